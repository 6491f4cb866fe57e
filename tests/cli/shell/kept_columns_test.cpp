// --keep: which columns of the input travel along, under which names.
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "hz/error.hpp"
#include "list_options.hpp"

namespace hz::app {
namespace {

using testing::ElementsAre;
using testing::HasSubstr;

TableHead input() {
  TableHead head;
  head.source = "list.csv";
  for (const char* const name : {"star", "teff", "survey", "ra"}) head.columns.push_back({name, "", "", ""});
  return head;
}
const std::vector<std::string> written{"star", "teff"};

std::vector<std::string> names(const std::string& keep) {
  std::vector<std::string> result;
  for (const KeptColumn& column : kept_columns(keep, input(), written)) result.push_back(column.head.name);
  return result;
}

TEST(KeptColumns, NoneAndAll) {
  EXPECT_THAT(names("none"), ElementsAre());
  EXPECT_THAT(names("all"), ElementsAre("survey", "ra"));
}

TEST(KeptColumns, ByNameInTheOrderAsked) {
  EXPECT_THAT(names("ra,survey"), ElementsAre("ra", "survey"));
  EXPECT_EQ(kept_columns("ra", input(), written).front().column, 3U);
}

TEST(KeptColumns, ANameOfOursIsMarkedAsTheInputs) { EXPECT_THAT(names("teff"), ElementsAre("input_teff")); }

TEST(KeptColumns, UnknownColumnOffersTheClosest) {
  try {
    (void)names("survy");
    ADD_FAILURE();
  } catch (const Error& error) {
    EXPECT_EQ(error.fault(), Fault::usage);
    EXPECT_THAT(error.what(), HasSubstr("did you mean survey?"));
  }
}

}  // namespace
}  // namespace hz::app
