#include "text_layout.hpp"

#include <gtest/gtest.h>

namespace hz::app {
namespace {

TEST(TextWidth, CountsWhatIsSeen) {
  EXPECT_EQ(text_width("Teff"), 4U);
  EXPECT_EQ(text_width("0.41 ± 0.01"), 11U);
  EXPECT_EQ(text_width("e\u0301"), 1U);   // combining acute accent
  EXPECT_EQ(text_width("\u6C34"), 2U);    // a wide letter
  EXPECT_EQ(text_width("\xFF\xC3"), 2U);  // two broken bytes, one mark each
}

TEST(Printable, ReplacesWhatCouldSteerATerminal) {
  EXPECT_EQ(printable("a\x1b[31mb\n"), "a\uFFFD[31mb\uFFFD");
  EXPECT_EQ(printable("\xC0\xAF"), "\uFFFD\uFFFD");      // an over-long slash
  EXPECT_EQ(printable("\xED\xA0\x80"), "\uFFFD\uFFFD\uFFFD");  // half of a surrogate pair
  EXPECT_EQ(printable("a\u202Eb"), "a\uFFFDb");          // turns the direction of writing
  EXPECT_EQ(printable("Kepler-22 b ±"), "Kepler-22 b ±");
}

TEST(Wrapped, BreaksAtBlanks) { EXPECT_EQ(wrapped("one two three", 7), "one two\nthree"); }
TEST(Wrapped, IndentsAllLinesButTheFirst) { EXPECT_EQ(wrapped("one two three", 9, 2), "one two\n  three"); }
TEST(Wrapped, LongWordStandsAlone) { EXPECT_EQ(wrapped("a verylongword b", 5), "a\nverylongword\nb"); }
TEST(Wrapped, EmptyStaysEmpty) { EXPECT_EQ(wrapped("", 5), ""); }
TEST(Wrapped, SeveralBlanksAreOne) { EXPECT_EQ(wrapped("a   b ", 9), "a b"); }

}  // namespace
}  // namespace hz::app
