#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "hz/constants.hpp"
#include "hz/orbit.hpp"
#include "routes.hpp"

namespace hz {
namespace {

/// Beyond 3 sigma (each value's half-width on the side that faces the other) and 10 per cent of the stated value.
bool differ(const Measured& stated, const Measured& other) {
  const double gap = std::abs(stated.value - other.value);
  const bool stated_is_lower = stated.value < other.value;
  const double sigma = std::hypot(stated_is_lower ? stated.plus.value_or(0) : stated.minus.value_or(0),
                                  stated_is_lower ? other.minus.value_or(0) : other.plus.value_or(0));
  return gap > 0.1 * stated.value && gap > 3 * sigma;
}

class Comparison {
public:
  explicit Comparison(Flags& flags) : flags_(flags) {}

  void compare(Quantity quantity, const std::optional<Measured>& stated, const std::optional<Measured>& other,
               std::string_view other_route) {
    if (!stated || !other || !differ(*stated, *other)) return;
    flags_.raise(flag::inconsistent, quantity);
    if (!words_.empty()) words_ += "; ";
    words_ += fmt::format("{} {:.4g} stated, {:.4g} from {}", name(quantity), stated->value, other->value, other_route);
  }
  [[nodiscard]] const std::string& words() const { return words_; }

private:
  Flags& flags_;
  std::string words_;
};

std::optional<Measured> used(const std::optional<Input>& input) {
  return input ? std::optional(input->used) : std::nullopt;
}

std::optional<Measured> stated_luminosity(const RowInputs& row) {
  if (const auto linear = row.inputs.peek(Quantity::luminosity, row.star.luminosity)) return linear->used;
  const auto decadic = row.inputs.peek(Quantity::log_luminosity, row.star.log_luminosity);
  return decadic ? std::optional(product(1, {{decadic->used, 1, true}})) : std::nullopt;
}

std::optional<Measured> luminosity_from_radius(const RowInputs& row) {
  const auto radius = row.inputs.peek(Quantity::stellar_radius, row.star.stellar_radius);
  if (!radius || !row.teff) return std::nullopt;
  return product(std::pow(constants::solar_teff, -4), {{radius->used, 2}, {row.teff->used, 4}});
}

std::optional<Measured> axis_from_period(const RowInputs& row) {
  const auto period = row.inputs.peek(Quantity::orbital_period, row.planet.orbital_period);
  const auto mass = row.inputs.peek(Quantity::stellar_mass, row.star.stellar_mass);
  if (!period || !mass) return std::nullopt;
  return product(semi_major_axis_of(1, 1), {{period->used, 2.0 / 3}, {mass->used, 1.0 / 3}});
}

}  // namespace

std::string contradictions(const RowInputs& row, const Measured& insolation) {
  Comparison comparison(row.inputs.flags());
  comparison.compare(Quantity::luminosity, stated_luminosity(row), luminosity_from_radius(row),
                     "stellar_radius and teff");
  comparison.compare(Quantity::semi_major_axis,
                     used(row.inputs.peek(Quantity::semi_major_axis, row.planet.semi_major_axis)),
                     axis_from_period(row), "orbital_period and stellar_mass");
  comparison.compare(Quantity::insolation, used(row.inputs.peek(Quantity::insolation, row.planet.insolation)),
                     insolation, "the route used");
  return comparison.words();
}

}  // namespace hz
