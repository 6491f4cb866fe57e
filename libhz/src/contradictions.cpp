#include "contradictions.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <initializer_list>

#include "ways.hpp"

namespace hz {
namespace {

/// Beyond 3 sigma (that of the gap on the side where it closes) and 10 per cent of what is said.
bool is_wide(double gap, const HalfWidths& sides, double said) {
  return std::abs(gap) > 0.1 * said && std::abs(gap) > 3 * (gap < 0 ? sides.plus : sides.minus);
}

/// Two values that share no input.
bool differ(const Measured& said, const Measured& other) {
  const HalfWidths sides{std::hypot(said.minus.value_or(0), other.plus.value_or(0)),
                         std::hypot(said.plus.value_or(0), other.minus.value_or(0))};
  return is_wide(said.value - other.value, sides, said.value);
}

std::optional<Form> stated_light(Resolver& r) {
  const std::optional<Form> linear = ways::stated_luminosity(r);
  return linear ? linear : ways::stated_log_luminosity(r);
}

std::optional<Form> light_without_magnitudes(Resolver& r) {
  const std::optional<Form> said = stated_light(r);
  return said ? said : ways::luminosity_from_radius(r);
}

std::optional<Form> stated_gravity(Resolver& r) { return r.log_of_decadic(Quantity::log_g); }

/// ln g from stated mass and radius, cgs.
std::optional<Form> gravity(Resolver& r) {
  const std::optional<Form> mass = ways::stated_mass(r);
  const std::optional<Form> radius = ways::stated_radius(r);
  if (!mass || !radius) return std::nullopt;
  Form form = (*mass - 2 * *radius) + std::log(10.0) * ways::solar_log_g();
  form.route = "stellar_mass and stellar_radius";
  return form;
}

/// Of a type that Teff is taken from; where a better colour gives Teff, a contradiction of poorer values is no news.
std::optional<Form> used_type(Resolver& r) {
  const TeffInput* used = r.teff();
  const std::optional<Form> by_type = ways::teff_from_type(r);
  return used != nullptr && by_type && used->form.route == by_type->route ? by_type : std::nullopt;
}

class Comparison {
public:
  explicit Comparison(Resolver& resolver) : r_(resolver) {}

  /// Each of `others` that leads anywhere against what is said.
  void compare(Quantity quantity, Way said_by, std::initializer_list<Way> others) {
    const std::optional<Form> said = said_by(r_);
    if (!said) return;
    for (const Way way : others) {
      const std::optional<Form> other = way(r_);
      if (!other || (other->marks.extinction_ignored && !r_.is_nearby())) continue;
      if (!differ(quantity, *said, *other)) continue;
      report(quantity, value_of(quantity, *said), said->route, value_of(quantity, *other), other->route);
    }
  }

  void report(Quantity quantity, const Measured& said, std::string_view said_route, const Measured& other,
              std::string_view other_route) {
    r_.inputs().flags().raise(flag::inconsistent, quantity);
    if (!words_.empty()) words_ += "; ";
    const bool is_stated = said_route.starts_with("stated");
    words_ += fmt::format("{} {:.4g} {}{}, {:.4g} from {}", name(quantity), shown(quantity, said.value),
                          is_stated ? "" : "from ", is_stated ? "stated" : said_route, shown(quantity, other.value),
                          other_route);
  }
  [[nodiscard]] const std::string& words() const { return words_; }

private:
  [[nodiscard]] const Form* teff_form() {
    const TeffInput* teff = r_.teff();
    return teff != nullptr ? &teff->form : nullptr;
  }
  /// On the scale on which the value is quoted: what is said in dex is compared there. An input of both, such as the
  /// Teff of R^2 Teff^4 and of a bolometric correction, moves both.
  [[nodiscard]] bool differ(Quantity quantity, const Form& said, const Form& other) {
    const bool as_they_are = quantity == Quantity::teff;
    if (quantity == Quantity::log_g || said.route == "stated logarithm") {
      return is_wide(said.value - other.value, half_widths(said - other, teff_form(), r_.sources()), 1);
    }
    const double said_value = as_they_are ? said.value : std::exp(said.value);
    const double other_value = as_they_are ? other.value : std::exp(other.value);
    const Form gap = as_they_are ? said - other : said_value * said - other_value * other;  // for its widths
    return is_wide(said_value - other_value, half_widths(gap, teff_form(), r_.sources()), said_value);
  }
  [[nodiscard]] Measured value_of(Quantity quantity, const Form& form) {
    if (quantity == Quantity::teff) return plain(form, r_.sources());
    return exponential(form, teff_form(), r_.sources());
  }
  static double shown(Quantity quantity, double value) {
    return quantity == Quantity::log_g ? std::log10(value) : value;
  }

  Resolver& r_;
  std::string words_;
};

}  // namespace

std::string contradictions(Resolver& resolver, const Measured* insolation) {
  using namespace ways;
  const Resolver::Quiet quiet(resolver);
  Comparison comparison(resolver);
  comparison.compare(Quantity::luminosity, stated_light, {luminosity_from_radius});
  comparison.compare(Quantity::luminosity, light_without_magnitudes, {luminosity_from_photometry});
  comparison.compare(Quantity::teff, stated_teff, {teff_from_vk, teff_from_bp_rp});
  comparison.compare(Quantity::teff, used_type, {teff_from_bv});
  comparison.compare(Quantity::log_g, stated_gravity, {gravity});
  comparison.compare(Quantity::distance, stated_distance, {distance_from_parallax});
  comparison.compare(Quantity::semi_major_axis, stated_axis, {axis_from_period, axis_from_scaled_and_stated_radius});
  comparison.compare(Quantity::planet_radius, stated_planet_radius,
                     {planet_radius_from_ratio, planet_radius_from_depth});
  if (insolation != nullptr) {
    const auto stated = resolver.take(Quantity::insolation);
    if (stated && differ(stated->used, *insolation)) {
      comparison.report(Quantity::insolation, stated->used, "stated", *insolation, "the route used");
    }
  }
  return comparison.words();
}

}  // namespace hz
