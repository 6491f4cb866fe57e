#include "missing_values.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "hz/error.hpp"

namespace hz::app {
namespace {

using ::testing::ElementsAre;
using Missing = ColumnMap::MissingNumber;

std::vector<Missing> read(const std::vector<std::string>& texts) { return read_missing_values(texts); }

std::string refusal(const std::string& text) {
  try {
    (void)read({text});
  } catch (const Error& error) {
    EXPECT_EQ(error.fault(), Fault::usage);
    return error.what();
  }
  return {};
}

TEST(MissingValues, OneNumberSeveralAndAgain) {
  EXPECT_THAT(read({"parallax=0"}), ElementsAre(Missing{Quantity::parallax, 0}));
  EXPECT_THAT(
      read({"parallax=0,-1", "teff=-99.5"}),
      ElementsAre(Missing{Quantity::parallax, 0}, Missing{Quantity::parallax, -1}, Missing{Quantity::teff, -99.5}));
  EXPECT_THAT(read({}), ElementsAre());
}

TEST(MissingValues, UnknownQuantityOffersTheNearest) {
  EXPECT_EQ(refusal("paralax=0"), "--missing-value: there is no quantity `paralax`; did you mean parallax?");
  EXPECT_EQ(refusal("=0"), "--missing-value: there is no quantity ``");
}

TEST(MissingValues, TextHasNoNumbers) {
  EXPECT_EQ(refusal("star=0"),
            "--missing-value: star is text; its spellings of \"no value\" stand in a column map: missing = [\"…\"]");
}

TEST(MissingValues, NeedsNumbers) {
  for (const auto* const text :
       {"parallax", "parallax=", "parallax=none", "parallax=0,", "parallax=0;1", "parallax=nan"}) {
    EXPECT_EQ(refusal(text),
              std::string("--missing-value ") + text + " needs numbers; write it like parallax=0 or parallax=0,-1");
  }
}

}  // namespace
}  // namespace hz::app
