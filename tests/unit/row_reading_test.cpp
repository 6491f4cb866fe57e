#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

#include "list_files.hpp"

namespace hz {
namespace {

using ::testing::HasSubstr;

std::vector<ListRow> rows_of(std::string_view bytes, std::string_view map = {}) {
  const testing::Folder folder;
  return testing::read_list(folder.write("list.csv", bytes), ColumnMap::parse(map, "map.toml"));
}

ListRow row_of(std::string_view bytes, std::string_view map = {}) {
  auto rows = rows_of(bytes, map);
  EXPECT_EQ(rows.size(), 1U);
  return rows.at(0);
}

Measured measured(double value, std::optional<double> minus = {}, std::optional<double> plus = {},
                  LimitMark limit = LimitMark::none) {
  return {value, minus, plus, limit, false};
}

TEST(RowReading, FillsBothRecords) {
  const auto row = row_of(
      "star,planet,spectral_type,number_of_stars,teff,luminosity,stellar_radius,stellar_mass,log_g,distance,orbital_"
      "period,semi_major_axis,a/R*,"
      "eccentricity,insolation,planet_radius,planet_mass,min_mass,adopted,planet_mass_kind,reference,star_id\n"
      " Lantern 4 ,Lantern 4 b ,K5 V,2,4410,0.165,0.7,0.72,4.6,12.5,80,0.412,100,0.1,0.9,1.3,2,1.5,1,Mass,Survey "
      "1,0042\n");
  EXPECT_EQ(row.number, 1U);
  EXPECT_EQ(row.line, 2U);
  EXPECT_EQ(row.star.name, "Lantern 4");
  EXPECT_EQ(row.star.id, "0042");
  EXPECT_EQ(row.planet.name, "Lantern 4 b");
  EXPECT_EQ(row.star.spectral_type, "K5 V");
  EXPECT_EQ(row.star.number_of_stars, 2);
  EXPECT_EQ(row.star.teff.stated, measured(4410));
  EXPECT_EQ(row.star.luminosity.stated, measured(0.165));
  EXPECT_EQ(row.star.stellar_radius.stated, measured(0.7));
  EXPECT_EQ(row.star.stellar_mass.stated, measured(0.72));
  EXPECT_EQ(row.star.log_g.stated, measured(4.6));
  EXPECT_EQ(row.star.distance.stated, measured(12.5));
  EXPECT_EQ(row.planet.orbital_period.stated, measured(80));
  EXPECT_EQ(row.planet.semi_major_axis.stated, measured(0.412));
  EXPECT_EQ(row.planet.scaled_semi_major_axis.stated, measured(100));
  EXPECT_EQ(row.planet.eccentricity.stated, measured(0.1));
  EXPECT_EQ(row.planet.insolation.stated, measured(0.9));
  EXPECT_EQ(row.planet.planet_radius.stated, measured(1.3));
  EXPECT_EQ(row.planet.planet_mass.stated, measured(2));
  EXPECT_EQ(row.planet.min_mass.stated, measured(1.5));
  EXPECT_EQ(row.planet.planet_mass_kind, PlanetMassKind::measured);
  EXPECT_EQ(row.planet.adopted, true);
  EXPECT_EQ(row.reference, "Survey 1");
}

TEST(RowReading, MissingIsNeitherValueNorProblem) {
  for (const auto* const nothing : {"", "nan", "NULL", "N/A", "-", "--", "...", " "}) {
    const auto row = row_of(std::string("star,teff\nx,") + nothing + "\n");
    EXPECT_FALSE(row.star.teff.stated.has_value()) << nothing;
    EXPECT_EQ(row.star.teff.problem, nullptr) << nothing;
  }
}

TEST(RowReading, FurtherSpellingsOfMissingComeFromTheMap) {
  EXPECT_FALSE(row_of("star,teff\nx,-99\n", "missing = [\"-99\"]").star.teff.stated.has_value());
  EXPECT_EQ(row_of("star,teff\nx,Unknown\n", "missing = [\"unknown \"]").star.teff.problem, nullptr);
  EXPECT_EQ(row_of("star,teff\nx,-99\n").star.teff.stated, measured(-99));
}

TEST(RowReading, UnreadableIsAProblemThatQuotes) {
  for (const auto* const text : {"hot", "inf", "4553+15-", "1e999"}) {
    const auto field = row_of(std::string("star,Teff [K]\nx,") + text + "\n").star.teff;
    ASSERT_NE(field.problem, nullptr) << text;
    EXPECT_FALSE(field.stated.has_value());
    EXPECT_EQ(field.problem->code, ProblemCode::unreadable);
    EXPECT_EQ(field.problem->column, "Teff [K]");
    EXPECT_EQ(field.problem->what, std::string("Teff [K] holds \"") + text + "\", which is not a value");
  }
}

TEST(RowReading, NumbersOutOfTheirDomainAreNotJudgedHere) {
  const auto row = row_of("star,teff,luminosity,eccentricity\nx,0,-3,1.5\n");
  EXPECT_EQ(row.star.teff.stated, measured(0));
  EXPECT_EQ(row.star.luminosity.stated, measured(-3));
  EXPECT_EQ(row.planet.eccentricity.stated, measured(1.5));
}

TEST(RowReading, HalfWidthColumns) {
  EXPECT_EQ(row_of("star,teff,teff_err\nx,4410,70\n").star.teff.stated, measured(4410, 70, 70));
  EXPECT_EQ(row_of("star,teff,teff_err_plus,teff_err_minus\nx,4410,80,60\n").star.teff.stated, measured(4410, 60, 80));
  EXPECT_EQ(row_of("star,teff,teff_err_plus,teff_err_minus\nx,4410,80,-60\n").star.teff.stated, measured(4410, 60, 80));
  EXPECT_EQ(row_of("star,teff,teff_err_plus,teff_err_minus\nx,4410,80,\n").star.teff.stated, measured(4410, {}, 80));
  EXPECT_EQ(row_of("star,teff,teff_err_plus,teff_err_minus\nx,4410,0,0\n").star.teff.stated, measured(4410, 0, 0));
  EXPECT_EQ(row_of("star,Teff,e_Teff,E_Teff\nx,4410,60,80\n").star.teff.stated, measured(4410, 60, 80));
  EXPECT_EQ(row_of("star,teff,teff_lower,teff_upper\nx,4410,4350,4490\n").star.teff.stated, measured(4410, 60, 80));
}

TEST(RowReading, BrokenHalfWidthsAreProblems) {
  EXPECT_THAT(row_of("star,teff,teff_err\nx,4410,wide\n").star.teff.problem->what,
              HasSubstr("teff_err holds \"wide\", which is not a number"));
  EXPECT_THAT(row_of("star,teff,teff_err\nx,4410,inf\n").star.teff.problem->what, HasSubstr("teff_err holds \"inf\""));
  EXPECT_EQ(row_of("star,teff,teff_err\nx,4410,-70\n").star.teff.problem->what,
            "teff_err holds \"-70\", and a half-width is never below 0");
  EXPECT_EQ(row_of("star,teff,teff_err_plus\nx,4410,-70\n").star.teff.problem->what,
            "teff_err_plus holds \"-70\", and a half-width is never below 0");
  EXPECT_THAT(row_of("star,teff,teff_err\nx,4410,\"0,5\"\n").star.teff.problem->what,
              HasSubstr("teff_err holds \"0,5\", which is not a number; a decimal comma? write 0.5"));
}

TEST(RowReading, OneSidedZeroAndWiderThanTheValue) {
  const auto teff_of = [](const std::string& cells) {
    return row_of("star,teff,teff_err_plus,teff_err_minus\nx," + cells + "\n").star.teff;
  };
  EXPECT_EQ(teff_of("4410,80,").stated, measured(4410, {}, 80));
  EXPECT_EQ(teff_of("4410,,60").stated, measured(4410, 60, {}));
  EXPECT_EQ(teff_of("4410,0,").stated, measured(4410, {}, 0));
  EXPECT_EQ(teff_of("4410,5000,6000").stated, measured(4410, 6000, 5000));  // judged where it is used
  EXPECT_EQ(teff_of("0,0.16,-0").stated, measured(0, 0, 0.16));
  EXPECT_EQ(teff_of("4410,80,\u221260").stated, measured(4410, 60, 80));
  EXPECT_EQ(row_of("star,eccentricity\nx,0 +0.16 \u22120\n").planet.eccentricity.stated, measured(0, 0, 0.16));
  EXPECT_EQ(row_of("star,eccentricity\nx,0+0.16-0\n").planet.eccentricity.stated, measured(0, 0, 0.16));
}

TEST(RowReading, BoundsAreTheEndsOfAnInterval) {
  const std::string header = "star,log_g,log_g_lower,log_g_upper\nx,";
  EXPECT_EQ(row_of(header + "-0.5,-0.75,0.25\n").star.log_g.stated, measured(-0.5, 0.25, 0.75));
  EXPECT_EQ(row_of(header + "4.5,4.25,\n").star.log_g.stated, measured(4.5, 0.25, {}));
  EXPECT_EQ(row_of(header + "4.5,4.5,4.75\n").star.log_g.stated, measured(4.5, 0, 0.25));
  EXPECT_FALSE(row_of(header + ",4.25,4.75\n").star.log_g.stated.has_value());
}

TEST(RowReading, BoundsBesideHalfWidthsOnlyFillTheOtherSide) {
  const std::string header = "star,teff,teff_err_plus,teff_lower,teff_upper\nx,";
  EXPECT_EQ(row_of(header + "4410,80,4350,4600\n").star.teff.stated, measured(4410, 60, 80));
}

TEST(RowReading, BoundsThatDoNotBracketTheValueAreNamed) {
  const std::string both = "star,teff,teff_lower,teff_upper\nx,";
  EXPECT_EQ(
      row_of(both + "4410,4500,4600\n").star.teff.problem->what,
      "teff holds \"4410\", which lies not between teff_lower \"4500\" and teff_upper \"4600\"; bounds are the ends "
      "of an interval around the value, not half-widths");
  EXPECT_THAT(row_of(both + "4410,70,80\n").star.teff.problem->what,  // half-widths in columns of bounds
              HasSubstr("not between teff_lower \"70\" and teff_upper \"80\""));
  EXPECT_THAT(row_of("star,teff,teff_lower\nx,4410,4500\n").star.teff.problem->what,
              HasSubstr("lies below teff_lower \"4500\""));
  EXPECT_THAT(row_of("star,teff,teff_upper\nx,4410,4400\n").star.teff.problem->what,
              HasSubstr("lies above teff_upper \"4400\""));
}

TEST(RowReading, BoundsInAUnitOfTheirOwn) {
  const auto radius =
      row_of("star,Planet radius [RJ],Planet radius lower [Earth],Planet radius upper [Earth]\nx,1,10,12\n")
          .planet.planet_radius.stated;
  const double jupiter = 7.1492e7 / 6.3781e6;  // IAU 2015 B3
  EXPECT_NEAR(*radius->minus, jupiter - 10, 1e-12);
  EXPECT_NEAR(*radius->plus, 12 - jupiter, 1e-12);
  // log g in SI is that in cgs less 2.
  const auto log_g = row_of("star,log g,log g lower [log(m/s2)]\nx,4.5,2.25\n").star.log_g.stated;
  EXPECT_DOUBLE_EQ(*log_g->minus, 0.25);
}

TEST(RowReading, HalfWidthsOfLogarithmsStayOnTheirScale) {
  const auto teff = row_of("star,Teff [log(K)],e_Teff\nx,3.76,0.01\n").star.teff.stated;
  EXPECT_NEAR(teff->value, std::pow(10, 3.76), 1e-9);
  EXPECT_NEAR(*teff->plus, std::pow(10, 3.77) - std::pow(10, 3.76), 1e-9);
  EXPECT_THAT(row_of("star,Teff [log(K)],Teff err [K]\nx,3.76,80\n").star.teff.problem->what,
              HasSubstr("Teff err [K] holds \"80\" in a unit that does not go with that of the value"));
}

TEST(RowReading, HalfWidthsInTheCellWinOverColumns) {
  EXPECT_EQ(row_of("star,teff,teff_err\nx,4410+-50,70\n").star.teff.stated, measured(4410, 50, 50));
}

TEST(RowReading, LimitMarks) {
  const auto limit_of = [](const std::string& mark) {
    return row_of("star,eccentricity,eccentricity_limit\nx,0.3," + mark + "\n").planet.eccentricity;
  };
  for (const auto* const upper : {"1", "<", "1.0", "+1"})
    EXPECT_EQ(limit_of(upper).stated->limit, LimitMark::upper) << upper;
  for (const auto* const lower : {"-1", ">"}) EXPECT_EQ(limit_of(lower).stated->limit, LimitMark::lower) << lower;
  for (const auto* const none : {"0", "", "="}) EXPECT_EQ(limit_of(none).stated->limit, LimitMark::none) << none;
  EXPECT_THAT(limit_of("2").problem->what,
              HasSubstr("eccentricity_limit holds \"2\", which is not one of 1, 0, -1, < and >"));
  EXPECT_FALSE(row_of("star,eccentricity,eccentricity_limit\nx,,1\n").planet.eccentricity.stated.has_value());
  EXPECT_EQ(row_of("star,eccentricity,eccentricity_limit\nx,,1\n").planet.eccentricity.problem, nullptr);
}

TEST(RowReading, UnitsOfColumnsAndCells) {
  const auto row =
      row_of("star,Orbital period [yr],Planet radius [RJ],Planet radius err [RJ],d\nx,2,1,0.5,74.597 mas\n",
             "[columns]\ndistance = { column = \"d\", unit = \"pc\" }");
  EXPECT_EQ(row.planet.orbital_period.stated, measured(730.5));
  EXPECT_DOUBLE_EQ(row.planet.planet_radius.stated->value, 7.1492e7 / 6.3781e6);
  EXPECT_DOUBLE_EQ(*row.planet.planet_radius.stated->plus, 0.5 * 7.1492e7 / 6.3781e6);
  EXPECT_DOUBLE_EQ(row.star.distance.stated->value, 1000 / 74.597);
  EXPECT_EQ(row_of("star,Orbital period [yr]\nx,30 d\n").planet.orbital_period.stated, measured(30));
  EXPECT_THAT(row_of("star,orbital_period\nx,30 furlong\n").planet.orbital_period.problem->what,
              HasSubstr("whose unit is not one of orbital_period"));
}

TEST(RowReading, HalfWidthInAUnitOfItsOwn) {
  const auto row = row_of("star,Orbital period [d],Orbital period err [h]\nx,30,12\n");
  EXPECT_EQ(row.planet.orbital_period.stated, measured(30, 0.5, 0.5));
}

TEST(RowReading, DistanceColumnInMasIsAParallaxOfEitherSign) {
  for (const auto& [text, number] : {std::pair("0", 0.0), std::pair("-3", -3.0), std::pair("50", 50.0)}) {
    const auto star = row_of(std::string("star,distance [mas],distance_err\nx,") + text + ",2\n").star;
    EXPECT_EQ(star.parallax.stated, measured(number, 2, 2)) << text;
    EXPECT_FALSE(star.distance.stated || star.distance.problem) << text;
  }
  const auto mapped = row_of("star,d,ed\nx,0.05,0.002\n",
                             "[columns]\ndistance = { column = \"d\", unit = \"arcsec\" }\ndistance_err = \"ed\"\n");
  EXPECT_EQ(mapped.star.parallax.stated, measured(50, 2, 2));
}

TEST(RowReading, ParallaxInACellOfDistancesMustBePositive) {
  EXPECT_DOUBLE_EQ(row_of("star,distance\nx,50 mas\n").star.distance.stated->value, 20);
  for (const auto* const text : {"0 mas", "-3 mas"}) {
    const auto field = row_of(std::string("star,distance\nx,") + text + "\n").star.distance;
    ASSERT_NE(field.problem, nullptr) << text;
    EXPECT_EQ(field.problem->code, ProblemCode::out_of_range);
  }
}

TEST(RowReading, EveryQuantityOfAStarReachesItsRecord) {
  const auto star = row_of(
                        "star,parallax,parallax_err,V mag,B mag,Gaia G,Gaia BP,Gaia RP,J mag,H mag,Ks mag,m "
                        "bol,B-V,V-K,V-J,BP-RP,A_V,"
                        "E(B-V),[Fe/H],stellar_density,companion_separation,V mag err\n"
                        "x,-1.5,0.5,-1.25,-1.5,0,0.25,-0.5,1,2,3,4,-0.25,-0.5,-0.75,-0.125,0,-0.5,-2.5,1.5,3.5,0.25\n")
                        .star;
  EXPECT_EQ(star.parallax.stated, measured(-1.5, 0.5, 0.5));
  EXPECT_EQ(star.magnitude_v.stated, measured(-1.25, 0.25, 0.25));
  EXPECT_EQ(star.magnitude_b.stated, measured(-1.5));
  EXPECT_EQ(star.magnitude_g.stated, measured(0));
  EXPECT_EQ(star.magnitude_bp.stated, measured(0.25));
  EXPECT_EQ(star.magnitude_rp.stated, measured(-0.5));
  EXPECT_EQ(star.magnitude_j.stated, measured(1));
  EXPECT_EQ(star.magnitude_h.stated, measured(2));
  EXPECT_EQ(star.magnitude_k.stated, measured(3));
  EXPECT_EQ(star.magnitude_bol.stated, measured(4));
  EXPECT_EQ(star.color_bv.stated, measured(-0.25));
  EXPECT_EQ(star.color_vk.stated, measured(-0.5));
  EXPECT_EQ(star.color_vj.stated, measured(-0.75));
  EXPECT_EQ(star.color_bp_rp.stated, measured(-0.125));
  EXPECT_EQ(star.extinction_v.stated, measured(0));
  EXPECT_EQ(star.reddening_bv.stated, measured(-0.5));
  EXPECT_EQ(star.metallicity.stated, measured(-2.5));
  EXPECT_EQ(star.stellar_density.stated, measured(1.5));
  EXPECT_EQ(star.companion_separation.stated, measured(3.5));
}

TEST(RowReading, EveryQuantityOfAPlanetReachesItsRecord) {
  const auto planet =
      row_of("planet,inclination,radius_ratio,transit_depth,circumbinary\nx,<88.5,0.0125+-0.0005,>0.0001,1\n").planet;
  EXPECT_EQ(planet.inclination.stated, measured(88.5, {}, {}, LimitMark::upper));
  EXPECT_EQ(planet.radius_ratio.stated, measured(0.0125, 0.0005, 0.0005));
  EXPECT_EQ(planet.transit_depth.stated, measured(0.0001, {}, {}, LimitMark::lower));
  EXPECT_EQ(planet.circumbinary, true);
}

// Source: definitions of the units; 1 mmag is 1 - 10^(-0.0004) (Pogson) = x - x^2/2 with
// x = 0.0004 ln 10 = 9.21034e-4, that is 9.20610e-4.
TEST(RowReading, TransitDepthsInEveryUnit) {
  const auto depth_of = [](const std::string& header, const std::string& cell) {
    return row_of("planet," + header + "\nx," + cell + "\n").planet.transit_depth.stated->value;
  };
  EXPECT_DOUBLE_EQ(depth_of("transit depth [%]", "1.5"), 0.015);
  EXPECT_DOUBLE_EQ(depth_of("transit depth (ppm)", "84"), 84e-6);
  EXPECT_DOUBLE_EQ(depth_of("transit depth [ppt]", "2"), 0.002);
  EXPECT_NEAR(depth_of("transit depth [mmag]", "1"), 9.20610e-4, 5e-10);
  EXPECT_DOUBLE_EQ(depth_of("transit_depth", "1.5%"), 0.015);
  EXPECT_DOUBLE_EQ(depth_of("transit_depth", "84 ppm"), 84e-6);
  EXPECT_DOUBLE_EQ(depth_of("transit_depth", "0.015"), 0.015);
}

TEST(RowReading, NumbersThatStandForNoValue) {
  const auto parallax_of = [](const std::string& cells, const std::string& values) {
    return row_of("star,parallax [arcsec],parallax_err,teff\nx," + cells + ",0\n",
                  "[missing_values]\nparallax = " + values + "\n")
        .star;
  };
  for (const auto* const none : {"0", "0.000", "-0", "-1", "-1.0", "0 arcsec", "-1 mas"}) {
    const auto star = parallax_of(std::string(none) + ",0.5", "[0, -1]");
    EXPECT_FALSE(star.parallax.stated || star.parallax.problem) << none;
    EXPECT_EQ(star.teff.stated, measured(0)) << "of that quantity only";
  }
  EXPECT_EQ(parallax_of("0.5,0", "0").parallax.stated, measured(500, 0, 0));  // not of its half-width
  EXPECT_EQ(parallax_of("-0.5,", "[0, -1]").parallax.stated, measured(-500));
  EXPECT_EQ(parallax_of("0+-0.5,", "0").parallax.stated, measured(0, 500, 500));  // a measurement
  EXPECT_EQ(row_of("star,parallax\nx,0\n").star.parallax.stated, measured(0));    // nothing is guessed
}

TEST(RowReading, AfterAMissingNumberTheNextChoiceCounts) {
  const auto row = row_of("planet,Planet radius [Earth],Planet radius [Jupiter]\na,-99,1\n",
                          "[missing_values]\nplanet_radius = -99\n");
  EXPECT_DOUBLE_EQ(row.planet.planet_radius.stated->value, 7.1492e7 / 6.3781e6);
}

TEST(RowReading, OverflowInTheConversionIsNoValue) {
  EXPECT_NE(row_of("star,planet_mass [MJ]\nx,1e308\n").planet.planet_mass.problem, nullptr);
}

TEST(RowReading, FirstFilledChoiceCountsWithItsOwnHalfWidths) {
  const auto rows = rows_of(
      "planet,Planet radius [Earth],Planet radius err [Earth],Planet radius [Jupiter],Planet radius err [Jupiter]\n"
      "a,2,0.1,9,9\nb,,0.1,1,0.2\n");
  EXPECT_EQ(rows[0].planet.planet_radius.stated, measured(2, 0.1, 0.1));
  EXPECT_DOUBLE_EQ(rows[1].planet.planet_radius.stated->value, 7.1492e7 / 6.3781e6);
  EXPECT_DOUBLE_EQ(*rows[1].planet.planet_radius.stated->plus, 0.2 * 7.1492e7 / 6.3781e6);
}

// A ranked list states what its own list stated, whatever route was taken.
TEST(RowReading, StatedValuesBesideUsedOnesAreKept) {
  const auto row = row_of("planet,luminosity,luminosity_used,luminosity_route\na,0.2,0.3,stellar_radius and teff\n");
  EXPECT_EQ(row.star.luminosity.stated, measured(0.2));
}

TEST(RowReading, KindsOfPlanetMass) {
  const auto kind_of = [](const std::string& text) {
    return row_of("planet,planet_mass,planet_mass_kind\na,3," + text + "\n").planet.planet_mass_kind;
  };
  for (const auto* const kind : {"Mass", "measured", "Msin(i)/sin(i)", "true mass"})
    EXPECT_EQ(kind_of(kind), PlanetMassKind::measured) << kind;
  for (const auto* const kind : {"Msini", "M sin i", "Mass*sin(i)", "minimum mass", "minimum"})
    EXPECT_EQ(kind_of(kind), PlanetMassKind::minimum) << kind;
  for (const auto* const kind : {"M-R relationship", "from radius", "mass-radius relation", "from_radius"})
    EXPECT_EQ(kind_of(kind), PlanetMassKind::from_radius) << kind;
  for (const auto* const kind : {"", "--", "guess"}) EXPECT_EQ(kind_of(kind), PlanetMassKind::unsaid) << kind;
}

TEST(RowReading, AdoptedMarks) {
  const auto adopted = [](const std::string& text) {
    return row_of("planet,adopted\na," + text + "\n").planet.adopted;
  };
  EXPECT_EQ(adopted("1"), true);
  EXPECT_EQ(adopted("TRUE"), true);
  EXPECT_EQ(adopted("no"), false);
  EXPECT_EQ(adopted("0"), false);
  EXPECT_EQ(adopted(""), std::nullopt);
}

TEST(RowReading, RaggedRowHasEmptyRecordsAndItsProblem) {
  const auto rows = rows_of("star,teff\nx,4410,1\ny,4410\n");
  ASSERT_TRUE(rows[0].problem.has_value());
  EXPECT_THAT(rows[0].problem->what, HasSubstr("line 2 holds 3 cells"));
  EXPECT_FALSE(rows[0].star.teff.stated.has_value());
  EXPECT_EQ(rows[1].number, 2U);
  EXPECT_FALSE(rows[1].problem.has_value());
}

TEST(RowReading, ColumnsOfNumbersAsBinaryFormatsHoldThem) {
  TableHead head;
  for (const auto* const name : {"teff", "teff_err", "number_of_stars", "planet_mass"})
    head.columns.push_back({name, {}, {}, {}});
  Chunk chunk;
  chunk.columns = {std::vector<double>{4410, std::nan("")}, std::vector<double>{70, 70},
                   std::vector<std::optional<std::int64_t>>{2, std::nullopt}, std::vector<double>{INFINITY, 3}};
  chunk.row_problems.resize(2);
  const auto understanding = Understanding::of(head);
  const auto first = understanding.row(chunk, 0);
  EXPECT_EQ(first.star.teff.stated, measured(4410, 70, 70));
  EXPECT_EQ(first.star.number_of_stars, 2);
  EXPECT_NE(first.planet.planet_mass.problem, nullptr);
  EXPECT_FALSE(understanding.row(chunk, 1).star.teff.stated.has_value());
}

}  // namespace
}  // namespace hz
