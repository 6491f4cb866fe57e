#include "hz/ranking.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"

namespace hz {
namespace {

using ::testing::ElementsAre;
using testing::exactly;
using ::testing::HasSubstr;
using testing::settings_of;
using testing::value;

/// A planet of a star like the Sun with this insolation.
Candidate candidate(const std::string& name, const Field& insolation, const Field& teff = value(5780, 60, 60)) {
  static std::size_t number = 0;
  Candidate made;
  made.row.number = ++number;
  made.row.line = number + 1;
  made.row.planet.name = name;
  made.row.star.teff = teff;
  made.row.planet.insolation = insolation;
  made.row.planet.planet_mass = value(1, 0.1, 0.1);
  made.answer = answer(made.row, settings_of());
  EXPECT_EQ(made.answer.status, Status::answered) << made.answer.reason;
  return made;
}

Candidate of_merit(const std::string& name, double merit, double insolation = 0.6, bool beyond = false) {
  Candidate made = candidate(name, value(insolation, 0.01, 0.01));
  made.answer.planet->merit = merit;
  if (beyond) made.answer.flags.emplace_back("beyond_planet_mass");
  return made;
}

/// "1 a", "2= b": places as they are printed.
std::vector<std::string> lines(const std::vector<Candidate>& candidates) {
  std::vector<std::string> shown;
  for (const Place& place : places_of(candidates)) {
    shown.push_back(std::to_string(place.rank) + (place.shared ? "= " : " ") +
                    candidates[place.candidate].row.planet.name);
  }
  return shown;
}

std::vector<std::string> in_the_running(const std::vector<Candidate>& candidates) {
  std::vector<std::string> names;
  for (const Candidate& c : candidates) {
    if (c.in_the_running()) names.push_back(c.row.planet.name);
  }
  return names;
}

// ---- order --------------------------------------------------------------------------------------------------------

TEST(Places, GoByMerit) {
  EXPECT_THAT(lines({of_merit("a", 0.2), of_merit("b", 0.9), of_merit("c", 0.5)}), ElementsAre("1 b", "2 c", "3 a"));
}

TEST(Places, EqualMeritToTwoDecimalsSharesAPlace) {
  EXPECT_THAT(
      lines({of_merit("a", 0.9), of_merit("b", 0.7), of_merit("c", 0.501), of_merit("d", 0.504), of_merit("e", 0.1)}),
      ElementsAre("1 a", "2 b", "3= c", "3= d", "5 e"));
}

TEST(Places, WithinAPlaceTheMiddleOfTheZoneComesFirstAndThenTheName) {
  const double middle = std::sqrt(1.107 * 0.356);
  EXPECT_THAT(
      lines({of_merit("z", 1, 0.9), of_merit("y", 0.999, middle), of_merit("b", 1, 0.8), of_merit("a", 1, 0.8)}),
      ElementsAre("1= y", "1= a", "1= b", "1= z"));
}

TEST(Places, BeyondTheFitsPlanetMassesIsASectionOfItsOwn) {
  const std::vector<Candidate> candidates = {of_merit("giant", 0.9, 0.6, true), of_merit("rock", 0.2),
                                             of_merit("other giant", 0.2, 0.6, true)};
  EXPECT_THAT(lines(candidates), ElementsAre("1 rock", "2 giant", "3 other giant"));
  const std::vector<Place> places = places_of(candidates);
  EXPECT_FALSE(places[0].beyond_planet_mass);
  EXPECT_TRUE(places[1].beyond_planet_mass);
}

TEST(Places, NoPlaceIsSharedAcrossTheSections) {
  EXPECT_THAT(lines({of_merit("giant", 0.5, 0.6, true), of_merit("rock", 0.5)}), ElementsAre("1 rock", "2 giant"));
}

TEST(Places, AreOnlyForRowsInTheRunning) {
  std::vector<Candidate> candidates = {of_merit("a", 0.2), of_merit("b", 0.9), of_merit("c", 0.5), of_merit("d", 0.4)};
  candidates[1].cut_reason = "planet_radius<1.8 is not met: 2";
  candidates[2].answer.status = Status::set_aside;
  candidates[3].answer.planet.reset();
  EXPECT_THAT(lines(candidates), ElementsAre("1 a"));
  EXPECT_TRUE(places_of({}).empty());
}

// ---- several rows of one planet -----------------------------------------------------------------------------------

TEST(FoldedName, IgnoresBlanksAndCase) {
  EXPECT_EQ(folded_name("Lantern 27 D"), "lantern27d");
  EXPECT_EQ(folded_name(" lantern\t27d "), "lantern27d");
  EXPECT_EQ(folded_name(""), "");
  EXPECT_NE(folded_name("Lantern 2 b"), folded_name("Lantern 2 c"));
}

TEST(OneRowAPlanet, TheAdoptedOneWins) {
  std::vector<Candidate> rows = {candidate("Lantern 4 b", value(0.6, 0.01, 0.01)),
                                 candidate("lantern 4B", exactly(0.9)),
                                 candidate("Lantern 4 c", value(0.6, 0.01, 0.01))};
  rows[0].preferred = true;
  rows[1].row.planet.adopted = true;
  keep_one_row_a_planet(rows);
  EXPECT_THAT(in_the_running(rows), ElementsAre("lantern 4B", "Lantern 4 c"));
  EXPECT_EQ(rows[0].answer.reason_kind, "another row of this planet is used");
  EXPECT_EQ(rows[0].answer.reason,
            "another row of this planet is used: line " + std::to_string(rows[1].row.line) + " (adopted)");
}

TEST(OneRowAPlanet, ThenThePreferredOne) {
  std::vector<Candidate> rows = {candidate("b2 b", value(0.6, 0.01, 0.01)), candidate("b2 b", exactly(0.9))};
  rows[1].preferred = true;
  keep_one_row_a_planet(rows);
  EXPECT_EQ(rows[0].answer.status, Status::set_aside);
  EXPECT_THAT(rows[0].answer.reason, HasSubstr("(preferred)"));
}

TEST(OneRowAPlanet, ThenTheOneWithMostInputsMeasured) {
  std::vector<Candidate> rows = {candidate("b2 b", exactly(0.6)), candidate("b2 b", value(0.9, 0.5, 0.5))};
  keep_one_row_a_planet(rows);
  EXPECT_EQ(rows[0].answer.status, Status::set_aside);
  EXPECT_THAT(rows[0].answer.reason, HasSubstr("(more inputs measured)"));
}

TEST(OneRowAPlanet, ThenTheSmallestRelativeUncertainty) {
  std::vector<Candidate> rows = {candidate("b2 b", value(0.6, 0.1, 0.1)), candidate("b2 b", value(0.9, 0.1, 0.1)),
                                 candidate("b2 b", value(0.3, 0.1, 0.1))};
  keep_one_row_a_planet(rows);
  EXPECT_EQ(rows[1].answer.status, Status::answered);
  EXPECT_THAT(rows[0].answer.reason, HasSubstr("(smaller error of insolation)"));
  EXPECT_EQ(rows[2].answer.status, Status::set_aside);
}

TEST(OneRowAPlanet, AnAssumedErrorCountsAsInfinite) {
  std::vector<Candidate> rows = {candidate("b2 b", value(0.6)),
                                 candidate("b2 b", value(0.6, 0.5, 0.5))};  // 6 per cent assumed
  rows[0].row.star.stellar_radius = value(1, 0.1, 0.1);                     // as many measured inputs
  keep_one_row_a_planet(rows);
  EXPECT_EQ(rows[0].answer.status, Status::set_aside);
  EXPECT_THAT(rows[0].answer.reason, HasSubstr("(smaller error of insolation)"));
}

TEST(OneRowAPlanet, ThenFileOrder) {
  std::vector<Candidate> rows = {candidate("b2 b", value(0.6, 0.1, 0.1)), candidate("b2 b", value(0.6, 0.1, 0.1))};
  keep_one_row_a_planet(rows);
  EXPECT_EQ(rows[0].answer.status, Status::answered);
  EXPECT_THAT(rows[1].answer.reason, HasSubstr("(it stands first)"));
}

TEST(OneRowAPlanet, TheWinnerSaysHowManyAndOverWhatRangeTheirPRun) {
  std::vector<Candidate> rows = {candidate("b2 b", value(0.6, 0.01, 0.01)), candidate("b2 b", value(1.107, 0.1, 0.1)),
                                 candidate("b2 b", value(5, 0.1, 0.1))};
  rows[1].row.planet.adopted = true;
  keep_one_row_a_planet(rows);
  EXPECT_THAT(rows[1].answer.note, HasSubstr("3 rows of this planet, P from 0.00 to 1.00"));
}

TEST(OneRowAPlanet, ABareLetterNeedsItsStar) {
  std::vector<Candidate> rows = {candidate("b", value(0.6, 0.1, 0.1)), candidate("b", value(0.7, 0.1, 0.1)),
                                 candidate("b", value(0.8, 0.1, 0.1))};
  rows[0].row.star.name = "Lantern 4";
  rows[1].row.star.name = "Lantern 5";
  rows[2].row.star.name = "LANTERN4";
  keep_one_row_a_planet(rows);
  EXPECT_EQ(rows[0].answer.status, Status::set_aside);  // 0.8 +- 0.1 is known better
  EXPECT_EQ(rows[1].answer.status, Status::answered);
  EXPECT_EQ(rows[2].answer.status, Status::answered);
}

TEST(OneRowAPlanet, NamelessRowsAndRowsSetAsideStayAsTheyAre) {
  std::vector<Candidate> rows = {candidate("", value(0.6, 0.1, 0.1)), candidate("", value(0.6, 0.1, 0.1)),
                                 candidate("x1 b", value(0.6, 0.1, 0.1)), candidate("x1 b", value(0.6, 0.1, 0.1))};
  rows[2].answer.status = Status::set_aside;
  rows[2].answer.reason = "teff is only a limit";
  keep_one_row_a_planet(rows);
  EXPECT_EQ(rows[0].answer.status, Status::answered);
  EXPECT_EQ(rows[1].answer.status, Status::answered);
  EXPECT_EQ(rows[2].answer.reason, "teff is only a limit");
  EXPECT_EQ(rows[3].answer.status, Status::answered);
  EXPECT_TRUE(rows[3].answer.note.empty());
}

// ---- rows without errors ------------------------------------------------------------------------------------------

/// What acceptance asks: a row whose half-widths are all missing or 0 never stands above an equal row that has them.
class RowsWithoutErrors : public ::testing::TestWithParam<double> {};

Field teff_without(bool printed_zero) { return printed_zero ? value(5780, 0, 0) : value(5780); }

TEST_P(RowsWithoutErrors, NeverStandAboveAnEqualRowThatHasThem) {
  for (const double relative : {0.01, 0.05, 0.2, 0.5}) {
    for (const bool printed_zero : {false, true}) {
      const double s = GetParam();
      // "a" would come first by its name and by its place in the file.
      std::vector<Candidate> rows = {
          candidate("a", printed_zero ? value(s, 0, 0) : value(s), teff_without(printed_zero)),
          candidate("b", value(s, relative * s, relative * s))};
      rows[0].row.planet.planet_mass = value(1);
      rows[0].answer = answer(rows[0].row, settings_of());
      humble_rows_without_errors(rows);
      const std::vector<Place> places = places_of(rows);
      EXPECT_EQ(places.front().candidate, 1U) << s << " " << relative;
      EXPECT_LE(places.front().rank, places.back().rank);
      EXPECT_LE(rows[0].answer.planet->merit, rows[1].answer.planet->merit);
    }
  }
}

// In the middle, near both edges of the conservative zone on either side, and near those of the optimistic one.
INSTANTIATE_TEST_SUITE_P(Insolations, RowsWithoutErrors,
                         ::testing::Values(0.6, 1.05, 1.15, 1.7, 1.9, 0.37, 0.34, 0.31));

TEST(RowsWithoutErrors, NoteWhyTheirMeritWasCut) {
  std::vector<Candidate> rows = {candidate("a", value(1.0), value(5780)), candidate("b", value(1.0, 0.4, 0.4))};
  rows[0].row.planet.planet_mass = value(1);
  rows[0].answer = answer(rows[0].row, settings_of());
  ASSERT_GT(rows[0].answer.planet->merit, rows[1].answer.planet->merit);
  humble_rows_without_errors(rows);
  EXPECT_THAT(rows[0].answer.note, HasSubstr("merit cut to that of an equal row with errors (line "));
}

TEST(RowsWithoutErrors, AreLeftAloneWithoutAnEqualRow) {
  std::vector<Candidate> rows = {candidate("a", value(1.0), value(5780)), candidate("b", value(0.99, 0.4, 0.4))};
  rows[0].row.planet.planet_mass = value(1);
  rows[0].answer = answer(rows[0].row, settings_of());
  const double merit = rows[0].answer.planet->merit;
  humble_rows_without_errors(rows);
  EXPECT_EQ(rows[0].answer.planet->merit, merit);
}

}  // namespace
}  // namespace hz
