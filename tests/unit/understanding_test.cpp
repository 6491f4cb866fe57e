#include "hz/table/understanding.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "list_files.hpp"

namespace hz {
namespace {

using ::testing::ElementsAre;
using ::testing::HasSubstr;

TableHead head_of(const std::vector<std::string>& names, std::vector<std::string> comments = {}) {
  TableHead head;
  head.source = "list.csv";
  for (const auto& name : names) head.columns.push_back({name, {}, {}, {}});
  head.comments = std::move(comments);
  return head;
}

// "teff_err [K] words", or "-" when the column is not used; "?" in front of an assumed unit.
std::vector<std::string> meanings(const TableHead& head, const ColumnMap& map = {}) {
  const auto understanding = Understanding::draft(head, map);
  std::vector<std::string> out(head.columns.size(), "-");
  for (const auto& column : understanding.columns()) {
    out[column.column] = canonical_name(column.quantity, column.part) + " [" + (column.unit_assumed ? "?" : "") +
                         column.unit + "] " + std::string(text(column.known_by));
  }
  return out;
}

std::string meaning(const std::string& header) { return meanings(head_of({header}))[0]; }

std::string refusal(const std::vector<std::string>& names, const ColumnMap& map = {}) {
  return testing::error_of([&] { (void)Understanding::of(head_of(names), map); });
}

TEST(Understanding, CanonicalNamesWithTheirParts) {
  EXPECT_THAT(
      meanings(head_of({"teff", "teff_err", "luminosity [Lsun]", "luminosity_err_plus", "luminosity_err_minus",
                        "semi_major_axis", "semi_major_axis_lower", "semi_major_axis_upper", "semi_major_axis_limit",
                        "semi_major_axis_route"})),
      ElementsAre("teff [?K] name", "teff_err [?K] name", "luminosity [Lsun] name", "luminosity_err_plus [?Lsun] name",
                  "luminosity_err_minus [?Lsun] name", "semi_major_axis [?AU] name", "semi_major_axis_lower [?AU] name",
                  "semi_major_axis_upper [?AU] name", "semi_major_axis_limit [] name",
                  "semi_major_axis_route [] name"));
}

TEST(Understanding, EveryAcceptedSpellingMeansItsQuantity) {
  for (std::size_t i = 0; i <= static_cast<std::size_t>(Quantity::note); ++i) {
    const auto quantity = static_cast<Quantity>(i);
    for (const auto& spelling : info(quantity).accept) {
      EXPECT_THAT(meaning(spelling), ::testing::StartsWith(std::string(name(quantity)) + " [")) << spelling;
    }
  }
}

TEST(Understanding, HeadersAsPeopleWriteThem) {
  EXPECT_EQ(meaning("Teff [K]"), "teff [K] words");
  EXPECT_EQ(meaning("T_eff (K)"), "teff [K] words");
  EXPECT_EQ(meaning("Orbital Period (days)"), "orbital_period [days] words");
  EXPECT_EQ(meaning("PERIOD [yr]"), "orbital_period [yr] words");
  EXPECT_EQ(meaning("a (AU)"), "semi_major_axis [AU] words");
  EXPECT_EQ(meaning("R* [Rsun]"), "stellar_radius [Rsun] words");
  EXPECT_EQ(meaning("R⋆"), "stellar_radius [?solRad] words");
  EXPECT_EQ(meaning("M* [Msun]"), "stellar_mass [Msun] words");
  EXPECT_EQ(meaning("log(L/Lsun)"), "log_luminosity [?dex(solLum)] words");
  EXPECT_EQ(meaning("a/R*"), "scaled_semi_major_axis [] words");
  EXPECT_EQ(meaning("Mass [Msun]"), "stellar_mass [Msun] words");
  EXPECT_EQ(meaning("Mass (MJ)"), "planet_mass [MJ] words");
  EXPECT_EQ(meaning("Radius [R_earth]"), "planet_radius [R_earth] words");
  EXPECT_EQ(meaning("Rp [RJ]"), "planet_radius [RJ] words");
  EXPECT_EQ(meaning("Rp [mag]"), "magnitude_rp [mag] words");
  EXPECT_EQ(meaning("K [m/s]"), "rv_semi_amplitude [m/s] words");
  EXPECT_EQ(meaning("M sin i"), "min_mass [?earthMass] words");
  EXPECT_EQ(meaning("Mass*sin(i) [Jupiter Mass]"), "min_mass [Jupiter Mass] words");
  EXPECT_EQ(meaning("[Fe/H] (dex)"), "metallicity [dex] words");
  EXPECT_EQ(meaning("Distance [mas]"), "parallax [mas] words");
  EXPECT_EQ(meaning("Parallax (arcsec)"), "parallax [arcsec] words");
  EXPECT_EQ(meaning("rotation period"), "-");
  EXPECT_EQ(meaning("Δv mag"), "-");
  EXPECT_EQ(meaning("gmag"), "-");
}

TEST(Understanding, LogarithmIsToldByTheUnit) {
  EXPECT_EQ(meaning("Luminosity [log10(Lsun)]"), "log_luminosity [log10(Lsun)] words");
  EXPECT_THAT(meanings(head_of({"Luminosity [dex]", "Luminosity error"})),
              ElementsAre("log_luminosity [dex] words", "log_luminosity_err [?dex] words"));
  EXPECT_THAT(meanings(head_of({"Luminosity [Lsun]", "Luminosity error"})),
              ElementsAre("luminosity [Lsun] words", "luminosity_err [?Lsun] words"));
}

TEST(Understanding, BracketsMayBePartOfTheWords) {
  EXPECT_EQ(meaning("E(B-V)"), "reddening_bv [?mag] words");
  EXPECT_EQ(meaning("E(B-V) [mag]"), "reddening_bv [mag] words");
  EXPECT_THAT(refusal({"e (orbit)"}), HasSubstr("column \"e (orbit)\" may be eccentricity"));
}

TEST(Understanding, ParallaxIsToldByTheUnit) {
  EXPECT_THAT(meanings(head_of({"distance [mas]", "distance_err", "distance_limit"})),
              ElementsAre("parallax [mas] name", "parallax_err [?mas] name", "parallax_limit [] name"));
  EXPECT_THAT(meanings(head_of({"Distance [arcsec]", "e_Distance"})),
              ElementsAre("parallax [arcsec] words", "parallax_err [arcsec] words"));
  // A half-width in pc is none of a parallax, nor the other way round.
  EXPECT_THAT(meanings(head_of({"distance [mas]", "distance_err [pc]"})), ElementsAre("parallax [mas] name", "-"));
  EXPECT_THAT(meanings(head_of({"distance", "distance_err [mas]"})), ElementsAre("distance [?pc] name", "-"));
}

TEST(Understanding, HalfWidthsFollowWhatTheUnitTells) {
  EXPECT_THAT(meanings(head_of({"luminosity [dex]", "luminosity_err"})),
              ElementsAre("log_luminosity [dex] name", "log_luminosity_err [?dex] name"));
}

TEST(Understanding, HalfWidthSpellings) {
  for (const auto* const symmetric : {"Teff err", "Teff_error", "Teff uncertainty", "teff unc.", "sigma Teff",
                                      "err_Teff", "Teff std", "Teff sigma", "e_Teff", "Teff err [K]"}) {
    EXPECT_THAT(meanings(head_of({"Teff", symmetric}))[1], ::testing::StartsWith("teff_err [")) << symmetric;
  }
  for (const auto* const plus : {"Teff err plus", "Teff_err_up", "Teff Upper Error", "Teff upper unc.",
                                 "Teff_unc_upper", "Teff err hi", "Teff err pos"}) {
    EXPECT_THAT(meanings(head_of({"Teff", plus}))[1], ::testing::StartsWith("teff_err_plus [")) << plus;
  }
  for (const auto* const minus : {"Teff err minus", "Teff_err_down", "Teff Lower Error", "Teff Lower Unc. [K]",
                                  "Teff lower uncertainty", "Teff err lo", "Teff err neg"}) {
    EXPECT_THAT(meanings(head_of({"Teff", minus}))[1], ::testing::StartsWith("teff_err_minus [")) << minus;
  }
  EXPECT_THAT(
      meanings(head_of({"Teff", "Teff lower", "Teff p84", "Teff limit flag", "l_Teff"})),
      ElementsAre("teff [?K] words", "teff_lower [?K] words", "teff_upper [?K] words", "-", "-"));  // two marks compete
  EXPECT_THAT(meanings(head_of({"Teff", "e_Teff", "E_Teff"})),
              ElementsAre("teff [?K] words", "teff_err [?K] words", "teff_err_plus [?K] words"));
  EXPECT_THAT(meanings(head_of({"B-V", "e_B-V"})), ElementsAre("color_bv [?mag] words", "color_bv_err [?mag] words"));
  EXPECT_THAT(meanings(head_of({"R [Rsun]", "e_R"})),
              ElementsAre("stellar_radius [Rsun] words", "stellar_radius_err [Rsun] words"));
}

TEST(Understanding, PartsWithoutTheirValueAreNotUsed) { EXPECT_EQ(meaning("teff_err"), "-"); }

TEST(Understanding, DescriptionsInTheCommentBlock) {
  const auto head =
      head_of({"p1", "p2", "p3", "m", "mu", "ml", "mlim", "prov", "d", "du", "v", "x", "a1"},
              {"COLUMN p1:        Orbital Period [days]", "COLUMN p2: Orbital Period Upper Unc. [days]",
               "p3:Orbital Period Lower Unc. [days]", "COLUMN m:     Planet Mass or Mass*sin(i) [Earth Mass]",
               "COLUMN mu:  Planet Mass or Mass*sin(i) [Earth Mass] Upper Unc.",
               "COLUMN ml:  Planet Mass or Mass*sin(i) [Earth Mass] Lower Unc.",
               "COLUMN mlim: Planet Mass or Mass*sin(i) [Earth Mass] Limit Flag",
               "COLUMN prov: Planet Mass or Mass*sin(i) Provenance", "COLUMN d: Distance [pc]",
               "COLUMN du: Distance [pc] Upper Unc", "COLUMN v: V (Johnson) Magnitude", "CONSTRAINT: nothing about x",
               "COLUMN a1: Orbit Semi-Major Axis [au])"});
  EXPECT_THAT(
      meanings(head),
      ElementsAre("orbital_period [days] comment", "orbital_period_err_plus [days] comment",
                  "orbital_period_err_minus [days] comment", "planet_mass [Earth Mass] comment",
                  "planet_mass_err_plus [Earth Mass] comment", "planet_mass_err_minus [Earth Mass] comment",
                  "planet_mass_limit [] comment", "planet_mass_kind [] comment", "distance [pc] comment",
                  "distance_err_plus [pc] comment", "magnitude_v [?mag] comment", "-", "semi_major_axis [au] comment"));
}

TEST(Understanding, DescriptionGivesTheUnitOfANamedColumn) {
  EXPECT_EQ(meanings(head_of({"planet_radius"}, {"planet_radius: size [Jupiter Radius]"}))[0],
            "planet_radius [Jupiter Radius] name");
}

TEST(Understanding, DescriptionSettlesABareLetter) {
  EXPECT_EQ(meanings(head_of({"a"}, {"a: Semi-major axis [au]"}))[0], "semi_major_axis [au] comment");
}

TEST(Understanding, SeveralUnitsOfOneQuantityAreChoices) {
  const auto understanding = Understanding::of(head_of(
      {"Planet radius [RJ]", "Planet radius err [RJ]", "Planet radius [R_earth]", "Planet radius err [R_earth]"}));
  std::vector<std::size_t> choices;
  for (const auto& column : understanding.columns()) choices.push_back(column.choice);
  EXPECT_THAT(choices, ElementsAre(0, 0, 1, 1));
}

TEST(Understanding, CanonicalNameWinsOverWords) {
  EXPECT_THAT(meanings(head_of({"Effective temperature", "Effective temperature err", "teff", "teff_err"})),
              ElementsAre("-", "-", "teff [?K] name", "teff_err [?K] name"));
}

TEST(Understanding, HalfWidthsOfALosingColumnDoNotMoveToTheWinner) {
  const auto map = ColumnMap::parse("[columns]\nteff = \"T spec\"\n", "map.toml");
  EXPECT_THAT(meanings(head_of({"Teff", "Teff err", "T spec", "T spec err"}), map),
              ElementsAre("-", "-", "teff [?K] map", "teff_err [?K] words"));
  EXPECT_THAT(meanings(head_of({"Teff", "Teff err", "T spec"}), map), ElementsAre("-", "-", "teff [?K] map"));
}

TEST(Understanding, TheMapWins) {
  const auto map = ColumnMap::parse(
      "ignore = [\"K\"]\n[columns]\nteff = \"Temp [K]\"\nteff_err = \"dT\"\ndistance = { column = \"d\", unit = \"ly\" "
      "}\nstellar_radius = \"R\"\n",
      "map.toml");
  EXPECT_THAT(meanings(head_of({"Temp [K]", "dT", "d", "R", "e_R", "K"}), map),
              ElementsAre("teff [K] map", "teff_err [?K] map", "distance [ly] map", "stellar_radius [?solRad] map",
                          "stellar_radius_err [?solRad] words", "-"));
}

TEST(Understanding, TwoColumnsForOneQuantityAreAnError) {
  EXPECT_EQ(refusal({"Teff", "T_eff"}),
            "list.csv: columns \"Teff\" and \"T_eff\" both look like teff; say which in a column map (--columns "
            "MAP.toml): teff = \"Teff\"  or  teff = \"T_eff\"");
  EXPECT_THAT(refusal({"Teff", "Teff err", "Teff sigma"}), HasSubstr("both look like teff_err"));
  EXPECT_THAT(refusal({"J mag", "mag J"}), HasSubstr("both look like magnitude_j"));
}

TEST(Understanding, TwoColumnsAreSettledByTheMap) {
  EXPECT_EQ(refusal({"Teff", "T_eff"}, ColumnMap::parse("[columns]\nteff = \"Teff\"\n", "map.toml")), "");
  EXPECT_EQ(refusal({"Teff", "T_eff"}, ColumnMap::parse("ignore = [\"Teff\"]\n", "map.toml")), "");
}

TEST(Understanding, BareLettersAndWordsAreAnError) {
  EXPECT_EQ(refusal({"R"}),
            "list.csv: column \"R\" may be stellar_radius or planet_radius; say which in a column map (--columns "
            "MAP.toml): stellar_radius = \"R\"  or  planet_radius = \"R\"  or  ignore = [\"R\"]  # above [columns]");
  for (const auto* const bare : {"a", "e", "R", "Rp", "mass", "Radius"})
    EXPECT_THAT(refusal({bare}), HasSubstr("may be")) << bare;
  // Magnitudes and velocities are no inputs of the main job: these are mentioned only.
  EXPECT_EQ(refusal({"K"}), "");
  EXPECT_EQ(refusal({"G"}), "");
  EXPECT_EQ(Understanding::draft(head_of({"K"})).doubts().size(), 1U);
}

TEST(Understanding, BareLettersStopNobodyWhoDoesNotNeedThem) {
  EXPECT_EQ(testing::error_of([] { (void)Understanding::of(head_of({"teff", "a", "e"}), {}, star_inputs()); }), "");
  EXPECT_EQ(refusal({"eccentricity", "e"}), "");
}

TEST(Understanding, FurtherDoubtsAreNamedToo) {
  EXPECT_THAT(refusal({"e", "Rp"}), HasSubstr("; also, column \"Rp\" may be"));
}

TEST(Understanding, UnknownUnitIsAnErrorThatSaysWhatToWrite) {
  EXPECT_EQ(
      refusal({"Teff [furlong]"}),
      "list.csv: the unit \"furlong\" of column \"Teff [furlong]\" is not one of teff; say which in a column map "
      "(--columns MAP.toml): "
      "teff = { column = \"Teff [furlong]\", unit = \"K\" }  or  ignore = [\"Teff [furlong]\"]  # above [columns]");
  EXPECT_THAT(refusal({"teff", "teff_err [AU]"}), HasSubstr("the unit \"AU\" of column \"teff_err [AU]\""));
  EXPECT_EQ(refusal({"V mag [Jy]"}), "");  // not needed: a note
  EXPECT_EQ(refusal({"Teff [furlong]"},
                    ColumnMap::parse("[columns]\nteff = { column = \"Teff [furlong]\", unit = \"K\" }\n", "map.toml")),
            "");
}

TEST(Understanding, OutputColumnsOfARankedListAreLeftAlone) {
  for (const auto& column : all_columns()) {
    if (column.in) continue;
    EXPECT_EQ(meaning(column.name), "-") << column.name;
  }
  EXPECT_THAT(
      meanings(head_of({"rank", "star", "p_conservative", "conservative_inner_edge_err_plus", "flags", "merit"})),
      ElementsAre("-", "star [] name", "-", "-", "-", "-"));
}

}  // namespace
}  // namespace hz
