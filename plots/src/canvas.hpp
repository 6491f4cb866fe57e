// A scene while it is being filled.
#pragma once
#include <string>

#include "text_measure.hpp"

namespace hz::plots {

enum class Align { left, center, right };

class Canvas {
public:
  /// Throws hz::Error (usage) for a width no figure is made for.
  Canvas(const TextMeasure& measure, double width);

  void add(std::string tag, Shape shape) { scene_.marks.push_back({std::move(tag), std::move(shape)}); }
  /// The advance width decides the alignment, so that figures line up; `anchor` lies on the baseline.
  void add_text(std::string tag, const Text& text, const TextStyle& style, Point anchor, Align align);
  [[nodiscard]] TextMark text_at(const Text& text, const TextStyle& style, Point anchor, Align align) const;

  [[nodiscard]] const TextMeasure& measure() const { return measure_; }
  [[nodiscard]] double width() const { return scene_.width; }
  /// Size of ordinary words on this page, pt; never below 7.
  [[nodiscard]] double size() const { return size_; }
  [[nodiscard]] TextStyle words() const;        // ink
  [[nodiscard]] TextStyle quiet_words() const;  // grey
  [[nodiscard]] TextStyle names() const;        // bold, a little larger

  [[nodiscard]] Scene finished(double height) &&;

private:
  const TextMeasure& measure_;
  Scene scene_;
  double size_ = 7;
};

/// Space between the marks and the edge of the page, pt.
inline constexpr double page_margin = 6;

}  // namespace hz::plots
