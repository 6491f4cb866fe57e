#include "label_rows.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace hz::plots {
namespace {

/// The room a leader takes between labels.
constexpr double leader_width = 1.0;

/// Neighbours that have met and move as one (pool adjacent violators: Barlow et al. 1972, Statistical Inference under
/// Order Restrictions).
struct Block {
  double sum = 0;
  double weight = 0;
  std::size_t count = 1;
  [[nodiscard]] double mean() const { return sum / weight; }
};

/// As good as immovable.
constexpr double fixed_weight = 1e6;
constexpr double immovable = 0.1;

/// The nearest rising sequence, in weighted least squares.
std::vector<double> isotonic(const std::vector<double>& wanted, const std::vector<Label>& labels) {
  std::vector<Block> blocks;
  for (std::size_t i = 0; i < wanted.size(); ++i) {
    const double weight = labels[i].fixed ? fixed_weight : 1;
    blocks.push_back({weight * wanted[i], weight});
    while (blocks.size() > 1 && blocks[blocks.size() - 2].mean() > blocks.back().mean()) {
      const Block last = blocks.back();
      blocks.pop_back();
      Block& merged = blocks.back();
      merged = {merged.sum + last.sum, merged.weight + last.weight, merged.count + last.count};
    }
  }
  std::vector<double> rising;
  for (const Block& block : blocks) rising.insert(rising.end(), block.count, block.mean());
  return rising;
}

double middle(const Obstacle& obstacle) { return (obstacle.low + obstacle.high) / 2; }

/// Obstacles inside the space, with those made one that leave no room for a label between them.
std::vector<Obstacle> merged(const std::vector<Obstacle>& obstacles, const LabelSpace& space) {
  constexpr double narrowest_label = 5;
  std::vector<Obstacle> apart;
  for (const Obstacle& one : obstacles) {
    if (one.low < space.low || one.high > space.high) continue;
    if (!apart.empty() && one.low - apart.back().high < 2 * space.gap + narrowest_label) {
      apart.back().high = std::max(apart.back().high, one.high);
      apart.back().from_row = std::min(apart.back().from_row, one.from_row);
    } else {
      apart.push_back(one);
    }
  }
  return apart;
}

/// What stands in one row, from left to right: its labels, leaders that pass, obstacles.
struct Row {
  std::vector<Label> items;
  std::vector<std::size_t> which;  // of the labels; obstacles are no_label
  static constexpr std::size_t no_label = static_cast<std::size_t>(-1);
};

Row row_of(const std::vector<Label>& labels, const std::vector<LabelPath>& paths,
           const std::vector<Obstacle>& obstacles, std::size_t row, std::size_t rows) {
  Row here;
  auto obstacle = obstacles.begin();
  const auto add_obstacles = [&](double up_to) {
    for (; obstacle != obstacles.end() && middle(*obstacle) <= up_to; ++obstacle) {
      if (obstacle->from_row > row) continue;
      here.items.push_back({middle(*obstacle), obstacle->high - obstacle->low, true});
      here.which.push_back(Row::no_label);
    }
  };
  for (std::size_t i = 0; i < labels.size(); ++i) {
    add_obstacles(labels[i].at);
    if (i % rows < row) continue;
    const double at = paths[i].path.empty() ? labels[i].at : paths[i].path.back();
    here.items.push_back({at, i % rows == row ? labels[i].width : leader_width});
    here.which.push_back(i);
  }
  add_obstacles(std::numeric_limits<double>::infinity());
  return here;
}

/// The labels in `rows` rows, taken in turn; nullopt when a row is too short.
std::optional<std::vector<LabelPath>> in_rows(const std::vector<Label>& labels, const LabelSpace& space,
                                              const std::vector<Obstacle>& obstacles, std::size_t rows) {
  std::vector<LabelPath> paths(labels.size());
  for (std::size_t row = 0; row < rows; ++row) {
    const Row here = row_of(labels, paths, obstacles, row, rows);
    const auto middles = spread(here.items, space);
    if (!middles) return std::nullopt;
    for (std::size_t k = 0; k < here.which.size(); ++k)
      if (here.which[k] != Row::no_label) paths[here.which[k]].path.push_back((*middles)[k]);
  }
  return paths;
}

double largest_shift(const std::vector<Label>& labels, const std::vector<LabelPath>& paths) {
  double largest = 0;
  for (std::size_t i = 0; i < labels.size(); ++i)
    for (const double x : paths[i].path) largest = std::max(largest, std::abs(x - labels[i].at));
  return largest;
}

}  // namespace

std::optional<std::vector<double>> spread(const std::vector<Label>& labels, const LabelSpace& space) {
  if (labels.empty()) return std::vector<double>{};
  // With the widths taken out, "does not overlap" becomes "rises".
  std::vector<double> taken{0};
  for (std::size_t i = 1; i < labels.size(); ++i)
    taken.push_back(taken.back() + (labels[i - 1].width + labels[i].width) / 2 + space.gap);
  const double low = space.low + labels.front().width / 2;
  const double high = space.high - labels.back().width / 2 - taken.back();
  if (low > high) return std::nullopt;

  std::vector<double> wanted;
  for (std::size_t i = 0; i < labels.size(); ++i) wanted.push_back(labels[i].at - taken[i]);
  std::vector<double> middles = isotonic(wanted, labels);
  for (std::size_t i = 0; i < labels.size(); ++i) {
    middles[i] = std::clamp(middles[i], low, high) + taken[i];
    if (labels[i].fixed && std::abs(middles[i] - labels[i].at) > immovable) return std::nullopt;
  }
  return middles;
}

std::optional<std::vector<LabelPath>> label_rows(const std::vector<Label>& labels, const LabelSpace& space,
                                                 double most_shift, const std::vector<Obstacle>& obstacles) {
  if (labels.empty()) return std::vector<LabelPath>{};
  const std::vector<Obstacle> in_the_way = merged(obstacles, space);
  std::optional<std::vector<LabelPath>> best;
  double smallest = std::numeric_limits<double>::infinity();
  for (std::size_t rows = 1; rows <= labels.size() && smallest > most_shift; ++rows) {
    const auto paths = in_rows(labels, space, in_the_way, rows);
    if (!paths || largest_shift(labels, *paths) >= smallest) continue;
    smallest = largest_shift(labels, *paths);
    best = paths;
  }
  return best;
}

}  // namespace hz::plots
