#include "hz/placement.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "gauss_rules.hpp"
#include "hz/require.hpp"
#include "insolation_sum.hpp"

namespace hz {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();
constexpr double one_sigma_tail = 0.15865525393145705;  // Phi(-1)
constexpr double ln10 = 2.302585092994045684;

double half_normal_mass(double z) { return std::erf(z / std::sqrt(2.0)); }

double reach(const Piece& piece) { return std::min(piece.end, integrated_sigmas); }

/// The Teff for which the limits answer under a policy, and the fitted part of it.
struct Answered {
  Range fitted;
  Range answered;
};

Answered answered_range(const std::optional<Range>& fitted, BeyondRange beyond) {
  if (!fitted) return {{0, infinity}, {0, infinity}};
  const double reach = beyond == BeyondRange::hold ? hold_reach : 0;
  return {*fitted, {fitted->low - reach, fitted->high + reach}};
}

/// Planet masses as a few nodes; one where the limit does not depend on the mass.
///
/// The limit is linear in ln(mass) between its fitted masses and held outside, so the Gauss rule is taken in the clamped
/// ln(mass): the runaway greenhouse of 2014 is nearly straight in it, and what lies outside becomes weight at the ends.
Rule planet_mass_nodes(const PlacementInput& input, const FluxLimit& limit, double smoothness) {
  const Distribution& x = input.planet_mass;
  const double ln_per_unit = input.planet_mass_decadic ? ln10 : 0;
  const auto ln_mass = [&](double value) { return ln_per_unit > 0 ? ln_per_unit * value : std::log(value); };
  if (!limit.depends_on_planet_mass() || x.is_exact()) return {{std::exp(ln_mass(x.central())), 1}};

  const Range fitted = *limit.planet_mass_range();
  const double low = std::log(fitted.low);
  const double high = std::log(fitted.high);
  const auto unit_of = [&](double mass) { return input.planet_mass_decadic ? std::log10(mass) : mass; };
  Rule dense;
  for (const Piece& piece : x.pieces()) {
    const double last = reach(piece);
    Cuts cuts(last);
    for (const double corner : {unit_of(fitted.low), unit_of(fitted.high)}) {
      cuts.add(piece.direction * (corner - piece.centre) / piece.sigma);
    }
    double below = 0;
    for (const double above : cuts.ends()) {
      visit_half_normal(below, above, 10, [&](double z, double weight) {
        const double mass = ln_mass(piece.centre + piece.direction * piece.sigma * z);
        dense.push_back({std::clamp(mass, low, high), piece.weight * weight / half_normal_mass(last)});
      });
      below = above;
    }
  }
  const double teff = input.teff.central();
  const double span = std::abs(std::log(limit.clamped_insolation(teff, fitted.high) / limit.clamped_insolation(teff, fitted.low)));
  const auto order = static_cast<std::size_t>(std::min(40.0, 3 + 4 * span / std::max(smoothness, 1e-3)));
  Rule nodes = gauss_rule_of(dense, order);
  for (Node& node : nodes) node.x = std::exp(node.x);
  return nodes;
}

/// P(answered, ln S - ln S_limit >= shift) for one limit.
class HotSide {
public:
  HotSide(const PlacementInput& input, const InsolationSum& sum, const FluxLimit& limit, const Answered& range, Effort effort)
      : input_(input), sum_(sum), limit_(limit), range_(range), effort_(effort),
        masses_(planet_mass_nodes(input, limit, effort == Effort::coarse ? 1 : sum.smoothness())) {}

  [[nodiscard]] double probability(double shift) const {
    if (input_.teff.is_exact()) return over_masses(input_.teff.central(), shift);
    if (const std::optional<double> certain = certain_share(shift)) return *certain;
    double sum = 0;
    for (const Piece& piece : input_.teff.pieces()) sum += piece.weight * over_piece(piece, shift);
    return sum;
  }

  /// How far the threshold moves over a 68 per cent half-width of Teff.
  [[nodiscard]] double teff_width() const {
    double width = 0;
    for (const Piece& piece : input_.teff.pieces()) width = std::max(width, threshold_shift(piece));
    return width;
  }

private:
  /// ln of what the Teff-free part of S must reach.
  [[nodiscard]] double threshold(double teff, double planet_mass, double shift) const {
    return std::log(limit_.clamped_insolation(teff, planet_mass)) + shift - input_.teff_power * std::log(teff);
  }

  [[nodiscard]] double over_masses(double teff, double shift) const {
    double sum = 0;
    for (const Node& node : masses_) sum += node.weight * sum_.tail(threshold(teff, node.x, shift));
    return sum;
  }

  /// Far from the limit the answer is the whole answered share or nothing; seen from a few Teff, with room to spare.
  [[nodiscard]] std::optional<double> certain_share(double shift) const {
    double least = infinity;
    double greatest = -infinity;
    for (const Piece& piece : input_.teff.pieces()) {
      for (const double part : {0.0, 0.5, 1.0}) {
        const double teff = piece.centre + piece.direction * piece.sigma * part * reach(piece);
        for (const Node& node : {masses_.front(), masses_.back()}) {
          const double y = threshold(std::max(teff, 1.0), node.x, shift);
          least = std::min(least, y);
          greatest = std::max(greatest, y);
        }
      }
    }
    constexpr double room = 0.02;
    if (sum_.least() > greatest + room) {
      return input_.teff.below(range_.answered.high) - input_.teff.below(range_.answered.low);
    }
    if (sum_.greatest() < least - room) return 0;
    return std::nullopt;
  }

  /// One half of the Teff distribution, cut at the ends of the fitted and of the answered range.
  [[nodiscard]] double over_piece(const Piece& piece, double shift) const {
    const double last = reach(piece);
    Cuts cuts(last);
    for (const double end : {range_.answered.low, range_.fitted.low, range_.fitted.high, range_.answered.high}) {
      cuts.add(piece.direction * (end - piece.centre) / piece.sigma);
    }
    const auto at = [&](double z) { return over_masses(piece.centre + piece.direction * piece.sigma * z, shift); };
    const auto is_answered = [&](double low, double high) {
      return range_.answered.contains(piece.centre + piece.direction * piece.sigma * (low + high) / 2);
    };
    if (cuts.ends().size() == 1 && is_answered(0, last) && smooth_over(piece)) return over_whole(piece, last, at);
    double sum = 0;
    double low = 0;
    for (const double high : cuts.ends()) {
      if (is_answered(low, high)) sum += adaptive(low, high, at, 0);
      low = high;
    }
    return sum / half_normal_mass(last);
  }

  [[nodiscard]] double threshold_shift(const Piece& piece) const {
    const double mass = masses_.front().x;
    const double tip = std::max(piece.centre + piece.direction * piece.sigma, 1.0);
    return std::abs(threshold(tip, mass, 0) - threshold(piece.centre, mass, 0));
  }

  /// That shift over one sigma, against the scale on which the tail bends.
  [[nodiscard]] double ratio(const Piece& piece) const {
    return threshold_shift(piece) / std::max(sum_.smoothness(), 1e-300);
  }

  [[nodiscard]] bool smooth_over(const Piece& piece) const { return effort_ == Effort::coarse || ratio(piece) < 0.4; }

  template <class Function>
  [[nodiscard]] double over_whole(const Piece& piece, double last, const Function& at) const {
    const std::size_t order = effort_ == Effort::coarse ? 4 : (ratio(piece) < 0.1 ? 4 : 8);
    double sum = 0;
    if (piece.end > integrated_sigmas) {
      for (const Node& node : half_normal_rule(order)) sum += node.weight * at(node.x);
      return sum;
    }
    visit_half_normal(0, last, order, [&](double z, double weight) { sum += weight * at(z); });
    return sum / half_normal_mass(last);
  }

  /// Halves the interval until two rules agree: the integrand may be as sharp as a step.
  template <class Function>
  [[nodiscard]] double adaptive(double low, double high, const Function& at, int depth) const {
    double fine = 0;
    double rough = 0;
    visit_half_normal(low, high, 10, [&](double z, double weight) { fine += weight * at(z); });
    visit_half_normal(low, high, 7, [&](double z, double weight) { rough += weight * at(z); });
    constexpr double wanted = 2e-6;
    constexpr int deepest = 18;
    if (std::abs(fine - rough) < wanted || depth == deepest) return fine;
    const double middle = (low + high) / 2;
    return adaptive(low, middle, at, depth + 1) + adaptive(middle, high, at, depth + 1);
  }

  const PlacementInput& input_;
  const InsolationSum& sum_;
  const FluxLimit& limit_;
  Answered range_;
  Effort effort_;
  Rule masses_;
};

/// Where a falling function of a distance above 0 crosses zero, to a thousandth; 0 when it starts below. `scale` is a guess.
template <class Function>
double falling_root(const Function& f, double scale) {
  double low = 0;
  double f_low = f(0);
  if (!(f_low > 0) || !(scale > 0)) return 0;
  double high = scale;
  double f_high = f(high);
  for (int step = 0; f_high > 0 && step < 30; ++step) {
    low = high;
    f_low = f_high;
    high *= 2;
    f_high = f(high);
  }
  // The Illinois rule: a secant whose stale end loses half its value.
  for (int step = 0; step < 40 && high - low > 1e-3 * high; ++step) {
    const double middle = f_low > f_high ? low + (high - low) * f_low / (f_low - f_high) : (low + high) / 2;
    const double f_middle = f(middle);
    if (std::abs(f_middle) < 1e-4) return middle;
    if (f_middle > 0) {
      low = middle;
      f_low = f_middle;
      f_high /= 2;
    } else {
      high = middle;
      f_high = f_middle;
      f_low /= 2;
    }
  }
  return (low + high) / 2;
}

double share_in(const Distribution& teff, const Range& range) {
  if (teff.is_exact()) return range.contains(teff.central()) ? 1 : 0;
  return std::clamp(teff.below(range.high) - teff.below(range.low), 0.0, 1.0);
}

}  // namespace

double central_insolation(const PlacementInput& input) {
  double sum = input.offset + input.teff_power * std::log(input.teff.central());
  for (const InsolationTerm& term : input.terms) {
    sum += term.power * (term.decadic ? ln10 * term.x.central() : std::log(term.x.central()));
  }
  const double e = input.eccentricity.central();
  return std::exp(sum - 0.5 * std::log1p(-e * e));
}

Probabilities place(const PlacementInput& input, const LimitSet& set, BeyondRange beyond) {
  HZ_REQUIRE(set.bounds_a_zone());
  const Answered range = answered_range(set.teff_range(), beyond);
  const InsolationSum sum(input, Effort::full);
  const double answered = share_in(input.teff, range.answered);
  const auto hot = [&](std::size_t limit) {
    if (answered == 0) return 0.0;
    return std::clamp(HotSide(input, sum, set.limits[limit], range, Effort::full).probability(0), 0.0, answered);
  };

  Probabilities p;
  p.teff_in_range = share_in(input.teff, range.fitted);
  p.unanswered = 1 - answered;
  if (set.conservative) {
    p.too_hot_conservative = hot(set.conservative->inner);
    const double hotter_than_outer = hot(set.conservative->outer);
    p.too_cold_conservative = answered - hotter_than_outer;
    p.conservative = std::max(0.0, hotter_than_outer - p.too_hot_conservative);
  }
  if (set.optimistic) {
    const double too_hot = hot(set.optimistic->inner);
    const double hotter_than_outer = std::max(too_hot, hot(set.optimistic->outer));
    p.too_hot = too_hot;
    p.optimistic = hotter_than_outer - too_hot;
    p.too_cold = answered - hotter_than_outer;
    if (p.conservative) p.conservative = std::min(*p.conservative, *p.optimistic);
  } else {
    p.too_hot = p.too_hot_conservative;
    p.too_cold = p.too_cold_conservative;
  }
  return p;
}

double log_margin_width(const PlacementInput& input, const FluxLimit& limit, BeyondRange beyond, Towards towards) {
  const Answered range = answered_range(limit.teff_range(), beyond);
  const double answered = share_in(input.teff, range.answered);
  if (answered == 0) return 0;
  const InsolationSum sum(input, Effort::coarse);
  const HotSide side(input, sum, limit, range, Effort::coarse);
  const double mass = input.planet_mass_decadic ? std::pow(10, input.planet_mass.central()) : input.planet_mass.central();
  const double central = std::log(central_insolation(input) / limit.clamped_insolation(input.teff.central(), mass));

  // How much of the answered distribution still lies beyond a distance from the centre, against what a sigma leaves.
  const double sign = towards == Towards::colder ? -1 : 1;
  const auto excess = [&](double distance) {
    const double hotter = side.probability(central + sign * distance) / answered;
    return (sign > 0 ? hotter : 1 - hotter) - one_sigma_tail;
  };
  return falling_root(excess, std::max(sum.width(), side.teff_width()));
}

}  // namespace hz
