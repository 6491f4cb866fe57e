// Constants and conversions, each with its unit and standard.
#pragma once

namespace hz::constants {

// IAU 2015 Resolution B3 (Prsa et al. 2016, AJ 152, 41, doi:10.3847/0004-6256/152/2/41): nominal values, exact by
// definition.
inline constexpr double solar_radius_m = 6.957e8;
inline constexpr double solar_irradiance_w_m2 = 1361.0;  // at 1 au
inline constexpr double solar_luminosity_w = 3.828e26;
inline constexpr double solar_teff = 5772.0;  // K
inline constexpr double solar_gm_m3_s2 = 1.3271244e20;
inline constexpr double earth_radius_m = 6.3781e6;    // equatorial
inline constexpr double jupiter_radius_m = 7.1492e7;  // equatorial
inline constexpr double earth_gm_m3_s2 = 3.986004e14;
inline constexpr double jupiter_gm_m3_s2 = 1.2668653e17;

// IAU 2012 Resolution B2: exact.
inline constexpr double au_m = 149597870700.0;

// Derived from the above.
inline constexpr double day_s = 86400.0;
inline constexpr double julian_year_d = 365.25;
inline constexpr double pi = 3.14159265358979323846;
inline constexpr double au_in_solar_radii = au_m / solar_radius_m;                    // 215.032156
inline constexpr double jupiter_in_earth_masses = jupiter_gm_m3_s2 / earth_gm_m3_s2;  // 317.82841, G cancels
inline constexpr double jupiter_in_earth_radii = jupiter_radius_m / earth_radius_m;   // 11.208981
inline constexpr double solar_in_earth_masses = solar_gm_m3_s2 / earth_gm_m3_s2;      // 332946.0783
inline constexpr double solar_in_earth_radii = solar_radius_m / earth_radius_m;       // 109.07637
inline constexpr double parsec_in_au = 648000.0 / pi;
inline constexpr double parsec_in_light_years = parsec_in_au * au_m / (299792458.0 * julian_year_d * day_s);  // 3.26156

/// Period of a massless planet at 1 au from 1 nominal solar mass, in d: 2 pi sqrt(au^3/GM) (365.256898).
inline constexpr double period_1au_d = 365.2568983840419;

/// Temperature of a fast-rotating black sphere at 1 au from 1 nominal solar luminosity, in K:
/// solar_teff sqrt(R_sun / 2 au) (278.33).
inline constexpr double equilibrium_temperature_1au = 278.3297440615529;

}  // namespace hz::constants
