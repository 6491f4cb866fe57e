// Names that must fit a width.
#pragma once
#include <string>
#include <vector>

#include "text_measure.hpp"

namespace hz::plots {

/// The text itself if it is at most `width` wide, else its beginning, an ellipsis and its end: names of stars differ at
/// both ends. Never cuts a letter from its combining marks.
[[nodiscard]] Text shortened(const TextMeasure& measure, const Text& text, const TextStyle& style, double width);

/// At most `most_lines` lines, broken at blanks; what does not fit is shortened.
[[nodiscard]] std::vector<Text> wrapped(const TextMeasure& measure, const Text& text, const TextStyle& style,
                                        double width, std::size_t most_lines);

}  // namespace hz::plots
