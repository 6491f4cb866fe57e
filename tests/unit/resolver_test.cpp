// Which way the resolver takes, what it refuses, and what it says of it.
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"

namespace hz {
namespace {

using testing::above;
using testing::below;
using testing::exactly;
using testing::has_flag;
using ::testing::HasSubstr;
using testing::settings_of;
using testing::unreadable;
using testing::value;

Answer star_answer(const StarRecord& star, const Settings& settings = settings_of()) {
  ListRow row;
  row.star = star;
  return answer_star(row, settings);
}

std::string route_of(const std::optional<Derived>& derived) { return derived ? derived->route : "none"; }

/// An M dwarf at 10 pc by V, J, Ks: M2V to M2.5V of the table.
StarRecord m_dwarf() {
  StarRecord star;
  star.magnitude_v = value(10.3, 0.02, 0.02);
  star.magnitude_k = value(6.05, 0.02, 0.02);
  star.parallax = value(100, 0.1, 0.1);
  return star;
}

// ---- order of preference ------------------------------------------------------------------------------------------

/// Takes one thing after the other away from a star that says everything.
TEST(TeffOrder, IsThatOfTheTable) {
  StarRecord star = m_dwarf();
  star.teff = exactly(3500);
  star.luminosity = exactly(0.03);
  star.stellar_radius = exactly(0.45);
  star.magnitude_j = value(6.9, 0.02, 0.02);
  star.magnitude_bp = value(10.5, 0.01, 0.01);
  star.magnitude_rp = value(8.2, 0.01, 0.01);
  star.magnitude_b = value(11.8, 0.02, 0.02);
  star.spectral_type = "M2V";
  star.stellar_mass = value(0.45, 0.02, 0.02);
  const auto route = [&star] { return route_of(star_answer(star).star.teff); };
  EXPECT_EQ(route(), "stated");
  star.teff = {};
  EXPECT_EQ(route(), "luminosity and stellar_radius");
  star.stellar_radius = {};
  EXPECT_EQ(route(), "magnitude_v and magnitude_k by Teff(V-Ks)");
  star.magnitude_k = {};
  EXPECT_EQ(route(), "magnitude_v and magnitude_j by Teff(V-J)");
  star.magnitude_j = {};
  EXPECT_EQ(route(), "magnitude_bp and magnitude_rp by Teff(BP-RP)");
  star.magnitude_bp = {};
  EXPECT_EQ(route(), "spectral_type by Teff(type)");
  star.spectral_type = {};
  EXPECT_EQ(route(), "magnitude_b and magnitude_v by Teff(B-V)");
  star.magnitude_b = {};
  star.magnitude_v = {};
  star.magnitude_k = value(6.05, 0.02, 0.02);
  EXPECT_EQ(route(), "magnitude_k and parallax by Teff(M_Ks)");
  star.parallax = {};
  EXPECT_EQ(route(), "stellar_mass by Teff(mass)");
  star.stellar_mass = {};
  EXPECT_EQ(route(), "none");
}

TEST(LuminosityOrder, IsThatOfTheTable) {
  StarRecord star = m_dwarf();
  star.teff = exactly(3500);
  star.luminosity = exactly(0.03);
  star.log_luminosity = exactly(-1.5);
  star.stellar_radius = exactly(0.45);
  star.magnitude_bol = exactly(8.6);
  star.magnitude_j = value(6.9, 0.02, 0.02);
  star.magnitude_g = value(9.4, 0.01, 0.01);
  star.spectral_type = "M2V";
  star.stellar_mass = value(0.45, 0.02, 0.02);
  const auto route = [&star] { return route_of(star_answer(star).star.luminosity); };
  EXPECT_EQ(route(), "stated");
  star.luminosity = {};
  EXPECT_EQ(route(), "stated logarithm");
  star.log_luminosity = {};
  EXPECT_EQ(route(), "stellar_radius and teff");
  star.stellar_radius = {};
  EXPECT_EQ(route(), "magnitude_bol and parallax");
  star.magnitude_bol = {};
  EXPECT_EQ(route(), "magnitude_v, parallax and BC_V(V-Ks)");
  star.magnitude_k = {};
  EXPECT_EQ(route(), "magnitude_j, parallax and BC_J(V-J)");
  star.magnitude_j = {};
  EXPECT_EQ(route(), "magnitude_g, parallax and BC_G(Teff)");
  star.magnitude_g = {};
  EXPECT_EQ(route(), "magnitude_v, parallax and BC_V(Teff)");
  star.magnitude_v = {};
  star.magnitude_k = value(6.05, 0.02, 0.02);
  EXPECT_EQ(route(), "magnitude_k and parallax by R(M_Ks) and teff");
  star.parallax = {};
  EXPECT_EQ(route(), "spectral_type by L(type)");
  star.spectral_type = {};
  EXPECT_EQ(route(), "stellar_mass by L(mass)");
  star.stellar_mass = {};
  EXPECT_EQ(route(), "none");
}

TEST(LuminosityOrder, VComesBeforeGOnHotStars) {
  StarRecord star;
  star.teff = exactly(5700);
  star.magnitude_v = value(6, 0.01, 0.01);
  star.magnitude_k = value(4.4, 0.01, 0.01);
  star.magnitude_g = value(5.85, 0.01, 0.01);
  star.distance = exactly(15);
  EXPECT_EQ(route_of(star_answer(star).star.luminosity), "magnitude_v, distance and BC_V(Teff)");
  star.magnitude_v = {};
  EXPECT_EQ(route_of(star_answer(star).star.luminosity), "magnitude_g, distance and BC_G(Teff)");
}

TEST(LuminosityOrder, PhotometryCanBePutFirst) {
  StarRecord star = m_dwarf();
  star.luminosity = exactly(0.03);
  Settings settings = settings_of();
  settings.luminosity_from = LuminosityFrom::photometry;
  EXPECT_EQ(route_of(star_answer(star, settings).star.luminosity), "magnitude_v, parallax and BC_V(V-Ks)");
  star.parallax = {};
  EXPECT_EQ(route_of(star_answer(star, settings).star.luminosity), "stated");
}

TEST(MassOrder, IsThatOfTheTable) {
  StarRecord star = m_dwarf();
  star.stellar_mass = exactly(0.45);
  star.stellar_radius = exactly(0.44);
  star.stellar_density = exactly(7.5);
  star.log_g = exactly(4.8);
  const auto route = [&star] { return route_of(star_answer(star).star.stellar_mass); };
  EXPECT_EQ(route(), "stated");
  star.stellar_mass = {};
  EXPECT_EQ(route(), "magnitude_k and parallax by M(M_Ks)");
  star.teff = exactly(3500);
  star.parallax = {};
  EXPECT_EQ(route(), "stellar_density and stellar_radius");
  star.stellar_density = {};
  EXPECT_EQ(route(), "luminosity by mass(L)");
  star.spectral_type = "M2III";  // only what needs no dwarf
  EXPECT_EQ(route(), "log_g and stellar_radius");
}

TEST(DistanceOrder, StatedComesBeforeTheParallax) {
  StarRecord star = m_dwarf();
  star.distance = exactly(12);
  EXPECT_EQ(star_answer(star).star.distance->measured.value, 12);
  star.distance = below(50);
  EXPECT_NEAR(star_answer(star).star.distance->measured.value, 10, 1e-12);
}

TEST(Colour, MagnitudesComeBeforeAStatedColour) {
  StarRecord star = m_dwarf();
  star.color_vk = value(3.5, 0.02, 0.02);
  EXPECT_EQ(route_of(star_answer(star).star.teff), "magnitude_v and magnitude_k by Teff(V-Ks)");
  star.magnitude_k = {};
  EXPECT_EQ(route_of(star_answer(star).star.teff), "color_vk by Teff(V-Ks)");
}

// ---- off the main sequence ----------------------------------------------------------------------------------------

TEST(OffMainSequence, WhiteDwarfsAndGiantsGetNothingFromARelation) {
  for (const auto& [type, kind] :
       {std::pair{"DA2", "a white dwarf"}, {"G8III", "a giant"}, {"sdM1", "a subdwarf"}, {"K1IV", "a subgiant"}}) {
    StarRecord star = m_dwarf();
    star.stellar_mass = exactly(0.5);
    star.spectral_type = type;
    const Answer answered = star_answer(star);
    EXPECT_EQ(answered.reason_kind, "no teff") << type;
    EXPECT_THAT(answered.reason, HasSubstr(std::string(kind) + " (" + type + ")"));
    EXPECT_FALSE(answered.star.teff) << type;
    EXPECT_TRUE(answered.limits.empty()) << type;
  }
}

TEST(OffMainSequence, StatedValuesStillServe) {
  for (const char* const type : {"DA2", "G8III"}) {
    StarRecord star;
    star.spectral_type = type;
    star.teff = exactly(5000);
    star.luminosity = exactly(40);
    EXPECT_EQ(star_answer(star).status, Status::answered) << type;
  }
}

/// BC_V by Flower and BC_G hold for giants too, but no correction does for a white dwarf.
TEST(OffMainSequence, CorrectionsThatAreNotOfDwarfsAloneServeGiants) {
  StarRecord star;
  star.teff = exactly(5000);
  star.magnitude_v = value(6, 0.01, 0.01);
  star.distance = exactly(100);
  star.spectral_type = "G8III";
  const Answer giant = star_answer(star);
  EXPECT_EQ(route_of(giant.star.luminosity), "magnitude_v, distance and BC_V(Teff)");
  EXPECT_FALSE(has_flag(giant, "main_sequence_assumed"));
  EXPECT_TRUE(has_flag(giant, "evolved"));
  star.spectral_type = "DA2";
  EXPECT_EQ(star_answer(star).reason_kind, "no luminosity");
}

TEST(OffMainSequence, SurfaceGravityTellsToo) {
  StarRecord star = m_dwarf();
  star.log_g = value(3.2, 0.1, 0.1);
  const Answer answered = star_answer(star);
  EXPECT_EQ(answered.reason_kind, "no teff");
  EXPECT_THAT(answered.reason, HasSubstr("log g 3.20"));
  star.log_g = value(4.0, 0.1, 0.1);
  EXPECT_EQ(star_answer(star).status, Status::answered);
  star.log_g = below(3.5);  // a limit tells nothing
  EXPECT_EQ(star_answer(star).status, Status::answered);
}

/// A white dwarf of V 15 at 10 pc, of the colour of an F star, and of no stated type.
TEST(OffMainSequence, ABlueFaintStarIsGivenAwayByItsSize) {
  StarRecord star;
  star.magnitude_v = value(15, 0.02, 0.02);
  star.color_bv = value(0.4, 0.02, 0.02);
  star.parallax = value(100, 0.1, 0.1);
  const Answer answered = star_answer(star);
  EXPECT_EQ(answered.status, Status::set_aside);
  EXPECT_EQ(answered.reason_kind, "luminosity out of range");
  EXPECT_THAT(answered.reason, HasSubstr("white dwarf"));
}

/// Source: Pecaut & Mamajek 2013: a star of 5770 K on the main sequence has 1.012 solar radii.
TEST(OffMainSequence, FortyPerCentOfTheMainSequenceIsTheLeast) {
  StarRecord star;
  star.color_bv = exactly(0.65);
  const double teff = star_answer(star).star.teff->measured.value;
  const double radius = 1.012 + (teff - 5770) / 90 * 0.048;  // G1V: 5860 K, 1.060
  for (const double share : {0.39, 0.41}) {
    star.luminosity = exactly(std::pow(share * radius, 2) * std::pow(teff / 5772, 4));
    EXPECT_EQ(star_answer(star).status, share < 0.4 ? Status::set_aside : Status::answered) << share;
  }
  star.teff = exactly(teff);  // what is measured is not doubted
  star.luminosity = exactly(1e-3);
  EXPECT_EQ(star_answer(star).status, Status::answered);
}

// ---- flags and cells ----------------------------------------------------------------------------------------------

TEST(MainSequenceFlag, IsRaisedByRelationsOfDwarfsAlone) {
  StarRecord star;
  star.spectral_type = "K5V";
  EXPECT_TRUE(has_flag(star_answer(star), "main_sequence_assumed"));
  star.teff = exactly(4400);
  star.luminosity = exactly(0.17);
  EXPECT_FALSE(has_flag(star_answer(star), "main_sequence_assumed"));
  star.luminosity = {};
  star.magnitude_g = value(10, 0.01, 0.01);  // BC_G holds for giants as well
  star.distance = exactly(30);
  EXPECT_FALSE(has_flag(star_answer(star), "main_sequence_assumed"));
}

/// A row answered inside, with a second star that only the list knows of.
TEST(CompanionFlag, ACloseOneLeavesNoVerdictFirm) {
  ListRow row = testing::earth();
  row.planet.semi_major_axis = exactly(1.2);
  row.star.distance = exactly(10);
  EXPECT_EQ(answer(row, settings_of()).planet->conservative, Verdict::inside);
  row.star.companion_separation = exactly(5);  // 50 au, against ten times an outer limit of 1.8 au
  Answer answered = answer(row, settings_of());
  EXPECT_TRUE(has_flag(answered, "companion"));
  EXPECT_FALSE(has_flag(answered, "close_companion"));
  EXPECT_EQ(answered.planet->conservative, Verdict::inside);
  row.star.companion_separation = exactly(1.5);  // 15 au
  answered = answer(row, settings_of());
  EXPECT_TRUE(has_flag(answered, "close_companion"));
  EXPECT_EQ(answered.planet->conservative, Verdict::likely_inside);
  EXPECT_EQ(answered.planet->optimistic, Verdict::likely_inside);
  row.planet.semi_major_axis = exactly(3);
  EXPECT_EQ(answer(row, settings_of()).planet->conservative, Verdict::likely_outside);
}

TEST(Cells, UnreadableOnesSetTheRowAsideWhereTheyAreConsulted) {
  StarRecord star = m_dwarf();
  star.magnitude_g = unreadable("magnitude_g");
  star.magnitude_bp = unreadable("magnitude_bp");
  star.color_bv = unreadable("color_bv");
  star.stellar_density = unreadable("stellar_density");
  EXPECT_EQ(star_answer(star).status, Status::answered) << star_answer(star).reason;
  star.magnitude_k = unreadable("magnitude_k");
  EXPECT_EQ(star_answer(star).reason_kind, "unreadable magnitude_k");
  star = m_dwarf();
  star.parallax = unreadable("parallax");
  EXPECT_EQ(star_answer(star).reason_kind, "unreadable parallax");
  star.distance = exactly(10);
  EXPECT_EQ(star_answer(star).status, Status::answered);
  star.extinction_v = unreadable("extinction_v");
  EXPECT_EQ(star_answer(star).reason_kind, "unreadable extinction_v");
}

/// Radius, mass and distance of a star whose light and Teff are stated are for show.
TEST(Cells, ALookAtWhatIsOnlyShownRaisesNothing) {
  StarRecord star;
  star.teff = exactly(5772);
  star.luminosity = exactly(1);
  star.stellar_radius = value(1.02);  // without an error
  star.stellar_mass = unreadable("stellar_mass");
  star.parallax = value(1, 0.3, 0.3);  // would need the prior
  star.magnitude_k = value(10, 0.02, 0.02);
  star.magnitude_v = above(11);  // only a limit
  const Answer answered = star_answer(star);
  EXPECT_EQ(answered.status, Status::answered) << answered.reason;
  EXPECT_TRUE(answered.flags.empty()) << answered.flags.front();
  EXPECT_EQ(answered.star.stellar_radius->measured.value, 1.02);
  EXPECT_TRUE(answered.star.distance);
}

}  // namespace
}  // namespace hz
