// From probabilities and central values to verdict, margin, zone position and merit.
#pragma once
#include "hz/answer.hpp"

namespace hz {

/// Fills in what follows from the placement input of an answered planet; its insolation and axis stand already.
void judge(PlanetAnswer& planet, const PlacementInput& input, const ListRow& row, const Settings& settings);

/// No verdict firmer than likely: what a close companion leaves.
void soften(PlanetAnswer& planet);

[[nodiscard]] double central_planet_mass(const PlacementInput& input);

}  // namespace hz
