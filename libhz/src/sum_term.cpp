#include "sum_term.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace hz {
namespace {

constexpr double ln10 = 2.302585092994045684;
constexpr double infinity = std::numeric_limits<double>::infinity();

double density_at_centre(const Piece& piece) { return piece.weight / (piece.mass * piece.sigma); }

bool density_jumps(std::span<const Piece> pieces) {
  const bool cut = std::any_of(pieces.begin(), pieces.end(), [](const Piece& p) { return p.end < integrated_sigmas; });
  return cut || pieces.size() < 2 || std::abs(density_at_centre(pieces[0]) / density_at_centre(pieces[1]) - 1) > 1e-6;
}

}  // namespace

SumTerm::SumTerm(Distribution x, Shape shape, double power) : x_(x), shape_(shape), power_(power) {
  if (x_.is_exact()) return;
  least_ = infinity;
  greatest_ = -infinity;
  for (const Piece& piece : x_.pieces()) {
    for (const double z : {0.0, reach(piece)}) {
      least_ = std::min(least_, value(at(piece, z)));
      greatest_ = std::max(greatest_, value(at(piece, z)));
    }
  }
  has_corners_ = density_jumps(x_.pieces());
  width_ = std::abs(value(x_.central() + x_.plus()) - value(x_.central() - x_.minus())) / 2;
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

Rule SumTerm::points(const Smoothness& smoothness, Effort effort) const {
  return points_of(
      x_, [this](double x) { return value(x); }, smoothness, effort);
}

TermSum::TermSum(const PlacementInput& input) : constant(input.offset) {
  const auto add = [&](const Distribution& x, SumTerm::Shape shape, double power) {
    const SumTerm term(x, shape, power);
    if (x.is_exact()) {
      constant += term.value(x.central());
    } else {
      terms.push_back(term);
    }
  };
  for (const InsolationTerm& term : input.terms) {
    add(term.x, term.decadic ? SumTerm::Shape::decadic : SumTerm::Shape::logarithm, term.power);
  }
  add(input.eccentricity, SumTerm::Shape::eccentricity, 1);
  std::stable_sort(terms.begin(), terms.end(), [](const auto& a, const auto& b) { return a.width() > b.width(); });
  least = greatest = constant;
  for (const SumTerm& term : terms) {
    least += term.least();
    greatest += term.greatest();
  }
}

}  // namespace hz
