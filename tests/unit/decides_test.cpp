#include "hz/decides.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <random>

#include "answer_helpers.hpp"

namespace hz {
namespace {

using testing::earth;
using testing::exactly;
using testing::settings_of;
using testing::value;

/// An input of a planet about a star like the Sun.
PlacementInput input_of(const Field& luminosity, const Field& axis, const Field& teff = exactly(5780),
                        const Field& mass = exactly(1)) {
  ListRow row = earth();
  row.star.teff = teff;
  row.star.luminosity = luminosity;
  row.planet.semi_major_axis = axis;
  row.planet.planet_mass = mass;
  return *answer(row, settings_of()).input;
}

double share_of(const std::vector<VarianceShare>& shares, Quantity quantity) {
  for (const VarianceShare& each : shares) {
    if (each.quantity == quantity) return each.share;
  }
  return 0;
}

double sum_of_shares(const std::vector<VarianceShare>& shares) {
  double sum = 0;
  for (const VarianceShare& each : shares) sum += each.share;
  return sum;
}

TEST(VarianceShares, SumToOneGreatestFirst) {
  ListRow row = earth();
  row.star.teff = value(3400, 80, 120);
  row.star.luminosity = {};
  row.star.stellar_radius = value(0.4, 0.02, 0.04);
  row.planet.semi_major_axis = value(0.15, 0.01, 0.01);
  row.planet.eccentricity = value(0.2, 0.1, 0.1);
  row.planet.planet_mass = {};
  row.planet.planet_radius = value(1.5, 0.2, 0.2);
  const std::vector<VarianceShare> shares = variance_shares(*answer(row, settings_of()).input, settings_of());
  ASSERT_EQ(shares.size(), 5U);
  EXPECT_NEAR(sum_of_shares(shares), 1, 1e-12);
  for (std::size_t i = 1; i < shares.size(); ++i) EXPECT_GE(shares[i - 1].share, shares[i].share);
  EXPECT_GT(shares.back().share, 0);
  EXPECT_GT(share_of(shares, Quantity::planet_mass), 0);
}

TEST(VarianceShares, OfAProductGoAsTheSquaresOfItsWidths) {
  // ln S = ln L - 2 ln a: 0.04 against 2 * 0.03.
  const std::vector<VarianceShare> shares =
      variance_shares(input_of(value(1, 0.04, 0.04), value(1, 0.03, 0.03)), settings_of());
  EXPECT_NEAR(share_of(shares, Quantity::luminosity), 0.0016 / (0.0016 + 0.0036), 0.005);
  EXPECT_EQ(shares.front().quantity, Quantity::semi_major_axis);
}

/// Zone position straight from its definition, with the formula of the limits left to FluxLimit.
double position(double luminosity, double axis, double teff, double mass) {
  const LimitSet& set = testing::set_named("K14");
  const auto ln_limit = [&](std::size_t i) {
    return std::log(set.limits[i].insolation(teff, mass, BeyondRange::hold)->value);
  };
  const double inner = ln_limit(set.conservative->inner);
  return (inner - std::log(luminosity / (axis * axis))) / (inner - ln_limit(set.conservative->outer));
}

struct Varied {
  bool luminosity = true, axis = true, teff = true, mass = true;
};

/// Variance over 40,000 draws; what is not varied stays at its central value. Its relative error is sqrt(2 / 40000).
double variance(const Varied& varied) {
  std::mt19937_64 generator(20);
  std::normal_distribution<double> normal;
  double sum = 0;
  double squares = 0;
  constexpr int draws = 40000;
  for (int i = 0; i < draws; ++i) {
    const double z[] = {normal(generator), normal(generator), normal(generator), normal(generator)};
    const double x = position(1 + (varied.luminosity ? 0.05 * z[0] : 0), 1.1 + (varied.axis ? 0.02 * z[1] : 0),
                              5200 + (varied.teff ? 400 * z[2] : 0), 2 + (varied.mass ? 0.3 * z[3] : 0));
    sum += x;
    squares += x * x;
  }
  return squares / draws - (sum / draws) * (sum / draws);
}

TEST(VarianceShares, AgreeWithFixingOneInputAtATime) {
  const std::vector<VarianceShare> shares = variance_shares(
      input_of(value(1, 0.05, 0.05), value(1.1, 0.02, 0.02), value(5200, 400, 400), value(2, 0.3, 0.3)), settings_of());
  const double all = variance({});
  EXPECT_NEAR(share_of(shares, Quantity::luminosity), 1 - variance({.luminosity = false}) / all, 0.05);
  EXPECT_NEAR(share_of(shares, Quantity::semi_major_axis), 1 - variance({.axis = false}) / all, 0.05);
  EXPECT_NEAR(share_of(shares, Quantity::teff), 1 - variance({.teff = false}) / all, 0.05);
  EXPECT_NEAR(share_of(shares, Quantity::planet_mass), 1 - variance({.mass = false}) / all, 0.05);
  EXPECT_GT(share_of(shares, Quantity::teff), 0.05);  // none is lost in the tolerance
}

TEST(VarianceShares, AreNoneWhenAllIsKnown) {
  EXPECT_TRUE(variance_shares(input_of(exactly(1), exactly(1)), settings_of()).empty());
}

double p_conservative(const PlacementInput& input) {
  return *place(input, testing::set_named("K14"), BeyondRange::hold).conservative;
}

bool is_firm(const PlacementInput& input) { return p_conservative(input) >= 0.95 || p_conservative(input) <= 0.05; }

PlacementInput shrunk(PlacementInput input, Quantity quantity, double factor) {
  for (InsolationTerm& term : input.terms) {
    if (term.quantity == quantity) term.x = term.x.scaled(factor);
  }
  return input;
}

TEST(SettlingFactor, MakesTheVerdictFirmAndNoMoreThanThat) {
  for (const double axis : {0.98, 1.0, 1.6, 1.8, 0.9}) {  // inside and outside of either edge (0.950 and 1.676 au)
    const PlacementInput input = input_of(value(1, 0.3, 0.3), value(axis, 0.005, 0.005));
    ASSERT_FALSE(is_firm(input)) << axis;
    const std::optional<double> factor =
        settling_factor(input, VarianceShare{Quantity::luminosity, {}, 0}, settings_of());
    ASSERT_TRUE(factor) << axis;
    EXPECT_GT(*factor, 0);
    EXPECT_LT(*factor, 1);
    EXPECT_TRUE(is_firm(shrunk(input, Quantity::luminosity, *factor))) << axis;
    EXPECT_FALSE(is_firm(shrunk(input, Quantity::luminosity, *factor + 0.02))) << axis;
  }
}

TEST(SettlingFactor, FollowsTheErrorFunctionOfASingleInput) {
  // The limit lies 0.05 au from the planet: 95 per cent inside is 1.645 half-widths.
  const double limit = 1 / std::sqrt(1.107);
  const std::optional<double> factor = settling_factor(input_of(exactly(1), value(limit + 0.05, 0.06, 0.06)),
                                                       VarianceShare{Quantity::semi_major_axis, {}, 0}, settings_of());
  ASSERT_TRUE(factor);
  EXPECT_NEAR(*factor, 0.05 / 1.6449 / 0.06, 0.011);  // found to 0.01
}

TEST(SettlingFactor, IsEmptyWhenTheVerdictIsFirmAlready) {
  EXPECT_FALSE(settling_factor(input_of(value(1, 0.01, 0.01), value(1.2, 0.01, 0.01)),
                               VarianceShare{Quantity::luminosity, {}, 0}, settings_of()));
  EXPECT_FALSE(settling_factor(input_of(value(1, 0.01, 0.01), value(0.3, 0.01, 0.01)),
                               VarianceShare{Quantity::luminosity, {}, 0}, settings_of()));
}

TEST(SettlingFactor, IsEmptyWhenThisInputAloneCannotSettleIt) {
  const PlacementInput input = input_of(value(1, 0.01, 0.01), value(0.96, 0.1, 0.1));
  ASSERT_FALSE(is_firm(input));
  EXPECT_FALSE(settling_factor(input, VarianceShare{Quantity::luminosity, {}, 0}, settings_of()));
}

}  // namespace
}  // namespace hz
