// The words of an answer: held and refused Teff, evolved hosts, stars without planets, margin, side, verdicts.
#include "hz/answer.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"
#include "hz/orbit.hpp"

namespace hz {
namespace {

using testing::earth;
using ::testing::ElementsAre;
using testing::exactly;
using testing::has_flag;
using ::testing::HasSubstr;
using testing::set_named;
using testing::settings_of;
using testing::value;

Answer at_teff(double teff, const Settings& settings = settings_of()) {
  ListRow row = earth();
  row.star.teff = exactly(teff);
  return answer(row, settings);
}

/// A planet of S = 1/a^2 about a star of 5780 K and one solar luminosity.
Answer at_axis(const Field& axis, const Settings& settings = settings_of()) {
  ListRow row = earth();
  row.star.teff = exactly(5780);
  row.planet.semi_major_axis = axis;
  return answer(row, settings);
}

// ---- Teff outside the fits ----------------------------------------------------------------------------------------

TEST(BeyondRange, HeldUpTo300KAndSaysSo) {
  for (const double teff :
       {2566.0, 2300.0, 7201.0, 7500.0}) {  // 2566 K: TRAPPIST-1 (Agol et al. 2021, PSJ 2, 1; from memory)
    const Answer held = at_teff(teff);
    EXPECT_EQ(held.status, Status::answered) << held.reason;
    EXPECT_TRUE(has_flag(held, "held")) << teff;
    for (const LimitAtStar& limit : held.limits) EXPECT_TRUE(limit.held);
    EXPECT_EQ(held.limits.front().insolation, at_teff(teff < 3000 ? 2600 : 7200).limits.front().insolation);
  }
  for (const double teff : {2600.0, 5000.0, 7200.0}) EXPECT_FALSE(has_flag(at_teff(teff), "held")) << teff;
}

TEST(BeyondRange, FartherOutIsSetAsideWithAReason) {
  for (const double teff : {2299.0, 7501.0, 12000.0}) {
    const Answer refused = at_teff(teff);
    EXPECT_EQ(refused.status, Status::set_aside);
    EXPECT_EQ(refused.reason_kind, "teff out of range");
    EXPECT_TRUE(refused.limits.empty());
  }
  EXPECT_EQ(at_teff(2299).reason,
            "teff 2299 K lies 301 K outside the fits of K14 (2600-7200 K), farther than the 300 K over which a limit "
            "is held");
}

TEST(BeyondRange, RefuseSetsAsideWhatHoldAnswers) {
  Settings settings = settings_of();
  settings.beyond = BeyondRange::refuse;
  const Answer refused = at_teff(2566, settings);
  EXPECT_EQ(refused.status, Status::set_aside);
  EXPECT_THAT(refused.reason,
              HasSubstr("2566 K lies 34 K outside the fits of K14 (2600-7200 K), and limits beyond them are refused"));
  EXPECT_EQ(at_teff(2600, settings).status, Status::answered);
}

TEST(BeyondRange, EachSetHasItsOwnRange) {
  EXPECT_EQ(at_teff(3300, settings_of("SELSIS07")).status, Status::set_aside);  // 3700-7200 K
  EXPECT_TRUE(has_flag(at_teff(3500, settings_of("SELSIS07")), "held"));
  EXPECT_FALSE(has_flag(at_teff(3300), "held"));
}

TEST(BeyondRange, ATeffThatStraddlesTheEndIsFlagged) {
  ListRow row = earth();
  row.star.teff = value(2650, 60, 60);
  EXPECT_TRUE(has_flag(answer(row, settings_of()), "held"));
  row.star.teff = value(2650, 10, 10);
  EXPECT_FALSE(has_flag(answer(row, settings_of()), "held"));
}

TEST(BeyondRange, TheRefusedShareIsUnanswered) {
  Settings settings = settings_of();
  settings.beyond = BeyondRange::refuse;
  ListRow row = earth();
  row.star.teff = value(2600, 50, 50);
  EXPECT_NEAR(answer(row, settings).planet->probabilities.unanswered, 0.5, 1e-9);
}

// ---- evolved hosts ------------------------------------------------------------------------------------------------

TEST(Evolved, ByLogG) {
  ListRow row = earth();
  row.star.log_g = exactly(3.99);
  EXPECT_TRUE(has_flag(answer(row, settings_of()), "evolved"));
  row.star.log_g = exactly(4.0);
  EXPECT_FALSE(has_flag(answer(row, settings_of()), "evolved"));
  row.star.log_g = testing::below(3.5);
  EXPECT_FALSE(has_flag(answer(row, settings_of()), "evolved"));
}

// Source: Pecaut & Mamajek 2013, version 2024.05.15: G2V 5770 K has 1.012 solar radii, so twice that is 2.02.
TEST(Evolved, ByRadiusForItsTeff) {
  ListRow row = earth();
  row.star.teff = exactly(5770);
  row.star.stellar_radius = exactly(2.10);
  EXPECT_TRUE(has_flag(answer(row, settings_of()), "evolved"));
  row.star.stellar_radius = exactly(1.95);
  EXPECT_FALSE(has_flag(answer(row, settings_of()), "evolved"));
}

TEST(Evolved, ByTheRadiusThatFollowsFromTheLuminosity) {
  ListRow row = earth();
  row.star.luminosity = exactly(2.1 * 2.1);  // L = R^2 at the Sun's Teff
  EXPECT_TRUE(has_flag(answer(row, settings_of()), "evolved"));
  row.star.luminosity = exactly(1.9 * 1.9);
  EXPECT_FALSE(has_flag(answer(row, settings_of()), "evolved"));
}

// ---- stars without planets, sets of other shapes
// ---------------------------------------------------------------------

TEST(StarWithoutPlanet, IsAnsweredWithItsZone) {
  ListRow row;
  row.star.name = "Lantern 4";
  row.star.teff = exactly(5780);
  row.star.luminosity = exactly(1);
  EXPECT_FALSE(is_planet(row));
  const Answer a = answer(row, settings_of());
  EXPECT_EQ(a.status, Status::answered);
  EXPECT_FALSE(a.planet);
  // 1/sqrt(S) of 1.107, 0.356, 1.776, 0.32: Kopparapu et al. 2014, ApJL 787, L29.
  EXPECT_NEAR(find_edge(a, ZoneEdge::conservative_inner)->distance->value, 0.95044, 5e-6);
  EXPECT_NEAR(find_edge(a, ZoneEdge::conservative_outer)->distance->value, 1.67600, 5e-6);
  EXPECT_NEAR(find_edge(a, ZoneEdge::optimistic_inner)->distance->value, 0.75038, 5e-6);
  EXPECT_NEAR(find_edge(a, ZoneEdge::optimistic_outer)->distance->value, 1.76777, 5e-6);
  EXPECT_EQ(find_edge(a, ZoneEdge::conservative_inner)->distance->plus, 0);
  // The mass follows from the light on the main sequence (Eker et al. 2018: log M = (0 + 0.007) / 5.743).
  EXPECT_NEAR(a.star.stellar_mass->measured.value, std::pow(10, 0.007 / 5.743), 1e-9);
  EXPECT_NEAR(*find_edge(a, ZoneEdge::conservative_inner)->period, 365.2569 * std::pow(0.95044, 1.5), 1);
}

TEST(StarWithoutPlanet, DistancesTakeHalfTheRelativeErrorOfTheLight) {
  ListRow row;
  row.star.teff = exactly(5780);
  row.star.luminosity = value(1, 0.04, 0.04);
  row.star.stellar_mass = exactly(1);
  row.star.distance = exactly(10);
  const Answer a = answer_star(row, settings_of());
  const LimitAtStar& inner = *find_edge(a, ZoneEdge::conservative_inner);
  EXPECT_NEAR(*inner.distance->plus, 0.95044 * (std::sqrt(1.04) - 1), 0.01 * 0.02);
  EXPECT_NEAR(*inner.distance->minus, 0.95044 * (1 - std::sqrt(0.96)), 0.01 * 0.02);
  EXPECT_NEAR(*inner.period, 365.2569 * std::pow(0.95044, 1.5), 0.01);
  EXPECT_NEAR(*inner.angular_separation, 95.044, 5e-4);  // 0.95 au at 10 pc is 0.095 arcsec
}

TEST(StarWithoutPlanet, NeedsALuminosity) {
  ListRow row;
  row.star.teff = exactly(5780);
  EXPECT_EQ(answer(row, settings_of()).reason_kind, "no luminosity");
  row.star.log_luminosity = testing::below(-1);
  EXPECT_EQ(answer(row, settings_of()).reason_kind, "log_luminosity is only a limit");
}

TEST(IsPlanet, WhenItIsNamedOrAnOrbitIsStated) {
  ListRow row;
  EXPECT_FALSE(is_planet(row));
  row.planet.planet_radius = exactly(1);
  EXPECT_FALSE(is_planet(row));
  row.planet.insolation = exactly(1);
  EXPECT_TRUE(is_planet(row));
  ListRow named;
  named.planet.name = "b";
  EXPECT_TRUE(is_planet(named));
}

TEST(SetsWithOneZone, LeaveTheOtherEmptyAndMeritUsesTheOne) {
  ListRow row = earth();
  row.star.luminosity = value(1, 0.1, 0.1);
  const Answer a = answer(row, settings_of("UJS03"));
  ASSERT_TRUE(a.planet);
  EXPECT_TRUE(a.planet->conservative);
  EXPECT_FALSE(a.planet->optimistic);
  EXPECT_FALSE(a.planet->probabilities.optimistic);
  EXPECT_EQ(a.planet->merit, *a.planet->probabilities.conservative);
  EXPECT_TRUE(a.planet->zone_position);
  EXPECT_EQ(find_edge(a, ZoneEdge::optimistic_inner), nullptr);
}

TEST(EquilibriumTemperatureSet, NeedsNoTeff) {
  ListRow row = earth();
  row.star.teff = {};
  const Answer a = answer(row, settings_of("TEQ_A03"));
  ASSERT_EQ(a.status, Status::answered) << a.reason;
  // 278.33 (0.7 S)^1/4 = 273 and 373 K: S = 1.322 and 4.608, so that Earth is too cold without its greenhouse.
  EXPECT_NEAR(find_edge(a, ZoneEdge::conservative_outer)->insolation, 1.3223, 1e-4);
  EXPECT_NEAR(find_edge(a, ZoneEdge::conservative_inner)->insolation, 4.6079, 1e-4);
  EXPECT_EQ(*a.planet->conservative, Verdict::outside);
  EXPECT_EQ(*a.planet->side, Side::cold);
  EXPECT_FALSE(has_flag(a, "held"));
}

// ---- what a placement says ----------------------------------------------------------------------------------------

// Common practice: Earth's equilibrium temperature is 255 K at Bond albedo 0.3 (254.6 K) and 278 K for a black planet.
TEST(EquilibriumTemperature, OfEarth) {
  Settings settings = settings_of();
  EXPECT_NEAR(answer(earth(), settings).planet->equilibrium_temperature, 255, 0.5);
  settings.bond_albedo = 0;
  EXPECT_NEAR(answer(earth(), settings).planet->equilibrium_temperature, 278, 0.5);
}

TEST(ZonePosition, IsZeroAtTheInnerLimitAndOneAtTheOuter) {
  const auto position = [](double s) { return *at_axis(exactly(1 / std::sqrt(s))).planet->zone_position; };
  EXPECT_NEAR(position(1.107), 0, 1e-12);
  EXPECT_NEAR(position(0.356), 1, 1e-12);
  EXPECT_NEAR(position(std::sqrt(1.107 * 0.356)), 0.5, 1e-12);
  EXPECT_LT(position(1.2), 0);
  EXPECT_GT(position(0.3), 1);
}

TEST(Margin, IsPositiveWhenTheNearestLimitLiesFartherOut) {
  const auto margin = [](double s) { return *at_axis(value(1 / std::sqrt(s), 0.02, 0.02)).planet->margin; };
  const Margin hot = margin(1.15);  // the runaway limit at 1.107 is 3.8 per cent off
  EXPECT_EQ(hot.limit->key(), "runaway_greenhouse");
  EXPECT_NEAR(*hot.distance, 1 / std::sqrt(1.107) - 1 / std::sqrt(1.15), 1e-12);
  EXPECT_GT(hot.widths, 0);
  const Margin warm = margin(1.05);
  EXPECT_EQ(warm.limit->key(), "runaway_greenhouse");
  EXPECT_NEAR(*warm.distance, 1 / std::sqrt(1.107) - 1 / std::sqrt(1.05), 1e-12);
  EXPECT_LT(warm.widths, 0);
  const Margin cold = margin(0.31);
  EXPECT_EQ(cold.limit->key(), "early_mars");
  EXPECT_LT(*cold.distance, 0);
  const Margin scorched = margin(5);
  EXPECT_EQ(scorched.limit->key(), "recent_venus");
  EXPECT_NEAR(*scorched.distance, 1 / std::sqrt(1.776) - 1 / std::sqrt(5), 1e-12);
}

TEST(Margin, CountsInTheHalfWidthThatFacesTheLimit) {
  ListRow row = earth();
  row.star.teff = exactly(5780);
  row.star.luminosity = value(1.05, 0.02, 0.1);  // colder than the limit at 1.107: it faces the hotter side
  const Margin margin = *answer(row, settings_of()).planet->margin;
  EXPECT_NEAR(margin.widths, std::log(1.05 / 1.107) / std::log(1.15 / 1.05), 0.02 * std::abs(margin.widths));
  row.star.luminosity = value(1.15, 0.02, 0.1);
  const Margin other = *answer(row, settings_of()).planet->margin;
  EXPECT_NEAR(other.widths, std::log(1.15 / 1.107) / -std::log(1.13 / 1.15), 0.02 * other.widths);
}

TEST(Margin, HasNoDistanceWhereNoAxisIsKnown) {
  ListRow row = testing::bare_earth();
  row.planet.insolation = value(1, 0.1, 0.1);
  const Margin margin = *answer(row, settings_of()).planet->margin;
  EXPECT_FALSE(margin.distance);
  EXPECT_NE(margin.widths, 0);
}

TEST(OrbitShare, IsTheTimeBetweenTheOptimisticLimits) {
  ListRow row = earth();
  row.star.teff = exactly(5780);
  row.planet.semi_major_axis = exactly(1.2);
  EXPECT_FALSE(answer(row, settings_of()).planet->orbit_share);  // circular
  row.planet.eccentricity = exactly(0.5);
  const double inner = 1 / std::sqrt(1.776);
  const double outer = 1 / std::sqrt(0.32);
  EXPECT_NEAR(*answer(row, settings_of()).planet->orbit_share,
              time_share_within(outer / 1.2, 0.5) - time_share_within(inner / 1.2, 0.5), 1e-12);
  row.planet.eccentricity = exactly(0.01);
  EXPECT_EQ(*answer(row, settings_of()).planet->orbit_share, 1);
}

TEST(Side, SaysWhereTheRestLies) {
  EXPECT_EQ(*at_axis(exactly(0.5)).planet->side, Side::hot);
  EXPECT_EQ(*at_axis(exactly(2)).planet->side, Side::cold);
  EXPECT_FALSE(at_axis(exactly(1.2)).planet->side);
  EXPECT_EQ(*at_axis(value(0.95, 0.05, 0.05)).planet->side, Side::hot);
  EXPECT_EQ(word(Side::hot), "hot");
  EXPECT_EQ(word(Side::cold), "cold");
}

TEST(Verdict, HasFiveWordsAndItsThresholdsIncludeTheirEnds) {
  const VerdictThresholds thresholds;
  EXPECT_EQ(verdict_of(1, thresholds), Verdict::inside);
  EXPECT_EQ(verdict_of(0.95, thresholds), Verdict::inside);
  EXPECT_EQ(verdict_of(0.9499, thresholds), Verdict::likely_inside);
  EXPECT_EQ(verdict_of(0.68, thresholds), Verdict::likely_inside);
  EXPECT_EQ(verdict_of(0.6799, thresholds), Verdict::open);
  EXPECT_EQ(verdict_of(0.3201, thresholds), Verdict::open);
  EXPECT_EQ(verdict_of(0.32, thresholds), Verdict::likely_outside);
  EXPECT_EQ(verdict_of(0.0501, thresholds), Verdict::likely_outside);
  EXPECT_EQ(verdict_of(0.05, thresholds), Verdict::outside);
  EXPECT_EQ(verdict_of(0, thresholds), Verdict::outside);
}

TEST(Verdict, WordsAreThoseOfTheFiles) {
  std::vector<std::string_view> words;
  for (const Verdict v :
       {Verdict::inside, Verdict::likely_inside, Verdict::open, Verdict::likely_outside, Verdict::outside}) {
    words.push_back(word(v));
  }
  EXPECT_THAT(words, ElementsAre("inside", "likely inside", "open", "likely outside", "outside"));
}

TEST(Verdict, UsersThresholdsAreUsed) {
  Settings settings = settings_of();
  const Answer open = at_axis(value(0.95044, 0.03, 0.03), settings);  // on the runaway limit
  EXPECT_EQ(*open.planet->conservative, Verdict::open);
  settings.thresholds.likely_inside = 0.4;
  EXPECT_EQ(*at_axis(value(0.95044, 0.03, 0.03), settings).planet->conservative, Verdict::likely_inside);
}

TEST(Merit, IsTheConservativeProbabilityAndHalfOfTheRest) {
  const PlanetAnswer planet = *at_axis(value(0.95044, 0.1, 0.1)).planet;
  const double conservative = *planet.probabilities.conservative;
  const double optimistic = *planet.probabilities.optimistic;
  EXPECT_LT(conservative, optimistic);
  EXPECT_DOUBLE_EQ(planet.merit, conservative + 0.5 * (optimistic - conservative));
}

TEST(Method, SamplingSaysTheSameWithinItsError) {
  ListRow row = earth();
  row.star.luminosity = value(1, 0.1, 0.2);
  row.planet.eccentricity = value(0.2, 0.1, 0.1);
  Settings settings = settings_of();
  const double exact = *answer(row, settings).planet->probabilities.conservative;
  settings.method = Method::sampling;
  settings.draws = 40000;
  const double sampled = *answer(row, settings).planet->probabilities.conservative;
  EXPECT_NEAR(sampled, exact, 4 * std::sqrt(exact * (1 - exact) / 40000));  // 4 sigma; the seed is fixed
  EXPECT_NE(sampled, exact);
  row.number = 77;  // draws hang on the target, not on its place in a list
  EXPECT_EQ(*answer(row, settings).planet->probabilities.conservative, sampled);
  settings.seed = 2;
  EXPECT_NE(*answer(row, settings).planet->probabilities.conservative, sampled);
}

TEST(Answer, NeedsASetThatBoundsAZone) {
  EXPECT_THROW((void)answer(earth(), Settings{}), std::logic_error);
  EXPECT_THROW((void)answer(earth(), settings_of("LECONTE13")), std::logic_error);
}

}  // namespace
}  // namespace hz
