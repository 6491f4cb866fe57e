// A planet on its axis, with the words it needs.
#pragma once
#include <optional>

#include "hz/plots/system.hpp"
#include "planet_row.hpp"

namespace hz::plots {

struct PlanetSpot {
  const FigurePlanet* planet = nullptr;
  double x = 0;
  double size = 0;  // radius of the disc
  double y = 0;     // of the disc's centre
  double side = 1;  // of the axis on which its whisker and label stand: -1 above, 1 below
  Text letter;
  Text p;  // empty where it is not written
  std::optional<WhiskerMark> whisker;
};

/// Text that interrupts the lines behind it.
[[nodiscard]] Mark over_ground(const PlanetRowPlan& plan, std::string tag, TextMark text);

}  // namespace hz::plots
