// Numbers rounded for people. Files keep full precision; nothing here feeds a calculation. Nothing prints nan or inf:
// what is not finite shows as "-".
#pragma once
#include <cstddef>
#include <optional>
#include <string>

#include "hz/measured.hpp"

namespace hz::app {

/// Decimals that show `value` with this many significant digits; 0 for larger numbers, at most 9.
[[nodiscard]] int decimals_for(double value, int significant);

/// Decimals that show the larger half-width with two digits and the smaller one with at least one; where there is no
/// half-width, those that show the value with `significant` digits.
[[nodiscard]] int decimals_for(const Measured& measured, int significant);

/// "0.950", "−0.50".
[[nodiscard]] std::string fixed(double value, int decimals);

/// Up to six significant digits without trailing zeros: "5780", "0.165", "1.2e-07".
[[nodiscard]] std::string short_number(double value);

/// "0.412 ± 0.012", "0.790 +0.030 −0.021", "< 0.3", "1.676"; the short form takes the decimals from decimals_for().
[[nodiscard]] std::string measured_text(const Measured& measured, int decimals);
[[nodiscard]] std::string measured_text(const Measured& measured);

/// Two digits, "> 0.99" and "< 0.01" at the ends, "-" where there is none.
[[nodiscard]] std::string probability_text(std::optional<double> probability);

/// "5,347".
[[nodiscard]] std::string count_text(std::size_t count);

/// "1 row", "5,347 rows".
[[nodiscard]] std::string counted(std::size_t count, const std::string& thing);

/// Nearest number with this many significant digits: what goes into files where the rest would be noise.
[[nodiscard]] double rounded(double value, int significant);

}  // namespace hz::app
