// Flags in words.
#pragma once
#include <string>
#include <string_view>

#include "hz/flags.hpp"

namespace hz::app {

/// "assumed_error:teff: the list gives no half-width ...": a flag and what it means.
[[nodiscard]] std::string flag_sentence(std::string_view flag);

/// The word as help shows it: "held", "assumed_error:QUANTITY".
[[nodiscard]] std::string flag_word(const FlagInfo& flag);

}  // namespace hz::app
