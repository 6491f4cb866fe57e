#include "zone_marks.hpp"

#include <gmock/gmock.h>

#include "palette.hpp"
#include "systems.hpp"

namespace hz::plots {
namespace {

const LogScale axis{0.1, 10, 0, 200};  // 1 au at x = 100

Color at(const std::vector<ColorStop>& shade, double x) {
  for (const ColorStop& stop : shade)
    if (std::abs(stop.at - x) < 1e-6) return stop.color;
  ADD_FAILURE() << "no stop at " << x;
  return {};
}

// 68 % of 0.75 +- 0.0225 au etc.; x = 100 + 100 log10(d).
TEST(ZoneShade, IsHalfWayAtTheEdgeAndFadesOverItsWidth) {
  const auto shade = zone_shade(testing::four_limits(1, 0.03), axis);
  const double inner = axis.x(0.75);
  EXPECT_EQ(at(shade, axis.x(0.75 * 0.97)), palette::white);
  const Color half = at(shade, inner);
  EXPECT_NEAR(half.red, (1 + palette::optimistic.red) / 2, 1e-9);
  EXPECT_NEAR(at(shade, axis.x(0.75 * 1.03)).red, palette::optimistic.red, 1e-9);
  EXPECT_NEAR(at(shade, axis.x(0.95 * 1.03)).red, palette::conservative.red, 1e-9);
}

TEST(ZoneShade, RisesInXAndIsWhiteAtBothEnds) {
  const auto shade = zone_shade(testing::four_limits(1, 0.05), axis);
  for (std::size_t i = 1; i < shade.size(); ++i) EXPECT_GE(shade[i].at, shade[i - 1].at);
  EXPECT_EQ(shade.front().color, palette::white);
  EXPECT_EQ(shade.back().color, palette::white);
}

TEST(ZoneShade, IsSharpWithoutHalfWidths) {
  auto limits = testing::four_limits(1, 0);
  for (FigureLimit& limit : limits) limit.distance.minus = limit.distance.plus = std::nullopt;
  const auto shade = zone_shade(limits, axis);
  EXPECT_NEAR(shade.front().at, axis.x(0.75), 0.02);
  EXPECT_NEAR(shade.back().at, axis.x(1.77), 0.02);
}

TEST(ZoneShade, NeedsBothEdgesOfAZone) {
  auto limits = testing::four_limits(1, 0.03);
  limits.resize(2);  // the two inner ones
  EXPECT_TRUE(zone_shade(limits, axis).empty());
}

TEST(ZoneShade, BearsLimitsThatCross) {
  auto limits = testing::four_limits(1, 0.03);
  std::swap(limits[1].distance, limits[2].distance);  // the conservative zone is empty
  for (const ColorStop& stop : zone_shade(limits, axis)) EXPECT_GE(stop.color.red, palette::optimistic.red - 1e-9);
}

TEST(LimitStroke, TellsConservativeFromOptimistic) {
  EXPECT_TRUE(limit_stroke(LimitRole::conservative_outer).dash.empty());
  EXPECT_FALSE(limit_stroke(LimitRole::optimistic_outer).dash.empty());
}

}  // namespace
}  // namespace hz::plots
