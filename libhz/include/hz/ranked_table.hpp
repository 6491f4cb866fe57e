// The columns of a ranked list: what the list stated, what follows, and what was decided, so that the file is itself a
// list.
#pragma once
#include <cstdint>
#include <functional>
#include <string>
#include <variant>
#include <vector>

#include "hz/quantity.hpp"
#include "hz/ranking.hpp"
#include "hz/settings.hpp"
#include "hz/table/table.hpp"

namespace hz {

/// One value of an output column; monostate is "no value".
using CellValue = std::variant<std::monostate, double, std::int64_t, std::string>;

/// A candidate with its place; rank 0 for rows without one.
struct RankedRow {
  const Candidate& candidate;
  std::size_t rank = 0;
};

struct OutputColumn {
  ColumnHead head;
  std::function<CellValue(const RankedRow&)> value;
};

/// The columns of a ranked list. `stated` are the quantities the input list speaks of: they come back as stated, in
/// canonical units, with half-widths and limit marks; `kept` are the heads of the input's own columns that travel along
/// (ListRow::kept holds their cells in the same order). What was used and how it was had stands in X_used and
/// X_used_route.
[[nodiscard]] std::vector<OutputColumn> ranked_columns(const Settings& settings, const std::vector<Quantity>& stated,
                                                       const std::vector<ColumnHead>& kept);

[[nodiscard]] TableHead head_of(const std::vector<OutputColumn>& columns);
[[nodiscard]] Chunk chunk_of(const std::vector<OutputColumn>& columns, const std::vector<RankedRow>& rows);

/// A number of six significant digits: more would claim too much of a derived value.
[[nodiscard]] double six_digits(double x);

}  // namespace hz
