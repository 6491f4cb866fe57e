// The fields of a row by the quantity they hold.
#pragma once
#include <string>

#include "hz/quantity.hpp"
#include "hz/records.hpp"

namespace hz {

[[nodiscard]] bool has_stated_field(Quantity quantity);

/// A name, kind or code as text; empty where the row says nothing.
[[nodiscard]] std::string stated_text(const ListRow& row, Quantity quantity);
[[nodiscard]] bool has_stated_text(Quantity quantity);

}  // namespace hz
