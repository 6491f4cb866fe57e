// Invented systems that figures are tried on.
#pragma once
#include <random>
#include <string>
#include <vector>

#include "hz/plots/system.hpp"

namespace hz::plots::testing {

/// The four limits of an invented star: about 0.75, 0.95, 1.68 and 1.77 au times sqrt(luminosity), with this relative
/// half-width.
std::vector<FigureLimit> four_limits(double luminosity, double width, bool held = false);

FigurePlanet planet(const std::string& label, double semi_major_axis, double half_width);

/// Four planets, two of them eccentric, from 0.06 to 0.79 au.
FigureStar lantern_27();
FigureStar without_planets();
FigureStar with_one_planet();
/// Eight planets within a factor of 5, at the zone of a held star; one without a radius.
FigureStar compact_in_zone();
/// Eight planets within a factor of 4, far inside the zone.
FigureStar compact_inside();
/// Two planets 0.7 per cent apart, one of them a giant; neither stellar mass nor the third planet's radius or P known.
FigureStar nearly_equal();
/// Planets at 0.005 and 100 au.
FigureStar far_apart();
FigureStar with_long_name();
/// Characters that the fonts have and have not, signs, a line break, broken UTF-8.
FigureStar with_strange_names();

/// All of the above.
std::vector<FigureStar> awkward_systems();

/// 0 to 8 planets, everything that may be missing missing now and then.
FigureStar random_system(std::mt19937& source);

/// Page width in mm; the words of the default limit set.
FigureOptions options(double width_mm);

}  // namespace hz::plots::testing
