// How probably a planet lies on each side of each limit.
#pragma once
#include <cstdint>
#include <optional>
#include <string_view>
#include <vector>

#include "hz/distribution.hpp"
#include "hz/limit_set.hpp"
#include "hz/quantity.hpp"
#include "hz/relation.hpp"

namespace hz {

/// One independent input of the insolation: ln S gets power * ln x, or power * ln(10) * x when x is a decadic
/// logarithm (or a magnitude, whose power is -0.4).
struct InsolationTerm {
  Quantity quantity{};
  Distribution x = Distribution::exact(1);
  double power = 1;
  bool decadic = false;
  /// Key of the relation whose scatter this is; empty for a value of the row.
  std::string_view scatter_of = {};
};

/// What Teff itself adds to ln S: power ln(teff) + slope (teff - centre) + weight * correction(teff).
struct TeffCurve {
  double power = 0;  // 4 where the luminosity follows from radius and Teff
  double slope = 0;  // per K: what an input shared by Teff and luminosity adds, to first order
  double centre = 0;
  double weight = 0;                     // of the bolometric correction, -0.4 ln(10)
  const Relation* correction = nullptr;  // not null when the weight is not 0

  [[nodiscard]] double operator()(double teff) const;
  [[nodiscard]] bool is_flat() const { return power == 0 && slope == 0 && weight == 0; }
};

/// Everything a placement depends on. ln S = offset + sum of terms + curve(teff) - ln(1 - e^2) / 2.
struct PlacementInput {
  double offset = 0;
  std::vector<InsolationTerm> terms;  // independent of each other and of Teff
  TeffCurve curve;
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
