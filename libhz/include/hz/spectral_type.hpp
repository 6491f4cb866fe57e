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
  subgiant,     // IV, III-V
  giant,        // III, II, I, their halves (III-IV) and suffixes
  white_dwarf,  // D and a letter, WD, VII
  other,        // Wolf-Rayet, carbon, S type: no place on the main sequence
};
[[nodiscard]] std::string_view word(StarKind kind);  // "a dwarf", "a white dwarf", …

struct SpectralType {
  StarKind kind = StarKind::dwarf;
  bool class_stated = false;
  /// O0 = 0, B0 = 10, A0 = 20, … M0 = 60, L0 = 70, T0 = 80, Y0 = 90, with the decimal subtype; the middle of a range.
  /// Empty for white dwarfs and others, and where a subtype is missing.
  std::optional<double> subtype;
  /// In subtypes, 68 per cent: as written (±); else half the span of a range, at least half a subtype, and at least 1
  /// where the type is marked uncertain (":", "?", or in brackets).
  double half_width = 0.5;
  /// The companion's type as written, in "M8+L3", "G2V+K1V", "K1III(+M)"; empty text behind a "+" that names none.
  std::optional<std::string> second;
};

/// Reads a spelling: "M5.5V", "dM4e", "K7 V", "sdM1", "DA2", "M8+L3", "L4::", "M0.0&plusmn0.5 V", "M(6.1 +/- 0.7) V",
/// "k7", "M3-M4V", "G8/K0IV", "G5/6 V", "F5 Ib", "G7 V Fe-1 CH-0.5", "(M4)".
///
/// Marks of emission, rotation, variability and abundance (e, p, n, var, Fe-0.5, …) are read over.
/// Errors    missing (empty, or a spelling of "no value"); unreadable, with one sentence that quotes what cannot be
///           read. A lower-case d before O, B or A is refused: it may mean a dwarf or a white dwarf.
/// Source    the notation of Gray & Corbally 2009, Stellar Spectral Classification, and, for white dwarfs, Sion et al.
///           1983, ApJ 269, 253, doi:10.1086/161036 (both from memory).
[[nodiscard]] Result<SpectralType> read_spectral_type(std::string_view text);

}  // namespace hz
