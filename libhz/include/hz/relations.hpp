// Published relations of stars and planets, read from catalogs/relations (embedded at build time).
#pragma once
#include <optional>

#include "hz/measured.hpp"

namespace hz {

/// Decadic logarithm of a planet's mass, from its radius, with 68 per cent half-widths.
///
/// Units     planet_radius in Earth radii, above 0, not a limit; the result in dex of Earth masses.
/// Validity  invertible below 14.31 Earth radii (131.58 Earth masses); larger planets are given 131.58 Earth masses,
///           the least their size says.
/// Error     the relation's scatter (4.03 or 14.6 per cent of the radius) and the radius's own half-widths, in
///           quadrature.
/// Source    Chen & Kipping 2017, ApJ 834, 17, doi:10.3847/1538-4357/834/1/17, inverted.
[[nodiscard]] Measured log_mass_from_radius(const Measured& planet_radius);

/// Decadic logarithm of a planet's radius, from its mass, with 68 per cent half-widths.
///
/// Units     planet_mass in Earth masses, above 0, not a limit; the result in dex of Earth radii.
/// Validity  all planets, brown dwarfs (131.58-26636 Earth masses, where the radius falls slowly) and low-mass stars.
/// Error     the relation's scatter (4.03, 14.6, 7.37 or 4.43 per cent of the radius) and the mass's own half-widths,
///           carried through the relation, in quadrature.
/// Source    Chen & Kipping 2017, ApJ 834, 17, doi:10.3847/1538-4357/834/1/17.
[[nodiscard]] Measured log_radius_from_mass(const Measured& planet_mass);

/// Radius of a main-sequence star of this Teff, linear between the table's rows; empty outside them (2270-45900 K).
///
/// Units     teff in K; the result in nominal solar radii.
/// Error     the scatter of relation("radius_teff_pm13"): the width of the main sequence, 7 to 20 per cent.
/// Source    Pecaut & Mamajek 2013, ApJS 208, 9, doi:10.1088/0067-0049/208/1/9, as updated, version 2024.05.15.
[[nodiscard]] std::optional<double> main_sequence_radius(double teff);

}  // namespace hz
