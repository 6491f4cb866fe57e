// A figure as plain numbers: where every mark and every word sits, before anything is painted.
//
// Lengths in pt (1/72 inch), x to the right, y downward, the origin at the upper left corner of the page.
#pragma once
#include <optional>
#include <string>
#include <variant>
#include <vector>

namespace hz::plots {

struct Point {
  double x = 0;
  double y = 0;
};

struct Box {
  double x = 0;  // left
  double y = 0;  // top
  double width = 0;
  double height = 0;

  [[nodiscard]] double right() const { return x + width; }
  [[nodiscard]] double bottom() const { return y + height; }
  [[nodiscard]] Point center() const { return {x + width / 2, y + height / 2}; }
  /// True when the two share more than an edge.
  [[nodiscard]] bool overlaps(const Box& other) const;
  [[nodiscard]] bool contains(const Box& other) const;
  /// Larger by `margin` on every side.
  [[nodiscard]] Box grown(double margin) const;
  /// The smallest box that holds both.
  [[nodiscard]] Box united(const Box& other) const;
};

/// sRGB, each channel 0 to 1, opaque.
struct Color {
  double red = 0;
  double green = 0;
  double blue = 0;
  friend bool operator==(const Color&, const Color&) = default;
};

struct Stroke {
  Color color;
  double width = 0.6;
  std::vector<double> dash = {};  // on, off, ...; empty: solid. A zero "on" is a round dot.
};

/// A colour at a place: along x of the page for a bar, at a distance from the centre for a sector.
struct ColorStop {
  double at = 0;
  Color color;
};

struct LineMark {
  std::vector<Point> points;
  Stroke stroke;
};

/// Part of a circle, `half_angle` (radian) up and down from the direction of +x.
struct ArcMark {
  Point center;
  double radius = 0;
  double half_angle = 0;
  Stroke stroke;
};

/// Part of a ring, coloured along its radius.
struct SectorMark {
  Point center;
  double inner = 0;
  double outer = 0;
  double half_angle = 0;
  std::vector<ColorStop> stops;  // by rising radius
};

/// A rectangle, coloured along x.
struct BarMark {
  Box box;
  std::vector<ColorStop> stops;  // by rising x
};

/// A disc that holds water up to a height, and a ring about it.
struct DiscMark {
  Point center;
  double radius = 0;  // of the ring
  double gap = 0;     // between the disc and the ring
  double filled = 0;  // share of the diameter, from below
  Color water;
  Color ground;
  Stroke ring;
  double halo = 0;  // white around the ring
};

/// A horizontal span with caps; an end that runs out of the axis has none.
struct WhiskerMark {
  double low = 0;
  double high = 0;
  double y = 0;
  double cap = 0;  // half its height
  bool low_open = false;
  bool high_open = false;
  Stroke stroke;
};

enum class Script { normal, sub, super };
struct TextRun {
  std::string text;  // UTF-8; holds only characters of the bundled fonts
  Script script = Script::normal;
  bool bold = false;
};
using Text = std::vector<TextRun>;

struct TextStyle {
  double size = 7;
  Color color;
  bool bold = false;
  bool italic = false;
};

/// What lies behind everything else.
using Ground = std::variant<SectorMark, BarMark>;

struct TextMark {
  Text text;
  TextStyle style;
  Point baseline;  // its left end
  Box box;         // of the ink
  std::optional<Ground> ground =
      std::nullopt;  // lines behind the words are interrupted, and this shows (white outside)
};

using Shape = std::variant<LineMark, ArcMark, SectorMark, BarMark, DiscMark, WhiskerMark, TextMark>;

/// What is drawn, and what it stands for: "limit:early Mars", "disc:d", "tick:distance". Later marks cover earlier
/// ones.
struct Mark {
  std::string tag;
  Shape shape;
};

struct Scene {
  double width = 0;
  double height = 0;
  std::vector<Mark> marks;
};

[[nodiscard]] Mark moved(Mark mark, double dx, double dy);
/// The box of the mark with its stroke and halo.
[[nodiscard]] Box extent(const Shape& shape);
/// Half the angle (radian) under which the centre of a disc sees the water's surface, for water up to `filled` of the
/// diameter: arccos(1 - 2 filled), 0 to pi.
[[nodiscard]] double chord_half_angle(double filled);
/// The words of a text without their shape.
[[nodiscard]] std::string plain(const Text& text);

}  // namespace hz::plots
