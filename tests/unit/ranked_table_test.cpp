#include "hz/ranked_table.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <array>
#include <cmath>

#include "answer_helpers.hpp"
#include "ranked_list_helpers.hpp"
#include "record_fields.hpp"

namespace hz {
namespace {

using testing::above;
using testing::below;
using testing::settings_of;
using testing::value;

constexpr auto photometry = std::to_array<Quantity>(
    {Quantity::magnitude_v, Quantity::magnitude_b, Quantity::magnitude_g, Quantity::magnitude_bp,
     Quantity::magnitude_rp, Quantity::magnitude_j, Quantity::magnitude_h, Quantity::magnitude_k,
     Quantity::magnitude_bol, Quantity::color_bv, Quantity::color_vk, Quantity::color_vj, Quantity::color_bp_rp,
     Quantity::extinction_v, Quantity::reddening_bv});

void set(ListRow& row, Quantity quantity, const Field& field) {
  for (const auto& [held, member] : star_fields) {
    if (held == quantity) row.star.*member = field;
  }
}

/// Numbers that no short decimal holds, half-widths missing, printed 0 and one-sided, limits, text that needs quoting.
std::vector<ListRow> awkward_list() {
  ListRow full;
  full.star.name = "Lantern 4";
  full.star.id = "0042";
  full.star.spectral_type = "K5 V, \"old\"";
  full.star.teff = value(4410.1, 70, 71.25);
  full.star.luminosity = value(0.1 + 0.2, 1e-3 / 3, 0.01);
  full.star.log_luminosity = value(-0.5228787452803376, 0.01);
  full.star.stellar_radius = value(0.7, 0, 0);
  full.star.stellar_mass = value(0.72, {}, 0.03);
  full.star.log_g = value(4.6);
  full.star.distance = value(12.345678901234567);
  full.star.number_of_stars = 2;
  std::size_t step = 0;
  for (const Quantity quantity : photometry)
    set(full, quantity, value(-1.0 / 3 * static_cast<double>(++step), 1e-9 / 3));
  full.star.parallax = value(-0.1 - 0.2, 1.0 / 7, 1.0 / 7);
  full.star.metallicity = below(-0.3);
  full.star.stellar_density = value(1.4);
  full.star.companion_separation = value(5.5);
  full.planet.inclination = above(88.5);
  full.planet.radius_ratio = value(0.01, 1e-3 / 7, 1e-3);
  full.planet.transit_depth = value(84e-6, {}, 1e-6 / 3);
  full.planet.circumbinary = true;
  full.planet.name = "Lantern 4 b";
  full.planet.orbital_period = value(97.123456789, 1e-7, 2e-7);
  full.planet.semi_major_axis = value(0.2, 0.01, 0.01);
  full.planet.scaled_semi_major_axis = value(1.0 / 3);
  full.planet.eccentricity = below(0.3);
  full.planet.insolation = value(0.9, 0.1, 0.1);
  full.planet.planet_radius = value(1.3, 0, 0.16);
  full.planet.planet_mass = below(35);
  full.planet.min_mass = above(0.2);
  full.planet.planet_mass_kind = PlanetMassKind::minimum;
  full.planet.adopted = true;
  full.reference = "#1, Survey";
  ListRow sparse;
  sparse.star.teff = value(5772);
  sparse.planet.name = "Lantern 5 b";
  sparse.planet.insolation = value(0.6, 0.05);
  ListRow refused = sparse;
  refused.planet.name = "Lantern 6 b";
  refused.star.teff = below(9000);
  std::vector<ListRow> rows = {full, sparse, refused};
  for (std::size_t i = 0; i < rows.size(); ++i) rows[i].number = i + 1;
  return rows;
}

std::vector<ListRow> read_back(const std::vector<ListRow>& rows, const Settings& settings) {
  const testing::Folder folder;
  std::vector<Candidate> candidates = testing::answered(rows, settings);
  const std::vector<Place> places = testing::ranked(candidates);
  testing::write_ranked(folder.file("ranked.csv"), candidates, places, settings);
  return testing::read_list(folder.file("ranked.csv"));
}

const ListRow& row_named(const std::vector<ListRow>& rows, const std::string& planet) {
  for (const ListRow& row : rows) {
    if (row.planet.name == planet) return row;
  }
  throw std::runtime_error("no " + planet);
}

TEST(RankedTable, StatedValuesComeBackDigitForDigit) {
  const std::vector<ListRow> before = awkward_list();
  const std::vector<ListRow> after = read_back(before, settings_of());
  ASSERT_EQ(after.size(), before.size());
  for (const ListRow& row : before) {
    const ListRow& back = row_named(after, row.planet.name);
    for (const auto& [quantity, field] : star_fields)
      EXPECT_EQ((back.star.*field).stated, (row.star.*field).stated) << name(quantity);
    for (const auto& [quantity, field] : planet_fields)
      EXPECT_EQ((back.planet.*field).stated, (row.planet.*field).stated) << name(quantity);
  }
}

TEST(RankedTable, TextComesBackAsItWas) {
  const std::vector<ListRow> before = awkward_list();
  const std::vector<ListRow> after = read_back(before, settings_of());
  for (const ListRow& row : before) {
    const ListRow& back = row_named(after, row.planet.name);
    EXPECT_EQ(back.star.name, row.star.name);
    EXPECT_EQ(back.star.id, row.star.id);
    EXPECT_EQ(back.star.spectral_type, row.star.spectral_type);
    EXPECT_EQ(back.star.number_of_stars, row.star.number_of_stars);
    EXPECT_EQ(back.planet.planet_mass_kind, row.planet.planet_mass_kind);
    EXPECT_EQ(back.planet.adopted, row.planet.adopted);
    EXPECT_EQ(back.planet.circumbinary, row.planet.circumbinary);
    EXPECT_EQ(back.reference, row.reference);
  }
}

TEST(RankedTable, ReadBackItGivesTheSameAnswers) {
  const Settings settings = settings_of();
  const testing::Folder folder;
  std::vector<Candidate> first = testing::answered(awkward_list(), settings);
  const std::vector<Place> places = testing::ranked(first);
  testing::write_ranked(folder.file("ranked.csv"), first, places, settings);
  std::vector<Candidate> second = testing::answered(testing::read_list(folder.file("ranked.csv")), settings);
  const std::vector<Place> again = testing::ranked(second);
  const auto before = testing::output_rows(first, places);
  const auto after = testing::output_rows(second, again);
  ASSERT_EQ(before.size(), after.size());
  for (std::size_t i = 0; i < before.size(); ++i) {
    EXPECT_EQ(testing::decision(after[i], settings), testing::decision(before[i], settings));
    EXPECT_EQ(after[i].candidate.answer.note, before[i].candidate.answer.note);
  }
}

std::map<std::string, CellValue> cells(const Candidate& candidate, const Settings& settings, std::size_t rank = 0) {
  std::map<std::string, CellValue> found;
  for (const OutputColumn& column : ranked_columns(settings, testing::every_quantity(), {})) {
    EXPECT_TRUE(found.emplace(column.head.name, column.value({candidate, rank})).second)
        << "twice: " << column.head.name;
  }
  return found;
}

TEST(RankedTable, SaysWhatWasUsedAndByWhichRoute) {
  const Settings settings = settings_of();
  Candidate candidate;
  candidate.row = testing::bare_earth();
  candidate.row.star.stellar_radius = testing::exactly(2);
  candidate.row.planet.orbital_period = testing::exactly(365.2568984);
  candidate.row.star.stellar_mass = testing::exactly(1);
  candidate.answer = answer(candidate.row, settings);
  const auto found = cells(candidate, settings, 3);
  EXPECT_EQ(std::get<std::int64_t>(found.at("rank")), 3);
  EXPECT_EQ(std::get<double>(found.at("luminosity_used")), 4);
  EXPECT_EQ(std::get<std::string>(found.at("luminosity_route")), "stellar_radius and teff");
  EXPECT_TRUE(std::holds_alternative<std::monostate>(found.at("luminosity")));
  EXPECT_EQ(std::get<double>(found.at("semi_major_axis_used")), 1);
  EXPECT_EQ(std::get<double>(found.at("insolation_used")), 4);
  EXPECT_EQ(std::get<std::string>(found.at("verdict_optimistic")), "outside");
  EXPECT_EQ(std::get<std::string>(found.at("side")), "hot");
  EXPECT_EQ(std::get<std::string>(found.at("limit_set")), "K14");
  EXPECT_EQ(std::get<std::string>(found.at("asymmetry")), "median");
  EXPECT_EQ(std::get<double>(found.at("p_conservative")), 0);
  // 2 au x 0.95044, cut to six digits; the planet is known exactly and has 1 Earth mass.
  EXPECT_NEAR(std::get<double>(found.at("conservative_inner_edge")), 2 * 0.9505, 0.001);
}

TEST(RankedTable, MissingIsMissing) {
  const Settings settings = settings_of();
  Candidate candidate;
  candidate.row.planet.name = "b";
  candidate.answer = answer(candidate.row, settings);
  const auto found = cells(candidate, settings);
  EXPECT_EQ(std::get<std::string>(found.at("status")), "set aside");
  EXPECT_EQ(std::get<std::string>(found.at("reason")),
            "no effective temperature (teff), and no colour, spectral_type or other value within the range of a "
            "relation that leads to it");
  for (const auto& [name, value] : found) {
    const bool said =
        name == "planet" || name == "status" || name == "reason" || name == "limit_set" || name == "asymmetry";
    EXPECT_EQ(std::holds_alternative<std::monostate>(value), !said) << name;
  }
}

TEST(RankedTable, RowsThatWereCutSayWhy) {
  Candidate candidate;
  candidate.row = testing::earth();
  candidate.answer = answer(candidate.row, settings_of());
  candidate.cut_reason = "planet_radius<1.8 is not met: 2";
  const auto found = cells(candidate, settings_of());
  EXPECT_EQ(std::get<std::string>(found.at("status")), "cut");
  EXPECT_EQ(std::get<std::string>(found.at("reason")), "planet_radius<1.8 is not met: 2");
}

TEST(RankedTable, TheListsOwnColumnsTravelAlong) {
  const Settings settings = settings_of();
  std::vector<Candidate> rows(2);
  for (Candidate& row : rows) row.answer = answer(row.row, settings);
  rows[0].row.kept = {"12 h", ""};
  rows[1].row.kept = {"", "x"};
  const auto columns = ranked_columns(settings, {}, {{"airmass", "", "", ""}, {"tag", "", "", ""}});
  const Chunk chunk = chunk_of(columns, {{rows[0], 0}, {rows[1], 0}});
  EXPECT_EQ(head_of(columns).columns.back().name, "tag");
  EXPECT_EQ(chunk.rows(), 2U);
  EXPECT_EQ(chunk.text(columns.size() - 2, 0), "12 h");
  EXPECT_EQ(chunk.text(columns.size() - 2, 1), "");
  EXPECT_EQ(chunk.text(columns.size() - 1, 1), "x");
}

TEST(SixDigits, AreKeptAndNoMore) {
  EXPECT_EQ(six_digits(0.95043768), 0.950438);
  EXPECT_EQ(six_digits(1234567.8), 1234570);
  EXPECT_EQ(six_digits(0), 0);
  EXPECT_EQ(six_digits(-1.23456789e-7), -1.23457e-7);
}

}  // namespace
}  // namespace hz
