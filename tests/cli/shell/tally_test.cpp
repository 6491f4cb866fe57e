#include "tally.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace hz::app {
namespace {

using testing::ElementsAre;

Answer set_aside(const std::string& kind) {
  Answer answer;
  answer.status = Status::set_aside;
  answer.reason_kind = kind;
  return answer;
}

TEST(Tally, CountsEveryRowOnce) {
  Tally tally;
  Answer held;
  held.flags = {"held", "evolved"};
  tally.count(held);
  tally.count({});
  tally.count(set_aside("no Teff"));
  tally.count(set_aside("no luminosity"));
  tally.count(set_aside("no luminosity"));
  EXPECT_THAT(tally.lines(), ElementsAre("read 5 rows: 2 answered, 3 set aside", "set aside: no luminosity 2, no Teff 1",
                                         "flags: evolved 1, held 1"));
}

TEST(Tally, SaysNothingOfWhatDidNotHappen) {
  Tally tally;
  tally.count({});
  EXPECT_THAT(tally.lines(), ElementsAre("read 1 row: 1 answered, 0 set aside"));
}

}  // namespace
}  // namespace hz::app
