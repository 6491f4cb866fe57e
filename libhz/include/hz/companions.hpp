// Whether a list says that a star is not alone, and whether the other star is near enough to matter to its zone.
#pragma once
#include <optional>
#include <string>

#include "hz/records.hpp"

namespace hz {

/// A second star this many times as far as the outer zone limit, or nearer, is close.
inline constexpr double close_companion_factor = 10;

struct Companions {
  bool present = false;
  std::string why;  // what the list says, its reasons joined by "; "; empty when no companion is named
  bool close = false;
};

/// What a row says of other stars. Their light and pull are not modelled: this only says that they are there.
///
/// Present   number_of_stars of 2 or more; a companion_separation; a spectral type that names two ("M8+L3", not
///           "G5/6 V"); a planet that circles both stars.
/// Close     separation * distance <= close_companion_factor * outer_limit, or a planet that circles both stars. A
/// lower
///           limit of the separation (">") leaves it open and is not close; an upper limit ("<") counts as its value.
/// Units     distance in pc, outer_limit (of the zone, from the star) in au, both above 0; the separation in arcsec.
///           Without either of them no separation is close.
/// Error     the separation is the one seen on the sky on one date: the true one is as a rule larger, and on an
///           eccentric orbit it may become smaller. A separation of 0 is one too small to be printed; a negative one is
///           none.
[[nodiscard]] Companions companions_of(const StarRecord& star, const PlanetRecord& planet,
                                       std::optional<double> distance, std::optional<double> outer_limit);

}  // namespace hz
