// The distribution of the part of ln S that does not hang on Teff: a sum of independent terms.
#pragma once
#include <vector>

#include "gauss_rules.hpp"
#include "hz/placement.hpp"

namespace hz {

/// The node spread of a half-normal that an integral looks at; 2e-7 of its mass lies beyond.
inline constexpr double integrated_sigmas = 5.2;

/// How finely an integral is taken.
enum class Effort {
  full,    // probabilities: about 1e-5
  coarse,  // half-widths: about 1 per cent of themselves
};

/// A variable and what it adds to ln S: power ln x, power ln(10) x, or -ln(1 - x^2) / 2 of an eccentricity.
class SumTerm {
public:
  enum class Shape { logarithm, decadic, eccentricity };
  SumTerm(Distribution x, Shape shape, double power);

  [[nodiscard]] double value(double x) const;
  /// The x whose value is y; an end of the variable's own scale when there is none.
  [[nodiscard]] double inverse(double y) const;
  /// Probability that this term is at least y.
  [[nodiscard]] double tail(double y) const;
  /// 68 per cent half-width of the term, for choosing orders and the closed-form variable.
  [[nodiscard]] double width() const { return width_; }
  [[nodiscard]] const Distribution& x() const { return x_; }
  /// Where the tail has a corner because the density jumps: at an uneven joint of the halves and where the domain cuts.
  [[nodiscard]] const std::vector<double>& corners() const { return corners_; }
  /// Smallest and greatest value within integrated_sigmas.
  [[nodiscard]] double least() const { return least_; }
  [[nodiscard]] double greatest() const { return greatest_; }

private:
  Distribution x_;
  Shape shape_;
  double power_;
  double width_ = 0;
  double least_ = 0;
  double greatest_ = 0;
  std::vector<double> corners_;
};

/// ln S without its Teff part.
class InsolationSum {
public:
  InsolationSum(const PlacementInput& input, Effort effort);

  /// Probability that the sum is at least y. The widest term is taken in closed form through its own distribution function,
  /// the second is integrated piece by piece between the corners of the first, the others by Gauss rules.
  [[nodiscard]] double tail(double y) const;

  [[nodiscard]] double width() const { return width_; }
  /// The scale on which tail() bends: the width of its sharpest feature that nothing smooths.
  [[nodiscard]] double smoothness() const { return smoothness_; }
  [[nodiscard]] double least() const { return least_; }
  [[nodiscard]] double greatest() const { return greatest_; }

private:
  [[nodiscard]] double tail_from(std::size_t term, double y) const;
  [[nodiscard]] double tail_of_two(double y) const;
  [[nodiscard]] double tail_over_piece(const Piece& piece, double y) const;

  double constant_ = 0;             // the known terms
  std::vector<SumTerm> terms_;      // the uncertain ones, widest first
  std::vector<Rule> outer_;         // of the third term and on: what each node adds, and its weight
  Rule second_;                     // of the second term, for where the first is smooth
  Effort effort_;
  double smoothness_ = 0;
  double width_ = 0;
  double least_ = 0;
  double greatest_ = 0;
};

}  // namespace hz
