// Parallaxes and extinctions as the resolver takes them.
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"
#include "hz/distance.hpp"

namespace hz {
namespace {

using testing::exactly;
using testing::has_flag;
using testing::settings_of;
using testing::value;

constexpr double ln10 = 2.302585092994046;

Answer star_answer(const StarRecord& star, const Settings& settings = settings_of()) {
  ListRow row;
  row.star = star;
  return answer_star(row, settings);
}

// ---- parallaxes ---------------------------------------------------------------------------------------------------

StarRecord with_parallax(const Field& parallax) {
  StarRecord star;
  star.teff = exactly(5700);
  star.magnitude_v = value(12, 0.01, 0.01);
  star.parallax = parallax;
  return star;
}

TEST(Parallax, ALargeErrorBringsThePrior) {
  EXPECT_FALSE(has_flag(star_answer(with_parallax(value(2, 0.199, 0.199))), "distance_prior"));
  const Answer answered = star_answer(with_parallax(value(2, 0.2, 0.2)));
  EXPECT_TRUE(has_flag(answered, "distance_prior"));
  const Measured posterior = log_distance_posterior(2, 0.2, 1350);
  const Measured& distance = answered.star.distance->measured;
  EXPECT_NEAR(distance.value, std::pow(10, posterior.value), 1e-9);
  EXPECT_NEAR(*distance.plus, distance.value * ln10 * *posterior.plus, 1e-9);
  EXPECT_NEAR(*distance.minus, distance.value * ln10 * *posterior.minus, 1e-9);
}

TEST(Parallax, NegativeOnesGetADistanceToo) {
  const Answer answered = star_answer(with_parallax(value(-0.5, 0.3, 0.3)));
  EXPECT_EQ(answered.status, Status::answered) << answered.reason;
  EXPECT_TRUE(has_flag(answered, "distance_prior"));
  EXPECT_GT(answered.star.distance->measured.value, 1000);
  EXPECT_GT(answered.star.luminosity->measured.value, 0);
}

TEST(Parallax, LengthScaleIsTheUsers) {
  Settings settings = settings_of();
  const double usual = star_answer(with_parallax(value(-0.5, 0.3, 0.3)), settings).star.distance->measured.value;
  settings.length_scale = 300;
  EXPECT_LT(star_answer(with_parallax(value(-0.5, 0.3, 0.3)), settings).star.distance->measured.value, usual);
}

TEST(Parallax, WithoutAnErrorNothingFollowsFromANegativeOne) {
  Settings settings = settings_of();
  settings.assumed_errors = {};
  for (const double mas : {-0.5, 0.0}) {
    for (const Field& parallax : {value(mas), exactly(mas)}) {
      EXPECT_EQ(star_answer(with_parallax(parallax), settings).reason_kind, "no luminosity") << mas;
    }
  }
}

/// An assumed error is a share of the value, and nothing of 0.
TEST(Parallax, ZeroHasADistanceOnlyWithAnErrorOfItsOwn) {
  EXPECT_EQ(star_answer(with_parallax(value(0))).reason_kind, "no luminosity");
  EXPECT_TRUE(has_flag(star_answer(with_parallax(value(0, 0.3, 0.3))), "distance_prior"));
}

// ---- extinction ---------------------------------------------------------------------------------------------------

double log_light(const StarRecord& star) { return std::log10(star_answer(star).star.luminosity->measured.value); }

// A_V 1: A_G 0.79 (Wang & Chen 2019), A_J 0.282, A_Ks 0.114 (Cardelli et al. 1989, R_V 3.1).
TEST(Extinction, ComesOffMagnitudes) {
  StarRecord star;
  star.teff = exactly(5700);
  star.distance = exactly(100);
  star.magnitude_g = exactly(9);
  const double dark = log_light(star);
  star.extinction_v = exactly(1);
  EXPECT_NEAR(log_light(star) - dark, 0.4 * 0.79, 1e-12);
  star.extinction_v = {};
  star.reddening_bv = exactly(0.1);
  EXPECT_NEAR(log_light(star) - dark, 0.4 * 0.79 * 0.31, 1e-12);
  star.magnitude_v = exactly(9);
  star.magnitude_g = {};
  star.reddening_bv = {};
  const double visual = log_light(star);
  star.extinction_v = exactly(1);
  EXPECT_NEAR(log_light(star) - visual, 0.4, 1e-12);
  star.extinction_v = exactly(0.5);
  star.reddening_bv = exactly(1);  // A_V is asked for first
  EXPECT_NEAR(log_light(star) - visual, 0.2, 1e-12);
}

/// Reddened by A_V 1 a star looks as red as another does without: E(B-V) 1/3.1, E(V-J) 0.718, E(V-Ks) 0.886, E(BP-RP)
/// 0.395.
TEST(Extinction, ComesOffColours) {
  struct Case {
    Field StarRecord::*color = nullptr;
    double intrinsic = 0, excess = 0;
  };
  constexpr Case cases[] = {{&StarRecord::color_bv, 0.6, 1 / 3.1},
                            {&StarRecord::color_vj, 1.1, 0.718},
                            {&StarRecord::color_vk, 1.5, 0.886},
                            {&StarRecord::color_bp_rp, 0.8, 0.395}};
  for (const Case& c : cases) {
    StarRecord star;
    star.*c.color = exactly(c.intrinsic);
    const double clear = star_answer(star).star.teff->measured.value;
    star.*c.color = exactly(c.intrinsic + c.excess);
    star.extinction_v = exactly(1);
    EXPECT_NEAR(star_answer(star).star.teff->measured.value, clear, 1e-6) << c.excess;
  }
}

TEST(Extinction, ItsErrorCountsOnceInMagnitudeAndColour) {
  StarRecord star;
  star.magnitude_v = exactly(11.2);
  star.magnitude_k = exactly(6.05);
  star.parallax = exactly(100);
  star.extinction_v = value(0.4, 0.1, 0.1);
  const Measured light = star_answer(star).star.luminosity->measured;
  // V-Ks 5.15 less 0.886 A_V is 4.80. Source: Pecaut & Mamajek 2013: 4.60 has BC_V -1.93, 5.00 -2.28.
  const double per_color = -0.35 / 0.40;
  const double by_extinction = 0.4 * ln10 * std::abs(-1 - 0.886 * per_color) * 0.1;
  EXPECT_NEAR(*light.plus / light.value, std::hypot(by_extinction, 0.4 * ln10 * 0.03), 1e-4);
}

TEST(Extinction, LeftOutIsFlaggedBeyond100ParsecsOnly) {
  StarRecord star;
  star.teff = exactly(5700);
  star.magnitude_v = exactly(9);
  for (const double distance : {99.0, 101.0}) {
    star.distance = exactly(distance);
    EXPECT_EQ(has_flag(star_answer(star), "extinction_ignored"), distance > 100) << distance;
  }
  star.extinction_v = exactly(0);
  EXPECT_FALSE(has_flag(star_answer(star), "extinction_ignored"));
  star = {};
  star.color_bv = exactly(0.65);  // nobody knows how far
  star.luminosity = exactly(1);
  EXPECT_TRUE(has_flag(star_answer(star), "extinction_ignored"));
}

}  // namespace
}  // namespace hz
