// The planets of one star along an axis, with labels that never touch.
#pragma once
#include <functional>
#include <optional>
#include <vector>

#include "canvas.hpp"
#include "hz/plots/system.hpp"
#include "log_scale.hpp"

namespace hz::plots {

/// A line that comes down from the top of the page to `height` above the axis, between x = low and high.
struct Curtain {
  double low = 0;
  double high = 0;
  double height = 0;
};

/// How a kind of figure wants its planets; the axis lies at y = 0.
struct PlanetRowPlan {
  LogScale axis;
  double unit = 4;  // radius of the disc of one Earth radius, pt
  FilledZone zone = FilledZone::conservative;
  bool labels_at_side = false;  // letter and P at the right of the disc; else the letter alone, above
  double clearance = 0;         // half the height of what labels and whiskers keep clear of
  TextStyle letter;
  TextStyle p;
  std::optional<Ground> ground;          // of the zone
  std::vector<Curtain> curtains;         // by rising x; labels keep clear of them
  std::function<Point(Point)> position;  // of a disc that belongs at x and stepped aside by y
};

/// Discs, whiskers and labels of all planets.
///
/// As long as nothing touches, labels stand beside their discs. Otherwise they go to rows above and below, by turns,
/// with leaders; discs that would cover each other step apart. Throws hz::Error (usage) when the page is too narrow for
/// so many labels.
[[nodiscard]] std::vector<Mark> planet_row(const Canvas& canvas, const FigureStar& star, const PlanetRowPlan& plan);

/// Room that a planet's label takes to the right of its place when it stands at the side of the disc, pt.
[[nodiscard]] double room_at_side(const Canvas& canvas, const FigurePlanet& planet, const PlanetRowPlan& plan);

}  // namespace hz::plots
