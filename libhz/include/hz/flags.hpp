// The closed list of words that say what was assumed, held or doubtful about an answer.
#pragma once
#include <cstddef>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "hz/quantity.hpp"

namespace hz {

struct FlagInfo {
  std::string_view word;  // a trailing ":" means that a quantity's name follows
  std::string_view meaning;
};
[[nodiscard]] std::span<const FlagInfo> all_flags();

namespace flag {
inline constexpr std::string_view held = "held";
inline constexpr std::string_view beyond_planet_mass = "beyond_planet_mass";
inline constexpr std::string_view evolved = "evolved";
inline constexpr std::string_view min_mass_used = "min_mass_used";
inline constexpr std::string_view mass_from_radius = "mass_from_radius";
inline constexpr std::string_view planet_mass_assumed = "planet_mass_assumed";
inline constexpr std::string_view circular_assumed = "circular_assumed";
inline constexpr std::string_view eccentricity_limit = "eccentricity_limit";
inline constexpr std::string_view main_sequence_assumed = "main_sequence_assumed";
inline constexpr std::string_view extinction_ignored = "extinction_ignored";
inline constexpr std::string_view distance_prior = "distance_prior";
inline constexpr std::string_view companion = "companion";
inline constexpr std::string_view close_companion = "close_companion";
inline constexpr std::string_view assumed_error = "assumed_error:";
inline constexpr std::string_view wide_error = "wide_error:";
inline constexpr std::string_view limit_ignored = "limit_ignored:";
inline constexpr std::string_view inconsistent = "inconsistent:";
}  // namespace flag

/// Flags in the order they were raised, each once.
class Flags {
public:
  void raise(std::string_view word);
  void raise(std::string_view word, Quantity quantity);
  [[nodiscard]] const std::vector<std::string>& words() const { return words_; }

private:
  std::vector<std::string> words_;
};

}  // namespace hz
