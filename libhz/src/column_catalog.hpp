// catalogs/columns.csv, parsed once.
#pragma once
#include <string>
#include <vector>

#include "hz/quantity.hpp"

namespace hz {

/// An X_... row: spellings of a part of any numeric quantity, as "X err" or "err X".
struct PartPattern {
  std::string name;  // "X_err"
  std::vector<std::string> accept;
};

struct ColumnCatalog {
  std::vector<QuantityInfo> columns;        // all rows but the patterns
  std::vector<std::size_t> quantity_index;  // where each Quantity stands in `columns`
  std::vector<PartPattern> patterns;
};

[[nodiscard]] const ColumnCatalog& column_catalog();

}  // namespace hz
