#include "unit_table.hpp"

#include <array>
#include <charconv>
#include <span>

#include "hz/constants.hpp"
#include "words.hpp"

namespace hz {
namespace {

using namespace constants;
using enum Dimension;

// CODATA 2018; only for masses in kg and g, where G does not cancel.
constexpr double gravitation_m3_kg_s2 = 6.67430e-11;
constexpr double year = julian_year_d;
constexpr double parsec = parsec_in_au * au_m;
constexpr double light_year = parsec / parsec_in_light_years;
constexpr double degree = 3.6e6;
constexpr double radian = 180.0 / pi * degree;

struct Unit {
  std::string_view spelling;
  Dimension dimension;
  double size;
};

// Symbols, where case matters: VOUnits 1.1, FITS 4.0, CDS, astropy and the habits of printed tables. Powers are written
// without sign ("m.s-1"); see normalised().
constexpr auto symbols = std::to_array<Unit>({
    {"m", length, 1},
    {"km", length, 1e3},
    {"cm", length, 1e-2},
    {"AU", length, au_m},
    {"au", length, au_m},
    {"a.u.", length, au_m},
    {"A.U.", length, au_m},
    {"ua", length, au_m},
    {"pc", length, parsec},
    {"kpc", length, 1e3 * parsec},
    {"Mpc", length, 1e6 * parsec},
    {"lyr", length, light_year},
    {"ly", length, light_year},
    {"solRad", length, solar_radius_m},
    {"Rsun", length, solar_radius_m},
    {"RSun", length, solar_radius_m},
    {"Rsol", length, solar_radius_m},
    {"Rs", length, solar_radius_m},
    {"Ro", length, solar_radius_m},
    {"earthRad", length, earth_radius_m},
    {"Rearth", length, earth_radius_m},
    {"REarth", length, earth_radius_m},
    {"Rgeo", length, earth_radius_m},
    {"RE", length, earth_radius_m},
    {"Re", length, earth_radius_m},
    {"jupiterRad", length, jupiter_radius_m},
    {"Rjup", length, jupiter_radius_m},
    {"RJup", length, jupiter_radius_m},
    {"Rjupiter", length, jupiter_radius_m},
    {"RJupiter", length, jupiter_radius_m},
    {"RJ", length, jupiter_radius_m},
    {"Rj", length, jupiter_radius_m},
    {"jovRad", length, jupiter_radius_m},

    {"kg", mass, gravitation_m3_kg_s2},
    {"g", mass, 1e-3 * gravitation_m3_kg_s2},
    // The stand-in for an Earth mass where a format has no word for it: the very unit, whatever digits of G it was made
    // with.
    {"5.9722E24kg", mass, earth_gm_m3_s2},
    {"solMass", mass, solar_gm_m3_s2},
    {"Msun", mass, solar_gm_m3_s2},
    {"MSun", mass, solar_gm_m3_s2},
    {"Msol", mass, solar_gm_m3_s2},
    {"Ms", mass, solar_gm_m3_s2},
    {"Mo", mass, solar_gm_m3_s2},
    {"earthMass", mass, earth_gm_m3_s2},
    {"Mearth", mass, earth_gm_m3_s2},
    {"MEarth", mass, earth_gm_m3_s2},
    {"geoMass", mass, earth_gm_m3_s2},
    {"Mgeo", mass, earth_gm_m3_s2},
    {"ME", mass, earth_gm_m3_s2},
    {"Me", mass, earth_gm_m3_s2},
    {"jupiterMass", mass, jupiter_gm_m3_s2},
    {"Mjup", mass, jupiter_gm_m3_s2},
    {"MJup", mass, jupiter_gm_m3_s2},
    {"Mjupiter", mass, jupiter_gm_m3_s2},
    {"MJupiter", mass, jupiter_gm_m3_s2},
    {"jovMass", mass, jupiter_gm_m3_s2},
    {"MJ", mass, jupiter_gm_m3_s2},
    {"Mj", mass, jupiter_gm_m3_s2},

    {"d", time, 1},
    {"D", time, 1},
    {"h", time, 1.0 / 24},
    {"hr", time, 1.0 / 24},
    {"hrs", time, 1.0 / 24},
    {"min", time, 1.0 / 1440},
    {"s", time, 1 / day_s},
    {"sec", time, 1 / day_s},
    {"yr", time, year},
    {"yrs", time, year},
    {"a", time, year},
    {"y", time, year},
    {"kyr", time, 1e3 * year},
    {"Myr", time, 1e6 * year},
    {"Gyr", time, 1e9 * year},
    {"Gyrs", time, 1e9 * year},
    {"Ga", time, 1e9 * year},
    {"Ma", time, 1e6 * year},

    {"solLum", power, solar_luminosity_w},
    {"Lsun", power, solar_luminosity_w},
    {"LSun", power, solar_luminosity_w},
    {"Lsol", power, solar_luminosity_w},
    {"Ls", power, solar_luminosity_w},
    {"Lo", power, solar_luminosity_w},
    {"L/Lsun", power, solar_luminosity_w},
    {"L/LSun", power, solar_luminosity_w},
    {"W", power, 1},
    {"erg/s", power, 1e-7},
    {"erg.s-1", power, 1e-7},

    {"K", temperature, 1},
    {"kK", temperature, 1e3},

    {"g.cm-3", density, 1},
    {"g/cm3", density, 1},
    {"g/cc", density, 1},
    {"kg.m-3", density, 1e-3},
    {"kg/m3", density, 1e-3},
    {"cgs", density, 1},

    {"mas", angle, 1},
    {"uas", angle, 1e-3},
    {"µas", angle, 1e-3},
    {"μas", angle, 1e-3},
    {"arcsec", angle, 1e3},
    {"as", angle, 1e3},
    {"\"", angle, 1e3},
    {"arcmin", angle, 6e4},
    {"deg", angle, degree},
    {"°", angle, degree},
    {"rad", angle, radian},

    {"mag", magnitude, 1},
    {"mmag", magnitude, 1e-3},
    {"dex", abundance, 1},
    {"[Fe/H]", abundance, 1},
    {"dex(solar)", abundance, 1},
    {"[-]", abundance, 1},
    {"[Sun]", abundance, 1},

    {"m.s-1", speed, 1},
    {"m/s", speed, 1},
    {"km.s-1", speed, 1e3},
    {"km/s", speed, 1e3},
    {"cm.s-1", speed, 1e-2},
    {"cm/s", speed, 1e-2},

    {"W.m-2", flux, 1},
    {"W/m2", flux, 1},
    {"kW.m-2", flux, 1e3},
    {"kW/m2", flux, 1e3},
    {"erg.s-1.cm-2", flux, 1e-3},
    {"erg.cm-2.s-1", flux, 1e-3},
    {"erg/s/cm2", flux, 1e-3},
    {"erg/cm2/s", flux, 1e-3},
    {"erg/(s.cm2)", flux, 1e-3},
    {"erg/(cm2.s)", flux, 1e-3},
    {"Searth", flux, solar_irradiance_w_m2},
    {"SEarth", flux, solar_irradiance_w_m2},
    {"SE", flux, solar_irradiance_w_m2},
    {"Se", flux, solar_irradiance_w_m2},
    {"S0", flux, solar_irradiance_w_m2},
    {"Fearth", flux, solar_irradiance_w_m2},
    {"FEarth", flux, solar_irradiance_w_m2},
    {"FE", flux, solar_irradiance_w_m2},
    {"Iearth", flux, solar_irradiance_w_m2},

    {"1", ratio, 1},
    {"-", ratio, 1},
    {"---", ratio, 1},
    {"%", ratio, 1e-2},
    {"ppt", ratio, 1e-3},
    {"ppm", ratio, 1e-6},
    {"ppb", ratio, 1e-9},

    {"cm.s-2", acceleration, 1},
    {"cm/s2", acceleration, 1},
    {"cm/s/s", acceleration, 1},
    {"cgs", acceleration, 1},
    {"m.s-2", acceleration, 100},
    {"m/s2", acceleration, 100},
    {"m/s/s", acceleration, 100},
    {"SI", acceleration, 100},
});

// Words in any case, folded as headers are.
constexpr auto unit_words = std::to_array<Unit>({
    {"meter", length, 1},
    {"meters", length, 1},
    {"metre", length, 1},
    {"metres", length, 1},
    {"kilometer", length, 1e3},
    {"kilometers", length, 1e3},
    {"kilometre", length, 1e3},
    {"kilometres", length, 1e3},
    {"astronomicalunit", length, au_m},
    {"astronomicalunits", length, au_m},
    {"parsec", length, parsec},
    {"parsecs", length, parsec},
    {"kiloparsec", length, 1e3 * parsec},
    {"kiloparsecs", length, 1e3 * parsec},
    {"lightyear", length, light_year},
    {"lightyears", length, light_year},
    {"lightyr", length, light_year},
    {"lightyrs", length, light_year},
    {"solarradius", length, solar_radius_m},
    {"solarradii", length, solar_radius_m},
    {"solarrad", length, solar_radius_m},
    {"sunradius", length, solar_radius_m},
    {"sunradii", length, solar_radius_m},
    {"solar", length, solar_radius_m},
    {"sun", length, solar_radius_m},
    {"rodot", length, solar_radius_m},
    {"earthradius", length, earth_radius_m},
    {"earthradii", length, earth_radius_m},
    {"earth", length, earth_radius_m},
    {"terrestrialradius", length, earth_radius_m},
    {"terrestrialradii", length, earth_radius_m},
    {"roplus", length, earth_radius_m},
    {"jupiterradius", length, jupiter_radius_m},
    {"jupiterradii", length, jupiter_radius_m},
    {"jovianradius", length, jupiter_radius_m},
    {"jovianradii", length, jupiter_radius_m},
    {"jupiter", length, jupiter_radius_m},
    {"jovian", length, jupiter_radius_m},
    {"jup", length, jupiter_radius_m},

    {"kilogram", mass, gravitation_m3_kg_s2},
    {"kilograms", mass, gravitation_m3_kg_s2},
    {"solarmass", mass, solar_gm_m3_s2},
    {"solarmasses", mass, solar_gm_m3_s2},
    {"sunmass", mass, solar_gm_m3_s2},
    {"sunmasses", mass, solar_gm_m3_s2},
    {"solar", mass, solar_gm_m3_s2},
    {"sun", mass, solar_gm_m3_s2},
    {"modot", mass, solar_gm_m3_s2},
    {"earthmass", mass, earth_gm_m3_s2},
    {"earthmasses", mass, earth_gm_m3_s2},
    {"terrestrialmass", mass, earth_gm_m3_s2},
    {"terrestrialmasses", mass, earth_gm_m3_s2},
    {"earth", mass, earth_gm_m3_s2},
    {"moplus", mass, earth_gm_m3_s2},
    {"jupitermass", mass, jupiter_gm_m3_s2},
    {"jupitermasses", mass, jupiter_gm_m3_s2},
    {"jovianmass", mass, jupiter_gm_m3_s2},
    {"jovianmasses", mass, jupiter_gm_m3_s2},
    {"jupiter", mass, jupiter_gm_m3_s2},
    {"jovian", mass, jupiter_gm_m3_s2},
    {"jup", mass, jupiter_gm_m3_s2},

    {"day", time, 1},
    {"days", time, 1},
    {"hour", time, 1.0 / 24},
    {"hours", time, 1.0 / 24},
    {"minute", time, 1.0 / 1440},
    {"minutes", time, 1.0 / 1440},
    {"second", time, 1 / day_s},
    {"seconds", time, 1 / day_s},
    {"year", time, year},
    {"years", time, year},
    {"myr", time, 1e6 * year},
    {"gyr", time, 1e9 * year},
    {"gigayear", time, 1e9 * year},
    {"gigayears", time, 1e9 * year},
    {"megayear", time, 1e6 * year},
    {"megayears", time, 1e6 * year},

    {"solarluminosity", power, solar_luminosity_w},
    {"solarluminosities", power, solar_luminosity_w},
    {"solarlum", power, solar_luminosity_w},
    {"sunluminosity", power, solar_luminosity_w},
    {"solar", power, solar_luminosity_w},
    {"sun", power, solar_luminosity_w},
    {"lodot", power, solar_luminosity_w},
    {"watt", power, 1},
    {"watts", power, 1},

    {"kelvin", temperature, 1},
    {"kelvins", temperature, 1},
    {"degk", temperature, 1},
    {"degree", angle, degree},
    {"degrees", angle, degree},
    {"degs", angle, degree},
    {"arcsecond", angle, 1e3},
    {"arcseconds", angle, 1e3},
    {"milliarcsecond", angle, 1},
    {"milliarcseconds", angle, 1},
    {"milliarcsec", angle, 1},
    {"microarcsecond", angle, 1e-3},
    {"microarcseconds", angle, 1e-3},
    {"radian", angle, radian},
    {"radians", angle, radian},
    {"magnitude", magnitude, 1},
    {"magnitudes", magnitude, 1},
    {"mags", magnitude, 1},
    {"earthflux", flux, solar_irradiance_w_m2},
    {"earth", flux, solar_irradiance_w_m2},
    {"earthinsolation", flux, solar_irradiance_w_m2},
    {"solarconstant", flux, solar_irradiance_w_m2},
    {"solarconstants", flux, solar_irradiance_w_m2},
    {"percent", ratio, 1e-2},
    {"dimensionless", ratio, 1},
    {"fraction", ratio, 1},
    {"none", ratio, 1},
    {"unitless", ratio, 1},
});

// `m s^{-1}`, `m.s**-1`, `m s-1` and `m*s-1` all become `m.s-1`; `R_sun` and `R☉` become `Rsun`.
std::string normalised(std::string_view unit) {
  static constexpr std::array<std::pair<std::string_view, std::string_view>, 20> steps{{
      {"**", ""}, {"^", ""},    {"{", ""},    {"}", ""},      {"$", ""},    {"\\", ""}, {"_", ""},
      {"⋆", ""},  {"☉", "sun"}, {"⊙", "sun"}, {"⊕", "earth"}, {"♃", "jup"}, {"⁻", "-"}, {"²", "2"},
      {"³", "3"}, {"¹", "1"},   {"*", "."},   {"·", "."},     {"−", "-"},   {" ", "."},
  }};
  std::string out(unit);
  for (const auto& [from, to] : steps) out = words::replaced(out, from, to);
  return out;
}

std::optional<double> size_of(std::span<const Unit> table, Dimension dimension, std::string_view spelling) {
  for (const Unit& unit : table) {
    if (unit.dimension == dimension && unit.spelling == spelling) return unit.size;
  }
  return std::nullopt;
}

std::optional<double> plain_size(Dimension dimension, std::string_view unit) {
  if (const auto size = size_of(symbols, dimension, unit)) return size;
  if (const auto size = size_of(symbols, dimension, normalised(unit))) return size;
  return size_of(unit_words, dimension, words::folded(unit));
}

}  // namespace

std::optional<double> unit_size(Dimension dimension, std::string_view unit) {
  unit = words::trimmed(unit);
  if (const auto size = plain_size(dimension, unit)) return size;
  double scale = 1;
  const auto [end, error] = std::from_chars(unit.data(), unit.data() + unit.size(), scale);
  if (error != std::errc{} || end == unit.data() || scale <= 0) return std::nullopt;
  const auto size = plain_size(dimension, words::trimmed(unit.substr(static_cast<std::size_t>(end - unit.data()))));
  return size ? std::optional(scale * *size) : std::nullopt;
}

}  // namespace hz
