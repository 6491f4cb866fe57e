#include "hz/relations.hpp"

#include <toml++/toml.h>

#include <algorithm>
#include <cmath>
#include <iterator>
#include <limits>
#include <string_view>
#include <vector>

#include "hz/relation.hpp"
#include "hz/require.hpp"

namespace hz {
namespace embedded {
extern const std::string_view planet_mass_radius;
}  // namespace embedded

namespace {

/// R = prefactor M^exponent up to mass_below, in Earth units.
struct MassRadiusPiece {
  double mass_below = 0;
  double prefactor = 0;
  double exponent = 0;
  double scatter = 0;

  [[nodiscard]] double log_mass(double radius) const { return std::log10(radius / prefactor) / exponent; }
  [[nodiscard]] double log_radius(double mass) const { return std::log10(prefactor) + exponent * std::log10(mass); }
};

double number(const toml::node& node, std::string_view key) {
  const std::optional<double> value = node.as_table()->at(key).value<double>();
  HZ_REQUIRE(value);
  return *value;
}

/// The last piece has no upper end.
double mass_below(const toml::node& node) {
  return node.as_table()->contains("mass_below") ? number(node, "mass_below") : std::numeric_limits<double>::infinity();
}

std::vector<MassRadiusPiece> read_pieces() {
  const toml::table table = toml::parse(embedded::planet_mass_radius);
  std::vector<MassRadiusPiece> pieces;
  for (const toml::node& node : *table["piece"].as_array()) {
    pieces.push_back(
        {mass_below(node), number(node, "prefactor"), number(node, "exponent"), number(node, "scatter_percent") / 100});
  }
  return pieces;
}

const std::vector<MassRadiusPiece>& pieces() {
  static const std::vector<MassRadiusPiece> read = read_pieces();
  return read;
}

/// The piece a mass lies on; a break belongs to the piece above.
const MassRadiusPiece& piece_at(double mass) {
  const auto reaches = [mass](const MassRadiusPiece& piece) { return mass < piece.mass_below; };
  const auto found = std::find_if(pieces().begin(), pieces().end(), reaches);
  return found == pieces().end() ? pieces().back() : *found;
}

double log_radius(double mass) { return piece_at(mass).log_radius(mass); }

/// The piece a radius lies on: the first whose upper break it does not pass. Radii above the last rising piece below
/// the giant planets stay on it.
const MassRadiusPiece& piece_of(double radius) {
  const auto falls = [](const MassRadiusPiece& piece) { return piece.exponent < 0; };
  const auto giants = std::find_if(pieces().begin(), pieces().end(), falls);
  const auto holds = [radius](const MassRadiusPiece& piece) {
    return piece.log_mass(radius) < std::log10(piece.mass_below);
  };
  const auto found = std::find_if(pieces().begin(), giants, holds);
  return found == giants ? *std::prev(giants) : *found;
}

double log_mass(double radius) {
  const MassRadiusPiece& piece = piece_of(radius);
  return std::min(piece.log_mass(radius), std::log10(piece.mass_below));
}

}  // namespace

Measured log_mass_from_radius(const Measured& planet_radius) {
  HZ_REQUIRE(planet_radius.value > 0);
  const double scatter = piece_of(planet_radius.value).scatter;
  const auto wide = [&](const std::optional<double>& half_width) {
    return std::hypot(scatter, half_width.value_or(0) / planet_radius.value);
  };
  const double centre = log_mass(planet_radius.value);
  Measured result;
  result.value = centre;
  result.minus = centre - log_mass(planet_radius.value * std::exp(-wide(planet_radius.minus)));
  // Above the last break the relation cannot be inverted; the side that leans on it takes the other side's width.
  const double above = log_mass(planet_radius.value * std::exp(wide(planet_radius.plus))) - centre;
  result.plus = above > 0 ? above : *result.minus;
  if (!(*result.minus > 0)) {
    const double slope = piece_of(planet_radius.value).exponent * std::log(10.0);
    result.minus = wide(planet_radius.minus) / slope;
    result.plus = wide(planet_radius.plus) / slope;
  }
  return result;
}

Measured log_radius_from_mass(const Measured& planet_mass) {
  HZ_REQUIRE(planet_mass.value > 0);
  const double centre = log_radius(planet_mass.value);
  const double below = log_radius(planet_mass.value * std::exp(-planet_mass.minus.value_or(0) / planet_mass.value));
  const double above = log_radius(planet_mass.value * std::exp(planet_mass.plus.value_or(0) / planet_mass.value));
  const double scatter = piece_at(planet_mass.value).scatter / std::log(10.0);
  Measured result;
  result.value = centre;
  // Of a giant planet the larger mass has the smaller radius.
  result.minus = std::hypot(scatter, centre - std::min({below, centre, above}));
  result.plus = std::hypot(scatter, std::max({below, centre, above}) - centre);
  return result;
}

std::optional<double> main_sequence_radius(double teff) {
  const Relation& radius = relation("radius_teff_pm13");
  if (!(teff >= radius.range().low && teff <= radius.range().high)) return std::nullopt;
  return radius(teff);
}

}  // namespace hz
