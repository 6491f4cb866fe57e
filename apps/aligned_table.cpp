#include "aligned_table.hpp"

#include <algorithm>

#include "hz/require.hpp"
#include "text_layout.hpp"

namespace hz::app {

void AlignedTable::add(std::vector<std::string> cells, Style style) {
  HZ_REQUIRE(cells.size() == columns_.size());
  for (std::string& cell : cells) cell = printable(cell);
  rows_.push_back({std::move(cells), style});
}

std::vector<AlignedTable::ShownColumn> AlignedTable::filled_columns() const {
  std::vector<ShownColumn> result;
  for (std::size_t column = 0; column < columns_.size(); ++column) {
    const bool filled =
        std::any_of(rows_.begin(), rows_.end(), [&](const Row& row) { return !row.cells[column].empty(); });
    if (filled) result.push_back({column, width_of(column)});
  }
  return result;
}

std::size_t AlignedTable::width_of(std::size_t column) const {
  std::size_t width = std::max(text_width(columns_[column].heading), text_width(gap_));
  for (const Row& row : rows_) width = std::max(width, text_width(row.cells[column]));
  return width;
}

std::string AlignedTable::line(const std::vector<std::string>& cells, const std::vector<ShownColumn>& shown) const {
  std::string result;
  for (const auto& [column, width] : shown) {
    const std::string cell = cells[column].empty() ? gap_ : cells[column];
    const std::string padding(width - text_width(cell), ' ');
    if (!result.empty()) result += "  ";
    result += columns_[column].align == Align::left ? cell + padding : padding + cell;
  }
  result.erase(result.find_last_not_of(' ') + 1);
  return result;
}

std::string AlignedTable::text(const Console& console, std::size_t indent) const {
  const std::vector<ShownColumn> shown = filled_columns();
  const std::string margin(indent, ' ');
  std::vector<std::string> headings;
  for (const Column& column : columns_) headings.push_back(column.heading);
  std::string result = margin + console.styled(line(headings, shown), Style::strong) + "\n";
  for (const Row& row : rows_) result += margin + console.styled(line(row.cells, shown), row.style) + "\n";
  return result;
}

}  // namespace hz::app
