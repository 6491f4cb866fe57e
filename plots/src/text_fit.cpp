#include "text_fit.hpp"

#include <glib.h>

#include <algorithm>

namespace hz::plots {
namespace {

/// Longer names are cut before they are measured letter by letter.
constexpr std::size_t most_letters = 160;

/// A text as letters with their combining marks, each with its script.
std::vector<TextRun> letters_of(const Text& text) {
  std::vector<TextRun> letters;
  for (const TextRun& run : text) {
    for (const char* at = run.text.c_str(); *at != '\0'; at = g_utf8_next_char(at)) {
      const std::string letter(at, static_cast<const char*>(g_utf8_next_char(at)));
      const gunichar character = g_utf8_get_char(at);
      const bool joins = g_unichar_ismark(character) || g_unichar_iszerowidth(character);
      if (joins && !letters.empty())
        letters.back().text += letter;
      else
        letters.push_back({letter, run.script, run.bold});
    }
  }
  return letters;
}

Text joined(const std::vector<TextRun>& letters, std::size_t head, std::size_t tail) {
  Text text;
  const auto add = [&](const TextRun& letter) {
    if (text.empty() || text.back().script != letter.script) text.push_back({"", letter.script, letter.bold});
    text.back().text += letter.text;
  };
  std::for_each_n(letters.begin(), head, add);
  if (head + tail < letters.size()) add({"…"});
  std::for_each_n(letters.end() - static_cast<std::ptrdiff_t>(tail), tail, add);
  return text;
}

Text first_letters(const std::vector<TextRun>& letters, std::size_t count) {
  return joined({letters.begin(), letters.begin() + static_cast<std::ptrdiff_t>(count)}, count, 0);
}

bool is_blank(const TextRun& letter) { return letter.text == " "; }

/// How many letters make the longest line of whole words that fits; 0 when not even a word does.
std::size_t line_length(const TextMeasure& measure, const std::vector<TextRun>& letters, const TextStyle& style,
                        double width) {
  std::size_t fitting = 0;
  for (std::size_t end = 1; end <= std::min(letters.size(), most_letters); ++end) {
    if (end < letters.size() && !is_blank(letters[end])) continue;
    if (measure.advance(first_letters(letters, end), style) > width) break;
    fitting = end;
  }
  return fitting;
}

}  // namespace

Text shortened(const TextMeasure& measure, const Text& text, const TextStyle& style, double width) {
  const std::vector<TextRun> letters = letters_of(text);
  if (letters.size() <= most_letters && measure.advance(text, style) <= width) return text;
  for (std::size_t kept = std::min(letters.size() - 1, most_letters); kept > 0; --kept) {
    Text shorter = joined(letters, (kept + 1) / 2, kept / 2);
    if (measure.advance(shorter, style) <= width) return shorter;
  }
  return {{"…"}};
}

std::vector<Text> wrapped(const TextMeasure& measure, const Text& text, const TextStyle& style, double width,
                          std::size_t most_lines) {
  std::vector<Text> lines;
  std::vector<TextRun> rest = letters_of(text);
  while (!rest.empty()) {
    const std::size_t fitting = line_length(measure, rest, style, width);
    if (fitting == rest.size() || fitting == 0 || lines.size() + 1 == most_lines) {
      lines.push_back(shortened(measure, joined(rest, rest.size(), 0), style, width));
      break;
    }
    lines.push_back(first_letters(rest, fitting));
    rest.erase(rest.begin(), rest.begin() + static_cast<std::ptrdiff_t>(fitting));
    while (!rest.empty() && is_blank(rest.front())) rest.erase(rest.begin());
  }
  return lines;
}

}  // namespace hz::plots
