// The ways from a row's fields to ln S, each as the terms it is a sum of.
#pragma once
#include <optional>
#include <string>
#include <vector>

#include "hz/answer.hpp"
#include "inputs.hpp"

namespace hz {

/// Part of ln S by one route, with the value of the quantity behind it.
struct Route {
  std::string name;  // "stated", "radius and teff", …
  double offset = 0;
  double teff_power = 0;
  std::vector<InsolationTerm> terms;
  Measured value;  // first-order half-widths
};

/// What the resolver reads from.
struct RowInputs {
  const StarRecord& star;
  const PlanetRecord& planet;
  const Settings& settings;
  Inputs inputs;
  std::optional<Input> teff;
};

/// ln L: as stated, else from radius and Teff (settings turn the order round). Empty when neither can be had.
[[nodiscard]] Result<std::optional<Route>> luminosity_route(const RowInputs& row);

/// Why a star has none: it is only a limit, or nothing gives it.
[[nodiscard]] Problem no_luminosity(const StarRecord& star);

/// -2 ln a: from period and stellar mass, else as stated, else a/R with R (settings turn the first two round).
[[nodiscard]] Result<std::optional<Route>> orbit_route(const RowInputs& row);

/// ln S before the eccentricity's factor, in the order of hz/settings.hpp; a Problem when there is none.
/// `averaged` tells that the route's value is averaged over the orbit already.
struct InsolationRoute {
  Route route;
  std::optional<Derived> luminosity;
  std::optional<Derived> semi_major_axis;
  bool averaged = false;
};
[[nodiscard]] Result<InsolationRoute> insolation_route(const RowInputs& row);

/// The planet's mass for limits that depend on it: stated, minimum, from the radius, else 1 Earth mass; raises its
/// flags.
struct PlanetMassRoute {
  Distribution x = Distribution::exact(1);
  bool decadic = false;
  Derived derived;              // Earth masses
  std::optional<double> limit;  // the end that a limit leaves possible, where nothing better is known; Earth masses
};
[[nodiscard]] Result<PlanetMassRoute> planet_mass_route(const RowInputs& row);

/// A product of powers with its first-order half-widths, each side from the side of each factor that moves it that way.
struct Factor {
  Measured value;
  double power = 1;
  bool decadic = false;
};
[[nodiscard]] Measured product(double constant, const std::vector<Factor>& factors);

/// Compares what the list says twice (luminosity, semi_major_axis, and insolation against the one that was used);
/// raises inconsistent: flags beyond 3 sigma and 10 per cent, and returns both values in words.
[[nodiscard]] std::string contradictions(const RowInputs& row, const Measured& insolation);

}  // namespace hz
