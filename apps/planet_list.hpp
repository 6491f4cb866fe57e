// A list read whole and answered: what rank, check and draw start from.
#pragma once
#include <functional>
#include <span>
#include <string>
#include <vector>

#include "console.hpp"
#include "hz/ranking.hpp"
#include "hz/table/table.hpp"
#include "options.hpp"
#include "settings_options.hpp"

namespace hz::app {

struct AnsweredList {
  std::vector<Candidate> candidates;  // one a row, in file order; of two lists, the planets first
  std::vector<Quantity> stated;       // what the list speaks of
  std::vector<ColumnHead> kept;       // heads of the cells that travel along
  std::string planets;                // the file that names the planets
  std::vector<std::string> joining;   // what joining two lists found, in lines; none for one list
  std::string differing_stars;        // stars whose rows state different values, counted; empty when there are none
};

/// Reads every row of the list, joined with --planets if that is given, and answers it. `written` are the names of the
/// columns that will stand in an output, for --keep; commands without that option keep nothing.
/// Rows that are not wanted are read but not answered: they come back set aside. Throws hz::Error (input) for a list
/// without rows, and for one without any column that says something of a star or a planet.
[[nodiscard]] AnsweredList answer_list(
    const std::string& path, const Arguments& arguments, const Settings& settings, const Console& console,
    std::span<const std::string> written = {},
    const std::function<bool(const ListRow&)>& wanted = [](const ListRow&) { return true; });

}  // namespace hz::app
