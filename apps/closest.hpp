// The word a user probably meant.
#pragma once
#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>

namespace hz::app {

/// Fewest single-letter insertions, deletions, replacements and swaps of neighbours that turn one word into the other.
[[nodiscard]] std::size_t edit_distance(std::string_view from, std::string_view to);

/// The candidate nearest to `word`, without regard to case; nullopt when none is near enough to be worth offering.
[[nodiscard]] std::optional<std::string> closest(std::string_view word, std::span<const std::string> candidates);

/// "; did you mean CANDIDATE?" or nothing: the tail of a message about an unknown word.
[[nodiscard]] std::string did_you_mean(std::string_view word, std::span<const std::string> candidates);

}  // namespace hz::app
