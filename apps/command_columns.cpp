// hzmap columns: how a list's columns are understood, how that was known, and what is missing for the job.
#include <fmt/format.h>

#include "aligned_table.hpp"
#include "column_map_text.hpp"
#include "commands.hpp"
#include "hz/atomic_file.hpp"
#include "hz/measured_text.hpp"
#include "job_needs.hpp"
#include "list_options.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

constexpr std::size_t shown_values = 3;

/// The first few cells that hold something, as the file has them.
std::string first_values(const std::optional<Chunk>& chunk, std::size_t column) {
  std::string result;
  std::size_t shown = 0;
  for (std::size_t row = 0; chunk && row < chunk->rows() && shown < shown_values; ++row) {
    if (chunk->row_problems[row]) continue;
    const std::string text = chunk->text(column, row);
    if (is_missing(text)) continue;
    result += (result.empty() ? "" : "; ") + text;
    ++shown;
  }
  return result;
}

std::string unit_text(const UnderstoodColumn& column) {
  return column.unit.empty() ? "" : column.unit + (column.unit_assumed ? " (assumed)" : "");
}

AlignedTable column_table(const TableHead& head, const Understanding& understanding,
                          const std::optional<Chunk>& chunk) {
  AlignedTable table({{"column"}, {"taken for"}, {"unit"}, {"known by"}, {"first values"}});
  for (const UnderstoodColumn& column : understanding.columns())
    table.add({head.columns[column.column].name, canonical_name(column.quantity, column.part), unit_text(column),
               std::string(text(column.known_by)), first_values(chunk, column.column)});
  for (const std::size_t column : understanding.others())
    table.add({head.columns[column].name, "", "", "", first_values(chunk, column)}, Style::faint);
  return table;
}

std::string doubt_text(const TableHead& head, const Doubt& doubt, std::size_t width) {
  std::string result =
      wrapped(fmt::format("In doubt: {}: {}. A map line settles it:", head.columns[doubt.column].name, doubt.what),
              width) +
      "\n";
  for (const std::string& line : doubt.map_lines) result += "  " + line + "\n";
  return result;
}

}  // namespace

int run_columns(const Arguments& arguments, Console& console) {
  const OpenList list = open_draft(arguments.words().front(), arguments);
  const TableHead& head = list.reader->head();
  const std::optional<Chunk> chunk = list.reader->next();
  const std::size_t width = terminal_width();
  if (const auto map = arguments.value("write")) write_file(*map, column_map_text(head, list.understanding));
  console.print(fmt::format("{}: {} of {} columns understood\n\n", head.source, list.understanding.columns().size(),
                            head.columns.size()));
  console.print(column_table(head, list.understanding, chunk).text(console) + "\n");
  for (const Doubt& doubt : list.understanding.doubts()) console.print(doubt_text(head, doubt, width) + "\n");
  for (const std::string& line : what_is_missing(list.understanding)) console.print(wrapped(line, width) + "\n");
  return exit_code::done;
}

}  // namespace hz::app
