#include "column_map_text.hpp"

#include <fmt/format.h>

namespace hz::app {
namespace {

/// A TOML basic string.
std::string quoted(std::string_view text) {
  std::string result = "\"";
  for (const char c : text) {
    const auto byte = static_cast<unsigned char>(c);
    if (c == '"' || c == '\\') {
      result += fmt::format("\\{}", c);
    } else if (byte < 0x20 || byte == 0x7F) {
      result += fmt::format("\\u{:04X}", byte);
    } else {
      result += c;
    }
  }
  return result + "\"";
}

std::string value_text(const ColumnHead& head, const UnderstoodColumn& column) {
  if (column.unit.empty()) return quoted(head.name);
  return fmt::format("{{ column = {}, unit = {} }}", quoted(head.name), quoted(column.unit));
}

/// A further column for a quantity cannot stand in a map, where each name stands once: it is only mentioned.
std::string understood_line(const TableHead& head, const UnderstoodColumn& column) {
  return fmt::format("{}{} = {}\n", column.choice > 0 ? "# " : "", canonical_name(column.quantity, column.part),
                     value_text(head.columns[column.column], column));
}

std::string doubt_lines(const TableHead& head, const Doubt& doubt) {
  std::string result = fmt::format("\n# {}: {}\n", quoted(head.columns[doubt.column].name), doubt.what);
  for (const std::string& line : doubt.map_lines) result += fmt::format("# {}\n", line);
  return result;
}

}  // namespace

std::string column_map_text(const TableHead& head, const Understanding& understanding) {
  std::string result =
      "# How the columns of this list are to be understood: name of hzmap = column of the list.\n"
      "# Edit, then use it with --columns.\n"
      "# missing = [\"-99\"]  # further spellings of \"no value\"\n"
      "# ignore = [\"K\"]     # columns to leave alone\n\n[columns]\n";
  for (const UnderstoodColumn& column : understanding.columns()) result += understood_line(head, column);
  for (const Doubt& doubt : understanding.doubts()) result += doubt_lines(head, doubt);
  if (!understanding.others().empty()) result += "\n# Not used:\n";
  for (const std::size_t column : understanding.others())
    result += fmt::format("#   {}\n", quoted(head.columns[column].name));
  return result;
}

}  // namespace hz::app
