#include <gmock/gmock.h>

#include "hz/plots/figures.hpp"
#include "layout_check.hpp"
#include "systems.hpp"

namespace hz::plots::testing {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;
using ::testing::SizeIs;

TEST(LanesScene, HasOneRowAStarInTheGivenOrder) {
  const Scene scene = lanes_scene({lantern_27(), with_one_planet(), without_planets()}, options(120));
  const auto stars = shapes<DiscMark>(scene, "star");
  const auto names = shapes<TextMark>(scene, "star name");
  ASSERT_THAT(stars, SizeIs(3));
  EXPECT_LT(stars[0].center.y, stars[1].center.y);
  EXPECT_LT(stars[1].center.y, stars[2].center.y);
  EXPECT_EQ(plain(names.at(1).text), "Lantern 2");
}

// One axis for all rows: d / a1 = 10 takes as much room in one row as in another.
TEST(LanesScene, SharesOneLogarithmicAxis) {
  FigureStar first = with_one_planet();
  FigureStar second = with_one_planet();
  FigureStar third = with_one_planet();
  first.planets[0].semi_major_axis.value = 0.05;
  second.planets[0].semi_major_axis.value = 0.5;
  third.planets[0].semi_major_axis.value = 5;
  const auto discs = shapes<DiscMark>(lanes_scene({first, second, third}, options(120)), "disc:");
  ASSERT_THAT(discs, SizeIs(3));
  EXPECT_NEAR(discs[1].center.x - discs[0].center.x, discs[2].center.x - discs[1].center.x, 1e-9);
}

TEST(LanesScene, NamesTheBestPlanetAtRight) {
  const Scene scene = lanes_scene({lantern_27(), without_planets()}, options(120));
  const auto best = shapes<TextMark>(scene, "best");
  ASSERT_THAT(best, SizeIs(2));
  EXPECT_EQ(plain(best[0].text), "d");
  EXPECT_EQ(plain(best[1].text), "0.64");
}

TEST(LanesScene, SaysWhenThereAreMoreStarsThanRows) {
  const Scene forty = lanes_scene(std::vector<FigureStar>(40, with_one_planet()), options(120));
  EXPECT_THAT(words(forty), Not(HasSubstr("stars")));
  const Scene more = lanes_scene(std::vector<FigureStar>(57, with_one_planet()), options(120));
  EXPECT_THAT(shapes<DiscMark>(more, "star"), SizeIs(40));
  EXPECT_THAT(words(more), HasSubstr("first 40 of 57 stars"));
}

TEST(LanesScene, ShortensLongNamesInTheMiddle) {
  const Scene scene = lanes_scene({with_long_name()}, options(88));
  const std::string name = plain(shapes<TextMark>(scene, "star name").at(0).text);
  EXPECT_THAT(name, HasSubstr("…"));
  EXPECT_EQ(name.rfind("Lan", 0), 0U);
  EXPECT_EQ(name.substr(name.size() - 3), "ark");
}

TEST(LanesScene, GrowsWithItsRows) {
  const double one = lanes_scene({with_one_planet()}, options(88)).height;
  const double eleven = lanes_scene(std::vector<FigureStar>(11, with_one_planet()), options(88)).height;
  EXPECT_GT(eleven - one, 10 * 15.0);  // a row has two lines of words of 7 pt
  EXPECT_LT(eleven - one, 10 * 40.0);
}

TEST(LanesScene, NeedsAStar) { EXPECT_THROW((void)lanes_scene({}, options(88)), std::logic_error); }

}  // namespace
}  // namespace hz::plots::testing
