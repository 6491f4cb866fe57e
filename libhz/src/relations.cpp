#include "hz/relations.hpp"

#include <toml++/toml.h>

#include <algorithm>
#include <charconv>
#include <cmath>
#include <string_view>
#include <vector>

#include "hz/require.hpp"

namespace hz {
namespace embedded {
extern const std::string_view planet_mass_radius;
extern const std::string_view main_sequence;
}  // namespace embedded

namespace {

/// R = prefactor M^exponent up to mass_below, in Earth units.
struct MassRadiusPiece {
  double mass_below = 0;
  double prefactor = 0;
  double exponent = 0;
  double scatter = 0;

  [[nodiscard]] double log_mass(double radius) const { return std::log10(radius / prefactor) / exponent; }
};

double number(const toml::node& node, std::string_view key) {
  const std::optional<double> value = node.as_table()->at(key).value<double>();
  HZ_REQUIRE(value);
  return *value;
}

std::vector<MassRadiusPiece> read_pieces() {
  const toml::table table = toml::parse(embedded::planet_mass_radius);
  std::vector<MassRadiusPiece> pieces;
  for (const toml::node& node : *table["piece"].as_array()) {
    pieces.push_back({number(node, "mass_below"), number(node, "prefactor"), number(node, "exponent"),
                      number(node, "scatter_percent") / 100});
  }
  return pieces;
}

const std::vector<MassRadiusPiece>& pieces() {
  static const std::vector<MassRadiusPiece> read = read_pieces();
  return read;
}

/// The piece a radius lies on: the first whose upper break it does not pass.
const MassRadiusPiece& piece_of(double radius) {
  for (const MassRadiusPiece& piece : pieces()) {
    if (piece.log_mass(radius) < std::log10(piece.mass_below)) return piece;
  }
  return pieces().back();
}

double log_mass(double radius) {
  const MassRadiusPiece& piece = piece_of(radius);
  return std::min(piece.log_mass(radius), std::log10(piece.mass_below));
}

struct MainSequenceRow {
  double teff = 0;
  double radius = 0;
};

/// Column `index` of a comma-separated line as a number.
double cell(std::string_view line, int index) {
  for (; index > 0; --index) line.remove_prefix(line.find(',') + 1);
  double value = 0;
  const auto [end, error] = std::from_chars(line.data(), line.data() + line.size(), value);
  HZ_REQUIRE(error == std::errc());
  return value;
}

/// Rows by rising Teff. Columns 1 and 3 of the table are Teff and radius.
std::vector<MainSequenceRow> read_main_sequence() {
  std::vector<MainSequenceRow> rows;
  bool header = true;
  for (std::string_view rest = embedded::main_sequence; !rest.empty();) {
    const std::string_view line = rest.substr(0, rest.find('\n'));
    rest.remove_prefix(std::min(rest.size(), line.size() + 1));
    if (line.empty() || line.front() == '#') continue;
    if (!header) rows.push_back({cell(line, 1), cell(line, 3)});
    header = false;
  }
  std::sort(rows.begin(), rows.end(), [](const auto& a, const auto& b) { return a.teff < b.teff; });
  return rows;
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
    const double slope = pieces().back().exponent * std::log(10.0);
    result.minus = wide(planet_radius.minus) / slope;
    result.plus = wide(planet_radius.plus) / slope;
  }
  return result;
}

std::optional<double> main_sequence_radius(double teff) {
  static const std::vector<MainSequenceRow> rows = read_main_sequence();
  if (teff < rows.front().teff || teff > rows.back().teff) return std::nullopt;
  const auto above = std::lower_bound(rows.begin() + 1, rows.end() - 1, teff,
                                      [](const MainSequenceRow& row, double t) { return row.teff < t; });
  const auto below = above - 1;
  const double part = (teff - below->teff) / (above->teff - below->teff);
  return below->radius + part * (above->radius - below->radius);
}

}  // namespace hz
