#include "hz/extinction.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <stdexcept>

namespace hz {
namespace {

// Source: Cardelli, Clayton & Mathis 1989, ApJ 345, 245, equation 2: in the infrared A(x)/A(V) = (0.574 - 0.527 / R_V)
// x^1.61, x in 1/um, with R_V = 3.1.
double infrared(double wavelength) { return (0.574 - 0.527 / 3.1) * std::pow(1 / wavelength, 1.61); }

TEST(Extinction, InfraredBandsAreThoseOfTheLaw) {
  EXPECT_NEAR(extinction_ratio(Quantity::magnitude_j), infrared(1.25), 5e-4);
  EXPECT_NEAR(extinction_ratio(Quantity::magnitude_k), infrared(2.20), 8e-4);
}

TEST(Extinction, RedderBandsSufferLess) {
  EXPECT_DOUBLE_EQ(extinction_ratio(Quantity::magnitude_v), 1);
  EXPECT_DOUBLE_EQ(extinction_ratio(Quantity::magnitude_g), 0.79);
  EXPECT_GT(extinction_ratio(Quantity::magnitude_b), 1);
  EXPECT_GT(extinction_ratio(Quantity::magnitude_g), extinction_ratio(Quantity::magnitude_j));
  EXPECT_GT(extinction_ratio(Quantity::magnitude_j), extinction_ratio(Quantity::magnitude_k));
}

TEST(Reddening, OfAColorIsTheDifferenceOfItsBands) {
  const auto ratio = [](Quantity magnitude) { return extinction_ratio(magnitude); };
  EXPECT_DOUBLE_EQ(color_excess_ratio(Quantity::color_bv), 1 / 3.1);
  EXPECT_NEAR(color_excess_ratio(Quantity::color_bv), ratio(Quantity::magnitude_b) - 1, 1e-12);
  EXPECT_DOUBLE_EQ(color_excess_ratio(Quantity::color_vj), 1 - ratio(Quantity::magnitude_j));
  EXPECT_DOUBLE_EQ(color_excess_ratio(Quantity::color_vk), 1 - ratio(Quantity::magnitude_k));
  EXPECT_DOUBLE_EQ(color_excess_ratio(Quantity::color_bp_rp), 0.395);
}

TEST(Extinction, OtherQuantitiesAreABug) {
  EXPECT_THROW((void)extinction_ratio(Quantity::teff), std::logic_error);
  EXPECT_THROW((void)extinction_ratio(Quantity::magnitude_bol), std::logic_error);
  EXPECT_THROW((void)color_excess_ratio(Quantity::magnitude_v), std::logic_error);
}

}  // namespace
}  // namespace hz
