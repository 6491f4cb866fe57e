// Constants against their standards, and against what follows from constants the library does not use.
#include "hz/constants.hpp"

#include <gtest/gtest.h>

#include <cmath>

namespace hz::constants {
namespace {

// Source: IAU 2015 Resolution B3, Mamajek et al. 2015, arXiv:1510.07674; Prsa et al. 2016, AJ 152, 41 (values seen).
// Nominal, exact by definition.
TEST(Constants, NominalValuesOfIau2015) {
  EXPECT_EQ(solar_radius_m, 6.957e8);
  EXPECT_EQ(solar_irradiance_w_m2, 1361.0);
  EXPECT_EQ(solar_luminosity_w, 3.828e26);
  EXPECT_EQ(solar_teff, 5772.0);
  EXPECT_EQ(solar_gm_m3_s2, 1.3271244e20);
  EXPECT_EQ(earth_radius_m, 6.3781e6);
  EXPECT_EQ(jupiter_radius_m, 7.1492e7);
  EXPECT_EQ(earth_gm_m3_s2, 3.986004e14);
  EXPECT_EQ(jupiter_gm_m3_s2, 1.2668653e17);
}

// Source: IAU 2012 Resolution B2 (seen), exact.
TEST(Constants, AstronomicalUnit) { EXPECT_EQ(au_m, 149597870700.0); }

// Computed in other code from the values above; each to half its last digit.
TEST(Constants, RatiosThatFollow) {
  EXPECT_NEAR(au_in_solar_radii, 215.032156, 5e-7);
  EXPECT_NEAR(1 / au_in_solar_radii, 0.004650467261, 5e-13);
  EXPECT_NEAR(jupiter_in_earth_masses, 317.82841, 5e-6);
  EXPECT_NEAR(jupiter_in_earth_radii, 11.208981, 5e-7);
  EXPECT_NEAR(solar_in_earth_masses, 332946.0783, 5e-5);
  EXPECT_NEAR(solar_in_earth_radii, 109.07637, 5e-6);
  EXPECT_NEAR(solar_in_earth_masses / jupiter_in_earth_masses, 1047.5655, 5e-5);
  EXPECT_NEAR(parsec_in_au, 206264.80624709636, 1e-9);
  EXPECT_NEAR(parsec_in_au * au_m, 3.085677581491367e16, 10);
  EXPECT_NEAR(parsec_in_light_years, 3.26156, 5e-6);  // common knowledge
}

TEST(Constants, PeriodAtOneAuFollowsFromKeplersThirdLaw) {
  EXPECT_NEAR(period_1au_d, 2 * pi * std::sqrt(au_m * au_m * au_m / solar_gm_m3_s2) / day_s, 1e-10);
  EXPECT_NEAR(period_1au_d, 365.256898, 5e-7);
}

TEST(Constants, EquilibriumTemperatureAtOneAuFollowsFromTheSun) {
  EXPECT_NEAR(equilibrium_temperature_1au, solar_teff * std::sqrt(solar_radius_m / (2 * au_m)), 1e-10);
  EXPECT_NEAR(equilibrium_temperature_1au, 278.33, 0.005);
}

// Source: CODATA 2018, Tiesinga et al. 2021, Rev. Mod. Phys. 93, 025010 (seen): sigma from h, k and c, all exact.
TEST(Constants, TheSunsLuminosityRadiusAndTeffBelongTogether) {
  constexpr double h = 6.62607015e-34;
  constexpr double k = 1.380649e-23;
  constexpr double c = 299792458.0;
  const double sigma = 2 * std::pow(pi, 5) * std::pow(k, 4) / (15 * std::pow(h, 3) * c * c);
  EXPECT_NEAR(sigma, 5.670374419e-8, 5e-18);
  // The nominal Teff is rounded to the kelvin.
  EXPECT_NEAR(std::pow(solar_luminosity_w / (4 * pi * solar_radius_m * solar_radius_m * sigma), 0.25), solar_teff, 0.5);
}

// One nominal luminosity at 1 au is 1361.17 W m^-2, 0.012 % above the nominal irradiance: both are nominal by
// definition.
TEST(Constants, OneSolarConstantIsOneNominalLuminosityAtOneAu) {
  const double flux = solar_luminosity_w / (4 * pi * au_m * au_m);
  EXPECT_NEAR(flux, 1361.1665, 5e-5);
  EXPECT_NEAR(flux / solar_irradiance_w_m2 - 1, 0.000122, 5e-7);
}

}  // namespace
}  // namespace hz::constants
