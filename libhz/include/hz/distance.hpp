// Distance from a parallax that is not much larger than its error.
#pragma once
#include "hz/measured.hpp"

namespace hz {

/// Below this relative error a parallax is simply inverted: its distribution in 1/d is its own.
inline constexpr double simple_parallax_error = 0.1;
/// Scale length of the exponentially decreasing space density, pc.
inline constexpr double default_length_scale = 1350;

/// Decadic logarithm of the distance in pc: median with its 16 and 84 per cent points under the exponentially
/// decreasing space density prior, p(r) ~ r^2 exp(-r / length_scale) N(parallax; 1000 / r, half_width).
///
/// Where a parallax of about 3 to 8 half-widths leaves two peaks, one near 1000 / parallax and one near
/// 2 length_scale, the nearer alone counts, up to the trough behind it: the farther one holds the stars of the prior,
/// which the parallax itself excludes. (Section 7 of the source says so of the mode; from memory.)
///
/// Units     parallax and half_width in mas, length_scale in pc; the result in dex of pc.
/// Validity  half_width and length_scale above 0, parallax finite, of any sign. Magnitudes beyond 1e12 and below
///           1e-12, and half-widths below 1e-10 of the parallax, are held there.
/// Error     quantiles to 1e-6 dex. For parallaxes of -3 to 10 half-widths, a two-piece normal in dex through the three
///           points (half the weight each side) misses the posterior's distribution function by at most 0.012 where
///           half_width * length_scale <= 100 mas pc, 0.02 up to 300, 0.044 up to 1000, and 0.13 beyond.
/// Source    Bailer-Jones 2015, PASP 127, 994, doi:10.1086/683116.
[[nodiscard]] Measured log_distance_posterior(double parallax, double half_width, double length_scale);

}  // namespace hz
