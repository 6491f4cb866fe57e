// Each way of the table of routes once: its value and half-widths against arithmetic done here, with the coefficients
// and table rows as printed (sources in catalogs/relations).
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"

namespace hz {
namespace {

using testing::exactly;
using testing::settings_of;
using testing::value;

constexpr double ln10 = 2.302585092994046;

double squared(double x) { return x * x; }

/// A polynomial by rising power.
double polynomial(std::initializer_list<double> c, double x) {
  double sum = 0;
  double power = 1;
  for (const double each : c) {
    sum += each * power;
    power *= x;
  }
  return sum;
}

double slope(std::initializer_list<double> c, double x) {
  constexpr double step = 1e-4;
  return (polynomial(c, x + step) - polynomial(c, x - step)) / (2 * step);
}

StarAnswer star_of(const StarRecord& star) {
  ListRow row;
  row.star = star;
  return answer_star(row, settings_of()).star;
}

/// Value and 68 per cent half-width. A relation's bend sets the two sides a little apart, by (bend / scatter)^2 in the
/// mean.
void expect_value(const std::optional<Derived>& derived, double wanted, double half_width, std::string_view route) {
  ASSERT_TRUE(derived) << route;
  EXPECT_EQ(derived->route, route);
  EXPECT_NEAR(derived->measured.value, wanted, 1e-6 * wanted) << route;
  EXPECT_NEAR((*derived->measured.minus + *derived->measured.plus) / 2, half_width, 1e-3 * half_width) << route;
  EXPECT_NEAR(*derived->measured.plus, half_width, 0.05 * half_width) << route;
}

// ---- Teff ---------------------------------------------------------------------------------------------------------

TEST(TeffWay, LuminosityAndRadius) {
  StarRecord star;
  star.luminosity = value(0.5, 0.03, 0.03);
  star.stellar_radius = value(0.8, 0.02, 0.02);
  const double teff = 5772 * std::pow(0.5 / (0.8 * 0.8), 0.25);
  expect_value(star_of(star).teff, teff, teff * std::hypot(0.25 * 0.03 / 0.5, 0.5 * 0.02 / 0.8),
               "luminosity and stellar_radius");
}

// Source: Boyajian et al. 2013 below V-Ks 3; Pecaut & Mamajek 2013 above: M2V 4.23 has 3560 K, M2.5V 4.43 3470 K.
TEST(TeffWay, VKs) {
  const std::initializer_list<double> boyajian = {8984, -2914, 588, -47.4};
  StarRecord star;
  star.color_vk = value(2.2, 0.05, 0.05);
  const double blue = polynomial(boyajian, 2.2);
  expect_value(star_of(star).teff, blue, std::hypot(slope(boyajian, 2.2) * 0.05, 0.02 * blue),
               "color_vk by Teff(V-Ks)");
  star = {};
  star.magnitude_v = value(12.33, 0.03, 0.03);
  star.magnitude_k = value(8, 0.02, 0.02);
  expect_value(star_of(star).teff, 3515, std::hypot(450 * std::hypot(0.03, 0.02), 0.022 * 3515),
               "magnitude_v and magnitude_k by Teff(V-Ks)");
}

// Source: Mann et al. 2015 from V-J 2.53, scatter 55 K; Boyajian et al. 2013 below.
TEST(TeffWay, VJ) {
  const std::initializer_list<double> mann = {2.840, -1.3453, 0.3906, -0.0546, 0.002913};
  const std::initializer_list<double> boyajian = {9052, -3972, 1039, -101};
  StarRecord star;
  star.color_vj = value(4, 0.05, 0.05);
  expect_value(star_of(star).teff, 3500 * polynomial(mann, 4), std::hypot(3500 * slope(mann, 4) * 0.05, 55),
               "color_vj by Teff(V-J)");
  star.color_vj = value(1.2, 0.05, 0.05);
  const double blue = polynomial(boyajian, 1.2);
  expect_value(star_of(star).teff, blue, std::hypot(slope(boyajian, 1.2) * 0.05, 0.02 * blue), "color_vj by Teff(V-J)");
}

// Source: Pecaut & Mamajek 2013: G1V 0.803 has 5860 K, G2V 0.823 5770 K.
TEST(TeffWay, BpRp) {
  StarRecord star;
  star.magnitude_bp = value(8.313, 0.006, 0.006);
  star.magnitude_rp = value(7.5, 0.008, 0.008);
  expect_value(star_of(star).teff, 5815, std::hypot(90 / 0.020 * 0.01, 0.022 * 5815),
               "magnitude_bp and magnitude_rp by Teff(BP-RP)");
}

// Source: Torres 2010 up to B-V 1.2; Boyajian et al. 2013 beyond.
TEST(TeffWay, BV) {
  const std::initializer_list<double> torres = {3.979145106714099,  -0.654992268598245, 1.740690042385095,
                                                -4.608815154057166, 6.792599779944473,  -5.396909891322525,
                                                2.192970376522490,  -0.359495739295671};
  const std::initializer_list<double> boyajian = {9552, -17443, 44350, -68940, 57338, -24072, 4009};
  StarRecord star;
  star.color_bv = value(0.65, 0.02, 0.02);
  const double blue = std::pow(10, polynomial(torres, 0.65));
  expect_value(star_of(star).teff, blue, std::hypot(ln10 * blue * slope(torres, 0.65) * 0.02, 0.03 * blue),
               "color_bv by Teff(B-V)");
  star = {};
  star.magnitude_b = value(11.3, 0.02, 0.02);
  star.magnitude_v = value(10, 0.01, 0.01);
  const double red = polynomial(boyajian, 1.3);
  expect_value(star_of(star).teff, red, std::hypot(slope(boyajian, 1.3) * std::hypot(0.02, 0.01), 0.03 * red),
               "magnitude_b and magnitude_v by Teff(B-V)");
}

// Source: Pecaut & Mamajek 2013: G1V 5860 K, G2V 5770 K, G3V 5720 K.
TEST(TeffWay, SpectralType) {
  StarRecord star;
  star.spectral_type = "G1.5V";
  expect_value(star_of(star).teff, 5815, std::hypot(0.5 * 90, 0.023 * 5815), "spectral_type by Teff(type)");
}

/// On a row of the table Teff falls by 90 K on one side and by 50 K on the other: 70 K either way, and 20 K of
/// skewness, which the scatter carries.
TEST(TeffWay, ABendSetsTheSidesApart) {
  StarRecord star;
  star.spectral_type = "G2 +/- 1 V";
  const Measured teff = star_of(star).teff->measured;
  EXPECT_EQ(teff.value, 5770);
  EXPECT_NEAR(*teff.plus, std::hypot(70, 0.023 * 5770 + 20), 1e-6);
  EXPECT_NEAR(*teff.minus, std::hypot(70, 0.023 * 5770 - 20), 1e-6);
}

// Source: Pecaut & Mamajek 2013: M1.5V M_Ks 5.75 has 3620 K, M2V 5.98 has 3560 K.
TEST(TeffWay, AbsoluteKs) {
  StarRecord star;
  star.magnitude_k = value(5.8, 0.02, 0.02);
  star.parallax = value(100, 1, 1);  // 10 pc
  const double spread = std::hypot(0.02, 5 / ln10 * 0.01);
  const double teff = 3620 - 60.0 / 0.23 * 0.05;
  expect_value(star_of(star).teff, teff, std::hypot(60.0 / 0.23 * spread, 0.033 * teff),
               "magnitude_k and parallax by Teff(M_Ks)");
}

// Source: Pecaut & Mamajek 2013: M1.5V of 0.485 solar masses has 3620 K, M1V of 0.51 3660 K.
TEST(TeffWay, Mass) {
  StarRecord star;
  star.stellar_mass = value(0.5, 0.01, 0.01);
  expect_value(star_of(star).teff, 3644, std::hypot(1600 * 0.01, 0.038 * 3644), "stellar_mass by Teff(mass)");
}

// ---- luminosity ---------------------------------------------------------------------------------------------------

/// ln L of an absolute bolometric magnitude.
double light(double absolute, double solar) { return std::pow(10, -0.4 * (absolute - solar)); }

/// Relative half-width of L from magnitudes' half-widths added in quadrature and a relative one of the distance.
double spread(double magnitudes, double distance) { return std::hypot(0.4 * ln10 * magnitudes, 2 * distance); }

// Source: IAU 2015 Resolution B2: M_bol 4.74.
TEST(LuminosityWay, BolometricMagnitude) {
  StarRecord star;
  star.teff = value(5000, 50, 50);
  star.magnitude_bol = value(8, 0.03, 0.03);
  star.distance = value(20, 0.4, 0.4);
  const double wanted = light(8 - 5 * std::log10(2.0), 4.74);
  expect_value(star_of(star).luminosity, wanted, wanted * spread(0.03, 0.02), "magnitude_bol and distance");
}

// Source: Pecaut & Mamajek 2013: V-Ks 4.23 has BC_V -1.62, 4.43 has -1.78; scatter 0.03 mag.
TEST(LuminosityWay, VByTheColourVKs) {
  StarRecord star;
  star.magnitude_v = value(12.33, 0.03, 0.03);
  star.magnitude_k = value(8, 0.02, 0.02);
  star.parallax = value(100, 2, 2);
  const double wanted = light(12.33 - 1.70, 4.74);
  // V moves the colour too: BC_V falls by 0.8 of it.
  const double magnitudes = std::hypot(0.2 * 0.03, 0.8 * 0.02, 0.03);
  expect_value(star_of(star).luminosity, wanted, wanted * spread(magnitudes, 0.02),
               "magnitude_v, parallax and BC_V(V-Ks)");
}

// Source: Flower 1996 as corrected by Torres 2010, 3.70 to 3.90, M_bol of the Sun 4.73; scatter 0.03 mag measured.
TEST(LuminosityWay, VOfHotStars) {
  StarRecord star;
  star.teff = value(5800, 60, 60);
  star.magnitude_v = value(6, 0.01, 0.01);
  star.parallax = value(50, 0.5, 0.5);
  const auto correction = [](double teff) {
    return polynomial({-0.370510203809015E+05, 0.385672629965804E+05, -0.150651486316025E+05, 0.261724637119416E+04,
                       -0.170623810323864E+03},
                      std::log10(teff));
  };
  const double wanted = light(6 - 5 * std::log10(2.0) + correction(5800), 4.73);
  const double by_teff = (correction(5860) - correction(5740)) / 2;
  expect_value(star_of(star).luminosity, wanted, wanted * spread(std::hypot(0.01, 0.03, by_teff), 0.01),
               "magnitude_v, parallax and BC_V(Teff)");
}

// Source: Mann et al. 2015 with the erratum, M_bol of the Sun 4.7554; scatter 0.022 mag.
TEST(LuminosityWay, JOfMDwarfs) {
  const std::initializer_list<double> correction = {0.8694, 0.3667, -0.02920};
  StarRecord star;
  star.magnitude_j = value(8, 0.02, 0.02);
  star.color_vj = value(4, 0.05, 0.05);
  star.parallax = value(100, 1, 1);
  const double wanted = light(8 + polynomial(correction, 4), 4.7554);
  const double magnitudes = std::hypot(0.02, slope(correction, 4) * 0.05, 0.022);
  expect_value(star_of(star).luminosity, wanted, wanted * spread(magnitudes, 0.01),
               "magnitude_j, parallax and BC_J(V-J)");
}

// Source: Andrae et al. 2018, table 4, 4000 to 8000 K, with its scatter.
TEST(LuminosityWay, G) {
  const auto correction = [](double teff) {
    return polynomial({6.000e-2, 6.731e-5, -6.647e-8, 2.859e-11, -7.197e-15}, teff - 5772);
  };
  const double scatter = polynomial({2.634e-2, 2.438e-5, -1.129e-9, -6.722e-12, 1.635e-15}, 5200 - 5772);
  StarRecord star;
  star.teff = value(5200, 60, 60);
  star.magnitude_g = value(9, 0.01, 0.01);
  star.parallax = value(20, 0.2, 0.2);
  const double wanted = light(9 - 5 * std::log10(5.0) + correction(5200), 4.74);
  const double by_teff = (correction(5260) - correction(5140)) / 2;
  expect_value(star_of(star).luminosity, wanted, wanted * spread(std::hypot(0.01, scatter, by_teff), 0.01),
               "magnitude_g, parallax and BC_G(Teff)");
}

// Source: Pecaut & Mamajek 2013: 3560 K has BC_V -1.62, 3470 K -1.78; scatter 0.10 mag below 4100 K.
TEST(LuminosityWay, VOfCoolStars) {
  StarRecord star;
  star.teff = value(3515, 40, 40);
  star.magnitude_v = value(12, 0.02, 0.02);
  star.parallax = value(100, 1, 1);
  const double wanted = light(12 - 1.70, 4.74);
  const double by_teff = 0.16 / 90 * 40;
  expect_value(star_of(star).luminosity, wanted, wanted * spread(std::hypot(0.02, 0.10, by_teff), 0.01),
               "magnitude_v, parallax and BC_V(Teff)");
}

// Source: Mann et al. 2015 with the erratum: R(M_Ks), scatter 2.89 per cent.
TEST(LuminosityWay, RadiusByKs) {
  const std::initializer_list<double> radius = {1.9515, -0.3520, 0.01680};
  StarRecord star;
  star.teff = value(3400, 60, 60);
  star.magnitude_k = value(6.5, 0.02, 0.02);
  star.distance = value(10, 0.1, 0.1);
  const double at = polynomial(radius, 6.5);
  const double wanted = at * at * std::pow(3400.0 / 5772, 4);
  const double by_radius = 2 * std::hypot(slope(radius, 6.5) / at * std::hypot(0.02, 5 / ln10 * 0.01), 0.0289);
  expect_value(star_of(star).luminosity, wanted, wanted * std::hypot(by_radius, 4 * 60.0 / 3400),
               "magnitude_k and distance by R(M_Ks) and teff");
}

// Source: Pecaut & Mamajek 2013: G1V log L 0.077, G2V 0.010; scatter 0.19 dex.
TEST(LuminosityWay, SpectralType) {
  StarRecord star;
  star.spectral_type = "G1.5V";
  const double wanted = std::pow(10, 0.0435);
  expect_value(star_of(star).luminosity, wanted, wanted * ln10 * std::hypot(0.5 * 0.067, 0.19),
               "spectral_type by L(type)");
}

/// Once the mass was two sources, and its errors counted in the wrong unit on one of the two ways.
// Source: Eker et al. 2018: log L = -0.976 + 2.028 log M below 0.45 solar masses; scatter 0.12 dex measured.
TEST(LuminosityWay, Mass) {
  StarRecord star;
  star.stellar_mass = value(0.3, 0.03, 0.03);
  const double wanted = std::pow(10, -0.976 + 2.028 * std::log10(0.3));
  expect_value(star_of(star).luminosity, wanted, wanted * std::hypot(2.028 * 0.1, ln10 * 0.12),
               "stellar_mass by L(mass)");
}

// ---- radius, mass, distance ---------------------------------------------------------------------------------------

TEST(RadiusWay, AbsoluteKs) {
  const std::initializer_list<double> radius = {1.9515, -0.3520, 0.01680};
  StarRecord star;
  star.teff = exactly(3400);
  star.magnitude_k = value(6.5, 0.02, 0.02);
  star.distance = exactly(10);
  const double at = polynomial(radius, 6.5);
  expect_value(star_of(star).stellar_radius, at, std::hypot(slope(radius, 6.5) * 0.02, 0.0289 * at),
               "magnitude_k and distance by R(M_Ks)");
}

TEST(RadiusWay, LuminosityAndTeff) {
  StarRecord star;
  star.luminosity = value(0.25, 0.01, 0.01);
  star.teff = value(4000, 40, 40);
  const double wanted = 0.5 * squared(5772.0 / 4000);
  expect_value(star_of(star).stellar_radius, wanted, wanted * std::hypot(0.02, 2 * 0.01), "luminosity and teff");
}

/// Nominal GM and R of the Sun: log g 4.4380676 (cgs).
constexpr double solar_log_g = 4.4380676;

/// Without a Teff no luminosity leads to the radius; a set that needs none still answers.
StarAnswer star_without_teff(const StarRecord& star) {
  ListRow row;
  row.star = star;
  return answer_star(row, settings_of("TEQ_A03")).star;
}

TEST(RadiusWay, LogGAndMass) {
  StarRecord star;
  star.luminosity = exactly(1);
  star.log_g = value(4.5, 0.05, 0.05);
  star.stellar_mass = value(0.4, 0.02, 0.02);
  star.spectral_type = "K0III";  // no relation helps
  const double wanted = std::sqrt(0.4 / std::pow(10, 4.5 - solar_log_g));
  expect_value(star_without_teff(star).stellar_radius, wanted, wanted * 0.5 * std::hypot(0.05, ln10 * 0.05),
               "log_g and stellar_mass");
}

// Source: Pecaut & Mamajek 2013: M6V of 0.105 solar masses has 0.137 solar radii, M6.5V of 0.096 0.126; 3.7 per cent.
// Out of the range of every luminosity by mass, which would come first.
TEST(RadiusWay, Mass) {
  ListRow row = testing::bare_earth();
  row.star.teff = exactly(2800);
  row.star.stellar_mass = value(0.1005, 0.001, 0.001);
  row.planet.scaled_semi_major_axis = exactly(30);
  expect_value(answer(row, settings_of()).star.stellar_radius, 0.1315,
               std::hypot(0.011 / 0.009 * 0.001, 0.037 * 0.1315), "stellar_mass by R(mass)");
}

// Source: Mann et al. 2019: log M of M_Ks - 7.5, scatter 2.5 per cent (0.011 dex).
TEST(MassWay, AbsoluteKs) {
  const std::initializer_list<double> log_mass = {-0.642, -0.208, -8.43e-4, 7.87e-3, 1.42e-4, -2.13e-4};
  StarRecord star;
  star.magnitude_k = value(6.5, 0.02, 0.02);
  star.parallax = value(100, 1, 1);
  const double wanted = std::pow(10, polynomial(log_mass, -1));
  const double dex = std::hypot(slope(log_mass, -1) * std::hypot(0.02, 5 / ln10 * 0.01), 0.011);
  expect_value(star_of(star).stellar_mass, wanted, wanted * ln10 * dex, "magnitude_k and parallax by M(M_Ks)");
}

/// A star that states Teff and radius, so that its luminosity, but no more of its mass, is known.
StarRecord with_radius() {
  StarRecord star;
  star.teff = exactly(5000);
  star.stellar_radius = value(0.8, 0.02, 0.02);
  return star;
}

// Mean density of the Sun: 3 GM / (4 pi G R^3) = 1.40978 g cm^-3 with G of CODATA 2018.
TEST(MassWay, DensityAndRadius) {
  StarRecord star = with_radius();
  star.stellar_density = value(2, 0.1, 0.1);
  const double wanted = 2 / 1.40978 * std::pow(0.8, 3);
  expect_value(star_of(star).stellar_mass, wanted, wanted * std::hypot(0.05, 3 * 0.025),
               "stellar_density and stellar_radius");
}

// Kepler: (a/au)^3 = M (P/yr)^2 with the Gaussian year of 365.2568984 d and 215.032156 solar radii to the au.
TEST(MassWay, TransitAndRadius) {
  ListRow row = testing::bare_earth();
  row.star = with_radius();
  row.planet.scaled_semi_major_axis = value(100, 2, 2);
  row.planet.orbital_period = exactly(90);
  const double axis = 100 * 0.8 / 215.032156;
  const double wanted = std::pow(axis, 3) / squared(90 / 365.2568984);
  expect_value(answer(row, settings_of()).star.stellar_mass, wanted, wanted * 3 * std::hypot(0.02, 0.025),
               "scaled_semi_major_axis, orbital_period and stellar_radius");
}

// Source: Eker et al. 2018 from 0.45 to 0.72 solar masses: log L = -0.102 + 4.572 log M, scatter 0.109 dex of L.
TEST(MassWay, Luminosity) {
  StarRecord star;
  star.teff = exactly(4200);
  star.luminosity = value(0.1, 0.005, 0.005);
  const double wanted = std::pow(10, (-1 + 0.102) / 4.572);
  expect_value(star_of(star).stellar_mass, wanted, wanted * std::hypot(0.05, ln10 * 0.109) / 4.572,
               "luminosity by mass(L)");
}

TEST(MassWay, LogGAndRadius) {
  StarRecord star = with_radius();
  star.spectral_type = "K0III";  // no relation helps
  star.log_g = value(4.5, 0.05, 0.05);
  const double wanted = std::pow(10, 4.5 - solar_log_g) * 0.64;
  expect_value(star_of(star).stellar_mass, wanted, wanted * std::hypot(ln10 * 0.05, 2 * 0.025),
               "log_g and stellar_radius");
}

TEST(DistanceWay, ParallaxIsInvertedWhenItsErrorIsSmall) {
  StarRecord star = with_radius();
  star.parallax = value(25, 0.5, 1);
  const Derived distance = *star_of(star).distance;
  EXPECT_EQ(distance.route, "parallax");
  EXPECT_DOUBLE_EQ(distance.measured.value, 40);
  EXPECT_NEAR(*distance.measured.minus, 40 * 1 / 25.0, 1e-12);  // a larger parallax is nearer
  EXPECT_NEAR(*distance.measured.plus, 40 * 0.5 / 25.0, 1e-12);
}

// ---- orbit and planet ---------------------------------------------------------------------------------------------

TEST(AxisWay, PeriodAndAMassByItsOwnRoute) {
  ListRow row = testing::bare_earth();
  row.star.teff = exactly(4200);
  row.star.luminosity = value(0.1, 0.005, 0.005);
  row.planet.orbital_period = value(100, 1, 1);
  const double mass = std::pow(10, (-1 + 0.102) / 4.572);
  const double wanted = std::cbrt(mass * squared(100 / 365.2568984));
  const double of_mass = std::hypot(0.05, ln10 * 0.109) / 4.572;
  expect_value(answer(row, settings_of()).planet->semi_major_axis, wanted,
               wanted * std::hypot(of_mass / 3, 2.0 / 3 * 0.01),
               "orbital_period and stellar_mass (luminosity by mass(L))");
}

/// L moves the mass as well, and with it the axis: S goes by L to the power 1 - 2/3 of the mass's.
TEST(InsolationWay, CountsALuminosityThatTheMassHangsOnOnce) {
  ListRow row = testing::bare_earth();
  row.star.teff = exactly(4200);
  row.star.luminosity = value(0.1, 0.005, 0.005);
  row.planet.orbital_period = exactly(100);
  const Measured s = answer(row, settings_of()).planet->insolation.measured;
  const double axis = std::cbrt(std::pow(10, (-1 + 0.102) / 4.572) * squared(100 / 365.2568984));
  EXPECT_NEAR(s.value, 0.1 / squared(axis), 1e-8);
  const double half_width = std::hypot((1 - 2.0 / 3 / 4.572) * 0.05, 2.0 / 3 / 4.572 * ln10 * 0.109);
  EXPECT_NEAR(*s.plus, s.value * half_width, 1e-4 * s.value * half_width);
}

// Nominal solar over Earth radius: 695700 / 6378.1 = 109.07637.
TEST(PlanetRadiusWay, RatioAndDepth) {
  ListRow row = testing::earth();
  row.star.stellar_radius = value(0.5, 0.02, 0.02);
  row.planet.radius_ratio = value(0.02, 0.0004, 0.0004);
  const double radius = 0.02 * 0.5 * 109.07637;
  expect_value(answer(row, settings_of()).planet->planet_radius, radius, radius * std::hypot(0.04, 0.02),
               "radius_ratio and stellar_radius");
  row.planet.radius_ratio = {};
  row.planet.transit_depth = value(0.0004, 0.00002, 0.00002);
  expect_value(answer(row, settings_of()).planet->planet_radius, radius, radius * std::hypot(0.04, 0.5 * 0.05),
               "transit_depth and stellar_radius");
}

}  // namespace
}  // namespace hz
