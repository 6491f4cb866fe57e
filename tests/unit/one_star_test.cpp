// Rows of one star that say different things of it.
#include "hz/one_star.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <filesystem>
#include <map>

#include "list_files.hpp"

namespace hz {
namespace {

using ::testing::ElementsAre;
using ::testing::IsEmpty;
using ::testing::Optional;

Field stated(double value, std::optional<double> error = std::nullopt, LimitMark limit = LimitMark::none) {
  return {Measured{value, error, error, limit, false}, {}};
}

Candidate planet_of(const std::string& star, Field teff, Field radius = {}, Field mass = {}) {
  Candidate candidate;
  candidate.row.planet.name = "any";
  candidate.row.star.name = star;
  candidate.row.star.teff = std::move(teff);
  candidate.row.star.stellar_radius = std::move(radius);
  candidate.row.star.stellar_mass = std::move(mass);
  return candidate;
}

double teff_of(const Candidate& candidate) { return candidate.row.star.teff.stated->value; }

TEST(CompareStars, ReportsTheStarsWhoseRowsDiffer) {
  std::vector<Candidate> rows{
      planet_of("Lantern 1", stated(5000), stated(0.9), stated(1)), planet_of("Lantern 2", stated(4000)),
      planet_of("LANTERN1", stated(5200), stated(0.9), stated(0.85)), planet_of("Lantern 2", stated(4000, 50))};
  const StarsCompared compared = compare_stars(rows, OneStar::as_given);
  ASSERT_EQ(compared.conflicts.size(), 1U) << "a value with an error and the same without agree";
  EXPECT_THAT(compared.conflicts[0].rows, ElementsAre(0, 2));
  EXPECT_THAT(compared.conflicts[0].quantities, ElementsAre(Quantity::teff, Quantity::stellar_mass));
  EXPECT_EQ(compared.conflicts[0].what, "teff 5000 to 5200, stellar_mass 0.85 to 1");
  EXPECT_EQ(teff_of(rows[2]), 5200) << "each row stands as it is";
  EXPECT_THAT(compared.taken_from, ::testing::Each(std::nullopt));
}

TEST(CompareStars, LuminosityAndItsLogarithmCountAsStated) {
  std::vector<Candidate> rows(4, planet_of("Lantern 1", {}));
  rows[0].row.star.luminosity = stated(1);
  rows[1].row.star.log_luminosity = stated(0);
  rows[2].row.star.log_luminosity = stated(0.01);
  const StarsCompared compared = compare_stars(rows, OneStar::as_given);
  ASSERT_EQ(compared.conflicts.size(), 1U);
  EXPECT_THAT(compared.conflicts[0].quantities, ElementsAre(Quantity::log_luminosity));
}

TEST(CompareStars, LimitsMissingValuesAndUnitConversionsAreNoConflict) {
  std::vector<Candidate> rows{planet_of("a", stated(5000), {}, stated(0.7)),
                              planet_of("a", stated(4000, {}, LimitMark::lower), {}, stated(0.7 * (1 + 1e-15))),
                              planet_of("a", {}), planet_of("", stated(5000)), planet_of("", stated(6000))};
  EXPECT_THAT(compare_stars(rows, OneStar::as_given).conflicts, IsEmpty());
}

TEST(CompareStars, RowsWithoutAPlanetAreLeftAlone) {
  std::vector<Candidate> rows{planet_of("a", stated(5000)), planet_of("a", stated(6000))};
  rows[1].row.planet.name.clear();
  EXPECT_THAT(compare_stars(rows, OneStar::first).conflicts, IsEmpty());
  EXPECT_EQ(teff_of(rows[1]), 6000);
}

TEST(CompareStars, FirstGivesAllRowsTheFirstStarThatSaysAnything) {
  std::vector<Candidate> rows{planet_of("a", {}), planet_of("A", stated(5000), stated(0.9)),
                              planet_of("b", stated(4000)), planet_of("a", stated(5200, 20), stated(0.9, 0.1))};
  const StarsCompared compared = compare_stars(rows, OneStar::first);
  EXPECT_EQ(teff_of(rows[0]), 5000);
  EXPECT_EQ(teff_of(rows[3]), 5000);
  EXPECT_FALSE(rows[3].row.star.teff.stated->plus) << "the whole record is taken, nothing is mixed";
  EXPECT_EQ(rows[0].row.star.name, "a") << "names stay as they are spelt";
  EXPECT_EQ(teff_of(rows[2]), 4000);
  EXPECT_THAT(compared.taken_from, ElementsAre(Optional(1U), std::nullopt, std::nullopt, Optional(1U)));
  ASSERT_EQ(compared.conflicts.size(), 1U);
  EXPECT_THAT(compared.conflicts[0].rows, ElementsAre(0, 1, 3)) << "the conflict is told even where it is settled";
}

TEST(CompareStars, BestIsTheStarWithMostErrorsStated) {
  std::vector<Candidate> rows{planet_of("a", stated(5000, 10)), planet_of("a", stated(5100, 90), stated(0.9, 0.2)),
                              planet_of("a", stated(5200, 0), stated(0.9), stated(0.9, 0.1))};
  static_cast<void>(compare_stars(rows, OneStar::best));
  EXPECT_EQ(teff_of(rows[0]), 5100) << "two errors; a printed 0 is none";
  EXPECT_EQ(teff_of(rows[2]), 5100);
}

TEST(CompareStars, ThenTheOneWithTheSmallestErrorsOfTeffAndRadiusThenTheFirst) {
  // 2 % + 10 %, 3 % + 5 % and, as good but later, 3 % + 5 %.
  std::vector<Candidate> rows{planet_of("a", stated(5000, 100), stated(1, 0.1)),
                              planet_of("a", stated(5100, 153), stated(1, 0.05)),
                              planet_of("a", stated(5200, 156), stated(1, 0.05))};
  static_cast<void>(compare_stars(rows, OneStar::best));
  for (const Candidate& row : rows) EXPECT_EQ(teff_of(row), 5100);

  std::vector<Candidate> no_radius{planet_of("a", stated(5000, 100), {}, stated(1, 0.1)),
                                   planet_of("a", stated(5100, 50), stated(0.9, 0.1))};
  static_cast<void>(compare_stars(no_radius, OneStar::best));
  EXPECT_EQ(teff_of(no_radius[0]), 5100) << "an error that is not stated is no small one";
}

TEST(CompareStars, ALuminosityAndItsLogarithmAreOneMeasurement) {
  std::vector<Candidate> rows{planet_of("a", stated(5000, 10)), planet_of("a", stated(5100, 90), stated(0.9, 0.2))};
  rows[0].row.star.luminosity = stated(1, 0.1);
  rows[0].row.star.log_luminosity = stated(0, 0.04);
  static_cast<void>(compare_stars(rows, OneStar::best));
  EXPECT_EQ(teff_of(rows[1]), 5100) << "two against two: then the known error of the radius decides";
}

// Source: README of the composite list, and counted from the file by another program: 192 hosts (538 rows) whose rows
// differ in Teff (169), R (162) or M (131).
TEST(CompareStars, FindsTheHostsOfTheCompositeListThatDiffer) {
  const std::string path = HZ_TEST_DIR "/../../shared/data/planets_composite_2023.csv";
  if (!std::filesystem::exists(path)) GTEST_SKIP() << "the list planets_composite_2023.csv is not here";
  std::vector<Candidate> candidates;
  for (ListRow& row : testing::read_list(path)) candidates.push_back({std::move(row), {}, false, ""});
  std::size_t rows = 0;
  std::map<Quantity, std::size_t> counts;
  const StarsCompared compared = compare_stars(candidates, OneStar::as_given);
  for (const StarConflict& conflict : compared.conflicts) {
    rows += conflict.rows.size();
    for (const Quantity quantity : conflict.quantities) ++counts[quantity];
  }
  EXPECT_EQ(compared.conflicts.size(), 192U) << "the list states no luminosity";
  EXPECT_EQ(rows, 538U);
  EXPECT_EQ(counts, (std::map<Quantity, std::size_t>{
                        {Quantity::teff, 169}, {Quantity::stellar_radius, 162}, {Quantity::stellar_mass, 131}}));
  static_cast<void>(compare_stars(candidates, OneStar::best));
  EXPECT_THAT(compare_stars(candidates, OneStar::as_given).conflicts, IsEmpty());
}

}  // namespace
}  // namespace hz
