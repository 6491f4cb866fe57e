// A table whose first rows can be looked at before they are read.
#pragma once
#include <cstddef>
#include <memory>
#include <optional>
#include <span>
#include <vector>

#include "hz/table/table.hpp"

namespace hz {

/// Rows enough to tell what the numbers of a column are.
inline constexpr std::size_t telling_rows = 1000;

/// Passes a table on, chunk by chunk, and gives its first rows twice.
class PeekedTable : public TableReader {
public:
  explicit PeekedTable(std::unique_ptr<TableReader> table) : table_(std::move(table)) {}

  [[nodiscard]] const TableHead& head() const override { return table_->head(); }
  [[nodiscard]] std::optional<Chunk> next() override;

  /// The chunks that hold the next rows, at least `rows` of them where the table has as many; next() still gives them.
  /// A slow pipe is waited for, so that the same bytes always look the same. Valid until next().
  [[nodiscard]] std::span<const Chunk> peek(std::size_t rows = telling_rows);

private:
  std::unique_ptr<TableReader> table_;
  std::vector<Chunk> waiting_;  // peeked and not yet passed on
};

}  // namespace hz
