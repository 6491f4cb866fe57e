#include "hz/plots/scene.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace hz::plots {
namespace {

Point operator+(Point p, Point by) { return {p.x + by.x, p.y + by.y}; }

struct Mover {
  Point by;

  void operator()(LineMark& line) const {
    for (Point& p : line.points) p = p + by;
  }
  void operator()(ArcMark& arc) const { arc.center = arc.center + by; }
  void operator()(SectorMark& sector) const { sector.center = sector.center + by; }
  void operator()(DiscMark& disc) const { disc.center = disc.center + by; }
  void operator()(BarMark& bar) const {
    bar.box.x += by.x;
    bar.box.y += by.y;
    for (ColorStop& stop : bar.stops) stop.at += by.x;
  }
  void operator()(WhiskerMark& whisker) const {
    whisker.low += by.x;
    whisker.high += by.x;
    whisker.y += by.y;
  }
  void operator()(TextMark& text) const {
    text.baseline = text.baseline + by;
    text.box.x += by.x;
    text.box.y += by.y;
    if (text.ground) std::visit(*this, *text.ground);
  }
};

/// Of a ring part that is symmetric about +x; `half_angle` below a right angle.
Box ring_box(Point center, double inner, double outer, double half_angle) {
  const double left = center.x + inner * std::cos(half_angle);
  const double up = outer * std::sin(half_angle);
  return {left, center.y - up, center.x + outer - left, 2 * up};
}

struct Extent {
  Box operator()(const LineMark& line) const {
    constexpr double far = std::numeric_limits<double>::max();
    Point low{far, far};
    Point high{-far, -far};
    for (const Point& p : line.points) {
      low = {std::min(low.x, p.x), std::min(low.y, p.y)};
      high = {std::max(high.x, p.x), std::max(high.y, p.y)};
    }
    return Box{low.x, low.y, high.x - low.x, high.y - low.y}.grown(line.stroke.width / 2);
  }
  Box operator()(const ArcMark& arc) const {
    return ring_box(arc.center, arc.radius, arc.radius, arc.half_angle).grown(arc.stroke.width / 2);
  }
  Box operator()(const SectorMark& sector) const {
    return ring_box(sector.center, sector.inner, sector.outer, sector.half_angle);
  }
  Box operator()(const BarMark& bar) const { return bar.box; }
  Box operator()(const DiscMark& disc) const {
    const double reach = disc.radius + disc.ring.width / 2 + disc.halo;
    return Box{disc.center.x, disc.center.y, 0, 0}.grown(reach);
  }
  Box operator()(const WhiskerMark& whisker) const {
    return Box{whisker.low, whisker.y - whisker.cap, whisker.high - whisker.low, 2 * whisker.cap}.grown(
        whisker.stroke.width / 2);
  }
  Box operator()(const TextMark& text) const { return text.box; }
};

}  // namespace

bool Box::overlaps(const Box& other) const {
  return x < other.right() && other.x < right() && y < other.bottom() && other.y < bottom();
}

bool Box::contains(const Box& other) const {
  return x <= other.x && other.right() <= right() && y <= other.y && other.bottom() <= bottom();
}

Box Box::grown(double margin) const { return {x - margin, y - margin, width + 2 * margin, height + 2 * margin}; }

Box Box::united(const Box& other) const {
  const double left = std::min(x, other.x);
  const double top = std::min(y, other.y);
  return {left, top, std::max(right(), other.right()) - left, std::max(bottom(), other.bottom()) - top};
}

Mark moved(Mark mark, double dx, double dy) {
  std::visit(Mover{{dx, dy}}, mark.shape);
  return mark;
}

Box extent(const Shape& shape) { return std::visit(Extent{}, shape); }

double chord_half_angle(double filled) { return std::acos(std::clamp(1 - 2 * filled, -1.0, 1.0)); }

std::string plain(const Text& text) {
  std::string words;
  for (const TextRun& run : text) words += run.text;
  return words;
}

}  // namespace hz::plots
