// The one table of routes: for each quantity the ways to get it, in order of preference.
#pragma once
#include <span>
#include <string_view>
#include <vector>

#include "hz/quantity.hpp"

namespace hz {

/// One way to a quantity, as people read it; libhz/src/route_table.cpp holds the ways themselves beside these words.
struct RouteInfo {
  Quantity gives{};
  std::string_view needs;                   // "magnitude_g, distance and teff"
  std::string_view law;                     // what carries it, where no published relation does
  std::vector<std::string_view> relations;  // keys of hz/relation.hpp: range, scatter and source stand there
  std::string_view holds;                   // when it is used, beyond the relations' own ranges; may be empty
};

/// All of them, grouped by quantity, best first.
[[nodiscard]] std::span<const RouteInfo> all_routes();

}  // namespace hz
