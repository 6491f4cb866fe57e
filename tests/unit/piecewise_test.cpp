#include "piecewise.hpp"

#include <gtest/gtest.h>

#include <stdexcept>

namespace hz {
namespace {

TEST(PiecewisePolynomial, EndBelongsToThePieceAbove) {
  const PiecewisePolynomial two({}, {{0, {1, 1}}, {2, {10, 0, 1}}});
  EXPECT_DOUBLE_EQ(two(1.5), 2.5);
  EXPECT_DOUBLE_EQ(two(2), 14);
  EXPECT_DOUBLE_EQ(two(3), 19);
  EXPECT_DOUBLE_EQ(two(-1), 0);  // the first piece serves below its own beginning
}

TEST(PiecewisePolynomial, ArgumentIsTransformed) {
  const PiecewisePolynomial in_log({true, 3, 2}, {{0, {0, 1}}});
  EXPECT_DOUBLE_EQ(in_log(1e5), 1);  // (log10 1e5 - 3) / 2
}

TEST(PiecewisePolynomial, NeedsRisingPieces) {
  EXPECT_THROW(PiecewisePolynomial({}, {}), std::logic_error);
  EXPECT_THROW(PiecewisePolynomial({}, {{1, {1}}, {1, {2}}}), std::logic_error);
}

TEST(Polyline, IsStraightBetweenPointsAndFlatOutside) {
  const Polyline line({{0, 1}, {1, 3}, {4, 0}});
  EXPECT_DOUBLE_EQ(line(0.5), 2);
  EXPECT_DOUBLE_EQ(line(1), 3);
  EXPECT_DOUBLE_EQ(line(2.5), 1.5);
  EXPECT_DOUBLE_EQ(line(-9), 1);
  EXPECT_DOUBLE_EQ(line(9), 0);
}

TEST(Polyline, NeedsTwoRisingPoints) {
  EXPECT_THROW(Polyline({{0, 1}}), std::logic_error);
  EXPECT_THROW(Polyline({{0, 1}, {0, 2}}), std::logic_error);
}

// y = x below 1, y = 2 x - 1.5 from 1 on: y between 0.5 and 1 has two answers, which one straight line joins from the
// last x that is alone with its y (0.5) to the first (1.25).
TEST(Inverse, JoinsAnOverlapByALine) {
  const Polyline back = inverse(PiecewisePolynomial({}, {{0, {0, 1}}, {1, {-1.5, 2}}}), 0, 3);
  EXPECT_DOUBLE_EQ(back(0.25), 0.25);
  EXPECT_DOUBLE_EQ(back(0.5), 0.5);
  EXPECT_DOUBLE_EQ(back(0.75), 0.875);
  EXPECT_DOUBLE_EQ(back(1), 1.25);
  EXPECT_DOUBLE_EQ(back(4.5), 3);
}

// y = x below 1, y = x + 1 from 1 on: nothing has a y between 1 and 2.
TEST(Inverse, StaysAtTheBreakOverAGap) {
  const Polyline back = inverse(PiecewisePolynomial({}, {{0, {0, 1}}, {1, {1, 1}}}), 0, 3);
  EXPECT_DOUBLE_EQ(back(0.9), 0.9);
  EXPECT_DOUBLE_EQ(back(1.5), 1);
  EXPECT_DOUBLE_EQ(back(2.5), 1.5);
}

TEST(Inverse, NeedsRisingStraightPieces) {
  EXPECT_THROW((void)inverse(PiecewisePolynomial({}, {{0, {0, -1}}}), 0, 1), std::logic_error);
  EXPECT_THROW((void)inverse(PiecewisePolynomial({}, {{0, {0, 1, 1}}}), 0, 1), std::logic_error);
}

}  // namespace
}  // namespace hz
