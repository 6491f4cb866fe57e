#include "one_star_options.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "hz/error.hpp"
#include "hz/measured_text.hpp"
#include "hz/units.hpp"

namespace hz::app {
namespace {

constexpr Option value_option(std::string_view name, std::string_view placeholder, std::string_view help) {
  return {name, '\0', OptionKind::value, placeholder, OptionGroup::input, help};
}

constexpr auto star_table = std::to_array<Option>({
    value_option("name", "NAME", "what to call it"),
    value_option("teff", "K", "effective temperature of the star"),
    value_option("luminosity", "LSUN", "bolometric luminosity, in solar luminosities"),
    value_option("log-luminosity", "DEX", "its decadic logarithm"),
    value_option("stellar-radius", "RSUN", "radius of the star; with Teff it gives the luminosity"),
    value_option("stellar-mass", "MSUN", "mass of the star; with it periods and distances become one another"),
    value_option("log-g", "DEX", "surface gravity of the star (cgs); it tells evolved stars"),
    value_option("distance", "PC", "distance of the star from us; it gives angles on the sky"),
});

constexpr auto planet_table = std::to_array<Option>({
    value_option("period", "DAYS", "orbital period; needs the stellar mass"),
    value_option("semi-major-axis", "AU", "semi-major axis of the orbit"),
    value_option("scaled-semi-major-axis", "RATIO", "semi-major axis divided by the stellar radius"),
    value_option("eccentricity", "E", "orbital eccentricity"),
    value_option("insolation", "S", "orbit-averaged insolation, Earth = 1"),
    value_option("planet-radius", "REARTH", "radius of the planet, in Earth radii"),
    value_option("planet-mass", "MEARTH", "mass of the planet, in Earth masses"),
    value_option("min-mass", "MEARTH", "minimum mass (m sin i), in Earth masses"),
});

struct StarValue {
  std::string_view option;
  Quantity quantity;
  Field StarRecord::*field;
};
constexpr auto star_values = std::to_array<StarValue>({
    {"teff", Quantity::teff, &StarRecord::teff},
    {"luminosity", Quantity::luminosity, &StarRecord::luminosity},
    {"log-luminosity", Quantity::log_luminosity, &StarRecord::log_luminosity},
    {"stellar-radius", Quantity::stellar_radius, &StarRecord::stellar_radius},
    {"stellar-mass", Quantity::stellar_mass, &StarRecord::stellar_mass},
    {"log-g", Quantity::log_g, &StarRecord::log_g},
    {"distance", Quantity::distance, &StarRecord::distance},
});

struct PlanetValue {
  std::string_view option;
  Quantity quantity;
  Field PlanetRecord::*field;
};
constexpr auto planet_values = std::to_array<PlanetValue>({
    {"period", Quantity::orbital_period, &PlanetRecord::orbital_period},
    {"semi-major-axis", Quantity::semi_major_axis, &PlanetRecord::semi_major_axis},
    {"scaled-semi-major-axis", Quantity::scaled_semi_major_axis, &PlanetRecord::scaled_semi_major_axis},
    {"eccentricity", Quantity::eccentricity, &PlanetRecord::eccentricity},
    {"insolation", Quantity::insolation, &PlanetRecord::insolation},
    {"planet-radius", Quantity::planet_radius, &PlanetRecord::planet_radius},
    {"planet-mass", Quantity::planet_mass, &PlanetRecord::planet_mass},
    {"min-mass", Quantity::min_mass, &PlanetRecord::min_mass},
});

/// Reads the values of `table` that are given into `record`; whether there was any.
template <class Record, class Table>
bool read_values(const Arguments& arguments, const Table& table, Record& record) {
  bool any = false;
  for (const auto& [option, quantity, field] : table) {
    if (!arguments.knows(option)) continue;
    const std::optional<std::string> text = arguments.value(option);
    if (!text) continue;
    (record.*field).stated = typed_value(option, quantity, *text);
    any = true;
  }
  return any;
}

}  // namespace

std::span<const Option> star_value_options() { return star_table; }
std::span<const Option> planet_value_options() { return planet_table; }

Measured typed_value(std::string_view option, Quantity quantity, const std::string& text) {
  const Result<MeasuredText> read = parse_measured(text, option);
  if (!read) {
    const std::string hint = comma_hint(text);
    throw Error(Fault::usage,
                fmt::format("--{} cannot be read from `{}`{}", option, text,
                            hint.empty() ? "; write it like 4410, 4410+-70, 4410+80-60, 0.165(9) or <0.3" : hint));
  }
  const std::optional<Conversion> to_canonical = read->unit.empty() ? Conversion{} : conversion(quantity, read->unit);
  if (!to_canonical)
    throw Error(Fault::usage, fmt::format("--{} has an unknown unit `{}` in `{}`; without a unit it is in {}", option,
                                          read->unit, text, info(quantity).unit));
  if (to_canonical->kind == ConversionKind::reciprocal && read->measured.value <= 0)
    throw Error(Fault::usage,
                fmt::format("--{} is a parallax in `{}`, and one that is not above 0 gives no distance", option, text));
  Measured measured = convert(read->measured, *to_canonical);
  measured.exact = !measured.minus && !measured.plus && measured.limit == LimitMark::none;
  return measured;
}

bool has_typed_values(const Arguments& arguments) {
  const auto given = [&](const Option& option) {
    return option.name != "name" && arguments.knows(option.name) && arguments.has(option.name);
  };
  return std::any_of(star_table.begin(), star_table.end(), given) ||
         std::any_of(planet_table.begin(), planet_table.end(), given);
}

ListRow typed_row(const Arguments& arguments) {
  ListRow row;
  row.number = 1;
  read_values(arguments, star_values, row.star);
  const bool has_planet = read_values(arguments, planet_values, row.planet);
  const std::string name = arguments.value("name").value_or("");
  if (has_planet) {
    row.planet.name = name.empty() ? "planet" : name;
  } else {
    row.star.name = name;
  }
  return row;
}

}  // namespace hz::app
