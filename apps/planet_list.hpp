// A list read whole and answered: what rank, check and draw start from.
#pragma once
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
/// Throws hz::Error (input) for a list without rows.
[[nodiscard]] AnsweredList answer_list(const std::string& path, const Arguments& arguments, const Settings& settings,
                                       const Console& console, std::span<const std::string> written = {});

}  // namespace hz::app
