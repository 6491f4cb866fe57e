#include "limit_check.hpp"

#include <fmt/format.h>

#include <cmath>
#include <set>
#include <vector>

namespace hz {
namespace {

constexpr int grid_steps = 512;  // 9 K a step over 2600-7200 K

/// Where two limits, or one, are looked at.
struct Place {
  double teff = 0;
  double planet_mass = 1;
};

std::vector<double> teff_grid(const std::optional<Range>& range) {
  if (!range) return {0.0};  // no dependence on Teff
  std::vector<double> grid;
  for (int i = 0; i <= grid_steps; ++i) grid.push_back(range->low + (range->high - range->low) * i / grid_steps);
  return grid;
}

void add_masses(const FluxLimit& limit, std::set<double>& masses) {
  if (const auto* quartic = std::get_if<QuarticForm>(&limit.form())) {
    for (const MassRow& row : quartic->rows) masses.insert(row.planet_mass);
  }
}

/// Every place of the grid of a limit and, for comparing, of another.
std::vector<Place> places(const FluxLimit& limit, const FluxLimit& other) {
  std::set<double> masses{1.0};
  add_masses(limit, masses);
  add_masses(other, masses);
  std::vector<Place> all;
  for (const double teff : teff_grid(limit.teff_range())) {
    for (const double planet_mass : masses) all.push_back({teff, planet_mass});
  }
  return all;
}

std::string at(const Place& place, const FluxLimit& limit) {
  const std::string teff = limit.teff_range() ? fmt::format(" at Teff {:.0f} K", place.teff) : "";
  return limit.depends_on_planet_mass() ? fmt::format("{} and {:g} Earth masses", teff, place.planet_mass) : teff;
}

/// Trouble where `hot` is colder than `cold`, or as hot when `touching` is not allowed.
Trouble trouble_of_order(const FluxLimit& hot, const FluxLimit& cold, bool touching, std::string_view what_to_do) {
  for (const Place& place : places(hot, cold)) {
    const double s_hot = hot.clamped_insolation(place.teff, place.planet_mass);
    const double s_cold = cold.clamped_insolation(place.teff, place.planet_mass);
    if (s_hot > s_cold || (touching && s_hot >= s_cold)) continue;
    return fmt::format("'{}' (S = {:.4g}) is not hotter than '{}' (S = {:.4g}){}; {}", hot.key(), s_hot, cold.key(),
                       s_cold, at(place, hot.depends_on_planet_mass() ? hot : cold), what_to_do);
  }
  return std::nullopt;
}

}  // namespace

Trouble trouble_of_limit(const FluxLimit& limit) {
  for (const Place& place : places(limit, limit)) {
    const double s = limit.clamped_insolation(place.teff, place.planet_mass);
    if (std::isfinite(s) && s > 0) continue;
    return fmt::format(
        "limit '{}' has S = {:.4g}{}; S must be above 0 over the whole teff_range: mend the coefficients "
        "or narrow the range",
        limit.key(), s, at(place, limit));
  }
  return std::nullopt;
}

Trouble trouble_of_zone(const LimitSet& set, const Zone& zone) {
  return trouble_of_order(set.limits.at(zone.inner), set.limits.at(zone.outer), false,
                          "write the inner, hotter limit first, and mend limits that cross");
}

Trouble trouble_of_nesting(const LimitSet& set) {
  if (!set.conservative || !set.optimistic) return std::nullopt;
  constexpr std::string_view what_to_do = "the conservative zone must lie within the optimistic one";
  const auto limit = [&set](std::size_t index) -> const FluxLimit& { return set.limits.at(index); };
  Trouble inner = trouble_of_order(limit(set.optimistic->inner), limit(set.conservative->inner), true, what_to_do);
  if (inner) return inner;
  return trouble_of_order(limit(set.conservative->outer), limit(set.optimistic->outer), true, what_to_do);
}

}  // namespace hz
