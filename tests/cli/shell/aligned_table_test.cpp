#include "aligned_table.hpp"

#include <gtest/gtest.h>

namespace hz::app {
namespace {

const Console plain(false, ColorChoice::never);

TEST(AlignedTable, AlignsByWhatIsSeen) {
  AlignedTable table({{"name"}, {"P", Align::right}});
  table.add({"é", "0.5"});
  table.add({"ab", "> 0.99"});
  EXPECT_EQ(table.text(plain), "name       P\né        0.5\nab    > 0.99\n");
}

TEST(AlignedTable, LeavesOutAColumnWithoutContent) {
  AlignedTable table({{"a"}, {"nothing"}, {"b"}});
  table.add({"1", "", "2"});
  EXPECT_EQ(table.text(plain), "a  b\n1  2\n");
}

TEST(AlignedTable, ShowsAGapAsADash) {
  AlignedTable table({{"a"}, {"b"}});
  table.add({"1", ""});
  table.add({"2", "x"});
  EXPECT_EQ(table.text(plain), "a  b\n1  -\n2  x\n");
}

TEST(AlignedTable, IndentsEveryLine) {
  AlignedTable table({{"a"}});
  table.add({"1"});
  EXPECT_EQ(table.text(plain, 2), "  a\n  1\n");
}

TEST(AlignedTable, CellsCannotSteerTheTerminal) {
  AlignedTable table({{"a"}});
  table.add({"\x1b[2J"});
  EXPECT_EQ(table.text(plain), "a\n\uFFFD[2J\n");
}

TEST(AlignedTable, StylesWholeLinesWithoutMovingThem) {
  AlignedTable table({{"a"}});
  table.add({"1"}, Style::water);
  EXPECT_EQ(table.text(Console(false, ColorChoice::always)), "\x1b[1ma\x1b[0m\n\x1b[34m1\x1b[0m\n");
}

}  // namespace
}  // namespace hz::app
