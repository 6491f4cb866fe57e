// Lists as astronomers have them. They are not part of the source; without them these tests skip themselves.
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <map>

#include "hz/table/peeked_table.hpp"
#include "list_files.hpp"
#include "record_fields.hpp"

namespace hz {
namespace {

using ::testing::HasSubstr;

std::string list_path(const std::string& name) { return std::string(HZ_TEST_DIR "/../../shared/data/") + name; }

#define HZ_NEEDS_LIST(name) \
  if (!std::filesystem::exists(list_path(name))) GTEST_SKIP() << "the list " << (name) << " is not here"

// "quantity part unit" by header.
std::map<std::string, std::string> understood(const std::string& name) {
  const auto reader = open_table(list_path(name));
  const auto understanding = Understanding::of(reader->head());
  std::map<std::string, std::string> out;
  for (const auto& column : understanding.columns()) {
    out[reader->head().columns[column.column].name] =
        canonical_name(column.quantity, column.part) + " [" + column.unit + "]";
  }
  return out;
}

const ListRow* find(const std::vector<ListRow>& rows, const std::string& planet) {
  for (const auto& row : rows) {
    if (row.planet.name == planet) return &row;
  }
  return nullptr;
}

std::size_t count(const std::vector<ListRow>& rows, bool (*holds)(const ListRow&)) {
  return static_cast<std::size_t>(std::count_if(rows.begin(), rows.end(), holds));
}

void expect_archive_columns(const std::map<std::string, std::string>& columns) {
  const std::map<std::string, std::string> expected{{"pl_name", "planet []"},
                                                    {"hostname", "star []"},
                                                    {"sy_snum", "number_of_stars []"},
                                                    {"pl_orbper", "orbital_period [days]"},
                                                    {"pl_orbpererr1", "orbital_period_err_plus [days]"},
                                                    {"pl_orbpererr2", "orbital_period_err_minus [days]"},
                                                    {"pl_orbperlim", "orbital_period_limit []"},
                                                    {"pl_orbsmax", "semi_major_axis [au]"},
                                                    {"pl_rade", "planet_radius [Earth Radius]"},
                                                    {"pl_radelim", "planet_radius_limit []"},
                                                    {"pl_radj", "planet_radius [Jupiter Radius]"},
                                                    {"pl_bmasse", "planet_mass [Earth Mass]"},
                                                    {"pl_bmasseerr2", "planet_mass_err_minus [Earth Mass]"},
                                                    {"pl_bmassj", "planet_mass [Jupiter Mass]"},
                                                    {"pl_bmasselim", "planet_mass_limit []"},
                                                    {"pl_bmassprov", "planet_mass_kind []"},
                                                    {"pl_orbeccen", "eccentricity []"},
                                                    {"pl_orbeccenlim", "eccentricity_limit []"},
                                                    {"pl_insol", "insolation [Earth Flux]"},
                                                    {"pl_eqt", "equilibrium_temperature [K]"},
                                                    {"st_teff", "teff [K]"},
                                                    {"st_tefferr1", "teff_err_plus [K]"},
                                                    {"st_tefflim", "teff_limit []"},
                                                    {"st_rad", "stellar_radius [Solar Radius]"},
                                                    {"st_mass", "stellar_mass [Solar mass]"},
                                                    {"st_logg", "log_g [log10(cm/s**2)]"},
                                                    {"st_met", "metallicity [dex]"},
                                                    {"sy_dist", "distance [pc]"},
                                                    {"sy_disterr1", "distance_err_plus [pc]"},
                                                    {"sy_vmag", "magnitude_v [mag]"},
                                                    {"sy_kmag", "magnitude_k [mag]"},
                                                    {"sy_gaiamag", "magnitude_g [mag]"},
                                                    {"st_spectype", "spectral_type []"}};
  for (const auto& [header, meaning] : expected) {
    const auto found = columns.find(header);
    ASSERT_NE(found, columns.end()) << header;
    EXPECT_EQ(found->second, meaning) << header;
  }
  EXPECT_EQ(columns.count("st_metratio"), 0U);
}

TEST(RealLists, CompositeIsUnderstoodWithoutAMap) {
  HZ_NEEDS_LIST("planets_composite_2023.csv");
  const auto columns = understood("planets_composite_2023.csv");
  expect_archive_columns(columns);
  EXPECT_EQ(columns.size(),
            79U);  // 88 less sy_pnum, 4 of the discovery, 2 flags, the metallicity ratio, sexagesimal RA and Dec
}

TEST(RealLists, CompositeIsReadInFull) {
  HZ_NEEDS_LIST("planets_composite_2023.csv");
  const auto rows = testing::read_list(list_path("planets_composite_2023.csv"));
  ASSERT_EQ(rows.size(), 5347U);
  // Source: README of the list and counts made with Python's csv module on the same file.
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.problem.has_value(); }), 0U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.planet.semi_major_axis.stated.has_value(); }), 5064U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.star.teff.stated.has_value(); }), 5146U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.planet.planet_mass_kind == PlanetMassKind::minimum; }),
            873U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.planet.planet_mass_kind == PlanetMassKind::from_radius; }),
            2799U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.planet.planet_mass_kind == PlanetMassKind::measured; }),
            1655U + 20U);
  EXPECT_EQ(count(rows,
                  [](const ListRow& row) {
                    return row.planet.eccentricity.stated && row.planet.eccentricity.stated->limit == LimitMark::upper;
                  }),
            242U);
  const auto no_width = [](const ListRow& row) {
    const auto& a = row.planet.semi_major_axis.stated;
    return a && !a->plus && !a->minus;
  };
  EXPECT_EQ(count(rows, no_width), 2536U);
}

TEST(RealLists, CompositeRowAsItStandsInTheFile) {
  HZ_NEEDS_LIST("planets_composite_2023.csv");
  const auto rows = testing::read_list(list_path("planets_composite_2023.csv"));
  const auto* const row = find(rows, "14 Her b");  // line 99
  ASSERT_NE(row, nullptr);
  EXPECT_EQ(row->line, 99U);
  EXPECT_EQ(row->planet.orbital_period.stated,
            (Measured{1765.03890112, 1.87256063, 1.67708897, LimitMark::none, false}));
  EXPECT_EQ(row->planet.semi_major_axis.stated, (Measured{2.773069, 0.118828, 0.110517, LimitMark::none, false}));
  EXPECT_EQ(row->planet.planet_radius.stated, (Measured{12.6, {}, {}, LimitMark::none, false}));
}

TEST(RealLists, SolutionsAreUnderstoodWithoutAMap) {
  HZ_NEEDS_LIST("planets_solutions_2025.csv");
  auto columns = understood("planets_solutions_2025.csv");
  expect_archive_columns(columns);
  EXPECT_EQ(columns["default_flag"], "adopted []");
  const auto rows = testing::read_list(list_path("planets_solutions_2025.csv"));
  EXPECT_EQ(rows.size(), 492U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.planet.adopted == true; }), 240U);  // 240 planets
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.planet.adopted == false; }), 252U);
}

TEST(RealLists, WorksheetAsksForAMap) {
  HZ_NEEDS_LIST("worksheet_mixed.csv");
  const auto what = testing::error_of([] { (void)understood("worksheet_mixed.csv"); });
  EXPECT_THAT(what, HasSubstr("column \"e\" may be eccentricity"));
  EXPECT_THAT(what, HasSubstr("eccentricity = \"e\""));
  EXPECT_THAT(what, HasSubstr("column \"Rp\" may be planet_radius or magnitude_rp"));
}

TEST(RealLists, WorksheetWithItsMap) {
  HZ_NEEDS_LIST("worksheet_mixed.csv");
  const auto map = ColumnMap::parse(testing::bytes_of(HZ_TEST_DIR "/cli/worksheet_map.toml"), "worksheet_map.toml");
  const auto rows = testing::read_list(list_path("worksheet_mixed.csv"), map);
  ASSERT_EQ(rows.size(), 78U);
  // One row has half-widths without their number; nothing else is unreadable.
  for (const auto& row : rows) {
    const bool broken = row.planet.name == "alf Ari b";
    EXPECT_EQ(row.star.teff.problem != nullptr, broken) << row.line;
    EXPECT_EQ(row.star.stellar_radius.problem != nullptr, broken) << row.line;
    EXPECT_EQ(row.star.stellar_mass.problem != nullptr, broken) << row.line;
    for (const auto* const field :
         {&row.star.log_luminosity, &row.star.distance, &row.planet.orbital_period, &row.planet.semi_major_axis,
          &row.planet.eccentricity, &row.planet.planet_radius, &row.planet.planet_mass}) {
      EXPECT_EQ(field->problem, nullptr) << row.line;
    }
    ASSERT_TRUE(row.star.distance.stated.has_value()) << row.line;
    ASSERT_TRUE(row.planet.orbital_period.stated.has_value()) << row.line;
  }
  EXPECT_EQ(find(rows, "alf Ari b")->star.teff.problem->what, "Teff [K] holds \"4553+15-\", which is not a value");
}

// The worksheet was made from the composite list by rounding conversions, so that both must agree to the printed
// digits.
TEST(RealLists, WorksheetAgreesWithTheListItCameFrom) {
  HZ_NEEDS_LIST("worksheet_mixed.csv");
  HZ_NEEDS_LIST("planets_composite_2023.csv");
  const auto map = ColumnMap::parse(testing::bytes_of(HZ_TEST_DIR "/cli/worksheet_map.toml"), "worksheet_map.toml");
  const auto sheet = testing::read_list(list_path("worksheet_mixed.csv"), map);
  const auto list = testing::read_list(list_path("planets_composite_2023.csv"));
  std::size_t distances = 0;
  for (const auto& row : sheet) {
    const auto* const original = find(list, row.planet.name);
    if (original == nullptr) continue;
    // Light years are given with four digits at least, milliarcseconds with five: 1 part in 2000 covers half of the
    // last one.
    EXPECT_NEAR(row.star.distance.stated->value / original->star.distance.stated->value, 1, 5e-4) << row.planet.name;
    // Years are given with four decimals: half of the last is 0.00005 * 365.25 d = 0.018 d, twice for solutions that
    // differ.
    if (original->planet.orbital_period.stated) {
      EXPECT_NEAR(row.planet.orbital_period.stated->value, original->planet.orbital_period.stated->value, 0.04)
          << row.planet.name;
    }
    ++distances;
  }
  EXPECT_GT(distances, 60U);
}

ColumnMap map_named(const std::string& name) {
  return ColumnMap::parse(testing::bytes_of(HZ_TEST_DIR "/cli/" + name), name);
}

std::vector<Doubt> implausible(const std::string& name, const ColumnMap& map = {}) {
  PeekedTable table(open_table(list_path(name)));
  auto doubts = Understanding::draft(table.head(), map, planet_inputs(), table.peek()).doubts();
  std::erase_if(doubts, [](const Doubt& doubt) { return doubt.what.find(" has a median of ") == std::string::npos; });
  return doubts;
}

std::size_t stated(const std::vector<ListRow>& rows, Field StarRecord::*field) {
  return static_cast<std::size_t>(std::count_if(
      rows.begin(), rows.end(), [field](const ListRow& row) { return (row.star.*field).stated.has_value(); }));
}

std::size_t problems(const std::vector<ListRow>& rows) {
  std::size_t out = 0;
  for (const auto& row : rows) {
    for (const auto& [quantity, field] : star_fields) out += (row.star.*field).problem != nullptr ? 1U : 0U;
  }
  return out;
}

TEST(RealLists, BrightListHasItsParallaxesInArcsec) {
  HZ_NEEDS_LIST("mdwarfs_bright_2011.csv");
  const auto doubts = implausible("mdwarfs_bright_2011.csv");
  ASSERT_EQ(doubts.size(), 1U);
  EXPECT_TRUE(doubts[0].blocks);
  EXPECT_THAT(doubts[0].what, HasSubstr("column \"plx\" has a median of 0.0"));
  EXPECT_THAT(doubts[0].what, HasSubstr("it looks like arcsec"));
  EXPECT_THAT(doubts[0].map_lines, ::testing::Contains("parallax = { column = \"plx\", unit = \"arcsec\" }"));
}

TEST(RealLists, NoOtherListLooksImplausible) {
  for (const auto* const name : {"nearest_10pc.csv", "mdwarfs_spectra_2015.csv", "planets_composite_2023.csv",
                                 "planets_solutions_2025.csv", "worksheet_mixed.csv"}) {
    HZ_NEEDS_LIST(name);
    EXPECT_THAT(implausible(name), ::testing::IsEmpty()) << name;
  }
  EXPECT_THAT(implausible("mdwarfs_bright_2011.csv", map_named("bright_2011_map.toml")), ::testing::IsEmpty());
  EXPECT_THAT(implausible("mdwarfs_spectra_2015.csv", map_named("spectra_2015_map.toml")), ::testing::IsEmpty());
  EXPECT_THAT(implausible("nearest_10pc.csv", map_named("nearest_10pc_map.toml")), ::testing::IsEmpty());
  EXPECT_THAT(implausible("worksheet_mixed.csv", map_named("worksheet_map.toml")), ::testing::IsEmpty());
}

// Source of the counts in the next three: Python's csv module on the same files, and their README.
TEST(RealLists, BrightListWithItsMap) {
  HZ_NEEDS_LIST("mdwarfs_bright_2011.csv");
  const auto rows = testing::read_list(list_path("mdwarfs_bright_2011.csv"), map_named("bright_2011_map.toml"));
  ASSERT_EQ(rows.size(), 8889U);
  EXPECT_EQ(problems(rows), 0U);
  EXPECT_EQ(stated(rows, &StarRecord::parallax), 1422U);
  EXPECT_EQ(stated(rows, &StarRecord::magnitude_b), 7331U);
  for (const auto field : {&StarRecord::magnitude_v, &StarRecord::magnitude_j, &StarRecord::magnitude_h,
                           &StarRecord::magnitude_k, &StarRecord::color_vj})
    EXPECT_EQ(stated(rows, field), 8889U);
  const auto& third = rows[2].star;  // line 4
  EXPECT_EQ(third.name, "I00014-1656");
  EXPECT_EQ(third.id, "PM J00014-1656");
  EXPECT_EQ(third.spectral_type, "k7");
  EXPECT_DOUBLE_EQ(third.parallax.stated->value, 31.1);
  EXPECT_DOUBLE_EQ(*third.parallax.stated->plus, 2.2);
  EXPECT_EQ(third.magnitude_k.stated->value, 7.22);
}

TEST(RealLists, SpectraListWithItsMap) {
  HZ_NEEDS_LIST("mdwarfs_spectra_2015.csv");
  const auto rows = testing::read_list(list_path("mdwarfs_spectra_2015.csv"), map_named("spectra_2015_map.toml"));
  ASSERT_EQ(rows.size(), 447U);
  EXPECT_EQ(problems(rows), 0U);
  EXPECT_EQ(stated(rows, &StarRecord::teff), 353U);
  EXPECT_EQ(stated(rows, &StarRecord::parallax), 388U);
  EXPECT_EQ(stated(rows, &StarRecord::magnitude_k), 0U);
  for (const auto field : {&StarRecord::stellar_radius, &StarRecord::log_luminosity, &StarRecord::metallicity})
    EXPECT_EQ(stated(rows, field), 447U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.star.stellar_radius.stated->value < 0; }), 41U);
  const auto& first = rows[0].star;  // line 2
  EXPECT_EQ(first.name, "LSPM J0001+0659");
  EXPECT_EQ(first.parallax.stated, (Measured{57.1, 2.6, 2.6, LimitMark::none, false}));
  EXPECT_EQ(first.log_luminosity.stated, (Measured{-3.03, 0.11, 0.11, LimitMark::none, false}));
  EXPECT_EQ(first.metallicity.stated->value, -0.05);
}

TEST(RealLists, NearestListWithItsMap) {
  HZ_NEEDS_LIST("nearest_10pc.csv");
  const auto rows = testing::read_list(list_path("nearest_10pc.csv"), map_named("nearest_10pc_map.toml"));
  ASSERT_EQ(rows.size(), 380U);
  EXPECT_EQ(problems(rows), 0U);
  EXPECT_EQ(stated(rows, &StarRecord::magnitude_v), 325U);
  EXPECT_EQ(stated(rows, &StarRecord::magnitude_b), 314U);
  EXPECT_EQ(stated(rows, &StarRecord::distance), 380U);
  EXPECT_EQ(stated(rows, &StarRecord::companion_separation), 115U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.star.name.empty(); }), 1U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.star.spectral_type.empty(); }), 34U);
  EXPECT_EQ(count(rows, [](const ListRow& row) { return row.planet.orbital_period.stated.has_value(); }), 0U);
  const auto& second = rows[1].star;  // line 3
  EXPECT_EQ(second.spectral_type, "G2V");
  EXPECT_EQ(second.magnitude_v.stated->value, 0.01);
  EXPECT_EQ(second.distance.stated->value, 1.346);
  EXPECT_EQ(second.companion_separation.stated->value, 5.5);
}

TEST(RealLists, NearestStarsEndTheirHeaderInASeparator) {
  HZ_NEEDS_LIST("nearest_10pc.csv");
  const auto table = testing::read_whole(list_path("nearest_10pc.csv"));
  EXPECT_EQ(table.rows.size(), 380U);
  EXPECT_EQ(table.head.columns.size(), 30U);
  EXPECT_THAT(table.problems, ::testing::Each(""));
}

}  // namespace
}  // namespace hz
