// How probably a planet lies on each side of each limit.
#pragma once
#include <cstdint>
#include <optional>
#include <vector>

#include "hz/distribution.hpp"
#include "hz/limit_set.hpp"
#include "hz/quantity.hpp"

namespace hz {

/// One independent input of the insolation: ln S gets power * ln x, or power * ln(10) * x when x is a decadic
/// logarithm.
struct InsolationTerm {
  Quantity quantity{};
  Distribution x = Distribution::exact(1);
  double power = 1;
  bool decadic = false;
};

/// Everything a placement depends on. ln S = offset + sum of terms + teff_power ln(teff) - ln(1 - e^2) / 2.
struct PlacementInput {
  double offset = 0;
  std::vector<InsolationTerm> terms;                   // independent of each other and of Teff
  double teff_power = 0;                               // 4 where the luminosity follows from radius and Teff
  Distribution teff = Distribution::exact(0);          // K
  Distribution eccentricity = Distribution::exact(0);  // 0 where the insolation is averaged already
  Distribution planet_mass = Distribution::exact(1);   // Earth masses, for limits that depend on it
  bool planet_mass_decadic = false;                    // planet_mass is a decadic logarithm of Earth masses
};

/// Orbit-averaged insolation at the central values.
[[nodiscard]] double central_insolation(const PlacementInput& input);

/// Shares of the joint distribution of the inputs. too_hot + optimistic + too_cold + unanswered = 1, against the
/// optimistic limits, or against the conservative ones when the set has no others. A zone the set does not have stays
/// empty.
struct Probabilities {
  std::optional<double> too_hot;
  std::optional<double> optimistic;
  std::optional<double> too_cold;
  std::optional<double> conservative;
  double too_hot_conservative = 0;  // the same sides for the conservative zone; they steer its `side`
  double too_cold_conservative = 0;
  double unanswered = 0;     // share of the Teff distribution for which the limits are refused
  double teff_in_range = 1;  // share of the Teff distribution inside the fitted range
};

/// By quadrature; error in each probability at most about 1e-4 (hz/placement.hpp's test compares 200 awkward cases).
[[nodiscard]] Probabilities place(const PlacementInput& input, const LimitSet& set, BeyondRange beyond);

/// By brute force from the very same distributions: the independent way. Standard error sqrt(p (1 - p) / draws).
[[nodiscard]] Probabilities place_by_sampling(const PlacementInput& input, const LimitSet& set, BeyondRange beyond,
                                              std::uint64_t draws, std::uint64_t seed);

/// Which side of the central value.
enum class Towards { colder, hotter };

/// The 68 per cent half-width of ln S - ln S_limit on one side of its central value, to about 1 per cent of itself.
///
/// With all insolation terms but the luminosity's left out it is twice the relative half-width of the limit's distance.
[[nodiscard]] double log_margin_width(const PlacementInput& input, const FluxLimit& limit, BeyondRange beyond,
                                      Towards towards);

}  // namespace hz
