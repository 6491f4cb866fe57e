// How a zone is shaded and edged, along one axis of distance.
#pragma once
#include <vector>

#include "hz/plots/system.hpp"
#include "log_scale.hpp"

namespace hz::plots {

/// The colours of the zone along x: white outside, two shades inside, each edge fading over the 68 % width of its
/// limit. Rises in x, white at both ends; empty when no pair of limits bounds a zone.
[[nodiscard]] std::vector<ColorStop> zone_shade(const std::vector<FigureLimit>& limits, const LogScale& axis);

[[nodiscard]] bool is_inner(LimitRole role);
[[nodiscard]] bool is_conservative(LimitRole role);

/// Solid for a conservative limit, dashed for an optimistic one.
[[nodiscard]] Stroke limit_stroke(LimitRole role);

/// A limit held at the end of its fitted range carries teeth on the side of the zone: so long, and so far apart, pt.
inline constexpr double tooth_length = 2.6;
inline constexpr double tooth_pitch = 4;
[[nodiscard]] Stroke tooth_stroke();

/// A limit that lies on the axis; the others are left out of a figure.
[[nodiscard]] bool on_axis(const LogScale& axis, double distance);

}  // namespace hz::plots
