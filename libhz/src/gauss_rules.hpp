// Nodes and weights for the integrals of a placement.
#pragma once
#include <array>
#include <cmath>
#include <cstddef>
#include <span>
#include <vector>

namespace hz {

/// One node of a rule.
struct Node {
  double x = 0;
  double weight = 0;
};
using Rule = std::vector<Node>;

/// Gauss-Legendre on [-1, 1], weights summing to 2. The rule of an order is made once and kept.
[[nodiscard]] const Rule& gauss_legendre(std::size_t order);

/// Gauss rule for a half-normal of unit width: x in sigmas from 0 upwards, weights summing to 1.
[[nodiscard]] const Rule& half_normal_rule(std::size_t order);

/// The Gauss rule of `order` nodes for a measure given as many nodes; the measure itself when it has no more than that.
///
/// Exact for polynomials up to degree 2 order - 1 over the measure, so it serves where the integrand is smooth over its
/// span.
[[nodiscard]] Rule gauss_rule_of(std::span<const Node> measure, std::size_t order);

/// Where a half-normal between 0 and `last` sigmas is cut: the few places where an integrand bends, in rising order.
class Cuts {
public:
  explicit Cuts(double last) : last_(last) { ends_.front() = last; }
  void add(double z) {
    if (!(z > 0 && z < last_) || count_ == ends_.size()) return;
    std::size_t place = count_++;
    for (; place > 0 && ends_[place - 1] > z; --place) ends_[place] = ends_[place - 1];
    ends_[place] = z;
  }
  /// The upper ends of the parts; the first part begins at 0 and the last ends at `last`.
  [[nodiscard]] std::span<const double> ends() const { return {ends_.data(), count_}; }

private:
  double last_;
  std::array<double, 8> ends_{};
  std::size_t count_ = 1;
};

/// Nodes of a half-normal between z_low and z_high sigmas, in panels short enough that the density itself is integrated
/// to 1e-7; the weights sum to the part's own mass, erf(z_high / sqrt 2) - erf(z_low / sqrt 2). Calls visit(z, weight).
template <class Visit>
void visit_half_normal(double z_low, double z_high, std::size_t order, Visit visit) {
  constexpr double longest_panel = 2.6;
  const auto panels = static_cast<int>(std::ceil((z_high - z_low) / longest_panel));
  const double half = (z_high - z_low) / panels / 2;
  for (int panel = 0; panel < panels; ++panel) {
    const double middle = z_low + (2 * panel + 1) * half;
    const double mass = std::erfc((middle - half) / std::sqrt(2.0)) - std::erfc((middle + half) / std::sqrt(2.0));
    double sum = 0;
    for (const Node& node : gauss_legendre(order))
      sum += node.weight * std::exp(-0.5 * std::pow(middle + half * node.x, 2));
    for (const Node& node : gauss_legendre(order)) {
      const double z = middle + half * node.x;
      visit(z, node.weight * std::exp(-z * z / 2) * mass / sum);
    }
  }
}

}  // namespace hz
