#include "hz/distribution.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "hz/require.hpp"

namespace hz {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();
constexpr double sqrt_half = 0.70710678118654752440;
constexpr double sigmas_of_95_percent_inside = 1.959963984540054;  // erf(x / sqrt 2) = 0.95
constexpr double low_tail = 0.15865525393145705;                   // Phi(-1)

double half_normal_mass(double z) { return std::erf(z * sqrt_half); }

Piece side(double centre, double sigma, double direction, double room, double weight) {
  Piece piece;
  piece.centre = centre;
  piece.sigma = sigma;
  piece.direction = direction;
  piece.end = sigma > 0 ? room / sigma : 0;
  piece.mass = half_normal_mass(piece.end);
  piece.weight = sigma > 0 ? weight * piece.mass : 0;
  return piece;
}

/// Share of the piece that lies within z sigmas of its centre.
double share_within(const Piece& piece, double z) {
  if (z <= 0) return 0;
  if (z >= piece.end) return 1;
  return half_normal_mass(z) / piece.mass;
}

double share_below(const Piece& piece, double x) {
  const double within = share_within(piece, piece.direction * (x - piece.centre) / piece.sigma);
  return piece.direction > 0 ? within : 1 - within;
}

}  // namespace

Distribution Distribution::exact(double value) {
  Distribution result;
  result.central_ = value;
  return result;
}

Distribution Distribution::two_piece(double value, double minus, double plus, Asymmetry asymmetry, Domain domain) {
  HZ_REQUIRE(minus >= 0 && plus >= 0 && minus + plus > 0);
  HZ_REQUIRE(domain.low <= value && value <= domain.high);
  const bool both = minus > 0 && plus > 0;
  const double share_of_minus = asymmetry == Asymmetry::mode || !both ? minus / (minus + plus) : 0.5;

  Distribution result;
  result.central_ = value;
  double total = 0;
  for (const Piece& piece : {side(value, minus, -1, value - domain.low, share_of_minus),
                             side(value, plus, +1, domain.high - value, 1 - share_of_minus)}) {
    if (!(piece.weight > 0)) continue;
    result.pieces_[result.count_++] = piece;
    total += piece.weight;
  }
  // A one-sided value at the very end of its domain has no room at all; it is then known.
  for (std::size_t i = 0; i < result.count_; ++i) result.pieces_[i].weight /= total;
  result.find_half_widths();
  return result;
}

Distribution Distribution::below(double limit, Domain domain) {
  HZ_REQUIRE(limit > 0 && domain.low == 0);
  return two_piece(0, 0, limit / sigmas_of_95_percent_inside, Asymmetry::median, domain);
}

Distribution Distribution::scaled(double factor) const {
  HZ_REQUIRE(factor >= 0);
  Distribution result;
  result.central_ = central_;
  if (factor == 0 || is_exact()) return result;
  double total = 0;
  for (Piece piece : pieces()) {
    piece.weight /= piece.mass;
    piece.sigma *= factor;
    piece.end /= factor;
    piece.mass = half_normal_mass(piece.end);
    piece.weight *= piece.mass;
    total += piece.weight;
    result.pieces_[result.count_++] = piece;
  }
  for (std::size_t i = 0; i < result.count_; ++i) result.pieces_[i].weight /= total;
  result.find_half_widths();
  return result;
}

double Distribution::below(double x) const {
  if (is_exact()) return x > central_ ? 1 : 0;
  double sum = 0;
  for (const Piece& piece : pieces()) sum += piece.weight * share_below(piece, x);
  return sum;
}

double Distribution::above(double x) const {
  if (is_exact()) return x <= central_ ? 1 : 0;
  double sum = 0;
  for (const Piece& piece : pieces()) sum += piece.weight * (1 - share_below(piece, x));
  return sum;
}

double Distribution::quantile(double u) const {
  HZ_REQUIRE(u > 0 && u < 1);
  if (is_exact()) return central_;
  double low = infinity;
  double high = -infinity;
  for (const Piece& piece : pieces()) {
    const double tip = piece.centre + piece.direction * piece.sigma * std::min(piece.end, 40.0);
    low = std::min({low, piece.centre, tip});
    high = std::max({high, piece.centre, tip});
  }
  const double wanted = 1e-12 * (high - low);
  while (high - low > wanted) {
    const double middle = low + (high - low) / 2;
    if (middle <= low || middle >= high) break;  // neighbouring numbers
    (below(middle) < u ? low : high) = middle;
  }
  return low + (high - low) / 2;
}

void Distribution::find_half_widths() {
  minus_ = plus_ = 0;
  if (is_exact()) return;
  const bool as_quoted = count_ == 2 && std::abs(pieces_[0].weight - 0.5) < 1e-9;  // medians that no domain cuts
  minus_ = as_quoted ? pieces_[0].sigma : std::max(0.0, central_ - quantile(low_tail));
  plus_ = as_quoted ? pieces_[1].sigma : std::max(0.0, quantile(1 - low_tail) - central_);
}

}  // namespace hz
