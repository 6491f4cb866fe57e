#include "hz/orbit.hpp"

#include <gtest/gtest.h>

#include <cmath>

#include "hz/constants.hpp"

namespace hz {
namespace {

TEST(Orbit, PeriodAndSemiMajorAxisAreInverse) {
  for (const double period : {0.5, 19.3, 365.25, 1e5}) {
    for (const double mass : {0.08, 1.0, 2.5}) {
      EXPECT_NEAR(period_of(semi_major_axis_of(period, mass), mass) / period, 1, 1e-14) << period << " " << mass;
    }
  }
}

TEST(Orbit, UnitsMeetAtOneAuAndOneSun) {
  EXPECT_DOUBLE_EQ(semi_major_axis_of(constants::period_1au_d, 1), 1);
  // a^3 goes as M P^2: eight times the period is four times the axis, and so is 64 times the mass.
  EXPECT_DOUBLE_EQ(semi_major_axis_of(8 * constants::period_1au_d, 1), 4);
  EXPECT_DOUBLE_EQ(semi_major_axis_of(constants::period_1au_d, 64), 4);
}

TEST(MeanFlux, CircularOrbitIsTheLimit) {
  EXPECT_EQ(mean_flux_factor(0), 1);
  EXPECT_NEAR(mean_flux_factor(1e-4), 1 + 0.5e-8, 1e-15);
  EXPECT_DOUBLE_EQ(mean_flux_factor(0.6), 1.25);  // sqrt(1 - 0.36) = 0.8
}

TEST(TimeShare, NothingWithinPeriastronAndAllWithinApastron) {
  for (const double e : {0.01, 0.3, 0.9, 0.999}) {
    EXPECT_EQ(time_share_within(1 - e, e), 0) << e;
    EXPECT_EQ(time_share_within(0.5 * (1 - e), e), 0) << e;
    EXPECT_EQ(time_share_within(1 + e, e), 1) << e;
    EXPECT_EQ(time_share_within(3, e), 1) << e;
  }
}

TEST(TimeShare, CircularOrbitIsAStep) {
  EXPECT_EQ(time_share_within(0.999999, 0), 0);
  EXPECT_EQ(time_share_within(1.000001, 0), 1);
}

TEST(TimeShare, LessThanHalfTheTimeIsSpentWithinOneSemiMajorAxis) {
  // r = a at E = pi / 2, where the mean anomaly is pi / 2 - e.
  for (const double e : {0.001, 0.3, 0.7, 0.95}) {
    EXPECT_NEAR(time_share_within(1, e), 0.5 - e / constants::pi, 1e-14) << e;
  }
}

/// Distance from the star, in semi-major axes, at a mean anomaly: Kepler's equation by bisection.
double distance_at(double mean_anomaly, double e) {
  double low = 0;
  double high = constants::pi;
  for (int i = 0; i < 60; ++i) {
    const double middle = (low + high) / 2;
    (middle - e * std::sin(middle) < mean_anomaly ? low : high) = middle;
  }
  return 1 - e * std::cos(low);
}

TEST(TimeShare, AgreesWithSteppingAlongTheOrbit) {
  constexpr int steps = 4000;
  for (const double e : {0.05, 0.4, 0.9}) {
    for (const double distance : {1 - 0.8 * e, 1 - 0.2 * e, 1.0, 1 + 0.5 * e, 1 + 0.95 * e}) {
      int within = 0;
      for (int i = 0; i < steps; ++i) within += distance_at(constants::pi * (i + 0.5) / steps, e) < distance ? 1 : 0;
      // Half an orbit by its other half's symmetry; the crossing falls between two steps.
      EXPECT_NEAR(time_share_within(distance, e), static_cast<double>(within) / steps, 1.0 / steps)
          << e << " " << distance;
    }
  }
}

}  // namespace
}  // namespace hz
