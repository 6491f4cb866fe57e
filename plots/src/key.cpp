#include "key.hpp"

#include <algorithm>

namespace hz::plots {
namespace {

constexpr double between_groups = 14;
constexpr double between_samples = 8;
constexpr double before_words = 3;
constexpr double between_lines = 4;

Shape shifted(const Shape& shape, double dx, double dy) { return moved({"", shape}, dx, dy).shape; }

/// The smallest box about all of them.
Box common_extent(const std::vector<Shape>& shapes) {
  Box box = extent(shapes.front());
  for (const Shape& shape : shapes) box = box.united(extent(shape));
  return box;
}

}  // namespace

void Key::start_group() { groups_.emplace_back(); }

void Key::append(Piece piece) {
  Group& group = groups_.back();
  piece.gap = group.empty() ? between_groups : between_samples;
  group.push_back(std::move(piece));
}

Key::Piece Key::piece(const std::vector<Shape>& shapes, const Text& words) const {
  Piece piece;
  if (!shapes.empty()) {
    const Box box = common_extent(shapes);
    for (const Shape& shape : shapes) piece.shapes.push_back(shifted(shape, -box.x, 0));
    piece.width = box.width + before_words;
    piece.half_height = std::max(-box.y, box.bottom());
  }
  const TextStyle style = canvas_.words();
  const Point baseline{piece.width, cap_height * style.size / 2};
  piece.shapes.emplace_back(canvas_.measure().placed(words, style, baseline));
  piece.width += canvas_.measure().advance(words, style);
  piece.half_height = std::max(piece.half_height, line_pitch * style.size / 2);
  return piece;
}

void Key::add_words(const Text& words) { append(piece({}, words)); }

void Key::add_sample(const std::vector<Shape>& shapes, const Text& words) { append(piece(shapes, words)); }

void Key::add_note(const std::string& note) {
  start_group();
  const double blank = canvas_.measure().advance({{" "}}, canvas_.words());
  for (std::size_t from = 0; from < note.size();) {
    const std::size_t end = std::min(note.find(' ', from), note.size());
    append(piece({}, canvas_.measure().printable(note.substr(from, end - from))));
    if (from > 0) groups_.back().back().gap = blank;
    from = end + 1;
  }
}

std::vector<Key::Line> Key::lines() const {
  const double room = canvas_.width() - 2 * page_margin;
  std::vector<Line> lines(1);
  double used = 0;
  for (const Group& group : groups_) {
    double whole = 0;
    for (const Piece& piece : group) whole += piece.gap + piece.width;
    if (used > 0 && used + whole > room && whole - between_groups <= room) used = room;  // keep it together
    for (const Piece& piece : group) {
      const double gap = lines.back().empty() ? 0 : piece.gap;
      if (!lines.back().empty() && used + gap + piece.width > room) {
        lines.emplace_back();
        used = 0;
      }
      used += (lines.back().empty() ? 0 : piece.gap) + piece.width;
      lines.back().push_back(piece);
    }
  }
  return lines;
}

double Key::draw(double top) {
  double y = top;
  for (const Line& line : lines()) {
    double half_height = 0;
    for (const Piece& piece : line) half_height = std::max(half_height, piece.half_height);
    double x = page_margin;
    for (std::size_t i = 0; i < line.size(); ++i) {
      if (i > 0) x += line[i].gap;
      for (const Shape& shape : line[i].shapes) canvas_.add("key", shifted(shape, x, y + half_height));
      x += line[i].width;
    }
    y += 2 * half_height + between_lines;
  }
  return y - between_lines;
}

}  // namespace hz::plots
