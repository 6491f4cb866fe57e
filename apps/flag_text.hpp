// Flags in words.
#pragma once
#include <string>
#include <string_view>

namespace hz::app {

/// "assumed_error:teff: the list gives no half-width ...": a flag and what it means.
[[nodiscard]] std::string flag_sentence(std::string_view flag);

}  // namespace hz::app
