#include "planet_marks.hpp"

#include <gmock/gmock.h>

#include <cmath>

#include "palette.hpp"

namespace hz::plots {
namespace {

TEST(DiscRadius, GrowsWithTheRadius) {
  EXPECT_DOUBLE_EQ(disc_radius(1, 4), 4);
  EXPECT_NEAR(disc_radius(4, 4), 4 * std::pow(4, 0.4), 1e-12);
  EXPECT_LT(disc_radius(4, 4), disc_radius(11, 4));
}

TEST(DiscRadius, HasASmallestAndALargest) {
  EXPECT_EQ(disc_radius(0.01, 4), disc_radius(0.02, 4));
  EXPECT_EQ(disc_radius(16, 4), disc_radius(200, 4));
}

TEST(MeasuredRadius, IsNoLimit) {
  FigurePlanet planet;
  planet.radius = 3;
  EXPECT_EQ(measured_radius(planet), 3);
  planet.radius_is_limit = true;
  EXPECT_FALSE(measured_radius(planet));
}

TEST(Disc, IsGreyWithoutAProbability) {
  EXPECT_EQ(disc({0, 0}, 4, std::nullopt, true).ground, palette::unknown);
  EXPECT_EQ(disc({0, 0}, 4, 0.0, true).ground, palette::white);
}

TEST(Disc, HasADashedRingWithoutARadius) {
  EXPECT_TRUE(disc({0, 0}, 4, 0.5, true).ring.dash.empty());
  EXPECT_FALSE(disc({0, 0}, 4, 0.5, false).ring.dash.empty());
  EXPECT_GT(disc({0, 0}, 4, 0.5, false).gap, 0);
}

TEST(Disc, HasABlueRingOnlyWhenPIsAtLeastOnePerCent) {
  EXPECT_EQ(disc({0, 0}, 4, 0.01, true).ring.color, palette::water);
  EXPECT_EQ(disc({0, 0}, 4, 0.0099, true).ring.color, palette::grey);
}

// 1 to 100 au over 200 pt: 10 au at x = 100, 8 au at 90.309, 15 au at 117.609.
TEST(Whisker, EndsAtTheHalfWidths) {
  const LogScale axis{1, 100, 0, 200};
  const auto whisker = plots::whisker({10, 2, 5}, axis, 7);
  ASSERT_TRUE(whisker);
  EXPECT_NEAR(whisker->low, 90.309, 1e-3);
  EXPECT_NEAR(whisker->high, 117.609, 1e-3);
  EXPECT_FALSE(whisker->low_open || whisker->high_open);
}

TEST(Whisker, HasNoCapWhereItLeavesTheAxis) {
  const LogScale axis{1, 100, 0, 200};
  const auto whisker = plots::whisker({10, 12, 200}, axis, 0);
  EXPECT_EQ(whisker->low, 0);
  EXPECT_EQ(whisker->high, 200);
  EXPECT_TRUE(whisker->low_open && whisker->high_open);
}

TEST(Whisker, NeedsAHalfWidth) { EXPECT_FALSE(whisker({10, {}, {}}, {1, 100, 0, 200}, 0)); }

TEST(ChordHalfAngle, PutsTheWaterAtItsHeight) {
  EXPECT_DOUBLE_EQ(chord_half_angle(0), 0);
  EXPECT_NEAR(chord_half_angle(0.25), std::acos(-1.0) / 3, 1e-12);  // cos 60 deg = 1 - 2 * 0.25
  EXPECT_NEAR(chord_half_angle(0.5), std::acos(-1.0) / 2, 1e-12);
  EXPECT_NEAR(chord_half_angle(1), std::acos(-1.0), 1e-12);
}

}  // namespace
}  // namespace hz::plots
