#include "layout_check.hpp"

#include <algorithm>
#include <cmath>

namespace hz::plots::testing {
namespace {

struct Widths {
  const Stroke* operator()(const LineMark& m) const { return &m.stroke; }
  const Stroke* operator()(const ArcMark& m) const { return &m.stroke; }
  const Stroke* operator()(const DiscMark& m) const { return &m.ring; }
  const Stroke* operator()(const WhiskerMark& m) const { return &m.stroke; }
  const Stroke* operator()(const SectorMark&) const { return nullptr; }
  const Stroke* operator()(const BarMark&) const { return nullptr; }
  const Stroke* operator()(const TextMark&) const { return nullptr; }
};

/// Whether a point of the line, taken every tenth of a point, lies in the box.
bool crosses(const LineMark& line, const Box& box) {
  for (std::size_t i = 1; i < line.points.size(); ++i) {
    const Point a = line.points[i - 1];
    const Point b = line.points[i];
    const int steps = static_cast<int>(10 * std::hypot(b.x - a.x, b.y - a.y)) + 1;
    for (int k = 0; k <= steps; ++k) {
      const double share = static_cast<double>(k) / steps;
      const Point p{a.x + (b.x - a.x) * share, a.y + (b.y - a.y) * share};
      if (box.x < p.x && p.x < box.right() && box.y < p.y && p.y < box.bottom()) return true;
    }
  }
  return false;
}

/// Distance from a point to a box.
double distance(const Point& p, const Box& box) {
  const double dx = std::max({box.x - p.x, 0.0, p.x - box.right()});
  const double dy = std::max({box.y - p.y, 0.0, p.y - box.bottom()});
  return std::hypot(dx, dy);
}

class Checker {
public:
  explicit Checker(const Scene& scene) : scene_(scene) {}

  std::vector<std::string> faults() && {
    for (const Mark& mark : scene_.marks) {
      check_page(mark);
      check_line_width(mark);
      check_disc(mark);
      if (const TextMark* text = std::get_if<TextMark>(&mark.shape)) check_text(mark, *text);
    }
    return std::move(faults_);
  }

private:
  void check_page(const Mark& mark) {
    if (!Box{0, 0, scene_.width, scene_.height}.contains(extent(mark.shape)))
      faults_.push_back(mark.tag + " leaves the page");
  }

  void check_line_width(const Mark& mark) {
    const Stroke* stroke = std::visit(Widths{}, mark.shape);
    if (stroke && stroke->width < 0.5) faults_.push_back(mark.tag + " is a line under 0.5 pt");
  }

  /// Discs of planets do not cover each other.
  void check_disc(const Mark& mark) {
    const DiscMark* disc = std::get_if<DiscMark>(&mark.shape);
    if (!disc || mark.tag.rfind("disc:", 0) != 0) return;
    for (const Mark& other : scene_.marks) {
      const DiscMark* second = std::get_if<DiscMark>(&other.shape);
      if (!second || &other <= &mark || other.tag.rfind("disc:", 0) != 0) continue;
      if (std::hypot(disc->center.x - second->center.x, disc->center.y - second->center.y) <
          disc->radius + second->radius)
        faults_.push_back(mark.tag + " covers " + other.tag);
    }
  }

  void check_text(const Mark& mark, const TextMark& text) {
    const std::string name = mark.tag + " '" + plain(text.text) + "'";
    if (text.style.size < 7) faults_.push_back(name + " is under 7 pt");
    if (text.box.width <= 0 && !text.text.empty() && !plain(text.text).empty()) faults_.push_back(name + " has no ink");
    for (const Mark& other : scene_.marks) check_against(mark, text, name, other);
  }

  void check_against(const Mark& mark, const TextMark& text, const std::string& name, const Mark& other) {
    if (const TextMark* words = std::get_if<TextMark>(&other.shape)) {
      if (&other > &mark && text.box.overlaps(words->box))
        faults_.push_back(name + " overlaps " + other.tag + " '" + plain(words->text) + "'");
    } else if (const DiscMark* disc = std::get_if<DiscMark>(&other.shape)) {
      if (distance(disc->center, text.box) < disc->radius) faults_.push_back(name + " overlaps " + other.tag);
    } else if (const LineMark* line = std::get_if<LineMark>(&other.shape)) {
      if (other.tag.find("leader:") != std::string::npos && crosses(*line, text.box))
        faults_.push_back(name + " is crossed by " + other.tag);
    }
  }

  const Scene& scene_;
  std::vector<std::string> faults_;
};

}  // namespace

std::vector<std::string> layout_faults(const Scene& scene) { return Checker(scene).faults(); }

std::string words(const Scene& scene) {
  std::string all;
  for (const Mark& mark : scene.marks)
    if (const TextMark* text = std::get_if<TextMark>(&mark.shape)) all += plain(text->text) + ' ';
  return all;
}

}  // namespace hz::plots::testing
