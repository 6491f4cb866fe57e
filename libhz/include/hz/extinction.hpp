// Interstellar extinction of a magnitude and reddening of a colour, per magnitude of extinction in V; read from
// catalogs/relations/extinction.toml (embedded at build time).
#pragma once
#include "hz/quantity.hpp"

namespace hz {

/// A_band / A_V.
///
/// Validity  magnitude_b, _v, _g, _j, _k; a broken precondition for any other quantity. Means of the diffuse medium
///           (R_V = 3.1); broad bands depend on the star: A_G / A_V falls from 0.79 at solar colours to about 0.6 for M
///           dwarfs.
/// Source    Cardelli, Clayton & Mathis 1989, ApJ 345, 245, doi:10.1086/167900; A_G = 0.79 A_V, Wang & Chen 2019, ApJ
///           877, 116, doi:10.3847/1538-4357/ab1c61.
[[nodiscard]] double extinction_ratio(Quantity magnitude);

/// E(colour) / A_V.
///
/// Validity  color_bv, _vk, _vj, _bp_rp; a broken precondition for any other quantity.
/// Source    as above; E(BP-RP) = A_G / 2, Andrae et al. 2018, A&A 616, A8, doi:10.1051/0004-6361/201732516.
[[nodiscard]] double color_excess_ratio(Quantity color);

}  // namespace hz
