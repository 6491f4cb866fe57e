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
/// Units     parallax and half_width in mas (half_width above 0; parallax of any sign), length_scale in pc.
/// Error     quantiles to 1e-6 dex. A two-piece normal in dex through them misses the posterior's distribution function
/// by
///           at most the value that its test prints.
/// Source    Bailer-Jones 2015, PASP 127, 994, doi:10.1086/683116.
[[nodiscard]] Measured log_distance_posterior(double parallax, double half_width, double length_scale);

}  // namespace hz
