// Ways to a star's radius, mass and distance.
#include <fmt/format.h>

#include <cmath>

#include "hz/constants.hpp"
#include "hz/distance.hpp"
#include "ways.hpp"

namespace hz::ways {
namespace {

constexpr double ln10 = 2.302585092994045684;
/// Mean density of the Sun, g cm^-3; nominal GM with G of CODATA 2018.
constexpr double solar_density = 1.4097798;

/// A radius by a relation, which is that of a star and so above 0.
std::optional<Form> log_of(const std::optional<Form>& radius) {
  return radius ? std::optional(logarithm(*radius)) : std::nullopt;
}

std::optional<Form> named(std::optional<Form> form, std::string route) {
  if (form) form->route = std::move(route);
  return form;
}

}  // namespace

double solar_log_g() {
  return std::log10(100 * constants::solar_gm_m3_s2 / (constants::solar_radius_m * constants::solar_radius_m));
}

std::optional<Form> stated_radius(Resolver& r) { return r.log_of(Quantity::stellar_radius); }

std::optional<Form> radius_from_absolute_k(Resolver& r) {
  return log_of(r.apply("stellar_radius_mk_mann15", r.absolute_k(), Quantity::stellar_radius));
}

std::optional<Form> radius_from_light(Resolver& r) {
  const std::optional<Form> light = r.find(Quantity::luminosity);
  if (!light) return std::nullopt;
  const TeffInput* teff = r.teff();
  if (teff == nullptr) return std::nullopt;
  Form form = (0.5 * *light) + 2 * std::log(constants::solar_teff / teff->form.value);
  form.curve.power -= 2;
  return named(form, "luminosity and teff");
}

std::optional<Form> radius_from_log_g(Resolver& r) {
  const std::optional<Form> gravity = r.log_of_decadic(Quantity::log_g);
  if (!gravity) return std::nullopt;
  const std::optional<Form> mass = r.find(Quantity::stellar_mass);
  if (!mass) return std::nullopt;
  return named((0.5 * (*mass - *gravity)) + 0.5 * ln10 * solar_log_g(), "log_g and stellar_mass");
}

std::optional<Form> radius_from_mass(Resolver& r) {
  const std::optional<Form> mass = plain_mass(r);
  const std::optional<Form> sunlike = r.apply("stellar_radius_mass_eker18", mass, Quantity::stellar_radius);
  return log_of(sunlike ? sunlike : r.apply("radius_mass_pm13", mass, Quantity::stellar_radius));
}

std::optional<Form> stated_mass(Resolver& r) { return r.log_of(Quantity::stellar_mass); }

// By way of its logarithm, so that every route takes the same source alike.
std::optional<Form> plain_mass(Resolver& r) {
  const std::optional<Form> mass = stated_mass(r);
  if (!mass) return std::nullopt;
  Form plain = raised(*mass);
  plain.route = "stellar_mass";
  return plain;
}

std::optional<Form> mass_from_absolute_k(Resolver& r) {
  const std::optional<Form> decadic = r.apply("log_stellar_mass_mk_mann19", r.absolute_k(), Quantity::stellar_mass);
  return decadic ? std::optional(ln10 * *decadic) : std::nullopt;
}

std::optional<Form> mass_from_density(Resolver& r) {
  const std::optional<Form> density = r.log_of(Quantity::stellar_density);
  if (!density) return std::nullopt;
  const std::optional<Form> radius = stated_radius(r);
  if (!radius) return std::nullopt;
  return named((*density + 3 * *radius) + -std::log(solar_density), "stellar_density and stellar_radius");
}

std::optional<Form> mass_from_transit(Resolver& r) {
  const std::optional<Form> scaled = r.log_of(Quantity::scaled_semi_major_axis);
  if (!scaled) return std::nullopt;
  const std::optional<Form> period = r.log_of(Quantity::orbital_period);
  if (!period) return std::nullopt;
  const std::optional<Form> radius = stated_radius(r);
  if (!radius) return std::nullopt;
  const double in_au_and_years = -3 * std::log(constants::au_in_solar_radii) + 2 * std::log(constants::period_1au_d);
  return named(((3 * (*scaled + *radius)) - 2 * *period) + in_au_and_years,
               "scaled_semi_major_axis, orbital_period and stellar_radius");
}

std::optional<Form> mass_from_log_g(Resolver& r) {
  const std::optional<Form> gravity = r.log_of_decadic(Quantity::log_g);
  if (!gravity) return std::nullopt;
  const std::optional<Form> radius = r.find(Quantity::stellar_radius);
  if (!radius) return std::nullopt;
  return named((*gravity + 2 * *radius) + -ln10 * solar_log_g(), "log_g and stellar_radius");
}

std::optional<Form> mass_from_luminosity(Resolver& r) {
  const std::optional<Form> light = r.find(Quantity::luminosity);
  if (!light) return std::nullopt;
  Form decadic_light = 1 / ln10 * *light;
  decadic_light.route = "luminosity";
  const std::optional<Form> decadic =
      r.apply("log_stellar_mass_luminosity_eker18", decadic_light, Quantity::stellar_mass);
  return decadic ? std::optional(ln10 * *decadic) : std::nullopt;
}

std::optional<Form> stated_distance(Resolver& r) { return r.log_of(Quantity::distance); }

std::optional<Form> distance_from_parallax(Resolver& r) {
  const std::optional<Input> parallax = r.take(Quantity::parallax);
  if (!parallax) return std::nullopt;
  const double value = parallax->used.value;
  if (!(value > 0) && parallax->assumed) return std::nullopt;  // neither a distance nor an error that says how far off
  const double half_width = (*parallax->used.minus + *parallax->used.plus) / 2;
  if (value > 0 && half_width < simple_parallax_error * value) {
    const std::size_t source = r.sources().of(Quantity::parallax, *parallax, true);
    return Form{std::log(1000 / value), {{source, -1}}, {}, {}, "parallax"};
  }
  if (!(half_width > 0)) return std::nullopt;
  Input posterior = *parallax;
  posterior.used = log_distance_posterior(value, half_width, r.settings().length_scale);
  posterior.x = Distribution::two_piece(posterior.used.value, *posterior.used.minus, *posterior.used.plus,
                                        Asymmetry::median, domain_of(Quantity::log_luminosity));
  Form form{
      ln10 * posterior.used.value, {{r.sources().of(Quantity::parallax, posterior, false), ln10}}, {}, {}, "parallax"};
  form.marks.distance_prior = true;
  return form;
}

}  // namespace hz::ways
