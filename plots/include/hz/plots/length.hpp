// Lengths on paper as people write them.
#pragma once
#include <string_view>

namespace hz::plots {

/// `88mm`, `8.8 cm`, `3.5in` or `250pt` in pt (1/72 inch).
///
/// Throws hz::Error (usage), which quotes the text, for anything else and for lengths that are not above 0.
[[nodiscard]] double parse_length(std::string_view text);

}  // namespace hz::plots
