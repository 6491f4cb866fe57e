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
  std::size_t count = 0;
  [[nodiscard]] double mean() const { return sum / static_cast<double>(count); }
};

/// The nearest rising sequence, in least squares.
std::vector<double> isotonic(const std::vector<double>& wanted) {
  std::vector<Block> blocks;
  for (const double value : wanted) {
    blocks.push_back({value, 1});
    while (blocks.size() > 1 && blocks[blocks.size() - 2].mean() > blocks.back().mean()) {
      const Block last = blocks.back();
      blocks.pop_back();
      blocks.back() = {blocks.back().sum + last.sum, blocks.back().count + last.count};
    }
  }
  std::vector<double> rising;
  for (const Block& block : blocks) rising.insert(rising.end(), block.count, block.mean());
  return rising;
}

/// The labels in `rows` rows, taken in turn; nullopt when a row is too short.
std::optional<std::vector<LabelPath>> in_rows(const std::vector<Label>& labels, const LabelSpace& space,
                                              std::size_t rows) {
  std::vector<LabelPath> paths(labels.size());
  for (std::size_t row = 0; row < rows; ++row) {
    std::vector<Label> here;
    std::vector<std::size_t> which;
    for (std::size_t i = 0; i < labels.size(); ++i) {
      if (i % rows < row) continue;
      const double at = paths[i].path.empty() ? labels[i].at : paths[i].path.back();
      here.push_back({at, i % rows == row ? labels[i].width : leader_width});
      which.push_back(i);
    }
    const auto middles = spread(here, space);
    if (!middles) return std::nullopt;
    for (std::size_t k = 0; k < which.size(); ++k) paths[which[k]].path.push_back((*middles)[k]);
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
  std::vector<double> middles = isotonic(wanted);
  for (std::size_t i = 0; i < labels.size(); ++i) middles[i] = std::clamp(middles[i], low, high) + taken[i];
  return middles;
}

std::optional<std::vector<LabelPath>> label_rows(const std::vector<Label>& labels, const LabelSpace& space,
                                                 double most_shift) {
  if (labels.empty()) return std::vector<LabelPath>{};
  std::optional<std::vector<LabelPath>> best;
  double smallest = std::numeric_limits<double>::infinity();
  for (std::size_t rows = 1; rows <= labels.size() && smallest > most_shift; ++rows) {
    const auto paths = in_rows(labels, space, rows);
    if (!paths || largest_shift(labels, *paths) >= smallest) continue;
    smallest = largest_shift(labels, *paths);
    best = paths;
  }
  return best;
}

}  // namespace hz::plots
