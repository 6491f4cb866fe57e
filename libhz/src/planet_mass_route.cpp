#include <cmath>

#include "hz/relations.hpp"
#include "routes.hpp"

namespace hz {
namespace {

PlanetMassRoute as_stated(const Input& input, std::string route) {
  return {input.x, false, {input.used, std::move(route)}, std::nullopt};
}

using MaybeMass = Result<std::optional<PlanetMassRoute>>;

MaybeMass take_mass(const RowInputs& row, Quantity quantity, const Field& field, std::string_view raise,
                    const char* route) {
  const auto mass = row.inputs.take(quantity, field);
  if (!mass) return mass.error();
  if (!*mass) return std::optional<PlanetMassRoute>();
  if (!raise.empty()) row.inputs.flags().raise(raise);
  return std::optional(as_stated(**mass, route));
}

MaybeMass stated_mass(const RowInputs& row) {
  switch (row.planet.planet_mass_kind) {
    case PlanetMassKind::from_radius: return std::optional<PlanetMassRoute>();
    case PlanetMassKind::minimum:
      return take_mass(row, Quantity::planet_mass, row.planet.planet_mass, flag::min_mass_used, "stated minimum");
    case PlanetMassKind::unsaid:
    case PlanetMassKind::measured: break;
  }
  return take_mass(row, Quantity::planet_mass, row.planet.planet_mass, "", "stated");
}

MaybeMass minimum_mass(const RowInputs& row) {
  return take_mass(row, Quantity::min_mass, row.planet.min_mass, flag::min_mass_used, "stated minimum");
}

MaybeMass mass_from_radius(const RowInputs& row) {
  const auto radius = row.inputs.take(Quantity::planet_radius, row.planet.planet_radius);
  if (!radius) return radius.error();
  if (!*radius) return std::optional<PlanetMassRoute>();
  row.inputs.flags().raise(flag::mass_from_radius);
  const Measured log_mass = log_mass_from_radius((*radius)->used);
  PlanetMassRoute found;
  found.decadic = true;
  found.x = Distribution::two_piece(log_mass.value, *log_mass.minus, *log_mass.plus, row.settings.asymmetry,
                                    domain_of(Quantity::log_luminosity));
  found.derived = {product(1, {{log_mass, 1, true}}), "planet_radius (Chen & Kipping 2017)"};
  return std::optional(found);
}

/// A mass that the list itself had from the radius, where the radius is not given.
MaybeMass listed_from_radius(const RowInputs& row) {
  if (row.planet.planet_mass_kind != PlanetMassKind::from_radius) return std::optional<PlanetMassRoute>();
  return take_mass(row, Quantity::planet_mass, row.planet.planet_mass, flag::mass_from_radius, "stated, from a radius");
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

PlanetMassRoute one_earth_mass(const RowInputs& row) {
  row.inputs.flags().raise(flag::planet_mass_assumed);
  PlanetMassRoute assumed;
  assumed.derived.measured = {1, 0, 0, LimitMark::none, false};
  assumed.derived.route = assumed_route;
  assumed.limit = limit_of(row.planet);
  return assumed;
}

}  // namespace

Result<PlanetMassRoute> planet_mass_route(const RowInputs& row) {
  for (const auto way : {stated_mass, minimum_mass, mass_from_radius, listed_from_radius}) {
    const MaybeMass found = way(row);
    if (!found) return found.error();
    if (*found) return **found;
  }
  return one_earth_mass(row);
}

}  // namespace hz
