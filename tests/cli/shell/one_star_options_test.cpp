#include "one_star_options.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <algorithm>

#include "commands.hpp"
#include "hz/constants.hpp"
#include "hz/error.hpp"

namespace hz::app {
namespace {

Arguments arguments(std::vector<std::string> words) {
  const Command& check = command_named("check");
  return Arguments::read(check.name, check.options, check.positionals, words);
}

TEST(TypedValue, WithoutHalfWidthsIsExact) {
  const Measured value = typed_value("teff", Quantity::teff, "5780");
  EXPECT_EQ(value.value, 5780);
  EXPECT_TRUE(value.exact);
}

TEST(TypedValue, WithHalfWidthsOrAsLimitIsNot) {
  EXPECT_FALSE(typed_value("teff", Quantity::teff, "4410+80-60").exact);
  EXPECT_FALSE(typed_value("eccentricity", Quantity::eccentricity, "<0.3").exact);
}

TEST(TypedValue, UnitWordIsConverted) {
  EXPECT_DOUBLE_EQ(typed_value("planet-radius", Quantity::planet_radius, "1 RJ").value,
                   constants::jupiter_in_earth_radii);
}

TEST(TypedValue, TroubleNamesTheOption) {
  for (const char* const text : {"abc", "", "nan", "4553+15-", "5780 RJ"}) {
    try {
      (void)typed_value("teff", Quantity::teff, text);
      ADD_FAILURE() << text;
    } catch (const Error& error) {
      EXPECT_EQ(error.fault(), Fault::usage);
      EXPECT_THAT(error.what(), testing::StartsWith("--teff ")) << text;
    }
  }
}

TEST(TypedRow, NameGoesToThePlanetWhenThereIsOne) {
  const ListRow planet = typed_row(arguments({"--name", "Lantern 4 b", "--teff", "5000", "--insolation", "1"}));
  EXPECT_EQ(planet.planet.name, "Lantern 4 b");
  EXPECT_EQ(planet.star.name, "");
  const ListRow star = typed_row(arguments({"--name", "Lantern 4", "--teff", "5000"}));
  EXPECT_EQ(star.star.name, "Lantern 4");
  EXPECT_EQ(star.planet.name, "");
}

TEST(TypedRow, ANamelessPlanetIsStillAPlanet) {
  EXPECT_EQ(typed_row(arguments({"--semi-major-axis", "1"})).planet.name, "planet");
}

TEST(TypedRow, EveryOptionReachesAFieldOfItsOwn) {
  std::vector<std::string> words;
  std::vector<Quantity> quantities;
  for (const auto table : {star_value_options(), planet_value_options()}) {
    for (const Option& option : table) {
      std::string name(option.name == "period" ? "orbital-period" : option.name);
      std::replace(name.begin(), name.end(), '-', '_');
      const auto quantity = quantity_named(name);
      if (!quantity || stated_field(ListRow{}, *quantity) == nullptr) continue;
      quantities.push_back(*quantity);
      words.push_back("--" + std::string(option.name));
      words.push_back("0." + std::to_string(100 + quantities.size()));
    }
  }
  EXPECT_EQ(quantities.size(), 35U);  // 24 of the star, 11 of the planet
  const ListRow row = typed_row(arguments(words));
  for (std::size_t i = 0; i < quantities.size(); ++i) {
    const Field* const field = stated_field(row, quantities[i]);
    ASSERT_TRUE(field->stated) << name(quantities[i]);
    EXPECT_EQ(field->stated->value, std::stod("0." + std::to_string(101 + i))) << name(quantities[i]);
  }
}

TEST(TypedRow, TextAndCountsToo) {
  const ListRow row = typed_row(arguments({"--spectral-type", "M4.5V", "--number-of-stars", "2"}));
  EXPECT_EQ(row.star.spectral_type, "M4.5V");
  EXPECT_EQ(row.star.number_of_stars, 2);
  EXPECT_THROW((void)typed_row(arguments({"--spectral-type", "8"})), Error);
}

TEST(HasTypedValues, ANameAloneDoesNotCount) {
  EXPECT_FALSE(has_typed_values(arguments({"--name", "x"})));
  EXPECT_TRUE(has_typed_values(arguments({"--log-g", "4.4"})));
  EXPECT_TRUE(has_typed_values(arguments({"--min-mass", "4.4"})));
}

}  // namespace
}  // namespace hz::app
