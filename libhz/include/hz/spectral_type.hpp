// An MK spectral type as lists write it.
#pragma once
#include <optional>
#include <string>
#include <string_view>

#include "hz/result.hpp"

namespace hz {

/// What a spectral type says the object is.
enum class StarKind {
  dwarf,        // class V, IV-V, or no class (then assumed a dwarf: `class_stated` is false)
  subdwarf,     // sd, esd, usd, VI
  subgiant,     // IV
  giant,        // III, II, I, their halves and suffixes
  white_dwarf,  // D and a letter
  other,        // Wolf-Rayet, carbon, S type …: no place on the main sequence
};
[[nodiscard]] std::string_view word(StarKind kind);  // "a dwarf", "a white dwarf", …

struct SpectralType {
  StarKind kind = StarKind::dwarf;
  bool class_stated = false;
  /// O0 = 0, B0 = 10, A0 = 20, … M0 = 60, L0 = 70, T0 = 80, Y0 = 90, with the decimal subtype; empty for white dwarfs
  /// and others, and where the subtype is missing.
  std::optional<double> subtype;
  double half_width = 0.5;            // half a subtype, or as written, or 1 where marked uncertain (":", "?")
  std::optional<std::string> second;  // the companion's type in "M8+L3", "G2V+K1V"
};

/// Reads a spelling; a Problem (unreadable, column spectral_type) with one sentence when it is none.
/// "M5.5V", "dM4e", "K7 V", "sdM1", "DA2", "M8+L3", "L4::", "M0.0&plusmn0.5 V", "k7", "M3-M4V", "G8/K0IV", "F5 Ib",
/// "(M4)".
[[nodiscard]] Result<SpectralType> read_spectral_type(std::string_view text);

}  // namespace hz
