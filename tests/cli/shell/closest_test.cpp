#include "closest.hpp"

#include <gtest/gtest.h>

#include <array>

namespace hz::app {
namespace {

const std::array<std::string, 3> names{"bounds", "rank", "limits"};

TEST(EditDistance, CountsEdits) {
  EXPECT_EQ(edit_distance("", ""), 0U);
  EXPECT_EQ(edit_distance("rank", ""), 4U);
  EXPECT_EQ(edit_distance("kitten", "sitting"), 3U);  // the textbook example
}

TEST(EditDistance, SwappedNeighboursAreOneEdit) { EXPECT_EQ(edit_distance("rnak", "rank"), 1U); }

TEST(Closest, OffersWhatWasMeant) {
  EXPECT_EQ(closest("bond", names), "bounds");
  EXPECT_EQ(closest("RANK", names), "rank");
}

TEST(Closest, ABeginningIsEnough) { EXPECT_EQ(closest("lim", names), "limits"); }

TEST(Closest, OffersNothingFarAway) {
  EXPECT_EQ(closest("photosynthesis", names), std::nullopt);
  EXPECT_EQ(closest("", names), std::nullopt);
}

TEST(DidYouMean, IsATailOrNothing) {
  EXPECT_EQ(did_you_mean("limit", names), "; did you mean limits?");
  EXPECT_EQ(did_you_mean("zzz", names), "");
}

}  // namespace
}  // namespace hz::app
