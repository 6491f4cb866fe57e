// The zones of many stars, a line each.
#pragma once
#include <vector>

#include "hz/ranked_table.hpp"
#include "hz/settings.hpp"

namespace hz::app {

/// The columns of a table of boundaries: names, what was used of the star and by which route, each zone edge with its
/// half-widths, insolation, period and angular separation, then status, reason and flags. Names are those of
/// catalogs/columns.csv. `kept`: heads of the input's columns that travel along, behind ours.
[[nodiscard]] std::vector<OutputColumn> bounds_columns(const Settings& settings, const std::vector<ColumnHead>& kept);

}  // namespace hz::app
