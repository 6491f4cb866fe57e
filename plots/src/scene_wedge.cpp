#include <algorithm>
#include <array>
#include <cmath>

#include "axis_fit.hpp"
#include "canvas.hpp"
#include "figure_key.hpp"
#include "hz/constants.hpp"
#include "hz/plots/figures.hpp"
#include "number_text.hpp"
#include "palette.hpp"
#include "planet_marks.hpp"
#include "planet_row.hpp"
#include "ruler.hpp"
#include "star_tint.hpp"
#include "text_fit.hpp"
#include "wedge_frame.hpp"
#include "wedge_titles.hpp"
#include "zone_marks.hpp"

namespace hz::plots {
namespace {

/// Words about the star, in lines that fit the column left of the axis.
struct StarWords {
  std::vector<Text> name;
  std::vector<Text> facts;
};

StarWords star_words(const Canvas& canvas, const FigureStar& star, double width) {
  const TextMeasure& measure = canvas.measure();
  StarWords words{wrapped(measure, measure.printable(star.name), canvas.names(), width, 3), {}};
  for (const std::string& fact : {measured_text(star.teff) + "\u00A0K", measured_text(star.luminosity) + "\u00A0L⊙"})
    for (Text& line : wrapped(measure, measure.printable(fact), canvas.quiet_words(), width, 2))
      words.facts.push_back(std::move(line));
  return words;
}

const std::array<std::string, 4> column_words{"distance", "insolation", "Earth = 1", "period"};

double column_width(const Canvas& canvas, const StarWords& words) {
  double width = 0;
  for (const std::string& word : column_words)
    width = std::max(width, canvas.measure().advance({{word}}, canvas.words()));
  for (const Text& line : words.name) width = std::max(width, canvas.measure().advance(line, canvas.names()));
  for (const Text& line : words.facts) width = std::max(width, canvas.measure().advance(line, canvas.quiet_words()));
  return width;
}

/// The wedge about y = 0, before it is moved into place.
class Wedge {
public:
  Wedge(const Canvas& canvas, const FigureStar& star, const WedgeFrame& frame)
      : canvas_(canvas), star_(star), frame_(frame) {}

  [[nodiscard]] std::vector<Mark> body(const StarWords& words, const PlanetRowPlan& plan) {
    add_zone();
    add("axis", LineMark{{{frame_.star_x, 0}, {frame_.axis.x1, 0}}, {palette::guide, 0.5, {}}});
    for (const FigurePlanet* planet : by_distance(star_)) add_orbit(*planet);
    for (const FigureLimit& limit : star_.limits) add_limit(limit);
    add_star(words);
    for (Mark& mark : planet_row(canvas_, star_, plan)) marks_.push_back(std::move(mark));
    return std::move(marks_);
  }

private:
  void add(std::string tag, Shape shape) { marks_.push_back({std::move(tag), std::move(shape)}); }
  [[nodiscard]] Point center() const { return {frame_.star_x, 0}; }

  void add_zone() {
    if (frame_.shade.empty()) return;
    add("zone", frame_.zone());
  }

  void add_arc(std::string tag, double distance, const Stroke& stroke) {
    if (!on_axis(frame_.axis, distance)) return;
    add(std::move(tag), ArcMark{center(), frame_.ring(distance), frame_.half_angle, stroke});
  }

  void add_orbit(const FigurePlanet& planet) {
    add_arc("orbit:" + planet.name, planet.semi_major_axis.value, {palette::grey, 0.7, {}});
    if (!planet.span) return;
    for (const double end : {planet.span->periastron, planet.span->apastron})
      add_arc("span:" + planet.name, end, span_stroke());
  }

  void add_limit(const FigureLimit& limit) {
    add_arc("limit:" + limit.title, limit.distance.value, limit_stroke(limit.role));
    if (!limit.held || !on_axis(frame_.axis, limit.distance.value)) return;
    const double ring = frame_.ring(limit.distance.value);
    const double far = ring + (is_inner(limit.role) ? tooth_length : -tooth_length);
    const int teeth = static_cast<int>(ring * frame_.half_angle / tooth_pitch);
    for (int i = -teeth; i <= teeth; ++i) {
      const double angle = i * tooth_pitch / ring;
      add("tooth:" + limit.title, LineMark{{at(ring, angle), at(far, angle)}, tooth_stroke()});
    }
  }

  [[nodiscard]] Point at(double ring, double angle) const {
    return {frame_.star_x + ring * std::cos(angle), ring * std::sin(angle)};
  }

  void add_star(const StarWords& words) {
    const double size = 2 * canvas_.size() - 5;
    const Color tint = star_tint(star_.teff.value);
    add("star", DiscMark{center(), size, 0, 0, tint, tint, {palette::grey, 0.7, {}}, 0});
    double y = -size - 5 - (static_cast<double>(words.name.size()) - 1) * line_pitch * canvas_.names().size;
    for (const Text& line : words.name) add_line("star name", line, canvas_.names(), y);
    y = size + 5 + cap_height * canvas_.size();
    for (const Text& line : words.facts) add_line("star fact", line, canvas_.quiet_words(), y);
  }

  void add_line(std::string tag, const Text& line, const TextStyle& style, double& y) {
    add(std::move(tag), canvas_.text_at(line, style, {frame_.star_x, y}, Align::center));
    y += line_pitch * style.size;
  }

  const Canvas& canvas_;
  const FigureStar& star_;
  const WedgeFrame& frame_;
  std::vector<Mark> marks_;
};

/// Everything that must lie on the axis, with the room it takes.
LogScale wedge_axis(const Canvas& canvas, const FigureStar& star, const PlanetRowPlan& plan, double x0) {
  std::vector<AxisNeed> needs = needs_of(star, plan.unit);
  for (const FigurePlanet& planet : star.planets)
    needs.push_back({planet.semi_major_axis.value, 0, room_at_side(canvas, planet, plan)});
  return fitted_axis(needs, x0, canvas.width() - page_margin - 2);
}

PlanetRowPlan side_label_plan(const Canvas& canvas, FilledZone zone) {
  PlanetRowPlan plan;
  plan.unit = 0.46 * canvas.size();
  plan.zone = zone;
  plan.labels_at_side = true;
  plan.letter = canvas.names();
  plan.p = canvas.words();
  return plan;
}

/// The wedge opens as far as this at its outermost ring.
double half_angle(const Canvas& canvas, double star_x, const LogScale& axis) {
  const double half_height = std::clamp(0.16 * canvas.width(), 50.0, 78.0);
  return std::asin(std::min(0.5, half_height / (axis.x1 - star_x)));
}

Box united_extent(const std::vector<Mark>& marks) {
  Box all = extent(marks.front().shape);
  for (const Mark& mark : marks) all = all.united(extent(mark.shape));
  return all;
}

void add_ruler(Canvas& canvas, const Ruler& ruler, const std::string& unit) {
  const double y = ruler.y + cap_height * canvas.size() / 2 - 1;
  canvas.add_text("ruler name", {{ruler.name}}, canvas.words(), {page_margin, y}, Align::left);
  canvas.add_text("ruler unit", {{unit}}, canvas.quiet_words(), {page_margin, y + line_pitch * canvas.size()},
                  Align::left);
  draw_ruler(canvas, ruler);
}

/// Rulers of distance, insolation and, with a stellar mass, period; returns the lower end.
double add_rulers(Canvas& canvas, const FigureStar& star, const LogScale& axis, double top) {
  const auto insolation = [&](double d) { return star.luminosity.value / (d * d); };
  const auto period = [&](double d) { return constants::period_1au_d * std::sqrt(d * d * d / *star.stellar_mass); };
  const double pitch = 3.4 * canvas.size();
  double y = top + 5;
  const auto add = [&](Ruler ruler, const std::string& unit) {
    ruler.y = y;
    add_ruler(canvas, ruler, unit);
    draw_limits_on_ruler(canvas, star.limits, axis, y);
    y += pitch;
  };
  add({"distance", axis, 0, "", ""}, "au");
  const LogScale falling{insolation(axis.value0), insolation(axis.value1), axis.x0, axis.x1};
  add({"insolation", falling, 0, "hotter", "colder"}, "Earth = 1");
  if (star.stellar_mass) add({"period", {period(axis.value0), period(axis.value1), axis.x0, axis.x1}, 0, "", ""}, "d");
  return y - pitch + ruler_depth(canvas);
}

}  // namespace

SectorMark WedgeFrame::zone() const {
  std::vector<ColorStop> stops = shade;
  for (ColorStop& stop : stops) stop.at -= star_x;
  return {{star_x, 0}, stops.front().at, stops.back().at, half_angle, stops};
}

Point WedgeFrame::on_ring(double x, double y) const {
  const double ring = x - star_x;
  return {star_x + std::sqrt(std::max(0.0, ring * ring - y * y)), y};
}

Scene wedge_scene(const FigureStar& star, const FigureOptions& options) {
  require_drawable(star);
  const TextMeasure measure;
  Canvas canvas(measure, options.width);
  const StarWords words = star_words(canvas, star, 0.27 * canvas.width());
  const double column = column_width(canvas, words);

  PlanetRowPlan plan = side_label_plan(canvas, options.filled_by);
  WedgeFrame frame;
  frame.star_x = page_margin + column / 2;
  frame.axis = plan.axis = wedge_axis(canvas, star, plan, page_margin + column + 8);
  frame.half_angle = half_angle(canvas, frame.star_x, frame.axis);
  frame.shade = zone_shade(star.limits, frame.axis);
  if (!frame.shade.empty()) plan.ground = frame.zone();
  plan.position = [&](Point p) { return frame.on_ring(p.x, p.y); };

  const LimitTitles titles(canvas, star, frame);
  plan.curtains = titles.curtains();

  const std::vector<Mark> body = Wedge(canvas, star, frame).body(words, plan);
  const Box reach = united_extent(body);
  const double star_y = page_margin + titles.height() + 4 - reach.y;
  for (Mark& mark : titles.marks(page_margin, star_y)) canvas.add(mark.tag, mark.shape);
  for (const Mark& mark : body) canvas.add(mark.tag, moved(mark, 0, star_y).shape);

  const double rulers_end = add_rulers(canvas, star, frame.axis, star_y + reach.bottom() + 8);
  const double key_end = draw_key(canvas, {star}, options, {FigureKind::wedge, plan.unit, ""}, rulers_end + 9);
  return std::move(canvas).finished(key_end + page_margin);
}

}  // namespace hz::plots
