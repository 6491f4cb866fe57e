#include "hz/requirement.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "answer_helpers.hpp"
#include "hz/error.hpp"
#include "list_files.hpp"

namespace hz {
namespace {

using testing::above;
using testing::below;
using testing::exactly;
using ::testing::HasSubstr;
using ::testing::IsEmpty;
using testing::settings_of;
using testing::value;

Candidate planet() {
  Candidate made;
  made.row = testing::earth();
  made.row.star.stellar_radius = exactly(1);
  made.row.planet.planet_radius = value(1.5, 0.1, 0.1);
  made.row.star.spectral_type = "G2 V";
  made.row.star.number_of_stars = 1;
  made.answer = answer(made.row, settings_of());
  return made;
}

std::string why(std::string_view requirement, const Candidate& candidate = planet()) {
  return why_not_met(parse_requirement(requirement), candidate);
}

std::string usage_error(std::string_view requirement) {
  return testing::error_of([&] { (void)parse_requirement(requirement); }, Fault::usage);
}

TEST(Requirement, EveryComparison) {
  EXPECT_THAT(why("planet_radius<1.6"), IsEmpty());
  EXPECT_EQ(why("planet_radius<1.5"), "planet_radius<1.5 is not met: 1.5");
  EXPECT_THAT(why("planet_radius<=1.5"), IsEmpty());
  EXPECT_THAT(why("planet_radius<=1.4"), HasSubstr("is not met"));
  EXPECT_THAT(why("planet_radius>1.4"), IsEmpty());
  EXPECT_THAT(why("planet_radius>1.5"), HasSubstr("is not met"));
  EXPECT_THAT(why("planet_radius>=1.5"), IsEmpty());
  EXPECT_THAT(why("planet_radius>=1.6"), HasSubstr("is not met"));
  EXPECT_THAT(why("planet_radius=1.5"), IsEmpty());
  EXPECT_THAT(why("planet_radius==1.5"), IsEmpty());
  EXPECT_THAT(why("planet_radius=1.4"), HasSubstr("is not met"));
}

TEST(Requirement, IsReadAsPeopleWriteIt) {
  const Requirement read = parse_requirement(" planet_radius  <=  1.8 ");
  EXPECT_EQ(read.name, "planet_radius");
  EXPECT_EQ(read.comparison, Comparison::less_or_equal);
  EXPECT_EQ(read.number, 1.8);
  EXPECT_EQ(read.text, "planet_radius  <=  1.8");
}

TEST(Requirement, TakesAQuantityAsUsed) {
  Candidate from_radius = planet();
  from_radius.row.star.luminosity = {};
  from_radius.row.star.stellar_radius = exactly(2);  // L = 4, not stated
  from_radius.answer = answer(from_radius.row, settings_of());
  EXPECT_THAT(why("luminosity>3.9", from_radius), IsEmpty());
  EXPECT_THAT(why("insolation>=4", from_radius), IsEmpty());
  EXPECT_THAT(why("luminosity<3.9", from_radius), HasSubstr("is not met: 4"));
}

TEST(Requirement, KnowsWhatHzmapDecided) {
  EXPECT_THAT(why("p_conservative>=0.5"), IsEmpty());
  EXPECT_THAT(why("p_conservative<0.5"), HasSubstr("is not met: 1"));
  EXPECT_THAT(why("verdict_optimistic=inside"), IsEmpty());
  EXPECT_EQ(why("verdict_optimistic=likely outside"), "verdict_optimistic=likely outside is not met: inside");
  EXPECT_THAT(why("equilibrium_temperature<260"), IsEmpty());
}

TEST(Requirement, ComparesText) {
  EXPECT_THAT(why("spectral_type=G2 V"), IsEmpty());
  EXPECT_THAT(why("spectral_type=K5 V"), HasSubstr("is not met: G2 V"));
}

TEST(Requirement, CountsAreNumbers) {
  EXPECT_THAT(why("number_of_stars<2"), IsEmpty());
  EXPECT_THAT(why("number_of_stars<=1"), IsEmpty());
  EXPECT_THAT(why("number_of_stars=1"), IsEmpty());
  EXPECT_THAT(why("number_of_stars>1"), HasSubstr("is not met: 1"));
}

TEST(Requirement, WhatIsNotKnownIsNotMet) {
  EXPECT_EQ(why("distance<10"), "distance<10 is not known to be met: no distance");
  EXPECT_THAT(why("distance>10"), HasSubstr("not known to be met"));
  EXPECT_THAT(why("star_id=7"), HasSubstr("not known to be met"));
}

TEST(Requirement, ALimitMeetsItWhenAllThatItAllowsDoes) {
  Candidate candidate = planet();
  candidate.row.planet.planet_radius = below(1.7);
  candidate.answer = answer(candidate.row, settings_of());
  EXPECT_THAT(why("planet_radius<1.8", candidate), IsEmpty());
  EXPECT_THAT(why("planet_radius<1.7", candidate), IsEmpty());
  EXPECT_EQ(why("planet_radius<1.6", candidate), "planet_radius<1.6 is not known to be met: only a limit, < 1.7");
  EXPECT_THAT(why("planet_radius>1", candidate), HasSubstr("not known to be met"));
  EXPECT_THAT(why("planet_radius=1.7", candidate), HasSubstr("not known to be met"));
  candidate.row.planet.planet_radius = above(1.7);
  candidate.answer = answer(candidate.row, settings_of());
  EXPECT_THAT(why("planet_radius>1.6", candidate), IsEmpty());
  EXPECT_THAT(why("planet_radius>=1.7", candidate), IsEmpty());
  EXPECT_THAT(why("planet_radius<1.8", candidate), HasSubstr("only a limit, > 1.7"));
}

TEST(Requirement, ALimitBesideAnotherRouteDoesNotCount) {
  Candidate candidate = planet();
  candidate.row.star.luminosity = below(3);  // L = 1 follows from the radius
  candidate.answer = answer(candidate.row, settings_of());
  ASSERT_EQ(candidate.answer.star.luminosity->measured.value, 1);
  EXPECT_THAT(why("luminosity<1.5", candidate), IsEmpty());
}

TEST(Requirement, AnAssumedMassIsNotKnown) {
  Candidate candidate = planet();
  candidate.row.planet.planet_radius = {};
  candidate.row.planet.planet_mass = {};
  candidate.answer = answer(candidate.row, settings_of());
  ASSERT_EQ(candidate.answer.planet->planet_mass.measured.value, 1);
  EXPECT_EQ(why("planet_mass<5", candidate), "planet_mass<5 is not known to be met: no planet_mass");
  candidate.row.planet.planet_mass = below(1000);
  candidate.answer = answer(candidate.row, settings_of());
  EXPECT_THAT(why("planet_mass<5", candidate), HasSubstr("only a limit, < 1000"));
}

TEST(Requirement, MistakesAreUsageErrors) {
  EXPECT_THAT(usage_error("planet_radius"), HasSubstr("has no comparison"));
  EXPECT_THAT(usage_error("<3"), HasSubstr("has no comparison"));
  EXPECT_THAT(usage_error("planet_size<3"), HasSubstr("there is no quantity or column `planet_size`"));
  EXPECT_THAT(usage_error("planet_radius<big"), HasSubstr("`big` is not a number"));
  EXPECT_THAT(usage_error("planet_radius<"), HasSubstr("is not a number"));
  EXPECT_THAT(usage_error("spectral_type<M"), HasSubstr("is not a number"));
}

}  // namespace
}  // namespace hz
