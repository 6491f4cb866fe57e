// A row's fields as distributions, with what had to be assumed raised as flags.
#pragma once
#include <optional>

#include "hz/flags.hpp"
#include "hz/records.hpp"
#include "hz/settings.hpp"

namespace hz {

/// A quantity as it enters the arithmetic: its distribution, and its value with the half-widths that were used.
struct Input {
  Distribution x = Distribution::exact(0);
  Measured used;
  bool assumed = false;  // the list gives no error: that of the settings was taken
  bool wide = false;     // the half-width exceeds the value
};

/// Takes fields out of one row.
class Inputs {
public:
  Inputs(const Settings& settings, Flags& flags) : settings_(settings), flags_(flags) {}

  /// The field as an input; empty when it is absent, or only a limit (then flagged limit_ignored). An unreadable cell
  /// or a value outside the quantity's domain is a Problem. A missing or zero error is replaced by the assumed one; the
  /// caller raises its flags when it uses the value.
  [[nodiscard]] Result<std::optional<Input>> take(Quantity quantity, const Field& field) const;

  /// Flags what was assumed of an input that is used.
  void raise(Quantity quantity, const Input& input) const;

  /// The same without flags, and empty on any trouble: for comparing what a list says twice.
  [[nodiscard]] std::optional<Input> peek(Quantity quantity, const Field& field) const;

  /// Eccentricity: circular when absent (flagged), a half-normal when an upper limit (flagged), else as take().
  [[nodiscard]] Result<Input> eccentricity(const Field& field) const;

  [[nodiscard]] Flags& flags() const { return flags_; }

  /// A value already known to be usable, with its half-widths settled.
  [[nodiscard]] Input settle(Quantity quantity, const Measured& measured) const;

private:
  [[nodiscard]] std::optional<Problem> refusal(Quantity quantity, const Measured& measured) const;

  const Settings& settings_;
  Flags& flags_;
};

/// Where a quantity can lie: eccentricity in [0, 1), extinctions at 0 or above, logarithms, magnitudes, colours and
/// parallaxes anywhere, everything else above 0.
[[nodiscard]] Domain domain_of(Quantity quantity);

}  // namespace hz
