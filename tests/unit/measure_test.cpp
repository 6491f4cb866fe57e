#include "measure.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "hz/constants.hpp"

namespace hz {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();
constexpr Domain positive{0, infinity};

double mass(const Rule& rule) {
  double sum = 0;
  for (const Node& node : rule) sum += node.weight;
  return sum;
}
double mean(const Rule& rule) {
  double sum = 0;
  for (const Node& node : rule) sum += node.weight * node.x;
  return sum / mass(rule);
}
double variance(const Rule& rule) {
  double sum = 0;
  for (const Node& node : rule) sum += node.weight * std::pow(node.x - mean(rule), 2);
  return sum / mass(rule);
}

double itself(double x) { return x; }

/// Mean of a half-normal cut at `end` sigmas, in sigmas.
double half_normal_mean(double end) {
  const double moment = std::sqrt(2 / constants::pi) * (std::isinf(end) ? 1 : 1 - std::exp(-end * end / 2));
  return moment / half_normal_mass(end);
}
double mean_of(const Distribution& x) {
  double sum = 0;
  for (const Piece& piece : x.pieces()) sum += piece.weight * at(piece, half_normal_mean(piece.end));
  return sum;
}

const Distribution shapes[] = {Distribution::two_piece(10, 1, 3, Asymmetry::median, positive),
                               Distribution::two_piece(10, 1, 3, Asymmetry::mode, positive),
                               Distribution::two_piece(10, 0, 1, Asymmetry::median, positive),
                               Distribution::two_piece(0.1, 0.3, 0.2, Asymmetry::median, positive),
                               Distribution::below(0.9, {0, 1})};

TEST(PointsOf, KeepMassAndMean) {
  for (const Distribution& x : shapes) {
    for (const bool corners : {false, true}) {
      for (const double ratio : {0.01, 0.1, 0.5, 1.0}) {
        for (const Effort effort : {Effort::full, Effort::coarse}) {
          const Rule points = points_of(x, itself, {ratio, corners}, effort);
          EXPECT_NEAR(mass(points), 1, 1e-12);
          // A cut half has panels of Gauss-Legendre nodes: three of them give its mean to 0.0014 of a width, five to
          // 1e-5.
          const bool rough = effort == Effort::coarse || ratio < 0.12;
          const double width = x.minus() + x.plus();
          EXPECT_NEAR(mean(points), mean_of(x), (rough ? 0.002 : 1e-4) * width)
              << x.central() << " " << ratio << " " << corners;
        }
      }
    }
  }
}

TEST(PointsOf, UncutHalvesHaveTheirMeanToRounding) {
  const Distribution x = Distribution::two_piece(10, 0.5, 0.9, Asymmetry::median, positive);
  for (const double ratio : {0.01, 0.1, 0.5, 1.0}) {
    EXPECT_NEAR(mean(points_of(x, itself, {ratio, false}, Effort::full)), 10 + std::sqrt(2 / constants::pi) * 0.2, 1e-8)
        << ratio;
  }
}

TEST(PointsOf, AreTakenThroughTheFunction) {
  const Distribution x = Distribution::two_piece(10, 1, 1, Asymmetry::median, positive);
  const Rule points = points_of(
      x, [](double v) { return v * v; }, {1, false}, Effort::full);
  EXPECT_NEAR(mean(points), 101, 1e-6);  // E x^2 = mean^2 + sigma^2
}

TEST(PointsOf, ExactValueIsOnePoint) {
  const Rule points = points_of(Distribution::exact(4), itself, {1, true}, Effort::full);
  ASSERT_EQ(points.size(), 1U);
  EXPECT_EQ(points[0].x, 4);
  EXPECT_EQ(points[0].weight, 1);
}

TEST(PointsOf, FinerBinsForWiderMeasures) {
  EXPECT_LT(bins_for({0.01, true}, Effort::full), bins_for({1, true}, Effort::full));
  EXPECT_LE(bins_for({1e6, true}, Effort::full), 120U);
  EXPECT_LT(bins_for({1, true}, Effort::coarse), bins_for({1, true}, Effort::full));
}

TEST(SumOf, KeepsMassMeanAndVariance) {
  const Rule a = points_of(shapes[0], itself, {1, true}, Effort::full);
  const Rule b = points_of(shapes[3], itself, {1, true}, Effort::full);
  for (const std::size_t most : {20U, 100U, 1000U, 100000U}) {
    const Rule sum = sum_of(a, b, most);
    EXPECT_LE(sum.size(), most);
    EXPECT_NEAR(mass(sum), 1, 1e-12) << most;
    EXPECT_NEAR(mean(sum), mean(a) + mean(b), 1e-10) << most;
    // A bin's own variance is lost, less than its width squared / 4.
    const double bin = (10 + 5.2 * 4 + 5) / static_cast<double>(most);
    EXPECT_NEAR(variance(sum), variance(a) + variance(b), bin * bin / 4 + 1e-9) << most;
    EXPECT_LE(variance(sum), variance(a) + variance(b) + 1e-9) << most;
  }
}

TEST(SumOf, ShiftsByAKnownValue) {
  const Rule a = points_of(shapes[0], itself, {1, false}, Effort::full);
  const Rule sum = sum_of(a, {{2.5, 1}}, 1000);
  ASSERT_EQ(sum.size(), a.size());
  for (std::size_t i = 0; i < a.size(); ++i) EXPECT_EQ(sum[i].x, a[i].x + 2.5);
}

TEST(SumOf, ManyEqualPointsAreOne) {
  const Rule point(10, Node{1, 0.1});
  const Rule sum = sum_of(point, point, 4);
  EXPECT_NEAR(mass(sum), 1, 1e-12);
  EXPECT_EQ(mean(sum), 2);
}

TEST(Piece, ReachEndsWithTheDomain) {
  const Piece cut = shapes[3].pieces()[0];  // 0.1 - 0.3: the domain ends after a third of a sigma
  EXPECT_NEAR(reach(cut), 1.0 / 3, 1e-15);
  EXPECT_NEAR(at(cut, reach(cut)), 0, 1e-15);
  EXPECT_EQ(reach(shapes[0].pieces()[1]), integrated_sigmas);
}

}  // namespace
}  // namespace hz
