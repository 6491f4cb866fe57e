// The names of the limits above a wedge.
#pragma once
#include <vector>

#include "canvas.hpp"
#include "hz/plots/system.hpp"
#include "label_rows.hpp"
#include "planet_row.hpp"
#include "wedge_frame.hpp"

namespace hz::plots {

/// Names of the limits above the wedge, with leaders to the upper ends of their arcs; no leader meets another.
class LimitTitles {
public:
  /// Throws hz::Error (usage) when the page is too narrow for the names.
  LimitTitles(const Canvas& canvas, const FigureStar& star, const WedgeFrame& frame);

  /// From the top of the highest name to the place where the leaders turn down.
  [[nodiscard]] double height() const;

  /// `top` of the names and the star's `star_y` on the page; leaders first.
  [[nodiscard]] std::vector<Mark> marks(double top, double star_y) const;

  /// The leaders where they come down to the wedge.
  [[nodiscard]] std::vector<Curtain> curtains() const;

private:
  [[nodiscard]] TextStyle style() const;
  [[nodiscard]] double line_height() const { return line_pitch * canvas_.size(); }
  [[nodiscard]] double row_height() const;
  [[nodiscard]] double row_bottom(std::size_t row, double top) const;
  [[nodiscard]] Point arc_end(std::size_t i) const;  // from the star's line
  void choose_lines();
  bool arrange(double width, std::size_t most_lines, double most_shift);
  [[nodiscard]] Mark leader(std::size_t i, double top, double star_y) const;
  void add_lines(std::vector<Mark>& all, std::size_t i, double top) const;

  const Canvas& canvas_;
  const WedgeFrame& frame_;
  std::vector<const FigureLimit*> limits_;  // by rising distance
  std::vector<std::vector<Text>> lines_;    // of each name
  std::vector<LabelPath> paths_;            // row 0 is the lowest
  std::vector<double> elbows_;              // x where each leader turns down
  double drop_ = 0;                         // height of the slanted part of the leaders
  std::size_t rows_ = 1;
  std::size_t most_lines_ = 1;
};

}  // namespace hz::plots
