// Distributions as weighted points, and sums of them.
#pragma once
#include <functional>

#include "gauss_rules.hpp"
#include "hz/distribution.hpp"

namespace hz {

/// The node spread of a half-normal that an integral looks at; 2e-7 of its mass lies beyond.
inline constexpr double integrated_sigmas = 5.2;

/// How finely an integral is taken.
enum class Effort {
  full,    // probabilities: about 1e-5
  coarse,  // half-widths: about 1 per cent of themselves
};

/// What a measure will be averaged over.
struct Smoothness {
  double ratio = 1;      // the measure's width over that of the function
  bool corners = false;  // the function's slope jumps somewhere
};

/// sigmas of a half-normal that are looked at: as far as its domain lets it, at most integrated_sigmas.
[[nodiscard]] double reach(const Piece& piece);
/// The value z sigmas out.
[[nodiscard]] double at(const Piece& piece, double z);
/// Probability of a half-normal within z sigmas: erf(z / sqrt 2).
[[nodiscard]] double half_normal_mass(double z);

/// Sub-intervals that serve one half of a distribution as bins of its own mass.
[[nodiscard]] std::size_t bins_for(const Smoothness& smoothness, Effort effort);

/// The distribution as weighted points of value(x), in units of whatever value() gives; weights sum to 1.
///
/// A smooth function is served by a few Gauss nodes. Where its slope jumps, no Gauss rule is good: then the halves are
/// cut into bins, each a point of the bin's own mass at its centre of mass, and the error falls with the square of the
/// bin.
[[nodiscard]] Rule points_of(const Distribution& x, const std::function<double(double)>& value,
                             const Smoothness& smoothness, Effort effort);

/// The sum of two independent measures, gathered into at most `most` points.
[[nodiscard]] Rule sum_of(const Rule& a, const Rule& b, std::size_t most);

}  // namespace hz
