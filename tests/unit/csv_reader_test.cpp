#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "list_files.hpp"

namespace hz {
namespace {

using ::testing::ElementsAre;
using ::testing::HasSubstr;
using Rows = std::vector<std::vector<std::string>>;

testing::WholeTable read(std::string_view bytes) {
  const testing::Folder folder;
  return testing::read_whole(folder.write("list.csv", bytes));
}

std::string refusal(std::string_view bytes) {
  return testing::error_of([&] { (void)read(bytes); });
}

std::vector<std::string> names(const TableHead& head) {
  std::vector<std::string> out;
  for (const auto& column : head.columns) out.push_back(column.name);
  return out;
}

TEST(CsvReader, PlainRows) {
  const auto table = read("a,b\n1,2\n3,4\n");
  EXPECT_THAT(names(table.head), ElementsAre("a", "b"));
  EXPECT_EQ(table.rows, (Rows{{"1", "2"}, {"3", "4"}}));
  EXPECT_THAT(table.lines, ElementsAre(2, 3));
}

TEST(CsvReader, ByteOrderMarkIsNoPartOfTheFirstName) {
  EXPECT_THAT(names(read("\xEF\xBB\xBF"
                         "a,b\n1,2\n")
                        .head),
              ElementsAre("a", "b"));
  EXPECT_THAT(names(read("\xEF\xBB\xBF# c\na,b\n1,2\n").head), ElementsAre("a", "b"));
}

TEST(CsvReader, LineEndsOfEverySystem) {
  const Rows expected{{"1", "2"}, {"3", "4"}};
  EXPECT_EQ(read("a,b\r\n1,2\r\n3,4\r\n").rows, expected);
  EXPECT_EQ(read("a,b\r1,2\r3,4\r").rows, expected);
  EXPECT_EQ(read("a,b\n1,2\n3,4").rows, expected);
  EXPECT_EQ(read("a,b\r\n1,2\r\n3,4").rows, expected);
}

TEST(CsvReader, CommentsAndBlankLinesAnywhere) {
  const auto table = read("# first: words\n#\n\na,b\n1,2\n# between\n\n  \n3,4\n#last");
  EXPECT_EQ(table.rows, (Rows{{"1", "2"}, {"3", "4"}}));
  EXPECT_THAT(table.lines, ElementsAre(5, 9));
  EXPECT_THAT(table.head.comments, ElementsAre("first: words", ""));
}

TEST(CsvReader, RowOfEmptyCellsIsARow) {
  EXPECT_EQ(read("a,b\n,\n").rows, (Rows{{"", ""}}));
  EXPECT_EQ(read("a\tb\n\t\n").rows, (Rows{{"", ""}}));
}

TEST(CsvReader, QuotedCells) {
  const auto table = read("a,b\n\"1,5\",\"say \"\"hi\"\"\"\n\"two\nlines\", \"spaced\" \n\"\",\"\"\"\"\nx,y\n");
  EXPECT_EQ(table.rows, (Rows{{"1,5", "say \"hi\""}, {"two\nlines", "spaced"}, {"", "\""}, {"x", "y"}}));
  EXPECT_THAT(table.lines, ElementsAre(2, 3, 5, 6));
  EXPECT_THAT(table.problems, ::testing::Each(""));
}

TEST(CsvReader, QuotesWithinACellStay) { EXPECT_EQ(read("a,b\n5\" disc,x\n").rows, (Rows{{"5\" disc", "x"}})); }

TEST(CsvReader, QuotedCrLfStays) { EXPECT_EQ(read("a,b\r\n\"1\r\n2\",3\r\n").rows, (Rows{{"1\r\n2", "3"}})); }

TEST(CsvReader, TextBehindAClosingQuoteSetsTheRowAside) {
  const auto table = read("a,b\n\"1\"x,2\n3,4\n");
  EXPECT_THAT(table.problems, ElementsAre("in line 2 text stands behind a closing quote", ""));
}

TEST(CsvReader, SeparatorIsToldFromTheHeader) {
  const Rows expected{{"1,5", "2"}};
  EXPECT_EQ(read("a;b\n1,5;2\n").rows, expected);
  EXPECT_EQ(read("a\tb\n1,5\t2\n").rows, expected);
  EXPECT_EQ(read("\"a,b,c,d\";e\n1,5;2\n").rows, expected);
  EXPECT_EQ(read("only\n7\n").rows, (Rows{{"7"}}));
}

TEST(CsvReader, HeaderNamesAreTrimmed) {
  EXPECT_THAT(names(read(" a , \"b, c\" \n1,2\n").head), ElementsAre("a", "b, c"));
}

TEST(CsvReader, HeaderMayEndInASeparator) {
  const auto table = read("a,b,\n1,2,\n3,4,5\n");
  EXPECT_THAT(names(table.head), ElementsAre("a", "b", ""));
  EXPECT_EQ(table.rows, (Rows{{"1", "2", ""}, {"3", "4", "5"}}));
}

TEST(CsvReader, RaggedRowsKeepTheirPlace) {
  const auto table = read("a,b\n1\n1,2,3\n4,5\n");
  EXPECT_THAT(table.problems, ElementsAre("line 2 holds 1 cells where the header names 2",
                                          "line 3 holds 3 cells where the header names 2", ""));
  EXPECT_EQ(table.rows.size(), 3U);
  EXPECT_THAT(table.rows[2], ElementsAre("4", "5"));
}

TEST(CsvReader, HeaderWithoutRowsGivesNone) {
  EXPECT_TRUE(read("a,b\n").rows.empty());
  EXPECT_TRUE(read("a,b").rows.empty());
  EXPECT_TRUE(read("a,b\n# nothing\n\n").rows.empty());
}

TEST(CsvReader, NothingInIt) {
  EXPECT_THAT(refusal(""), HasSubstr("list.csv: the file is empty"));
  EXPECT_THAT(refusal("# only\n\n# comments\n"), HasSubstr("no header line"));
}

TEST(CsvReader, UnclosedQuoteNamesWhereItOpened) {
  EXPECT_THAT(refusal("a,b\n1,2\n3,\"open\nmore\nand more"),
              HasSubstr("list.csv:3: a quote opens here and never closes"));
  EXPECT_THAT(refusal("a,\"b\n1,2\n"), HasSubstr("list.csv:1: a quote opens here"));
}

TEST(CsvReader, UnclosedQuoteInABigFileNamesWhereItOpened) {
  std::string bytes = "a,b\n1,\"open\n";
  while (bytes.size() < 6'000'000) bytes += "3,4\n";
  EXPECT_THAT(refusal(bytes),
              HasSubstr("list.csv:2: this row is longer than 4 MB; a quote opens here and does not close"));
}

TEST(CsvReader, NulByteNamesItsLine) {
  EXPECT_THAT(refusal(std::string("a,b\n1,2\n3,\0\n", 11)), HasSubstr("list.csv:3: holds a NUL byte"));
  EXPECT_THAT(refusal(std::string("a,b\n1,2\n3,\"\n\0\"\n", 15)), HasSubstr("list.csv:4: holds a NUL byte"));
  EXPECT_THAT(refusal(std::string("a,\0b\n1,2\n", 9)), HasSubstr("list.csv:1: holds a NUL byte"));
  EXPECT_THAT(refusal(std::string("a,b\n#\0\n1,2\n", 11)), HasSubstr("list.csv:2: holds a NUL byte"));
}

TEST(CsvReader, TenMegabytesOnOneLine) {
  std::string long_line;
  long_line.resize(10'000'000, 'x');
  EXPECT_THAT(refusal(long_line), HasSubstr("list.csv:1: this row is longer than 4 MB"));
  EXPECT_THAT(refusal("a,b\n1,2\n" + long_line + "\n3,4\n"), HasSubstr("list.csv:3: this row is longer than 4 MB"));
}

TEST(CsvReader, LongRowsWithinTheLimitAreRead) {
  const std::string cell(3'000'000, 'x');
  const auto table = read("a,b\n1," + cell + "\n2,y\n");
  ASSERT_EQ(table.rows.size(), 2U);
  EXPECT_EQ(table.rows[0][1], cell);
  EXPECT_EQ(table.rows[1][1], "y");
}

TEST(CsvReader, NamesOnlyOnce) {
  EXPECT_THAT(refusal("a,b,a\n1,2,3\n"), HasSubstr("list.csv:1: columns 1 and 3 are both named \"a\""));
}

TEST(CsvReader, ManyChunksGiveEveryRowInOrder) {
  std::string bytes = "# top\nname,text\n";
  constexpr std::size_t count = 60'000;
  for (std::size_t i = 0; i < count; ++i)
    bytes += std::to_string(i) + ",\"a \"\"long\"\" cell, number\n" + std::to_string(i) + "\"\r\n";
  const testing::Folder folder;
  const auto reader = open_table(folder.write("list.csv", bytes));
  std::size_t row_number = 0;
  std::size_t chunks = 0;
  while (const auto chunk = reader->next()) {
    ++chunks;
    EXPECT_EQ(chunk->first_row, row_number + 1);
    for (std::size_t row = 0; row < chunk->rows(); ++row, ++row_number) {
      ASSERT_EQ(chunk->text(0, row), std::to_string(row_number));
      ASSERT_EQ(chunk->text(1, row), "a \"long\" cell, number\n" + std::to_string(row_number));
      ASSERT_EQ(chunk->lines[row], 3 + 2 * row_number);
    }
  }
  EXPECT_EQ(row_number, count);
  EXPECT_GT(chunks, 1U);
}

TEST(CsvReader, MovingAChunkKeepsItsCells) {
  const testing::Folder folder;
  const auto reader = open_table(folder.write("list.csv", "a\nx\n"));
  auto chunk = reader->next();
  const Chunk moved = std::move(*chunk);
  chunk.reset();
  EXPECT_EQ(moved.text(0, 0), "x");
}

TEST(OpenTable, NoSuchFile) {
  EXPECT_THAT(testing::error_of([] { (void)open_table("/nowhere/list.csv"); }),
              HasSubstr("/nowhere/list.csv: cannot be read: No such file"));
}

TEST(OpenTable, Directory) {
  const testing::Folder folder;
  EXPECT_THAT(testing::error_of([&] { (void)open_table(folder.file("")); }), HasSubstr("is a directory"));
}

TEST(OpenTable, OtherFormatsAreNamed) {
  const std::vector<std::pair<std::string, std::string>> starts{{"\x1f\x8b\x08", "gzip"},
                                                                {"SIMPLE  =                    T", "FITS"},
                                                                {"<?xml version=\"1.0\"?>", "VOTable"},
                                                                {"<VOTABLE>", "VOTable"},
                                                                {"PK\x03\x04", "spreadsheet"},
                                                                {"\xff\xfe"
                                                                 "a",
                                                                 "UTF-16"}};
  for (const auto& [start, name] : starts) {
    const auto what = refusal(start);
    EXPECT_THAT(what, HasSubstr(name));
    EXPECT_THAT(what, HasSubstr("not a text table"));
  }
}

}  // namespace
}  // namespace hz
