// The order of routes to the insolation, each against arithmetic by hand, and what a list says twice.
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"

namespace hz {
namespace {

using testing::bare_earth;
using testing::below;
using testing::earth;
using testing::exactly;
using testing::has_flag;
using testing::has_flag_like;
using ::testing::HasSubstr;
using testing::settings_of;
using testing::value;

/// Nominal au over nominal solar radius: 149597870.7 / 695700.
constexpr double au_in_radii = 215.032156;

Answer answered(const ListRow& row, const Settings& settings = settings_of()) {
  Answer result = answer(row, settings);
  EXPECT_EQ(result.status, Status::answered) << result.reason;
  return result;
}

double insolation(const Answer& a) { return a.planet->insolation.measured.value; }

/// A row that says everything, each way another number: L 1, or 4 from the radius; a 1 from the period, 2 stated, 3
/// from a/R (with the radius 2); S 7 stated.
ListRow talkative() {
  ListRow row = bare_earth();
  row.star.luminosity = exactly(1);
  row.star.stellar_radius = exactly(2);
  row.planet.orbital_period = exactly(365.2568984);
  row.star.stellar_mass = exactly(1);
  row.planet.semi_major_axis = exactly(2);
  row.planet.scaled_semi_major_axis = exactly(au_in_radii * 3 / 2);
  row.planet.insolation = exactly(7);
  return row;
}

TEST(LuminosityRoute, StatedComesFirst) {
  const Answer a = answered(talkative());
  EXPECT_EQ(a.star.luminosity->route, "stated");
  EXPECT_EQ(a.star.luminosity->measured.value, 1);
}

TEST(LuminosityRoute, LogarithmIsASecondWayOfStatingIt) {
  ListRow row = talkative();
  row.star.luminosity = {};
  row.star.log_luminosity = value(-0.5, 0.02, 0.02);
  const Answer a = answered(row);
  EXPECT_EQ(a.star.luminosity->route, "stated logarithm");
  EXPECT_NEAR(a.star.luminosity->measured.value, 0.316227766, 1e-9);
  EXPECT_NEAR(*a.star.luminosity->measured.plus, 0.316227766 * 0.02 * std::log(10), 1e-9);
}

TEST(LuminosityRoute, RadiusAndTeffComeNext) {
  ListRow row = talkative();
  row.star.luminosity = {};
  EXPECT_NEAR(answered(row).star.luminosity->measured.value, 4, 1e-12);  // Teff is the Sun's: L = R^2
  row.star.teff = exactly(5772 / 2.0);
  EXPECT_NEAR(answered(row).star.luminosity->measured.value, 4.0 / 16, 1e-12);
}

TEST(LuminosityRoute, OptionTurnsTheOrderRound) {
  Settings settings = settings_of();
  settings.luminosity_from = LuminosityFrom::radius;
  ListRow row = talkative();
  EXPECT_NEAR(answered(row, settings).star.luminosity->measured.value, 4, 1e-12);
  row.star.stellar_radius = {};
  EXPECT_EQ(answered(row, settings).star.luminosity->measured.value, 1);
}

TEST(LuminosityRoute, ALimitTakesTheNextWay) {
  ListRow row = talkative();
  row.star.luminosity = below(0.5);
  const Answer a = answered(row);
  EXPECT_EQ(a.star.luminosity->route, "stellar_radius and teff");
  EXPECT_TRUE(has_flag(a, "limit_ignored:luminosity"));
}

TEST(OrbitRoute, PeriodAndStellarMassComeFirst) {
  const Answer a = answered(talkative());
  EXPECT_NEAR(a.planet->semi_major_axis->measured.value, 1, 1e-9);
  EXPECT_EQ(a.planet->semi_major_axis->route, "orbital_period and stellar_mass");
  EXPECT_NEAR(insolation(a), 1, 1e-9);
}

TEST(OrbitRoute, StatedComesNextAndThenTheScaledAxis) {
  ListRow row = talkative();
  row.planet.orbital_period = {};
  EXPECT_EQ(answered(row).planet->semi_major_axis->measured.value, 2);
  EXPECT_NEAR(insolation(answered(row)), 0.25, 1e-12);
  row.planet.semi_major_axis = {};
  EXPECT_NEAR(answered(row).planet->semi_major_axis->measured.value, 3, 1e-8);
  EXPECT_NEAR(insolation(answered(row)), 1.0 / 9, 1e-9);
  EXPECT_EQ(answered(row).planet->semi_major_axis->route, "scaled_semi_major_axis and stellar_radius");
}

TEST(OrbitRoute, OptionTurnsTheOrderRound) {
  Settings settings = settings_of();
  settings.semi_major_axis_from = SemiMajorAxisFrom::stated;
  ListRow row = talkative();
  EXPECT_EQ(answered(row, settings).planet->semi_major_axis->measured.value, 2);
  row.planet.semi_major_axis = {};
  EXPECT_NEAR(answered(row, settings).planet->semi_major_axis->measured.value, 1, 1e-9);
}

TEST(OrbitRoute, ALimitTakesTheNextWay) {
  ListRow row = talkative();
  row.star.stellar_mass = below(1.2);
  const Answer a = answered(row);
  EXPECT_EQ(a.planet->semi_major_axis->route, "stated");
  EXPECT_TRUE(has_flag(a, "limit_ignored:stellar_mass"));
}

TEST(InsolationRoute, LuminosityWithTheAxisComesFirst) {
  const Answer a = answered(talkative());
  EXPECT_EQ(a.planet->insolation.route, "luminosity and semi_major_axis");
}

TEST(InsolationRoute, EarthReceivesOne) {
  EXPECT_EQ(insolation(answered(earth())), 1);
  ListRow row = bare_earth();
  row.planet.orbital_period = exactly(365.2569);
  row.star.stellar_mass = exactly(1);
  row.star.stellar_radius = exactly(1);
  EXPECT_NEAR(insolation(answered(row)), 1, 1e-7);
}

TEST(InsolationRoute, ScaledAxisWithARadiusIsShownInAu) {
  ListRow row = bare_earth();
  row.planet.scaled_semi_major_axis = exactly(au_in_radii);
  row.star.stellar_radius = exactly(0.5);
  const Answer a = answered(row);
  EXPECT_EQ(a.planet->insolation.route, "scaled_semi_major_axis and teff");
  EXPECT_NEAR(a.planet->semi_major_axis->measured.value, 0.5, 1e-8);
}

TEST(InsolationRoute, ScaledAxisAndTeffNeedNoRadius) {
  ListRow row = bare_earth();
  row.planet.scaled_semi_major_axis = exactly(au_in_radii);
  const Answer a = answered(row);
  EXPECT_NEAR(insolation(a), 1, 1e-8);
  EXPECT_EQ(a.planet->insolation.route, "scaled_semi_major_axis and teff");
  EXPECT_FALSE(a.planet->semi_major_axis);
  row.star.teff = exactly(5772 / 2.0);
  EXPECT_NEAR(insolation(answered(row)), 1.0 / 16, 1e-8);
  row.planet.scaled_semi_major_axis = exactly(2 * au_in_radii);
  EXPECT_NEAR(insolation(answered(row)), 1.0 / 64, 1e-8);
}

TEST(InsolationRoute, TheRadiusCancelsBesideAScaledAxis) {
  ListRow row = bare_earth();
  row.star.stellar_radius = value(3, 1, 1);
  row.planet.scaled_semi_major_axis = exactly(au_in_radii);
  const Answer a = answered(row);
  EXPECT_NEAR(insolation(a), 1, 1e-8);
  EXPECT_EQ(a.planet->insolation.measured.plus, 0);  // the radius's error does not count
}

TEST(InsolationRoute, StatedComesLast) {
  ListRow row = bare_earth();
  row.planet.insolation = value(0.7, 0.1, 0.2);
  const Answer a = answered(row);
  EXPECT_EQ(a.planet->insolation.route, "stated");
  EXPECT_EQ(insolation(a), 0.7);
  EXPECT_EQ(a.planet->insolation.measured.plus, 0.2);
}

TEST(InsolationRoute, OptionTurnsTheOrderRound) {
  Settings settings = settings_of();
  settings.insolation_from = InsolationFrom::stated;
  EXPECT_EQ(insolation(answered(talkative(), settings)), 7);
  EXPECT_EQ(answered(talkative(), settings).planet->insolation.route, "stated");
  EXPECT_EQ(insolation(answered(earth(), settings)), 1);
}

TEST(InsolationRoute, ALimitThatSendsItElsewhereIsFlagged) {
  ListRow row = bare_earth();
  row.star.luminosity = below(2);
  row.planet.semi_major_axis = exactly(1);
  row.planet.insolation = exactly(0.7);
  const Answer a = answered(row);
  EXPECT_EQ(insolation(a), 0.7);
  EXPECT_TRUE(has_flag(a, "limit_ignored:luminosity"));
}

TEST(InsolationRoute, EccentricOrbitsAreAveraged) {
  ListRow row = earth();
  row.planet.eccentricity = exactly(0.6);
  EXPECT_DOUBLE_EQ(insolation(answered(row)), 1.25);
  row = bare_earth();  // a stated insolation is averaged already
  row.planet.insolation = exactly(1);
  row.planet.eccentricity = exactly(0.6);
  EXPECT_EQ(insolation(answered(row)), 1);
}

TEST(InsolationRoute, HalfWidthsFollowToFirstOrder) {
  ListRow row = earth();
  row.star.luminosity = value(1, 0.03, 0.06);
  row.planet.semi_major_axis = value(1, 0.02, 0.04);
  const Measured s = answered(row).planet->insolation.measured;
  EXPECT_NEAR(*s.plus, std::hypot(0.06, 2 * 0.02), 1e-12);  // a smaller axis is more light
  EXPECT_NEAR(*s.minus, std::hypot(0.03, 2 * 0.04), 1e-12);
}

// ---- what a list says twice ---------------------------------------------------------------------------------------

ListRow two_luminosities(double stated, double width, double radius) {
  ListRow row = earth();
  row.star.teff = exactly(5772);
  row.star.luminosity = value(stated, width, width);
  row.star.stellar_radius = exactly(radius);  // L = radius^2
  return row;
}

TEST(Inconsistent, BeyondThreeSigmaAndTenPerCent) {
  const Answer far = answered(two_luminosities(1, 0.05, std::sqrt(1.2)));
  EXPECT_TRUE(has_flag(far, "inconsistent:luminosity"));
  EXPECT_THAT(far.note, HasSubstr("luminosity 1 stated, 1.2 from stellar_radius and teff"));
  EXPECT_FALSE(has_flag_like(answered(two_luminosities(1, 0.07, std::sqrt(1.2))), "inconsistent"));    // 2.9 sigma
  EXPECT_FALSE(has_flag_like(answered(two_luminosities(1, 0.001, std::sqrt(1.09))), "inconsistent"));  // 9 per cent
  EXPECT_TRUE(has_flag_like(answered(two_luminosities(1, 0.001, std::sqrt(1.11))), "inconsistent"));
  EXPECT_TRUE(has_flag_like(answered(two_luminosities(1, 0.05, std::sqrt(0.8))), "inconsistent"));
}

TEST(Inconsistent, TheFacingHalfWidthCounts) {
  ListRow row = two_luminosities(1, 0.05, std::sqrt(1.2));
  row.star.luminosity = value(1, 0.01, 0.07);
  EXPECT_FALSE(has_flag_like(answered(row), "inconsistent"));
  row.star.luminosity = value(1, 0.07, 0.01);
  EXPECT_TRUE(has_flag_like(answered(row), "inconsistent"));
}

TEST(Inconsistent, SemiMajorAxisAndInsolationToo) {
  const Answer a = answered(talkative());
  EXPECT_TRUE(has_flag(a, "inconsistent:luminosity"));
  EXPECT_TRUE(has_flag(a, "inconsistent:semi_major_axis"));
  EXPECT_TRUE(has_flag(a, "inconsistent:insolation"));
  EXPECT_THAT(a.note, HasSubstr("semi_major_axis 2 stated, 1 from orbital_period and stellar_mass"));
  EXPECT_THAT(a.note, HasSubstr("insolation 7 stated, 1 from the route used"));
}

TEST(Inconsistent, SayingOneThingTwiceIsNoTrouble) {
  ListRow row = two_luminosities(1, 0.05, 1);
  row.planet.insolation = value(1.05, 0.01, 0.01);
  const Answer a = answered(row);
  EXPECT_FALSE(has_flag_like(a, "inconsistent"));
  EXPECT_TRUE(a.note.empty()) << a.note;
}

// Source: the composite list's row of HD 113538 b: log g 3.79 +- 0.53 is 1.8 half-widths from M / R^2, in dex.
TEST(Inconsistent, WideSurfaceGravityIsComparedInDex) {
  ListRow row = bare_earth();
  row.star.teff = value(4462, 145, 145);
  row.star.stellar_radius = value(0.53, 0.02, 0.02);
  row.star.stellar_mass = value(0.58, 0.05, 0.05);
  row.star.log_g = value(3.79, 0.53, 0.53);
  EXPECT_FALSE(has_flag(answer_star(row, settings_of()), "inconsistent:log_g"));
  row.star.log_g = value(3.79, 0.1, 0.1);
  EXPECT_TRUE(has_flag(answer_star(row, settings_of()), "inconsistent:log_g"));
}

// A Teff that is too low makes R^2 Teff^4 too small and the light from V, by its bolometric correction, too large: its
// half-width counts for more in their difference than in the two apart.
// Source: the composite list's row of HAT-P-11 b.
TEST(Inconsistent, TeffOfBothLuminositiesCountsInTheirDifference) {
  ListRow row = bare_earth();
  row.star.teff = value(4780, 50, 50);
  row.star.stellar_radius = value(0.68, 0.01, 0.01);
  row.star.distance = value(37.7647, 0.0337, 0.0337);
  row.star.magnitude_v = value(9.46, 0.03, 0.03);
  EXPECT_FALSE(has_flag(answer_star(row, settings_of()), "inconsistent:luminosity"));
  row.star.teff = value(4780, 30, 30);
  EXPECT_TRUE(has_flag(answer_star(row, settings_of()), "inconsistent:luminosity"));
}

// Source: nearest_10pc.csv (HO Lib): M3V with B-V 1.20 in its list.
TEST(Inconsistent, TypeAndBlueColorWhereTeffIsTakenFromTheType) {
  ListRow row = bare_earth();
  row.star.teff = {};
  row.star.spectral_type = "M3V";
  row.star.magnitude_v = value(10.56);
  row.star.magnitude_b = value(11.76);
  row.star.distance = value(6.3);
  EXPECT_TRUE(has_flag(answer_star(row, settings_of()), "inconsistent:teff"));
  row.star.magnitude_k = value(5.84);  // Teff by V-Ks: nothing hangs on the others
  EXPECT_FALSE(has_flag(answer_star(row, settings_of()), "inconsistent:teff"));
}

// 16 mag and 3900 K at 10 pc: by a correction of main-sequence stars 8.6e-5 solar luminosities, so 0.020 solar radii; a
// main-sequence star of 3900 K has 0.60 (Pecaut & Mamajek 2013, between K9V and M0V).
TEST(BelowMainSequence, StatedTeffDoesNotHideAWhiteDwarf) {
  ListRow row;
  row.star.teff = value(3900, 50, 50);
  row.star.distance = value(10, 0.1, 0.1);
  row.star.magnitude_v = value(16);
  const Answer answer = answer_star(row, settings_of());
  EXPECT_EQ(answer.status, Status::set_aside);
  EXPECT_THAT(answer.reason, HasSubstr("0.034 times the size of a main-sequence star of 3900 K (stated)"));
  row.star.magnitude_v = value(9);
  EXPECT_EQ(answer_star(row, settings_of()).status, Status::answered);
}

}  // namespace
}  // namespace hz
