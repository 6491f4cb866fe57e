// hzmap columns: how a list's columns are understood, how that was known, and what is missing for the job.
#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>

#include "aligned_table.hpp"
#include "commands.hpp"
#include "files.hpp"
#include "hz/atomic_file.hpp"
#include "hz/table/column_report.hpp"
#include "list_options.hpp"
#include "numbers.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

constexpr std::size_t widest_value = 24;

std::string values_text(const std::vector<std::string>& samples) {
  std::vector<std::string> shown;
  for (const std::string& sample : samples) shown.push_back(shortened(printable(sample), widest_value));
  return fmt::format("{}", fmt::join(shown, "; "));
}

std::string header_text(const ReportedColumn& column) { return column.header.empty() ? "(no name)" : column.header; }

std::string unit_text(const ReportedColumn& column) {
  return column.unit.empty() ? "" : column.unit + (column.unit_assumed ? " (assumed)" : "");
}

std::string known_text(const ReportedColumn& column) {
  if (!column.doubt.empty()) return "in doubt";
  return column.known_by ? std::string(text(*column.known_by)) : "";
}

AlignedTable column_table(const ColumnReport& report) {
  AlignedTable table({{"column"}, {"taken for"}, {"unit"}, {"known by"}, {"first values"}}, "");
  for (const ReportedColumn& column : report.columns) {
    const Style style = column.meaning.empty() && column.doubt.empty() ? Style::faint : Style::plain;
    table.add({header_text(column), column.meaning, unit_text(column), known_text(column), values_text(column.samples)},
              style);
  }
  return table;
}

std::string doubt_text(const Doubt& doubt, std::size_t width) {
  const char* const tail =
      doubt.map_lines.size() == 1 ? "this map line settles it" : "one of these map lines settles it";
  std::string result = wrapped(fmt::format("In doubt: {}; {}:", printable(doubt.what), tail), width) + "\n";
  for (const std::string& line : doubt.map_lines) result += "  " + printable(line) + "\n";
  return result + "\n";
}

std::string job_sentence(const char* commands, const std::vector<std::string>& missing, const Understanding& draft) {
  const auto& doubts = draft.doubts();
  const bool stops = std::any_of(doubts.begin(), doubts.end(), [](const Doubt& doubt) { return doubt.blocks; });
  if (stops) return fmt::format("{} stops until the columns in doubt are settled.", commands);
  if (missing.empty()) return fmt::format("{} has all it needs.", commands);
  return fmt::format("{} lacks {}.", commands, fmt::join(missing, "; "));
}

void write_map(const std::string& path, const TableHead& head, const Understanding& understanding) {
  refuse_to_replace(path);
  write_file(path, starter_map(head, understanding));
}

}  // namespace

int run_columns(const Arguments& arguments, Console& console) {
  const OpenList list = open_draft(arguments.words().front(), arguments);
  const TableHead& head = list.reader->head();
  const Understanding for_stars = Understanding::draft(head, list.map, star_inputs(), list.reader->peek());
  const ColumnReport report = report_columns(head, list.understanding, list.reader->next());
  if (const auto map = arguments.value("write")) write_map(*map, head, list.understanding);
  console.print(fmt::format("{}: {} of {} understood\n\n", head.source, list.understanding.columns().size(),
                            counted(head.columns.size(), "column")));
  console.print(column_table(report).text(console) + "\n");
  const std::size_t width = terminal_width();
  for (const Doubt& doubt : list.understanding.doubts()) console.print(doubt_text(doubt, width));
  console.print(wrapped(job_sentence("`bounds`", report.missing_for_stars, for_stars), width) + "\n");
  console.print(
      wrapped(job_sentence("`rank` (also `check`, `draw`)", report.missing_for_planets, list.understanding), width) +
      "\n");
  return exit_code::done;
}

}  // namespace hz::app
