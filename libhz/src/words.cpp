#include "words.hpp"

#include <algorithm>

namespace hz::words {
namespace {

constexpr bool is_continuation(char c) { return (static_cast<unsigned char>(c) & 0xC0U) == 0x80U; }
constexpr bool is_ascii_letter(char c) { return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z'); }
constexpr bool is_digit(char c) { return c >= '0' && c <= '9'; }
constexpr bool is_blank(char c) { return c == ' ' || c == '\t' || c == '\r' || c == '\n'; }
constexpr bool is_control(char c) { return static_cast<unsigned char>(c) < 0x20U || c == '\x7f'; }
constexpr bool is_ascii(char c) { return static_cast<unsigned char>(c) < 0x80U; }
constexpr char lower(char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c; }

// "R*" means the star's radius, but "Mass*sin(i)" is a product.
std::string star_signs_spelled(std::string_view text) {
  std::string out;
  for (std::size_t i = 0; i < text.size(); ++i) {
    const bool ends_word =
        i > 0 && is_ascii_letter(text[i - 1]) && (i + 1 == text.size() || !is_ascii_letter(text[i + 1]));
    if (text[i] == '*' && ends_word && text.substr(i, 2) != "**") {
      out += "star";
    } else {
      out += text[i];
    }
  }
  return out;
}

}  // namespace

std::string_view trimmed(std::string_view text) {
  while (!text.empty() && is_blank(text.front())) text.remove_prefix(1);
  while (!text.empty() && is_blank(text.back())) text.remove_suffix(1);
  return text;
}

std::string lower_case(std::string_view text) {
  std::string out(text);
  std::transform(out.begin(), out.end(), out.begin(), lower);
  return out;
}

std::string folded(std::string_view text) {
  std::string signs = star_signs_spelled(text);
  for (const std::string_view star : {"⋆", "★", "∗"}) signs = replaced(signs, star, "star");
  for (const std::string_view sun : {"☉", "⊙"}) signs = replaced(signs, sun, "sun");
  signs = replaced(signs, "⊕", "earth");
  std::string out;
  for (const char c : signs) {
    if (is_ascii_letter(c) || is_digit(c) || !is_ascii(c)) out += lower(c);
  }
  return out;
}

std::string quoted(std::string_view text) {
  constexpr std::size_t longest = 40;
  std::string out = "\"";
  std::size_t characters = 0;
  for (const char c : text) {
    if (!is_continuation(c) && ++characters > longest) return out + "…\"";
    out += is_control(c) ? ' ' : c;
  }
  return out + '"';
}

std::string replaced(std::string_view text, std::string_view from, std::string_view to) {
  std::string out;
  for (auto found = text.find(from); found != std::string_view::npos; found = text.find(from)) {
    out.append(text.substr(0, found)).append(to);
    text.remove_prefix(found + from.size());
  }
  return out.append(text);
}

std::vector<std::string_view> split(std::string_view text, char separator) {
  std::vector<std::string_view> parts;
  for (auto found = text.find(separator); found != std::string_view::npos; found = text.find(separator)) {
    parts.push_back(text.substr(0, found));
    text.remove_prefix(found + 1);
  }
  parts.push_back(text);
  return parts;
}

}  // namespace hz::words
