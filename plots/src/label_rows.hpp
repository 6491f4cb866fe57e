// Labels along a line that must not overlap.
#pragma once
#include <cstddef>
#include <optional>
#include <vector>

namespace hz::plots {

/// A label that wants its middle at `at`; a fixed one is in the way of the others.
struct Label {
  double at = 0;
  double width = 0;
  bool fixed = false;
};

/// Where labels may stand, and how.
struct LabelSpace {
  double low = 0;   // left end
  double high = 0;  // right end
  double gap = 2;   // between neighbours
};

/// The middles of the labels in one row, in the given order, with the least sum of squared shifts; nullopt when the row
/// is too short for them, or a fixed one would have to move. `labels` rise in `at`.
[[nodiscard]] std::optional<std::vector<double>> spread(const std::vector<Label>& labels, const LabelSpace& space);

/// The way of one label's leader: its x in every row it passes, and last the middle of the label, which stands in the
/// row path.size() - 1 (0 is next to the mark).
struct LabelPath {
  std::vector<double> path;
  [[nodiscard]] std::size_t row() const { return path.size() - 1; }
};

/// Something that stands in the rows from `from_row` on.
struct Obstacle {
  double low = 0;
  double high = 0;
  std::size_t from_row = 0;
};

/// Labels in as few rows as keep every shift within `most_shift`, else in those with the smallest largest shift;
/// leaders pass between the labels of nearer rows and never cross. Obstacles (by rising `low`) are kept clear of; those
/// outside the space do not count. nullopt when no number of rows has room.
[[nodiscard]] std::optional<std::vector<LabelPath>> label_rows(const std::vector<Label>& labels,
                                                               const LabelSpace& space, double most_shift,
                                                               const std::vector<Obstacle>& obstacles = {});

}  // namespace hz::plots
