// The ways from stated values to derived ones, one function each; libhz/src/route_table.cpp puts them in order.
#pragma once
#include <optional>

#include "resolver.hpp"

namespace hz::ways {

// Teff, K.
std::optional<Form> stated_teff(Resolver& r);
std::optional<Form> teff_from_luminosity_and_radius(Resolver& r);
std::optional<Form> teff_from_vk(Resolver& r);
std::optional<Form> teff_from_vj(Resolver& r);
std::optional<Form> teff_from_bp_rp(Resolver& r);
std::optional<Form> teff_from_bv(Resolver& r);
std::optional<Form> teff_from_type(Resolver& r);
std::optional<Form> teff_from_absolute_k(Resolver& r);
std::optional<Form> teff_from_mass(Resolver& r);

// ln of the luminosity.
std::optional<Form> stated_luminosity(Resolver& r);
std::optional<Form> stated_log_luminosity(Resolver& r);
std::optional<Form> luminosity_from_radius(Resolver& r);  // a stated radius
std::optional<Form> luminosity_from_bolometric(Resolver& r);
std::optional<Form> luminosity_from_v_and_vk(Resolver& r);
std::optional<Form> luminosity_from_hot_v(Resolver& r);
std::optional<Form> luminosity_from_j(Resolver& r);
std::optional<Form> luminosity_from_g(Resolver& r);
std::optional<Form> luminosity_from_cool_v(Resolver& r);
std::optional<Form> luminosity_from_derived_radius(Resolver& r);
std::optional<Form> luminosity_from_type(Resolver& r);
std::optional<Form> luminosity_from_mass(Resolver& r);
std::optional<Form> luminosity_from_photometry(Resolver& r);  // the first of those with a magnitude and a correction

/// log g of the nominal Sun, cgs: log10(GM / R^2).
[[nodiscard]] double solar_log_g();

// ln of the star's radius, mass and distance.
std::optional<Form> stated_radius(Resolver& r);
std::optional<Form> radius_from_absolute_k(Resolver& r);
std::optional<Form> radius_from_light(Resolver& r);
std::optional<Form> radius_from_log_g(Resolver& r);
std::optional<Form> radius_from_mass(Resolver& r);
std::optional<Form> stated_mass(Resolver& r);
std::optional<Form> plain_mass(Resolver& r);  // the stated mass itself, in solar masses
std::optional<Form> mass_from_absolute_k(Resolver& r);
std::optional<Form> mass_from_density(Resolver& r);
std::optional<Form> mass_from_transit(Resolver& r);
std::optional<Form> mass_from_log_g(Resolver& r);
std::optional<Form> mass_from_luminosity(Resolver& r);
std::optional<Form> stated_distance(Resolver& r);
std::optional<Form> distance_from_parallax(Resolver& r);

// ln of the orbit's semi-major axis, of the insolation before the eccentricity's factor, and of the planet's radius.
std::optional<Form> axis_from_period(Resolver& r);  // with a stated mass
std::optional<Form> stated_axis(Resolver& r);
std::optional<Form> axis_from_period_and_derived_mass(Resolver& r);
std::optional<Form> axis_from_scaled(Resolver& r);
std::optional<Form> axis_from_scaled_and_stated_radius(Resolver& r);
std::optional<Form> insolation_from_luminosity(Resolver& r);
std::optional<Form> insolation_from_scaled(Resolver& r);
std::optional<Form> stated_insolation(Resolver& r);
std::optional<Form> insolation_from_rough_luminosity(Resolver& r);
std::optional<Form> stated_planet_radius(Resolver& r);
std::optional<Form> planet_radius_from_ratio(Resolver& r);
std::optional<Form> planet_radius_from_depth(Resolver& r);

}  // namespace hz::ways
