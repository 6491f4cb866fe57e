#include "hz/placement.hpp"

#include <algorithm>
#include <cmath>

#include "hz/require.hpp"
#include "sum_term.hpp"
#include "threshold.hpp"

namespace hz {
namespace {

constexpr double one_sigma_tail = 0.15865525393145705;  // Phi(-1)
constexpr double ln10 = 2.302585092994045684;

std::size_t most_points(Effort effort) { return effort == Effort::coarse ? 48 : 256; }

/// The terms from `first` on, with the constant, as one measure. `inner_width` is that of what is taken in closed form.
Rule measure_of(const TermSum& sum, std::size_t first, double inner_width, bool corners, Effort effort) {
  Rule measure{{sum.constant, 1}};
  for (std::size_t i = first; i < sum.terms.size(); ++i) {
    const Smoothness smoothness{sum.terms[i].width() / inner_width, corners};
    measure = sum_of(measure, sum.terms[i].points(smoothness, effort), most_points(effort));
  }
  return measure;
}

/// All terms but the widest as one measure, made at its first use: every limit of a planet shares it.
class NarrowTerms {
public:
  NarrowTerms(const TermSum& sum, Effort effort) : sum_(sum), effort_(effort) {}

  [[nodiscard]] const Rule& points() {
    const SumTerm& widest = sum_.terms.front();
    if (points_.empty()) points_ = measure_of(sum_, 1, widest.width(), widest.has_corners(), effort_);
    return points_;
  }

private:
  const TermSum& sum_;
  Effort effort_;
  Rule points_;
};

/// P(answered, ln S - ln S_limit >= shift) for one limit.
///
/// The widest of the inputs is taken in closed form through its own distribution function; all others are summed into
/// one measure of a few hundred points beforehand, so that a shift costs as many distribution functions as there are
/// points.
class HotSide {
public:
  HotSide(const PlacementInput& input, const TermSum& sum, NarrowTerms& narrow, const FluxLimit& limit,
          const AnsweredRange& range, Effort effort)
      : sum_(sum), threshold_(input, limit, range, effort), answered_(share_in(input.teff, range.answered)) {
    through_threshold_ = sum.terms.empty() || threshold_.width() > sum.terms.front().width();
    if (is_certain(0) && effort == Effort::full) return;
    if (through_threshold_) {
      threshold_.make_tracks();
      rest_ = measure_of(sum, 0, threshold_.width(), true, effort);
      return;
    }
    const SumTerm& widest = sum.terms.front();
    Rule lowered = threshold_.points({threshold_.width() / widest.width(), widest.has_corners()});
    for (Node& node : lowered) node.x = -node.x;
    rest_ = lowered.empty() ? lowered : sum_of(narrow.points(), lowered, most_points(effort));
  }

  [[nodiscard]] double probability(double shift) const {
    if (is_certain(shift)) return sum_.least > threshold_.greatest() + shift ? answered_ : 0;
    double sum = 0;
    for (const Node& node : rest_) {
      sum += node.weight *
             (through_threshold_ ? threshold_.at_most(node.x - shift) : sum_.terms.front().tail(shift - node.x));
    }
    return std::clamp(sum, 0.0, answered_);
  }

  [[nodiscard]] double width() const {
    double square = threshold_.width() * threshold_.width();
    for (const SumTerm& term : sum_.terms) square += term.width() * term.width();
    return std::sqrt(square);
  }

private:
  /// Far from the limit the answer is the whole answered share or nothing.
  [[nodiscard]] bool is_certain(double shift) const {
    return sum_.least > threshold_.greatest() + shift || sum_.greatest < threshold_.least() + shift;
  }

  const TermSum& sum_;
  Threshold threshold_;
  double answered_;
  bool through_threshold_ = false;
  Rule rest_;  // everything but the variable in closed form
};

/// Where a falling function of a distance above 0 crosses zero, to a thousandth; 0 when it starts below. `scale` is a
/// guess.
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

}  // namespace

double TeffCurve::operator()(double teff) const {
  double sum = slope * (teff - centre);
  if (power != 0) sum += power * std::log(teff);
  if (weight != 0) sum += weight * (*correction)(teff);
  return sum;
}

double central_insolation(const PlacementInput& input) {
  double sum = input.offset + input.curve(input.teff.central());
  for (const InsolationTerm& term : input.terms) {
    sum += term.power * (term.decadic ? ln10 * term.x.central() : std::log(term.x.central()));
  }
  const double e = input.eccentricity.central();
  return std::exp(sum - 0.5 * std::log1p(-e * e));
}

Probabilities place(const PlacementInput& input, const LimitSet& set, BeyondRange beyond) {
  HZ_REQUIRE(set.bounds_a_zone());
  const AnsweredRange range = answered_range(set.teff_range(), beyond);
  const TermSum sum(input);
  NarrowTerms narrow(sum, Effort::full);
  const double answered = share_in(input.teff, range.answered);
  const auto hot = [&](std::size_t limit) {
    if (answered == 0) return 0.0;
    return HotSide(input, sum, narrow, set.limits[limit], range, Effort::full).probability(0);
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
  const AnsweredRange range = answered_range(limit.teff_range(), beyond);
  const double answered = share_in(input.teff, range.answered);
  if (answered == 0) return 0;
  const TermSum sum(input);
  NarrowTerms narrow(sum, Effort::coarse);
  const HotSide side(input, sum, narrow, limit, range, Effort::coarse);
  const double mass =
      input.planet_mass_decadic ? std::pow(10, input.planet_mass.central()) : input.planet_mass.central();
  const double central = std::log(central_insolation(input) / limit.clamped_insolation(input.teff.central(), mass));

  // How much of the answered distribution still lies beyond a distance from the centre, against what a sigma leaves.
  const double sign = towards == Towards::colder ? -1 : 1;
  const auto excess = [&](double distance) {
    const double hotter = side.probability(central + sign * distance) / answered;
    return (sign > 0 ? hotter : 1 - hotter) - one_sigma_tail;
  };
  return falling_root(excess, side.width());
}

}  // namespace hz
