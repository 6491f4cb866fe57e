// Nothing on a page overlaps, is cut off or too small, whatever the system.
#include <gmock/gmock.h>

#include "hz/error.hpp"
#include "hz/plots/figures.hpp"
#include "layout_check.hpp"
#include "systems.hpp"

namespace hz::plots::testing {
namespace {

using ::testing::IsEmpty;

class Layout : public ::testing::TestWithParam<double> {};  // page width, mm
INSTANTIATE_TEST_SUITE_P(Widths, Layout, ::testing::Values(60, 88, 120, 180, 400));

TEST_P(Layout, OfTheWedgeHoldsForAwkwardSystems) {
  for (const FigureStar& star : awkward_systems())
    EXPECT_THAT(layout_faults(wedge_scene(star, options(GetParam()))), IsEmpty()) << star.name;
}

TEST_P(Layout, OfTheWedgeHoldsForRandomSystems) {
  std::mt19937 source(20140601);
  for (int i = 0; i < 50; ++i)
    EXPECT_THAT(layout_faults(wedge_scene(random_system(source), options(GetParam()))), IsEmpty()) << "system " << i;
}

TEST_P(Layout, OfLanesHoldsForAwkwardSystems) {
  EXPECT_THAT(layout_faults(lanes_scene(awkward_systems(), options(GetParam()))), IsEmpty());
  for (const FigureStar& star : awkward_systems())
    EXPECT_THAT(layout_faults(lanes_scene({star}, options(GetParam()))), IsEmpty()) << star.name;
}

TEST_P(Layout, OfLanesHoldsForRandomSystems) {
  std::mt19937 source(20140602);
  for (const std::size_t count : {7U, 40U}) {
    std::vector<FigureStar> stars;
    for (std::size_t i = 0; i < count; ++i) stars.push_back(random_system(source));
    EXPECT_THAT(layout_faults(lanes_scene(stars, options(GetParam()))), IsEmpty()) << count << " stars";
  }
}

TEST(LayoutCheck, SeesWordsThatOverlap) {
  Scene scene = wedge_scene(lantern_27(), options(88));
  const auto title = shapes<TextMark>(scene, "title:").front();
  scene.marks.push_back({"a second time", title});
  EXPECT_THAT(layout_faults(scene), ::testing::SizeIs(1));
}

TEST(LayoutCheck, SeesMarksThatLeaveThePage) {
  Scene scene = wedge_scene(lantern_27(), options(88));
  scene.width -= 20;
  EXPECT_FALSE(layout_faults(scene).empty());
}

TEST(Layout, RefusesPagesTooNarrowOrTooWideToDraw) {
  for (const double width : {59.0, 1001.0, 0.0, -88.0}) {
    EXPECT_THROW((void)wedge_scene(lantern_27(), options(width)), Error) << width;
    EXPECT_THROW((void)lanes_scene({lantern_27()}, options(width)), Error) << width;
  }
}

}  // namespace
}  // namespace hz::plots::testing
