#include "hz/extinction.hpp"

#include <optional>
#include <string_view>

#include "hz/require.hpp"
#include "toml_table.hpp"

namespace hz {
namespace embedded {
extern const std::string_view extinction;
}  // namespace embedded

namespace {

struct Extinction {
  double r_v = 0;              // A_V / E(B-V)
  double g = 0, j = 0, k = 0;  // A_band / A_V
  double g_per_bp_rp = 0;      // A_G / E(BP-RP)
};

/// `value` of the list's table that has this name.
double value_of(const TomlTable& file, std::string_view list, Quantity quantity, std::string_view value) {
  for (const toml::node& node : file.tables(list)) {
    const TomlTable entry(node, "extinction.toml", "an entry");
    entry.allow_only({"name", value, "citation", "provenance"});
    if (entry.text("name") == name(quantity)) return entry.number(value);
  }
  file.fail(list, "extinction.toml lacks an entry; add it");
}

Extinction read_extinction() {
  const toml::table root = parse_toml(embedded::extinction, "extinction.toml");
  const TomlTable file(root, "extinction.toml", "the file");
  file.allow_only({"r_v", "band", "color"});
  const auto band = [&file](Quantity quantity) { return value_of(file, "band", quantity, "per_extinction_v"); };
  return {file.number("r_v"), band(Quantity::magnitude_g), band(Quantity::magnitude_j), band(Quantity::magnitude_k),
          value_of(file, "color", Quantity::color_bp_rp, "extinction_g_per_excess")};
}

const Extinction& extinction() {
  static const Extinction read = read_extinction();
  return read;
}

}  // namespace

double extinction_ratio(Quantity magnitude) {
  switch (magnitude) {
    case Quantity::magnitude_b: return 1 + 1 / extinction().r_v;
    case Quantity::magnitude_v: return 1;
    case Quantity::magnitude_g: return extinction().g;
    case Quantity::magnitude_j: return extinction().j;
    case Quantity::magnitude_k: return extinction().k;
    default: break;
  }
  HZ_REQUIRE(!"the extinction in this band is known");
  return 0;
}

double color_excess_ratio(Quantity color) {
  switch (color) {
    case Quantity::color_bv: return 1 / extinction().r_v;
    case Quantity::color_vj: return 1 - extinction().j;
    case Quantity::color_vk: return 1 - extinction().k;
    case Quantity::color_bp_rp: return extinction().g / extinction().g_per_bp_rp;
    default: break;
  }
  HZ_REQUIRE(!"the reddening of this colour is known");
  return 0;
}

}  // namespace hz
