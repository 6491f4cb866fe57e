// A value as a list gives it, with its uncertainty: the only carrier of uncertainty in this library.
#pragma once
#include <optional>

namespace hz {

/// Whether a number is a measurement or the end of what is possible.
enum class LimitMark {
  none,   // a measurement
  upper,  // "<": the true value lies below
  lower,  // ">": the true value lies above
};

/// A number with its lower and upper half-width (68 per cent, both at least 0), on the scale and in the unit it is
/// quoted in.
///
/// A half-width that the list leaves out is empty, never 0 or NaN; a printed 0 stays 0. Which distribution these
/// numbers stand for, and what an empty or zero half-width means, is decided in hz/distribution.hpp and nowhere else.
struct Measured {
  double value = 0;
  std::optional<double> minus;
  std::optional<double> plus;
  LimitMark limit = LimitMark::none;
  bool exact = false;  // typed by hand without half-widths: taken as known

  friend bool operator==(const Measured&, const Measured&) = default;
};

}  // namespace hz
