#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "list_files.hpp"

namespace hz {
namespace {

TableHead head_of(const std::vector<std::string>& names) {
  TableHead head;
  for (const auto& name : names) head.columns.push_back({name, {}, {}, {}});
  return head;
}

Chunk chunk_of(std::vector<Cells> columns, std::size_t rows) {
  Chunk chunk;
  chunk.columns = std::move(columns);
  chunk.row_problems.resize(rows);
  return chunk;
}

std::string written(const std::vector<std::string>& names, std::vector<Cells> columns, std::size_t rows) {
  const testing::Folder folder;
  const auto path = folder.file("out.csv");
  const auto writer = create_table(path, head_of(names));
  writer->write(chunk_of(std::move(columns), rows));
  writer->finish();
  return testing::bytes_of(path);
}

TEST(CsvWriter, MinimalQuotesAndLineFeeds) {
  std::vector<std::string_view> text{"plain", "a,b", "say \"hi\"", "two\nlines", "#mark", " blank", "blank ", "", "ü"};
  EXPECT_EQ(written({"text", "unit [K]"}, {text, text}, text.size()).substr(0, 14), "text,unit [K]\n");
  EXPECT_EQ(written({"t"}, {text}, text.size()),
            "t\nplain\n\"a,b\"\n\"say \"\"hi\"\"\"\n\"two\nlines\"\n\"#mark\"\n\" blank\"\n\"blank \"\n\"\"\nü\n");
}

TEST(CsvWriter, ShortestNumbersThatReadBack) {
  std::vector<double> numbers{0.1, 1.0 / 3, 5772, 1e22, 1e-7, -0.0, 6.02214076e23};
  EXPECT_EQ(written({"x"}, {numbers}, numbers.size()),
            "x\n0.1\n0.3333333333333333\n5772\n1e+22\n1e-07\n-0\n6.02214076e+23\n");
}

TEST(CsvWriter, NoValueAndNoInfinityAreEmpty) {
  constexpr auto infinity = std::numeric_limits<double>::infinity();
  std::vector<double> numbers{std::nan(""), infinity, -infinity, 1};
  std::vector<std::optional<std::int64_t>> whole{std::nullopt, 9007199254740993, -1, 0};
  EXPECT_EQ(written({"x", "id"}, {numbers, whole}, 4), "x,id\n,\n,9007199254740993\n,-1\n1,0\n");
}

TEST(CsvWriter, WhatItWritesReadsBack) {
  const testing::Folder folder;
  const auto path = folder.file("out.csv");
  std::vector<std::string_view> text{"a;b", "\"", "\r\n", "", "  ", "#", "x\ty"};
  const auto writer = create_table(path, head_of({"first, name", "second"}));
  writer->write(chunk_of({text, text}, text.size()));
  writer->finish();
  const auto table = testing::read_whole(path);
  ASSERT_EQ(table.rows.size(), text.size());
  for (std::size_t i = 0; i < text.size(); ++i) EXPECT_THAT(table.rows[i], ::testing::Each(std::string(text[i])));
  EXPECT_THAT(table.problems, ::testing::Each(""));
}

TEST(CsvWriter, ChunkOfAnotherWidthIsABrokenPrecondition) {
  const testing::Folder folder;
  const auto writer = create_table(folder.file("out.csv"), head_of({"a", "b"}));
  EXPECT_THROW(writer->write(chunk_of({std::vector<double>{1}}, 1)), std::logic_error);
}

TEST(CsvWriter, NothingIsSeenBeforeItIsFinished) {
  const testing::Folder folder;
  {
    const auto writer = create_table(folder.file("out.csv"), head_of({"a"}));
    EXPECT_FALSE(std::filesystem::exists(folder.file("out.csv")));
  }
  EXPECT_EQ(folder.entries(), 0U);
}

}  // namespace
}  // namespace hz
