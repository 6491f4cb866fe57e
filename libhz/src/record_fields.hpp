// Which field of a record holds which quantity: one table for reading and for writing.
#pragma once
#include <array>
#include <utility>

#include "hz/quantity.hpp"
#include "hz/records.hpp"

namespace hz {

inline constexpr auto star_fields = std::to_array<std::pair<Quantity, Field StarRecord::*>>({
    {Quantity::teff, &StarRecord::teff},
    {Quantity::luminosity, &StarRecord::luminosity},
    {Quantity::log_luminosity, &StarRecord::log_luminosity},
    {Quantity::stellar_radius, &StarRecord::stellar_radius},
    {Quantity::stellar_mass, &StarRecord::stellar_mass},
    {Quantity::log_g, &StarRecord::log_g},
    {Quantity::stellar_density, &StarRecord::stellar_density},
    {Quantity::metallicity, &StarRecord::metallicity},
    {Quantity::parallax, &StarRecord::parallax},
    {Quantity::distance, &StarRecord::distance},
    {Quantity::magnitude_v, &StarRecord::magnitude_v},
    {Quantity::magnitude_b, &StarRecord::magnitude_b},
    {Quantity::magnitude_g, &StarRecord::magnitude_g},
    {Quantity::magnitude_bp, &StarRecord::magnitude_bp},
    {Quantity::magnitude_rp, &StarRecord::magnitude_rp},
    {Quantity::magnitude_j, &StarRecord::magnitude_j},
    {Quantity::magnitude_h, &StarRecord::magnitude_h},
    {Quantity::magnitude_k, &StarRecord::magnitude_k},
    {Quantity::magnitude_bol, &StarRecord::magnitude_bol},
    {Quantity::color_bv, &StarRecord::color_bv},
    {Quantity::color_vk, &StarRecord::color_vk},
    {Quantity::color_vj, &StarRecord::color_vj},
    {Quantity::color_bp_rp, &StarRecord::color_bp_rp},
    {Quantity::extinction_v, &StarRecord::extinction_v},
    {Quantity::reddening_bv, &StarRecord::reddening_bv},
    {Quantity::companion_separation, &StarRecord::companion_separation},
});

inline constexpr auto planet_fields = std::to_array<std::pair<Quantity, Field PlanetRecord::*>>({
    {Quantity::orbital_period, &PlanetRecord::orbital_period},
    {Quantity::semi_major_axis, &PlanetRecord::semi_major_axis},
    {Quantity::scaled_semi_major_axis, &PlanetRecord::scaled_semi_major_axis},
    {Quantity::eccentricity, &PlanetRecord::eccentricity},
    {Quantity::insolation, &PlanetRecord::insolation},
    {Quantity::planet_radius, &PlanetRecord::planet_radius},
    {Quantity::planet_mass, &PlanetRecord::planet_mass},
    {Quantity::min_mass, &PlanetRecord::min_mass},
    {Quantity::inclination, &PlanetRecord::inclination},
    {Quantity::radius_ratio, &PlanetRecord::radius_ratio},
    {Quantity::transit_depth, &PlanetRecord::transit_depth},
});

}  // namespace hz
