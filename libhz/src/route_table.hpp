// The table of routes with the functions that walk them.
#pragma once
#include <optional>
#include <span>
#include <string_view>

#include "form.hpp"
#include "hz/quantity.hpp"

namespace hz {

class Resolver;
using Way = std::optional<Form> (*)(Resolver&);

/// One line of the table. The form that a way returns is the natural logarithm of the quantity; for teff it is K.
struct RouteEntry {
  Quantity gives{};
  std::string_view family;  // what a setting can put first: "stated", "radius", "photometry", "period", "computed"
  Way way = nullptr;
};

/// In the order of all_routes().
[[nodiscard]] std::span<const RouteEntry> route_entries();

}  // namespace hz
