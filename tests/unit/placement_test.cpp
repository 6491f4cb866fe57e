#include "hz/placement.hpp"

#include <gtest/gtest.h>

#include <cmath>

#include "awkward_cases.hpp"

namespace hz {
namespace {

using test::awkward_cases;
using test::AwkwardCase;

const LimitSet& set_named(std::string_view key) { return *LimitCatalog::published().find(key); }

/// Difference of two probabilities in standard errors of the sampled one; a share of a draw keeps the ends apart from
/// 0.
double z_of(double exact, double sampled, double draws) {
  const double p = std::clamp((exact + sampled) / 2, 1 / draws, 1 - 1 / draws);
  return (exact - sampled) / std::sqrt(p * (1 - p) / draws);
}

std::vector<double> numbers_of(const Probabilities& p) {
  return {*p.too_hot,
          *p.optimistic,
          *p.too_cold,
          *p.conservative,
          p.unanswered,
          p.too_hot_conservative,
          p.too_cold_conservative};
}

/// 50 of the 200 awkward cases against 100,000 draws each.
class AwkwardPlacement : public testing::TestWithParam<std::size_t> {};

TEST_P(AwkwardPlacement, AgreesWithTheSamplerWithinItsError) {
  constexpr std::uint64_t draws = 100'000;
  const std::vector<AwkwardCase> cases = awkward_cases();
  double sum_of_squares = 0;
  int count = 0;
  for (std::size_t i = GetParam(); i < cases.size(); i += 4) {
    const Probabilities exact = place(cases[i].input, set_named("K14"), cases[i].beyond);
    const Probabilities sampled = place_by_sampling(cases[i].input, set_named("K14"), cases[i].beyond, draws, i + 1);
    for (std::size_t k = 0; k < numbers_of(exact).size(); ++k) {
      const double z = z_of(numbers_of(exact)[k], numbers_of(sampled)[k], draws);
      // 350 numbers: 4.5 sigma is met by chance once in 400 runs of another seed; the seed is fixed.
      EXPECT_LT(std::abs(z), 4.5) << cases[i].name << ", number " << k << ": " << numbers_of(exact)[k] << " against "
                                  << numbers_of(sampled)[k];
      sum_of_squares += z * z;
      ++count;
    }
  }
  EXPECT_LT(sum_of_squares / count, 1.25) << "a bias too small for any single case";
}

INSTANTIATE_TEST_SUITE_P(Quarters, AwkwardPlacement, testing::Values(0, 1, 2, 3));

/// Gauss nodes once lay beyond an eccentricity of 1 where the domain cut it between five and seven half-widths out: P 1
/// for 0.06.
TEST(Placement, AnErrorOfEccentricityOfAnySizeAgreesWithTheSampler) {
  PlacementInput input;
  input.offset = -4 * std::log(constants::solar_teff);
  input.curve.power = 4;
  input.teff = Distribution::two_piece(5898, 13, 13, Asymmetry::median, test::positive);
  input.terms = {{Quantity::stellar_radius,
                  Distribution::two_piece(1.07, 0.015, 0.015, Asymmetry::median, test::positive), 2, false},
                 {Quantity::semi_major_axis,
                  Distribution::two_piece(0.81, 0.016, 0.016, Asymmetry::median, test::positive), -2, false}};
  constexpr std::uint64_t draws = 50'000;
  for (int hundredths = 5; hundredths <= 30; ++hundredths) {
    const double sigma = 0.01 * hundredths;
    input.eccentricity = Distribution::two_piece(0.24, sigma, sigma, Asymmetry::median, {0, 1});
    const Probabilities exact = place(input, set_named("K14"), BeyondRange::hold);
    const Probabilities sampled = place_by_sampling(input, set_named("K14"), BeyondRange::hold, draws, 7);
    EXPECT_LT(std::abs(z_of(*exact.optimistic, *sampled.optimistic, draws)), 4) << "half-width " << sigma;
  }
}

TEST(Placement, SharesSumToOneOnEveryAwkwardCase) {
  for (const AwkwardCase& c : awkward_cases()) {
    const Probabilities p = place(c.input, set_named("K14"), c.beyond);
    EXPECT_NEAR(*p.too_hot + *p.optimistic + *p.too_cold + p.unanswered, 1, 1e-12) << c.name;
    EXPECT_LE(*p.conservative, *p.optimistic) << c.name;
    for (const double share : numbers_of(p)) EXPECT_GE(share, 0) << c.name;
  }
}

TEST(Placement, KnownInputsGiveAStep) {
  PlacementInput input;
  input.teff = Distribution::exact(5780);
  input.terms = {{Quantity::insolation, Distribution::exact(1.0), 1, false}};
  const Probabilities earth = place(input, set_named("K14"), BeyondRange::hold);
  EXPECT_EQ(*earth.conservative, 1);
  EXPECT_EQ(*earth.optimistic, 1);
  input.terms = {{Quantity::insolation, Distribution::exact(1.911), 1, false}};  // Venus: 1 / 0.72333^2
  const Probabilities venus = place(input, set_named("K14"), BeyondRange::hold);
  EXPECT_EQ(*venus.too_hot, 1);
  EXPECT_EQ(*venus.conservative, 0);
}

/// With one uncertain input the answer is its own distribution function.
TEST(Placement, OneNormalInputFollowsItsErrorFunction) {
  PlacementInput input;
  input.teff = Distribution::exact(5780);
  input.terms = {
      {Quantity::insolation, Distribution::two_piece(1.107, 0.1, 0.1, Asymmetry::median, {0, HUGE_VAL}), 1, false}};
  const Probabilities p = place(input, set_named("K14"), BeyondRange::hold);
  EXPECT_NEAR(p.too_hot_conservative, 0.5, 1e-9);  // the limit is 1.107 itself
  EXPECT_NEAR(p.too_cold_conservative, 0.5 * std::erfc((1.107 - 0.356) / 0.1 / std::sqrt(2)), 1e-9);
}

/// Under `refuse` the share of Teff outside the fits is what the distribution says: half of it here.
TEST(Placement, RefusedShareIsUnanswered) {
  PlacementInput input;
  input.teff = Distribution::two_piece(2600, 50, 50, Asymmetry::median, {0, HUGE_VAL});
  input.terms = {{Quantity::insolation, Distribution::exact(0.5), 1, false}};
  const Probabilities refused = place(input, set_named("K14"), BeyondRange::refuse);
  EXPECT_NEAR(refused.unanswered, 0.5, 1e-9);
  EXPECT_NEAR(*refused.optimistic, 0.5, 1e-6);
  const Probabilities held = place(input, set_named("K14"), BeyondRange::hold);
  EXPECT_NEAR(held.unanswered, 0, 1e-8);  // 300 K is six half-widths
  EXPECT_NEAR(held.teff_in_range, 0.5, 1e-9);
}

TEST(Placement, ASetWithOneZoneLeavesTheOtherEmpty) {
  PlacementInput input;
  input.teff = Distribution::exact(5700);
  input.terms = {{Quantity::insolation, Distribution::exact(1.0), 1, false}};
  const Probabilities p = place(input, set_named("UJS03"), BeyondRange::hold);
  EXPECT_TRUE(p.conservative);
  EXPECT_FALSE(p.optimistic);
  EXPECT_EQ(*p.too_hot + *p.conservative + *p.too_cold, 1);
}

/// One normal input of relative width w: ln S has half-widths near w, each side its own.
TEST(MarginWidth, FollowsTheFacingHalfWidth) {
  PlacementInput input;
  input.teff = Distribution::exact(5780);
  input.terms = {
      {Quantity::insolation, Distribution::two_piece(1, 0.05, 0.2, Asymmetry::median, {0, HUGE_VAL}), 1, false}};
  const FluxLimit& limit = set_named("K14").limits[set_named("K14").conservative->inner];
  EXPECT_NEAR(log_margin_width(input, limit, BeyondRange::hold, Towards::hotter), std::log(1.2), 0.01 * 0.2);
  EXPECT_NEAR(log_margin_width(input, limit, BeyondRange::hold, Towards::colder), -std::log(0.95), 0.01 * 0.05);
}

}  // namespace
}  // namespace hz
