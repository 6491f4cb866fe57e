// The options of commands that read a list: how its columns are understood, what is written and where.
#pragma once
#include <memory>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "hz/table/peeked_table.hpp"
#include "hz/table/table.hpp"
#include "hz/table/understanding.hpp"
#include "options.hpp"

namespace hz::app {

[[nodiscard]] std::span<const Option> reading_options();  // --columns, --missing-value
[[nodiscard]] std::span<const Option> writing_options();  // --output, --keep, --strict

/// A list, opened and understood.
struct OpenList {
  ColumnMap map;
  std::unique_ptr<PeekedTable> reader;
  Understanding understanding;
};

/// Opens the list at `path` ("-" is standard input) with the user's column map, if `map_option` gives one. A doubt
/// about a column of a `needed` quantity stops the work, and so do implausible numbers in the first rows. Throws
/// hz::Error: input, or usage for an -o that names the list itself.
[[nodiscard]] OpenList open_list(const std::string& path, const Arguments& arguments, std::span<const Quantity> needed,
                                 std::string_view map_option = "columns");

/// The same, with doubts instead of an error: for telling how a list is understood.
[[nodiscard]] OpenList open_draft(const std::string& path, const Arguments& arguments);

/// The index of a column that an option names. Throws hz::Error (usage) that offers the closest name.
[[nodiscard]] std::size_t column_named(std::string_view option, const std::string& name, const TableHead& head);

/// A column of the input that travels along.
struct KeptColumn {
  std::optional<std::size_t> column;  // index in the input's head; empty for a column of another list
  ColumnHead head;  // its name has "input_" in front where the output has a column of that name already
};

/// What --keep asks for. `all` leaves out the columns whose name the output has already.
/// Throws hz::Error (usage) that offers the closest name for a column the input does not have.
[[nodiscard]] std::vector<KeptColumn> kept_columns(const Arguments& arguments, const TableHead& input,
                                                   std::span<const std::string> written);

/// The cells of these columns in a row, as text; empty ones for a row that could not be read, and for columns of
/// another list.
[[nodiscard]] std::vector<std::string> kept_cells(const Chunk& chunk, std::size_t row,
                                                  std::span<const KeptColumn> kept);

[[nodiscard]] std::vector<ColumnHead> heads_of(std::span<const KeptColumn> kept);

/// The part of kept_columns behind the option's value; for tests.
[[nodiscard]] std::vector<KeptColumn> kept_columns(const std::string& keep, const TableHead& input,
                                                   std::span<const std::string> written);

}  // namespace hz::app
