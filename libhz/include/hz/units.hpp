// Units by the words people write, converted to the canonical unit of a quantity.
#pragma once
#include <optional>
#include <string_view>

#include "hz/measured.hpp"
#include "hz/quantity.hpp"

namespace hz {

/// How numbers in a unit become numbers in the canonical unit.
enum class ConversionKind {
  factor,              // value * factor
  reciprocal,          // factor / value: a parallax in a distance column; half-widths change sides
};
struct Conversion {
  ConversionKind kind = ConversionKind::factor;
  double factor = 1;
};

/// How `unit` becomes the canonical unit of `quantity`; nullopt for a unit that is unknown or of another dimension.
/// Understands the VOUnits, FITS, CDS and common astropy spellings and the words of published tables ("Earth Radius",
/// "days", "Rsun", "RJ", "ly"). Case-exact where case matters.
[[nodiscard]] std::optional<Conversion> conversion(Quantity quantity, std::string_view unit);

/// The measured value in the canonical unit, half-widths and limit marks turned with it.
[[nodiscard]] Measured convert(const Measured& measured, const Conversion& conversion);

}  // namespace hz
