#include "hz/units.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <string>
#include <vector>

#include "hz/constants.hpp"

namespace hz {
namespace {

using namespace constants;

double factor(Quantity quantity, std::string_view unit) {
  const auto found = conversion(quantity, unit);
  EXPECT_TRUE(found && found->kind == ConversionKind::factor) << name(quantity) << " in " << unit;
  return found ? found->number : std::nan("");
}

TEST(Units, CanonicalUnitsOfTheCatalogueChangeNothing) {
  for (std::size_t i = 0; i <= static_cast<std::size_t>(Quantity::note); ++i) {
    const auto quantity = static_cast<Quantity>(i);
    if (!is_numeric(quantity)) continue;
    const auto found = conversion(quantity, info(quantity).unit);
    ASSERT_TRUE(found.has_value()) << name(quantity) << " in " << info(quantity).unit;
    EXPECT_EQ(convert(Measured{2.5, 0.5, 0.25, {}, {}}, *found).value, 2.5) << name(quantity);
  }
}

TEST(Units, CanonicalSpellingsOfEveryStandard) {
  const std::vector<std::pair<Quantity, std::vector<std::string>>> same{
      {Quantity::teff, {"K", "Kelvin", "kelvin", " K ", "deg K"}},
      {Quantity::luminosity,
       {"solLum", "Lsun", "L_sun", "LSun", "L☉", "L_{\\odot}", "Lsol", "Solar", "solar luminosity", "L/Lsun"}},
      {Quantity::log_luminosity,
       {"dex(solLum)", "log(solLum)", "log10(L/Lsun)", "[Lsun]", "dex", "log10(Solar)", "log(L/L_sun)", "Lsun"}},
      {Quantity::stellar_radius,
       {"solRad", "Rsun", "R_sun", "RSun", "R☉", "R⊙", "Solar Radius", "solar radii", "solar"}},
      {Quantity::stellar_mass, {"solMass", "Msun", "M_sun", "Solar mass", "Solar Masses", "M☉"}},
      {Quantity::planet_radius,
       {"earthRad", "R_earth", "Rearth", "R⊕", "RE", "Earth Radius", "earth radii", "Earth", "Rgeo"}},
      {Quantity::planet_mass,
       {"earthMass", "M_earth", "Mearth", "M⊕", "ME", "Earth Mass", "earth masses", "5.9722E24kg"}},
      {Quantity::orbital_period, {"d", "day", "days", "Days", "DAYS"}},
      {Quantity::semi_major_axis, {"AU", "au", "a.u.", "astronomical unit"}},
      {Quantity::distance, {"pc", "parsec", "Parsecs"}},
      {Quantity::parallax, {"mas", "milliarcsec"}},
      {Quantity::insolation, {"1361W.m**-2", "Earth Flux", "S_earth", "S⊕", "earth", "solar constant"}},
      {Quantity::log_g,
       {"dex(cm.s**-2)", "log(cm.s**-2)", "[cm/s2]", "[cm.s**-2]", "log10(cm/s**2)", "cgs", "dex", "cm/s2",
        "log(cm s^-2)"}},
      {Quantity::metallicity, {"dex", "[Fe/H]"}},
      {Quantity::age, {"Gyr", "Ga"}},
      {Quantity::rv_semi_amplitude, {"m.s**-1", "m/s", "m s-1", "m s^-1", "m.s-1", "m s$^{-1}$"}},
      {Quantity::stellar_density, {"g.cm**-3", "g/cm3", "g cm-3", "g/cm**3"}},
      {Quantity::inclination, {"deg", "degrees", "°"}},
      {Quantity::eccentricity, {"", "1", "-"}},
      {Quantity::magnitude_v, {"mag"}}};
  for (const auto& [quantity, units] : same) {
    for (const auto& unit : units) {
      const auto found = conversion(quantity, unit);
      ASSERT_TRUE(found.has_value()) << name(quantity) << " in " << unit;
      EXPECT_NEAR(convert(Measured{2, {}, {}, {}, {}}, *found).value, 2, 1e-12) << name(quantity) << " in " << unit;
    }
  }
}

TEST(Units, OtherUnitsAreConverted) {
  EXPECT_EQ(factor(Quantity::orbital_period, "yr"), 365.25);  // Julian year, IAU
  EXPECT_EQ(factor(Quantity::orbital_period, "a"), 365.25);
  EXPECT_DOUBLE_EQ(factor(Quantity::orbital_period, "h"), 1.0 / 24);
  EXPECT_EQ(factor(Quantity::parallax, "arcsec"), 1000);
  EXPECT_EQ(factor(Quantity::teff, "kK"), 1000);
  // Source: IAU 2015 Resolution B3, nominal equatorial radii 7.1492e7 m and 6.3781e6 m, GM 1.2668653e17
  // and 3.986004e14.
  EXPECT_DOUBLE_EQ(factor(Quantity::planet_radius, "RJ"), 7.1492e7 / 6.3781e6);
  EXPECT_DOUBLE_EQ(factor(Quantity::planet_radius, "Jupiter Radius"), 7.1492e7 / 6.3781e6);
  EXPECT_DOUBLE_EQ(factor(Quantity::planet_mass, "MJ"), 1.2668653e17 / 3.986004e14);
  EXPECT_DOUBLE_EQ(factor(Quantity::planet_mass, "M_jup"), 1.2668653e17 / 3.986004e14);
  EXPECT_DOUBLE_EQ(factor(Quantity::planet_radius, "km"), 1 / 6378.1);
  EXPECT_DOUBLE_EQ(factor(Quantity::planet_radius, "6.3781E6m"), 1);
  // Source: GM and G (CODATA 2018, 6.67430e-11): 3.986004e14 / 6.67430e-11 = 5.97217e24 kg.
  EXPECT_NEAR(factor(Quantity::planet_mass, "kg") * 5.97217e24, 1, 1e-6);
  // Source: light year 9.4607304725808e15 m (IAU), parsec 3.0856775814913673e16 m (IAU 2015 B2): 3.26156377716743.
  EXPECT_NEAR(1 / factor(Quantity::distance, "ly"), 3.26156377716743, 1e-12);
  EXPECT_DOUBLE_EQ(factor(Quantity::semi_major_axis, "Rsun"), 6.957e8 / 149597870700.0);
  EXPECT_DOUBLE_EQ(factor(Quantity::insolation, "W/m2"), 1 / 1361.0);
  EXPECT_DOUBLE_EQ(factor(Quantity::insolation, "erg/s/cm**2"), 1e-3 / 1361.0);
  EXPECT_DOUBLE_EQ(factor(Quantity::luminosity, "erg/s"), 1e-7 / 3.828e26);
  EXPECT_DOUBLE_EQ(factor(Quantity::transit_depth, "ppm"), 1e-6);
  EXPECT_DOUBLE_EQ(factor(Quantity::transit_depth, "%"), 0.01);
  EXPECT_DOUBLE_EQ(factor(Quantity::age, "Myr"), 1e-3);
  EXPECT_DOUBLE_EQ(factor(Quantity::rv_semi_amplitude, "km/s"), 1000);
  EXPECT_NEAR(factor(Quantity::inclination, "rad"), 57.29577951308232, 1e-12);
}

TEST(Units, LogarithmsInOtherUnitsAreShifted) {
  const auto log_g = conversion(Quantity::log_g, "log10(m/s**2)");
  ASSERT_TRUE(log_g.has_value());
  EXPECT_DOUBLE_EQ(convert(Measured{2.44, 0.1, 0.2, {}, {}}, *log_g).value, 4.44);
  EXPECT_EQ(convert(Measured{2.44, 0.1, 0.2, {}, {}}, *log_g).minus, 0.1);
  const auto log_l = conversion(Quantity::log_luminosity, "log(erg/s)");
  ASSERT_TRUE(log_l.has_value());
  EXPECT_NEAR(convert(Measured{33.583, {}, {}, {}, {}}, *log_l).value, 0, 1e-4);  // 3.828e33 erg/s: log 33.58297
}

TEST(Units, ParallaxInADistanceColumnIsItsReciprocal) {
  const auto mas = conversion(Quantity::distance, "mas");
  ASSERT_TRUE(mas.has_value());
  const auto far = convert(Measured{100, 10, 25, LimitMark::upper, false}, *mas);
  EXPECT_DOUBLE_EQ(far.value, 10);
  EXPECT_DOUBLE_EQ(*far.minus, 10 - 1000.0 / 125);
  EXPECT_DOUBLE_EQ(*far.plus, 1000.0 / 90 - 10);
  EXPECT_EQ(far.limit, LimitMark::lower);
  EXPECT_DOUBLE_EQ(convert(Measured{0.5, {}, {}, {}, {}}, *conversion(Quantity::distance, "arcsec")).value, 2);
}

TEST(Units, LogarithmsOfWhatIsWantedItself) {
  const auto log_teff = conversion(Quantity::teff, "log(K)");
  ASSERT_TRUE(log_teff.has_value());
  EXPECT_EQ(log_teff, conversion(Quantity::teff, "dex(K)"));
  const auto teff = convert(Measured{3.76, 0.01, 0.02, LimitMark::upper, false}, *log_teff);
  EXPECT_NEAR(teff.value, 5754.399, 1e-3);  // 10^3.76
  EXPECT_NEAR(*teff.minus, teff.value - std::pow(10, 3.75), 1e-9);
  EXPECT_NEAR(*teff.plus, std::pow(10, 3.78) - teff.value, 1e-9);
  EXPECT_EQ(teff.limit, LimitMark::upper);
  EXPECT_NEAR(convert(2, *conversion(Quantity::planet_radius, "log(km)")), 100 / 6378.1, 1e-12);
  EXPECT_FALSE(conversion(Quantity::teff, "[K]"));              // in brackets, but hardly a logarithm
  EXPECT_FALSE(conversion(Quantity::luminosity, "log(Lsun)"));  // has a quantity of its own
}

// Source: Pogson's ratio, 10^(-0.4 m): 1 - 10^(-0.004) = x - x^2/2 + x^3/6 with x = 0.004 ln 10 = 0.00921034, that is
// 0.00916806; 1 - 10^(-0.04) = 0.0879892 by x = 0.0921034 to the fifth power.
TEST(Units, DimmingInMagnitudesIsAFraction) {
  const auto mmag = conversion(Quantity::transit_depth, "mmag");
  ASSERT_TRUE(mmag.has_value());
  const auto depth = convert(Measured{10, 1, {}, {}, false}, *mmag);
  EXPECT_NEAR(depth.value, 0.00916806, 1e-8);
  EXPECT_NEAR(*depth.minus, depth.value - convert(9, *mmag), 1e-15);
  EXPECT_NEAR(convert(0.1, *conversion(Quantity::transit_depth, "mag")), 0.0879892, 1e-7);
}

TEST(Units, BackAgain) {
  const std::vector<std::pair<Quantity, std::string>> units{{Quantity::planet_radius, "RJ"},
                                                            {Quantity::log_g, "log(m/s2)"},
                                                            {Quantity::distance, "arcsec"},
                                                            {Quantity::teff, "log(kK)"},
                                                            {Quantity::transit_depth, "mmag"}};
  for (const auto& [quantity, unit] : units) {
    const auto found = conversion(quantity, unit);
    ASSERT_TRUE(found.has_value()) << unit;
    EXPECT_NEAR(convert_back(convert(0.3, *found), *found), 0.3, 1e-14) << unit;
  }
}

TEST(Units, ParallaxWiderThanItselfKeepsAFiniteHalfWidth) {
  const auto far = convert(Measured{2, 3, {}, {}, {}}, *conversion(Quantity::distance, "mas"));
  EXPECT_DOUBLE_EQ(*far.plus, 500.0 / 2 * 3);
  EXPECT_FALSE(far.minus.has_value());
}

TEST(Units, ReciprocalOfZeroIsABrokenPrecondition) {
  EXPECT_THROW((void)convert(Measured{0, {}, {}, {}, {}}, *conversion(Quantity::distance, "mas")), std::logic_error);
}

TEST(Units, HalfWidthsTurnWithTheValue) {
  const auto radius =
      convert(Measured{1, 0.5, {}, LimitMark::lower, false}, *conversion(Quantity::planet_radius, "RJ"));
  EXPECT_DOUBLE_EQ(*radius.minus, 0.5 * radius.value);
  EXPECT_FALSE(radius.plus.has_value());
  EXPECT_EQ(radius.limit, LimitMark::lower);
}

TEST(Units, UnknownOrOfAnotherDimension) {
  EXPECT_FALSE(conversion(Quantity::teff, "furlong"));
  EXPECT_FALSE(conversion(Quantity::teff, "AU"));
  EXPECT_FALSE(conversion(Quantity::semi_major_axis, "mas"));
  EXPECT_FALSE(conversion(Quantity::luminosity, "dex"));
  EXPECT_FALSE(conversion(Quantity::orbital_period, "Mpc"));
  EXPECT_FALSE(conversion(Quantity::distance, "PC"));  // case counts
  EXPECT_FALSE(conversion(Quantity::distance, "0pc"));
  EXPECT_FALSE(conversion(Quantity::distance, "-1pc"));
  EXPECT_FALSE(conversion(Quantity::star, "pc"));
  EXPECT_FALSE(conversion(Quantity::star, ""));
}

}  // namespace
}  // namespace hz
