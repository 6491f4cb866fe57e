#include "measure.hpp"

#include <algorithm>
#include <cmath>

namespace hz {
namespace {

std::size_t gauss_order(double ratio, Effort effort) {
  if (effort == Effort::coarse) return 3;
  if (ratio < 0.03) return 2;
  if (ratio < 0.12) return 3;
  if (ratio < 0.35) return 5;
  if (ratio < 0.6) return 8;
  return 12;
}

/// A part of a half-normal between z_low and z_high: its mass and where the mass lies on average.
Node bin(double z_low, double z_high) {
  constexpr double root = 0.70710678118654752440;
  constexpr double two_over_pi_root = 0.79788456080286535588;  // sqrt(2 / pi)
  const double mass = std::erfc(z_low * root) - std::erfc(z_high * root);
  const double moment = two_over_pi_root * (std::exp(-z_low * z_low / 2) - std::exp(-z_high * z_high / 2));
  return {mass > 0 ? moment / mass : (z_low + z_high) / 2, mass};
}

/// The points of one half, by z.
Rule half_points(const Piece& piece, const Smoothness& smoothness, Effort effort) {
  Rule rule;
  if (smoothness.corners) {
    const std::size_t bins = bins_for(smoothness, effort);
    const double step = reach(piece) / static_cast<double>(bins);
    for (std::size_t i = 0; i < bins; ++i)
      rule.push_back(bin(step * static_cast<double>(i), step * static_cast<double>(i + 1)));
    return rule;
  }
  const std::size_t order = gauss_order(smoothness.ratio, effort);
  // Its last node lies at up to seven sigmas: an eccentricity must not be carried past 1 by it.
  const bool cut = piece.end < integrated_sigmas || piece.end < half_normal_rule(order).back().x;
  if (!cut) return half_normal_rule(order);
  // Gauss-Legendre on a cut half misses its mean by 0.04 of a width with two nodes a panel, by 0.0014 with three.
  visit_half_normal(0, reach(piece), std::max<std::size_t>(order, 3), [&](double z, double weight) {
    rule.push_back({z, weight});
  });
  return rule;
}

/// Gathers points into equal bins, each at its centre of mass.
class Gatherer {
public:
  Gatherer(double low, double high, std::size_t bins)
      : low_(low), per_unit_(static_cast<double>(bins) / (high - low)), mass_(bins, 0.0), moment_(bins, 0.0) {}

  void add(double x, double weight) {
    const double place = (x - low_) * per_unit_;
    const std::size_t index = std::min(static_cast<std::size_t>(std::max(place, 0.0)), mass_.size() - 1);
    mass_[index] += weight;
    moment_[index] += weight * x;
  }

  [[nodiscard]] Rule points() const {
    Rule rule;
    for (std::size_t i = 0; i < mass_.size(); ++i) {
      if (mass_[i] > 0) rule.push_back({moment_[i] / mass_[i], mass_[i]});
    }
    return rule;
  }

private:
  double low_;
  double per_unit_;
  std::vector<double> mass_;
  std::vector<double> moment_;
};

std::pair<double, double> span_of(const Rule& rule) {
  const auto [least, greatest] =
      std::minmax_element(rule.begin(), rule.end(), [](const Node& a, const Node& b) { return a.x < b.x; });
  return {least->x, greatest->x};
}

}  // namespace

double reach(const Piece& piece) { return std::min(piece.end, integrated_sigmas); }

double at(const Piece& piece, double z) { return piece.centre + piece.direction * piece.sigma * z; }

double half_normal_mass(double z) { return std::erf(z / std::sqrt(2.0)); }

std::size_t bins_for(const Smoothness& smoothness, Effort effort) {
  if (effort == Effort::coarse) return 6;
  // A corner whose slope jumps by 0.4 a width costs about 0.02 ratio step^2 at worst: 1e-4 is asked for.
  const double step = std::sqrt(5e-3 / std::max(smoothness.ratio, 1e-3));
  return static_cast<std::size_t>(std::clamp(integrated_sigmas / step, 8.0, 120.0));
}

Rule points_of(const Distribution& x, const std::function<double(double)>& value, const Smoothness& smoothness,
               Effort effort) {
  if (x.is_exact()) return {{value(x.central()), 1}};
  Rule points;
  for (const Piece& piece : x.pieces()) {
    const Rule half = half_points(piece, smoothness, effort);
    double sum = 0;
    for (const Node& node : half) sum += node.weight;
    for (const Node& node : half) points.push_back({value(at(piece, node.x)), piece.weight * node.weight / sum});
  }
  return points;
}

Rule sum_of(const Rule& a, const Rule& b, std::size_t most) {
  if (a.size() * b.size() <= most) {
    Rule sum;
    for (const Node& p : a) {
      for (const Node& q : b) sum.push_back({p.x + q.x, p.weight * q.weight});
    }
    return sum;
  }
  const auto [a_low, a_high] = span_of(a);
  const auto [b_low, b_high] = span_of(b);
  if (!(a_high + b_high > a_low + b_low)) return {{a_low + b_low, 1}};
  Gatherer gatherer(a_low + b_low, a_high + b_high, most);
  for (const Node& p : a) {
    for (const Node& q : b) gatherer.add(p.x + q.x, p.weight * q.weight);
  }
  return gatherer.points();
}

}  // namespace hz
