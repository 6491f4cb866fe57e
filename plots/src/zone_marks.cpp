#include "zone_marks.hpp"

#include <algorithm>

#include "palette.hpp"

namespace hz::plots {
namespace {

/// One limit's fade along x: 0 left of `low`, one half at `middle`, 1 right of `high`.
struct Ramp {
  double low = 0;
  double middle = 0;
  double high = 0;

  [[nodiscard]] double operator()(double x) const {
    if (x <= low) return 0;
    if (x >= high) return 1;
    return x <= middle ? 0.5 * (x - low) / (middle - low) : 1 - 0.5 * (high - x) / (high - middle);
  }
};

/// Even a limit without a half-width gets this much, so that every colour has one place.
constexpr double sharpest = 0.01;

Ramp ramp_of(const FigureLimit& limit, const LogScale& axis) {
  const Measured& d = limit.distance;
  const double middle = axis.x(d.value);
  const double near = d.value - d.minus.value_or(0);
  const double low = near > 0 ? axis.x(near) : axis.x0;
  const double high = axis.x(d.value + d.plus.value_or(0));
  return {std::min(std::max(low, axis.x0), middle - sharpest), middle, std::max(high, middle + sharpest)};
}

struct ZoneRamps {
  Ramp inner;
  Ramp outer;
  Color color;
  [[nodiscard]] double share(double x) const { return inner(x) * (1 - outer(x)); }
};

void add_zone(std::vector<ZoneRamps>& zones, const std::vector<FigureLimit>& limits, const LogScale& axis,
              LimitRole inner, LimitRole outer, const Color& color) {
  const auto with = [&](LimitRole role) {
    return std::find_if(limits.begin(), limits.end(), [&](const FigureLimit& limit) { return limit.role == role; });
  };
  if (with(inner) == limits.end() || with(outer) == limits.end()) return;
  zones.push_back({ramp_of(*with(inner), axis), ramp_of(*with(outer), axis), color});
}

}  // namespace

std::vector<ColorStop> zone_shade(const std::vector<FigureLimit>& limits, const LogScale& axis) {
  std::vector<ZoneRamps> zones;
  add_zone(zones, limits, axis, LimitRole::optimistic_inner, LimitRole::optimistic_outer, palette::optimistic);
  add_zone(zones, limits, axis, LimitRole::conservative_inner, LimitRole::conservative_outer, palette::conservative);
  std::vector<double> places;
  for (const ZoneRamps& zone : zones)
    for (const Ramp& ramp : {zone.inner, zone.outer}) places.insert(places.end(), {ramp.low, ramp.middle, ramp.high});
  std::sort(places.begin(), places.end());

  std::vector<ColorStop> shade;
  for (const double x : places) {
    Color color = palette::white;
    for (const ZoneRamps& zone : zones) color = palette::mixed(zone.color, color, zone.share(x));
    shade.push_back({x, color});
  }
  return shade;
}

bool is_inner(LimitRole role) { return role == LimitRole::optimistic_inner || role == LimitRole::conservative_inner; }

bool is_conservative(LimitRole role) {
  return role == LimitRole::conservative_inner || role == LimitRole::conservative_outer;
}

Stroke limit_stroke(LimitRole role) {
  if (is_conservative(role)) return {palette::water, 0.9, {}};
  return {palette::water, 0.8, {2.4, 1.6}};
}

Stroke tooth_stroke() { return {palette::water, 0.6, {}}; }

bool on_axis(const LogScale& axis, double distance) {
  return distance > 0 && axis.x(distance) >= axis.x0 && axis.x(distance) <= axis.x1;
}

}  // namespace hz::plots
