#include "text_layout.hpp"

#include <cstdint>

namespace hz::app {
namespace {

struct CodePoint {
  std::uint32_t value = 0;
  std::size_t bytes = 1;
  bool broken = false;
};

constexpr CodePoint broken_byte{0xFFFD, 1, true};

std::size_t sequence_length(unsigned char lead) {
  if (lead < 0x80) return 1;
  if (lead >= 0xC2 && lead < 0xE0) return 2;
  if (lead >= 0xE0 && lead < 0xF0) return 3;
  if (lead >= 0xF0 && lead < 0xF5) return 4;
  return 0;
}

/// The code point at the start of `text`, which is not empty. Over-long forms and surrogates count as broken.
CodePoint first_code_point(std::string_view text) {
  const auto lead = static_cast<unsigned char>(text[0]);
  const std::size_t length = sequence_length(lead);
  if (length == 0 || length > text.size()) return broken_byte;
  std::uint32_t value = length == 1 ? lead : lead & (0x7FU >> length);
  for (std::size_t i = 1; i < length; ++i) {
    const auto next = static_cast<unsigned char>(text[i]);
    if ((next & 0xC0U) != 0x80U) return broken_byte;
    value = (value << 6U) | (next & 0x3FU);
  }
  const bool too_long = (length == 3 && value < 0x800) || (length == 4 && value < 0x10000);
  if (too_long || value > 0x10FFFF || (value >= 0xD800 && value <= 0xDFFF)) return broken_byte;
  return {value, length, false};
}

bool within(std::uint32_t value, std::uint32_t low, std::uint32_t high) { return low <= value && value <= high; }

/// Marks that sit on the letter before them, and invisible joiners (Unicode 15, the blocks people meet in names).
bool takes_no_room(std::uint32_t value) {
  return within(value, 0x0300, 0x036F) || within(value, 0x1AB0, 0x1AFF) || within(value, 0x1DC0, 0x1DFF) ||
         within(value, 0x200B, 0x200F) || within(value, 0x20D0, 0x20FF) || within(value, 0xFE00, 0xFE0F) ||
         within(value, 0xFE20, 0xFE2F);
}

/// East Asian wide and full-width letters (Unicode Standard Annex 11), by block.
bool takes_two(std::uint32_t value) {
  return within(value, 0x1100, 0x115F) || within(value, 0x2E80, 0xA4CF) || within(value, 0xAC00, 0xD7A3) ||
         within(value, 0xF900, 0xFAFF) || within(value, 0xFE30, 0xFE6F) || within(value, 0xFF00, 0xFF60) ||
         within(value, 0xFFE0, 0xFFE6) || within(value, 0x1F300, 0x1FAFF) || within(value, 0x20000, 0x3FFFD);
}

bool is_control(std::uint32_t value) {
  return value < 0x20 || within(value, 0x7F, 0x9F) || within(value, 0x202A, 0x202E) || within(value, 0x2066, 0x2069);
}

}  // namespace

std::size_t text_width(std::string_view text) {
  std::size_t width = 0;
  while (!text.empty()) {
    const CodePoint point = first_code_point(text);
    if (!takes_no_room(point.value)) width += takes_two(point.value) ? 2U : 1U;
    text.remove_prefix(point.bytes);
  }
  return width;
}

std::string printable(std::string_view text) {
  std::string result;
  while (!text.empty()) {
    const CodePoint point = first_code_point(text);
    if (point.broken || is_control(point.value)) {
      result += "\xEF\xBF\xBD";
    } else {
      result += text.substr(0, point.bytes);
    }
    text.remove_prefix(point.bytes);
  }
  return result;
}

std::string wrapped(std::string_view text, std::size_t width, std::size_t indent) {
  std::string result;
  std::size_t column = indent;
  bool line_is_empty = true;
  while (!text.empty()) {
    const std::string_view word = text.substr(0, text.find(' '));
    text.remove_prefix(word.size() == text.size() ? word.size() : word.size() + 1);
    if (word.empty()) continue;
    const std::size_t room = text_width(word) + (line_is_empty ? 0 : 1);
    if (!line_is_empty && column + room > width) {
      result += "\n" + std::string(indent, ' ');
      column = indent;
    } else if (!line_is_empty) {
      result += ' ';
      ++column;
    }
    result += word;
    column += text_width(word);
    line_is_empty = false;
  }
  return result;
}

}  // namespace hz::app
