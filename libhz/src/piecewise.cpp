#include "piecewise.hpp"

#include <algorithm>
#include <cmath>
#include <iterator>
#include <utility>

#include "hz/require.hpp"

namespace hz {
namespace {

double horner(const std::vector<double>& coefficients, double t) {
  double sum = 0;
  for (auto c = coefficients.rbegin(); c != coefficients.rend(); ++c) sum = sum * t + *c;
  return sum;
}

double line_at(const PolynomialPiece& line, double x) { return horner(line.coefficients, x); }

double x_of(const PolynomialPiece& line, double y) { return (y - line.coefficients[0]) / line.coefficients[1]; }

}  // namespace

double Argument::of(double x) const { return ((log10 ? std::log10(x) : x) - minus) / over; }

PiecewisePolynomial::PiecewisePolynomial(Argument argument, std::vector<PolynomialPiece> pieces)
    : argument_(argument), pieces_(std::move(pieces)) {
  HZ_REQUIRE(!pieces_.empty());
  const auto falls = [](const PolynomialPiece& a, const PolynomialPiece& b) { return b.from <= a.from; };
  HZ_REQUIRE(std::adjacent_find(pieces_.begin(), pieces_.end(), falls) == pieces_.end());
}

double PiecewisePolynomial::operator()(double x) const {
  const auto starts_above = [](double at, const PolynomialPiece& piece) { return at < piece.from; };
  const auto next = std::upper_bound(pieces_.begin() + 1, pieces_.end(), x, starts_above);
  return horner(std::prev(next)->coefficients, argument_.of(x));
}

Polyline::Polyline(std::vector<Point> points) : points_(std::move(points)) {
  HZ_REQUIRE(points_.size() >= 2);
  const auto falls = [](const Point& a, const Point& b) { return b.x <= a.x; };
  HZ_REQUIRE(std::adjacent_find(points_.begin(), points_.end(), falls) == points_.end());
}

double Polyline::operator()(double x) const {
  const auto lies_below = [](const Point& point, double at) { return point.x < at; };
  const auto above = std::lower_bound(points_.begin() + 1, points_.end() - 1, x, lies_below);
  const auto below = std::prev(above);
  const double part = std::clamp((x - below->x) / (above->x - below->x), 0.0, 1.0);
  return below->y + part * (above->y - below->y);
}

Polyline inverse(const PiecewisePolynomial& lines, double low, double high) {
  const std::vector<PolynomialPiece>& pieces = lines.pieces();
  for (const PolynomialPiece& piece : pieces) HZ_REQUIRE(piece.coefficients.size() == 2 && piece.coefficients[1] > 0);
  std::vector<Point> points = {{line_at(pieces.front(), low), low}};
  for (auto upper = pieces.begin() + 1; upper != pieces.end(); ++upper) {
    const auto lower = std::prev(upper);
    const double end = line_at(*lower, upper->from);
    const double start = line_at(*upper, upper->from);
    points.push_back({std::min(end, start), std::min(upper->from, x_of(*lower, start))});
    points.push_back({std::max(end, start), std::max(upper->from, x_of(*upper, end))});
  }
  points.push_back({line_at(pieces.back(), high), high});
  return Polyline(std::move(points));
}

}  // namespace hz
