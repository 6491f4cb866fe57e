#include "star_tint.hpp"

#include <algorithm>
#include <array>
#include <cmath>

namespace hz::plots {
namespace {

struct Cubic {
  double c3, c2, c1, c0;
  [[nodiscard]] double operator()(double t) const { return ((c3 * t + c2) * t + c1) * t + c0; }
};

// Kang et al. 2002: x as a cubic in 1000 K / T, y as a cubic in x.
constexpr Cubic x_cool{-0.2661239, -0.2343589, 0.8776956, 0.179910};
constexpr Cubic x_hot{-3.0258469, 2.1070379, 0.2226347, 0.240390};
constexpr Cubic y_coolest{-1.1063814, -1.34811020, 2.18555832, -0.20219683};
constexpr Cubic y_cool{-0.9549476, -1.37418593, 2.09137015, -0.16748867};
constexpr Cubic y_hot{3.0817580, -5.87338670, 3.75112997, -0.37001483};

/// IEC 61966-2-1, the transfer curve.
double encoded(double linear) {
  return linear <= 0.0031308 ? 12.92 * linear : 1.055 * std::pow(linear, 1 / 2.4) - 0.055;
}

}  // namespace

Chromaticity black_body_chromaticity(double teff) {
  const double t = std::clamp(teff, 1667.0, 25000.0);
  const double x = t <= 4000 ? x_cool(1000 / t) : x_hot(1000 / t);
  if (t <= 2222) return {x, y_coolest(x)};
  return {x, t <= 4000 ? y_cool(x) : y_hot(x)};
}

Color star_tint(double teff) {
  const auto [x, y] = black_body_chromaticity(teff);
  const double big_x = x / y;
  const double big_z = (1 - x - y) / y;
  // IEC 61966-2-1: XYZ (Y = 1) to linear sRGB; colours outside the gamut lose their negative part.
  std::array<double, 3> linear{3.2406 * big_x - 1.5372 - 0.4986 * big_z, -0.9689 * big_x + 1.8758 + 0.0415 * big_z,
                               0.0557 * big_x - 0.2040 + 1.0570 * big_z};
  const double brightest = *std::max_element(linear.begin(), linear.end());
  for (double& channel : linear) channel = encoded(std::max(0.0, channel / brightest));
  return {linear[0], linear[1], linear[2]};
}

}  // namespace hz::plots
