#include "hz/table/peeked_table.hpp"

#include <gtest/gtest.h>

#include <numeric>

namespace hz {
namespace {

/// Chunks of the sizes given, rows counted through.
class Chunks : public TableReader {
public:
  explicit Chunks(std::vector<std::size_t> sizes) : sizes_(std::move(sizes)) {}
  [[nodiscard]] const TableHead& head() const override { return head_; }
  [[nodiscard]] std::optional<Chunk> next() override {
    if (given_ == sizes_.size()) return std::nullopt;
    Chunk chunk;
    chunk.first_row = 1 + std::accumulate(sizes_.begin(), sizes_.begin() + static_cast<std::ptrdiff_t>(given_), 0UL);
    chunk.row_problems.resize(sizes_[given_++]);
    return chunk;
  }

private:
  TableHead head_{"chunks", {}, {}};
  std::vector<std::size_t> sizes_;
  std::size_t given_ = 0;
};

PeekedTable table_of(std::vector<std::size_t> sizes) { return PeekedTable(std::make_unique<Chunks>(std::move(sizes))); }

std::vector<std::size_t> first_rows(PeekedTable& table) {
  std::vector<std::size_t> out;
  while (const auto chunk = table.next()) out.push_back(chunk->first_row);
  return out;
}

using Rows = std::vector<std::size_t>;

TEST(PeekedTable, GivesEveryChunkOnceAfterAPeek) {
  auto table = table_of({2, 3, 4});
  EXPECT_EQ(table.head().source, "chunks");
  EXPECT_EQ(table.peek(4).size(), 2U);
  EXPECT_EQ(table.peek(4).size(), 2U);  // the same ones
  EXPECT_EQ(first_rows(table), (Rows{1, 3, 6}));
}

TEST(PeekedTable, PeeksNoFurtherThanAsked) {
  auto table = table_of({2, 3, 4});
  EXPECT_EQ(table.peek(1).size(), 1U);
  EXPECT_EQ(table.peek(3).size(), 2U);
  EXPECT_EQ(table.peek(0).size(), 2U);
}

TEST(PeekedTable, PeeksFromWhereReadingIs) {
  auto table = table_of({2, 3, 4});
  EXPECT_EQ(table.next()->first_row, 1U);
  ASSERT_EQ(table.peek(1).size(), 1U);
  EXPECT_EQ(table.peek(1).front().first_row, 3U);
  EXPECT_EQ(first_rows(table), (Rows{3, 6}));
}

TEST(PeekedTable, ShortAndEmptyTables) {
  auto few = table_of({2});
  EXPECT_EQ(few.peek(100).size(), 1U);
  EXPECT_EQ(first_rows(few), (Rows{1}));
  auto none = table_of({});
  EXPECT_TRUE(none.peek().empty());
  EXPECT_FALSE(none.next());
}

}  // namespace
}  // namespace hz
