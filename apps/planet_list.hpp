// A list read whole and answered: what rank, check and draw start from.
#pragma once
#include <functional>
#include <span>
#include <string>
#include <vector>

#include "console.hpp"
#include "hz/ranking.hpp"
#include "list_options.hpp"
#include "options.hpp"
#include "settings_options.hpp"

namespace hz::app {

/// --prefer COLUMN=VALUE.
[[nodiscard]] std::span<const Option> preference_options();

struct AnsweredList {
  std::vector<Candidate> candidates;  // one a row, in file order
  std::vector<Quantity> stated;       // what the list speaks of
  std::vector<KeptColumn> kept;
};

/// Reads every row of the list and answers it. `written` are the names of the columns that will stand in an output, for
/// --keep; commands without that option keep nothing.
/// Rows that are not wanted are read but not answered: they come back set aside. Throws hz::Error (input) for a list
/// without rows, and for one without any column that says something of a star or a planet.
[[nodiscard]] AnsweredList answer_list(
    const std::string& path, const Arguments& arguments, const Settings& settings, const Console& console,
    std::span<const std::string> written = {},
    const std::function<bool(const ListRow&)>& wanted = [](const ListRow&) { return true; });

}  // namespace hz::app
