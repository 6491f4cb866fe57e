#include "hz/sky.hpp"

#include <gtest/gtest.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <random>
#include <stdexcept>
#include <string>

#include "list_files.hpp"

namespace hz {
namespace {

// alpha Centauri C at 14h 29m 42.95s, -62 deg 40 arcmin 46.2 arcsec (10 parsec sample, Reyle et al. 2021, A&A 650,
// A201): 15 (14 + 29/60 + 42.95/3600) = 217.42895833 deg, -(62 + 40/60 + 46.2/3600) = -62.67950000 deg.
constexpr double ra_of_c = 217.428958333333333;
constexpr double dec_of_c = -62.6795;

TEST(RightAscension, Spellings) {
  for (const char* const text :
       {"14 29 42.95", "14:29:42.95", "14h29m42.95s", "14h 29m 42.95s", "14H29M42.95S", "+14 29 42.95",
        " 14  29 42.95 ", "14 29 42.95s", "14:29.7158333333333333", "14.4952638888888889h", "217.428958333333333",
        "217.428958333333333d", "217.428958333333333°", "217d25m44.25s", "217°25′44.25″", "2.17428958333333333e2"}) {
    const auto found = read_right_ascension(text);
    ASSERT_TRUE(found.has_value()) << text << ": " << found.error().what;
    EXPECT_NEAR(*found, ra_of_c, 1e-11) << text;
  }
}

TEST(RightAscension, AFullTurnIsNone) {
  for (const char* const text : {"360", "24 00 00", "23 59 60", "0", "-0", "00:00:00", "24h"}) {
    const auto found = read_right_ascension(text);
    ASSERT_TRUE(found.has_value()) << text;
    EXPECT_EQ(*found, 0) << text;
    EXPECT_FALSE(std::signbit(*found)) << text;
  }
}

TEST(Declination, Spellings) {
  for (const char* const text :
       {"-62 40 46.2", "-62:40:46.2", "-62d40m46.2s", "-62°40′46.2″", "-62° 40' 46.2\"", "-62d40'46.2''",
        "\u221262 40 46.2", "- 62 40 46.2", "-62 40.77", "-62.6795", "-62.6795deg", "-62.6795 deg"}) {
    const auto found = read_declination(text);
    ASSERT_TRUE(found.has_value()) << text << ": " << found.error().what;
    EXPECT_NEAR(*found, dec_of_c, 1e-11) << text;
  }
  EXPECT_NEAR(*read_declination("+04 41 36.1"), 4.69336111111111, 1e-11);
  EXPECT_NEAR(*read_declination("4.69336111111111"), 4.69336111111111, 1e-11);
}

TEST(Declination, SignCountsForAllOfIt) {
  EXPECT_NEAR(*read_declination("-00 12 30"), -(12.0 / 60 + 30.0 / 3600), 1e-13);
  EXPECT_NEAR(*read_declination("-0:12"), -0.2, 1e-13);
  EXPECT_NEAR(*read_declination("+00 12 30"), 12.0 / 60 + 30.0 / 3600, 1e-13);
  EXPECT_NEAR(*read_declination("-0.5"), -0.5, 1e-13);
}

TEST(SkyReading, RefusalsSayWhy) {
  const auto ra = [](const char* text) { return read_right_ascension(text).error(); };
  const auto dec = [](const char* text) { return read_declination(text).error(); };
  EXPECT_EQ(ra("14 29 x").what, "ra holds \"14 29 x\", which is not an angle");
  EXPECT_EQ(ra("14 60 00").what, "ra holds \"14 60 00\", with minutes or seconds of 60 and more");
  EXPECT_EQ(ra("25 00 00").what, "ra holds \"25 00 00\", beyond 0 to 24 hours");
  EXPECT_EQ(ra("-10").what, "ra holds \"-10\", beyond 0 to 360 degrees");
  EXPECT_EQ(ra("-10").code, ProblemCode::out_of_range);
  EXPECT_EQ(ra("").code, ProblemCode::missing);
  EXPECT_EQ(dec("--").code, ProblemCode::missing);
  EXPECT_EQ(dec("14h29m").what, "dec holds \"14h29m\", which is in hours");
  EXPECT_EQ(dec("-90 00 01").what, "dec holds \"-90 00 01\", beyond -90 to 90 degrees");
  EXPECT_EQ(dec("10 10 60.1").code, ProblemCode::out_of_range);
  for (const char* const text :
       {"1:2:",          "1::2", "1 2 3 4", "1.5 30", "1 2.5 3", "1 -2 3", "h", "+",     "1h2h3",
        "1d2d",          "nan.", "inf",     "1e400",  "1s",      "1m",     ".", "1.2.3", "14 29 42.95 s s",
        "217d25m44.2sx", "\xff"}) {
    EXPECT_EQ(ra(text).code, ProblemCode::unreadable) << text;
    EXPECT_EQ(dec(text).code, ProblemCode::unreadable) << text;
  }
}

TEST(SkyReading, OfARealList) {
  const std::string list = HZ_TEST_DIR "/../../shared/data/nearest_10pc.csv";
  if (!std::filesystem::exists(list)) GTEST_SKIP() << "the list nearest_10pc.csv is not here";
  const auto table = testing::read_whole(list);
  ASSERT_EQ(table.head.columns[1].name, "RA");
  ASSERT_EQ(table.head.columns[2].name, "Dec");
  for (const auto& row : table.rows) {
    EXPECT_TRUE(read_right_ascension(row[1]).has_value()) << row[1];
    EXPECT_TRUE(read_declination(row[2]).has_value()) << row[2];
  }
}

// The other list gives both spellings of one position: "12h20m42.91s" beside 185.1787791, and so on.
TEST(SkyReading, SexagesimalAgreesWithDecimalInARealList) {
  const std::string list = HZ_TEST_DIR "/../../shared/data/planets_composite_2023.csv";
  if (!std::filesystem::exists(list)) GTEST_SKIP() << "the list planets_composite_2023.csv is not here";
  const auto table = testing::read_whole(list);
  const auto column = [&table](std::string_view name) {
    std::size_t at = 0;
    while (table.head.columns.at(at).name != name) ++at;
    return at;
  };
  double worst = 0;
  int contradictions = 0;
  for (const auto& row : table.rows) {
    const SkyPosition text{*read_right_ascension(row[column("rastr")]), *read_declination(row[column("decstr")])};
    const SkyPosition number{*read_right_ascension(row[column("ra")]), *read_declination(row[column("dec")])};
    const double apart = angular_distance(text, number);
    // Half of the last digits printed: 0.005 s = 0.075 arcsec and 0.005 arcsec.
    if (apart > 0.0752) {
      ++contradictions;
    } else {
      worst = std::max(worst, apart);
    }
  }
  // Six rows contradict themselves, by up to 5 degrees, or print fewer digits (counted with Python on the same file).
  EXPECT_EQ(contradictions, 6);
  EXPECT_GT(worst, 0.07);
}

// --- distances ---

constexpr long double degree = 3.14159265358979323846264338327950288L / 180;

/// By the cross and dot product of unit vectors, in long double.
double by_vectors(const SkyPosition& a, const SkyPosition& b) {
  const auto vector = [](const SkyPosition& p) {
    const long double ra = p.ra * degree;
    const long double dec = p.dec * degree;
    return std::array<long double, 3>{std::cos(dec) * std::cos(ra), std::cos(dec) * std::sin(ra), std::sin(dec)};
  };
  const auto u = vector(a);
  const auto v = vector(b);
  const long double x = u[1] * v[2] - u[2] * v[1];
  const long double y = u[2] * v[0] - u[0] * v[2];
  const long double z = u[0] * v[1] - u[1] * v[0];
  const long double dot = u[0] * v[0] + u[1] * v[1] + u[2] * v[2];
  return static_cast<double>(std::atan2(std::hypot(x, y, z), dot) / degree * 3600);
}

std::vector<SkyPosition> random_positions(std::size_t count) {
  std::mt19937_64 engine(4258);
  std::uniform_real_distribution<double> ra(0, 360);
  std::uniform_real_distribution<double> sine(-1, 1);
  std::vector<SkyPosition> out(count);
  for (auto& position : out) position = {ra(engine), std::asin(sine(engine)) / static_cast<double>(degree)};
  return out;
}

TEST(AngularDistance, AgreesWithVectorsInLongDouble) {
  const auto positions = random_positions(400);
  for (const auto& a : positions) {
    for (const auto& b : positions) EXPECT_NEAR(angular_distance(a, b), by_vectors(a, b), 1e-9);
  }
}

TEST(AngularDistance, SmallAnglesKeepTheirDigits) {
  for (const double dec : {0.0, 45.0, -62.6795, 89.0}) {
    for (const double step : {1e-3, 1e-6, 1e-9}) {
      const SkyPosition at{217.0, dec};
      const SkyPosition north{217.0, dec + step};
      const SkyPosition east{217.0 + step, dec};
      const double rise = (north.dec - at.dec) * 3600;  // what is left of the step between two doubles
      const double across = (east.ra - at.ra) * 3600 * std::cos(dec * static_cast<double>(degree));
      EXPECT_NEAR(angular_distance(at, north) / rise, 1, 1e-12) << dec << " " << step;
      EXPECT_NEAR(angular_distance(at, east) / across, 1, 1e-7 * step + 1e-12) << dec << " " << step;
    }
  }
}

TEST(AngularDistance, KnownAngles) {
  EXPECT_EQ(angular_distance({10, 20}, {10, 20}), 0);
  EXPECT_NEAR(angular_distance({0, 0}, {180, 0}), 648000, 1e-9);
  EXPECT_NEAR(angular_distance({30, 50}, {210, -50}), 648000, 1e-9);
  EXPECT_NEAR(angular_distance({12, 90}, {200, 90}), 0, 1e-9);
  EXPECT_NEAR(angular_distance({12, 90}, {200, -90}), 648000, 1e-9);
  EXPECT_NEAR(angular_distance({359.9999, 0}, {0.0001, 0}), 0.72, 1e-9);
}

TEST(AngularDistance, OfAKnownPair) {
  // alpha Centauri A and B, 10 parsec sample (as above): 14 39 36.49 -60 50 02.4 and 14 39 35.06 -60 50 15.1. By the
  // flat sky: 1.43 s * 15 * cos 60.8357 deg = 10.453 arcsec and 12.7 arcsec, together 16.449 arcsec.
  const SkyPosition a{*read_right_ascension("14 39 36.49"), *read_declination("-60 50 02.4")};
  const SkyPosition b{*read_right_ascension("14 39 35.06"), *read_declination("-60 50 15.1")};
  EXPECT_NEAR(angular_distance(a, b), 16.449, 0.001);
}

// --- the index ---

/// By looking at every one.
std::vector<std::size_t> by_brute_force(const std::vector<SkyPosition>& list, const SkyPosition& at, double radius) {
  std::vector<std::size_t> found;
  for (std::size_t i = 0; i < list.size(); ++i) {
    if (angular_distance(at, list[i]) <= radius) found.push_back(i);
  }
  return found;
}

void expect_same(const std::vector<SkyPosition>& list, const SkyIndex& index, const SkyPosition& at, double radius) {
  const auto matches = index.matches(at, radius);
  std::vector<std::size_t> found;
  for (const auto& match : matches) {
    found.push_back(match.index);
    EXPECT_EQ(match.distance, angular_distance(at, list[match.index]));
  }
  EXPECT_TRUE(std::is_sorted(matches.begin(), matches.end(),
                             [](const auto& a, const auto& b) { return a.distance < b.distance; }));
  std::sort(found.begin(), found.end());
  EXPECT_EQ(found, by_brute_force(list, at, radius)) << at.ra << " " << at.dec << " " << radius;
}

/// 2,000 positions: all over the sky, crowded at 0 h, at both poles and in one field, and the corners themselves.
std::vector<SkyPosition> awkward_positions() {
  auto list = random_positions(1500);
  std::mt19937_64 engine(17);
  std::uniform_real_distribution<double> all(0, 360);
  std::uniform_real_distribution<double> small(-0.02, 0.02);
  while (list.size() < 1990) {
    const double east = small(engine);
    list.push_back({east < 0 ? east + 360 : east, 30 + small(engine)});
    list.push_back({all(engine), 90 - std::abs(small(engine))});
    list.push_back({all(engine), std::abs(small(engine)) - 90});
    list.push_back({123 + small(engine), small(engine)});
  }
  for (const double ra : {0.0, 90.0, 180.0, std::nextafter(360.0, 0.0), 270.0}) {
    list.push_back({ra, 90});
    list.push_back({ra, -90});
  }
  list.resize(2000);
  return list;
}

TEST(SkyIndex, FindsWhatBruteForceFinds) {
  const auto list = awkward_positions();
  const SkyIndex index(list);
  for (const double radius : {0.0, 1.0, 5.0, 30.0, 60.0, 3600.0, 36000.0}) {
    for (std::size_t i = 0; i < list.size(); i += 7) expect_same(list, index, list[i], radius);
    for (const auto& at : random_positions(50)) expect_same(list, index, at, radius);
  }
}

TEST(SkyIndex, PolesAndTheMeridianOf0HAreNoBorders) {
  const auto list = awkward_positions();
  const SkyIndex index(list);
  for (const SkyPosition& at : {SkyPosition{0, 90}, SkyPosition{200, -90}, SkyPosition{77, 89.99}, SkyPosition{0, 30},
                                SkyPosition{std::nextafter(360.0, 0.0), 30}, SkyPosition{0, 0}, SkyPosition{180, 45}}) {
    for (const double radius : {1.0, 36.0, 72.0, 7200.0, 161999.0, 162000.0, 324000.0, 500000.0, 648000.0, 1e9}) {
      expect_same(list, index, at, radius);
    }
  }
}

TEST(SkyIndex, ExactlyAtTheRadiusIsWithin) {
  const std::vector<SkyPosition> list{{10, 0}, {10, 1.0 / 1024}, {10, 0}};
  const SkyIndex index(list);
  const double apart = angular_distance(list[0], list[1]);
  EXPECT_EQ(index.matches(list[0], apart).size(), 3U);
  EXPECT_EQ(index.matches(list[0], std::nextafter(apart, 0.0)).size(), 2U);
  const auto equal = index.matches(list[0], 0);
  ASSERT_EQ(equal.size(), 2U);
  EXPECT_EQ(equal[0].index, 0U);
  EXPECT_EQ(equal[1].index, 2U);
}

TEST(SkyIndex, OfNothingFindsNothing) { EXPECT_TRUE(SkyIndex({}).matches({0, 0}, 1e9).empty()); }

TEST(SkyIndex, BrokenPreconditionsThrow) {
  const std::vector<SkyPosition> beyond{{360, 0}};
  EXPECT_THROW((void)SkyIndex(beyond), std::logic_error);
  EXPECT_THROW((void)SkyIndex({}).matches({0, 91}, 1), std::logic_error);
  EXPECT_THROW((void)SkyIndex({}).matches({0, 0}, -1), std::logic_error);
  EXPECT_THROW((void)SkyIndex({}).matches({0, 0}, std::nan("")), std::logic_error);
}

}  // namespace
}  // namespace hz
