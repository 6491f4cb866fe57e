// Orbits: Kepler's third law, and what eccentricity does to the light received.
#pragma once

namespace hz {

/// Semi-major axis of a planet of negligible mass: (M (P / 365.256898 d)^2)^(1/3), Kepler's third law.
/// Units: period in d, stellar_mass solar; the result in au. Both above 0.
[[nodiscard]] double semi_major_axis_of(double period, double stellar_mass);

/// The inverse. Units: semi_major_axis in au; the result in d.
[[nodiscard]] double period_of(double semi_major_axis, double stellar_mass);

/// Time-averaged flux on an eccentric orbit over that on the circular one of the same semi-major axis: 1 / sqrt(1 -
/// e^2). Source: Williams & Pollard 2002, Int. J. Astrobiology 1, 61. 0 <= eccentricity < 1.
[[nodiscard]] double mean_flux_factor(double eccentricity);

/// Share of an orbit's time spent closer to the star than `distance`, given in semi-major axes. 0 <= eccentricity < 1.
[[nodiscard]] double time_share_within(double distance, double eccentricity);

}  // namespace hz
