#include "hz/distance.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <optional>
#include <vector>

#include "gauss_rules.hpp"
#include "hz/require.hpp"

namespace hz {
namespace {

constexpr double low_tail = 0.15865525393145705;  // Phi(-1)
constexpr double ln10 = 2.302585092994045684;
constexpr double greatest_held = 1e12;
constexpr double finest_parallax = 1e-10;
constexpr double negligible = -30;     // logarithm of a density beside its peak
constexpr double panel_in_scales = 2;  // panel length in units of the density's own scale
constexpr std::size_t order = 8;       // Gauss-Legendre nodes a panel

/// The posterior in units of the length scale: x = r / L, and the parallax times L is 1 / x.
struct Posterior {
  double parallax = 0;  // times L
  double sigma = 0;     // times L
};

/// Geometric bisection for the place where `rises` turns from false to true.
template <class Rises>
double turning_point(double low, double high, Rises rises) {
  for (int step = 0; step < 200; ++step) {
    const double middle = std::sqrt(low) * std::sqrt(high);
    if (middle <= low || middle >= high) break;  // neighbouring numbers
    (rises(middle) ? high : low) = middle;
  }
  return high;
}

/// The density's nearer peak, and the trough behind it where there is a second peak.
struct Peak {
  double at = 0;
  std::optional<double> trough;
};

/// Bailer-Jones 2015, eq. 19: the density of r is level where x^3 - 2 x^2 + a x - b = 0 with a = parallax / sigma^2 and
/// b = 1 / sigma^2. The cubic rises, falls between its stationary points and rises again: with three roots the first is
/// the nearer peak, the second the trough.
Peak nearer_peak(const Posterior& posterior) {
  const double b = 1 / (posterior.sigma * posterior.sigma);
  const double a = posterior.parallax * b;
  const auto positive = [&](double x) { return ((x - 2) * x + a) * x - b >= 0; };
  const auto negative = [&](double x) { return !positive(x); };
  const double least = std::min(1.0, b / (1 + std::abs(a))) / 2;      // there x^3 + |a| x < b
  const double greatest = 3 + std::sqrt(std::abs(a)) + std::cbrt(b);  // there x^2 (x - 2) > b + |a| x
  if (a < 4.0 / 3) {
    const double root = std::sqrt(4 - 3 * a);
    const double first = a / (2 + root);  // (2 - root) / 3 without its cancellation
    const double second = (2 + root) / 3;
    const bool two_peaks = first > 0 && positive(first) && negative(second);
    if (two_peaks) return {turning_point(least, first, positive), turning_point(first, second, negative)};
  }
  return {turning_point(least, greatest, positive), std::nullopt};
}

/// The density of ln x, as a function of t = ln(x / reference). Differences from the reference are formed without
/// cancellation, so that even a parallax known to one part in 1e10 keeps its digits.
class LogDensity {
public:
  LogDensity(const Posterior& posterior, double reference)
      : reference_(reference),
        true_parallax_(1 / reference),
        misfit_(posterior.parallax - true_parallax_),
        precision_(1 / (posterior.sigma * posterior.sigma)),
        parallax_(std::abs(posterior.parallax)) {}

  /// Logarithm of the density beside that at the reference: 3 ln x - x - (parallax - 1/x)^2 / (2 sigma^2).
  [[nodiscard]] double operator()(double t) const {
    const double growth = std::expm1(t);                           // of x
    const double change = true_parallax_ * growth / (1 + growth);  // of the misfit: 1/x shrinks
    return 3 * t - reference_ * growth - change * (misfit_ + change / 2) * precision_;
  }
  /// A length in t over which the density is smooth: the second derivative with all its terms counted positive.
  [[nodiscard]] double scale(double t) const {
    const double x = reference_ * std::exp(t);
    return 1 / std::sqrt(1 + x + (parallax_ + 2 / x) * precision_ / x);
  }

private:
  double reference_;
  double true_parallax_;
  double misfit_;
  double precision_;
  double parallax_;
};

/// A stretch of ln x, short enough for one Gauss rule, with the mass over it.
struct Panel {
  double start = 0;
  double length = 0;
  double mass = 0;
};

/// The posterior's distribution function in t, panel by panel.
class Cumulative {
public:
  /// From below the reference (a peak in r) to `end`, as far as the density is not negligible beside that peak.
  Cumulative(const LogDensity& log_density, double end) : log_density_(log_density) {
    double t = 0;
    while (log_density_(t) > negligible) t -= panel_in_scales * log_density_.scale(t);
    while (t < end && (t < 0 || log_density_(t) > negligible)) {
      const double length = std::min(panel_in_scales * log_density_.scale(t), end - t);
      panels_.push_back({t, length, mass(t, length)});
      total_ += panels_.back().mass;
      t += length;
    }
  }

  [[nodiscard]] double quantile(double u) const {
    double missing = u * total_;
    auto panel = panels_.begin();
    for (; panel + 1 != panels_.end() && missing > panel->mass; ++panel) missing -= panel->mass;
    return panel->start + length_of(*panel, missing);
  }

private:
  [[nodiscard]] double density(double t) const { return std::exp(log_density_(t)); }
  [[nodiscard]] double mass(double start, double length) const {
    double sum = 0;
    for (const Node& node : rule_) sum += node.weight * density(start + length / 2 * (1 + node.x));
    return length / 2 * sum;
  }
  /// How far into the panel its mass reaches `wanted`: Newton's steps, halved where they leave the bracket.
  [[nodiscard]] double length_of(const Panel& panel, double wanted) const {
    double low = 0;
    double high = panel.length;
    double length = panel.length * std::clamp(wanted / panel.mass, 0.0, 1.0);
    for (int step = 0; step < 50; ++step) {
      const double excess = mass(panel.start, length) - wanted;
      (excess > 0 ? high : low) = length;
      double next = length - excess / density(panel.start + length);
      if (!(next > low && next < high)) next = low + (high - low) / 2;
      if (std::abs(next - length) < 1e-4 * panel.length) return next;
      length = next;
    }
    return length;
  }

  const Rule& rule_ = gauss_legendre(order);
  LogDensity log_density_;
  std::vector<Panel> panels_;
  double total_ = 0;
};

}  // namespace

Measured log_distance_posterior(double parallax, double half_width, double length_scale) {
  HZ_REQUIRE(std::isfinite(parallax) && half_width > 0 && length_scale > 0);
  // Held where squares would overflow, and where the peak would be narrower than the spacing of numbers.
  const double held_parallax = std::clamp(parallax, -greatest_held, greatest_held);
  const double sigma =
      std::max(std::clamp(half_width, 1 / greatest_held, greatest_held), finest_parallax * std::abs(held_parallax));
  const double scale = std::clamp(length_scale, 1 / greatest_held, greatest_held);

  const double in_length_scales = scale / 1000;  // mas to 1 / length_scale
  const Posterior posterior{held_parallax * in_length_scales, sigma * in_length_scales};
  const Peak peak = nearer_peak(posterior);
  const double end = peak.trough ? std::log(*peak.trough / peak.at) : std::numeric_limits<double>::infinity();
  const Cumulative cumulative(LogDensity(posterior, peak.at), end);

  const double median = cumulative.quantile(0.5);
  Measured result;
  result.value = (std::log(peak.at * scale) + median) / ln10;
  result.minus = (median - cumulative.quantile(low_tail)) / ln10;
  result.plus = (cumulative.quantile(1 - low_tail) - median) / ln10;
  return result;
}

}  // namespace hz
