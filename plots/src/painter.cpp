#include "painter.hpp"

#include <cairo.h>

#include <memory>

#include "palette.hpp"

namespace hz::plots {
namespace {

constexpr double full_circle = 6.283185307179586;

struct DestroyPattern {
  void operator()(cairo_pattern_t* pattern) const { cairo_pattern_destroy(pattern); }
};
using Pattern = std::unique_ptr<cairo_pattern_t, DestroyPattern>;

class Painter {
public:
  Painter(cairo_t* cr, const TextMeasure& measure) : cr_(cr), measure_(measure) {}

  void operator()(const LineMark& line) const {
    cairo_new_path(cr_);
    for (const Point& p : line.points) cairo_line_to(cr_, p.x, p.y);
    stroke(line.stroke);
  }

  void operator()(const ArcMark& arc) const {
    cairo_new_path(cr_);
    cairo_arc(cr_, arc.center.x, arc.center.y, arc.radius, -arc.half_angle, arc.half_angle);
    stroke(arc.stroke);
  }

  void operator()(const SectorMark& sector) const { fill_ground(sector); }

  void operator()(const BarMark& bar) const { fill_ground(bar); }

  void operator()(const DiscMark& disc) const {
    if (disc.halo > 0) fill_disc(disc, disc.radius + disc.ring.width / 2 + disc.halo, palette::white);
    fill_disc(disc, disc.radius, palette::white);
    fill_disc(disc, disc.radius - disc.gap, disc.ground);
    if (disc.filled > 0) fill_water(disc);
    circle(disc.center, disc.radius);
    stroke(disc.ring);
  }

  void operator()(const WhiskerMark& whisker) const {
    const auto line = [&](double x0, double y0, double x1, double y1) {
      cairo_new_path(cr_);
      cairo_move_to(cr_, x0, y0);
      cairo_line_to(cr_, x1, y1);
      stroke(whisker.stroke);
    };
    line(whisker.low, whisker.y, whisker.high, whisker.y);
    if (!whisker.low_open) line(whisker.low, whisker.y - whisker.cap, whisker.low, whisker.y + whisker.cap);
    if (!whisker.high_open) line(whisker.high, whisker.y - whisker.cap, whisker.high, whisker.y + whisker.cap);
  }

  void operator()(const TextMark& text) const {
    if (text.ground) interrupt_lines(text);
    measure_.draw(cr_, text);
  }

private:
  void set_source(const Color& color) const { cairo_set_source_rgb(cr_, color.red, color.green, color.blue); }

  void stroke(const Stroke& stroke) const {
    set_source(stroke.color);
    cairo_set_line_width(cr_, stroke.width);
    cairo_set_line_join(cr_, CAIRO_LINE_JOIN_ROUND);
    const bool dotted = !stroke.dash.empty() && stroke.dash.front() == 0;
    cairo_set_line_cap(cr_, dotted ? CAIRO_LINE_CAP_ROUND : CAIRO_LINE_CAP_BUTT);
    cairo_set_dash(cr_, stroke.dash.data(), static_cast<int>(stroke.dash.size()), 0);
    cairo_stroke(cr_);
  }

  [[nodiscard]] static Pattern colors(const SectorMark& sector) {
    const Point c = sector.center;
    Pattern pattern(cairo_pattern_create_radial(c.x, c.y, sector.inner, c.x, c.y, sector.outer));
    add_stops(pattern.get(), sector.stops, sector.inner, sector.outer);
    return pattern;
  }

  [[nodiscard]] static Pattern colors(const BarMark& bar) {
    Pattern pattern(cairo_pattern_create_linear(bar.box.x, 0, bar.box.right(), 0));
    add_stops(pattern.get(), bar.stops, bar.box.x, bar.box.right());
    return pattern;
  }

  void outline(const SectorMark& sector) const {
    const Point c = sector.center;
    cairo_new_path(cr_);
    cairo_arc(cr_, c.x, c.y, sector.outer, -sector.half_angle, sector.half_angle);
    cairo_arc_negative(cr_, c.x, c.y, sector.inner, sector.half_angle, -sector.half_angle);
  }

  void outline(const BarMark& bar) const {
    cairo_new_path(cr_);
    cairo_rectangle(cr_, bar.box.x, bar.box.y, bar.box.width, bar.box.height);
  }

  template <class GroundMark>
  void fill_ground(const GroundMark& ground) const {
    const Pattern pattern = colors(ground);
    outline(ground);
    cairo_set_source(cr_, pattern.get());
    cairo_fill(cr_);
  }

  /// A broad outline of the words in the colours of the ground.
  void interrupt_lines(const TextMark& text) const {
    set_source(palette::white);
    stroke_around(text);
    cairo_save(cr_);
    std::visit([&](const auto& ground) { outline(ground); }, *text.ground);
    cairo_clip(cr_);
    const Pattern pattern = std::visit([](const auto& ground) { return colors(ground); }, *text.ground);
    cairo_set_source(cr_, pattern.get());
    stroke_around(text);
    cairo_restore(cr_);
  }

  void stroke_around(const TextMark& text) const {
    cairo_new_path(cr_);
    measure_.outline(cr_, text);
    cairo_set_line_width(cr_, 0.3 * text.style.size);
    cairo_set_line_join(cr_, CAIRO_LINE_JOIN_ROUND);
    cairo_set_dash(cr_, nullptr, 0, 0);
    cairo_stroke(cr_);
  }

  static void add_stops(cairo_pattern_t* pattern, const std::vector<ColorStop>& stops, double from, double to) {
    for (const ColorStop& stop : stops) {
      const double at = (stop.at - from) / (to - from);
      cairo_pattern_add_color_stop_rgb(pattern, at, stop.color.red, stop.color.green, stop.color.blue);
    }
  }

  void circle(Point center, double radius) const {
    cairo_new_path(cr_);
    cairo_arc(cr_, center.x, center.y, radius, 0, full_circle);
    cairo_close_path(cr_);
  }

  void fill_disc(const DiscMark& disc, double radius, const Color& color) const {
    circle(disc.center, radius);
    set_source(color);
    cairo_fill(cr_);
  }

  /// The part of the disc below the chord at `filled` of its diameter.
  void fill_water(const DiscMark& disc) const {
    const double half = chord_half_angle(disc.filled);
    cairo_new_path(cr_);
    cairo_arc(cr_, disc.center.x, disc.center.y, disc.radius - disc.gap, full_circle / 4 - half,
              full_circle / 4 + half);
    cairo_close_path(cr_);
    set_source(disc.water);
    cairo_fill(cr_);
  }

  cairo_t* cr_;
  const TextMeasure& measure_;
};

}  // namespace

void paint(cairo_t* cr, const Scene& scene, const TextMeasure& measure) {
  cairo_set_source_rgb(cr, 1, 1, 1);
  cairo_paint(cr);
  const Painter painter(cr, measure);
  for (const Mark& mark : scene.marks) std::visit(painter, mark.shape);
}

}  // namespace hz::plots
