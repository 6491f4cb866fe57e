// Placement by brute force. It shares with the quadrature only the distributions and the limits.
#include <cmath>
#include <random>

#include "hz/placement.hpp"
#include "hz/require.hpp"

namespace hz {
namespace {

using Generator = std::mt19937_64;

double draw(const Distribution& x, Generator& generator) {
  if (x.is_exact()) return x.central();
  double pick = std::uniform_real_distribution<double>()(generator);
  const Piece* piece = &x.pieces().front();
  for (const Piece& candidate : x.pieces()) {
    piece = &candidate;
    if ((pick -= candidate.weight) < 0) break;
  }
  std::normal_distribution<double> normal;
  while (true) {
    const double z = std::abs(normal(generator));
    if (z < piece->end) return piece->centre + piece->direction * piece->sigma * z;
  }
}

struct Counts {
  std::uint64_t too_hot = 0, optimistic = 0, too_cold = 0;
  std::uint64_t too_hot_conservative = 0, conservative = 0, too_cold_conservative = 0;
  std::uint64_t unanswered = 0, in_range = 0;
};

/// One draw of everything: where its insolation falls against one zone's limits.
struct Drawn {
  double insolation = 0, teff = 0, planet_mass = 0;
};

Drawn draw_all(const PlacementInput& input, Generator& generator) {
  Drawn drawn;
  drawn.teff = draw(input.teff, generator);
  double product = std::exp(input.offset + input.curve(drawn.teff));
  for (const InsolationTerm& term : input.terms) {
    const double x = draw(term.x, generator);
    product *= std::pow(term.decadic ? std::pow(10, x) : x, term.power);
  }
  const double e = draw(input.eccentricity, generator);
  drawn.insolation = product / std::sqrt(1 - e * e);
  const double mass = draw(input.planet_mass, generator);
  drawn.planet_mass = input.planet_mass_decadic ? std::pow(10, mass) : mass;
  return drawn;
}

}  // namespace

Probabilities place_by_sampling(const PlacementInput& input, const LimitSet& set, BeyondRange beyond,
                                std::uint64_t draws, std::uint64_t seed) {
  HZ_REQUIRE(set.bounds_a_zone() && draws > 0);
  Generator generator(seed);
  const std::optional<Range> fitted = set.teff_range();
  Counts counts;
  for (std::uint64_t i = 0; i < draws; ++i) {
    const Drawn drawn = draw_all(input, generator);
    if (!fitted || fitted->contains(drawn.teff)) ++counts.in_range;
    const double reach = beyond == BeyondRange::hold ? hold_reach : 0;
    if (fitted && (drawn.teff < fitted->low - reach || drawn.teff > fitted->high + reach)) {
      ++counts.unanswered;
      continue;
    }
    const auto hotter_than = [&](std::size_t limit) {
      return drawn.insolation >= set.limits[limit].clamped_insolation(drawn.teff, drawn.planet_mass);
    };
    if (set.conservative) {
      if (hotter_than(set.conservative->inner)) {
        ++counts.too_hot_conservative;
      } else {
        ++(hotter_than(set.conservative->outer) ? counts.conservative : counts.too_cold_conservative);
      }
    }
    if (set.optimistic) {
      if (hotter_than(set.optimistic->inner)) {
        ++counts.too_hot;
      } else {
        ++(hotter_than(set.optimistic->outer) ? counts.optimistic : counts.too_cold);
      }
    }
  }
  const auto share = [&](std::uint64_t count) { return static_cast<double>(count) / static_cast<double>(draws); };
  Probabilities p;
  p.teff_in_range = share(counts.in_range);
  p.unanswered = share(counts.unanswered);
  if (set.conservative) {
    p.too_hot_conservative = share(counts.too_hot_conservative);
    p.too_cold_conservative = share(counts.too_cold_conservative);
    p.conservative = share(counts.conservative);
  }
  p.too_hot = set.optimistic ? share(counts.too_hot) : p.too_hot_conservative;
  p.too_cold = set.optimistic ? share(counts.too_cold) : p.too_cold_conservative;
  if (set.optimistic) p.optimistic = share(counts.optimistic);
  return p;
}

}  // namespace hz
