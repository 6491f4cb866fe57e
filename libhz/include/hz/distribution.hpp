// What a measured value stands for: a two-piece normal on the scale it is quoted on, cut to its domain and
// renormalised.
#pragma once
#include <array>
#include <cstddef>
#include <optional>
#include <span>

#include "hz/measured.hpp"

namespace hz {

/// What an asymmetric value +a -b means. The choice moves a probability by 0.04 in the median of asymmetric rows.
enum class Asymmetry {
  median,  // the value is the median, the half-widths reach the 16 and 84 per cent points: half the weight each side
  mode,    // the value is the mode: each side's weight is proportional to its half-width
};

/// Where a quantity can lie at all.
struct Domain {
  double low = 0;
  double high = 0;  // may be infinity
};

/// One side of a two-piece normal: a half-normal from `centre` outwards, as far as `end` (the domain's end or
/// infinity).
struct Piece {
  double centre = 0;
  double sigma = 0;      // above 0
  double direction = 1;  // +1 above the centre, -1 below
  double end = 0;        // in units of sigma from the centre, above 0; infinity when the domain does not cut it
  double weight = 0;     // its share of the whole; the shares sum to 1
  double mass = 1;       // the half-normal's own mass within `end` (erf(end / sqrt 2))
};

/// A probability distribution of one input.
class Distribution {
public:
  /// A known value.
  [[nodiscard]] static Distribution exact(double value);

  /// Two-piece normal of half-widths minus and plus (both at least 0, not both 0) about `value`, cut to `domain`.
  ///
  /// A zero half-width puts all the weight on the other side. A value outside the domain, or a side with no room in the
  /// domain, leaves only the other side; `value` must lie in the closed domain.
  [[nodiscard]] static Distribution two_piece(double value, double minus, double plus, Asymmetry asymmetry,
                                              Domain domain);

  /// Half-normal from 0 upwards with 95 per cent below `limit`, cut to `domain`: what an upper limit of an eccentricity
  /// means.
  [[nodiscard]] static Distribution below(double limit, Domain domain);

  /// The same value with its half-widths times `factor` (0 makes it exact); what a better or worse measurement would
  /// say.
  [[nodiscard]] Distribution scaled(double factor) const;

  [[nodiscard]] double central() const { return central_; }  // the quoted value
  [[nodiscard]] bool is_exact() const { return count_ == 0; }
  [[nodiscard]] std::span<const Piece> pieces() const { return {pieces_.data(), count_}; }  // empty when exact

  /// Probability of lying below x; of lying at x or above.
  [[nodiscard]] double below(double x) const;
  [[nodiscard]] double above(double x) const;

  /// The x with probability u below it, 0 < u < 1.
  [[nodiscard]] double quantile(double u) const;

  /// Half-widths to the 16 and 84 per cent points of the distribution as it is, from the central value; at least 0.
  [[nodiscard]] double minus() const { return minus_; }
  [[nodiscard]] double plus() const { return plus_; }

private:
  void find_half_widths();

  double central_ = 0;
  double minus_ = 0;
  double plus_ = 0;
  std::array<Piece, 2> pieces_{};
  std::size_t count_ = 0;
};

}  // namespace hz
