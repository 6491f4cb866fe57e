#include <gmock/gmock.h>

#include "palette.hpp"
#include "text_fit.hpp"

namespace hz::plots {
namespace {

class Words : public ::testing::Test {
protected:
  TextMeasure measure;
  TextStyle style{7, palette::ink};

  std::string printable(std::string_view typed) const { return plain(measure.printable(typed)); }
  double width(const Text& text) const { return measure.advance(text, style); }
};

// Noto Sans Regular: the digit 0 is 572 of 1000 units wide (table hmtx); ten of them at 7 pt are 40.04 pt.
TEST_F(Words, AreMeasuredWithoutHinting) {
  EXPECT_NEAR(width({{"0000000000"}}), 40.04, 0.05);
  style.size = 70;
  EXPECT_NEAR(width({{"0000000000"}}), 400.4, 0.5);
}

TEST_F(Words, HaveInkWhereTheyStand) {
  const TextMark mark = measure.placed({{"H"}}, style, {10, 20});
  EXPECT_NEAR(mark.box.bottom(), 20, 0.05);
  EXPECT_NEAR(mark.box.height, cap_height * style.size, 0.05);
}

TEST_F(Words, SetSubscriptsLowerAndSmaller) {
  const TextMark sub = measure.placed({{"R"}, {"\u2295", Script::sub}}, style, {0, 0});
  EXPECT_GT(sub.box.bottom(), 0.5);
  EXPECT_LT(width({{"R"}, {"\u2295", Script::sub}}), width({{"R\u2295"}}));
}

TEST_F(Words, KeepLettersTheFontsHave) { EXPECT_EQ(printable("Lantern 27 α Фонарь é"), "Lantern 27 α Фонарь é"); }

TEST_F(Words, ReplaceCharactersTheFontsLack) {
  EXPECT_EQ(printable("灯籠 7"), "◻◻ 7");
  EXPECT_EQ(printable("a\xFF"), "a\uFFFD");
}

TEST_F(Words, TakeTheSignOfTheSunInEitherForm) {
  EXPECT_EQ(printable("L☉"), "L⊙");
  EXPECT_EQ(measure.printable("L☉")[1].script, Script::sub);
}

TEST_F(Words, StandOnOneLine) { EXPECT_EQ(printable("a\nb\tc\x01"), "a b c "); }

TEST_F(Words, NeverFallBackOnAnEmptyBox) {
  EXPECT_GT(measure.placed({{std::string(replacement_sign)}}, style, {0, 0}).box.width, 1);
}

TEST_F(Words, AreShortenedInTheMiddle) {
  const Text name{{"Lantern 0123456789 component"}};
  const Text shorter = shortened(measure, name, style, 50);
  EXPECT_LE(width(shorter), 50);
  EXPECT_GT(width(shorter), 40);
  EXPECT_THAT(plain(shorter), ::testing::StartsWith("Lant"));
  EXPECT_THAT(plain(shorter), ::testing::EndsWith("ent"));
  EXPECT_EQ(plain(shortened(measure, name, style, 500)), plain(name));
}

TEST_F(Words, KeepLettersAndTheirMarksTogether) {
  const Text name{{"e\u0301e\u0301e\u0301e\u0301e\u0301e\u0301"}};
  const std::string shorter = plain(shortened(measure, name, style, 18));
  const std::string head = shorter.substr(0, shorter.find("…"));
  EXPECT_EQ(head.size() % 3, 0U);
  EXPECT_GT(head.size(), 0U);
}

TEST_F(Words, ShortenEvenEndlessNamesSoon) {
  EXPECT_LE(width(shortened(measure, {{std::string(100000, 'x')}}, style, 50)), 50);
  EXPECT_EQ(plain(shortened(measure, {{"long"}}, style, 1)), "…");
}

TEST_F(Words, AreWrappedAtBlanks) {
  const auto lines = wrapped(measure, {{"runaway greenhouse"}}, style, 45, 2);
  ASSERT_EQ(lines.size(), 2U);
  EXPECT_EQ(plain(lines[0]), "runaway");
  EXPECT_EQ(plain(lines[1]), "greenhouse");
}

TEST_F(Words, AreShortenedWhenTheLinesRunOut) {
  const auto lines = wrapped(measure, {{"one two three four five six seven eight"}}, style, 40, 2);
  ASSERT_EQ(lines.size(), 2U);
  for (const Text& line : lines) EXPECT_LE(width(line), 40);
  EXPECT_THAT(plain(lines[1]), ::testing::HasSubstr("…"));
}

}  // namespace
}  // namespace hz::plots
