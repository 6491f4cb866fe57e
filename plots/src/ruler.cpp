#include "ruler.hpp"

#include "number_text.hpp"
#include "palette.hpp"
#include "zone_marks.hpp"

namespace hz::plots {
namespace {

constexpr double long_tick = 4;
constexpr double short_tick = 2.2;
constexpr double label_gap = 5;

double label_baseline(const Canvas& canvas) { return long_tick + 2 + cap_height * canvas.size(); }

TextStyle direction_style(const Canvas& canvas) {
  TextStyle style = canvas.quiet_words();
  style.italic = true;
  return style;
}

/// The words at the ends; returns their boxes.
std::vector<Box> add_directions(Canvas& canvas, const Ruler& ruler) {
  std::vector<Box> boxes;
  const auto add = [&](const std::string& word, double x, Align align) {
    if (word.empty()) return;
    const Point anchor{x, ruler.y + label_baseline(canvas)};
    boxes.push_back(canvas.text_at({{word}}, direction_style(canvas), anchor, align).box);
    canvas.add_text("direction:" + ruler.name, {{word}}, direction_style(canvas), anchor, align);
  };
  add(ruler.low_x_word, ruler.scale.x0, Align::left);
  add(ruler.high_x_word, ruler.scale.x1, Align::right);
  return boxes;
}

/// A label that would leave the page or touch a direction word is left out; its tick stays long.
void add_tick_label(Canvas& canvas, const Ruler& ruler, const Tick& tick, const std::vector<Box>& taken) {
  const Point anchor{tick.x, ruler.y + label_baseline(canvas)};
  const TextMark label = canvas.text_at(tick_text(tick.digit, tick.exponent), canvas.words(), anchor, Align::center);
  if (label.box.x < page_margin || label.box.right() > canvas.width() - 1) return;
  for (const Box& box : taken)
    if (label.box.overlaps(box.grown(label_gap - 1))) return;
  canvas.add("number:" + ruler.name, label);
}

}  // namespace

double ruler_depth(const Canvas& canvas) { return label_baseline(canvas) + 2; }

void draw_ruler(Canvas& canvas, const Ruler& ruler) {
  const Stroke line{palette::ink, 0.7, {}};
  canvas.add("ruler:" + ruler.name, LineMark{{{ruler.scale.x0, ruler.y}, {ruler.scale.x1, ruler.y}}, line});
  const std::vector<Box> taken = add_directions(canvas, ruler);
  const auto width = [&](const Tick& tick) {
    return canvas.measure().advance(tick_text(tick.digit, tick.exponent), canvas.words());
  };
  for (const Tick& tick : log_ticks(ruler.scale, label_gap, width)) {
    const double length = tick.labelled ? long_tick : short_tick;
    const Stroke stroke{palette::ink, tick.labelled ? 0.7 : 0.5, {}};
    canvas.add("tick:" + ruler.name, LineMark{{{tick.x, ruler.y}, {tick.x, ruler.y + length}}, stroke});
    if (tick.labelled) add_tick_label(canvas, ruler, tick, taken);
  }
}

void draw_limits_on_ruler(Canvas& canvas, const std::vector<FigureLimit>& limits, const LogScale& distance, double y) {
  for (const FigureLimit& limit : limits) {
    if (!on_axis(distance, limit.distance.value)) continue;
    const double x = distance.x(limit.distance.value);
    const Stroke stroke{palette::water, is_conservative(limit.role) ? 1.1 : 0.6, {}};
    canvas.add("ruler limit:" + limit.title, LineMark{{{x, y - 4.5}, {x, y - 0.35}}, stroke});
  }
}

}  // namespace hz::plots
