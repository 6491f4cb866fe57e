// Which column is a candidate for which quantity, each judged by itself.
#pragma once
#include <cstddef>
#include <string>
#include <vector>

#include "hz/table/understanding.hpp"

namespace hz {

/// A column recognised, before the columns are compared with each other.
struct ColumnCandidate {
  std::size_t column = 0;
  Quantity quantity{};  // as its unit tells
  Quantity named{};     // as its header or the map calls it
  ColumnPart part = ColumnPart::value;
  std::string unit;  // as stated; empty when nothing states it
  bool unit_known = true;
  KnownBy known_by = KnownBy::name;
  std::string base;                // folded words of the quantity, to pair half-widths with their values
  std::vector<Quantity> meanings;  // ambiguous: may be any of these
};

/// Throws hz::Error (input) when the map names a column that is not there or a unit that is not understood.
[[nodiscard]] std::vector<ColumnCandidate> match_columns(const TableHead& head, const ColumnMap& map);

/// What the file says of each column in words: its own description, else a comment line `name: words [unit]`.
[[nodiscard]] std::vector<std::string> descriptions(const TableHead& head);

}  // namespace hz
