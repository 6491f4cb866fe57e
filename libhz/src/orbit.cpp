#include "hz/orbit.hpp"

#include <cmath>

#include "hz/constants.hpp"

namespace hz {

double semi_major_axis_of(double period, double stellar_mass) {
  const double years = period / constants::period_1au_d;
  return std::cbrt(stellar_mass * years * years);
}

double period_of(double semi_major_axis, double stellar_mass) {
  return constants::period_1au_d * std::sqrt(semi_major_axis * semi_major_axis * semi_major_axis / stellar_mass);
}

double mean_flux_factor(double eccentricity) { return 1 / std::sqrt(1 - eccentricity * eccentricity); }

double time_share_within(double distance, double eccentricity) {
  if (distance >= 1 + eccentricity) return 1;
  if (distance <= 1 - eccentricity) return 0;
  // r = a (1 - e cos E), and time runs with the mean anomaly E - e sin E.
  const double anomaly = std::acos((1 - distance) / eccentricity);
  return (anomaly - eccentricity * std::sin(anomaly)) / constants::pi;
}

}  // namespace hz
