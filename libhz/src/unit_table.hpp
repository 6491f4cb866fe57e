// Spellings of units, each with its dimension and size.
#pragma once
#include <optional>
#include <string_view>

namespace hz {

enum class Dimension {
  length,        // m
  mass,          // as GM in m^3 s^-2, so that nominal ratios stay exact
  time,          // d
  power,         // W
  temperature,   // K
  density,       // g cm^-3
  angle,         // mas
  magnitude,     // mag
  abundance,     // dex
  speed,         // m s^-1
  flux,          // W m^-2
  ratio,         // 1
  acceleration,  // cm s^-2
};

/// Size of a unit in the one named above; nullopt when the spelling is unknown in this dimension. Understands a number
/// in front ("1361W.m**-2").
[[nodiscard]] std::optional<double> unit_size(Dimension dimension, std::string_view unit);

}  // namespace hz
