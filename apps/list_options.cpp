#include "list_options.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "closest.hpp"
#include "files.hpp"
#include "hz/error.hpp"
#include "missing_values.hpp"

namespace hz::app {
namespace {

constexpr auto reading_table = std::to_array<Option>({
    {"columns", '\0', OptionKind::value, "MAP.toml", OptionGroup::input,
     "how the columns are to be understood; `hzmap columns LIST --write MAP.toml` writes one to edit"},
    {"missing-value", '\0', OptionKind::list, "QUANTITY=N,...", OptionGroup::input,
     "numbers that stand for no value of a quantity, such as parallax=0,-1; may be given again"},
});

constexpr auto writing_table = std::to_array<Option>({
    {"output", 'o', OptionKind::value, "FILE", OptionGroup::output,
     "write the whole table to a file; - is standard output"},
    {"keep", '\0', OptionKind::value, "COL,...", OptionGroup::output,
     "columns of the list that travel along: their names, all or none (default none)"},
    {"strict", '\0', OptionKind::flag, "", OptionGroup::output, "exit with 1 when any row was set aside"},
});

bool has_name(std::span<const std::string> names, const std::string& name) {
  return std::find(names.begin(), names.end(), name) != names.end();
}

std::vector<std::string> names_of(const TableHead& head) {
  std::vector<std::string> names;
  for (const ColumnHead& column : head.columns) names.push_back(column.name);
  return names;
}

KeptColumn keep_column(const TableHead& input, std::size_t column, std::span<const std::string> written) {
  KeptColumn kept{column, input.columns[column]};
  if (has_name(written, kept.head.name)) kept.head.name = "input_" + kept.head.name;
  return kept;
}

std::vector<KeptColumn> keep_all(const TableHead& input, std::span<const std::string> written) {
  std::vector<KeptColumn> result;
  for (std::size_t column = 0; column < input.columns.size(); ++column) {
    if (!has_name(written, input.columns[column].name)) result.push_back(keep_column(input, column, written));
  }
  return result;
}

ColumnMap column_map(const Arguments& arguments, std::string_view map_option) {
  const std::optional<std::string> file = arguments.value(map_option);
  ColumnMap map = file ? ColumnMap::parse(read_text_file(*file), *file) : ColumnMap{};
  const auto missing = read_missing_values(arguments.values("missing-value"));
  map.missing_numbers.insert(map.missing_numbers.end(), missing.begin(), missing.end());
  return map;
}

/// The library speaks of --columns, the option of a list that stands alone.
[[noreturn]] void name_the_option(const Error& error, std::string_view map_option) {
  constexpr std::string_view usual = "--columns ";
  std::string what = error.what();
  const std::size_t at = what.find(usual);
  if (at != std::string::npos) what.replace(at, usual.size(), fmt::format("--{} ", map_option));
  throw Error(error.fault(), what);
}

}  // namespace

std::span<const Option> reading_options() { return reading_table; }
std::span<const Option> writing_options() { return writing_table; }

std::size_t column_named(std::string_view option, const std::string& name, const TableHead& head) {
  const std::vector<std::string> names = names_of(head);
  const auto found = std::find(names.begin(), names.end(), name);
  if (found != names.end()) return static_cast<std::size_t>(found - names.begin());
  throw Error(Fault::usage,
              fmt::format("--{}: {} has no column `{}`{}", option, head.source, name, did_you_mean(name, names)));
}

OpenList open_list(const std::string& path, const Arguments& arguments, std::span<const Quantity> needed,
                   std::string_view map_option) {
  const std::optional<std::string> output = arguments.knows("output") ? arguments.value("output") : std::nullopt;
  if (output && *output != "-" && path != "-") refuse_to_overwrite(path, *output);
  OpenList list{column_map(arguments, map_option), std::make_unique<PeekedTable>(open_table(path)), {}};
  try {
    list.understanding = Understanding::of(list.reader->head(), list.map, needed, list.reader->peek());
  } catch (const Error& error) {
    name_the_option(error, map_option);
  }
  return list;
}

OpenList open_draft(const std::string& path, const Arguments& arguments) {
  OpenList list{column_map(arguments, "columns"), std::make_unique<PeekedTable>(open_table(path)), {}};
  list.understanding = Understanding::draft(list.reader->head(), list.map, planet_inputs(), list.reader->peek());
  return list;
}

std::vector<KeptColumn> kept_columns(const std::string& keep, const TableHead& input,
                                     std::span<const std::string> written) {
  if (keep == "none") return {};
  if (keep == "all") return keep_all(input, written);
  std::vector<KeptColumn> result;
  for (std::size_t start = 0; start <= keep.size();) {
    const std::size_t comma = std::min(keep.find(',', start), keep.size());
    result.push_back(keep_column(input, column_named("keep", keep.substr(start, comma - start), input), written));
    start = comma + 1;
  }
  return result;
}

std::vector<KeptColumn> kept_columns(const Arguments& arguments, const TableHead& input,
                                     std::span<const std::string> written) {
  return kept_columns(arguments.value("keep").value_or("none"), input, written);
}

std::vector<std::string> kept_cells(const Chunk& chunk, std::size_t row, std::span<const KeptColumn> kept) {
  std::vector<std::string> cells;
  for (const KeptColumn& column : kept) {
    const bool is_here = column.column && !chunk.row_problems[row];
    cells.push_back(is_here ? chunk.text(*column.column, row) : "");
  }
  return cells;
}

std::vector<ColumnHead> heads_of(std::span<const KeptColumn> kept) {
  std::vector<ColumnHead> heads;
  for (const KeptColumn& column : kept) heads.push_back(column.head);
  return heads;
}

}  // namespace hz::app
