#include "axis_fit.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "hz/require.hpp"
#include "planet_marks.hpp"

namespace hz::plots {
namespace {

constexpr double beside = 7;  // room beside everything, pt
constexpr double least_decades = 0.5;

void add_measured(std::vector<AxisNeed>& needs, const Measured& d, double room) {
  needs.push_back({d.value, room, room});
  needs.push_back({std::max(d.value - d.minus.value_or(0), d.value / 2), beside, beside});
  needs.push_back({std::min(d.value + d.plus.value_or(0), d.value * 2), beside, beside});
}

bool drawable(double value) { return std::isfinite(value) && value > 0; }

/// Points per power of ten at which `low` stands at x_low and every need has its room.
double widest_scale(const std::vector<AxisNeed>& needs, double low, double x_low, double x1) {
  double scale = std::numeric_limits<double>::infinity();
  for (const AxisNeed& need : needs) {
    const double decades = std::log10(need.distance) - low;
    if (decades > 0) scale = std::min(scale, (x1 - need.right - x_low) / decades);
  }
  return scale;
}

}  // namespace

std::vector<AxisNeed> needs_of(const FigureStar& star, double unit) {
  std::vector<AxisNeed> needs;
  for (const FigureLimit& limit : star.limits) add_measured(needs, limit.distance, beside);
  for (const FigurePlanet& planet : star.planets) {
    add_measured(needs, planet.semi_major_axis, disc_radius(measured_radius(planet), unit) + 3);
    if (!planet.span) continue;
    needs.push_back({planet.span->periastron, beside, beside});
    needs.push_back({planet.span->apastron, beside, beside});
  }
  if (needs.empty()) needs.push_back({std::sqrt(star.luminosity.value), beside, beside});
  return needs;
}

LogScale fitted_axis(std::vector<AxisNeed> needs, double x0, double x1) {
  const auto by_distance = [](const AxisNeed& a, const AxisNeed& b) { return a.distance < b.distance; };
  const auto [low, high] = std::minmax_element(needs.begin(), needs.end(), by_distance);
  const double middle = std::sqrt(low->distance * high->distance);
  const double spread = std::pow(10, least_decades / 2);
  needs.push_back({middle / spread, beside, beside});
  needs.push_back({middle * spread, beside, beside});

  const double lowest = std::log10(std::min_element(needs.begin(), needs.end(), by_distance)->distance);
  double room = 0;  // left of the lowest: the largest that anything could need
  for (const AxisNeed& need : needs) room = std::max(room, need.left);
  const double scale = widest_scale(needs, lowest, x0 + room, x1);
  return {std::pow(10, lowest - room / scale), std::pow(10, lowest + (x1 - x0 - room) / scale), x0, x1};
}

void require_drawable(const FigureStar& star) {
  HZ_REQUIRE(drawable(star.teff.value) && drawable(star.luminosity.value));
  HZ_REQUIRE(!star.stellar_mass || drawable(*star.stellar_mass));
  for (const FigureLimit& limit : star.limits) HZ_REQUIRE(drawable(limit.distance.value));
  for (const FigurePlanet& planet : star.planets) {
    HZ_REQUIRE(drawable(planet.semi_major_axis.value));
    HZ_REQUIRE(!planet.radius || drawable(*planet.radius));
    HZ_REQUIRE(!planet.span || (drawable(planet.span->periastron) && drawable(planet.span->apastron)));
  }
}

}  // namespace hz::plots
