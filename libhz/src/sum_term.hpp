// The terms of ln S that do not hang on Teff.
#pragma once
#include <vector>

#include "hz/placement.hpp"
#include "measure.hpp"

namespace hz {

/// A variable and what it adds to ln S: power ln x, power ln(10) x, or -ln(1 - x^2) / 2 of an eccentricity.
class SumTerm {
public:
  enum class Shape { logarithm, decadic, eccentricity };
  SumTerm(Distribution x, Shape shape, double power);

  [[nodiscard]] double value(double x) const;
  /// Probability that this term is at least y.
  [[nodiscard]] double tail(double y) const;
  /// 68 per cent half-width of the term.
  [[nodiscard]] double width() const { return width_; }
  /// Whether the tail's slope jumps: at an uneven joint of the halves, or where the domain cuts.
  [[nodiscard]] bool has_corners() const { return has_corners_; }
  /// Smallest and greatest value within integrated_sigmas.
  [[nodiscard]] double least() const { return least_; }
  [[nodiscard]] double greatest() const { return greatest_; }
  [[nodiscard]] Rule points(const Smoothness& smoothness, Effort effort) const;

private:
  [[nodiscard]] double inverse(double y) const;

  Distribution x_;
  Shape shape_;
  double power_;
  bool has_corners_ = false;
  double width_ = 0;
  double least_ = 0;
  double greatest_ = 0;
};

/// ln S without its Teff part: a constant and independent terms, the widest first.
struct TermSum {
  explicit TermSum(const PlacementInput& input);

  double constant = 0;
  std::vector<SumTerm> terms;
  double least = 0;
  double greatest = 0;
};

}  // namespace hz
