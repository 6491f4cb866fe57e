#include <gmock/gmock.h>

#include <cmath>

#include "hz/plots/figures.hpp"
#include "layout_check.hpp"
#include "systems.hpp"

namespace hz::plots::testing {
namespace {

using ::testing::HasSubstr;
using ::testing::IsEmpty;
using ::testing::Not;
using ::testing::SizeIs;

/// The tick over the number that stands under a ruler.
double tick_x(const Scene& scene, const std::string& ruler, const std::string& number) {
  double best = NAN;
  for (const TextMark& text : shapes<TextMark>(scene, "number:" + ruler)) {
    if (plain(text.text) != number) continue;
    for (const LineMark& tick : shapes<LineMark>(scene, "tick:" + ruler))
      if (!(std::abs(best - text.box.center().x) < std::abs(tick.points[0].x - text.box.center().x)))
        best = tick.points[0].x;
  }
  EXPECT_FALSE(std::isnan(best)) << number << " is not on the ruler of " << ruler;
  return best;
}

/// Where a distance lies, from two numbers under the ruler and nothing else.
struct Reading {
  double x_low, x_high, low, high;
  [[nodiscard]] double x(double distance) const {
    return x_low + (x_high - x_low) * std::log(distance / low) / std::log(high / low);
  }
};
/// Distances worked out by hand have five digits: half a unit of 1e-5 in 0.1 au is 0.01 pt at 180 pt a factor e.
constexpr double tolerance = 0.01;

class Wedge : public ::testing::Test {
protected:
  Scene scene = wedge_scene(lantern_27(), options(180));
  Reading distance{tick_x(scene, "distance", "0.1"), tick_x(scene, "distance", "0.7"), 0.1, 0.7};
  Point star = shapes<DiscMark>(scene, "star").front().center;
};

TEST_F(Wedge, PutsLimitsAtTheirDistanceFromTheStar) {
  for (const FigureLimit& limit : lantern_27().limits) {
    const auto arcs = shapes<ArcMark>(scene, "limit:" + limit.title);
    ASSERT_THAT(arcs, SizeIs(1)) << limit.title;
    EXPECT_NEAR(arcs[0].center.x + arcs[0].radius, distance.x(limit.distance.value), tolerance) << limit.title;
    EXPECT_DOUBLE_EQ(arcs[0].center.y, star.y);
  }
}

TEST_F(Wedge, PutsPlanetsAndTheirOrbitsAtTheirDistance) {
  const double expected = distance.x(0.412);
  EXPECT_NEAR(shapes<DiscMark>(scene, "disc:Lantern 27 d").at(0).center.x, expected, tolerance);
  const ArcMark orbit = shapes<ArcMark>(scene, "orbit:Lantern 27 d").at(0);
  EXPECT_NEAR(orbit.center.x + orbit.radius, expected, tolerance);
}

TEST_F(Wedge, DrawsTheSpanOfAnEccentricOrbit) {
  const auto ends = shapes<ArcMark>(scene, "span:Lantern 27 d");
  ASSERT_THAT(ends, SizeIs(2));
  EXPECT_NEAR(ends[0].center.x + ends[0].radius, distance.x(0.362), tolerance);
  EXPECT_NEAR(ends[1].center.x + ends[1].radius, distance.x(0.462), tolerance);
  EXPECT_THAT(shapes<ArcMark>(scene, "span:Lantern 27 b"), IsEmpty());
}

TEST_F(Wedge, DrawsWhiskersOver68PerCent) {
  const WhiskerMark whisker = shapes<WhiskerMark>(scene, "whisker:Lantern 27 d").at(0);
  EXPECT_NEAR(whisker.low, distance.x(0.400), tolerance);
  EXPECT_NEAR(whisker.high, distance.x(0.424), tolerance);
  const DiscMark disc = shapes<DiscMark>(scene, "disc:Lantern 27 d").at(0);
  EXPECT_GT(whisker.y - whisker.cap, disc.center.y + disc.radius);
}

// S = L / d^2, so S = 1 lies at sqrt(0.165) = 0.40620 au and S = 10 at sqrt(0.0165) = 0.12845 au.
TEST_F(Wedge, PutsInsolationWhereLOverDSquaredSays) {
  EXPECT_NEAR(tick_x(scene, "insolation", "1"), distance.x(0.40620), tolerance);
  EXPECT_NEAR(tick_x(scene, "insolation", "10"), distance.x(0.12845), tolerance);
}

// Kepler: a = (0.68 (100 / 365.2569)^2)^(1/3) = (0.68 * 0.0749555)^(1/3) = 0.37077 au for 100 d about 0.68 solar
// masses.
TEST_F(Wedge, PutsPeriodsWhereKeplerSays) {
  EXPECT_NEAR(tick_x(scene, "period", "100"), distance.x(0.37077), tolerance);
}

TEST_F(Wedge, FillsDiscsToTheHeightOfP) {
  EXPECT_DOUBLE_EQ(shapes<DiscMark>(scene, "disc:Lantern 27 d").at(0).filled, 0.64);
  EXPECT_DOUBLE_EQ(shapes<DiscMark>(scene, "disc:Lantern 27 b").at(0).filled, 0.0);
}

TEST_F(Wedge, WritesWhatAReaderNeeds) {
  const std::string all = words(scene);
  for (const char* needed :
       {"Lantern 27", "4410 ±\u00A070\u00A0K", "0.165 ±\u00A00.009\u00A0L\u2299", "0.64", "< 0.01", "recent Venus",
        "runaway greenhouse", "maximum greenhouse", "early Mars", "P in the conservative zone", "68 %",
        "span of an eccentric orbit", "Kopparapu", "M\u2295", "hotter", "colder"})
    EXPECT_THAT(all, HasSubstr(needed));
  EXPECT_THAT(all, Not(HasSubstr("held")));
  EXPECT_THAT(all, Not(HasSubstr("not measured")));
}

TEST_F(Wedge, FadesTheZoneOverThe68PerCentOfItsEdges) {
  const SectorMark zone = shapes<SectorMark>(scene, "zone").at(0);
  // Recent Venus: 0.75 sqrt(0.165) = 0.30465 au with 3 per cent; early Mars: 1.77 sqrt(0.165) = 0.71898 au.
  EXPECT_NEAR(zone.center.x + zone.inner, distance.x(0.30465 * 0.97), tolerance);
  EXPECT_NEAR(zone.center.x + zone.outer, distance.x(0.71898 * 1.03), tolerance);
}

TEST(WedgeScene, FillsByTheOptimisticZoneWhenAsked) {
  FigureOptions by_optimistic = options(88);
  by_optimistic.filled_by = FilledZone::optimistic;
  const Scene scene = wedge_scene(lantern_27(), by_optimistic);
  EXPECT_DOUBLE_EQ(shapes<DiscMark>(scene, "disc:Lantern 27 d").at(0).filled, 0.9);
  EXPECT_THAT(words(scene), HasSubstr("P in the optimistic zone"));
}

TEST(WedgeScene, HasNoPeriodRulerWithoutAStellarMass) {
  EXPECT_THAT(shapes<LineMark>(wedge_scene(lantern_27(), options(88)), "ruler:period"), SizeIs(1));
  EXPECT_THAT(shapes<LineMark>(wedge_scene(nearly_equal(), options(88)), "ruler:period"), IsEmpty());
}

TEST(WedgeScene, KeysWhatIsMissing) {
  const Scene scene = wedge_scene(nearly_equal(), options(120));
  EXPECT_THAT(words(scene), HasSubstr("radius not measured"));
  EXPECT_THAT(words(scene), HasSubstr("not known"));
  EXPECT_THAT(shapes<DiscMark>(scene, "disc:Lantern 27 d").at(0).ring.dash, Not(IsEmpty()));
  EXPECT_THAT(shapes<TextMark>(scene, "p:Lantern 27 d"), IsEmpty());
}

TEST(WedgeScene, ShowsHeldLimitsByTeethAndKeysThem) {
  const Scene scene = wedge_scene(compact_in_zone(), options(120));
  EXPECT_THAT(shapes<LineMark>(scene, "tooth:recent Venus"), Not(IsEmpty()));
  EXPECT_THAT(words(scene), HasSubstr("limit held"));
  EXPECT_THAT(shapes<LineMark>(wedge_scene(lantern_27(), options(120)), "tooth:"), IsEmpty());
}

TEST(WedgeScene, DrawsAStarWithoutPlanetsOrLimits) {
  FigureStar bare = without_planets();
  bare.limits.clear();
  const Scene scene = wedge_scene(bare, options(88));
  EXPECT_THAT(shapes<DiscMark>(scene, "disc:"), IsEmpty());
  EXPECT_THAT(shapes<SectorMark>(scene, "zone"), IsEmpty());
  EXPECT_THAT(shapes<LineMark>(scene, "ruler:"), SizeIs(3));
  EXPECT_THAT(layout_faults(scene), IsEmpty());
}

TEST(WedgeScene, KeepsDiscsOfNearlyEqualOrbitsApart) {
  const Scene scene = wedge_scene(nearly_equal(), options(88));
  const DiscMark b = shapes<DiscMark>(scene, "disc:Lantern 27 b").at(0);
  const DiscMark c = shapes<DiscMark>(scene, "disc:Lantern 27 c").at(0);
  EXPECT_GE(std::hypot(b.center.x - c.center.x, b.center.y - c.center.y), b.radius + c.radius);
}

TEST(WedgeScene, RefusesNumbersThatAreNone) {
  FigureStar broken = lantern_27();
  broken.planets[0].semi_major_axis.value = 0;
  EXPECT_THROW((void)wedge_scene(broken, options(88)), std::logic_error);
  broken = lantern_27();
  broken.luminosity.value = NAN;
  EXPECT_THROW((void)wedge_scene(broken, options(88)), std::logic_error);
}

}  // namespace
}  // namespace hz::plots::testing
