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
    EXPECT_FALSE(row.star.teff.problem.has_value()) << nothing;
  }
}

TEST(RowReading, FurtherSpellingsOfMissingComeFromTheMap) {
  EXPECT_FALSE(row_of("star,teff\nx,-99\n", "missing = [\"-99\"]").star.teff.stated.has_value());
  EXPECT_FALSE(row_of("star,teff\nx,Unknown\n", "missing = [\"unknown \"]").star.teff.problem.has_value());
  EXPECT_EQ(row_of("star,teff\nx,-99\n").star.teff.stated, measured(-99));
}

TEST(RowReading, UnreadableIsAProblemThatQuotes) {
  for (const auto* const text : {"hot", "inf", "4553+15-", "1e999"}) {
    const auto field = row_of(std::string("star,Teff [K]\nx,") + text + "\n").star.teff;
    ASSERT_TRUE(field.problem.has_value()) << text;
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
  EXPECT_THAT(row_of("star,teff,teff_err\nx,4410,-70\n").star.teff.problem->what, HasSubstr("half-width below 0"));
  EXPECT_THAT(row_of("star,teff,teff_err_plus\nx,4410,-70\n").star.teff.problem->what, HasSubstr("half-width below 0"));
  EXPECT_THAT(row_of("star,teff,teff_lower\nx,4410,4500\n").star.teff.problem->what,
              HasSubstr("bound on the wrong side"));
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
  EXPECT_FALSE(row_of("star,eccentricity,eccentricity_limit\nx,,1\n").planet.eccentricity.problem.has_value());
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

TEST(RowReading, ParallaxInADistanceColumnMustBePositive) {
  for (const auto* const text : {"0", "-3"}) {
    const auto field = row_of(std::string("star,distance [mas]\nx,") + text + "\n").star.distance;
    ASSERT_TRUE(field.problem.has_value()) << text;
    EXPECT_EQ(field.problem->code, ProblemCode::out_of_range);
  }
}

TEST(RowReading, OverflowInTheConversionIsNoValue) {
  EXPECT_TRUE(row_of("star,planet_mass [MJ]\nx,1e308\n").planet.planet_mass.problem.has_value());
}

TEST(RowReading, FirstFilledChoiceCountsWithItsOwnHalfWidths) {
  const auto rows = rows_of(
      "planet,Planet radius [Earth],Planet radius err [Earth],Planet radius [Jupiter],Planet radius err [Jupiter]\n"
      "a,2,0.1,9,9\nb,,0.1,1,0.2\n");
  EXPECT_EQ(rows[0].planet.planet_radius.stated, measured(2, 0.1, 0.1));
  EXPECT_DOUBLE_EQ(rows[1].planet.planet_radius.stated->value, 7.1492e7 / 6.3781e6);
  EXPECT_DOUBLE_EQ(*rows[1].planet.planet_radius.stated->plus, 0.2 * 7.1492e7 / 6.3781e6);
}

TEST(RowReading, DerivedValuesOfAnEarlierRunAreLeftOut) {
  const auto rows = rows_of("planet,luminosity,luminosity_route\na,0.2,stated\nb,0.2,radius and teff\nc,0.2,\n");
  EXPECT_TRUE(rows[0].star.luminosity.stated.has_value());
  EXPECT_FALSE(rows[1].star.luminosity.stated.has_value());
  EXPECT_FALSE(rows[1].star.luminosity.problem.has_value());
  EXPECT_TRUE(rows[2].star.luminosity.stated.has_value());
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
  EXPECT_TRUE(first.planet.planet_mass.problem.has_value());
  EXPECT_FALSE(understanding.row(chunk, 1).star.teff.stated.has_value());
}

}  // namespace
}  // namespace hz
