// The key that both kinds of figure share.
#pragma once
#include <string>
#include <vector>

#include "canvas.hpp"
#include "hz/plots/system.hpp"

namespace hz::plots {

enum class FigureKind { wedge, lanes };

/// The dotted line of periastron and apastron.
[[nodiscard]] Stroke span_stroke();

/// What the key must know beside the systems and the options.
struct KeyPlan {
  FigureKind kind = FigureKind::wedge;
  double unit = 4;   // as for disc_radius
  std::string note;  // a last sentence; may be empty
};

/// Draws what occurs in these systems, and names the limit set, below `top`; returns the lower end.
double draw_key(Canvas& canvas, const std::vector<FigureStar>& stars, const FigureOptions& options, const KeyPlan& plan,
                double top);

}  // namespace hz::plots
