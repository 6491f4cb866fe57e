// How the values of a star were come by, in words.
#pragma once
#include <string>
#include <string_view>

#include "hz/answer.hpp"

namespace hz::app {

/// A route with the words the field uses: "magnitude_g, parallax and BC_G(teff)" becomes "G, parallax and BC_G(Teff)".
[[nodiscard]] std::string route_words(std::string_view route);

/// "Teff 4410 ± 70 K, L 0.1650 ± 0.0090 L☉": what the row itself states of its star, of what was used.
[[nodiscard]] std::string stated_values(const StarAnswer& star);

/// "Derived: Teff from V−K_s by …: 3412 ± 60 K; L from G, parallax and BC_G(Teff): 0.0218 ± 0.0011 L☉."; what is only
/// stated is left out. Empty when nothing was derived.
[[nodiscard]] std::string derivation_sentence(const StarAnswer& star);

}  // namespace hz::app
