// Units by the words people write, converted to the canonical unit of a quantity.
#pragma once
#include <optional>
#include <string_view>

#include "hz/measured.hpp"
#include "hz/quantity.hpp"

namespace hz {

/// How numbers in a unit become numbers in the canonical unit.
enum class ConversionKind {
  factor,      // value * number
  offset,      // value + number: a logarithm of the same thing in another unit
  reciprocal,  // number / value: a parallax in a distance column; half-widths change sides
  antilog,     // number * 10^value: a logarithm where the thing itself is wanted
  dimming,     // 1 - 10^(-0.4 number value): magnitudes in a column of fractions of the light
};
struct Conversion {
  ConversionKind kind = ConversionKind::factor;
  double number = 1;

  friend bool operator==(const Conversion&, const Conversion&) = default;
};

/// How `unit` becomes the canonical unit of `quantity`; nullopt for a unit that is unknown or of another dimension, and
/// for every unit of a quantity that is no number.
///
/// Understands the VOUnits, FITS, CDS and common astropy spellings and the words of published tables ("Earth Radius",
/// "days", "Rsun", "RJ", "ly"), a number in front ("1361W.m**-2") and logarithms ("dex(cm.s**-2)", "log10(L/Lsun)",
/// "dex"), "log(K)" also for a quantity that is no logarithm itself. Case-exact where case matters. Empty: already
/// canonical.
[[nodiscard]] std::optional<Conversion> conversion(Quantity quantity, std::string_view unit);

/// One number in the canonical unit. A reciprocal needs one above 0 (else a broken precondition).
[[nodiscard]] double convert(double value, const Conversion& conversion);

/// The number in the unit that `conversion` starts from: convert() the other way round.
[[nodiscard]] double convert_back(double canonical, const Conversion& conversion);

/// The measured value in the canonical unit, half-widths and limit marks turned with it. Where the conversion bends,
/// the ends of the interval are carried over exactly. A reciprocal needs a value above 0 (else a broken precondition);
/// where its interval reaches past zero the half-width follows from the slope.
[[nodiscard]] Measured convert(const Measured& measured, const Conversion& conversion);

}  // namespace hz
