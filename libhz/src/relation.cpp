#include "hz/relation.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <iterator>
#include <utility>

#include "hz/require.hpp"
#include "relation_reader.hpp"

namespace hz {
namespace embedded {
extern const std::string_view bolometric_corrections;
extern const std::string_view color_temperature;
extern const std::string_view m_dwarfs;
extern const std::string_view main_sequence_relations;
extern const std::string_view mass_luminosity;
}  // namespace embedded

namespace {

double held(double x, const Range& range) {
  HZ_REQUIRE(!std::isnan(x));
  return std::clamp(x, range.low, range.high);
}

std::vector<Relation> read_all() {
  const std::array<std::pair<std::string_view, const char*>, 5> files = {{
      {embedded::bolometric_corrections, "bolometric_corrections.toml"},
      {embedded::color_temperature, "color_temperature.toml"},
      {embedded::m_dwarfs, "m_dwarfs.toml"},
      {embedded::main_sequence_relations, "main_sequence.toml"},
      {embedded::mass_luminosity, "mass_luminosity.toml"},
  }};
  std::vector<Relation> relations;
  for (const auto& [text, file] : files) {
    std::vector<Relation> of_file = RelationReader(text, file).read();
    std::move(of_file.begin(), of_file.end(), std::back_inserter(relations));
  }
  return relations;
}

}  // namespace

double Relation::operator()(double at) const { return value_(held(at, range_)); }

double Relation::scatter(double at) const { return scatter_(held(at, range_)); }

double Relation::slope(double at) const {
  const double x_held = held(at, range_);
  const auto next = std::upper_bound(breaks_.begin(), breaks_.end(), x_held);
  const double low = next == breaks_.begin() ? range_.low : *std::prev(next);
  const double high = next == breaks_.end() ? range_.high : std::nextafter(*next, low);
  // A relative step of 1e-5 of the range keeps both the rounding of steep polynomials and their curvature below 1e-6.
  const double step = 1e-5 * (range_.high - range_.low);
  const double before = std::max(low, x_held - step);
  const double after = std::min(high, x_held + step);
  return (value_(after) - value_(before)) / (after - before);
}

const Relation& relation(std::string_view key) {
  const std::span<const Relation> all = all_relations();
  const auto found = std::find_if(all.begin(), all.end(), [key](const Relation& r) { return r.key == key; });
  HZ_REQUIRE(found != all.end());
  return *found;
}

std::span<const Relation> all_relations() {
  static const std::vector<Relation> relations = read_all();
  return relations;
}

}  // namespace hz
