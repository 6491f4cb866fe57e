#include "canvas.hpp"

#include <fmt/format.h>

#include "hz/error.hpp"
#include "hz/plots/figures.hpp"
#include "palette.hpp"

namespace hz::plots {
namespace {

constexpr double mm = 72 / 25.4;

double size_for(double width) {
  if (width < 105 * mm) return 7;
  return width < 150 * mm ? 7.5 : 8;
}

double checked(double width) {
  constexpr double rounding = 1e-6;
  if (width > narrowest_page - rounding && width < widest_page + rounding) return width;
  throw Error(Fault::usage,
              fmt::format("a figure {:.4g} mm wide cannot be drawn; choose a width from {:.4g} to {:.4g} mm",
                          width / mm, narrowest_page / mm, widest_page / mm));
}

}  // namespace

Canvas::Canvas(const TextMeasure& measure, double width) : measure_(measure), size_(size_for(checked(width))) {
  scene_.width = width;
}

TextMark Canvas::text_at(const Text& text, const TextStyle& style, Point anchor, Align align) const {
  const double width = align == Align::left ? 0 : measure_.advance(text, style);
  return measure_.placed(text, style, {anchor.x - (align == Align::center ? width / 2 : width), anchor.y});
}

void Canvas::add_text(std::string tag, const Text& text, const TextStyle& style, Point anchor, Align align) {
  add(std::move(tag), text_at(text, style, anchor, align));
}

TextStyle Canvas::words() const { return {size_, palette::ink}; }
TextStyle Canvas::quiet_words() const { return {size_, palette::grey}; }
TextStyle Canvas::names() const { return {size_ + 1, palette::ink, true}; }

Scene Canvas::finished(double height) && {
  scene_.height = height;
  return std::move(scene_);
}

}  // namespace hz::plots
