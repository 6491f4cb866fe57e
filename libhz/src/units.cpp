#include "hz/units.hpp"

#include <array>
#include <cmath>
#include <string>
#include <utility>

#include "hz/require.hpp"
#include "unit_table.hpp"
#include "words.hpp"

namespace hz {
namespace {

// nullopt for names and codes, and for logarithms, whose units are wrapped.
std::optional<Dimension> dimension_of(Quantity quantity) {
  switch (quantity) {
    case Quantity::teff:
    case Quantity::equilibrium_temperature: return Dimension::temperature;
    case Quantity::luminosity: return Dimension::power;
    case Quantity::stellar_radius:
    case Quantity::planet_radius:
    case Quantity::semi_major_axis:
    case Quantity::distance: return Dimension::length;
    case Quantity::stellar_mass:
    case Quantity::planet_mass:
    case Quantity::min_mass: return Dimension::mass;
    case Quantity::stellar_density: return Dimension::density;
    case Quantity::parallax:
    case Quantity::companion_separation:
    case Quantity::inclination:
    case Quantity::arg_periastron: return Dimension::angle;
    case Quantity::metallicity: return Dimension::abundance;
    case Quantity::age:
    case Quantity::orbital_period: return Dimension::time;
    case Quantity::rv_semi_amplitude: return Dimension::speed;
    case Quantity::insolation: return Dimension::flux;
    case Quantity::scaled_semi_major_axis:
    case Quantity::eccentricity:
    case Quantity::radius_ratio:
    case Quantity::transit_depth:
    case Quantity::bond_albedo: return Dimension::ratio;
    default: break;
  }
  if (info(quantity).unit == "mag") return Dimension::magnitude;
  return std::nullopt;
}

// What `log(...)`, `log10(...)`, `lg(...)`, `dex(...)` or `[...]` holds; the unit itself without one of them.
std::string_view unwrapped(std::string_view unit) {
  static constexpr std::array<std::pair<std::string_view, std::string_view>, 5> wrappers{
      {{"log(", ")"}, {"log10(", ")"}, {"lg(", ")"}, {"dex(", ")"}, {"[", "]"}}};
  for (const auto& [open, close] : wrappers) {
    if (!unit.starts_with(open) || !unit.ends_with(close)) continue;
    return words::trimmed(unit.substr(open.size(), unit.size() - open.size() - close.size()));
  }
  return unit;
}

// A logarithm in another unit is the same number plus a constant. A bare "dex" says nothing of the unit: the usual one.
std::optional<Conversion> log_conversion(Quantity quantity, std::string_view unit) {
  const auto dimension = quantity == Quantity::log_g ? Dimension::acceleration : Dimension::power;
  const auto canonical = unit_size(dimension, unwrapped(info(quantity).unit));
  HZ_REQUIRE(canonical.has_value());
  if (unit == "dex" || unit == "log" || unit == "log10") return Conversion{ConversionKind::offset, 0};
  const auto size = unit_size(dimension, unwrapped(unit));
  if (!size) return std::nullopt;
  return Conversion{ConversionKind::offset, std::log10(*size / *canonical)};
}

// A parallax in a distance column: pc = 1000 / mas.
std::optional<Conversion> parallax_as_distance(std::string_view unit) {
  const auto mas = unit_size(Dimension::angle, unit);
  if (!mas) return std::nullopt;
  return Conversion{ConversionKind::reciprocal, 1000.0 / *mas};
}

double canonical_size(Quantity quantity, Dimension dimension) {
  const auto& unit = info(quantity).unit;
  if (unit.empty()) return 1;
  const auto size = unit_size(dimension, unit);
  HZ_REQUIRE(size.has_value());
  return *size;
}

Measured reciprocal(const Measured& measured, double factor) {
  HZ_REQUIRE(measured.value > 0);
  Measured out = measured;
  out.value = factor / measured.value;
  // The ends of the interval are carried over; where the far end would pass zero, the slope serves.
  if (measured.plus) out.minus = out.value - factor / (measured.value + *measured.plus);
  if (measured.minus) {
    const double near_zero = measured.value - *measured.minus;
    const bool crosses = near_zero <= 0;
    out.plus = crosses ? out.value / measured.value * *measured.minus : factor / near_zero - out.value;
  }
  if (!measured.plus) out.minus.reset();
  if (!measured.minus) out.plus.reset();
  if (measured.limit == LimitMark::upper) out.limit = LimitMark::lower;
  if (measured.limit == LimitMark::lower) out.limit = LimitMark::upper;
  return out;
}

std::optional<double> scaled(const std::optional<double>& half_width, double factor) {
  return half_width ? std::optional(*half_width * factor) : std::nullopt;
}

}  // namespace

std::optional<Conversion> conversion(Quantity quantity, std::string_view unit) {
  unit = words::trimmed(unit);
  if (unit.empty()) return is_numeric(quantity) ? std::optional(Conversion{}) : std::nullopt;
  if (quantity == Quantity::log_luminosity || quantity == Quantity::log_g) return log_conversion(quantity, unit);
  const auto dimension = dimension_of(quantity);
  if (!dimension) return std::nullopt;
  if (const auto size = unit_size(*dimension, unit)) {
    return Conversion{ConversionKind::factor, *size / canonical_size(quantity, *dimension)};
  }
  return quantity == Quantity::distance ? parallax_as_distance(unit) : std::nullopt;
}

Measured convert(const Measured& measured, const Conversion& conversion) {
  Measured out = measured;
  switch (conversion.kind) {
    case ConversionKind::reciprocal: return reciprocal(measured, conversion.number);
    case ConversionKind::offset: out.value += conversion.number; break;
    case ConversionKind::factor:
      out.value *= conversion.number;
      out.minus = scaled(measured.minus, conversion.number);
      out.plus = scaled(measured.plus, conversion.number);
  }
  return out;
}

}  // namespace hz
