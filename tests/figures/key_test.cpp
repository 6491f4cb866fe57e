#include "key.hpp"

#include <gmock/gmock.h>

#include "layout_check.hpp"
#include "systems.hpp"

namespace hz::plots {
namespace {

class KeyLines : public ::testing::Test {
protected:
  TextMeasure measure;

  Scene drawn(double width_mm, int groups) {
    Canvas canvas(measure, width_mm * 72 / 25.4);
    Key key(canvas);
    for (int i = 0; i < groups; ++i) {
      key.start_group();
      key.add_words({{"heading"}});
      key.add_sample({DiscMark{{0, 0}, 4, 0, 0.5, {}, {}, {}, 0}}, {{"sample"}});
    }
    const double end = key.draw(10);
    return std::move(canvas).finished(end);
  }
};

TEST_F(KeyLines, WrapToThePage) {
  const Scene narrow = drawn(60, 6);
  const Scene wide = drawn(400, 6);
  EXPECT_GT(narrow.height, wide.height);
  EXPECT_THAT(testing::layout_faults(narrow), ::testing::IsEmpty());
}

TEST_F(KeyLines, KeepGroupsTogether) {
  const auto texts = testing::shapes<TextMark>(drawn(60, 6), "key");
  for (std::size_t i = 0; i + 1 < texts.size(); i += 2)
    EXPECT_DOUBLE_EQ(texts[i].baseline.y, texts[i + 1].baseline.y) << i;
}

TEST_F(KeyLines, BreakNotesAtBlanks) {
  Canvas canvas(measure, 60 * 72 / 25.4);
  Key key(canvas);
  key.add_note("limits: a set with a title that is far too long for one line of a narrow page");
  const double end = key.draw(0);
  const Scene scene = std::move(canvas).finished(end);
  EXPECT_THAT(testing::layout_faults(scene), ::testing::IsEmpty());
  EXPECT_THAT(testing::words(scene), ::testing::HasSubstr("far too long for one line"));
}

}  // namespace
}  // namespace hz::plots
