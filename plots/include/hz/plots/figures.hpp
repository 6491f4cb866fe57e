// The kinds of figure: from systems to scenes.
#pragma once
#include <cstddef>
#include <vector>

#include "hz/plots/scene.hpp"
#include "hz/plots/system.hpp"

namespace hz::plots {

/// The narrowest page on which every figure still has room for its words, pt (60 mm).
inline constexpr double narrowest_page = 60 * 72 / 25.4;
/// The widest, pt (1 m).
inline constexpr double widest_page = 1000 * 72 / 25.4;
/// So many rows of lanes are drawn; the figure says when there were more.
inline constexpr std::size_t most_lanes = 40;

/// One system: the star at left, its zone as arcs, each planet on its orbit, rulers of distance, insolation and period.
///
/// The page is as high as it needs to be. Throws hz::Error: usage for a width outside narrowest_page to widest_page, or
/// too narrow for so many planets; output when the bundled fonts are not found. Values must be finite and above 0 where
/// hz/plots/system.hpp says so (HZ_REQUIRE).
[[nodiscard]] Scene wedge_scene(const FigureStar& star, const FigureOptions& options);

/// One row a star, in the order given: its zone as a bar, its planets, the best of them at right.
///
/// Stars beyond most_lanes are left out, and the figure says so. At least one star. Throws as wedge_scene.
[[nodiscard]] Scene lanes_scene(const std::vector<FigureStar>& stars, const FigureOptions& options);

}  // namespace hz::plots
