#include "progress.hpp"

#include <gtest/gtest.h>

namespace hz::app {
namespace {

TEST(ProgressLine, ABarWhereTheEndIsKnown) {
  EXPECT_EQ(progress_line("answering", 3000, 5000), "answering  [==============          ]  60 %  3,000 of 5,000 rows");
  EXPECT_EQ(progress_line("answering", 0, 5000), "answering  [                        ]   0 %  0 of 5,000 rows");
}

TEST(ProgressLine, NeverPastItsEnd) {
  EXPECT_EQ(progress_line("answering", 6, 5), "answering  [========================] 100 %  6 of 5 rows");
}

TEST(ProgressLine, NotDoneIsNotAHundred) {
  EXPECT_EQ(progress_line("answering", 4999, 5000), "answering  [======================= ]  99 %  4,999 of 5,000 rows");
}

TEST(ProgressLine, ACountWhereItIsNot) {
  EXPECT_EQ(progress_line("answering", 3000, std::nullopt), "answering  3,000 rows");
  EXPECT_EQ(progress_line("answering", 3, 0), "answering  3 rows");
}

}  // namespace
}  // namespace hz::app
