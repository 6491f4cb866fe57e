// Ways to the effective temperature.
#include <cmath>

#include "hz/constants.hpp"
#include "ways.hpp"

namespace hz::ways {
std::optional<Form> stated_teff(Resolver& r) { return r.stated(Quantity::teff); }

std::optional<Form> teff_from_luminosity_and_radius(Resolver& r) {
  const std::optional<Form> radius = stated_radius(r);
  if (!radius) return std::nullopt;
  std::optional<Form> light = stated_luminosity(r);
  if (!light) light = stated_log_luminosity(r);
  if (!light) return std::nullopt;
  Form teff = raised((0.25 * *light - 0.5 * *radius) + std::log(constants::solar_teff));
  teff.route = "luminosity and stellar_radius";
  return teff;
}

// By the table that was checked on M dwarfs where they are, by interferometric radii where those were measured.
std::optional<Form> teff_from_vk(Resolver& r) {
  constexpr double reddest_well_measured = 3.0;
  const std::optional<Form> color = r.color(Quantity::color_vk);
  if (!color) return std::nullopt;
  return r.apply(color->value < reddest_well_measured ? "teff_vk_boyajian13" : "teff_vk_pm13", color, Quantity::teff);
}

std::optional<Form> teff_from_vj(Resolver& r) {
  const std::optional<Form> color = r.color(Quantity::color_vj);
  const std::optional<Form> cool = r.apply("teff_vj_mann15", color, Quantity::teff);
  return cool ? cool : r.apply("teff_vj_boyajian13", color, Quantity::teff);
}

std::optional<Form> teff_from_bp_rp(Resolver& r) {
  return r.apply("teff_bprp_pm13", r.color(Quantity::color_bp_rp), Quantity::teff);
}

std::optional<Form> teff_from_bv(Resolver& r) {
  const std::optional<Form> color = r.color(Quantity::color_bv);
  const std::optional<Form> blue = r.apply("teff_bv_torres10", color, Quantity::teff);
  return blue ? blue : r.apply("teff_bv_boyajian13", color, Quantity::teff);
}

std::optional<Form> teff_from_type(Resolver& r) { return r.apply("teff_subtype_pm13", r.subtype(), Quantity::teff); }

std::optional<Form> teff_from_absolute_k(Resolver& r) {
  return r.apply("teff_mk_pm13", r.absolute_k(), Quantity::teff);
}

std::optional<Form> teff_from_mass(Resolver& r) { return r.apply("teff_mass_pm13", plain_mass(r), Quantity::teff); }

}  // namespace hz::ways
