// Columns whose numbers are not what their header seems to say.
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "hz/table/peeked_table.hpp"
#include "list_files.hpp"

namespace hz {
namespace {

using ::testing::ElementsAre;
using ::testing::HasSubstr;
using ::testing::IsEmpty;

std::vector<Doubt> doubts_of(const std::string& header, const std::vector<std::string>& numbers,
                             std::string_view map = {}) {
  const testing::Folder folder;
  std::string bytes = "star," + header + "\n";
  for (const auto& number : numbers) bytes += "x," + number + "\n";
  PeekedTable table(open_table(folder.write("list.csv", bytes)));
  return Understanding::draft(table.head(), ColumnMap::parse(map, "map.toml"), planet_inputs(), table.peek()).doubts();
}

/// The map lines offered; a doubt that stops nobody is none here.
std::vector<std::string> lines_for(const std::string& header, const std::vector<std::string>& numbers,
                                   std::string_view map = {}) {
  const auto doubts = doubts_of(header, numbers, map);
  EXPECT_LE(doubts.size(), 1U);
  if (doubts.empty()) return {};
  EXPECT_TRUE(doubts[0].blocks);
  return doubts[0].map_lines;
}

TEST(Plausibility, ParallaxOfNearbyStarsInArcsecIsNotInMas) {
  const auto doubts = doubts_of("plx", {"0.031", "0.05", "0.02"});
  ASSERT_EQ(doubts.size(), 1U);
  EXPECT_EQ(doubts[0].what,
            "column \"plx\" has a median of 0.031 mas (no unit is stated); the nearest star has 769 mas, and a median "
            "below 0.8 mas lies beyond 1 kpc; it looks like arcsec");
  EXPECT_THAT(doubts[0].map_lines, ElementsAre("parallax = { column = \"plx\", unit = \"arcsec\" }",
                                               "parallax = { column = \"plx\", unit = \"mas\" }"));
  EXPECT_TRUE(doubts[0].blocks);
}

TEST(Plausibility, ParallaxOfArcsecondsIsInMas) {
  EXPECT_THAT(lines_for("plx [arcsec]", {"5", "20", "3"}),
              ElementsAre("parallax = { column = \"plx [arcsec]\", unit = \"mas\" }",
                          "parallax = { column = \"plx [arcsec]\", unit = \"arcsec\" }"));
}

TEST(Plausibility, UnitThatTheFileStatesIsBelievedFarther) {
  EXPECT_THAT(lines_for("plx [mas]", {"0.2", "0.3", "0.4"}), IsEmpty());
  EXPECT_THAT(lines_for("plx", {"0.2", "0.3", "0.4"}), ::testing::SizeIs(2));
  EXPECT_THAT(lines_for("plx [mas]", {"0.05", "0.03", "0.04"}), ::testing::SizeIs(2));
}

TEST(Plausibility, UnitInTheMapIsNeverDoubted) {
  for (const auto* const unit : {"arcsec", "mas"}) {
    const auto map = std::string("[columns]\nparallax = { column = \"plx\", unit = \"") + unit + "\" }\n";
    EXPECT_THAT(doubts_of("plx", {"0.031", "0.05", "0.02"}, map), IsEmpty()) << unit;
  }
  EXPECT_THAT(lines_for("plx", {"0.031", "0.05", "0.02"}, "[columns]\nparallax = \"plx\"\n"), ::testing::SizeIs(2));
}

// Every line that a doubt offers, put into a map, ends the doubt.
TEST(Plausibility, EveryOfferedLineSettlesIt) {
  const std::vector<std::pair<std::string, std::vector<std::string>>> columns{
      {"plx", {"0.031", "0.05", "0.02"}},     {"Teff", {"3.76", "3.6", "3.9"}},
      {"luminosity", {"-1", "-2", "0.3"}},    {"log L", {"0.001", "0.002", "0.01", "0.05", "0.5"}},
      {"log L", {"33.1", "33.5", "34"}},      {"distance", {"0.02", "0.05", "0.3"}},
      {"period", {"0.05", "0.1", "0.2"}},     {"inclination", {"1.55", "1.56", "1.5"}},
      {"planet radius", {"0.1", "0.2", "1"}}, {"planet mass", {"0.01", "0.02", "1"}},
      {"transit depth", {"0.8", "1.2", "2"}}, {"stellar mass", {"400", "500", "600"}},
      {"log g", {"27000", "10000", "5000"}},  {"insolation", {"1e7", "2e6", "3e6"}}};
  for (const auto& [header, numbers] : columns) {
    const auto lines = lines_for(header, numbers);
    EXPECT_FALSE(lines.empty()) << header;
    for (const auto& line : lines)
      EXPECT_THAT(doubts_of(header, numbers, "[columns]\n" + line + "\n"), IsEmpty()) << line;
  }
}

TEST(Plausibility, LuminosityWithNegativesIsALogarithm) {
  const auto doubts = doubts_of("L star", {"-1.5", "0.2", "-0.3", "0.1"});
  ASSERT_EQ(doubts.size(), 1U);
  EXPECT_EQ(doubts[0].what,
            "column \"L star\" holds numbers below 0 (2 of 4), which no luminosity is; it looks like "
            "log_luminosity");
  EXPECT_THAT(doubts[0].map_lines,
              ElementsAre("log_luminosity = \"L star\"", "luminosity = { column = \"L star\", unit = \"solLum\" }"));
}

TEST(Plausibility, SentinelIsNoLogarithm) {
  EXPECT_THAT(doubts_of("luminosity", {"-99", "0.2", "-99", "0.1"}), IsEmpty());
  EXPECT_THAT(doubts_of("parallax", {"0", "-1", "0", "0", "50", "20", "12"}), IsEmpty());
  EXPECT_THAT(doubts_of("parallax", {"0.01", "0.01", "0.01", "50", "20", "12"}, "[missing_values]\nparallax = 0.01\n"),
              IsEmpty());
}

TEST(Plausibility, LogarithmsOfEverySortOfListPass) {
  EXPECT_THAT(doubts_of("log L", {"-3.03", "-2.04", "-2.46", "-0.01", "0.002"}), IsEmpty());  // dwarfs
  EXPECT_THAT(doubts_of("log L", {"0.9", "1.8", "2.2", "3.1", "2.5"}), IsEmpty());            // giants
  EXPECT_THAT(doubts_of("log L", {"0.05", "0.1", "0.3", "0.4", "0.2"}), IsEmpty());           // brighter than the Sun
  EXPECT_THAT(doubts_of("log L [dex]", {"0.001", "0.002", "0.01", "0.05", "0.5"}), IsEmpty());
}

TEST(Plausibility, TemperaturesInKiloKelvinOrAsLogarithms) {
  EXPECT_THAT(lines_for("Teff", {"5.7", "5.9", "6.1"}),
              ElementsAre("teff = { column = \"Teff\", unit = \"kK\" }", "teff = { column = \"Teff\", unit = \"K\" }"));
  EXPECT_THAT(lines_for("Teff", {"3.5", "3.7", "3.6"}), ElementsAre("teff = { column = \"Teff\", unit = \"kK\" }",
                                                                    "teff = { column = \"Teff\", unit = \"log(K)\" }",
                                                                    "teff = { column = \"Teff\", unit = \"K\" }"));
}

TEST(Plausibility, DistancesMayBeKiloparsecOrParallaxes) {
  EXPECT_THAT(lines_for("distance", {"0.02", "0.05", "0.3"}),
              ElementsAre("distance = { column = \"distance\", unit = \"kpc\" }",
                          "parallax = { column = \"distance\", unit = \"arcsec\" }",
                          "distance = { column = \"distance\", unit = \"pc\" }"));
}

TEST(Plausibility, WhatLooksLikeNothingSaysSo) {
  const auto doubts = doubts_of("log g", {"27000", "10000", "5000"});
  ASSERT_EQ(doubts.size(), 1U);
  EXPECT_THAT(doubts[0].what, ::testing::EndsWith("log10 of cm/s2 is meant"));
  EXPECT_THAT(doubts[0].map_lines, ElementsAre("log_g = { column = \"log g\", unit = \"dex(cm.s**-2)\" }"));
}

TEST(Plausibility, AFewOddNumbersAreNotTheMedian) {
  EXPECT_THAT(doubts_of("parallax", {"0.05", "50", "20"}), IsEmpty());
  EXPECT_THAT(doubts_of("parallax", {"0.05", "0.03"}), IsEmpty());  // too few to tell
  EXPECT_THAT(doubts_of("parallax", {"", "nan", "hot", "<0.1", "50 mas", "0.05 arcsec"}), IsEmpty());
}

TEST(Plausibility, StopsOnlyThoseWhoReadTheColumn) {
  const testing::Folder folder;
  const auto list = folder.write("list.csv", "planet,inclination,plx\na,1.5,20\nb,1.5,20\nc,1.5,20\n");
  const auto blocks = [&](std::span<const Quantity> needed) {
    PeekedTable table(open_table(list));
    return Understanding::draft(table.head(), {}, needed, table.peek()).doubts().at(0).blocks;
  };
  EXPECT_TRUE(blocks(planet_inputs()));
  EXPECT_FALSE(blocks(star_inputs()));
}

TEST(Plausibility, IsAnErrorThatPrintsTheLines) {
  const testing::Folder folder;
  const auto list = folder.write("list.csv", "star,plx\na,0.03\nb,0.02\nc,0.05\n");
  const auto what = testing::error_of([&] {
    PeekedTable table(open_table(list));
    (void)Understanding::of(table.head(), {}, star_inputs(), table.peek());
  });
  EXPECT_THAT(what,
              HasSubstr("it looks like arcsec; say which in a column map (--columns MAP.toml): parallax = { column "
                        "= \"plx\", unit = \"arcsec\" }  or  parallax = { column = \"plx\", unit = \"mas\" }"));
}

TEST(Plausibility, JudgesTheFirstThousandRowsWhateverTheChunks) {
  std::string bytes = "star,parallax\n";
  for (std::size_t i = 0; i < 3 * telling_rows; ++i) bytes += i < telling_rows ? "x,20\n" : "x,0.02\n";
  const testing::Folder folder;
  PeekedTable table(open_table(folder.write("list.csv", bytes)));
  EXPECT_THAT(Understanding::draft(table.head(), {}, star_inputs(), table.peek()).doubts(), IsEmpty());
  EXPECT_THAT(Understanding::draft(table.head(), {}, star_inputs(), table.peek(3 * telling_rows)).doubts(), IsEmpty());
}

}  // namespace
}  // namespace hz
