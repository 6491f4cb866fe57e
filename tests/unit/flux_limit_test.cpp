#include "hz/flux_limit.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>
#include <stdexcept>

namespace {

using hz::BeyondRange;
using hz::FluxLimit;
using hz::Range;

constexpr double nan = std::numeric_limits<double>::quiet_NaN();
constexpr double infinity = std::numeric_limits<double>::infinity();

/// Rises by 1e-4 a kelvin; half as much again at 10 as at 1 Earth mass.
FluxLimit sloping() {
  hz::QuarticForm form;
  form.teff_reference = 5000;
  form.rows = {{1, {1.0, 1e-4, 0, 0, 0}}, {10, {1.5, 1e-4, 0, 0, 0}}};
  return {"sloping", "sloping", Range{4000, 6000}, form};
}

double value(const FluxLimit& limit, double teff, double planet_mass) {
  return limit.insolation(teff, planet_mass, BeyondRange::hold).value().value;
}

TEST(FluxLimit, QuarticIsThePolynomialAsPrinted) {
  hz::QuarticForm form;
  form.teff_reference = 5780;
  form.rows = {{1, {1, 2e-3, 3e-6, 4e-9, 5e-12}}};
  const FluxLimit limit("x", "x", Range{2600, 7200}, form);
  EXPECT_DOUBLE_EQ(value(limit, 5780, 1), 1.0);
  EXPECT_DOUBLE_EQ(value(limit, 6780, 1), 1 + 2 + 3 + 4 + 5);  // t = 1000
  EXPECT_DOUBLE_EQ(value(limit, 4780, 1), 1 - 2 + 3 - 4 + 5);
}

TEST(FluxLimit, DistanceQuadraticGivesTheSquareOfTheInverseDistance) {
  const FluxLimit limit("x", "x", Range{3700, 7200}, hz::DistanceQuadraticForm{1.0, 1e-4, 2e-7, 5700});
  EXPECT_DOUBLE_EQ(value(limit, 5700, 1), 1.0);
  EXPECT_DOUBLE_EQ(value(limit, 6700, 1), 1 / (0.7 * 0.7));  // 1 - 0.1 - 0.2
  EXPECT_DOUBLE_EQ(value(limit, 4700, 1), 1 / (0.9 * 0.9));  // 1 + 0.1 - 0.2
}

TEST(FluxLimit, DistanceFitBelowZeroGivesNegativeInsolation) {
  const FluxLimit limit("x", "x", Range{3700, 7200}, hz::DistanceQuadraticForm{-2.0, 0, 0, 5700});
  EXPECT_DOUBLE_EQ(limit.clamped_insolation(5700, 1), -0.25);
}

TEST(FluxLimit, FluxQuadraticIsInTeffItself) {
  const FluxLimit limit("x", "x", Range{3000, 7000}, hz::FluxQuadraticForm{1e-8, -2e-4, 1.5});
  EXPECT_NEAR(value(limit, 4000, 1), 0.16 - 0.8 + 1.5, 1e-15);
}

TEST(FluxLimit, PointsAreConstant) {
  const FluxLimit flux("x", "x", Range{5780, 5780}, hz::FluxPointForm{1.1});
  const FluxLimit distance("x", "x", Range{5780, 5780}, hz::DistancePointForm{2.0});
  EXPECT_DOUBLE_EQ(value(flux, 5780, 1), 1.1);
  EXPECT_DOUBLE_EQ(value(distance, 5780, 1), 0.25);
}

TEST(FluxLimit, EquilibriumTemperatureComesBack) {
  const FluxLimit limit("x", "x", std::nullopt, hz::EquilibriumForm{300, 0.25});
  const double s = value(limit, 100, 1);  // no range: any Teff
  EXPECT_NEAR(278.3297440615529 * std::pow(0.75 * s, 0.25), 300, 1e-10);
  EXPECT_EQ(value(limit, 50000, 1), s);
}

TEST(FluxLimit, PlanetMassIsExactAtTheRows) {
  EXPECT_EQ(value(sloping(), 5000, 1), 1.0);
  EXPECT_EQ(value(sloping(), 5000, 10), 1.5);
}

TEST(FluxLimit, PlanetMassIsLinearInItsLogarithmBetweenTheRows) {
  EXPECT_NEAR(value(sloping(), 5500, std::sqrt(10.0)), 1.25 + 0.05, 1e-15);
}

TEST(FluxLimit, PlanetMassIsHeldOutsideTheRows) {
  EXPECT_EQ(value(sloping(), 5000, 1e-6), 1.0);
  EXPECT_EQ(value(sloping(), 5000, 1e6), 1.5);
}

TEST(FluxLimit, InsolationIsContinuousAcrossARow) {
  const double below = value(sloping(), 5000, std::nextafter(1.0, 2.0));
  EXPECT_NEAR(below, 1.0, 1e-14);
  EXPECT_NEAR(value(sloping(), 5000, std::nextafter(10.0, 0.0)), 1.5, 1e-14);
}

TEST(FluxLimit, PlanetMassRangeIsThatOfTheRows) {
  ASSERT_TRUE(sloping().planet_mass_range());
  EXPECT_EQ(sloping().planet_mass_range()->low, 1);
  EXPECT_EQ(sloping().planet_mass_range()->high, 10);
  const FluxLimit point("x", "x", Range{5780, 5780}, hz::FluxPointForm{1.1});
  EXPECT_FALSE(point.depends_on_planet_mass());
  EXPECT_FALSE(point.planet_mass_range());
}

TEST(FluxLimit, BothEndsOfTheRangeAreIn) {
  for (const BeyondRange beyond : {BeyondRange::hold, BeyondRange::refuse}) {
    EXPECT_DOUBLE_EQ(sloping().insolation(4000, 1, beyond).value().value, 0.9);
    EXPECT_FALSE(sloping().insolation(4000, 1, beyond).value().held);
    EXPECT_DOUBLE_EQ(sloping().insolation(6000, 1, beyond).value().value, 1.1);
    EXPECT_FALSE(sloping().insolation(6000, 1, beyond).value().held);
  }
}

TEST(FluxLimit, HoldReachesExactly300KOutside) {
  for (const double teff : {3700.0, 3999.0}) {
    const auto cold = sloping().insolation(teff, 1, BeyondRange::hold);
    ASSERT_TRUE(cold.has_value()) << teff;
    EXPECT_TRUE(cold.value().held);
    EXPECT_DOUBLE_EQ(cold.value().value, 0.9);
  }
  EXPECT_DOUBLE_EQ(sloping().insolation(6300, 1, BeyondRange::hold).value().value, 1.1);
  EXPECT_FALSE(sloping().insolation(std::nextafter(3700.0, 0.0), 1, BeyondRange::hold).has_value());
  EXPECT_FALSE(sloping().insolation(std::nextafter(6300.0, 7000.0), 1, BeyondRange::hold).has_value());
}

TEST(FluxLimit, HoldReachesAroundASinglePoint) {
  const FluxLimit point("x", "x", Range{5780, 5780}, hz::FluxPointForm{1.1});
  EXPECT_FALSE(point.insolation(5780, 1, BeyondRange::hold).value().held);
  EXPECT_TRUE(point.insolation(5480, 1, BeyondRange::hold).value().held);
  EXPECT_TRUE(point.insolation(6080, 1, BeyondRange::hold).value().held);
  EXPECT_FALSE(point.insolation(6081, 1, BeyondRange::hold).has_value());
}

TEST(FluxLimit, RefuseAnswersNothingOutside) {
  EXPECT_FALSE(sloping().insolation(std::nextafter(4000.0, 0.0), 1, BeyondRange::refuse).has_value());
  const auto refused = sloping().insolation(6001, 1, BeyondRange::refuse);
  ASSERT_FALSE(refused.has_value());
  EXPECT_EQ(refused.error().code, hz::ProblemCode::out_of_range);
  EXPECT_EQ(refused.error().column, "teff");
  EXPECT_EQ(refused.error().what, "Teff 6001 K lies outside the fitted range 4000-6000 K");
  EXPECT_EQ(sloping().insolation(3000, 1, BeyondRange::hold).error().what,
            "Teff 3000 K lies more than 300 K outside the fitted range 4000-6000 K");
}

TEST(FluxLimit, OddArgumentsAreProblemsAndNeverNaN) {
  for (const double teff : {nan, infinity, -infinity}) {
    EXPECT_FALSE(sloping().insolation(teff, 1, BeyondRange::hold).has_value());
  }
  for (const double planet_mass : {nan, infinity, 0.0, -1.0}) {
    const auto answer = sloping().insolation(5000, planet_mass, BeyondRange::hold);
    ASSERT_FALSE(answer.has_value());
    EXPECT_EQ(answer.error().column, "planet_mass");
  }
}

TEST(FluxLimit, ClampedInsolationIsThatOfTheNearerEnd) {
  EXPECT_DOUBLE_EQ(sloping().clamped_insolation(1000, 1), 0.9);
  EXPECT_DOUBLE_EQ(sloping().clamped_insolation(9000, 1), 1.1);
}

TEST(FluxLimit, CurveAtAPlanetMassIsTheLimitItself) {
  for (const double planet_mass : {0.5, 1.0, 2.0, 7.0, 10.0, 20.0}) {
    const hz::LimitCurve curve = sloping().at_planet_mass(planet_mass);
    for (const double teff : {3000.0, 4321.0, 6000.0}) {
      EXPECT_EQ(curve(teff), sloping().clamped_insolation(teff, planet_mass));
    }
  }
}

TEST(FluxLimit, RequiresSensibleParts) {
  const hz::QuarticForm no_rows;
  hz::QuarticForm falling;
  falling.rows = {{5, {1, 0, 0, 0, 0}}, {1, {1, 0, 0, 0, 0}}};
  const auto make = [](Range range, const hz::LimitForm& form) { return FluxLimit("x", "x", range, form); };
  EXPECT_THROW(make({1, 2}, no_rows), std::logic_error);
  EXPECT_THROW(make({1, 2}, falling), std::logic_error);
  EXPECT_THROW(make({2, 1}, hz::FluxPointForm{1}), std::logic_error);
}

}  // namespace
