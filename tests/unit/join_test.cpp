// Planets joined to stars by what both are called, and by where both stand.
#include "hz/join.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <algorithm>
#include <chrono>
#include <filesystem>
#include <functional>
#include <numeric>
#include <random>
#include <string>
#include <vector>

#include "list_files.hpp"

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

// --- by position ---

using Places = std::vector<std::optional<SkyPosition>>;
constexpr double arcsec = 1.0 / 3600;  // deg

Joiner joined_on_sky(const Places& planets, const Places& stars, double tolerance) {
  Joiner joiner(planets.size(), stars.size());
  joiner.by_position(planets, stars, tolerance);
  return joiner;
}

TEST(JoinerByPosition, TheNearestWithinTheToleranceFits) {
  const Places stars{SkyPosition{10, 0}, SkyPosition{10 + 4 * arcsec, 0}, SkyPosition{50, 0}, std::nullopt};
  const Joiner joiner =
      joined_on_sky({SkyPosition{10, 1 * arcsec}, SkyPosition{50, 6 * arcsec}, std::nullopt}, stars, 5);
  EXPECT_EQ(joiner.planets()[0].standing, Standing::matched) << "the other star lies four times as far";
  EXPECT_THAT(joiner.planets()[0].stars, ElementsAre(0));
  EXPECT_NEAR(*joiner.planets()[0].distance, 1, 1e-6);
  EXPECT_EQ(joiner.planets()[1].standing, Standing::unmatched) << "6 arcsec are too far";
  EXPECT_EQ(joiner.planets()[2].standing, Standing::unmatched);
  EXPECT_THAT(joiner.stars(),
              ElementsAre(Standing::matched, Standing::unmatched, Standing::unmatched, Standing::unmatched));
}

TEST(JoinerByPosition, StarsAboutAsNearAreAmbiguous) {
  const Places stars{SkyPosition{10, 3.9 * arcsec}, SkyPosition{10, -2 * arcsec}, SkyPosition{10, 4.9 * arcsec}};
  const Joiner joiner = joined_on_sky({SkyPosition{10, 0}}, stars, 5);
  EXPECT_EQ(joiner.planets()[0].standing, Standing::ambiguous) << "3.9 arcsec are less than twice 2";
  EXPECT_THAT(joiner.planets()[0].stars, ElementsAre(0, 1));
  EXPECT_FALSE(joiner.planets()[0].distance);
  EXPECT_THAT(joiner.stars(), ElementsAre(Standing::ambiguous, Standing::ambiguous, Standing::unmatched));
  EXPECT_EQ(joined_on_sky({SkyPosition{10, 0}}, stars, 3).planets()[0].standing, Standing::matched)
      << "a smaller tolerance leaves only one";
}

TEST(JoinerByPosition, TwoStarsInOnePlaceAreAmbiguous) {
  const Places same{SkyPosition{10, 0}, SkyPosition{10, 0}};
  EXPECT_EQ(joined_on_sky({SkyPosition{10, 0}}, same, 5).planets()[0].standing, Standing::ambiguous);
  const Places nearly{SkyPosition{10, 0}, SkyPosition{10, 0.05 * arcsec}};
  EXPECT_EQ(joined_on_sky({SkyPosition{10, 0}}, nearly, 5).planets()[0].standing, Standing::ambiguous);
  const Places apart{SkyPosition{10, 0}, SkyPosition{10, 0.6 * arcsec}};
  EXPECT_EQ(joined_on_sky({SkyPosition{10, 0}}, apart, 5).planets()[0].standing, Standing::matched);
}

TEST(JoinerByPosition, TheMeridianAndThePolesAreNoBorders) {
  const Places stars{SkyPosition{359.9999, 0}, SkyPosition{0, 89.9999}, SkyPosition{90, -90}};
  const Joiner joiner =
      joined_on_sky({SkyPosition{0.0001, 0}, SkyPosition{180, 89.9999}, SkyPosition{270, -89.9999}}, stars, 1);
  for (std::size_t i = 0; i < 3; ++i) {
    EXPECT_EQ(joiner.planets()[i].standing, Standing::matched);
    EXPECT_THAT(joiner.planets()[i].stars, ElementsAre(i));
  }
}

TEST(JoinerByPosition, NamesAndPositionsFollowEachOther) {
  Joiner joiner(3, 2);
  joiner.by_name(Names{{"a"}, {"x"}, {"y"}}, Names{{"a"}, {"b"}}, NameMatching::folded);
  joiner.by_position(Places{SkyPosition{2, 0}, SkyPosition{2, 0}, SkyPosition{3, 0}},
                     Places{SkyPosition{1, 0}, SkyPosition{2, 0}}, 1);
  EXPECT_THAT(joiner.planets()[0].stars, ElementsAre(0)) << "its name comes first, wherever it stands";
  EXPECT_FALSE(joiner.planets()[0].distance);
  EXPECT_THAT(joiner.planets()[1].stars, ElementsAre(1));
  EXPECT_EQ(joiner.planets()[1].way, 1U);
  EXPECT_EQ(joiner.planets()[2].standing, Standing::unmatched);
}

TEST(JoinerByPosition, AgreesWithComparingEveryPair) {
  std::mt19937 random(20240502);
  std::uniform_real_distribution<double> within(-60 * arcsec, 60 * arcsec);
  const auto some_places = [&](std::size_t rows) {
    Places places;
    for (std::size_t i = 0; i < rows; ++i) {
      const double ra = std::fmod(360 + within(random), 360);
      places.push_back(SkyPosition{ra, 10 + within(random)});
    }
    return places;
  };
  const Places stars = some_places(100);
  const Places planets = some_places(400);
  const Joiner joiner = joined_on_sky(planets, stars, 5);
  std::array<std::size_t, 3> counts{};
  for (std::size_t i = 0; i < planets.size(); ++i) {
    std::vector<double> distances;
    for (const auto& star : stars) distances.push_back(angular_distance(*planets[i], *star));
    const double nearest = *std::min_element(distances.begin(), distances.end());
    const auto as_near = std::count_if(distances.begin(), distances.end(), [&](double distance) {
      return distance <= 5 && distance <= std::max(0.1, 2 * nearest);
    });
    const Standing expected = as_near == 0   ? Standing::unmatched
                              : as_near == 1 ? Standing::matched
                                             : Standing::ambiguous;
    EXPECT_EQ(joiner.planets()[i].standing, expected) << i;
    ++counts[static_cast<std::size_t>(expected)];
    if (expected != Standing::matched) continue;
    EXPECT_EQ(*joiner.planets()[i].distance, nearest);
  }
  EXPECT_THAT(counts, ::testing::Each(::testing::Gt(20U))) << "each kind was met";
}

Places places_of(const std::string& path, const std::string& ra_name, const std::string& dec_name) {
  const testing::WholeTable table = testing::read_whole(path);
  const auto column = [&](const std::string& name) {
    const auto found = std::find_if(table.head.columns.begin(), table.head.columns.end(),
                                    [&](const ColumnHead& head) { return head.name == name; });
    return static_cast<std::size_t>(found - table.head.columns.begin());
  };
  const std::size_t ra_column = column(ra_name);
  const std::size_t dec_column = column(dec_name);
  Places places;
  for (const auto& cells : table.rows) {
    const Result<double> ra = read_right_ascension(cells.at(ra_column));
    const Result<double> dec = read_declination(cells.at(dec_column));
    places.push_back(ra && dec ? std::optional(SkyPosition{*ra, *dec}) : std::nullopt);
  }
  return places;
}

// Two M-dwarf lists that share no names (Newton et al. 2015, ApJ 800, 85; Lepine & Gaidos 2011, AJ 142, 138). Counted
// by another program, every pair compared: 291 of the first have a star of the second within 30 arcsec, 286 within 5.
TEST(JoinerByPosition, FindsTheMDwarfsOfOneListInAnother) {
  const std::string folder = HZ_TEST_DIR "/../../shared/data/";
  if (!std::filesystem::exists(folder)) GTEST_SKIP() << "the lists of M dwarfs are not here";
  const Places spectra = places_of(folder + "mdwarfs_spectra_2015.csv", "_RAJ2000", "_DEJ2000");
  const Places bright = places_of(folder + "mdwarfs_bright_2011.csv", "RA_ICRS", "DE_ICRS");
  const auto found = [&](double tolerance) {
    const Joiner joiner = joined_on_sky(spectra, bright, tolerance);
    return std::count_if(joiner.planets().begin(), joiner.planets().end(),
                         [](const StarFit& fit) { return fit.standing != Standing::unmatched; });
  };
  EXPECT_EQ(found(30), 291);
  EXPECT_EQ(found(5), 286);
}

Field stated(double value) { return {Measured{value, {}, {}, LimitMark::none, false}, {}}; }

TEST(CompletedStar, TakesOnlyWhatTheStarListDoesNotSay) {
  StarRecord star;
  star.name = "Lantern 4";
  star.teff = stated(5000);
  star.stellar_radius.problem =
      std::make_shared<const Unread>(Unread{{ProblemCode::unreadable, "R", "R holds x"}, "x"});
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
