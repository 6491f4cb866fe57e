// Whether the numbers of a column fit the unit they are taken to be in.
#pragma once
#include <span>
#include <vector>

#include "hz/table/understanding.hpp"
#include "table/reading_plan.hpp"

namespace hz {

/// What is known of a list once its head is understood.
struct UnderstoodList {
  const TableHead& head;
  const std::vector<UnderstoodColumn>& columns;
  const ReadingPlan& plan;
  const ColumnMap& map;
  std::span<const Quantity> needed;
};

/// Doubts about value columns whose numbers in the first rows (telling_rows of them) look like another unit or
/// quantity. A unit stated in the map is never doubted. A column of fewer than three numbers is not judged.
[[nodiscard]] std::vector<Doubt> implausible_columns(const UnderstoodList& list, std::span<const Chunk> first);

}  // namespace hz
