// Small functions for text as people type it.
#pragma once
#include <string>
#include <string_view>
#include <vector>

namespace hz::words {

/// Without blanks, tabs and line ends around.
[[nodiscard]] std::string_view trimmed(std::string_view text);

/// ASCII letters in lower case; other bytes stay.
[[nodiscard]] std::string lower_case(std::string_view text);

/// For comparing headers: lower case, only letters, digits and non-ASCII bytes; a star sign at the end of a word ("R*",
/// "R⋆") reads "star", the signs of Sun and Earth read "sun" and "earth".
[[nodiscard]] std::string folded(std::string_view text);

/// In quotes, on one line, cut to 40 characters: for messages.
[[nodiscard]] std::string quoted(std::string_view text);

/// `text` with every `from` made `to`.
[[nodiscard]] std::string replaced(std::string_view text, std::string_view from, std::string_view to);

[[nodiscard]] std::vector<std::string_view> split(std::string_view text, char separator);

}  // namespace hz::words
