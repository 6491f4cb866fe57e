#include "hz/distribution.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>
#include <stdexcept>
#include <vector>

namespace hz {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();
constexpr Domain everywhere{-infinity, infinity};
constexpr Domain positive{0, infinity};
constexpr Domain eccentricities{0, 1};
constexpr double low_tail = 0.15865525393145705;  // Phi(-1): a normal's share below its lower 68 per cent point
constexpr Asymmetry median = Asymmetry::median;
constexpr Asymmetry mode = Asymmetry::mode;

double phi(double z) { return std::erfc(-z / std::sqrt(2)) / 2; }

/// What tests of every shape run over.
std::vector<Distribution> shapes() {
  return {Distribution::two_piece(10, 1, 1, median, positive),
          Distribution::two_piece(10, 1, 3, median, positive),
          Distribution::two_piece(10, 1, 3, mode, positive),
          Distribution::two_piece(10, 0, 3, median, positive),
          Distribution::two_piece(10, 3, 0, mode, positive),
          Distribution::two_piece(0.1, 0.3, 0.2, median, positive),
          Distribution::two_piece(0.1, 0.3, 0.2, mode, positive),
          Distribution::two_piece(0.9, 0.15, 0.4, median, eccentricities),
          Distribution::two_piece(0, 0.1, 0.1, median, eccentricities),
          Distribution::two_piece(-1, 0.2, 0.1, median, everywhere),
          Distribution::below(0.3, eccentricities),
          Distribution::below(0.9, eccentricities)};
}

TEST(Distribution, ValueIsTheMedianByDefault) {
  EXPECT_NEAR(Distribution::two_piece(10, 1, 3, median, positive).below(10), 0.5, 1e-12);
  EXPECT_NEAR(Distribution::two_piece(10, 0.2, 3, median, everywhere).below(10), 0.5, 1e-12);
}

TEST(Distribution, ValueIsTheModeWhenAskedFor) {
  // Each side's weight is proportional to its half-width, so that the density has no step at the value.
  const Distribution x = Distribution::two_piece(10, 1, 3, mode, everywhere);
  EXPECT_NEAR(x.below(10), 0.25, 1e-12);
  const double step = 1e-5;
  EXPECT_NEAR((x.below(10) - x.below(10 - step)) / (x.below(10 + step) - x.below(10)), 1, 1e-6);
}

TEST(Distribution, HalfWidthsOfAMedianReachThe16And84PerCentPoints) {
  const Distribution x = Distribution::two_piece(10, 1, 3, median, everywhere);
  EXPECT_NEAR(x.below(9), low_tail, 1e-12);
  EXPECT_NEAR(x.above(13), low_tail, 1e-12);
  EXPECT_EQ(x.minus(), 1);
  EXPECT_EQ(x.plus(), 3);
}

TEST(Distribution, HalfWidthsAreThoseOfTheDistributionAsItIs) {
  for (const Distribution& x : shapes()) {
    EXPECT_GT(x.minus() + x.plus(), 0);
    if (x.minus() > 0) {
      EXPECT_NEAR(x.below(x.central() - x.minus()), low_tail, 1e-9) << x.central();
    }
    if (x.plus() > 0) {
      EXPECT_NEAR(x.above(x.central() + x.plus()), low_tail, 1e-9) << x.central();
    }
  }
}

TEST(Distribution, ZeroBesideAPositiveHalfWidthPutsAllWeightThere) {
  for (const Asymmetry asymmetry : {median, mode}) {
    const Distribution up = Distribution::two_piece(10, 0, 2, asymmetry, positive);
    EXPECT_EQ(up.below(10), 0);
    EXPECT_NEAR(up.below(12), std::erf(std::sqrt(0.5)), 1e-12);
    EXPECT_EQ(up.minus(), 0);
    const Distribution down = Distribution::two_piece(10, 2, 0, asymmetry, positive);
    EXPECT_EQ(down.above(10), 0);
    EXPECT_NEAR(down.above(8), std::erf(std::sqrt(0.5)), 1e-6);  // 3e-7 of it lies below 0 and is cut
    EXPECT_EQ(down.plus(), 0);
  }
}

TEST(Distribution, IsCutToItsDomainAndRenormalised) {
  const Distribution x = Distribution::two_piece(0.1, 0.2, 0.2, median, positive);
  EXPECT_EQ(x.below(0), 0);
  EXPECT_EQ(x.above(0), 1);
  const double lost = phi(-0.5);
  for (const double at : {0.01, 0.05, 0.1, 0.2, 0.5}) {
    EXPECT_NEAR(x.below(at), (phi((at - 0.1) / 0.2) - lost) / (1 - lost), 1e-12) << at;
  }
}

TEST(Distribution, EccentricityNeverReachesOne) {
  const Distribution e = Distribution::two_piece(0.9, 0.15, 0.4, median, eccentricities);
  EXPECT_NEAR(e.below(1), 1, 1e-15);
  EXPECT_EQ(e.above(1), 0);
  EXPECT_EQ(e.below(0), 0);
  // The side with less room keeps the less weight: half of erf(0.25 / sqrt 2) against half of erf(6 / sqrt 2).
  const double above = std::erf(0.25 / std::sqrt(2));
  EXPECT_NEAR(e.above(0.9), above / (above + 1), 1e-8);
}

TEST(Distribution, ASideWithoutRoomLeavesOnlyTheOther) {
  const Distribution e = Distribution::two_piece(0, 0.1, 0.1, median, eccentricities);
  EXPECT_EQ(e.below(0), 0);
  EXPECT_NEAR(e.below(0.1), std::erf(std::sqrt(0.5)), 1e-12);
  EXPECT_TRUE(Distribution::two_piece(0, 0.1, 0, median, eccentricities).is_exact());
}

TEST(Distribution, UpperLimitHas95PerCentBelowIt) {
  const Distribution e = Distribution::below(0.3, eccentricities);
  EXPECT_NEAR(e.below(0.3), 0.95, 1e-9);
  EXPECT_EQ(e.central(), 0);
  EXPECT_EQ(e.below(0), 0);
  // Half-normal: half as far, 0.98 sigma, holds erf(0.98 / sqrt 2).
  EXPECT_NEAR(e.below(0.15), std::erf(1.959963984540054 / 2 / std::sqrt(2)), 1e-9);
}

TEST(Distribution, UpperLimitNearTheDomainsEndIsRenormalised) {
  const Distribution e = Distribution::below(0.9, eccentricities);
  const double within_one = std::erf(1.959963984540054 / 0.9 / std::sqrt(2));
  EXPECT_NEAR(e.below(0.9), 0.95 / within_one, 1e-12);
  EXPECT_NEAR(e.below(1), 1, 1e-15);
}

TEST(Distribution, BelowAndAboveShareAllThereIs) {
  for (const Distribution& x : shapes()) {
    double weight = 0;
    for (const Piece& piece : x.pieces()) weight += piece.weight;
    EXPECT_NEAR(weight, 1, 1e-15);
    for (double at = -2; at < 20; at += 0.0703) EXPECT_NEAR(x.below(at) + x.above(at), 1, 1e-14);
  }
}

TEST(Distribution, QuantileIsTheInverseOfBelow) {
  for (const Distribution& x : shapes()) {
    for (const double u : {1e-6, 0.01, low_tail, 0.3, 0.5, 0.7, 0.95, 0.999, 1 - 1e-6}) {
      EXPECT_NEAR(x.below(x.quantile(u)), u, 1e-9) << x.central() << " " << u;
    }
  }
}

TEST(Distribution, ScaledIsTheSameValueMeasuredBetter) {
  const Distribution x = Distribution::two_piece(0.1, 0.3, 0.2, mode, positive);
  const Distribution expected = Distribution::two_piece(0.1, 0.15, 0.1, mode, positive);
  const Distribution half = x.scaled(0.5);
  EXPECT_EQ(half.central(), 0.1);
  for (const double at : {0.01, 0.05, 0.1, 0.2, 0.5}) EXPECT_NEAR(half.below(at), expected.below(at), 1e-12) << at;
  EXPECT_NEAR(half.minus(), expected.minus(), 1e-9);
  EXPECT_NEAR(half.scaled(2).below(0.2), x.below(0.2), 1e-12);
}

TEST(Distribution, ScaledToNothingIsExact) {
  for (const Distribution& x : shapes()) {
    EXPECT_TRUE(x.scaled(0).is_exact());
    EXPECT_EQ(x.scaled(0).central(), x.central());
    EXPECT_EQ(x.scaled(1).minus(), x.minus());
    EXPECT_EQ(x.scaled(1).plus(), x.plus());
  }
}

TEST(Distribution, ExactValueIsAStep) {
  const Distribution x = Distribution::exact(3);
  EXPECT_EQ(x.below(3), 0);
  EXPECT_EQ(x.above(3), 1);
  EXPECT_EQ(x.below(3.0001), 1);
  EXPECT_EQ(x.quantile(0.2), 3);
  EXPECT_TRUE(x.pieces().empty());
  EXPECT_EQ(x.minus(), 0);
  EXPECT_EQ(x.plus(), 0);
  EXPECT_TRUE(x.scaled(2).is_exact());
}

TEST(Distribution, BrokenPreconditionsThrow) {
  EXPECT_THROW((void)Distribution::two_piece(1, -0.1, 0.1, median, positive), std::logic_error);
  EXPECT_THROW((void)Distribution::two_piece(1, 0, 0, median, positive), std::logic_error);
  EXPECT_THROW((void)Distribution::two_piece(-1, 0.1, 0.1, median, positive), std::logic_error);
  EXPECT_THROW((void)Distribution::below(0, eccentricities), std::logic_error);
  EXPECT_THROW((void)Distribution::exact(1).scaled(-1), std::logic_error);
  EXPECT_THROW((void)Distribution::below(0.3, eccentricities).quantile(1), std::logic_error);
}

// A half-width far below the value once left the search between two neighbouring numbers for ever.
TEST(Distribution, QuantileEndsForAHalfWidthNearTheValuesOwnPrecision) {
  const Distribution x = Distribution::two_piece(1e5, 1e-9, 3e-9, Asymmetry::mode, {0, HUGE_VAL});
  EXPECT_NEAR(x.quantile(0.5), 1e5, 1e-8);
}

}  // namespace
}  // namespace hz
