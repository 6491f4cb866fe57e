// How a planet looks: a disc by its radius, filled to the height of its probability, and its whisker.
#pragma once
#include <vector>

#include "canvas.hpp"
#include "hz/plots/system.hpp"
#include "log_scale.hpp"

namespace hz::plots {

[[nodiscard]] std::optional<double> filling(const FigurePlanet& planet, FilledZone zone);
/// A radius that was measured; a limit is none.
[[nodiscard]] std::optional<double> measured_radius(const FigurePlanet& planet);

/// Radius of the disc, pt, for one Earth radius drawn as `unit`: it grows as the radius to the power 0.4,
/// so that giants leave room, between the smallest disc that can show a height and that of 16 Earth radii. Without a
/// radius 1.1 units.
[[nodiscard]] double disc_radius(std::optional<double> radius, double unit);

/// The disc: a dashed ring apart from it without a radius, grey inside without a probability.
[[nodiscard]] DiscMark disc(Point center, double size, std::optional<double> p, bool known_radius);

/// The 68 % of the semi-major axis along the axis, cut where the axis ends; nullopt without half-widths.
[[nodiscard]] std::optional<WhiskerMark> whisker(const Measured& semi_major_axis, const LogScale& axis, double y);

/// Half the height of a whisker's caps, pt.
inline constexpr double whisker_cap = 1.8;

/// What is written beside the disc.
[[nodiscard]] Text label_text(const Canvas& canvas, const FigurePlanet& planet, const TextStyle& style, double width);

/// By rising distance.
[[nodiscard]] std::vector<const FigurePlanet*> by_distance(const FigureStar& star);

}  // namespace hz::plots
