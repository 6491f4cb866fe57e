#include "hz/quantity.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <set>
#include <utility>

#include "list_files.hpp"

namespace hz {
namespace {

// The enumerator and its name, spelled out: a row moved or dropped in the catalogue shows here.
#define HZ_NAMED(quantity) std::pair(Quantity::quantity, #quantity)
const std::vector<std::pair<Quantity, std::string>> named{HZ_NAMED(star),
                                                          HZ_NAMED(star_id),
                                                          HZ_NAMED(planet),
                                                          HZ_NAMED(ra),
                                                          HZ_NAMED(dec),
                                                          HZ_NAMED(spectral_type),
                                                          HZ_NAMED(teff),
                                                          HZ_NAMED(luminosity),
                                                          HZ_NAMED(log_luminosity),
                                                          HZ_NAMED(stellar_radius),
                                                          HZ_NAMED(stellar_mass),
                                                          HZ_NAMED(stellar_density),
                                                          HZ_NAMED(parallax),
                                                          HZ_NAMED(distance),
                                                          HZ_NAMED(magnitude_v),
                                                          HZ_NAMED(magnitude_b),
                                                          HZ_NAMED(magnitude_g),
                                                          HZ_NAMED(magnitude_bp),
                                                          HZ_NAMED(magnitude_rp),
                                                          HZ_NAMED(magnitude_j),
                                                          HZ_NAMED(magnitude_h),
                                                          HZ_NAMED(magnitude_k),
                                                          HZ_NAMED(magnitude_bol),
                                                          HZ_NAMED(color_bv),
                                                          HZ_NAMED(color_vk),
                                                          HZ_NAMED(color_vj),
                                                          HZ_NAMED(color_bp_rp),
                                                          HZ_NAMED(extinction_v),
                                                          HZ_NAMED(reddening_bv),
                                                          HZ_NAMED(metallicity),
                                                          HZ_NAMED(log_g),
                                                          HZ_NAMED(age),
                                                          HZ_NAMED(orbital_period),
                                                          HZ_NAMED(semi_major_axis),
                                                          HZ_NAMED(scaled_semi_major_axis),
                                                          HZ_NAMED(eccentricity),
                                                          HZ_NAMED(inclination),
                                                          HZ_NAMED(arg_periastron),
                                                          HZ_NAMED(planet_radius),
                                                          HZ_NAMED(radius_ratio),
                                                          HZ_NAMED(planet_mass),
                                                          HZ_NAMED(min_mass),
                                                          HZ_NAMED(transit_depth),
                                                          HZ_NAMED(rv_semi_amplitude),
                                                          HZ_NAMED(insolation),
                                                          HZ_NAMED(equilibrium_temperature),
                                                          HZ_NAMED(bond_albedo),
                                                          HZ_NAMED(number_of_stars),
                                                          HZ_NAMED(companion_separation),
                                                          HZ_NAMED(circumbinary),
                                                          HZ_NAMED(planet_mass_kind),
                                                          HZ_NAMED(adopted),
                                                          HZ_NAMED(reference),
                                                          HZ_NAMED(note)};
#undef HZ_NAMED

TEST(Quantity, EveryEnumeratorHasItsRow) {
  EXPECT_EQ(named.size(), static_cast<std::size_t>(Quantity::note) + 1);
  for (const auto& [quantity, text] : named) {
    EXPECT_EQ(name(quantity), text);
    EXPECT_EQ(quantity_named(text), quantity);
    EXPECT_TRUE(info(quantity).in) << text;
  }
}

TEST(Quantity, EveryReadableRowHasItsEnumerator) {
  std::size_t readable = 0;
  for (const auto& column : all_columns()) readable += column.in ? 1U : 0U;
  EXPECT_EQ(readable, named.size());
}

TEST(Quantity, OutputColumnsAreNoQuantities) {
  EXPECT_EQ(quantity_named("p_conservative"), std::nullopt);
  EXPECT_EQ(quantity_named("X_err"), std::nullopt);
  EXPECT_EQ(quantity_named(""), std::nullopt);
}

TEST(Quantity, NamesAndNotesAreNoNumbers) {
  for (const auto quantity : {Quantity::star, Quantity::planet, Quantity::planet_mass_kind, Quantity::adopted,
                              Quantity::note, Quantity::ra}) {
    EXPECT_FALSE(is_numeric(quantity)) << name(quantity);
  }
  for (const auto quantity : {Quantity::teff, Quantity::eccentricity, Quantity::planet_mass})
    EXPECT_TRUE(is_numeric(quantity));
}

TEST(Quantity, CatalogueReadsAsPlainCsv) {
  const auto table = testing::read_whole(HZ_TEST_DIR "/../catalogs/columns.csv");
  EXPECT_THAT(table.problems, ::testing::Each(""));
  std::size_t columns = 0;
  for (const auto& row : table.rows) {
    if (row[0].starts_with("X_")) continue;
    EXPECT_EQ(all_columns()[columns].name, row[0]);
    EXPECT_EQ(all_columns()[columns++].description, row[8]);
  }
  EXPECT_EQ(columns, all_columns().size());
}

}  // namespace
}  // namespace hz
