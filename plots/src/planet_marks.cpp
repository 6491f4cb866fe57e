#include "planet_marks.hpp"

#include <algorithm>
#include <cmath>

#include "hz/constants.hpp"
#include "palette.hpp"
#include "text_fit.hpp"

namespace hz::plots {
namespace {

constexpr double largest_shown = 16;  // Earth radii
constexpr double smallest_disc = 2.2;
constexpr int dashes_of_unknown = 9;

}  // namespace

std::optional<double> filling(const FigurePlanet& planet, FilledZone zone) {
  return zone == FilledZone::conservative ? planet.p_conservative : planet.p_optimistic;
}

std::optional<double> measured_radius(const FigurePlanet& planet) {
  return planet.radius_is_limit ? std::nullopt : planet.radius;
}

double disc_radius(std::optional<double> radius, double unit) {
  if (!radius) return 1.1 * unit;
  return std::max(smallest_disc, unit * std::pow(std::min(*radius, largest_shown), 0.4));
}

DiscMark disc(Point center, double size, std::optional<double> p, bool known_radius) {
  const bool wet = p && *p >= 0.01;
  Stroke ring{wet ? palette::water : palette::grey, 0.9, {}};
  double gap = 0;
  if (!known_radius) {
    const double period = 2 * constants::pi * size / dashes_of_unknown;
    ring.dash = {0.55 * period, 0.45 * period};
    gap = 1.3;
  }
  return {center, size, gap, p.value_or(0), palette::water, p ? palette::white : palette::unknown, ring, 0.7};
}

std::optional<WhiskerMark> whisker(const Measured& semi_major_axis, const LogScale& axis, double y) {
  if (!semi_major_axis.minus && !semi_major_axis.plus) return std::nullopt;
  const double near = semi_major_axis.value - semi_major_axis.minus.value_or(0);
  const double low = near > 0 ? axis.x(near) : axis.x0 - 1;
  const double high = axis.x(semi_major_axis.value + semi_major_axis.plus.value_or(0));
  return WhiskerMark{std::max(low, axis.x0),     std::min(high, axis.x1), y, whisker_cap,
                     low<axis.x0, high> axis.x1, {palette::ink, 0.7, {}}};
}

Text label_text(const Canvas& canvas, const FigurePlanet& planet, const TextStyle& style, double width) {
  const Text text = canvas.measure().printable(planet.label.empty() ? planet.name : planet.label);
  return shortened(canvas.measure(), text, style, width);
}

std::vector<const FigurePlanet*> by_distance(const FigureStar& star) {
  std::vector<const FigurePlanet*> planets;
  for (const FigurePlanet& planet : star.planets) planets.push_back(&planet);
  std::stable_sort(planets.begin(), planets.end(), [](const FigurePlanet* a, const FigurePlanet* b) {
    return a->semi_major_axis.value < b->semi_major_axis.value;
  });
  return planets;
}

}  // namespace hz::plots
