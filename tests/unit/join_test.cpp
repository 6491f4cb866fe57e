// Planets joined to stars by what both are called.
#include "hz/join.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <algorithm>
#include <chrono>
#include <numeric>
#include <random>
#include <string>
#include <vector>

namespace hz {
namespace {

using ::testing::ElementsAre;
using ::testing::IsEmpty;

using Names = std::vector<Aliases>;

Joiner joined(const Names& planets, const Names& stars, NameMatching matching = NameMatching::folded) {
  Joiner joiner(planets.size(), stars.size());
  joiner.by_name(planets, stars, matching);
  return joiner;
}

TEST(Aliases, ArePartedTrimmedAndWithoutTheWordsForNoValue) {
  EXPECT_THAT(aliases_of("Lantern 4"), ElementsAre("Lantern 4"));
  EXPECT_THAT(aliases_of("  Lantern 4 ;LTN 4;; n/a ; - "), ElementsAre("Lantern 4", "LTN 4"));
  EXPECT_THAT(aliases_of(""), IsEmpty());
  EXPECT_THAT(aliases_of(" ; NaN"), IsEmpty());
  const std::vector<std::string> missing{"Unknown"};
  EXPECT_THAT(aliases_of("unknown;Lantern 4", missing), ElementsAre("Lantern 4"));
}

TEST(Joiner, BlanksAndCaseDoNotMatterUnlessNamesAreExact) {
  const Names planets{{"LANTERN  4"}, {"lantern 4"}};
  const Names stars{{"Lantern 3"}, {"Lantern 4"}};
  const Joiner folded = joined(planets, stars);
  EXPECT_EQ(folded.planets()[0].standing, Standing::matched);
  EXPECT_THAT(folded.planets()[0].stars, ElementsAre(1));
  EXPECT_THAT(folded.stars(), ElementsAre(Standing::unmatched, Standing::matched));
  const Joiner exact = joined(planets, stars, NameMatching::exact);
  EXPECT_EQ(exact.planets()[0].standing, Standing::unmatched);
  EXPECT_EQ(joined({{"Lantern 4"}}, stars, NameMatching::exact).planets()[0].standing, Standing::matched);
}

TEST(Joiner, AnyAliasOfEitherSideFits) {
  const Joiner joiner = joined({{"HX 9", "LTN 4"}, {"HX 9"}}, {{"Lantern 4", "LTN4"}, {"Lantern 9", "hx 9", "HX9"}});
  // The first planet shares a name with both stars.
  EXPECT_EQ(joiner.planets()[0].standing, Standing::ambiguous);
  EXPECT_THAT(joiner.planets()[0].stars, ElementsAre(0, 1));
  EXPECT_EQ(joiner.planets()[1].standing, Standing::matched);
  EXPECT_THAT(joiner.planets()[1].stars, ElementsAre(1));
  // A star that has a planet of its own is matched, whatever else fits it.
  EXPECT_THAT(joiner.stars(), ElementsAre(Standing::ambiguous, Standing::matched));
}

TEST(Joiner, ManyPlanetsMayHaveOneStarAndManyNamesMeanOne) {
  const Joiner joiner = joined({{"a", "A", "b"}, {"a"}, {"b"}}, {{"a", "b"}});
  for (const StarFit& fit : joiner.planets()) EXPECT_EQ(fit.standing, Standing::matched);
}

TEST(Joiner, TwoStarsOfOneNameAreNeitherTaken) {
  const Joiner joiner = joined({{"x"}, {"y"}}, {{"x"}, {"y"}, {"X"}, {"z"}});
  EXPECT_EQ(joiner.planets()[0].standing, Standing::ambiguous);
  EXPECT_THAT(joiner.planets()[0].stars, ElementsAre(0, 2));
  EXPECT_THAT(joiner.stars(),
              ElementsAre(Standing::ambiguous, Standing::matched, Standing::ambiguous, Standing::unmatched));
}

TEST(Joiner, RowsWithoutNamesFitNothing) {
  const Joiner joiner = joined({{}, {"x"}}, {{}, {"y"}, {}});
  for (const StarFit& fit : joiner.planets()) EXPECT_EQ(fit.standing, Standing::unmatched);
  EXPECT_THAT(joiner.stars(), ::testing::Each(Standing::unmatched));
}

TEST(Joiner, ListsMayBeEmpty) {
  EXPECT_THAT(joined({}, {{"x"}}).stars(), ElementsAre(Standing::unmatched));
  EXPECT_EQ(joined({{"x"}}, {}).planets()[0].standing, Standing::unmatched);
}

TEST(Joiner, NamesBeyondAsciiCompareByteForByte) {
  const Joiner joiner = joined({{"Λύχνος 6"}, {"λύχνος6"}, {"L\xff"}}, {{"Λύχνος  6"}, {"l\xff"}});
  EXPECT_THAT(joiner.planets()[0].stars, ElementsAre(0));
  EXPECT_EQ(joiner.planets()[1].standing, Standing::unmatched) << "only ASCII letters have a lower case here";
  EXPECT_THAT(joiner.planets()[2].stars, ElementsAre(1)) << "bytes that are no text compare as they stand";
}

TEST(Joiner, TheFirstWayThatFitsCounts) {
  const Names stars_by_first{{"1"}, {"2"}, {"2"}};
  const Names stars_by_second{{"a"}, {"b"}, {"c"}};
  const Names planets_by_first{{"1"}, {"2"}, {}, {"9"}};
  const Names planets_by_second{{"b"}, {"b"}, {"c"}, {"d"}};
  Joiner joiner(4, 3);
  joiner.by_name(planets_by_first, stars_by_first, NameMatching::folded);
  joiner.by_name(planets_by_second, stars_by_second, NameMatching::folded);
  EXPECT_EQ(joiner.planets()[0].way, 0U);
  EXPECT_THAT(joiner.planets()[0].stars, ElementsAre(0));
  EXPECT_EQ(joiner.planets()[1].standing, Standing::ambiguous) << "a later way does not overrule the first that fits";
  EXPECT_EQ(joiner.planets()[2].way, 1U);
  EXPECT_THAT(joiner.planets()[2].stars, ElementsAre(2));
  EXPECT_EQ(joiner.planets()[3].standing, Standing::unmatched);
  EXPECT_THAT(joiner.stars(), ElementsAre(Standing::matched, Standing::ambiguous, Standing::matched));
}

TEST(Joiner, NoMoreThanThreeOfTheStarsThatFitAreNamed) {
  const Joiner joiner = joined({{"x", "y"}}, {{"y"}, {"x"}, {"x"}, {"y"}, {"x"}, {"z"}});
  EXPECT_THAT(joiner.planets()[0].stars, ElementsAre(0, 1, 2));
  EXPECT_EQ(std::count(joiner.stars().begin(), joiner.stars().end(), Standing::ambiguous), 5);
}

/// Every pair compared: slow, and plain to see that it is right.
Standing standing_by_comparison(const Aliases& planet, const Names& stars, std::vector<std::size_t>& fits) {
  for (std::size_t star = 0; star < stars.size(); ++star) {
    const auto shares = [&](const std::string& name) {
      return std::find(stars[star].begin(), stars[star].end(), name) != stars[star].end();
    };
    if (std::any_of(planet.begin(), planet.end(), shares)) fits.push_back(star);
  }
  return fits.empty() ? Standing::unmatched : fits.size() == 1 ? Standing::matched : Standing::ambiguous;
}

TEST(Joiner, AgreesWithComparingEveryPair) {
  std::mt19937 random(20240501);
  const auto some_names = [&](std::size_t rows) {
    Names names(rows);
    for (Aliases& aliases : names) {
      for (unsigned i = random() % 4; i > 0; --i) aliases.push_back(std::to_string(random() % 400));
    }
    return names;
  };
  const Names planets = some_names(300);
  const Names stars = some_names(200);
  const Joiner joiner = joined(planets, stars, NameMatching::exact);
  std::vector<Standing> of_stars(stars.size(), Standing::unmatched);
  for (std::size_t i = 0; i < planets.size(); ++i) {
    std::vector<std::size_t> fits;
    const Standing standing = standing_by_comparison(planets[i], stars, fits);
    EXPECT_EQ(joiner.planets()[i].standing, standing);
    for (const std::size_t star : fits) {
      if (of_stars[star] != Standing::matched) of_stars[star] = standing;
    }
    fits.resize(std::min<std::size_t>(3, fits.size()));
    EXPECT_EQ(joiner.planets()[i].stars, fits);
  }
  EXPECT_EQ(joiner.stars(), of_stars);
}

double seconds_of(const std::function<void()>& action) {
  const auto start = std::chrono::steady_clock::now();
  action();
  return std::chrono::duration<double>(std::chrono::steady_clock::now() - start).count();
}

// Comparing every pair of these would take minutes; the bound leaves room for a slow, busy machine.
TEST(Joiner, AHundredThousandByAHundredThousandInAboutASecond) {
  constexpr std::size_t rows = 100000;
  Names stars;
  for (std::size_t i = 0; i < rows; ++i) stars.push_back({"Lantern " + std::to_string(i), "LTN " + std::to_string(i)});
  Names planets(stars.rbegin(), stars.rend());
  EXPECT_LT(seconds_of([&] {
              const Joiner joiner = joined(planets, stars);
              EXPECT_THAT(joiner.planets().front().stars, ElementsAre(rows - 1));
              EXPECT_THAT(joiner.stars(), ::testing::Each(Standing::matched));
            }),
            10);
  const Names namesakes(rows, Aliases{"the same"});
  EXPECT_LT(seconds_of([&] {
              const Joiner joiner = joined(namesakes, namesakes);
              EXPECT_THAT(joiner.stars(), ::testing::Each(Standing::ambiguous));
            }),
            10);
}

Field stated(double value) { return {Measured{value, {}, {}, LimitMark::none, false}, {}}; }

TEST(CompletedStar, TakesOnlyWhatTheStarListDoesNotSay) {
  StarRecord star;
  star.name = "Lantern 4";
  star.teff = stated(5000);
  star.stellar_radius.problem = Problem{ProblemCode::unreadable, "R", "R holds x"};
  StarRecord other;
  other.name = "LTN 4";
  other.spectral_type = "K2V";
  other.number_of_stars = 2;
  other.teff = stated(5100);
  other.stellar_radius = stated(0.8);
  other.stellar_mass = stated(0.85);
  const StarRecord both = completed(star, other);
  EXPECT_EQ(both.name, "Lantern 4");
  EXPECT_EQ(both.spectral_type, "K2V");
  EXPECT_EQ(both.number_of_stars, 2);
  EXPECT_EQ(both.teff.stated->value, 5000);
  EXPECT_EQ(both.stellar_mass.stated->value, 0.85);
  EXPECT_TRUE(both.stellar_radius.problem) << "a cell that cannot be read is not passed over";
  EXPECT_FALSE(both.stellar_radius.stated);
}

TEST(CompletedStar, DoesNotMixTwoFormsOfOneQuantity) {
  StarRecord star;
  star.log_luminosity = stated(-1);
  star.parallax = stated(50);
  StarRecord other;
  other.luminosity = stated(0.3);
  other.distance = stated(33);
  const StarRecord both = completed(star, other);
  EXPECT_FALSE(both.luminosity.stated);
  EXPECT_FALSE(both.distance.stated);
  EXPECT_EQ(both.log_luminosity.stated->value, -1);
  const StarRecord from_other = completed({}, other);
  EXPECT_EQ(from_other.luminosity.stated->value, 0.3);
  EXPECT_EQ(from_other.distance.stated->value, 33);
}

}  // namespace
}  // namespace hz
