// Rulers: a line with ticks.
#pragma once
#include <string>
#include <vector>

#include "canvas.hpp"
#include "hz/plots/system.hpp"
#include "log_scale.hpp"

namespace hz::plots {

struct Ruler {
  std::string name;  // for the tags: "distance"
  LogScale scale;
  double y = 0;            // of the line
  std::string low_x_word;  // at the ends, below the line; they tell the direction of a scale that runs against habit
  std::string high_x_word;
};

/// The height of ticks and their labels below the line.
[[nodiscard]] double ruler_depth(const Canvas& canvas);
void draw_ruler(Canvas& canvas, const Ruler& ruler);
/// Short strokes above the line where the limits lie.
void draw_limits_on_ruler(Canvas& canvas, const std::vector<FigureLimit>& limits, const LogScale& distance, double y);

}  // namespace hz::plots
