#include "gauss_rules.hpp"

#include <Eigen/Eigenvalues>
#include <array>
#include <cmath>
#include <mutex>

#include "hz/constants.hpp"
#include "hz/require.hpp"

namespace hz {
namespace {

constexpr std::size_t greatest_order = 64;

/// Golub & Welsch 1969, Math. Comp. 23, 221: nodes are the eigenvalues of the Jacobi matrix, weights the squared first
/// components of its eigenvectors times the measure's mass.
Rule golub_welsch(const Eigen::VectorXd& diagonal, const Eigen::VectorXd& subdiagonal, double mass) {
  Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver;
  solver.computeFromTridiagonal(diagonal, subdiagonal, Eigen::ComputeEigenvectors);
  Rule rule;
  for (Eigen::Index i = 0; i < diagonal.size(); ++i) {
    const double first = solver.eigenvectors()(0, i);
    rule.push_back({solver.eigenvalues()(i), mass * first * first});
  }
  return rule;
}

Rule make_gauss_legendre(std::size_t order) {
  const auto n = static_cast<Eigen::Index>(order);
  Eigen::VectorXd subdiagonal(n - 1);
  for (Eigen::Index k = 1; k < n; ++k) {
    const auto kk = static_cast<double>(k);
    subdiagonal(k - 1) = kk / std::sqrt(4 * kk * kk - 1);
  }
  return golub_welsch(Eigen::VectorXd::Zero(n), subdiagonal, 2);
}

Rule make_half_normal(std::size_t order) {
  Rule dense;
  for (int z = 0; z < 12; ++z) {
    visit_half_normal(z, z + 1, 32, [&](double x, double weight) { dense.push_back({x, weight}); });
  }
  return gauss_rule_of(dense, order);
}

/// Rules are made at first use and then only read; each has its own once-flag, so threads may ask at the same time.
template <class Make>
const Rule& kept(std::size_t order, std::array<Rule, greatest_order + 1>& rules,
                 std::array<std::once_flag, greatest_order + 1>& made, Make make) {
  HZ_REQUIRE(order >= 1 && order <= greatest_order);
  std::call_once(made[order], [&] { rules[order] = make(order); });
  return rules[order];
}

}  // namespace

const Rule& gauss_legendre(std::size_t order) {
  static std::array<Rule, greatest_order + 1> rules;
  static std::array<std::once_flag, greatest_order + 1> made;
  return kept(order, rules, made, make_gauss_legendre);
}

const Rule& half_normal_rule(std::size_t order) {
  static std::array<Rule, greatest_order + 1> rules;
  static std::array<std::once_flag, greatest_order + 1> made;
  return kept(order, rules, made, make_half_normal);
}

Rule gauss_rule_of(std::span<const Node> measure, std::size_t order) {
  if (measure.size() <= order) return Rule(measure.begin(), measure.end());
  double mass = 0;
  for (const Node& node : measure) mass += node.weight;

  // Stieltjes' procedure: orthonormal polynomials on the measure's own nodes give the Jacobi matrix.
  const auto n = static_cast<Eigen::Index>(order);
  Eigen::VectorXd diagonal(n);
  Eigen::VectorXd subdiagonal(n - 1);
  std::vector<double> previous(measure.size(), 0.0);
  std::vector<double> current(measure.size(), 1 / std::sqrt(mass));
  double norm = 0;
  for (Eigen::Index k = 0; k < n; ++k) {
    double alpha = 0;
    for (std::size_t i = 0; i < measure.size(); ++i)
      alpha += measure[i].weight * measure[i].x * current[i] * current[i];
    diagonal(k) = alpha;
    if (k + 1 == n) break;
    double square = 0;
    for (std::size_t i = 0; i < measure.size(); ++i) {
      const double next = (measure[i].x - alpha) * current[i] - norm * previous[i];
      previous[i] = current[i];
      current[i] = next;
      square += measure[i].weight * next * next;
    }
    norm = std::sqrt(square);
    if (!(norm > 1e-12)) {  // the measure has no more than k + 1 distinct nodes
      return golub_welsch(diagonal.head(k + 1), subdiagonal.head(k), mass);
    }
    for (double& value : current) value /= norm;
    subdiagonal(k) = norm;
  }
  return golub_welsch(diagonal, subdiagonal, mass);
}

}  // namespace hz
