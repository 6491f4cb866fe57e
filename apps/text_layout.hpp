// Text on a terminal: how wide it is, what may be shown, where lines break.
#pragma once
#include <cstddef>
#include <string>
#include <string_view>

namespace hz::app {

/// Columns that UTF-8 text takes: combining marks take none, wide East Asian letters two.
[[nodiscard]] std::size_t text_width(std::string_view text);

/// `text` with control characters (which could steer a terminal) and broken UTF-8 replaced by U+FFFD.
[[nodiscard]] std::string printable(std::string_view text);

/// `text` in lines of at most `width` columns, broken at blanks; every line but the first starts with `indent` blanks,
/// and the first is taken to start there too. A longer word has a line to itself. No newline at the end.
[[nodiscard]] std::string wrapped(std::string_view text, std::size_t width, std::size_t indent = 0);

}  // namespace hz::app
