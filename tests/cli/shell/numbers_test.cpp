#include "numbers.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

namespace hz::app {
namespace {

Measured bare(double value, LimitMark limit = LimitMark::none) {
  Measured measured;
  measured.value = value;
  measured.limit = limit;
  return measured;
}
Measured with_widths(double value, double minus, double plus) {
  Measured measured = bare(value);
  measured.minus = minus;
  measured.plus = plus;
  return measured;
}

TEST(MeasuredText, LargerHalfWidthHasTwoDigits) {
  EXPECT_EQ(measured_text(with_widths(0.4123, 0.0117, 0.0117)), "0.412 ± 0.012");
  EXPECT_EQ(measured_text(with_widths(4410.4, 71.2, 71.2)), "4410 ± 71");
  EXPECT_EQ(measured_text(with_widths(4410.4, 712, 712)), "4410 ± 712");
}

TEST(MeasuredText, AsymmetricHalfWidthsShareTheirDecimals) {
  EXPECT_EQ(measured_text(with_widths(0.79, 0.0213, 0.0298)), "0.790 +0.030 −0.021");
}

TEST(MeasuredText, SmallerHalfWidthKeepsADigit) {
  EXPECT_EQ(measured_text(with_widths(412, 0.3, 12)), "412.0 +12.0 −0.3");
}

TEST(MeasuredText, HalfWidthsThatPrintAlikeAreSymmetric) {
  EXPECT_EQ(measured_text(with_widths(1.5, 0.1204, 0.1196)), "1.50 ± 0.12");
}

TEST(MeasuredText, OneSideAlone) { EXPECT_EQ(measured_text(with_widths(1.5, 0, 0.12)), "1.50 +0.12 −0.00"); }

TEST(MeasuredText, NoHalfWidthsNoPlusMinus) {
  EXPECT_EQ(measured_text(bare(5780)), "5780");
  EXPECT_EQ(measured_text(with_widths(5780, 0, 0)), "5780");
}

TEST(MeasuredText, LimitsKeepTheirMark) {
  EXPECT_EQ(measured_text(bare(0.3, LimitMark::upper)), "< 0.3");
  EXPECT_EQ(measured_text(bare(0.04, LimitMark::lower)), "> 0.04");
}

TEST(MeasuredText, WhatIsNotFiniteIsADash) {
  EXPECT_EQ(measured_text(bare(std::nan(""))), "-");
  EXPECT_EQ(measured_text(with_widths(1.5, std::numeric_limits<double>::infinity(), std::nan(""))), "1.5");
}

TEST(DecimalsFor, CountsAfterRounding) {
  EXPECT_EQ(decimals_for(0.0996, 2), 2);  // 0.10
  EXPECT_EQ(decimals_for(0.0994, 2), 3);  // 0.099
  EXPECT_EQ(decimals_for(0.750, 3), 3);
  EXPECT_EQ(decimals_for(12345.0, 3), 0);
  EXPECT_EQ(decimals_for(0.0, 3), 0);
}

TEST(Fixed, NegativeZeroLosesItsSign) {
  EXPECT_EQ(fixed(-0.001, 2), "0.00");
  EXPECT_EQ(fixed(-0.5, 2), "−0.50");
}

TEST(ShortNumber, SixDigitsAtMost) {
  EXPECT_EQ(short_number(5780), "5780");
  EXPECT_EQ(short_number(0.16534298), "0.165343");
  EXPECT_EQ(short_number(1.2e-7), "1.2e-07");
  EXPECT_EQ(short_number(std::numeric_limits<double>::infinity()), "-");
}

TEST(ProbabilityText, EndsAreNeverCertain) {
  EXPECT_EQ(probability_text(1.0), "> 0.99");
  EXPECT_EQ(probability_text(0.9901), "> 0.99");
  EXPECT_EQ(probability_text(0.99), "0.99");
  EXPECT_EQ(probability_text(0.665), "0.67");
  EXPECT_EQ(probability_text(0.01), "0.01");
  EXPECT_EQ(probability_text(0.0099), "< 0.01");
  EXPECT_EQ(probability_text(0.0), "< 0.01");
  EXPECT_EQ(probability_text(std::nullopt), "-");
}

TEST(CountText, GroupsThousands) {
  EXPECT_EQ(count_text(0), "0");
  EXPECT_EQ(count_text(999), "999");
  EXPECT_EQ(count_text(5347), "5,347");
  EXPECT_EQ(count_text(1234567), "1,234,567");
  EXPECT_EQ(counted(1, "row"), "1 row");
  EXPECT_EQ(counted(0, "row"), "0 rows");
}

TEST(Rounded, KeepsThatManyDigits) {
  EXPECT_EQ(rounded(0.94982183, 7), 0.9498218);
  EXPECT_EQ(rounded(123456789.0, 3), 123000000.0);
  EXPECT_EQ(rounded(0.0, 3), 0.0);
}

}  // namespace
}  // namespace hz::app
