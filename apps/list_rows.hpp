// A list read whole, nothing answered yet.
#pragma once
#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "console.hpp"
#include "hz/ranking.hpp"
#include "list_options.hpp"

namespace hz::app {

[[nodiscard]] std::span<const Option> preference_options();  // --prefer COLUMN=VALUE

/// A cell that makes a row the user's own choice.
struct Preference {
  std::size_t column = 0;
  std::string value;
};

/// What --prefer says. Throws hz::Error (usage) for a column that the list does not have.
[[nodiscard]] std::optional<Preference> read_preference(const Arguments& arguments, const TableHead& head);

/// What is wanted of a row besides its records.
struct RowReading {
  std::vector<KeptColumn> kept;          // travel along
  std::optional<Preference> preference;  // marks the user's own choice
  std::vector<std::size_t> identifiers;  // columns to join on
};

/// Every row, in file order.
struct ListRows {
  std::vector<Candidate> candidates;                  // their answers are empty
  std::vector<std::vector<std::string>> identifiers;  // of each row, the cells asked for; empty when none are
};

/// Throws hz::Error (input) for a list without rows.
[[nodiscard]] ListRows read_rows(const OpenList& list, const RowReading& reading, const Console& console);

/// What a list speaks of, in the order of the canonical columns.
[[nodiscard]] std::vector<Quantity> stated_quantities(const Understanding& understanding);

/// Throws hz::Error (input) when a list states nothing that any route starts from.
void refuse_unusable(std::span<const Quantity> stated, const std::string& file);

/// What joining lists or comparing rows says of a row, on its way to the answer.
struct Remark {
  std::vector<std::string> flags;
  std::string note;
  std::string no_star;       // why the star list has no star for this planet
  std::string no_star_kind;  // the same in a few words, for counting
};

/// One list, or two joined, ready to be answered.
struct UnansweredList {
  std::vector<Candidate> candidates;
  std::vector<Remark> remarks;       // one a row
  std::vector<Quantity> stated;      // what the list speaks of
  std::vector<ColumnHead> kept;      // heads of the cells that travel along
  std::string planets;               // the file that names the planets
  std::vector<std::string> joining;  // what joining found, in lines; none for one list
};

}  // namespace hz::app
