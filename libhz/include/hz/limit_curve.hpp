// A limit at one planet mass: what a hot loop evaluates.
#pragma once
#include <algorithm>
#include <array>
#include <cmath>
#include <limits>

namespace hz {

/// A closed interval.
struct Range {
  double low = 0;
  double high = 0;
  [[nodiscard]] bool contains(double x) const { return low <= x && x <= high; }
};

/// Insolation at a limit as a function of Teff alone. Every published form is a polynomial p of t = teff -
/// teff_reference: S = p(t), or S = 1/p(t)^2 where the source fits the distance at 1 solar luminosity.
struct LimitCurve {
  std::array<double, 5> coefficients{};  // of t^0 ... t^4
  double teff_reference = 0;
  bool in_distance = false;
  Range teff_range{-std::numeric_limits<double>::infinity(), std::numeric_limits<double>::infinity()};

  /// In solar constants; teff (K, not NaN) is clamped to teff_range. No allocation, no logarithm.
  ///
  /// A distance fit below zero gives a negative S and not a plausible positive one, so that checking a set can see it.
  [[nodiscard]] double operator()(double teff) const {
    const double t = std::clamp(teff, teff_range.low, teff_range.high) - teff_reference;
    const auto& c = coefficients;
    const double p = c[0] + t * (c[1] + t * (c[2] + t * (c[3] + t * c[4])));
    return in_distance ? 1.0 / (p * std::abs(p)) : p;
  }
};

}  // namespace hz
