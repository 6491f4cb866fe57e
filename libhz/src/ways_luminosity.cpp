// Ways to the luminosity, in nominal solar units.
#include <fmt/format.h>

#include <cmath>

#include "hz/constants.hpp"
#include "ways.hpp"

namespace hz::ways {
namespace {

constexpr double ln10 = 2.302585092994045684;
constexpr double per_magnitude = -0.4 * ln10;  // ln L
constexpr double warmest_of_the_cool = 4000;   // K: Flower's corrections fail below, the sequence's serve there

/// ln L of an absolute bolometric magnitude without its distance: m + correction, to be counted from the Sun's.
Form light(const Form& bolometric, const Form& distance, double solar) {
  // M = m - 5 log10(d / 10 pc), so that ln L = -0.4 ln(10) (m + 5 - M_sun) + 2 ln d.
  return per_magnitude * (bolometric + (5 - solar)) + 2 * distance;
}

/// From a magnitude with a correction that follows Teff: the same Teff as in the limits.
std::optional<Form> by_teff(Resolver& r, Quantity magnitude, std::string_view key) {
  const Relation& correction = relation(key);
  const TeffInput* teff = r.teff();
  if (teff == nullptr || !correction.range().contains(teff->form.value)) return std::nullopt;
  const std::optional<Form> apparent = r.magnitude(magnitude);
  if (!apparent) return std::nullopt;
  const std::optional<Form> distance = r.find(Quantity::distance);
  if (!distance || !r.holds(correction)) return std::nullopt;
  const double at_centre = correction(teff->form.value);
  Form bolometric = *apparent + at_centre;
  bolometric.terms.push_back(
      {r.sources().scatter(Quantity::luminosity, correction, correction.scatter(teff->form.value), 0), 1});
  Form form = light(bolometric, *distance, *correction.solar_bolometric_magnitude);
  form.curve.weight = per_magnitude;
  form.curve.correction = &correction;
  form.marks.main_sequence = form.marks.main_sequence || correction.main_sequence;
  form.route = fmt::format("{}, {} and {}", name(magnitude), Resolver::distance_word(*distance), correction.label);
  return form;
}

/// From a magnitude with a correction that follows a colour.
std::optional<Form> by_color(Resolver& r, Quantity magnitude, Quantity color, std::string_view key) {
  const std::optional<Form> apparent = r.magnitude(magnitude);
  if (!apparent) return std::nullopt;
  const std::optional<Form> correction = r.apply(key, r.color(color), Quantity::luminosity);
  if (!correction) return std::nullopt;
  const std::optional<Form> distance = r.find(Quantity::distance);
  if (!distance) return std::nullopt;
  Form form = light(*apparent + *correction, *distance, *relation(key).solar_bolometric_magnitude);
  form.route = fmt::format("{}, {} and {}", name(magnitude), Resolver::distance_word(*distance), relation(key).label);
  return form;
}

/// A luminosity that nothing of this very star but its type or mass speaks for.
std::optional<Form> rough(const std::optional<Form>& decadic) {
  if (!decadic) return std::nullopt;
  Form form = ln10 * *decadic;
  form.marks.rough = true;
  return form;
}

std::optional<Form> from_radius(Resolver& r, const std::optional<Form>& radius) {
  if (!radius) return std::nullopt;
  const TeffInput* teff = r.teff();
  if (teff == nullptr) return std::nullopt;
  Form form = (2 * *radius) + 4 * std::log(teff->form.value / constants::solar_teff);
  form.curve.power = 4;
  return form;
}

}  // namespace

std::optional<Form> stated_luminosity(Resolver& r) { return r.log_of(Quantity::luminosity); }

std::optional<Form> stated_log_luminosity(Resolver& r) {
  std::optional<Form> form = r.log_of_decadic(Quantity::log_luminosity);
  if (form) form->route = "stated logarithm";
  return form;
}

std::optional<Form> luminosity_from_radius(Resolver& r) {
  std::optional<Form> form = r.teff() == nullptr ? std::nullopt : from_radius(r, stated_radius(r));
  if (form) form->route = "stellar_radius and teff";
  return form;
}

std::optional<Form> luminosity_from_bolometric(Resolver& r) {
  constexpr double solar = 4.74;  // IAU 2015 Resolution B2: M_bol 4.74 for the nominal solar luminosity
  const std::optional<Form> apparent = r.stated(Quantity::magnitude_bol);
  if (!apparent) return std::nullopt;
  const std::optional<Form> distance = r.find(Quantity::distance);
  if (!distance) return std::nullopt;
  Form form = light(*apparent, *distance, solar);
  form.route = fmt::format("magnitude_bol and {}", Resolver::distance_word(*distance));
  return form;
}

std::optional<Form> luminosity_from_v_and_vk(Resolver& r) {
  const TeffInput* teff = r.teff();
  if (teff != nullptr && teff->form.value > warmest_of_the_cool) return std::nullopt;
  return by_color(r, Quantity::magnitude_v, Quantity::color_vk, "bc_v_pm13_vk");
}

std::optional<Form> luminosity_from_hot_v(Resolver& r) { return by_teff(r, Quantity::magnitude_v, "bc_v_flower96"); }

std::optional<Form> luminosity_from_j(Resolver& r) {
  return by_color(r, Quantity::magnitude_j, Quantity::color_vj, "bc_j_mann15");
}

std::optional<Form> luminosity_from_g(Resolver& r) { return by_teff(r, Quantity::magnitude_g, "bc_g_andrae18"); }

std::optional<Form> luminosity_from_cool_v(Resolver& r) { return by_teff(r, Quantity::magnitude_v, "bc_v_pm13_teff"); }

std::optional<Form> luminosity_from_derived_radius(Resolver& r) {
  const std::optional<Form> radius = radius_from_absolute_k(r);
  std::optional<Form> form = from_radius(r, radius);
  if (form) form->route = fmt::format("{} and teff", radius->route);
  return form;
}

std::optional<Form> luminosity_from_type(Resolver& r) {
  return rough(r.apply("log_luminosity_subtype_pm13", r.subtype(), Quantity::luminosity));
}

std::optional<Form> luminosity_from_mass(Resolver& r) {
  const std::optional<Form> mass = r.log_of(Quantity::stellar_mass);
  if (!mass) return std::nullopt;
  Form decadic_mass = 1 / ln10 * *mass;
  decadic_mass.route = "stellar_mass";
  return rough(r.apply("log_luminosity_mass_eker18", decadic_mass, Quantity::luminosity));
}

std::optional<Form> luminosity_from_photometry(Resolver& r) {
  for (const auto way : {luminosity_from_v_and_vk, luminosity_from_hot_v, luminosity_from_j, luminosity_from_g,
                         luminosity_from_cool_v}) {
    if (std::optional<Form> found = way(r)) return found;
  }
  return std::nullopt;
}

}  // namespace hz::ways
