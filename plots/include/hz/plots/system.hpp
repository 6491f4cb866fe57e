// What a figure is told: one star, its limits and its planets, as plain values that are already worked out.
#pragma once
#include <optional>
#include <string>
#include <vector>

#include "hz/measured.hpp"

namespace hz::plots {

enum class LimitRole { optimistic_inner, conservative_inner, conservative_outer, optimistic_outer };

/// One limit of the zone, for this star.
struct FigureLimit {
  std::string title;  // "runaway greenhouse"
  LimitRole role = LimitRole::conservative_inner;
  Measured distance;  // au, above 0; the half-widths are those of the limit for this star; missing ones are drawn sharp
  bool held = false;  // the star lies outside the fitted range
};

/// The nearest and the farthest point of an eccentric orbit, au.
struct OrbitSpan {
  double periastron = 0;
  double apastron = 0;
};

/// One planet, placed.
struct FigurePlanet {
  std::string name;          // "Lantern 27 d"
  std::string label;         // "d"; empty: the name is written
  Measured semi_major_axis;  // au, above 0
  std::optional<OrbitSpan> span;
  std::optional<double> radius;  // Earth radii
  bool radius_is_limit = false;  // drawn as an unmeasured radius
  std::optional<double> p_conservative;
  std::optional<double> p_optimistic;
};

/// One system: a row of lanes, or a whole wedge.
struct FigureStar {
  std::string name;
  Measured teff;                       // K, above 0
  Measured luminosity;                 // nominal solar, above 0
  std::optional<double> stellar_mass;  // solar; without it there is no period ruler
  std::vector<FigureLimit> limits;     // any order; roles may be missing
  std::vector<FigurePlanet> planets;   // any order
};

/// Whose probability fills the discs.
enum class FilledZone { conservative, optimistic };

/// What a figure needs beside the systems.
struct FigureOptions {
  double width = 0;  // page, pt (hz/plots/length.hpp)
  FilledZone filled_by = FilledZone::conservative;
  std::string limit_set;            // "Kopparapu et al. 2014"; named in the key; may be empty
  std::string runaway_planet_mass;  // "1 M⊕", where a limit depends on it; may be empty
  std::string order;                // lanes only, above the names: "hottest first"; may be empty
};

}  // namespace hz::plots
