#include "one_star_options.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

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
  EXPECT_DOUBLE_EQ(typed_value("planet-radius", Quantity::planet_radius, "1 RJ").value, constants::jupiter_in_earth_radii);
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
  int value = 1;
  for (const auto table : {star_value_options(), planet_value_options()}) {
    for (const Option& option : table) {
      if (option.name == "name") continue;
      words.push_back("--" + std::string(option.name));
      words.push_back(std::to_string(value++));
    }
  }
  const ListRow row = typed_row(arguments(words));
  const StarRecord& s = row.star;
  const PlanetRecord& p = row.planet;
  double expected = 1;
  for (const Field* const field :
       {&s.teff, &s.luminosity, &s.log_luminosity, &s.stellar_radius, &s.stellar_mass, &s.log_g, &s.distance,
        &p.orbital_period, &p.semi_major_axis, &p.scaled_semi_major_axis, &p.eccentricity, &p.insolation,
        &p.planet_radius, &p.planet_mass, &p.min_mass}) {
    ASSERT_TRUE(field->stated);
    EXPECT_EQ(field->stated->value, expected++);
  }
}

TEST(HasTypedValues, ANameAloneDoesNotCount) {
  EXPECT_FALSE(has_typed_values(arguments({"--name", "x"})));
  EXPECT_TRUE(has_typed_values(arguments({"--log-g", "4.4"})));
  EXPECT_TRUE(has_typed_values(arguments({"--min-mass", "4.4"})));
}

}  // namespace
}  // namespace hz::app
