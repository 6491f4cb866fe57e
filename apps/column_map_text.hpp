// A starter column map, to be edited by hand and given back with --columns.
#pragma once
#include <string>

#include "hz/table/understanding.hpp"

namespace hz::app {

/// TOML in the form that ColumnMap::parse reads: what is understood, as lines; doubts and unused columns, as comments.
/// Read back unedited, it gives the same understanding.
[[nodiscard]] std::string column_map_text(const TableHead& head, const Understanding& understanding);

}  // namespace hz::app
