// The key: every kind of mark, wrapped to the width of the page.
#pragma once
#include <string>
#include <vector>

#include "canvas.hpp"

namespace hz::plots {

/// What stays together if it can: a heading with its samples, a note.
class Key {
public:
  explicit Key(Canvas& canvas) : canvas_(canvas) {}

  /// The next entries belong together.
  void start_group();
  void add_words(const Text& words);
  /// A sample drawn about the point (0, 0), and what it means.
  void add_sample(const std::vector<Shape>& shapes, const Text& words);
  /// A group of its own that may break at any blank.
  void add_note(const std::string& note);

  /// Draws all, from `top` down; returns the lower end.
  double draw(double top);

private:
  struct Piece {
    std::vector<Shape> shapes;  // about the left end of the line's middle
    double width = 0;
    double half_height = 0;
    double gap = 0;  // before it, unless it begins a line
  };
  using Group = std::vector<Piece>;
  using Line = std::vector<Piece>;

  [[nodiscard]] Piece piece(const std::vector<Shape>& shapes, const Text& words) const;
  [[nodiscard]] std::vector<Line> lines() const;
  void append(Piece piece);

  Canvas& canvas_;
  std::vector<Group> groups_;
};

}  // namespace hz::plots
