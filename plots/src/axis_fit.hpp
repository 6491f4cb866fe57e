// A logarithmic axis of distance that has room for everything on it.
#pragma once
#include <vector>

#include "hz/plots/system.hpp"
#include "log_scale.hpp"

namespace hz::plots {

/// A distance that must lie on the axis, with so much room (pt) to its sides.
struct AxisNeed {
  double distance = 1;  // au, above 0
  double left = 0;
  double right = 0;
};

/// Limits, planets, spans and their half-widths; a far-reaching half-width counts to half and twice the value only.
[[nodiscard]] std::vector<AxisNeed> needs_of(const FigureStar& star, double unit);

/// The axis from x0 to x1 with the widest scale that leaves this room; half a power of ten at least.
[[nodiscard]] LogScale fitted_axis(std::vector<AxisNeed> needs, double x0, double x1);

/// Values a figure cannot do without are finite and above 0; HZ_REQUIRE.
void require_drawable(const FigureStar& star);

}  // namespace hz::plots
