#include "label_rows.hpp"

#include <gmock/gmock.h>

namespace hz::plots {
namespace {

using ::testing::DoubleNear;
using ::testing::ElementsAre;

TEST(Spread, LeavesLabelsThatHaveRoom) { EXPECT_THAT(*spread({{20, 10}, {60, 10}}, {0, 100, 2}), ElementsAre(20, 60)); }

// Two labels of 10 with a gap of 2 that both want 50 stand 12 apart about it.
TEST(Spread, PartsLabelsEvenly) {
  EXPECT_THAT(*spread({{50, 10}, {50, 10}}, {0, 100, 2}), ElementsAre(DoubleNear(44, 1e-9), DoubleNear(56, 1e-9)));
}

TEST(Spread, StaysInsideItsSpace) {
  EXPECT_THAT(*spread({{1, 10}, {2, 10}}, {0, 100, 2}), ElementsAre(5, 17));
  EXPECT_THAT(*spread({{99, 10}, {100, 10}}, {0, 100, 2}), ElementsAre(83, 95));
}

TEST(Spread, RefusesARowThatIsTooShort) {
  EXPECT_FALSE(spread({{5, 10}, {5, 10}}, {0, 21, 2}));
  EXPECT_TRUE(spread({{5, 10}, {5, 10}}, {0, 22, 2}));
}

TEST(Spread, DoesNotMoveWhatIsFixed) {
  const auto middles = *spread({{48, 10}, {50, 2, true}, {51, 10}}, {0, 100, 2});
  EXPECT_NEAR(middles[1], 50, 1e-3);
  EXPECT_NEAR(middles[0], 42, 1e-3);  // 50 - 1 - 2 - 5
  EXPECT_NEAR(middles[2], 58, 1e-3);
}

TEST(LabelRows, TakeOneRowWhenShiftsAreSmall) {
  const auto paths = *label_rows({{20, 10}, {31, 10}}, {0, 100, 2}, 5);
  EXPECT_EQ(paths[0].row(), 0U);
  EXPECT_EQ(paths[1].row(), 0U);
}

/// No label meets a label or a passing leader of its row, and the order of all is kept.
void expect_sound(const std::vector<Label>& labels, const std::vector<LabelPath>& paths, const LabelSpace& space) {
  for (std::size_t row = 0; row < labels.size(); ++row) {
    double end = space.low - space.gap;
    for (std::size_t i = 0; i < labels.size(); ++i) {
      if (paths[i].row() < row) continue;
      const double half = paths[i].row() == row ? labels[i].width / 2 : 0.5;
      EXPECT_GE(paths[i].path[row] - half, end + space.gap - 1e-9) << "row " << row << ", label " << i;
      end = paths[i].path[row] + half;
    }
    EXPECT_LE(end, space.high + 1e-9);
  }
}

TEST(LabelRows, TakeMoreRowsWhereLabelsCrowd) {
  const std::vector<Label> labels(8, Label{50, 22});
  const LabelSpace space{0, 150, 2};
  const auto paths = *label_rows(labels, space, 12);
  EXPECT_GT(paths[1].row(), 0U);
  expect_sound(labels, paths, space);
}

TEST(LabelRows, KeepClearOfObstacles) {
  const std::vector<Label> labels{{30, 20}, {55, 20}, {58, 20}};
  const auto paths = *label_rows(labels, {0, 200, 2}, 100, {{52, 54, 0}});
  for (const LabelPath& path : paths) {
    const double half = path.row() == 0 ? 10 : 0.5;
    EXPECT_TRUE(path.path[0] + half < 52 || path.path[0] - half > 54) << path.path[0];
  }
}

TEST(LabelRows, IgnoreObstaclesBeforeTheirRow) {
  const auto paths = *label_rows({{53, 20}}, {0, 200, 2}, 100, {{52, 54, 1}});
  EXPECT_DOUBLE_EQ(paths[0].path[0], 53);
}

TEST(LabelRows, SayWhenThereIsNoRoom) { EXPECT_FALSE(label_rows({{50, 120}}, {0, 100, 2}, 10)); }

}  // namespace
}  // namespace hz::plots
