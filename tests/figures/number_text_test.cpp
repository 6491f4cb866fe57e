#include "number_text.hpp"

#include <gmock/gmock.h>

namespace hz::plots {
namespace {

/// With ordinary blanks.
std::string written(const Measured& measured) {
  std::string text = measured_text(measured);
  for (std::size_t at = text.find("\u00A0"); at != text.npos; at = text.find("\u00A0")) text.replace(at, 2, " ");
  return text;
}

TEST(MeasuredText, GivesHalfWidthsTwoDigits) {
  EXPECT_EQ(written({4410, 70, 70}), "4410 ± 70");
  EXPECT_EQ(written({4412, 158, 158}), "4410 ± 160");
  EXPECT_EQ(written({0.165, 0.009, 0.009}), "0.165 ± 0.009");
  EXPECT_EQ(written({0.16523, 0.00912, 0.00912}), "0.1652 ± 0.0091");
  EXPECT_EQ(written({5772, 0.8, 0.8}), "5772.0 ± 0.8");
  EXPECT_EQ(written({2.0, 1.0, 1.0}), "2 ± 1");
}

TEST(MeasuredText, WritesBothHalfWidthsWhenTheyDiffer) {
  EXPECT_EQ(written({4410, 60, 80}), "4410 +80/−60");
  EXPECT_EQ(written({1.1, 0.08, 0.12}), "1.10 +0.12/−0.08");
}

TEST(MeasuredText, TakesMissingAndZeroForNone) {
  EXPECT_EQ(written({5772, {}, {}}), "5772");
  EXPECT_EQ(written({0.165, 0, 0}), "0.165");
  EXPECT_EQ(written({0.000553, {}, {}}), "0.000553");
  EXPECT_EQ(written({123456, {}, {}}), "123456");
}

TEST(MeasuredText, KeepsOneSidedHalfWidths) { EXPECT_EQ(written({1.1, {}, 0.12}), "1.10 +0.12/−0.00"); }

TEST(ProbabilityText, HasTwoDigitsAndOpenEnds) {
  EXPECT_EQ(probability_text(0.644), "0.64");
  EXPECT_EQ(probability_text(0.5), "0.50");
  EXPECT_EQ(probability_text(0.99), "0.99");
  EXPECT_EQ(probability_text(0.9901), "> 0.99");
  EXPECT_EQ(probability_text(1), "> 0.99");
  EXPECT_EQ(probability_text(0.01), "0.01");
  EXPECT_EQ(probability_text(0.0099), "< 0.01");
  EXPECT_EQ(probability_text(0), "< 0.01");
}

TEST(TickText, WritesDecimalsAndPowers) {
  EXPECT_EQ(plain(tick_text(5, -2)), "0.05");
  EXPECT_EQ(plain(tick_text(2, 0)), "2");
  EXPECT_EQ(plain(tick_text(3, 3)), "3000");
  EXPECT_EQ(plain(tick_text(1, -4)), "0.0001");
  EXPECT_EQ(plain(tick_text(1, 5)), "105");
  EXPECT_EQ(tick_text(1, 5)[1].script, Script::super);
  EXPECT_EQ(plain(tick_text(2, -5)), "2×10−5");
}

}  // namespace
}  // namespace hz::plots
