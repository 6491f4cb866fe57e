// Words set with pango in the bundled faces: measured for a scene, drawn by the painter.
#pragma once
#include <memory>
#include <string>
#include <string_view>

#include "hz/plots/scene.hpp"

using cairo_t = struct _cairo;  // as cairo.h declares it

namespace hz::plots {

/// Heights of the bundled faces in shares of the size (Noto Sans, tables OS/2 and hhea).
inline constexpr double cap_height = 0.714;
inline constexpr double line_pitch = 1.2;
/// What stands for a character that no bundled face holds: ◻.
inline constexpr std::string_view replacement_sign = "\u25FB";

class TextMeasure {
public:
  /// Throws hz::Error (output) when the fonts are not found.
  TextMeasure();
  ~TextMeasure();
  TextMeasure(const TextMeasure&) = delete;
  TextMeasure& operator=(const TextMeasure&) = delete;

  [[nodiscard]] double advance(const Text& text, const TextStyle& style) const;

  /// With its left end at `baseline`.
  [[nodiscard]] TextMark placed(Text text, const TextStyle& style, Point baseline) const;

  /// What people typed as text that can be drawn: valid UTF-8 on one line, the Sun sign U+2609 as U+2299, and
  /// replacement_sign for every character the faces lack. Signs of the Sun and the Earth become subscripts.
  [[nodiscard]] Text printable(std::string_view typed) const;

  /// Fills the words with their colour.
  void draw(cairo_t* cr, const TextMark& mark) const;
  /// Adds the outlines of the words to the current path.
  void outline(cairo_t* cr, const TextMark& mark) const;

private:
  struct Pango;
  std::unique_ptr<Pango> pango_;
};

}  // namespace hz::plots
