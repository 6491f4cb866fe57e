#include "canvas.hpp"

#include <gmock/gmock.h>

namespace hz::plots {
namespace {

TEST(Canvas, NeverWritesBelow7Points) {
  const TextMeasure measure;
  for (const double mm : {60, 88, 120, 180, 1000}) EXPECT_GE(Canvas(measure, mm * 72 / 25.4).size(), 7) << mm;
}

TEST(Canvas, AlignsByTheAdvanceWidth) {
  const TextMeasure measure;
  const Canvas canvas(measure, 300);
  const Text text{{"early Mars"}};
  const double width = measure.advance(text, canvas.words());
  EXPECT_DOUBLE_EQ(canvas.text_at(text, canvas.words(), {100, 50}, Align::left).baseline.x, 100);
  EXPECT_DOUBLE_EQ(canvas.text_at(text, canvas.words(), {100, 50}, Align::center).baseline.x, 100 - width / 2);
  EXPECT_DOUBLE_EQ(canvas.text_at(text, canvas.words(), {100, 50}, Align::right).baseline.x, 100 - width);
}

TEST(Box, TouchingIsNotOverlapping) {
  const Box box{0, 0, 10, 10};
  EXPECT_FALSE(box.overlaps({10, 0, 5, 5}));
  EXPECT_TRUE(box.overlaps({9.9, 9.9, 5, 5}));
  EXPECT_TRUE(box.contains({0, 0, 10, 10}));
  EXPECT_FALSE(box.contains({0, 0, 10.1, 10}));
}

TEST(Moved, MovesEveryKindOfMark) {
  const std::vector<Shape> shapes{LineMark{{{0, 0}, {5, 5}}, {}},
                                  ArcMark{{0, 0}, 20, 0.2, {}},
                                  SectorMark{{0, 0}, 10, 20, 0.2, {}},
                                  BarMark{{0, 0, 5, 5}, {}},
                                  DiscMark{{0, 0}, 4, 0, 0.5, {}, {}, {}, 0},
                                  WhiskerMark{0, 5, 0, 2, false, false, {}},
                                  TextMark{{{"a"}}, {}, {0, 0}, {0, -5, 4, 5}, std::nullopt}};
  for (const Shape& shape : shapes) {
    const Box before = extent(shape);
    const Box after = extent(moved({"", shape}, 3, -2).shape);
    EXPECT_NEAR(after.x, before.x + 3, 1e-12) << shape.index();
    EXPECT_NEAR(after.y, before.y - 2, 1e-12) << shape.index();
    EXPECT_NEAR(after.width, before.width, 1e-12) << shape.index();
  }
}

}  // namespace
}  // namespace hz::plots
