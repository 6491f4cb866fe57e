#include "planet_mass_route.hpp"

#include <algorithm>
#include <cmath>

#include "hz/constants.hpp"
#include "hz/relations.hpp"

namespace hz {
namespace {

using MaybeMass = std::optional<PlanetMassRoute>;

/// 1 / sin i of an isotropic inclination: cos i is uniform, so that P(sin i < s) = 1 - sqrt(1 - s^2). In dex: its
/// median 2 / sqrt 3, and from there to the 16 and 84 per cent points.
constexpr double median_log_inverse_sine = 0.0624693683;
constexpr double lower_log_inverse_sine = 0.0569334795;
constexpr double upper_log_inverse_sine = 0.2047358490;

MaybeMass take_mass(Resolver& r, Quantity quantity, const char* route) {
  const std::optional<Input> mass = r.take(quantity);
  if (!mass) return std::nullopt;
  r.inputs().raise(quantity, *mass);
  return PlanetMassRoute{mass->x, false, {mass->used, route}, std::nullopt};
}

/// A decadic mass with its two-piece distribution.
PlanetMassRoute decadic(const Resolver& r, const Measured& log_mass, std::string route) {
  PlanetMassRoute found;
  found.decadic = true;
  found.x = *log_mass.minus + *log_mass.plus > 0
                ? Distribution::two_piece(log_mass.value, *log_mass.minus, *log_mass.plus, r.settings().asymmetry,
                                          domain_of(Quantity::log_luminosity))
                : Distribution::exact(log_mass.value);
  const double value = std::pow(10, log_mass.value);
  found.derived = {{value, value - std::pow(10, log_mass.value - *log_mass.minus),
                    std::pow(10, log_mass.value + *log_mass.plus) - value, LimitMark::none, false},
                   std::move(route)};
  return found;
}

/// The minimum mass as a decadic logarithm.
Measured log_of(const Measured& mass) {
  const double per_unit = 1 / (std::log(10.0) * mass.value);
  return {std::log10(mass.value), *mass.minus * per_unit, *mass.plus * per_unit, LimitMark::none, false};
}

MaybeMass by_inclination(const Resolver& r, Measured log_mass, const Input& inclination) {
  const double angle = inclination.used.value * constants::pi / 180;
  const double sine = std::abs(std::sin(angle));
  if (!(sine > 0)) return std::nullopt;
  const double width = (*inclination.used.minus + *inclination.used.plus) / 2 * constants::pi / 180;
  const double log_width = width * std::abs(std::cos(angle)) / sine / std::log(10.0);
  log_mass.value -= std::log10(sine);
  log_mass.minus = std::hypot(*log_mass.minus, log_width);
  log_mass.plus = std::hypot(*log_mass.plus, log_width);
  return decadic(r, log_mass, "min_mass and inclination");
}

/// A mass times the sine of the inclination.
MaybeMass from_minimum(Resolver& r, Quantity quantity) {
  const std::optional<Input> mass = r.take(quantity);
  if (!mass) return std::nullopt;
  r.inputs().raise(quantity, *mass);
  Measured log_mass = log_of(mass->used);
  const std::optional<Input> inclination = r.take(Quantity::inclination);
  if (inclination) {
    if (MaybeMass found = by_inclination(r, log_mass, *inclination)) return found;
  }
  r.inputs().flags().raise(flag::min_mass_used);
  log_mass.value += median_log_inverse_sine;
  log_mass.minus = std::hypot(*log_mass.minus, lower_log_inverse_sine);
  log_mass.plus = std::hypot(*log_mass.plus, upper_log_inverse_sine);
  return decadic(r, log_mass, "min_mass, isotropic inclination");
}

MaybeMass stated_mass(Resolver& r) {
  switch (r.row().planet.planet_mass_kind) {
    case PlanetMassKind::from_radius: return std::nullopt;
    case PlanetMassKind::minimum: return from_minimum(r, Quantity::planet_mass);
    case PlanetMassKind::unsaid:
    case PlanetMassKind::measured: break;
  }
  return take_mass(r, Quantity::planet_mass, "stated");
}

MaybeMass minimum_mass(Resolver& r) { return from_minimum(r, Quantity::min_mass); }

MaybeMass mass_from_radius(Resolver& r) {
  const std::optional<Form> radius = r.find(Quantity::planet_radius);
  if (!radius) return std::nullopt;
  r.raise(*radius);
  r.inputs().flags().raise(flag::mass_from_radius);
  const TeffInput* teff = radius->curve.is_flat() ? nullptr : r.teff();
  const Measured log_mass = log_mass_from_radius(exponential(*radius, teff ? &teff->form : nullptr, r.sources()));
  const std::string from = radius->route == "stated" ? "planet_radius" : radius->route;
  return decadic(r, log_mass, from + " (Chen & Kipping 2017)");
}

/// A mass that the list itself had from the radius, where the radius is not given.
MaybeMass listed_from_radius(Resolver& r) {
  if (r.row().planet.planet_mass_kind != PlanetMassKind::from_radius) return std::nullopt;
  MaybeMass found = take_mass(r, Quantity::planet_mass, "stated, from a radius");
  if (found) r.inputs().flags().raise(flag::mass_from_radius);
  return found;
}

/// The mass that a limit points at: an upper limit's own value (all below is possible), a lower limit's own value.
std::optional<double> limit_of(const PlanetRecord& planet) {
  for (const Field* field : {&planet.planet_mass, &planet.min_mass}) {
    if (field->stated && field->stated->limit != LimitMark::none) return field->stated->value;
  }
  const Field& radius = planet.planet_radius;
  if (!radius.stated || radius.stated->limit == LimitMark::none || !(radius.stated->value > 0)) return std::nullopt;
  return std::pow(10, log_mass_from_radius({radius.stated->value, {}, {}, LimitMark::none, false}).value);
}

PlanetMassRoute one_earth_mass(const Resolver& r) {
  r.inputs().flags().raise(flag::planet_mass_assumed);
  PlanetMassRoute assumed;
  assumed.derived.measured = {1, 0, 0, LimitMark::none, false};
  assumed.derived.route = assumed_route;
  assumed.limit = limit_of(r.row().planet);
  return assumed;
}

}  // namespace

Result<PlanetMassRoute> planet_mass_route(Resolver& resolver) {
  for (const auto way : {stated_mass, minimum_mass, mass_from_radius, listed_from_radius}) {
    const MaybeMass found = way(resolver);
    if (resolver.problem()) return *resolver.problem();
    if (found) return *found;
  }
  return one_earth_mass(resolver);
}

}  // namespace hz
