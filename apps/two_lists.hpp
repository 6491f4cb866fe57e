// A list of stars and a list of planets, joined into one list.
#pragma once
#include <span>
#include <string>

#include "list_rows.hpp"
#include "options.hpp"

namespace hz::app {

/// Reads the list of stars at `stars_path` and the list of planets that --planets names, and joins them: one row a row
/// of the list of planets, in its order, with its star's values, then one row a star that no planet has. A planet whose
/// star is not found, or that fits several, keeps what its own row says of its star, and a remark says why.
/// `written` as in answer_list().
/// Throws hz::Error: usage for options that do not fit the lists; input for lists that cannot be read or joined.
[[nodiscard]] UnansweredList read_two_lists(const std::string& stars_path, const Arguments& arguments,
                                            const Console& console, std::span<const std::string> written);

}  // namespace hz::app
