// The one list of names that serves input, output, help and code; its words, units and UCDs are data in
// catalogs/columns.csv.
#pragma once
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace hz {

/// Every quantity a list may state. The enumerator is the canonical column name.
// clang-format off
enum class Quantity {
  star, star_id, planet, ra, dec, spectral_type,
  teff, luminosity, log_luminosity, stellar_radius, stellar_mass, stellar_density, parallax, distance,
  magnitude_v, magnitude_b, magnitude_g, magnitude_bp, magnitude_rp, magnitude_j, magnitude_h, magnitude_k, magnitude_bol,
  color_bv, color_vk, color_vj, color_bp_rp, extinction_v, reddening_bv, metallicity, log_g, age,
  orbital_period, semi_major_axis, scaled_semi_major_axis, eccentricity, inclination, arg_periastron,
  planet_radius, radius_ratio, planet_mass, min_mass, transit_depth, rv_semi_amplitude,
  insolation, equilibrium_temperature, bond_albedo,
  number_of_stars, companion_separation, circumbinary, planet_mass_kind, adopted, reference, note,
};
// clang-format on

/// What catalogs/columns.csv says of a quantity (or of a column that only hzmap writes).
struct QuantityInfo {
  std::string name;    // canonical column name
  std::string symbol;  // as the field prints it; may be empty
  std::string unit;    // canonical unit, ECSV spelling; empty when dimensionless or text
  std::string ucd;
  std::vector<std::string> accept;  // header words that mean it, as people write them
  std::string description;
  bool in = false;   // understood on reading
  bool out = false;  // written by hzmap
};

/// All rows of catalogs/columns.csv in file order: quantities, output-only columns; not the X_... patterns.
[[nodiscard]] std::span<const QuantityInfo> all_columns();

[[nodiscard]] const QuantityInfo& info(Quantity quantity);
[[nodiscard]] std::string_view name(Quantity quantity);
[[nodiscard]] std::optional<Quantity> quantity_named(std::string_view canonical_name);

/// Half-widths, limits and routes make sense for it: false for names, kinds, codes and notes.
[[nodiscard]] bool is_numeric(Quantity quantity);

}  // namespace hz
