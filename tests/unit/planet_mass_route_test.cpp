// Which planet mass moves the inner edge, and what is flagged about it.
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"

namespace hz {
namespace {

using testing::above;
using testing::below;
using testing::earth;
using testing::exactly;
using testing::has_flag;
using testing::settings_of;
using testing::value;

/// What a row says of the planet's mass.
struct Says {
  Field planet_radius = {};
  Field planet_mass = {};
  Field min_mass = {};
  Field inclination = {};
  PlanetMassKind planet_mass_kind = PlanetMassKind::unsaid;
};

Answer with(const Says& says, std::string_view set = default_limit_set) {
  ListRow row = earth();
  row.planet.planet_mass = says.planet_mass;
  row.planet.min_mass = says.min_mass;
  row.planet.inclination = says.inclination;
  row.planet.planet_radius = says.planet_radius;
  row.planet.planet_mass_kind = says.planet_mass_kind;
  Answer result = answer(row, settings_of(set));
  EXPECT_EQ(result.status, Status::answered) << result.reason;
  return result;
}

double mass(const Answer& a) { return a.planet->planet_mass.measured.value; }

TEST(PlanetMassRoute, StatedComesFirst) {
  const Answer a = with({.planet_radius = exactly(2), .planet_mass = exactly(3), .min_mass = exactly(2.5)});
  EXPECT_EQ(mass(a), 3);
  EXPECT_EQ(a.planet->planet_mass.route, "stated");
  EXPECT_FALSE(has_flag(a, "min_mass_used"));
  EXPECT_FALSE(has_flag(a, "mass_from_radius"));
}

TEST(PlanetMassRoute, MinimumComesNextAndIsFlagged) {
  const Answer a = with({.planet_radius = exactly(2), .min_mass = exactly(2.5)});
  // 1 / sin i of an isotropic inclination has the median 2 / sqrt 3, its 16 and 84 per cent points are 1.01283 and
  // 1.85014 (P(sin i < s) = 1 - sqrt(1 - s^2)).
  EXPECT_NEAR(mass(a), 2.5 * 2 / std::sqrt(3.0), 2e-6);
  EXPECT_NEAR(*a.planet->planet_mass.measured.minus, 2.5 * (2 / std::sqrt(3.0) - 1.01283), 1e-4);
  EXPECT_NEAR(*a.planet->planet_mass.measured.plus, 2.5 * (1.85014 - 2 / std::sqrt(3.0)), 1e-4);
  EXPECT_TRUE(has_flag(a, "min_mass_used"));
}

TEST(PlanetMassRoute, AStatedInclinationSettlesAMinimumMass) {
  const Answer a = with({.min_mass = value(2.5, 0.1, 0.1), .inclination = value(60, 3, 3)});
  EXPECT_NEAR(mass(a), 2.5 / std::sin(60 * std::acos(-1) / 180), 1e-9);
  EXPECT_EQ(a.planet->planet_mass.route, "min_mass and inclination");
  EXPECT_FALSE(has_flag(a, "min_mass_used"));
  // First order: d ln M = 0.04 (+) cot i di.
  const double relative = std::hypot(0.04, 3 * std::acos(-1) / 180 / std::tan(60 * std::acos(-1) / 180));
  EXPECT_NEAR(a.input->planet_mass.plus(), relative / std::log(10), 1e-9);
}

TEST(PlanetMassRoute, RadiusComesNextWithItsScatter) {
  const Answer a = with({.planet_radius = exactly(1.008)});  // 1 Earth mass by Chen & Kipping 2017
  EXPECT_NEAR(mass(a), 1, 1e-9);
  EXPECT_TRUE(has_flag(a, "mass_from_radius"));
  EXPECT_TRUE(a.input->planet_mass_decadic);
  EXPECT_NEAR(a.input->planet_mass.plus(), 0.0403 / 0.279 / std::log(10), 1e-9);
}

TEST(PlanetMassRoute, OneEarthMassIsAssumedInTheEnd) {
  const Answer a = with({});
  EXPECT_EQ(mass(a), 1);
  EXPECT_EQ(a.planet->planet_mass.route, "assumed");
  EXPECT_TRUE(has_flag(a, "planet_mass_assumed"));
  EXPECT_FALSE(has_flag(a, "beyond_planet_mass"));
}

TEST(PlanetMassRoute, KindOfMassIsHonoured) {
  const Answer minimum = with({.planet_mass = exactly(3), .planet_mass_kind = PlanetMassKind::minimum});
  EXPECT_NEAR(mass(minimum), 3 * 2 / std::sqrt(3.0), 3e-6);
  EXPECT_TRUE(has_flag(minimum, "min_mass_used"));
  const Answer measured = with({.planet_mass = exactly(3), .planet_mass_kind = PlanetMassKind::measured});
  EXPECT_FALSE(has_flag(measured, "min_mass_used"));
}

TEST(PlanetMassRoute, AListsOwnMassFromTheRadiusYieldsToOurs) {
  const Answer ours = with(
      {.planet_radius = exactly(1.008), .planet_mass = exactly(3), .planet_mass_kind = PlanetMassKind::from_radius});
  EXPECT_NEAR(mass(ours), 1, 1e-9);
  EXPECT_TRUE(has_flag(ours, "mass_from_radius"));
  const Answer theirs = with({.planet_mass = exactly(3), .planet_mass_kind = PlanetMassKind::from_radius});
  EXPECT_EQ(mass(theirs), 3);
  EXPECT_TRUE(has_flag(theirs, "mass_from_radius"));
  EXPECT_EQ(theirs.planet->planet_mass.route, "stated, from a radius");
}

TEST(PlanetMassRoute, ALimitNeverMovesTheInnerEdge) {
  for (const Field& limit : {below(3), above(3), below(1000)}) {
    const Answer a = with({.planet_mass = limit});
    EXPECT_EQ(mass(a), 1);
    EXPECT_TRUE(has_flag(a, "planet_mass_assumed"));
    EXPECT_EQ(find_edge(a, ZoneEdge::conservative_inner)->insolation,
              find_edge(with({}), ZoneEdge::conservative_inner)->insolation);
  }
}

TEST(PlanetMassRoute, ALimitThatLeavesItOutsideTheFitsIsFlagged) {
  EXPECT_TRUE(has_flag(with({.planet_mass = below(1000)}), "beyond_planet_mass"));
  EXPECT_TRUE(has_flag(with({.min_mass = below(1000)}), "beyond_planet_mass"));
  EXPECT_TRUE(has_flag(with({.planet_mass = above(8)}), "beyond_planet_mass"));
  EXPECT_TRUE(has_flag(with({.planet_radius = below(12)}), "beyond_planet_mass"));
  EXPECT_FALSE(has_flag(with({.planet_mass = below(4)}), "beyond_planet_mass"));
  EXPECT_FALSE(has_flag(with({.planet_radius = below(1.5)}), "beyond_planet_mass"));
}

TEST(PlanetMassRoute, ALimitBesideARadiusDoesNotCount) {
  const Answer a = with({.planet_radius = exactly(1.3), .planet_mass = below(35)});
  EXPECT_FALSE(has_flag(a, "beyond_planet_mass"));
  EXPECT_TRUE(has_flag(a, "mass_from_radius"));
  EXPECT_TRUE(has_flag(a, "limit_ignored:planet_mass"));
  EXPECT_TRUE(has_flag(with({.planet_mass = below(35)}), "beyond_planet_mass"));
}

TEST(PlanetMassRoute, CentralMassDecidesWhetherItIsBeyondTheFits) {
  EXPECT_FALSE(has_flag(with({.planet_mass = exactly(5)}), "beyond_planet_mass"));
  EXPECT_TRUE(has_flag(with({.planet_mass = exactly(5.001)}), "beyond_planet_mass"));
  EXPECT_FALSE(has_flag(with({.planet_mass = exactly(0.1)}), "beyond_planet_mass"));
  EXPECT_TRUE(has_flag(with({.planet_mass = exactly(0.099)}), "beyond_planet_mass"));
  EXPECT_FALSE(has_flag(with({.planet_mass = value(4.9, 1, 1)}), "beyond_planet_mass"));
  EXPECT_TRUE(has_flag(with({.planet_radius = exactly(11)}), "beyond_planet_mass"));
}

TEST(PlanetMassRoute, SetsWithoutPlanetMassAreJudgedAlike) {
  EXPECT_TRUE(has_flag(with({.planet_mass = exactly(300)}, "K13ERR"), "beyond_planet_mass"));
  EXPECT_FALSE(has_flag(with({.planet_mass = exactly(3)}, "K13ERR"), "beyond_planet_mass"));
}

// Source: Kopparapu et al. 2014, ApJL 787, L29: runaway greenhouse of the Sun at 0.1, 1 and 5 Earth masses.
TEST(PlanetMassRoute, MovesTheInnerEdgeAlone) {
  const auto inner = [](double m) {
    ListRow row = earth();
    row.star.teff = exactly(5780);
    row.planet.planet_mass = exactly(m);
    return find_edge(answer(row, settings_of()), ZoneEdge::conservative_inner)->insolation;
  };
  EXPECT_DOUBLE_EQ(inner(0.1), 0.99);
  EXPECT_DOUBLE_EQ(inner(1), 1.107);
  EXPECT_DOUBLE_EQ(inner(5), 1.188);
  EXPECT_DOUBLE_EQ(inner(300), 1.188);                           // held
  EXPECT_NEAR(inner(std::sqrt(5)), (1.107 + 1.188) / 2, 1e-12);  // linear in S against ln(planet mass)
  const auto outer = [](double m) {
    return find_edge(with({.planet_mass = exactly(m)}), ZoneEdge::conservative_outer)->insolation;
  };
  EXPECT_EQ(outer(0.1), outer(5));
}

}  // namespace
}  // namespace hz
