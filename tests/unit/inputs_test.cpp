// What stands for a field: its half-widths as given, assumed or exact, its limits, and what sets a row aside.
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"

namespace hz {
namespace {

using testing::above;
using testing::bare_earth;
using testing::below;
using testing::earth;
using testing::exactly;
using testing::has_flag;
using testing::has_flag_like;
using ::testing::HasSubstr;
using testing::settings_of;
using testing::unreadable;
using testing::value;

using FieldOf = Field& (*)(ListRow&);

Measured luminosity_of(const Field& field, const Settings& settings = settings_of()) {
  ListRow row = earth();
  row.star.luminosity = field;
  return answer(row, settings).star.luminosity->measured;
}

// ---- assumed errors -----------------------------------------------------------------------------------------------

struct AssumedCase {
  const char* name;
  FieldOf field;
  double at;
  double half_width;  // on the quantity's own scale
  Measured (*used)(const Answer&);
};

const AssumedCase assumed_cases[] = {
    {"teff", [](ListRow& r) -> Field& { return r.star.teff; }, 5772, 0.016 * 5772,
     [](const Answer& a) { return a.star.teff->measured; }},
    {"luminosity", [](ListRow& r) -> Field& { return r.star.luminosity; }, 0.9, 0.14 * 0.9,
     [](const Answer& a) { return a.star.luminosity->measured; }},
    {"stellar_mass", [](ListRow& r) -> Field& { return r.star.stellar_mass; }, 1.1, 0.056 * 1.1,
     [](const Answer& a) { return a.star.stellar_mass->measured; }},
    {"distance", [](ListRow& r) -> Field& { return r.star.distance; }, 12, 0.012 * 12,
     [](const Answer& a) { return a.star.distance->measured; }},
    {"semi_major_axis", [](ListRow& r) -> Field& { return r.planet.semi_major_axis; }, 1.2, 0.023 * 1.2,
     [](const Answer& a) { return a.planet->semi_major_axis->measured; }},
    {"planet_mass", [](ListRow& r) -> Field& { return r.planet.planet_mass; }, 2, 0.13 * 2,
     [](const Answer& a) { return a.planet->planet_mass.measured; }},
};

class AssumedError : public ::testing::TestWithParam<AssumedCase> {};

TEST_P(AssumedError, StandsInForAMissingOrPrintedZero) {
  const AssumedCase& c = GetParam();
  for (const Field& field : {value(c.at), value(c.at, 0, 0), value(c.at, 0), value(c.at, {}, 0)}) {
    ListRow row = earth();
    c.field(row) = field;
    const Answer answered = answer(row, settings_of());
    ASSERT_EQ(answered.status, Status::answered) << answered.reason;
    EXPECT_NEAR(*c.used(answered).minus, c.half_width, 1e-12 * c.at);
    EXPECT_NEAR(*c.used(answered).plus, c.half_width, 1e-12 * c.at);
  }
}

TEST_P(AssumedError, IsFlaggedWhereItMovesAnAnswer) {
  const AssumedCase& c = GetParam();
  ListRow row = earth();
  c.field(row) = value(c.at);
  const Answer answered = answer(row, settings_of());
  // The star's mass and distance only label the zone here; nothing of the placement hangs on them.
  const bool moves = std::string(c.name) != "stellar_mass" && std::string(c.name) != "distance";
  EXPECT_EQ(has_flag(answered, std::string("assumed_error:") + c.name), moves);
  c.field(row) = value(c.at, 0.01, 0.01);
  EXPECT_FALSE(has_flag_like(answer(row, settings_of()), "assumed_error"));
}

TEST_P(AssumedError, CanBeSwitchedOff) {
  const AssumedCase& c = GetParam();
  ListRow row = earth();
  c.field(row) = value(c.at);
  Settings settings = settings_of();
  settings.assumed_errors = {};
  const Answer answered = answer(row, settings);
  EXPECT_EQ(c.used(answered).minus, 0);
  EXPECT_EQ(c.used(answered).plus, 0);
  EXPECT_FALSE(has_flag_like(answered, "assumed_error"));
}

INSTANTIATE_TEST_SUITE_P(Quantities, AssumedError, ::testing::ValuesIn(assumed_cases),
                         [](const auto& instance) { return std::string(instance.param.name); });

TEST(AssumedErrors, AreTheDocumentedOnes) {
  const AssumedErrors errors = default_assumed_errors();
  EXPECT_EQ(errors.at(Quantity::stellar_radius), 0.06);
  EXPECT_EQ(errors.at(Quantity::planet_radius), 0.09);
  EXPECT_EQ(errors.at(Quantity::insolation), 0.06);
  EXPECT_EQ(errors.at(Quantity::eccentricity), 0.05);
  EXPECT_FALSE(errors.contains(Quantity::orbital_period));  // a period is exact
}

TEST(AssumedErrors, ReachTheOtherRoutes) {
  ListRow row = bare_earth();
  row.star.stellar_radius = value(1);
  row.planet.orbital_period = value(365.256898);
  row.star.stellar_mass = value(1);
  const Answer answered = answer(row, settings_of());
  EXPECT_TRUE(has_flag(answered, "assumed_error:stellar_radius"));
  EXPECT_TRUE(has_flag(answered, "assumed_error:stellar_mass"));
  EXPECT_FALSE(has_flag(answered, "assumed_error:orbital_period"));
  EXPECT_NEAR(*answered.star.luminosity->measured.plus, 2 * 0.06, 1e-9);
  EXPECT_NEAR(*answered.planet->semi_major_axis->measured.plus, 0.056 / 3, 1e-6);
}

TEST(AssumedErrors, OfALogarithmAreOnItsOwnScale) {
  ListRow row = bare_earth();
  row.planet.semi_major_axis = exactly(1);
  row.star.log_luminosity = value(0);
  const Answer answered = answer(row, settings_of());
  EXPECT_TRUE(has_flag(answered, "assumed_error:log_luminosity"));
  // 14 per cent of L is 0.0608 dex; carried to L to first order it is 14 per cent again.
  EXPECT_NEAR(*answered.star.luminosity->measured.plus, 0.14, 1e-12);
}

TEST(AssumedErrors, OfAnEccentricityAreAbsolute) {
  ListRow row = earth();
  row.planet.eccentricity = value(0.3);
  const Answer answered = answer(row, settings_of());
  EXPECT_TRUE(has_flag(answered, "assumed_error:eccentricity"));
  EXPECT_DOUBLE_EQ(answered.input->eccentricity.plus(), 0.05);
}

TEST(AssumedErrors, AUsersOwnIsTaken) {
  Settings settings = settings_of();
  settings.assumed_errors[Quantity::luminosity] = 0.3;
  EXPECT_DOUBLE_EQ(*luminosity_of(value(2), settings).plus, 0.6);
}

// ---- given half-widths --------------------------------------------------------------------------------------------

TEST(HalfWidths, OneGivenServesBothSides) {
  EXPECT_EQ(luminosity_of(value(1, {}, 0.1)).minus, 0.1);
  EXPECT_EQ(luminosity_of(value(1, 0.2, {})).plus, 0.2);
}

TEST(HalfWidths, AZeroBesideAPositiveOneStaysAZero) {
  const Measured up = luminosity_of(value(1, 0, 0.16));
  EXPECT_EQ(up.minus, 0);
  EXPECT_EQ(up.plus, 0.16);
  ListRow row = earth();
  row.star.luminosity = value(1, 0, 0.16);
  const Answer answered = answer(row, settings_of());
  EXPECT_EQ(answered.input->terms.front().x.below(1), 0);
  EXPECT_FALSE(has_flag_like(answered, "assumed_error"));
}

TEST(HalfWidths, TypedValuesAreExact) {
  const Answer answered = answer(earth(), settings_of());
  EXPECT_TRUE(answered.flags.empty()) << ::testing::PrintToString(answered.flags);
  EXPECT_TRUE(answered.input->teff.is_exact());
  EXPECT_TRUE(answered.input->planet_mass.is_exact());
  for (const InsolationTerm& term : answered.input->terms) EXPECT_TRUE(term.x.is_exact());
  EXPECT_EQ(answered.planet->insolation.measured.plus, 0);
}

TEST(HalfWidths, LargerThanTheValueStillMakeADistribution) {
  ListRow row = earth();
  row.star.luminosity = value(0.1, 0.5, 0.5);
  row.planet.semi_major_axis = value(0.3, 0.4, 0.4);
  const Probabilities p = answer(row, settings_of()).planet->probabilities;
  EXPECT_NEAR(*p.too_hot + *p.optimistic + *p.too_cold + p.unanswered, 1, 1e-9);
  EXPECT_GT(*p.too_hot, 0.1);
  EXPECT_GT(*p.too_cold, 0.1);
}

TEST(HalfWidths, AsymmetryIsTheUsersChoice) {
  ListRow row = earth();
  row.star.luminosity = value(1, 0.05, 0.2);
  Settings settings = settings_of();
  EXPECT_NEAR(answer(row, settings).input->terms.front().x.below(1), 0.5, 1e-12);
  settings.asymmetry = Asymmetry::mode;
  EXPECT_NEAR(answer(row, settings).input->terms.front().x.below(1), 0.2, 1e-12);
}

// ---- eccentricity -------------------------------------------------------------------------------------------------

TEST(Eccentricity, MissingIsCircularAndFlagged) {
  ListRow row = earth();
  row.planet.eccentricity = {};
  const Answer answered = answer(row, settings_of());
  EXPECT_TRUE(has_flag(answered, "circular_assumed"));
  EXPECT_TRUE(answered.input->eccentricity.is_exact());
  EXPECT_EQ(answered.planet->insolation.measured.value, 1);
}

TEST(Eccentricity, UpperLimitIsAHalfNormalWith95PerCentBelowIt) {
  ListRow row = earth();
  row.planet.eccentricity = below(0.3);
  const Answer answered = answer(row, settings_of());
  EXPECT_TRUE(has_flag(answered, "eccentricity_limit"));
  EXPECT_FALSE(has_flag(answered, "circular_assumed"));
  EXPECT_NEAR(answered.input->eccentricity.below(0.3), 0.95, 1e-9);
  EXPECT_EQ(answered.planet->insolation.measured.value, 1);  // central value: circular
  EXPECT_GT(*answered.planet->insolation.measured.plus, 0);
}

TEST(Eccentricity, LowerLimitIsIgnored) {
  ListRow row = earth();
  row.planet.eccentricity = above(0.1);
  const Answer answered = answer(row, settings_of());
  EXPECT_TRUE(has_flag(answered, "limit_ignored:eccentricity"));
  EXPECT_TRUE(has_flag(answered, "circular_assumed"));
  EXPECT_EQ(answered.planet->insolation.measured.value, 1);
}

TEST(Eccentricity, UnboundOrbitsSetTheRowAside) {
  for (const double e : {1.0, 1.7, -0.01}) {
    for (const Field& field : {value(e), exactly(e), below(e)}) {
      ListRow row = earth();
      row.planet.eccentricity = field;
      const Answer answered = answer(row, settings_of());
      EXPECT_EQ(answered.status, Status::set_aside) << e;
      EXPECT_EQ(answered.reason_kind, "eccentricity out of range");
      EXPECT_THAT(answered.reason, HasSubstr("0 <= eccentricity < 1"));
    }
  }
}

TEST(Eccentricity, IsNotAskedForBesideAnAveragedInsolation) {
  ListRow row = bare_earth();
  row.planet.insolation = exactly(1);
  row.planet.eccentricity = unreadable("eccentricity");
  const Answer answered = answer(row, settings_of());
  EXPECT_EQ(answered.status, Status::answered) << answered.reason;
  row.planet.eccentricity = {};
  EXPECT_FALSE(has_flag(answer(row, settings_of()), "circular_assumed"));
}

// ---- what sets a row aside ----------------------------------------------------------------------------------------

struct FieldCase {
  const char* name;
  FieldOf field;
  bool bare = false;  // consulted only where luminosity and orbit are not stated
};

const FieldCase consulted[] = {
    {"teff", [](ListRow& r) -> Field& { return r.star.teff; }},
    {"luminosity", [](ListRow& r) -> Field& { return r.star.luminosity; }},
    {"semi_major_axis", [](ListRow& r) -> Field& { return r.planet.semi_major_axis; }},
    {"planet_mass", [](ListRow& r) -> Field& { return r.planet.planet_mass; }},
    {"stellar_radius", [](ListRow& r) -> Field& { return r.star.stellar_radius; }, true},
    {"stellar_mass", [](ListRow& r) -> Field& { return r.star.stellar_mass; }, true},
    {"orbital_period", [](ListRow& r) -> Field& { return r.planet.orbital_period; }, true},
};

ListRow row_of(const FieldCase& c) {
  if (!c.bare) return earth();
  ListRow row = bare_earth();
  row.star.stellar_radius = exactly(1);
  row.star.stellar_mass = exactly(1);
  row.planet.orbital_period = exactly(365.25);
  return row;
}

class Consulted : public ::testing::TestWithParam<FieldCase> {};

TEST_P(Consulted, UnreadableSetsTheRowAsideWithItsColumn) {
  ListRow row = row_of(GetParam());
  ASSERT_EQ(answer(row, settings_of()).status, Status::answered);
  GetParam().field(row) = unreadable(GetParam().name);
  const Answer answered = answer(row, settings_of());
  EXPECT_EQ(answered.status, Status::set_aside);
  EXPECT_EQ(answered.reason_kind, std::string("unreadable ") + GetParam().name);
  EXPECT_THAT(answered.reason, HasSubstr("4553+15-"));
  EXPECT_FALSE(answered.planet);
}

TEST_P(Consulted, NotAboveZeroSetsTheRowAsideWithItsColumn) {
  for (const double x : {0.0, -1.0}) {
    for (const Field& field : {value(x), exactly(x), value(x, 0.1, 0.1)}) {
      ListRow row = row_of(GetParam());
      GetParam().field(row) = field;
      const Answer answered = answer(row, settings_of());
      EXPECT_EQ(answered.status, Status::set_aside);
      EXPECT_EQ(answered.reason_kind, std::string(GetParam().name) + " out of range");
      EXPECT_THAT(answered.reason, HasSubstr(GetParam().name));
      EXPECT_FALSE(answered.planet);
    }
  }
}

INSTANTIATE_TEST_SUITE_P(Fields, Consulted, ::testing::ValuesIn(consulted),
                         [](const auto& instance) { return std::string(instance.param.name); });

TEST(NotConsulted, UnreadableCellsDoNoHarm) {
  ListRow row = earth();
  row.star.stellar_mass = exactly(1);
  row.planet.orbital_period = exactly(365.25);
  row.star.stellar_radius = unreadable("stellar_radius");      // L is stated
  row.planet.semi_major_axis = unreadable("semi_major_axis");  // a follows from the period
  row.planet.scaled_semi_major_axis = unreadable("scaled_semi_major_axis");
  row.planet.insolation = unreadable("insolation");
  row.planet.planet_radius = unreadable("planet_radius");  // the mass is stated
  row.planet.min_mass = unreadable("min_mass");
  row.star.log_g = unreadable("log_g");
  row.star.distance = unreadable("distance");
  const Answer answered = answer(row, settings_of());
  EXPECT_EQ(answered.status, Status::answered) << answered.reason;
  EXPECT_FALSE(has_flag_like(answered, "inconsistent"));
}

TEST(SetAside, ARowThatCouldNotBeReadKeepsItsReason) {
  ListRow row;
  row.problem = Problem{ProblemCode::unreadable, "", "the row has 3 cells and the header 5"};
  const Answer answered = answer(row, settings_of());
  EXPECT_EQ(answered.status, Status::set_aside);
  EXPECT_EQ(answered.reason, "the row has 3 cells and the header 5");
  EXPECT_EQ(answered.reason_kind, "unreadable row");
  row.planet.name = "b";
  EXPECT_EQ(answer(row, settings_of()).reason_kind, "unreadable row");
}

TEST(SetAside, TeffThatIsOnlyALimitOrMissing) {
  ListRow row = earth();
  row.star.teff = below(3000);
  EXPECT_EQ(answer(row, settings_of()).reason_kind, "teff is only a limit");
  row.star.teff = {};
  EXPECT_EQ(answer(row, settings_of()).reason_kind, "no teff");
  EXPECT_EQ(answer(row, settings_of()).status, Status::set_aside);
}

TEST(SetAside, NothingThatGivesTheLightOrTheOrbit) {
  ListRow row = earth();
  row.star.luminosity = {};
  EXPECT_EQ(answer(row, settings_of()).reason_kind, "no luminosity");
  row = earth();
  row.planet.semi_major_axis = {};
  EXPECT_EQ(answer(row, settings_of()).reason_kind, "no semi_major_axis");
}

TEST(SetAside, AnOnlyLimitIsNamed) {
  ListRow row = earth();
  row.star.luminosity = below(0.01);
  Answer answered = answer(row, settings_of());
  EXPECT_EQ(answered.status, Status::set_aside);
  EXPECT_EQ(answered.reason_kind, "luminosity is only a limit");
  row = earth();
  row.planet.semi_major_axis = above(3);
  answered = answer(row, settings_of());
  EXPECT_EQ(answered.reason_kind, "semi_major_axis is only a limit");
  row = bare_earth();
  row.planet.insolation = below(2);
  EXPECT_EQ(answer(row, settings_of()).reason_kind, "insolation is only a limit");
}

}  // namespace
}  // namespace hz
