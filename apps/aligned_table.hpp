// A small table for people to read.
#pragma once
#include <string>
#include <vector>

#include "console.hpp"

namespace hz::app {

enum class Align { left, right };

/// Rows of text under headings, each column as wide as its widest cell. A column without any cell text is left out, and
/// an empty cell of another column shows "-", so that a gap is seen to be meant.
class AlignedTable {
public:
  struct Column {
    std::string heading;
    Align align = Align::left;
  };

  explicit AlignedTable(std::vector<Column> columns, std::string gap = "-")
      : columns_(std::move(columns)), gap_(std::move(gap)) {}

  /// One cell a column.
  void add(std::vector<std::string> cells, Style style = Style::plain);

  [[nodiscard]] bool empty() const { return rows_.empty(); }

  /// The table, each line with `indent` blanks in front and a newline at its end.
  [[nodiscard]] std::string text(const Console& console, std::size_t indent = 0) const;

private:
  struct Row {
    std::vector<std::string> cells;
    Style style = Style::plain;
  };
  struct ShownColumn {
    std::size_t column = 0;
    std::size_t width = 0;
  };
  [[nodiscard]] std::vector<ShownColumn> filled_columns() const;
  [[nodiscard]] std::size_t width_of(std::size_t column) const;
  [[nodiscard]] std::string line(const std::vector<std::string>& cells, const std::vector<ShownColumn>& shown) const;

  std::vector<Column> columns_;
  std::string gap_;
  std::vector<Row> rows_;
};

}  // namespace hz::app
