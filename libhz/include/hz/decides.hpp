// What decides a verdict: which input the zone position hangs on, and how much better it would have to be known.
#pragma once
#include <optional>
#include <string_view>
#include <vector>

#include "hz/answer.hpp"
#include "hz/placement.hpp"

namespace hz {

/// An input's share of the variance of zone position, to first order: from its half-widths alone, the others at their
/// central values. The planet mass counts as Quantity::planet_mass.
struct VarianceShare {
  Quantity quantity{};
  std::string_view scatter_of;  // key of the relation whose scatter it is; empty for a measured value
  double share = 0;
};

/// Greatest first, summing to 1; empty when every input is known or the set bounds no zone at the central values.
[[nodiscard]] std::vector<VarianceShare> variance_shares(const PlacementInput& input, const Settings& settings);

/// By what factor (below 1) the half-widths of one input must shrink, all central values staying, for the verdict of
/// the conservative zone (else the optimistic one) to become firm: inside or outside. Empty when it is firm already, or
/// when this input alone cannot settle it.
[[nodiscard]] std::optional<double> settling_factor(const PlacementInput& input, const VarianceShare& which,
                                                    const Settings& settings);

}  // namespace hz
