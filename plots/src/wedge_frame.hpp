// The geometry of a wedge: rings about the star whose radii follow the axis of distance.
#pragma once
#include <vector>

#include "hz/plots/scene.hpp"
#include "log_scale.hpp"

namespace hz::plots {

/// y = 0 is the line from the star outward; the scene is moved into place when its height is known.
struct WedgeFrame {
  double star_x = 0;
  LogScale axis;
  double half_angle = 0;
  std::vector<ColorStop> shade;  // along x

  /// Of the ring at this distance (au).
  [[nodiscard]] double ring(double distance) const { return axis.x(distance) - star_x; }
  /// The zone in its shades; there must be one.
  [[nodiscard]] SectorMark zone() const;
  /// A place on the ring that meets the axis at x, `y` below the axis.
  [[nodiscard]] Point on_ring(double x, double y) const;
};

}  // namespace hz::plots
