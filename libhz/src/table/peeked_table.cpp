#include "hz/table/peeked_table.hpp"

#include <utility>

namespace hz {

std::optional<Chunk> PeekedTable::next() {
  if (waiting_.empty()) return table_->next();
  auto first = std::move(waiting_.front());
  waiting_.erase(waiting_.begin());
  return first;
}

std::span<const Chunk> PeekedTable::peek(std::size_t rows) {
  std::size_t seen = 0;
  for (const Chunk& chunk : waiting_) seen += chunk.rows();
  while (seen < rows) {
    auto chunk = table_->next();
    if (!chunk) break;
    seen += chunk->rows();
    waiting_.push_back(*std::move(chunk));
  }
  return waiting_;
}

}  // namespace hz
