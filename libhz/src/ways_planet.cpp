// Ways to a planet's orbit, insolation and radius.
#include <cmath>

#include "hz/constants.hpp"
#include "ways.hpp"

namespace hz::ways {
namespace {

std::optional<Form> by_kepler(Resolver& r, const std::optional<Form>& period, const std::optional<Form>& mass) {
  if (!period || !mass || r.problem()) return std::nullopt;
  return (2.0 / 3 * *period + 1.0 / 3 * *mass) + -2.0 / 3 * std::log(constants::period_1au_d);
}

std::optional<Form> by_radius(const Form& scaled, const std::optional<Form>& radius) {
  if (!radius) return std::nullopt;
  Form axis = (scaled + *radius) + -std::log(constants::au_in_solar_radii);
  axis.route = "scaled_semi_major_axis and stellar_radius";
  return axis;
}

bool uses(Resolver& r, const Form& form, Quantity quantity) {
  for (const FormTerm& term : form.terms) {
    if (r.sources()[term.source].quantity == quantity) return true;
  }
  return false;
}

/// L / a^2.
std::optional<Form> light_over_axis(Resolver& r) {
  const std::optional<Form> light = r.find(Quantity::luminosity);
  if (!light) return std::nullopt;
  const std::optional<Form> axis = r.find(Quantity::semi_major_axis);
  if (!axis) return std::nullopt;
  // With L from the radius and a from a/R the radius cancels: a/R and Teff say the same.
  const bool scaled = uses(r, *axis, Quantity::scaled_semi_major_axis);
  if (scaled && light->curve.power > 0 && uses(r, *light, Quantity::stellar_radius)) return std::nullopt;
  Form insolation = *light - 2 * *axis;
  insolation.route = "luminosity and semi_major_axis";
  return insolation;
}

}  // namespace

std::optional<Form> axis_from_period(Resolver& r) {
  const std::optional<Form> period = r.log_of(Quantity::orbital_period);
  if (!period) return std::nullopt;
  std::optional<Form> axis = by_kepler(r, period, stated_mass(r));
  if (axis) axis->route = "orbital_period and stellar_mass";
  return axis;
}

std::optional<Form> stated_axis(Resolver& r) { return r.log_of(Quantity::semi_major_axis); }

std::optional<Form> axis_from_period_and_derived_mass(Resolver& r) {
  const std::optional<Form> period = r.log_of(Quantity::orbital_period);
  if (!period) return std::nullopt;
  const std::optional<Form> mass = r.find(Quantity::stellar_mass);
  std::optional<Form> axis = by_kepler(r, period, mass);
  if (axis) axis->route = "orbital_period and stellar_mass (" + mass->route + ")";
  return axis;
}

std::optional<Form> axis_from_scaled(Resolver& r) {
  const std::optional<Form> scaled = r.log_of(Quantity::scaled_semi_major_axis);
  return scaled ? by_radius(*scaled, r.find(Quantity::stellar_radius)) : std::nullopt;
}

std::optional<Form> axis_from_scaled_and_stated_radius(Resolver& r) {
  const std::optional<Form> scaled = r.log_of(Quantity::scaled_semi_major_axis);
  return scaled ? by_radius(*scaled, r.log_of(Quantity::stellar_radius)) : std::nullopt;
}

std::optional<Form> insolation_from_luminosity(Resolver& r) {
  const std::optional<Form> insolation = light_over_axis(r);
  return insolation && !insolation->marks.rough ? insolation : std::nullopt;
}

std::optional<Form> insolation_from_rough_luminosity(Resolver& r) { return light_over_axis(r); }

std::optional<Form> insolation_from_scaled(Resolver& r) {
  const TeffInput* teff = r.teff();
  if (teff == nullptr) return std::nullopt;
  const std::optional<Form> scaled = r.log_of(Quantity::scaled_semi_major_axis);
  if (!scaled) return std::nullopt;
  Form insolation = (-2.0 * *scaled) + 2 * std::log(constants::au_in_solar_radii) +
                    4 * std::log(teff->form.value / constants::solar_teff);
  insolation.curve.power = 4;
  insolation.route = "scaled_semi_major_axis and teff";
  return insolation;
}

std::optional<Form> stated_insolation(Resolver& r) { return r.log_of(Quantity::insolation); }

std::optional<Form> stated_planet_radius(Resolver& r) { return r.log_of(Quantity::planet_radius); }

std::optional<Form> planet_radius_from_ratio(Resolver& r) {
  const std::optional<Form> ratio = r.log_of(Quantity::radius_ratio);
  if (!ratio) return std::nullopt;
  const std::optional<Form> radius = r.find(Quantity::stellar_radius);
  if (!radius) return std::nullopt;
  Form planet = (*ratio + *radius) + std::log(constants::solar_in_earth_radii);
  planet.route = "radius_ratio and stellar_radius";
  return planet;
}

// The depth of a full transit across a disc without limb darkening: (R_planet / R_star)^2.
std::optional<Form> planet_radius_from_depth(Resolver& r) {
  const std::optional<Form> depth = r.log_of(Quantity::transit_depth);
  if (!depth) return std::nullopt;
  const std::optional<Form> radius = r.find(Quantity::stellar_radius);
  if (!radius) return std::nullopt;
  Form planet = (0.5 * *depth + *radius) + std::log(constants::solar_in_earth_radii);
  planet.route = "transit_depth and stellar_radius";
  return planet;
}

}  // namespace hz::ways
