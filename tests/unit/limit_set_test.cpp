#include "hz/limit_set.hpp"

#include <gtest/gtest.h>

#include <fstream>
#include <string>
#include <vector>

#include "hz/error.hpp"

namespace {

using hz::LimitCatalog;
using hz::LimitSet;

/// The message that a user's file is refused with; empty when it is taken.
std::string refusal(const std::string& toml) {
  try {
    (void)LimitCatalog::published().with(toml, "mine.toml");
  } catch (const hz::Error& error) {
    EXPECT_EQ(error.fault(), hz::Fault::input);
    return error.what();
  }
  return "";
}

const std::string head = "[[set]]\nkey = \"MINE\"\ntitle = \"mine\"\ncitation = \"notebook\"\n";  // lines 1-4
const std::string range = "teff_range = [3000, 6000]\n";                                          // line 5

std::string point(const std::string& key, const std::string& insolation) {
  return "[[set.limit]]\nkey = \"" + key + "\"\nform = \"flux_point\"\ninsolation = " + insolation + "\n";
}

std::string quartic(const std::string& key, const std::string& rows) {
  return "[[set.limit]]\nkey = \"" + key + "\"\nform = \"flux_quartic\"\nteff_reference = 5000\nrows = [\n" + rows +
         "]\n";
}

std::string equilibrium(const std::string& lines) {
  return "[[set.limit]]\nkey = \"warm\"\nform = \"equilibrium_temperature\"\n" + lines;
}

const std::string both = point("hot", "1.1") + point("cold", "0.4");

// ---- the published catalogue ----------------------------------------------------------------------------------------

TEST(LimitCatalog, LoadsEveryPublishedSetInFileOrder) {
  std::vector<std::string> keys;
  for (const LimitSet& set : LimitCatalog::published().sets()) keys.push_back(set.key);
  const std::vector<std::string> expected{"K14",       "K13ERR",  "K13ORIG", "RK18",      "SELSIS07",   "UJS03",
                                          "KWR93SUN",  "KWR93F0", "KWR93M0", "LECONTE13", "WOLFTOON13", "ABE11LAND",
                                          "ABE11AQUA", "ZSOM13",  "RK17",    "TEQ_A03",   "TEQ_A0"};
  EXPECT_EQ(keys, expected);
}

TEST(LimitCatalog, FindsAKeyWithoutRegardToCase) {
  const LimitCatalog& catalog = LimitCatalog::published();
  ASSERT_NE(catalog.find("k13err"), nullptr);
  EXPECT_EQ(catalog.find("k13err")->key, "K13ERR");
  EXPECT_EQ(catalog.find("K13"), nullptr);
  EXPECT_EQ(catalog.find(""), nullptr);
  EXPECT_NE(catalog.find(hz::default_limit_set), nullptr);
}

TEST(LimitCatalog, ZonesRunFromRunawayToMaximumGreenhouseAndFromRecentVenusToEarlyMars) {
  for (const char* key : {"K14", "K13ERR", "K13ORIG", "SELSIS07"}) {
    const LimitSet& set = *LimitCatalog::published().find(key);
    ASSERT_TRUE(set.conservative && set.optimistic) << key;
    EXPECT_EQ(set.limits[set.conservative->inner].key(), "runaway_greenhouse");
    EXPECT_EQ(set.limits[set.conservative->outer].key(), "maximum_greenhouse");
    EXPECT_EQ(set.limits[set.optimistic->inner].key(), "recent_venus");
    EXPECT_EQ(set.limits[set.optimistic->outer].key(), "early_mars");
  }
}

TEST(LimitCatalog, LoneLimitsBoundNoZone) {
  for (const LimitSet& set : LimitCatalog::published().sets())
    EXPECT_EQ(set.bounds_a_zone(), set.limits.size() > 1) << set.key;
}

TEST(LimitSet, RangesAreThoseOfTheLimitsThatBoundItsZones) {
  const LimitSet& k14 = *LimitCatalog::published().find("K14");
  ASSERT_TRUE(k14.teff_range() && k14.planet_mass_range());
  EXPECT_EQ(k14.teff_range()->low, 2600);
  EXPECT_EQ(k14.teff_range()->high, 7200);
  EXPECT_EQ(k14.planet_mass_range()->low, 0.1);
  EXPECT_EQ(k14.planet_mass_range()->high, 5);
  EXPECT_FALSE(LimitCatalog::published().find("K13ERR")->planet_mass_range());
  EXPECT_FALSE(LimitCatalog::published().find("TEQ_A03")->teff_range());
  EXPECT_EQ(LimitCatalog::published().find("RK17")->teff_range()->high, 5780);
}

TEST(LimitSet, RunawayGreenhouseRisesWithTeffAndWithPlanetMass) {
  const LimitSet& k14 = *LimitCatalog::published().find("K14");
  const hz::FluxLimit& runaway = k14.limits.at(k14.conservative->inner);
  const std::vector<double> masses{0.1, 0.15, 0.5, 0.9, 1.0, 1.5, 4.0, 5.0};
  for (int teff = 2600; teff < 7200; teff += 50) {
    for (const double mass : masses) {
      EXPECT_LT(runaway.clamped_insolation(teff, mass), runaway.clamped_insolation(teff + 50, mass));
    }
    for (std::size_t i = 1; i < masses.size(); ++i) {
      EXPECT_LT(runaway.clamped_insolation(teff, masses[i - 1]), runaway.clamped_insolation(teff, masses[i]));
    }
  }
}

// ---- a user's file --------------------------------------------------------------------------------------------------

TEST(LimitFile, JoinsThePublishedSets) {
  const LimitCatalog catalog =
      LimitCatalog::published().with(head + range + "conservative = [\"hot\", \"cold\"]\n" + both, "mine.toml");
  EXPECT_EQ(catalog.sets().size(), LimitCatalog::published().sets().size() + 1);
  const LimitSet& mine = *catalog.find("mine");
  EXPECT_EQ(mine.title, "mine");
  EXPECT_EQ(mine.status, "current");
  EXPECT_EQ(mine.warning, "");
  EXPECT_TRUE(mine.conservative);
  EXPECT_FALSE(mine.optimistic);
  EXPECT_EQ(mine.teff_range()->low, 3000);
}

/// The lines of the example in the comments on top of catalogs/limits.toml.
std::string example_in_the_catalogue() {
  std::ifstream file(HZ_TEST_DIR "/../catalogs/limits.toml");
  const std::string mark = "#   ";
  std::string example;
  for (std::string line; std::getline(file, line) && line.starts_with("#") && !line.starts_with("# Forms");) {
    if (line.starts_with(mark)) example += line.substr(mark.size()) + "\n";
  }
  return example;
}

TEST(LimitFile, TheExampleInTheCatalogueIsTaken) {
  const std::string example = example_in_the_catalogue();
  ASSERT_TRUE(example.starts_with("[[set]]\n"));
  EXPECT_TRUE(LimitCatalog::published().with(example, "example.toml").find("MINE")->conservative);
}

TEST(LimitFile, TitleOfALimitIsItsKeyWithBlanksUnlessGiven) {
  const LimitCatalog catalog = LimitCatalog::published().with(head + range + point("very_hot", "2"), "mine.toml");
  EXPECT_EQ(catalog.find("MINE")->limits.at(0).title(), "very hot");
}

TEST(LimitFile, ByteOrderMarkAndCrlfAreNoTrouble) {
  std::string text = "\xEF\xBB\xBF" + head + range + both;
  for (std::size_t at = 0; (at = text.find('\n', at)) != std::string::npos; at += 2) text.insert(at, "\r");
  EXPECT_EQ(refusal(text), "");
}

TEST(LimitFile, ZonesMayTouch) {
  EXPECT_EQ(refusal(head + range + "conservative = [\"hot\", \"cold\"]\noptimistic = [\"hot\", \"cold\"]\n" + both),
            "");
}

TEST(LimitFile, RefusesTextThatIsNotToml) {
  EXPECT_EQ(refusal("a = \n"),
            "mine.toml:1:5: Error while parsing key-value pair: expected value, saw '\\n'; mend the TOML there");
  const std::string nul(1, '\0');
  EXPECT_TRUE(refusal("[[set]]\nkey = \"a" + nul + "\"\n").starts_with("mine.toml:2:9: Error while parsing"));
}

TEST(LimitFile, RefusesAFileWithoutSets) {
  EXPECT_EQ(refusal(""), "mine.toml:1:1: the file has no 'set'; add it");
  EXPECT_EQ(refusal("[set]\nkey = \"x\"\n"), "mine.toml:1:1: the file: 'set' is a table; write a list of tables");
  EXPECT_EQ(refusal("set = []\n"), "mine.toml:1:7: the file: 'set' is empty; give at least one");
  EXPECT_EQ(refusal("set = [1]\n"), "mine.toml:1:8: a [[set]] is a number; write it as a table");
}

TEST(LimitFile, RefusesUnknownKeysEverywhere) {
  EXPECT_EQ(refusal("sets = 1\n"), "mine.toml:1:1: the file has an unknown key 'sets'; known here: set");
  EXPECT_EQ(refusal(head + "tilte = \"x\"\n"),
            "mine.toml:5:1: set 'MINE' has an unknown key 'tilte'; known here: key, title, citation, doi, status, "
            "provenance, warning, teff_range, conservative, optimistic, limit");
  EXPECT_EQ(refusal(head + range + point("hot", "1") + "distance = 1\n"),
            "mine.toml:10:1: limit 'hot' of set 'MINE' has an unknown key 'distance'; known here: key, title, form, "
            "insolation");
  EXPECT_EQ(
      refusal(head + range + quartic("hot", "{ planet_mass = 1, s0 = 1, e = 2 },\n")),
      "mine.toml:11:28: a row of limit 'hot' of set 'MINE' has an unknown key 'e'; known here: planet_mass, s0, a, "
      "b, c, d");
}

TEST(LimitFile, RefusesMissingKeys) {
  EXPECT_EQ(refusal("[[set]]\ntitle = \"x\"\n"), "mine.toml:1:1: a [[set]] has no 'key'; add it");
  EXPECT_EQ(refusal("[[set]]\nkey = \"x\"\ntitle = \"x\"\n"), "mine.toml:1:1: set 'x' has no 'citation'; add it");
  EXPECT_EQ(refusal(head + range), "mine.toml:1:1: set 'MINE' has no 'limit'; add it");
  EXPECT_EQ(refusal(head + both),
            "mine.toml:1:1: set 'MINE': no 'teff_range', which every form but equilibrium_temperature needs; add it");
  EXPECT_EQ(refusal(head + range + "[[set.limit]]\nkey = \"hot\"\n"),
            "mine.toml:6:1: limit 'hot' of set 'MINE' has no 'form'; add it");
  EXPECT_EQ(refusal(head + range + quartic("hot", "{ planet_mass = 1, s0 = 1, a = 0, b = 0, c = 0 },\n")),
            "mine.toml:11:1: a row of limit 'hot' of set 'MINE' has no 'd'; add it");
}

TEST(LimitFile, RefusesWrongTypes) {
  EXPECT_EQ(refusal("[[set]]\nkey = 3\n"), "mine.toml:2:7: a [[set]]: 'key' is a number; write text in quotes");
  EXPECT_EQ(refusal("[[set]]\nkey = \"\"\n"), "mine.toml:2:7: a [[set]]: 'key' is empty; fill it in");
  EXPECT_EQ(refusal("[[set]]\nkey = \"a b\"\n"),
            "mine.toml:2:7: key 'a b' holds other characters than letters, digits, - and _; leave them out");
  EXPECT_EQ(refusal(head + range + point("hot", "\"1.1\"")),
            "mine.toml:9:14: limit 'hot' of set 'MINE': 'insolation' is text; write a number");
  EXPECT_EQ(refusal(head + range + point("hot", "true")),
            "mine.toml:9:14: limit 'hot' of set 'MINE': 'insolation' is true or false; write a number");
  EXPECT_EQ(refusal(head + range + quartic("hot", "7,\n")),
            "mine.toml:11:1: a row of limit 'hot' of set 'MINE' is a number; write it as a table");
  EXPECT_EQ(refusal(head + range + quartic("hot", "")),
            "mine.toml:10:8: limit 'hot' of set 'MINE': 'rows' is empty; give at least one");
  EXPECT_EQ(refusal(head + "status = \"old\"\n"),
            "mine.toml:5:10: set 'MINE': status is 'old'; write \"current\" or \"superseded\"");
  EXPECT_EQ(refusal(head + range + "[[set.limit]]\nkey = \"hot\"\nform = \"cubic\"\n"),
            "mine.toml:8:8: limit 'hot' of set 'MINE': unknown form 'cubic'; known: flux_quartic, distance_quadratic, "
            "flux_quadratic, flux_point, distance_point, equilibrium_temperature");
}

TEST(LimitFile, RefusesNumbersThatAreNotFinite) {
  for (const char* number : {"nan", "inf", "-inf", "1e999"}) {
    EXPECT_TRUE(refusal(head + range + point("hot", number)).starts_with("mine.toml:9:")) << number;
  }
  EXPECT_EQ(refusal(head + "teff_range = [3000, inf]\n" + both),
            "mine.toml:5:21: set 'MINE': 'teff_range' holds what is not a finite number; write numbers only");
}

TEST(LimitFile, RefusesATeffRangeThatIsNone) {
  const std::string message =
      "mine.toml:5:14: set 'MINE': 'teff_range' is not two temperatures; write [lowest, highest] in K";
  EXPECT_EQ(refusal(head + "teff_range = [6000, 3000]\n" + both), message);
  EXPECT_EQ(refusal(head + "teff_range = [6000]\n" + both), message);
  EXPECT_EQ(refusal(head + "teff_range = [0, 3000]\n" + both), message);
  EXPECT_EQ(refusal(head + "teff_range = 3000\n" + both),
            "mine.toml:5:14: set 'MINE': 'teff_range' is a number; write a list of numbers");
}

TEST(LimitFile, RefusesKeysThatExist) {
  EXPECT_EQ(refusal("[[set]]\nkey = \"k14\"\ntitle = \"x\"\ncitation = \"x\"\n"),
            "mine.toml:2:7: there is a set 'k14' already; choose another key");
  EXPECT_EQ(refusal(head + range + both + head), "mine.toml:15:7: there is a set 'MINE' already; choose another key");
  EXPECT_EQ(refusal(head + range + point("hot", "1") + point("Hot", "2")),
            "mine.toml:11:7: set 'MINE': a second limit 'Hot'; choose another key");
}

TEST(LimitFile, RefusesZonesThatMakeNoSense) {
  EXPECT_EQ(
      refusal(head + range + "optimistic = [\"hot\", \"chilly\"]\n" + both),
      "mine.toml:6:14: set 'MINE': 'optimistic' names a limit 'chilly' that the set does not have; its limits: hot, "
      "cold");
  EXPECT_EQ(refusal(head + range + "optimistic = [\"hot\"]\n" + both),
            "mine.toml:6:14: set 'MINE': 'optimistic' names 1 limits; write [inner, outer]");
  EXPECT_EQ(refusal(head + range + "optimistic = \"hot\"\n" + both),
            "mine.toml:6:14: set 'MINE': 'optimistic' is text; write a list of texts in quotes");
  EXPECT_EQ(refusal(head + range + "optimistic = [\"hot\", 3]\n" + both),
            "mine.toml:6:22: set 'MINE': 'optimistic' holds a number; write texts in quotes");
  EXPECT_EQ(refusal(head + range + "conservative = [\"cold\", \"hot\"]\n" + both),
            "mine.toml:6:16: set 'MINE': 'cold' (S = 0.4) is not hotter than 'hot' (S = 1.1) at Teff 3000 K; write the "
            "inner, hotter limit first, and mend limits that cross");
  EXPECT_NE(refusal(head + range + "conservative = [\"hot\", \"hot\"]\n" + both), "");
}

TEST(LimitFile, RefusesLimitsThatCrossInsideTheRange) {
  // hot = 1.1 - 2e-4 (teff - 5000) meets cold at 5500 K; the next place looked at is 3000 + 3000 * 427 / 512 = 5501.95
  // K, where hot = 1.1 - 0.10039 = 0.99961.
  const std::string crossing =
      quartic("hot", "{ planet_mass = 1, s0 = 1.1, a = -2e-4, b = 0, c = 0, d = 0 },\n") + point("cold", "1.0");
  EXPECT_EQ(
      refusal(head + range + "conservative = [\"hot\", \"cold\"]\n" + crossing),
      "mine.toml:6:16: set 'MINE': 'hot' (S = 0.9996) is not hotter than 'cold' (S = 1) at Teff 5502 K; write the "
      "inner, hotter limit first, and mend limits that cross");
}

TEST(LimitFile, LooksAtEveryPlanetMassOfALimit) {
  const std::string rows =
      "{ planet_mass = 0.1, s0 = 0.3, a = 0, b = 0, c = 0, d = 0 },\n"
      "{ planet_mass = 1, s0 = 1.1, a = 0, b = 0, c = 0, d = 0 },\n";
  EXPECT_EQ(
      refusal(head + range + "conservative = [\"hot\", \"cold\"]\n" + quartic("hot", rows) + point("cold", "0.4")),
      "mine.toml:6:16: set 'MINE': 'hot' (S = 0.3) is not hotter than 'cold' (S = 0.4) at Teff 3000 K and 0.1 Earth "
      "masses; write the inner, hotter limit first, and mend limits that cross");
}

TEST(LimitFile, RefusesAConservativeZoneOutsideTheOptimisticOne) {
  const std::string four = both + point("venus", "1.0") + point("mars", "0.3");
  EXPECT_EQ(refusal(head + range + "conservative = [\"hot\", \"cold\"]\noptimistic = [\"venus\", \"mars\"]\n" + four),
            "mine.toml:6:16: set 'MINE': 'venus' (S = 1) is not hotter than 'hot' (S = 1.1) at Teff 3000 K; the "
            "conservative zone must lie within the optimistic one");
  EXPECT_EQ(refusal(head + range + "conservative = [\"venus\", \"mars\"]\noptimistic = [\"hot\", \"cold\"]\n" + four),
            "mine.toml:6:16: set 'MINE': 'mars' (S = 0.3) is not hotter than 'cold' (S = 0.4) at Teff 3000 K; the "
            "conservative zone must lie within the optimistic one");
}

TEST(LimitFile, RefusesInsolationThatIsNotAboveZeroSomewhere) {
  EXPECT_EQ(refusal(head + range + point("hot", "-1")),
            "mine.toml:9:14: limit 'hot' of set 'MINE': 'insolation' is -1; it must be above 0");
  EXPECT_EQ(
      refusal(head + range + quartic("hot", "{ planet_mass = 1, s0 = 1, a = -1e-3, b = 0, c = 0, d = 0 },\n")),
      "mine.toml:8:8: set 'MINE': limit 'hot' has S = 0 at Teff 6000 K; S must be above 0 over the whole teff_range: "
      "mend the coefficients or narrow the range");
  EXPECT_TRUE(
      refusal(head + range +
              "[[set.limit]]\nkey = \"x\"\nform = \"distance_quadratic\"\nteff_reference = 5700\nl_sun = -1\na = "
              "0\nb = 0\n")
          .starts_with("mine.toml:8:8: set 'MINE': limit 'x' has S = -1 at Teff 3000 K"));
}

TEST(LimitFile, RefusesPlanetMassesThatDoNotRise) {
  const auto row = [](const std::string& mass) {
    return "{ planet_mass = " + mass + ", s0 = 1, a = 0, b = 0, c = 0, d = 0 },\n";
  };
  EXPECT_EQ(
      refusal(head + range + quartic("hot", row("5") + row("1"))),
      "mine.toml:12:17: limit 'hot' of set 'MINE': planet_mass 1 follows 5; order the rows by rising planet mass");
  EXPECT_EQ(refusal(head + range + quartic("hot", row("0"))),
            "mine.toml:11:17: a row of limit 'hot' of set 'MINE': 'planet_mass' is 0; it must be above 0");
}

TEST(LimitFile, EquilibriumTemperatureNeedsNoTeffRangeAndASensibleAlbedo) {
  EXPECT_EQ(refusal(head + equilibrium("temperature = 300\nbond_albedo = 0.3\n")), "");
  EXPECT_EQ(refusal(head + equilibrium("temperature = 300\nbond_albedo = 1\n")),
            "mine.toml:9:15: limit 'warm' of set 'MINE': 'bond_albedo' is 1; it must be at least 0 and below 1");
  EXPECT_EQ(refusal(head + equilibrium("temperature = -3\nbond_albedo = 0\n")),
            "mine.toml:8:15: limit 'warm' of set 'MINE': 'temperature' is -3; it must be above 0");
}

}  // namespace
