// What a list says twice.
#pragma once
#include <string>

#include "resolver.hpp"

namespace hz {

/// Compares stated values with what other stated values of the row lead to: luminosity, teff, log_g, distance,
/// semi_major_axis, planet_radius, and insolation against the one that was used. Raises inconsistent: flags beyond 3
/// sigma and 10 per cent, and returns both values in words. Photometry takes part only where its extinction is known or
/// small.
[[nodiscard]] std::string contradictions(Resolver& resolver, const Measured* insolation);

}  // namespace hz
