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

constexpr auto log_wrappers = std::to_array<std::pair<std::string_view, std::string_view>>(
    {{"log(", ")"}, {"log10(", ")"}, {"lg(", ")"}, {"dex(", ")"}, {"[", "]"}});

// What `log(...)`, `log10(...)`, `lg(...)`, `dex(...)` or `[...]` holds; nullopt without one of them.
std::optional<std::string_view> inside_log(std::string_view unit) {
  for (const auto& [open, close] : log_wrappers) {
    if (!unit.starts_with(open) || !unit.ends_with(close)) continue;
    return words::trimmed(unit.substr(open.size(), unit.size() - open.size() - close.size()));
  }
  return std::nullopt;
}

std::string_view unwrapped(std::string_view unit) { return inside_log(unit).value_or(unit); }

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

// The logarithm of something that is wanted itself, called so in letters: "[K]" is too often meant as K. That of a
// luminosity is a quantity of its own.
std::optional<Conversion> antilog(Quantity quantity, Dimension dimension, std::string_view unit) {
  if (quantity == Quantity::luminosity || unit.starts_with('[')) return std::nullopt;
  const auto inside = inside_log(unit);
  const auto size = inside ? unit_size(dimension, *inside) : std::nullopt;
  if (!size) return std::nullopt;
  return Conversion{ConversionKind::antilog, *size / canonical_size(quantity, dimension)};
}

std::optional<Conversion> dimming(std::string_view unit) {
  const auto magnitudes = unit_size(Dimension::magnitude, unit);
  if (!magnitudes) return std::nullopt;
  return Conversion{ConversionKind::dimming, *magnitudes};
}

constexpr double ln_10 = 2.302585092994045684;

// The ends of the interval are carried over.
Measured bent(const Measured& measured, const Conversion& conversion) {
  Measured out = measured;
  out.value = convert(measured.value, conversion);
  if (measured.plus) out.plus = convert(measured.value + *measured.plus, conversion) - out.value;
  if (measured.minus) out.minus = out.value - convert(measured.value - *measured.minus, conversion);
  return out;
}

LimitMark turned(LimitMark mark) {
  if (mark == LimitMark::none) return mark;
  return mark == LimitMark::upper ? LimitMark::lower : LimitMark::upper;
}

Measured reciprocal(const Measured& measured, const Conversion& conversion) {
  Measured out = measured;
  out.value = convert(measured.value, conversion);
  out.minus.reset();
  out.plus.reset();
  if (measured.plus) out.minus = out.value - convert(measured.value + *measured.plus, conversion);
  // Where the far end would pass zero, the slope serves.
  const double near_zero = measured.value - measured.minus.value_or(0);
  if (measured.minus) {
    out.plus =
        near_zero > 0 ? convert(near_zero, conversion) - out.value : out.value / measured.value * *measured.minus;
  }
  out.limit = turned(measured.limit);
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
  if (quantity == Quantity::distance) {
    if (const auto parallax = parallax_as_distance(unit)) return parallax;
  }
  if (quantity == Quantity::transit_depth) {
    if (const auto magnitudes = dimming(unit)) return magnitudes;
  }
  return antilog(quantity, *dimension, unit);
}

double convert(double value, const Conversion& conversion) {
  switch (conversion.kind) {
    case ConversionKind::factor: return value * conversion.number;
    case ConversionKind::offset: return value + conversion.number;
    case ConversionKind::reciprocal: HZ_REQUIRE(value > 0); return conversion.number / value;
    case ConversionKind::antilog: return conversion.number * std::pow(10.0, value);
    case ConversionKind::dimming: return -std::expm1(-0.4 * ln_10 * conversion.number * value);
  }
  return value;
}

double convert_back(double canonical, const Conversion& conversion) {
  switch (conversion.kind) {
    case ConversionKind::factor: return canonical / conversion.number;
    case ConversionKind::offset: return canonical - conversion.number;
    case ConversionKind::reciprocal: return conversion.number / canonical;
    case ConversionKind::antilog: return std::log10(canonical / conversion.number);
    case ConversionKind::dimming: return std::log1p(-canonical) / (-0.4 * ln_10 * conversion.number);
  }
  return canonical;
}

Measured convert(const Measured& measured, const Conversion& conversion) {
  if (conversion.kind == ConversionKind::reciprocal) return reciprocal(measured, conversion);
  const bool is_straight = conversion.kind == ConversionKind::factor || conversion.kind == ConversionKind::offset;
  if (!is_straight) return bent(measured, conversion);
  Measured out = measured;
  out.value = convert(measured.value, conversion);
  if (conversion.kind == ConversionKind::offset) return out;
  out.minus = scaled(measured.minus, conversion.number);
  out.plus = scaled(measured.plus, conversion.number);
  return out;
}

}  // namespace hz
