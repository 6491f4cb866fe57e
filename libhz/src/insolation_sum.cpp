#include "insolation_sum.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "gauss_rules.hpp"

namespace hz {
namespace {

constexpr double ln10 = 2.302585092994045684;
constexpr double infinity = std::numeric_limits<double>::infinity();

double half_normal_mass(double z) { return std::erf(z / std::sqrt(2.0)); }

double reach(const Piece& piece) { return std::min(piece.end, integrated_sigmas); }

double at(const Piece& piece, double z) { return piece.centre + piece.direction * piece.sigma * z; }

/// Gauss nodes a side that serve a variable whose width is `ratio` times that of what it is averaged over.
std::size_t order_for(double ratio, Effort effort) {
  if (effort == Effort::coarse) return 3;
  if (ratio < 0.03) return 2;
  if (ratio < 0.12) return 3;
  if (ratio < 0.35) return 5;
  if (ratio < 0.6) return 8;
  return 12;
}

/// What each node of a term adds to the sum, and its weight.
Rule rule_for(const SumTerm& term, double ratio, Effort effort) {
  const std::size_t order = order_for(ratio, effort);
  Rule result;
  for (const Piece& piece : term.x().pieces()) {
    Rule rule;
    if (piece.end > integrated_sigmas) {
      rule = half_normal_rule(order);
    } else {
      visit_half_normal(0, piece.end, order, [&](double z, double weight) { rule.push_back({z, weight}); });
    }
    double sum = 0;
    for (const Node& node : rule) sum += node.weight;
    for (const Node& node : rule) result.push_back({term.value(at(piece, node.x)), piece.weight * node.weight / sum});
  }
  return result;
}

}  // namespace

SumTerm::SumTerm(Distribution x, Shape shape, double power) : x_(x), shape_(shape), power_(power) {
  if (x_.is_exact()) return;
  const std::span<const Piece> pieces = x_.pieces();
  least_ = infinity;
  greatest_ = -infinity;
  for (const Piece& piece : pieces) {
    for (const double z : {0.0, reach(piece)}) {
      least_ = std::min(least_, value(at(piece, z)));
      greatest_ = std::max(greatest_, value(at(piece, z)));
    }
    if (piece.end < integrated_sigmas) corners_.push_back(value(at(piece, piece.end)));
  }
  const auto density = [](const Piece& piece) { return piece.weight / (piece.mass * piece.sigma); };
  const bool even = pieces.size() == 2 && std::abs(density(pieces[0]) / density(pieces[1]) - 1) < 1e-6;
  if (!even) corners_.push_back(value(x_.central()));
  constexpr double low_tail = 0.15865525393145705;
  width_ = std::abs(value(x_.quantile(1 - low_tail)) - value(x_.quantile(low_tail))) / 2;
}

double SumTerm::value(double x) const {
  switch (shape_) {
    case Shape::logarithm: return x > 0 ? power_ * std::log(x) : (power_ > 0 ? -infinity : infinity);
    case Shape::decadic: return power_ * ln10 * x;
    case Shape::eccentricity: return -0.5 * std::log1p(-x * x);
  }
  return 0;
}

double SumTerm::inverse(double y) const {
  switch (shape_) {
    case Shape::logarithm: return std::exp(y / power_);
    case Shape::decadic: return y / (power_ * ln10);
    case Shape::eccentricity: return y <= 0 ? 0 : std::sqrt(-std::expm1(-2 * y));
  }
  return 0;
}

double SumTerm::tail(double y) const {
  if (shape_ == Shape::eccentricity && y <= 0) return 1;
  const double above = x_.above(inverse(y));
  return power_ > 0 ? above : 1 - above;
}

InsolationSum::InsolationSum(const PlacementInput& input, Effort effort) : constant_(input.offset), effort_(effort) {
  const auto add = [&](const Distribution& x, SumTerm::Shape shape, double power) {
    SumTerm term(x, shape, power);
    if (x.is_exact()) {
      constant_ += term.value(x.central());
    } else {
      terms_.push_back(std::move(term));
    }
  };
  for (const InsolationTerm& term : input.terms) {
    add(term.x, term.decadic ? SumTerm::Shape::decadic : SumTerm::Shape::logarithm, term.power);
  }
  add(input.eccentricity, SumTerm::Shape::eccentricity, 1);
  std::stable_sort(terms_.begin(), terms_.end(), [](const auto& a, const auto& b) { return a.width() > b.width(); });

  least_ = greatest_ = constant_;
  double variance = 0;
  for (const SumTerm& term : terms_) {
    least_ += term.least();
    greatest_ += term.greatest();
    variance += term.width() * term.width();
  }
  width_ = std::sqrt(variance);
  if (terms_.empty()) return;
  // A corner of the widest term is rounded off only by the second.
  smoothness_ = terms_[0].corners().empty() ? terms_[0].width() : (terms_.size() > 1 ? terms_[1].width() : 0);
  if (terms_.size() > 1) second_ = rule_for(terms_[1], terms_[1].width() / terms_[0].width(), effort_);
  for (std::size_t i = 2; i < terms_.size(); ++i) {
    outer_.push_back(rule_for(terms_[i], terms_[i].width() / smoothness_, effort_));
  }
}

double InsolationSum::tail(double y) const {
  if (terms_.empty()) return constant_ >= y ? 1 : 0;
  return tail_from(terms_.size() - 1, y - constant_);
}

double InsolationSum::tail_from(std::size_t term, double y) const {
  if (term == 0) return terms_[0].tail(y);
  if (term == 1) return tail_of_two(y);
  double sum = 0;
  for (const Node& node : outer_[term - 2]) sum += node.weight * tail_from(term - 1, y - node.x);
  return sum;
}

double InsolationSum::tail_of_two(double y) const {
  if (y <= terms_[0].least() + terms_[1].least()) return 1;
  if (y >= terms_[0].greatest() + terms_[1].greatest()) return 0;
  if (terms_[0].corners().empty()) {
    double sum = 0;
    for (const Node& node : second_) sum += node.weight * terms_[0].tail(y - node.x);
    return sum;
  }
  double sum = 0;
  for (const Piece& piece : terms_[1].x().pieces()) sum += piece.weight * tail_over_piece(piece, y);
  return sum;
}

/// The first term's tail averaged over one half of the second, cut where the second carries the first across a corner.
double InsolationSum::tail_over_piece(const Piece& piece, double y) const {
  const double last = reach(piece);
  Cuts cuts(last);
  for (const double corner : terms_[0].corners()) {
    cuts.add(piece.direction * (terms_[1].inverse(y - corner) - piece.centre) / piece.sigma);
  }
  double sum = 0;
  double low = 0;
  for (const double high : cuts.ends()) {
    visit_half_normal(low, high, effort_ == Effort::coarse ? 4 : 8, [&](double z, double weight) {
      sum += weight * terms_[0].tail(y - terms_[1].value(at(piece, z)));
    });
    low = high;
  }
  return sum / half_normal_mass(last);
}

}  // namespace hz
