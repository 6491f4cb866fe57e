#include "log_scale.hpp"

#include <gmock/gmock.h>

#include <cmath>

namespace hz::plots {
namespace {

double ten_points(const Tick&) { return 10; }

std::vector<double> labelled_values(const std::vector<Tick>& ticks) {
  std::vector<double> values;
  for (const Tick& tick : ticks)
    if (tick.labelled) values.push_back(tick.digit * std::pow(10.0, tick.exponent));
  return values;
}

// From 0.01 at x = 100 to 10 at x = 400: 100 pt a power of ten; 0.5 lies 1.69897 powers above 0.01.
TEST(LogScale, PutsADistanceWhereHandArithmeticDoes) {
  const LogScale scale{0.01, 10, 100, 400};
  EXPECT_NEAR(scale.x(0.1), 200, 1e-9);
  EXPECT_NEAR(scale.x(0.5), 269.897, 1e-3);
  EXPECT_NEAR(scale.value(269.897), 0.5, 1e-5);
}

TEST(LogScale, MayFall) {
  const LogScale scale{100, 1, 0, 200};
  EXPECT_NEAR(scale.x(10), 100, 1e-9);
  EXPECT_NEAR(scale.x(100), 0, 1e-9);
}

TEST(LogTicks, LabelsAsManyRoundNumbersAsFit) {
  const auto values = [](double points) { return labelled_values(log_ticks({0.95, 10.5, 0, points}, 5, ten_points)); };
  EXPECT_THAT(values(400), ::testing::SizeIs(10));  // 1 to 10
  EXPECT_THAT(values(150), ::testing::ElementsAre(1, 2, 3, 5, 7, 10));
  EXPECT_THAT(values(70), ::testing::ElementsAre(1, 2, 5, 10));
  EXPECT_THAT(values(35), ::testing::ElementsAre(1, 3, 10));
  EXPECT_THAT(values(20), ::testing::ElementsAre(1, 10));
}

TEST(LogTicks, SkipsPowersOfTenOnAVeryLongScale) {
  const auto values = labelled_values(log_ticks({1e-6, 1e6, 0, 120}, 5, ten_points));
  EXPECT_THAT(values, ::testing::SizeIs(7));  // every second power
  EXPECT_DOUBLE_EQ(values.front(), 1e-6);
}

TEST(LogTicks, KeepTheirDistance) {
  for (const double points : {40.0, 90.0, 200.0, 500.0}) {
    const auto ticks = log_ticks({0.003, 40, 0, points}, 5, ten_points);
    for (std::size_t i = 1; i < ticks.size(); ++i) EXPECT_GT(ticks[i].x - ticks[i - 1].x, 1.5) << points;
  }
}

TEST(LogTicks, StayOnAFallingScale) {
  for (const Tick& tick : log_ticks({50, 0.2, 30, 300}, 5, ten_points)) {
    EXPECT_GE(tick.x, 30);
    EXPECT_LE(tick.x, 300);
  }
}

}  // namespace
}  // namespace hz::plots
