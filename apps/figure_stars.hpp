// Answered rows as the stars of a figure.
#pragma once
#include <string>
#include <vector>

#include "hz/plots/figures.hpp"
#include "hz/ranking.hpp"
#include "hz/settings.hpp"

namespace hz::app {

/// Stars with their planets, in the order in which the stars first appear, and what could not be drawn.
struct FigureStars {
  std::vector<plots::FigureStar> stars;
  std::vector<std::string> left_out;  // "Lantern 12 b: no luminosity …"
};

/// One star a name; its values are those of its first row that has an answer. A planet of which only the insolation is
/// known stands at the distance where its star gives that much.
[[nodiscard]] FigureStars figure_stars(const std::vector<Candidate>& candidates, const Settings& settings);

}  // namespace hz::app
