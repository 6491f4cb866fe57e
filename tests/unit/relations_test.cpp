#include "hz/relations.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <map>
#include <stdexcept>

namespace hz {
namespace {

constexpr double ln10 = 2.302585092994046;

Measured radius(double value, std::optional<double> minus = {}, std::optional<double> plus = {}) {
  return {value, minus, plus, LimitMark::none, false};
}
double mass_of(double planet_radius) { return std::pow(10, log_mass_from_radius(radius(planet_radius)).value); }

/// A mass read off a radius printed to `digit`, on a piece of this exponent: relative error digit / 2 / R / exponent.
double tolerance(double mass, double planet_radius, double digit, double exponent) {
  return mass * digit / 2 / planet_radius / exponent * 1.01;
}

// Source: Chen & Kipping 2017, ApJ 834, 17: the relation evaluated at 1 and 10 Earth masses in other code, 1.008 and
// 3.137 Earth radii; at its breaks (2.04 and 131.58 Earth masses) 1.230 and 14.31.
TEST(MassFromRadius, InvertsThePublishedRelation) {
  EXPECT_NEAR(mass_of(1.008), 1, 1e-12);  // the prefactor itself
  EXPECT_NEAR(mass_of(3.137), 10, tolerance(10, 3.137, 0.001, 0.589));
  EXPECT_NEAR(mass_of(1.230), 2.04, tolerance(2.04, 1.230, 0.001, 0.279));
  EXPECT_NEAR(mass_of(14.30), 131.58, tolerance(131.58, 14.31, 0.03, 0.589));
}

TEST(MassFromRadius, IsContinuousAndRisesOverTheFirstBreak) {
  const double at_break = 1.008 * std::pow(2.04, 0.2790);
  EXPECT_NEAR(mass_of(at_break * (1 - 1e-6)), mass_of(at_break * (1 + 1e-6)), 1e-4);  // prefactor has five digits
  double last = 0;
  for (double r = 0.3; r < 14.3; r += 0.01) {
    EXPECT_GT(mass_of(r), last) << r;
    last = mass_of(r);
  }
}

TEST(MassFromRadius, LargerPlanetsGetTheLeastMassTheirSizeSays) {
  for (const double r : {14.32, 16.0, 25.0}) EXPECT_NEAR(mass_of(r), 131.58, 1e-9) << r;
}

TEST(MassFromRadius, WidthIsTheScatterOverTheSlope) {
  // One piece: d log M = w / (exponent ln 10), w = 4.03 per cent of the radius, or 14.6 per cent.
  const Measured small = log_mass_from_radius(radius(0.9));
  EXPECT_NEAR(*small.minus, 0.0403 / 0.279 / ln10, 1e-12);
  EXPECT_NEAR(*small.plus, 0.0403 / 0.279 / ln10, 1e-12);
  const Measured neptune = log_mass_from_radius(radius(4));
  EXPECT_NEAR(*neptune.minus, 0.146 / 0.589 / ln10, 1e-12);
  EXPECT_NEAR(*neptune.plus, 0.146 / 0.589 / ln10, 1e-12);
}

TEST(MassFromRadius, TheRadiusOwnErrorAddsInQuadratureOnItsSide) {
  const Measured mass = log_mass_from_radius(radius(4, 0.4, 0.8));
  EXPECT_NEAR(*mass.minus, std::hypot(0.146, 0.1) / 0.589 / ln10, 1e-12);
  EXPECT_NEAR(*mass.plus, std::hypot(0.146, 0.2) / 0.589 / ln10, 1e-12);
}

TEST(MassFromRadius, WidthFollowsTheRelationOverABreak) {
  // 1.22 Earth radii lie below the break at 1.230; 4.03 per cent more lie above it, where the relation is steeper.
  const Measured mass = log_mass_from_radius(radius(1.22));
  const double centre = std::log10(1.22 / 1.008) / 0.279;
  EXPECT_NEAR(mass.value, centre, 1e-12);
  EXPECT_NEAR(*mass.plus, std::log10(1.22 * std::exp(0.0403) / 0.80812) / 0.589 - centre, 1e-12);
  EXPECT_LT(*mass.plus, *mass.minus);
}

TEST(MassFromRadius, WidthsStayPositiveWhereTheRelationIsFlat) {
  for (const double r : {14.2, 14.32, 15.0, 20.0}) {
    const Measured mass = log_mass_from_radius(radius(r));
    EXPECT_GT(*mass.minus, 0) << r;
    EXPECT_GT(*mass.plus, 0) << r;
    EXPECT_LT(*mass.plus, 0.2) << r;
  }
}

TEST(MassFromRadius, NeedsARadius) { EXPECT_THROW((void)log_mass_from_radius(radius(0)), std::logic_error); }

Measured mass(double value, std::optional<double> minus = {}, std::optional<double> plus = {}) {
  return {value, minus, plus, LimitMark::none, false};
}
double radius_of(double planet_mass) { return std::pow(10, log_radius_from_mass(mass(planet_mass)).value); }

TEST(RadiusFromMass, UndoesTheMassFromTheRadius) {
  // Prefactors have five digits, so at a break the pieces meet to 1e-5.
  for (const double m : {0.05, 0.5, 1.0, 2.0, 2.04, 5.0, 17.0, 100.0, 131.0}) {
    EXPECT_NEAR(std::pow(10, log_mass_from_radius(radius(radius_of(m))).value), m, 1e-4 * m) << m;
  }
}

TEST(RadiusFromMass, IsContinuousAndPeaksWithTheGiants) {
  for (const double at_break : {2.04, 131.58, 26636.0}) {
    EXPECT_NEAR(radius_of(at_break * (1 - 1e-9)), radius_of(at_break), 2e-5 * radius_of(at_break)) << at_break;
  }
  EXPECT_GT(radius_of(131.58), radius_of(120));
  EXPECT_GT(radius_of(131.58), radius_of(1000));
  EXPECT_GT(radius_of(40000), radius_of(26636));
}

// Widths in dex: the scatter (4.03, 14.6, 7.37, 4.43 per cent of the radius) over ln 10.
TEST(RadiusFromMass, WidthIsTheScatterOfThePiece) {
  for (const auto& [m, scatter] : std::map<double, double>{{1, 0.0403}, {10, 0.146}, {318, 0.0737}, {3e4, 0.0443}}) {
    EXPECT_NEAR(*log_radius_from_mass(mass(m)).minus, scatter / ln10, 1e-12) << m;
    EXPECT_NEAR(*log_radius_from_mass(mass(m)).plus, scatter / ln10, 1e-12) << m;
  }
}

TEST(RadiusFromMass, TheMassOwnErrorIsCarriedThroughTheSlope) {
  const Measured small = log_radius_from_mass(mass(10, 1, 2));
  EXPECT_NEAR(*small.minus, std::hypot(0.146, 0.1 * 0.589) / ln10, 1e-12);
  EXPECT_NEAR(*small.plus, std::hypot(0.146, 0.2 * 0.589) / ln10, 1e-12);
  // A heavier giant planet is the smaller one: its upper half-width in mass lowers the radius.
  const Measured giant = log_radius_from_mass(mass(500, 0, 50));
  EXPECT_NEAR(*giant.minus, std::hypot(0.0737, 0.1 * 0.044) / ln10, 1e-12);
  EXPECT_NEAR(*giant.plus, 0.0737 / ln10, 1e-12);
}

TEST(RadiusFromMass, NeedsAMass) { EXPECT_THROW((void)log_radius_from_mass(mass(0)), std::logic_error); }

// Source: Pecaut & Mamajek 2013, ApJS 208, 9, table 5, version 2024.05.15: rows G0V, M5V, M8V, O3V and L0V.
TEST(MainSequenceRadius, IsTheTablesAtItsRows) {
  EXPECT_DOUBLE_EQ(*main_sequence_radius(5930), 1.100);
  EXPECT_DOUBLE_EQ(*main_sequence_radius(3060), 0.196);
  EXPECT_DOUBLE_EQ(*main_sequence_radius(2570), 0.114);
  EXPECT_DOUBLE_EQ(*main_sequence_radius(45900), 13.43);
  EXPECT_DOUBLE_EQ(*main_sequence_radius(2270), 0.102);
}

TEST(MainSequenceRadius, IsLinearBetweenRows) {
  EXPECT_NEAR(*main_sequence_radius(5895), 1.080, 1e-12);           // half-way between G0V and G1V (5860 K, 1.060)
  EXPECT_NEAR(*main_sequence_radius(2300), 0.102 - 0.0005, 1e-12);  // half-way between L0V and M9.5V (2330 K, 0.101)
}

TEST(MainSequenceRadius, IsEmptyOutsideTheTable) {
  EXPECT_FALSE(main_sequence_radius(2269.9));
  EXPECT_FALSE(main_sequence_radius(45900.1));
}

}  // namespace
}  // namespace hz
