#include "gauss_rules.hpp"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <stdexcept>

#include "hz/constants.hpp"

namespace hz {
namespace {

double moment(const Rule& rule, int power) {
  double sum = 0;
  for (const Node& node : rule) sum += node.weight * std::pow(node.x, power);
  return sum;
}

/// E z^k of a half-normal of unit width.
double half_normal_moment(int power) {
  return std::pow(2, power / 2.0) * std::tgamma((power + 1) / 2.0) / std::sqrt(constants::pi);
}

TEST(GaussLegendre, IsExactToTwiceItsOrder) {
  for (const std::size_t order : {1U, 2U, 5U, 16U, 64U}) {
    const Rule& rule = gauss_legendre(order);
    ASSERT_EQ(rule.size(), order);
    for (int power = 0; power < 2 * static_cast<int>(order); ++power) {
      EXPECT_NEAR(moment(rule, power), power % 2 == 0 ? 2.0 / (power + 1) : 0, 1e-13) << order << " " << power;
    }
  }
  EXPECT_GT(std::abs(moment(gauss_legendre(2), 4) - 2.0 / 5), 0.1);  // and no farther
}

TEST(GaussLegendre, OrdersOutOfReachAreABug) {
  EXPECT_THROW((void)gauss_legendre(0), std::logic_error);
  EXPECT_THROW((void)gauss_legendre(65), std::logic_error);
}

TEST(HalfNormalRule, HasTheMomentsOfAHalfNormal) {
  for (const std::size_t order : {1U, 2U, 3U, 5U, 8U, 12U}) {
    const Rule& rule = half_normal_rule(order);
    ASSERT_EQ(rule.size(), order);
    for (int power = 0; power < 2 * static_cast<int>(order); ++power) {
      EXPECT_NEAR(moment(rule, power) / half_normal_moment(power), 1, 1e-9) << order << " " << power;
    }
    for (const Node& node : rule) EXPECT_GT(node.x, 0);
  }
}

Rule uneven_measure() {
  Rule measure;
  for (int i = 0; i < 40; ++i)
    measure.push_back({std::sin(1.7 * i) + 0.05 * i, 0.01 + 0.03 * std::abs(std::cos(2.3 * i))});
  return measure;
}

TEST(GaussRuleOf, KeepsPolynomialsOfTwiceItsOrder) {
  const Rule measure = uneven_measure();
  for (const std::size_t order : {1U, 3U, 5U, 8U}) {
    const Rule rule = gauss_rule_of(measure, order);
    ASSERT_EQ(rule.size(), order);
    for (int power = 0; power < 2 * static_cast<int>(order); ++power) {
      EXPECT_NEAR(moment(rule, power), moment(measure, power), 1e-10 * std::max(1.0, std::abs(moment(measure, power))))
          << order << " " << power;
    }
  }
}

TEST(GaussRuleOf, IsTheMeasureItselfWhenThatIsSmall) {
  const Rule measure = {{1, 0.25}, {3, 0.75}};
  const Rule rule = gauss_rule_of(measure, 4);
  ASSERT_EQ(rule.size(), 2U);
  EXPECT_EQ(rule[1].x, 3);
  EXPECT_EQ(rule[1].weight, 0.75);
}

TEST(GaussRuleOf, RepeatedNodesAreOneNode) {
  Rule measure;
  for (int i = 0; i < 30; ++i) measure.push_back({i % 2 == 0 ? 1.0 : 2.0, 1.0 / 30});
  const Rule rule = gauss_rule_of(measure, 6);
  EXPECT_LE(rule.size(), 6U);
  for (int power = 0; power < 6; ++power) EXPECT_NEAR(moment(rule, power), moment(measure, power), 1e-12) << power;
}

TEST(VisitHalfNormal, WeighsAPartByItsOwnMass) {
  const auto between = [](double low, double high) {
    return std::erf(high / std::sqrt(2)) - std::erf(low / std::sqrt(2));
  };
  for (const auto& [low, high] :
       {std::pair(0.0, 5.2), std::pair(0.5, 3.1), std::pair(2.0, 2.001), std::pair(4.0, 9.0)}) {
    Rule rule;
    visit_half_normal(low, high, 12, [&](double z, double weight) { rule.push_back({z, weight}); });
    EXPECT_NEAR(moment(rule, 0) / between(low, high), 1, 1e-12) << low;
    const double first = std::sqrt(2 / constants::pi) * (std::exp(-low * low / 2) - std::exp(-high * high / 2));
    EXPECT_NEAR(moment(rule, 1) / first, 1, 1e-6) << low;
    for (const Node& node : rule) EXPECT_TRUE(node.x > low && node.x < high);
  }
}

TEST(Cuts, AreInRisingOrderAndInsideTheSpan) {
  Cuts cuts(5);
  for (const double z : {3.0, 1.0, -1.0, 0.0, 5.0, 7.0, 2.0}) cuts.add(z);
  const std::vector<double> ends(cuts.ends().begin(), cuts.ends().end());
  EXPECT_EQ(ends, (std::vector<double>{1, 2, 3, 5}));
}

TEST(Cuts, NanIsNoPlace) {
  Cuts cuts(5);
  cuts.add(std::nan(""));
  EXPECT_EQ(cuts.ends().size(), 1U);
}

}  // namespace
}  // namespace hz
