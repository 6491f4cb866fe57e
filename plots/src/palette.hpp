// The colours of the figures.
//
// Blue is water, grey is elsewhere. The blue is that of the high-contrast set of P. Tol (SRON/EPS/TN/09-002, "Colour
// Schemes"), which survives grey print and colour-blind eyes; the shades of the zone are tints towards white of the sky
// blue of Okabe & Ito (2008, "Color Universal Design").
#pragma once
#include "hz/plots/scene.hpp"

namespace hz::plots::palette {

/// `share` of the first colour, the rest of the second.
constexpr Color mixed(const Color& first, const Color& second, double share) {
  return {share * first.red + (1 - share) * second.red, share * first.green + (1 - share) * second.green,
          share * first.blue + (1 - share) * second.blue};
}

constexpr Color rgb(int red, int green, int blue) { return {red / 255.0, green / 255.0, blue / 255.0}; }

inline constexpr Color white = rgb(255, 255, 255);
inline constexpr Color ink = rgb(34, 34, 34);         // words and whiskers
inline constexpr Color grey = rgb(85, 85, 85);        // second words, orbits
inline constexpr Color guide = rgb(119, 119, 119);    // thin lines that only lead the eye
inline constexpr Color unknown = rgb(221, 221, 221);  // inside of a disc without a probability
inline constexpr Color water = rgb(0, 68, 136);       // Tol high-contrast blue
inline constexpr Color sky = rgb(86, 180, 233);       // Okabe-Ito sky blue
inline constexpr Color conservative = mixed(sky, white, 0.50);
inline constexpr Color optimistic = mixed(sky, white, 0.22);

}  // namespace hz::plots::palette
