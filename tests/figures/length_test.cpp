#include "hz/plots/length.hpp"

#include <gmock/gmock.h>

#include "hz/error.hpp"

namespace hz::plots {
namespace {

// 1 in = 25.4 mm = 72 pt.
TEST(Length, IsReadInEveryUnit) {
  EXPECT_DOUBLE_EQ(parse_length("3.5in"), 252);
  EXPECT_NEAR(parse_length("88mm"), 249.4488, 1e-4);
  EXPECT_NEAR(parse_length("8.8 cm"), 249.4488, 1e-4);
  EXPECT_DOUBLE_EQ(parse_length("250pt"), 250);
  EXPECT_DOUBLE_EQ(parse_length("1e2mm"), parse_length("100mm"));
}

TEST(Length, RefusesEverythingElseAndQuotesIt) {
  for (const char* text : {"", "88", "mm", "88 m", "88mm ", "88,5mm", "-88mm", "0mm", "nanmm", "infpt", "1e400mm",
                           "1e308in", "88mmm", "+88mm", "0x10mm"}) {
    try {
      (void)parse_length(text);
      ADD_FAILURE() << text << " was taken";
    } catch (const Error& error) {
      EXPECT_EQ(error.fault(), Fault::usage);
      EXPECT_THAT(error.what(), ::testing::HasSubstr("'" + std::string(text) + "'"));
    }
  }
}

}  // namespace
}  // namespace hz::plots
