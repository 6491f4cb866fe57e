// The colour of a star's disc: decoration only, nothing is read from it.
#pragma once
#include "hz/plots/scene.hpp"

namespace hz::plots {

/// CIE 1931 chromaticity of a black body.
///
/// Validity  1667 to 25000 K; held at the ends outside.
/// Source    Kang et al. 2002, "Design of advanced color temperature control system for HDTV applications",
///           J. Korean Phys. Soc. 41, 865 (cubic splines of the Planckian locus).
struct Chromaticity {
  double x = 0;
  double y = 0;
};
[[nodiscard]] Chromaticity black_body_chromaticity(double teff);

/// Its colour in sRGB (IEC 61966-2-1), as bright as the screen allows.
[[nodiscard]] Color star_tint(double teff);

}  // namespace hz::plots
