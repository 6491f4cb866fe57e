// --missing-value: numbers that stand for "no value".
#pragma once
#include <span>
#include <string>
#include <vector>

#include "hz/table/understanding.hpp"

namespace hz::app {

/// What `parallax=0` and `parallax=0,-1` say, one text an option given. Throws hz::Error (usage) that offers the
/// closest name for an unknown quantity.
[[nodiscard]] std::vector<ColumnMap::MissingNumber> read_missing_values(std::span<const std::string> texts);

}  // namespace hz::app
