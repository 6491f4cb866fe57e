// Numbers as a figure writes them.
#pragma once
#include <string>

#include "hz/measured.hpp"
#include "hz/plots/scene.hpp"

namespace hz::plots {

/// `4410 ± 70`, `0.165 ± 0.009`, `4410 +80/−60`: half-widths with two digits, the value to the same decimal, zeros that
/// end all of them left out; ± does not part from its number. Without a half-width above 0: four digits.
[[nodiscard]] std::string measured_text(const Measured& measured);

/// Two digits; `> 0.99` above 0.99 and `< 0.01` below 0.01.
[[nodiscard]] std::string probability_text(double p);

/// digit * 10^exponent: `0.05`, `2000`, and with a power of ten from 10^4 on and below 10^-4. `digit` is 1 to 9.
[[nodiscard]] Text tick_text(int digit, int exponent);

}  // namespace hz::plots
