#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "list_files.hpp"

namespace hz {
namespace {

using ::testing::ElementsAre;
using ::testing::HasSubstr;
using ::testing::UnorderedElementsAre;

std::string refusal(std::string_view text) {
  return testing::error_of([&] { (void)ColumnMap::parse(text, "map.toml"); });
}

TEST(ColumnMap, ReadsEveryKey) {
  const auto map = ColumnMap::parse(R"toml(missing = ["-99", "unknown"]
ignore = ["K"]
[columns]
teff = "T (phot)"
teff_err_plus = "dT+"
distance = { column = "d", unit = "pc" }
star = "Host, components"
[missing_values]
parallax = [0, -1]
teff = -99.5
)toml",
                                    "map.toml");
  EXPECT_THAT(map.missing_values, ElementsAre("-99", "unknown"));
  EXPECT_THAT(map.missing_numbers, UnorderedElementsAre(ColumnMap::MissingNumber{Quantity::parallax, 0},
                                                        ColumnMap::MissingNumber{Quantity::parallax, -1},
                                                        ColumnMap::MissingNumber{Quantity::teff, -99.5}));
  ASSERT_EQ(map.ignored.size(), 1U);
  EXPECT_EQ(map.ignored[0].column, "K");
  EXPECT_EQ(map.ignored[0].place, "map.toml:2:11");
  ASSERT_EQ(map.entries.size(), 4U);
  for (const auto& entry : map.entries) {
    if (entry.quantity == Quantity::distance) {
      EXPECT_EQ(entry.column, "d");
      EXPECT_EQ(entry.unit, "pc");
      EXPECT_EQ(entry.place, "map.toml:6:1");
    }
    if (entry.part == ColumnPart::upper_half_width) {
      EXPECT_EQ(entry.column, "dT+");
      EXPECT_EQ(entry.quantity, Quantity::teff);
    }
  }
}

TEST(ColumnMap, EmptyIsFine) { EXPECT_TRUE(ColumnMap::parse("# nothing\n", "map.toml").entries.empty()); }

TEST(ColumnMap, MistakesNameTheirPlace) {
  EXPECT_THAT(refusal("colums = 1\n"), HasSubstr("map.toml:1:1: \"colums\" is not a key of a column map"));
  EXPECT_THAT(refusal("[columns]\ntemperature = \"T\"\n"),
              HasSubstr("map.toml:2:1: \"temperature\" is not a column name of hzmap"));
  EXPECT_THAT(refusal("[columns]\nteff = 5\n"), HasSubstr("map.toml:2:8: teff must be text in quotes"));
  EXPECT_THAT(refusal("[columns]\nteff = { colum = \"T\" }\n"),
              HasSubstr("map.toml:2:10: \"colum\" is not known here"));
  EXPECT_THAT(refusal("[columns]\nteff = { unit = \"K\" }\n"), HasSubstr("map.toml:2:1: teff names no column"));
  EXPECT_THAT(refusal("[columns]\nteff = { column = \"T\", unit = \"AU\" }\n"),
              HasSubstr("map.toml:2:31: \"AU\" is not a unit of teff; the canonical one is \"K\""));
  EXPECT_THAT(refusal("[columns]\nstar = { column = \"T\", unit = \"K\" }\n"), HasSubstr("star has no unit"));
  EXPECT_THAT(refusal("[columns]\nstar_err = \"T\"\n"), HasSubstr("\"star_err\" is not a column name"));
  EXPECT_THAT(refusal("missing = \"-99\"\n"), HasSubstr("map.toml:1:11: missing must be a list of texts"));
  EXPECT_THAT(refusal("missing = [-99]\n"), HasSubstr("map.toml:1:12: missing must be text in quotes"));
  EXPECT_THAT(refusal("[missing_values]\nparalax = 0\n"),
              HasSubstr("map.toml:2:1: \"paralax\" is not a quantity with a number"));
  EXPECT_THAT(refusal("[missing_values]\nstar = 0\n"), HasSubstr("\"star\" is not a quantity with a number"));
  EXPECT_THAT(refusal("[missing_values]\nparallax = [0, \"none\"]\n"),
              HasSubstr("map.toml:2:16: parallax must be a number or a list of numbers"));
  EXPECT_THAT(refusal("[missing_values]\nparallax = nan\n"), HasSubstr("must be a number"));
  EXPECT_THAT(refusal("missing_values = [0]\n"), HasSubstr("must be a section [missing_values]"));
  EXPECT_THAT(refusal("columns = 3\n"), HasSubstr("columns must be a section [columns]"));
  EXPECT_THAT(refusal("[columns\n"), HasSubstr("map.toml:1:"));
  EXPECT_THAT(refusal("[columns]\nteff = \"a\"\nteff = \"b\"\n"), HasSubstr("map.toml:3:"));
}

TEST(ColumnMap, TextMayStandInSeveralColumns) {
  const testing::Folder folder;
  const auto list = folder.write("list.csv", "HIP,Name,T\n1,,5000\n2,Lantern 2,5000\n,,5000\n");
  const auto rows =
      testing::read_list(list, ColumnMap::parse("[columns]\nteff = \"T\"\nstar = [\"Name\", \"HIP\"]\n", "map.toml"));
  EXPECT_EQ(rows[0].star.name, "1");
  EXPECT_EQ(rows[1].star.name, "Lantern 2");
  EXPECT_EQ(rows[2].star.name, "");
  EXPECT_THAT(refusal("[columns]\nteff = [\"T1\", \"T2\"]\n"),
              HasSubstr("map.toml:2:1: teff takes one column; only text, such as star, takes a list of them"));
  EXPECT_THAT(refusal("[columns]\nstar = [1]\n"), HasSubstr("star must be text in quotes"));
}

TEST(ColumnMap, HeaderThatBeginsInBracketsStatesNoUnit) {
  const testing::Folder folder;
  const auto list = folder.write("list.csv", "[Fe/H]1,T\n-0.5,5000\n");
  const auto map = ColumnMap::parse("[columns]\nmetallicity = \"[Fe/H]1\"\n", "map.toml");
  EXPECT_EQ(testing::read_list(list, map)[0].star.metallicity.stated->value, -0.5);
}

TEST(ColumnMap, ColumnsMustBeThere) {
  const testing::Folder folder;
  const auto list = folder.write("list.csv", "star,T\nLantern 1,5000\n");
  const auto use = [&](std::string_view text) {
    return testing::error_of([&] { (void)testing::read_list(list, ColumnMap::parse(text, "map.toml")); });
  };
  EXPECT_THAT(use("[columns]\nteff = \"Temp\"\n"), HasSubstr("map.toml:2:1: "));
  EXPECT_THAT(use("[columns]\nteff = \"Temp\"\n"), HasSubstr("list.csv has no column named \"Temp\""));
  EXPECT_THAT(use("ignore = [\"Temp\"]\n"), HasSubstr("has no column named \"Temp\""));
  EXPECT_THAT(use("[columns]\nteff = \"T\"\nstellar_mass = \"T\"\n"),
              HasSubstr("column \"T\" stands in the map twice"));
}

}  // namespace
}  // namespace hz
