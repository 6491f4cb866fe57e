// The planet's mass for limits that depend on it.
#pragma once
#include <optional>

#include "resolver.hpp"

namespace hz {

struct PlanetMassRoute {
  Distribution x = Distribution::exact(1);
  bool decadic = false;
  Derived derived;              // Earth masses
  std::optional<double> limit;  // the end that a limit leaves possible, where nothing better is known; Earth masses
};

/// Stated, from the minimum mass, from the radius, else 1 Earth mass; raises its flags. A minimum mass is divided by
/// the sine of the stated inclination, else of an isotropic one.
[[nodiscard]] Result<PlanetMassRoute> planet_mass_route(Resolver& resolver);

}  // namespace hz
