// Probabilities against brute force over the raw inputs: parallaxes, magnitudes, colours, types, masses and the
// scatters of relations are drawn, and everything that follows is worked out anew for each draw.
#include <gtest/gtest.h>

#include <array>
#include <cmath>

#include "lantern_rows.hpp"

namespace hz {
namespace {

using testing::Draw;
using testing::DrawnStar;
using testing::LanternRow;

constexpr int draws = 30'000;
constexpr std::uint64_t survey_seed = 1;

/// Earth = 1. Chen & Kipping 2017: R = 1.008 M^0.2790 with a scatter of 4.03 per cent up to 2.04 Earth masses,
/// 0.80812 M^0.589 with 14.6 per cent above.
double planet_mass_of(double radius, Draw& draw) {
  const double break_radius = 1.008 * std::pow(2.04, 0.2790);
  const double on_relation = radius * std::exp((radius < break_radius ? 0.0403 : 0.146) * draw.normal());
  return on_relation < break_radius ? std::pow(on_relation / 1.008, 1 / 0.2790)
                                    : std::pow(on_relation / 0.80812, 1 / 0.589);
}

struct DrawnPlanet {
  double teff = 0, insolation = 0, mass = 1;
};

double draw_axis(const PlanetRecord& planet, const DrawnStar& star, Draw& draw) {
  if (planet.semi_major_axis.stated) return draw.of(planet.semi_major_axis, 0);
  if (planet.orbital_period.stated) {
    const double years = draw.of(planet.orbital_period, 0) / 365.256898;
    return std::cbrt(star.mass * years * years);
  }
  return draw.of(planet.scaled_semi_major_axis, 0) * star.radius * 695700 / 149597870.7;
}

double draw_eccentricity(const PlanetRecord& planet, Draw& draw) {
  double e = 1;
  while (e >= 1) e = draw.of(planet.eccentricity, 0);
  return e;
}

DrawnPlanet draw_planet(const LanternRow& lantern, Draw& draw) {
  const PlanetRecord& planet = lantern.row.planet;
  const DrawnStar star = lantern.kind->star_of(lantern.row.star, draw);
  const double axis = draw_axis(planet, star, draw);
  const double e = draw_eccentricity(planet, draw);
  DrawnPlanet drawn{star.teff, star.luminosity / (axis * axis) / std::sqrt(1 - e * e), 1};
  if (planet.radius_ratio.stated) {
    drawn.mass = planet_mass_of(109.07637 * draw.of(planet.radius_ratio, 0) * star.radius, draw);
  }
  return drawn;
}

/// Too hot, optimistic, too cold, unanswered, conservative.
using Shares = std::array<double, 5>;

Shares brute_force(const LanternRow& lantern) {
  const LimitSet& set = testing::set_named("K14");
  Draw draw(lantern.row, lantern.row.number);
  Shares counts{};
  for (int i = 0; i < draws; ++i) {
    const DrawnPlanet planet = draw_planet(lantern, draw);
    const auto limit = [&](std::size_t index) {
      return set.limits[index].insolation(planet.teff, planet.mass, BeyondRange::hold);
    };
    if (!limit(set.optimistic->inner)) {
      ++counts[3];
      continue;
    }
    const auto hotter_than = [&](std::size_t index) { return planet.insolation >= limit(index)->value; };
    ++counts[hotter_than(set.optimistic->inner) ? 0 : hotter_than(set.optimistic->outer) ? 1 : 2];
    if (!hotter_than(set.conservative->inner) && hotter_than(set.conservative->outer)) ++counts[4];
  }
  for (double& count : counts) count /= draws;
  return counts;
}

Shares shares_of(const Probabilities& p) {
  return {*p.too_hot, *p.optimistic, *p.too_cold, p.unanswered, *p.conservative};
}

/// By how much the worst of the shares is off beyond three sigma of its draws.
double excess(const Shares& ours, const Shares& drawn) {
  double worst = 0;
  for (std::size_t k = 0; k < ours.size(); ++k) {
    const double p = std::clamp((ours[k] + drawn[k]) / 2, 1.0 / draws, 1 - 1.0 / draws);
    worst = std::max(worst, std::abs(ours[k] - drawn[k]) - 3 * std::sqrt(p * (1 - p) / draws));
  }
  return worst;
}

double greatest_difference(const Shares& ours, const Shares& drawn) {
  double worst = 0;
  for (std::size_t k = 0; k < ours.size(); ++k) worst = std::max(worst, std::abs(ours[k] - drawn[k]));
  return worst;
}

TEST(RawInputs, JointPropagationAgreesWithBruteForce) {
  double sum_of_squares = 0;
  int close = 0;
  const std::vector<LanternRow> rows = testing::lantern_rows(survey_seed);
  for (const LanternRow& lantern : rows) {
    const Answer answered = answer(lantern.row, testing::settings_of());
    ASSERT_EQ(answered.status, Status::answered) << lantern.name << ": " << answered.reason;
    const Shares ours = shares_of(answered.planet->probabilities);
    const Shares drawn = brute_force(lantern);
    EXPECT_LT(excess(ours, drawn), lantern.kind->allowed)
        << lantern.name << ": P " << ours[1] << " and " << ours[4] << ", drawn " << drawn[1] << " and " << drawn[4];
    if (excess(ours, drawn) < 0.01) ++close;
    sum_of_squares += std::pow(greatest_difference(ours, drawn), 2);
  }
  const auto count = static_cast<double>(rows.size());
  EXPECT_GE(close, 0.85 * count);
  EXPECT_LT(std::sqrt(sum_of_squares / count), 0.01);  // 0.002 of it is the draws'
}

/// A planet far inside or far outside would agree whatever were done to the errors.
TEST(RawInputs, EveryPlanetIsWithinReachOfALimit) {
  const std::vector<LanternRow> rows = testing::lantern_rows(survey_seed);
  EXPECT_GE(rows.size(), 50U);
  for (const LanternRow& lantern : rows) {
    const Shares p = shares_of(answer(lantern.row, testing::settings_of()).planet->probabilities);
    EXPECT_TRUE((p[1] > 0.02 && p[1] < 0.98) || (p[4] > 0.02 && p[4] < 0.98)) << lantern.name;
  }
}

}  // namespace
}  // namespace hz
