// catalogs/relations/main_sequence.csv, two columns at a time.
#pragma once
#include <optional>
#include <string_view>
#include <vector>

#include "hz/flux_limit.hpp"
#include "piecewise.hpp"

namespace hz {

/// The rows that have both columns, by rising x: the longest run of neighbouring rows over which x rises or falls all
/// along, and of those the rows with x in `range` when one is given, both ends in. The column `spt` is read as a
/// spectral subtype: O0 = 0, B0 = 10, A0 = 20, … L0 = 70. A broken precondition when there is no such column.
[[nodiscard]] std::vector<Point> main_sequence_points(std::string_view x_column, std::string_view y_column,
                                                      const std::optional<Range>& range);

}  // namespace hz
