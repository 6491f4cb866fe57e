// Values with uncertainties as people write them.
#pragma once
#include <optional>
#include <string>
#include <string_view>

#include "hz/measured.hpp"
#include "hz/result.hpp"

namespace hz {

/// A number with what may stand around it.
struct MeasuredText {
  Measured measured;
  std::string unit;  // the word after the number ("d", "RJ", "ME"), as written; empty without one
};

/// Reads `4410`, `4410+-70`, `4410+/-70`, `4410±70`, `4410 ± 70`, `4410+80-60`, `4410 (+80/-60)`, `4410 +80 -60`,
/// `0.165(9)` (= ±0.009: last digits), `<0.3`, `> 0.04`, `1.2d3`, each with an optional unit word behind it.
///
/// Half-widths come out at least 0. Not finite, a half-width without its number (`4553+15-`) or anything left over
/// gives Problem::unreadable, which quotes the text, with comma_hint() where that helps. `column` names the place in
/// the problem.
[[nodiscard]] Result<MeasuredText> parse_measured(std::string_view text, std::string_view column);

/// Empty text and the documented spellings of "no value": nan, null, none, n/a, na, -, --, ..., … (any case, blanks
/// around).
[[nodiscard]] bool is_missing(std::string_view text);

/// "; a decimal comma? write 4.62" for a text that would be a value but for its commas; empty for any other.
[[nodiscard]] std::string comma_hint(std::string_view text);

/// The whole of `text` as a finite number: leading +, the sign U+2212, Fortran exponents; nullopt otherwise.
[[nodiscard]] std::optional<double> parse_number(std::string_view text);

}  // namespace hz
