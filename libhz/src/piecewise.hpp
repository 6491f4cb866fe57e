// Curves that published relations are made of: polynomials in pieces, and straight lines between the rows of a table.
#pragma once
#include <vector>

namespace hz {

/// What the polynomials of a relation are polynomials of: (x or log10 x, minus a reference) / a divisor.
struct Argument {
  bool log10 = false;
  double minus = 0;
  double over = 1;

  [[nodiscard]] double of(double x) const;
};

/// c[0] + c[1] t + c[2] t^2 + … from x = `from` up to the next piece.
struct PolynomialPiece {
  double from = 0;
  std::vector<double> coefficients;
};

class PiecewisePolynomial {
public:
  PiecewisePolynomial() = default;
  /// At least one piece, by rising `from`; the first one also serves below its own.
  PiecewisePolynomial(Argument argument, std::vector<PolynomialPiece> pieces);

  [[nodiscard]] double operator()(double x) const;
  [[nodiscard]] const std::vector<PolynomialPiece>& pieces() const { return pieces_; }

private:
  Argument argument_;
  std::vector<PolynomialPiece> pieces_;
};

struct Point {
  double x = 0;
  double y = 0;
};

/// Straight lines through points of strictly rising x, at least two; flat outside.
class Polyline {
public:
  Polyline() = default;
  explicit Polyline(std::vector<Point> points);

  [[nodiscard]] double operator()(double x) const;
  [[nodiscard]] const std::vector<Point>& points() const { return points_; }

private:
  std::vector<Point> points_;
};

/// x(y) of rising straight pieces between x = low and high. Where two pieces overlap in y, or leave a gap, one straight
/// line joins the last unshared point of the lower piece to the first of the upper one: the inverse rises everywhere
/// and over a gap stays at the break.
[[nodiscard]] Polyline inverse(const PiecewisePolynomial& lines, double low, double high);

}  // namespace hz
