#include "threshold.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace hz {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();
constexpr double ln10 = 2.302585092994045684;
constexpr std::size_t most_points = 128;

double planet_mass_at(const PlacementInput& input, double x) {
  return input.planet_mass_decadic ? std::exp(ln10 * x) : x;
}

double unit_of(const PlacementInput& input, double planet_mass) {
  return input.planet_mass_decadic ? std::log10(planet_mass) : planet_mass;
}

/// Calls visit(z_low, z_high) for the parts of a half between `places`.
template <class Visit>
void visit_parts(const Piece& piece, std::initializer_list<double> places, Visit visit) {
  Cuts cuts(reach(piece));
  for (const double x : places) cuts.add(piece.direction * (x - piece.centre) / piece.sigma);
  double low = 0;
  for (const double high : cuts.ends()) {
    visit(low, high);
    low = high;
  }
}

}  // namespace

AnsweredRange answered_range(const std::optional<Range>& fitted, BeyondRange beyond) {
  if (!fitted) return {{0, infinity}, {0, infinity}};
  const double further = beyond == BeyondRange::hold ? hold_reach : 0;
  return {*fitted, {fitted->low - further, fitted->high + further}};
}

double share_in(const Distribution& teff, const Range& range) {
  if (teff.is_exact()) return range.contains(teff.central()) ? 1 : 0;
  return std::clamp(teff.below(range.high) - teff.below(range.low), 0.0, 1.0);
}

Threshold::Threshold(const PlacementInput& input, const FluxLimit& limit, const AnsweredRange& range, Effort effort)
    : input_(input), limit_(limit), range_(range), effort_(effort) {
  const Distribution& teff = input.teff;
  const double mass = planet_mass_at(input, input.planet_mass.central());
  const LimitCurve curve = limit.at_planet_mass(mass);
  teff_width_ = std::abs(value(teff.central() + teff.plus(), curve) - value(teff.central() - teff.minus(), curve)) / 2;
  const auto at_mass = [&](double x) {
    return value(teff.central(), limit.at_planet_mass(std::max(planet_mass_at(input, x), 1e-9)));
  };
  const Distribution& x = input.planet_mass;
  if (limit.depends_on_planet_mass() && !x.is_exact()) {
    mass_width_ = std::abs(at_mass(x.central() + x.plus()) - at_mass(x.central() - x.minus())) / 2;
  }
  width_ = std::hypot(teff_width_, mass_width_);

  least_ = infinity;
  greatest_ = -infinity;
  for (const Node& planet : mass_points(2)) {
    const LimitCurve at_planet = limit.at_planet_mass(planet.x);
    const auto see = [&](double t) {
      const double y = value(std::clamp(t, std::max(range.answered.low, 1.0), range.answered.high), at_planet);
      least_ = std::min(least_, y);
      greatest_ = std::max(greatest_, y);
    };
    see(teff.central());
    for (const Piece& piece : teff.pieces()) {
      for (const double part : {0.25, 0.5, 0.75, 1.0}) see(at(piece, part * reach(piece)));
    }
  }
  // Between the places seen, and between two mass nodes and the ends of the masses, the threshold may go a little
  // further.
  const double room = 0.02 + 6 * mass_width_;
  least_ -= room;
  greatest_ += room;
}

double Threshold::value(double teff, const LimitCurve& curve) const {
  const double above_zero = std::max(teff, 1.0);
  const double flux = std::log(curve(above_zero));
  return flux - input_.curve(above_zero);
}

/// The limit is linear in ln(mass) between its fitted masses and held outside, so the Gauss rule is taken in the
/// clamped ln(mass): the runaway greenhouse of 2014 is nearly straight in it, and what lies outside becomes weight at
/// the ends.
Rule Threshold::mass_points(std::size_t order) const {
  const Distribution& x = input_.planet_mass;
  if (!limit_.depends_on_planet_mass() || x.is_exact()) return {{planet_mass_at(input_, x.central()), 1}};
  const Range fitted = *limit_.planet_mass_range();
  Rule dense;
  for (const Piece& piece : x.pieces()) {
    visit_parts(piece, {unit_of(input_, fitted.low), unit_of(input_, fitted.high)}, [&](double low, double high) {
      visit_half_normal(low, high, 10, [&](double z, double weight) {
        const double mass = std::clamp(planet_mass_at(input_, at(piece, z)), fitted.low, fitted.high);
        dense.push_back({std::log(mass), piece.weight * weight / half_normal_mass(reach(piece))});
      });
    });
  }
  Rule nodes = gauss_rule_of(dense, order);
  for (Node& node : nodes) node.x = std::exp(node.x);
  return nodes;
}

Rule Threshold::teff_points(const Smoothness& smoothness) const {
  const Distribution& teff = input_.teff;
  if (teff.is_exact()) return range_.answered.contains(teff.central()) ? Rule{{teff.central(), 1}} : Rule{};
  const Range& answered = range_.answered;
  const Range& fitted = range_.fitted;
  if (share_in(teff, fitted) > 1 - 1e-7)
    return points_of(
        teff, [](double t) { return t; }, smoothness, effort_);

  // The ends of the fitted range are bends (held) or steps (refused): each half is cut there.
  Rule points;
  const std::size_t order = smoothness.corners ? std::max<std::size_t>(8, bins_for(smoothness, effort_) / 2) : 10;
  for (const Piece& piece : teff.pieces()) {
    visit_parts(piece, {answered.low, fitted.low, fitted.high, answered.high}, [&](double low, double high) {
      if (!answered.contains(at(piece, (low + high) / 2))) return;
      visit_half_normal(low, high, std::min<std::size_t>(order, 40), [&](double z, double weight) {
        points.push_back({at(piece, z), piece.weight * weight / half_normal_mass(reach(piece))});
      });
    });
  }
  return points;
}

Rule Threshold::points(const Smoothness& smoothness) const {
  const Rule masses = mass_points(effort_ == Effort::coarse ? 2 : 6);
  const Rule teffs = teff_points(smoothness);
  Rule points;
  for (const Node& mass : masses) {
    const LimitCurve curve = limit_.at_planet_mass(mass.x);
    for (const Node& teff : teffs) points.push_back({value(teff.x, curve), teff.weight * mass.weight});
  }
  return points.empty() ? points : sum_of(points, {{0, 1}}, most_points);
}

Threshold::Track Threshold::teff_track(double planet_mass, double weight) const {
  const LimitCurve curve = limit_.at_planet_mass(planet_mass);
  Track track{weight, {}};
  const Distribution& teff = input_.teff;
  if (teff.is_exact()) {
    const double y = value(teff.central(), curve);
    if (range_.answered.contains(teff.central())) track.steps.push_back({teff.central(), teff.central(), y, y, 1});
    return track;
  }
  const int steps = effort_ == Effort::coarse ? 8 : 40;
  for (const Piece& piece : teff.pieces()) {
    visit_parts(piece, {range_.answered.low, range_.fitted.low, range_.fitted.high, range_.answered.high},
                [&](double low, double high) {
                  if (!range_.answered.contains(at(piece, (low + high) / 2))) return;
                  for (int i = 0; i < steps; ++i) {
                    const double x_low = at(piece, low + (high - low) * i / steps);
                    const double x_high = at(piece, low + (high - low) * (i + 1) / steps);
                    track.steps.push_back({x_low, x_high, value(x_low, curve), value(x_high, curve),
                                           std::abs(teff.below(x_high) - teff.below(x_low))});
                  }
                });
  }
  return track;
}

Threshold::Track Threshold::mass_track(double teff, double weight) const {
  Track track{weight, {}};
  const Distribution& x = input_.planet_mass;
  const Range fitted = *limit_.planet_mass_range();
  const auto y_at = [&](double u) {
    return value(teff, limit_.at_planet_mass(std::max(planet_mass_at(input_, u), 1e-9)));
  };
  constexpr int steps = 20;
  for (const Piece& piece : x.pieces()) {
    visit_parts(piece, {unit_of(input_, fitted.low), unit_of(input_, 1), unit_of(input_, fitted.high)},
                [&](double low, double high) {
                  for (int i = 0; i < steps; ++i) {
                    const double x_low = at(piece, low + (high - low) * i / steps);
                    const double x_high = at(piece, low + (high - low) * (i + 1) / steps);
                    track.steps.push_back(
                        {x_low, x_high, y_at(x_low), y_at(x_high), std::abs(x.below(x_high) - x.below(x_low))});
                  }
                });
  }
  return track;
}

double Threshold::at_most_on(const Track& track, const Distribution& x, double y) const {
  double sum = 0;
  for (const Step& step : track.steps) {
    if (step.y_low <= y && step.y_high <= y) {
      sum += step.mass;
    } else if (step.y_low <= y || step.y_high <= y) {
      const double crossing = step.x_low + (step.x_high - step.x_low) * (y - step.y_low) / (step.y_high - step.y_low);
      sum += std::abs(x.below(crossing) - x.below(step.y_low <= y ? step.x_low : step.x_high));
    }
  }
  return sum * track.weight;
}

void Threshold::make_tracks() {
  if (teff_width_ >= mass_width_) {
    for (const Node& mass : mass_points(effort_ == Effort::coarse ? 2 : 6))
      tracks_.push_back(teff_track(mass.x, mass.weight));
  } else {
    const Smoothness smoothness{teff_width_ / mass_width_, true};
    for (const Node& teff : teff_points(smoothness)) tracks_.push_back(mass_track(teff.x, teff.weight));
  }
}

double Threshold::at_most(double y) const {
  double sum = 0;
  for (const Track& track : tracks_) {
    sum += at_most_on(track, teff_width_ >= mass_width_ ? input_.teff : input_.planet_mass, y);
  }
  return sum;
}

}  // namespace hz
