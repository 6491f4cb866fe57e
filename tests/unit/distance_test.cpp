#include "hz/distance.hpp"

#include <gtest/gtest.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>
#include <random>
#include <stdexcept>
#include <vector>

namespace hz {
namespace {

constexpr double low_tail = 0.15865525393145705;  // Phi(-1)
const double ln10 = std::log(10);

double phi(double z) { return std::erfc(-z / std::sqrt(2)) / 2; }

struct Case {
  double parallax;      // mas
  double half_width;    // mas
  double length_scale;  // pc
};

/// Logarithm of the published density in r, up to a constant. r in pc.
double log_density(const Case& x, double r) {
  const double misfit = (x.parallax - 1000 / r) / x.half_width;
  return 2 * std::log(r) - r / x.length_scale - misfit * misfit / 2;
}

/// The published cubic, whose roots are where the density of r is level: eq. 19 of Bailer-Jones 2015, PASP 127, 994, in
/// pc.
double cubic(const Case& x, double r) {
  const double precision = 1e6 / (x.half_width * x.half_width);
  return ((r / x.length_scale - 2) * r + x.parallax / 1000 * precision) * r - precision;
}

/// Where the density is least between two peaks: the middle one of three roots. Infinite where there is one alone.
double trough(const Case& x) {
  constexpr double step = 1.001;
  const auto falls_below = [&](double r) { return cubic(x, r) >= 0 && cubic(x, r * step) < 0; };
  double low = 1e-3;
  while (low < 1e9 && !falls_below(low)) low *= step;
  if (low >= 1e9) return HUGE_VAL;
  double high = low * step;
  for (int i = 0; i < 60; ++i) (cubic(x, (low + high) / 2) >= 0 ? low : high) = (low + high) / 2;
  return high;
}

/// The distribution function by trapezia on many distances, with nothing taken from the library.
struct Dense {
  std::vector<double> r;
  std::vector<double> below;

  Dense(const Case& x, double nearest, double farthest, std::size_t count = 200000) : r(count), below(count) {
    std::vector<double> density(count);
    for (std::size_t i = 0; i < count; ++i) {
      r[i] = nearest * std::pow(farthest / nearest, static_cast<double>(i) / static_cast<double>(count - 1));
      density[i] = log_density(x, r[i]);
    }
    const double top = *std::max_element(density.begin(), density.end());
    for (double& value : density) value = std::exp(value - top);
    for (std::size_t i = 1; i < count; ++i) {
      below[i] = below[i - 1] + (r[i] - r[i - 1]) * (density[i] + density[i - 1]) / 2;
    }
    for (double& value : below) value /= below.back();
  }
  [[nodiscard]] double log_quantile(double u) const {
    const auto after = static_cast<std::size_t>(std::lower_bound(below.begin(), below.end(), u) - below.begin());
    const double part = (u - below[after - 1]) / (below[after] - below[after - 1]);
    return std::log10(r[after - 1] + part * (r[after] - r[after - 1]));
  }
};

/// Wide enough for all but 1e-12 of the posterior: around where the prior's fall and the parallax's balance each other
/// (cube and square root), around the parallax and around the prior.
Dense dense(const Case& x, std::size_t count = 200000) {
  const double reach = 1e6 * x.length_scale / (x.half_width * x.half_width);  // pc^3
  const double cube = std::cbrt(reach);
  const double square = std::sqrt(std::max(-x.parallax, 0.0) / 1000 * reach);
  const double nearest = std::min({1000 / (std::max(x.parallax, 0.0) + 12 * x.half_width), 0.1 * cube,
                                   square > 0 ? 0.1 * square : HUGE_VAL, 60 * x.length_scale});
  return {x, nearest, std::min(trough(x), 60 * x.length_scale + 4 * cube + 4 * square), count};
}

double worst_difference(const Measured& found, const Dense& expected) {
  return std::max({std::abs(found.value - expected.log_quantile(0.5)),
                   std::abs(found.value - *found.minus - expected.log_quantile(low_tail)),
                   std::abs(found.value + *found.plus - expected.log_quantile(1 - low_tail))});
}

TEST(DistancePosterior, AgreesWithADenseIntegration) {
  for (const double signal : {-8.0, -3.0, -1.0, 0.0, 0.7, 2.0, 3.0, 4.5, 5.0, 6.5, 9.0, 15.0}) {
    for (const double half_width : {1e-3, 0.03, 0.5, 10.0, 100.0}) {
      for (const double length_scale : {10.0, 135.0, 1350.0}) {
        const Case x{signal * half_width, half_width, length_scale};
        EXPECT_LT(worst_difference(log_distance_posterior(x.parallax, x.half_width, x.length_scale), dense(x)), 1e-6)
            << signal << " " << half_width << " " << length_scale;
      }
    }
  }
}

TEST(DistancePosterior, DenseReferencePeaksAtThePublishedMode) {
  // One real root each.
  for (const Case& x : {Case{1, 0.3, 1350}, Case{0.5, 1, 1350}, Case{-1, 0.5, 400}, Case{0, 2, 1350}}) {
    double mode = 1;
    double high = 1e5;
    while (high - mode > 1e-6) (cubic(x, (mode + high) / 2) < 0 ? mode : high) = (mode + high) / 2;
    for (const double beside : {0.99, 0.999, 1.001, 1.01}) {
      EXPECT_LT(log_density(x, mode * beside), log_density(x, mode)) << x.parallax;
    }
  }
}

TEST(DistancePosterior, PreciseParallaxIsInverted) {
  for (const double parallax : {0.5, 40.0, 768.07}) {
    for (const double relative : {1e-2, 1e-4, 1e-6, 1e-9}) {
      const Measured found = log_distance_posterior(parallax, relative * parallax, 1350);
      // In 1/r the prior is r^4 exp(-r / L): it moves the median by (4 - r / L) relative^2, and by terms of the fourth
      // order.
      const double square = relative * relative;
      const double shift = (4 - 1000 / parallax / 1350) * square;
      EXPECT_NEAR(found.value, std::log10(1000 / parallax) + shift / ln10, 100 * square * square + 1e-13) << relative;
      EXPECT_NEAR(*found.minus * ln10 / relative, 1, 4 * relative + 1e-5) << relative;
      EXPECT_NEAR(*found.plus * ln10 / relative, 1, 4 * relative + 1e-5) << relative;
    }
  }
}

TEST(DistancePosterior, UselessParallaxLeavesThePrior) {
  // The prior is a gamma distribution of shape 3: P(r < x L) = 1 - exp(-x) (1 + x + x^2 / 2).
  const auto below = [](double x) { return 1 - std::exp(-x) * (1 + x + x * x / 2); };
  for (const double parallax : {-100.0, 0.0, 100.0}) {
    const Measured found = log_distance_posterior(parallax, 1e7, 1350);
    EXPECT_NEAR(below(std::pow(10, found.value) / 1350), 0.5, 1e-6);
    EXPECT_NEAR(below(std::pow(10, found.value - *found.minus) / 1350), low_tail, 1e-6);
    EXPECT_NEAR(below(std::pow(10, found.value + *found.plus) / 1350), 1 - low_tail, 1e-6);
    EXPECT_NEAR(found.value, std::log10(2.674060313754 * 1350), 1e-6);  // median of that gamma distribution
  }
}

TEST(DistancePosterior, AgreesWithDrawsFromThePriorWeightedByTheLikelihood) {
  std::mt19937_64 engine(20150708);
  for (const Case& x : {Case{1, 0.5, 1350}, Case{-0.5, 0.4, 1350}, Case{20, 8, 30}, Case{0.2, 0.1, 1350}}) {
    const Measured found = log_distance_posterior(x.parallax, x.half_width, x.length_scale);
    std::gamma_distribution<double> prior(3, x.length_scale);
    double total = 0;
    double squares = 0;
    std::array<double, 3> below{};
    const std::array<double, 3> points{found.value - *found.minus, found.value, found.value + *found.plus};
    for (int draw = 0; draw < 400000; ++draw) {
      const double r = prior(engine);
      const double misfit = (x.parallax - 1000 / r) / x.half_width;
      const double weight = std::exp(-misfit * misfit / 2);
      total += weight;
      squares += weight * weight;
      for (std::size_t i = 0; i < points.size(); ++i) below[i] += std::log10(r) < points[i] ? weight : 0;
    }
    const double effective = total * total / squares;
    const std::array<double, 3> expected{low_tail, 0.5, 1 - low_tail};
    for (std::size_t i = 0; i < points.size(); ++i) {
      const double sigma = std::sqrt(expected[i] * (1 - expected[i]) / effective);
      EXPECT_NEAR(below[i] / total, expected[i], 4 * sigma) << x.parallax << " " << i;
    }
  }
}

/// Greatest difference between the posterior's distribution function and that of the two-piece normal in dex.
double two_piece_miss(const Case& x) {
  const Measured found = log_distance_posterior(x.parallax, x.half_width, x.length_scale);
  const Dense expected = dense(x, 8000);
  double worst = 0;
  for (std::size_t i = 0; i < expected.r.size(); ++i) {
    const double off = std::log10(expected.r[i]) - found.value;
    worst = std::max(worst, std::abs(phi(off / (off < 0 ? *found.minus : *found.plus)) - expected.below[i]));
  }
  return worst;
}

/// The worst for parallaxes of -3 to 10 half-widths, for half-width times length scale between the two, in mas pc.
double worst_miss(double from, double to) {
  double worst = 0;
  for (double signal = -3; signal < 10.01; signal += 0.2) {
    for (double product = to; product >= from; product /= std::pow(10, 0.1)) {
      worst = std::max(worst, two_piece_miss({signal * product / 1350, product / 1350, 1350}));
    }
  }
  return worst;
}

// The figures of the header, from both sides.
TEST(DistancePosterior, TwoPieceNormalMissesItByNoMoreThanTheHeaderSays) {
  const std::array<double, 4> worst{worst_miss(10, 100), worst_miss(100, 300), worst_miss(300, 1000),
                                    worst_miss(1000, 1.35e5)};
  const std::array<double, 4> stated{0.012, 0.02, 0.044, 0.13};
  for (std::size_t i = 0; i < worst.size(); ++i) {
    EXPECT_LE(worst[i], stated[i]) << i;
    EXPECT_GT(worst[i], 0.85 * stated[i]) << i;
  }
}

TEST(DistancePosterior, OfTwoPeaksTheNearerCounts) {
  // 21.3 +- 5.5 mas (I00304+0420 of the list of bright M dwarfs of 2011) by a prior of 1350 pc: half of all the mass
  // lies beyond 3 kpc, where no M dwarf of 12 mag is.
  const Case x{21.3, 5.5, 1350};
  const Measured found = log_distance_posterior(x.parallax, x.half_width, x.length_scale);
  EXPECT_LT(found.value + *found.plus, std::log10(trough(x)));
  EXPECT_LT(worst_difference(found, dense(x)), 1e-6);
  const Dense whole(x, 20, 1e5);
  EXPECT_GT(whole.log_quantile(0.5), std::log10(3000));
}

TEST(DistancePosterior, TheNearerPeakFollowsTheParallax) {
  // Whatever the prior's scale, once it is far longer than the distance.
  for (const double signal : {4.0, 5.0, 7.0, 9.0}) {
    const double near = log_distance_posterior(50, 50 / signal, 1000).value;
    EXPECT_NEAR(log_distance_posterior(50, 50 / signal, 30000).value, near, 0.02) << signal;
    EXPECT_GT(near, std::log10(20)) << signal;
    EXPECT_LT(near, std::log10(45)) << signal;
  }
}

TEST(DistancePosterior, GrowsAsTheParallaxShrinks) {
  double last = -std::numeric_limits<double>::infinity();
  for (double parallax = 20; parallax > -20; parallax -= 0.25) {
    const double found = log_distance_posterior(parallax, 2, 400).value;
    EXPECT_GT(found, last) << parallax;
    last = found;
  }
}

TEST(DistancePosterior, UnitsOfTheLengthScaleCancel) {
  // Ten times the length scale and a tenth of the parallax are ten times the distance.
  const Measured near = log_distance_posterior(3, 1, 135);
  const Measured far = log_distance_posterior(0.3, 0.1, 1350);
  EXPECT_NEAR(far.value - near.value, 1, 1e-12);
  EXPECT_NEAR(*far.minus, *near.minus, 1e-12);
  EXPECT_NEAR(*far.plus, *near.plus, 1e-12);
}

TEST(DistancePosterior, ExtremesGiveFiniteAnswers) {
  for (const double parallax : {-1e300, -1e6, -1e-9, 0.0, 1e-9, 1e6, 1e300}) {
    for (const double half_width : {1e-300, 1e-9, 1e-3, 1e9, 1e300}) {
      for (const double length_scale : {1e-300, 1e-3, 1.0, 1e9, 1e300}) {
        const Measured found = log_distance_posterior(parallax, half_width, length_scale);
        EXPECT_TRUE(std::isfinite(found.value)) << parallax << " " << half_width << " " << length_scale;
        EXPECT_TRUE(*found.minus >= 0 && *found.plus >= 0) << parallax << " " << half_width << " " << length_scale;
      }
    }
  }
}

TEST(DistancePosterior, BrokenPreconditionsThrow) {
  EXPECT_THROW((void)log_distance_posterior(1, 0, 1350), std::logic_error);
  EXPECT_THROW((void)log_distance_posterior(1, 1, 0), std::logic_error);
  EXPECT_THROW((void)log_distance_posterior(std::nan(""), 1, 1350), std::logic_error);
}

}  // namespace
}  // namespace hz
