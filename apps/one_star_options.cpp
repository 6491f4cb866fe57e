#include "one_star_options.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "hz/error.hpp"
#include "hz/measured_text.hpp"
#include "hz/require.hpp"
#include "hz/spectral_type.hpp"
#include "hz/units.hpp"

namespace hz::app {
namespace {

constexpr Option value_option(std::string_view name, std::string_view placeholder, std::string_view help) {
  return {name, '\0', OptionKind::value, placeholder, OptionGroup::input, help};
}

/// A spelling that nobody could read is refused at once, unlike in a list.
std::string typed_type(const std::string& text) {
  const Result<SpectralType> read = read_spectral_type(text);
  if (!read) throw Error(Fault::usage, "--spectral-type: " + read.error().what);
  return text;
}

constexpr auto star_table = std::to_array<Option>({
    value_option("name", "NAME", "what to call it"),
    value_option("teff", "K", "effective temperature of the star"),
    value_option("luminosity", "LSUN", "bolometric luminosity, in solar luminosities"),
    value_option("log-luminosity", "DEX", "its decadic logarithm"),
    value_option("stellar-radius", "RSUN", "radius of the star; with Teff it gives the luminosity"),
    value_option("stellar-mass", "MSUN", "mass of the star; with it periods and distances become one another"),
    value_option("log-g", "DEX", "surface gravity of the star (cgs); it tells evolved stars"),
    value_option("stellar-density", "G/CM3", "mean density of the star"),
    value_option("spectral-type", "TYPE", "MK spectral type, such as M4.5V"),
    value_option("parallax", "MAS", "trigonometric parallax"),
    value_option("distance", "PC", "distance of the star from us; it gives angles on the sky"),
    value_option("magnitude-v", "MAG", "apparent magnitudes: Johnson V, with distance or parallax"),
    value_option("magnitude-b", "MAG", "Johnson B"),
    value_option("magnitude-g", "MAG", "Gaia G"),
    value_option("magnitude-bp", "MAG", "Gaia BP"),
    value_option("magnitude-rp", "MAG", "Gaia RP"),
    value_option("magnitude-j", "MAG", "J"),
    value_option("magnitude-k", "MAG", "Ks"),
    value_option("magnitude-bol", "MAG", "bolometric, IAU 2015 B2 zero point"),
    value_option("color-bv", "MAG", "colours: B-V"),
    value_option("color-vk", "MAG", "V-Ks"),
    value_option("color-vj", "MAG", "V-J"),
    value_option("color-bp-rp", "MAG", "BP-RP"),
    value_option("extinction-v", "MAG", "extinction A_V, taken off magnitudes and colours"),
    value_option("reddening-bv", "MAG", "reddening E(B-V); A_V is 3.1 times it"),
    value_option("number-of-stars", "N", "stars in the system"),
    value_option("companion-separation", "ARCSEC", "angle on the sky to the nearest companion star"),
});

constexpr auto planet_table = std::to_array<Option>({
    value_option("period", "DAYS", "orbital period; needs a stellar mass"),
    value_option("semi-major-axis", "AU", "semi-major axis of the orbit"),
    value_option("scaled-semi-major-axis", "RATIO", "semi-major axis divided by the stellar radius"),
    value_option("eccentricity", "E", "orbital eccentricity"),
    value_option("inclination", "DEG", "orbital inclination; with it a minimum mass becomes a mass"),
    value_option("insolation", "S", "orbit-averaged insolation, Earth = 1"),
    value_option("planet-radius", "REARTH", "radius of the planet, in Earth radii"),
    value_option("radius-ratio", "RATIO", "planet radius divided by stellar radius"),
    value_option("transit-depth", "SHARE", "depth of the transit; 700ppm is understood"),
    value_option("planet-mass", "MEARTH", "mass of the planet, in Earth masses"),
    value_option("min-mass", "MEARTH", "minimum mass (m sin i), in Earth masses"),
});

/// The quantity an option states: its canonical name is the option's with other dashes.
Quantity quantity_of(std::string_view option) {
  if (option == "period") return Quantity::orbital_period;
  std::string name(option);
  std::replace(name.begin(), name.end(), '-', '_');
  const std::optional<Quantity> quantity = quantity_named(name);
  HZ_REQUIRE(quantity);
  return *quantity;
}

/// Reads the values of `table` that are given into the row; whether there was any.
bool read_values(const Arguments& arguments, std::span<const Option> table, ListRow& row) {
  bool any = false;
  for (const Option& option : table) {
    if (option.name == "name" || !arguments.knows(option.name)) continue;
    const std::optional<std::string> text = arguments.value(option.name);
    if (!text) continue;
    any = true;
    const Quantity quantity = quantity_of(option.name);
    if (quantity == Quantity::spectral_type) {
      row.star.spectral_type = typed_type(*text);
    } else if (quantity == Quantity::number_of_stars) {
      row.star.number_of_stars = static_cast<int>(option_count(option.name, *text, 1));
    } else {
      stated_field(row, quantity)->stated = typed_value(option.name, quantity, *text);
    }
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
  read_values(arguments, star_table, row);
  const bool has_planet = read_values(arguments, planet_table, row);
  const std::string name = arguments.value("name").value_or("");
  if (has_planet) {
    row.planet.name = name.empty() ? "planet" : name;
  } else {
    row.star.name = name;
  }
  return row;
}

}  // namespace hz::app
