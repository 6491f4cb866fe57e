#include <fmt/format.h>

#include <algorithm>

#include "axis_fit.hpp"
#include "canvas.hpp"
#include "figure_key.hpp"
#include "hz/plots/figures.hpp"
#include "hz/require.hpp"
#include "number_text.hpp"
#include "palette.hpp"
#include "planet_marks.hpp"
#include "planet_row.hpp"
#include "ruler.hpp"
#include "star_tint.hpp"
#include "text_fit.hpp"
#include "zone_marks.hpp"

namespace hz::plots {
namespace {

constexpr double tint_size = 3;
constexpr double between_columns = 7;
constexpr double between_rows = 6;

/// The columns of the page.
struct LaneColumns {
  double names_right = 0;
  double tint_x = 0;
  double letter_right = 0;
  double p_right = 0;
};

const FigurePlanet* best_planet(const FigureStar& star, FilledZone zone) {
  const FigurePlanet* best = nullptr;
  for (const FigurePlanet* planet : by_distance(star))
    if (filling(*planet, zone) && (!best || *filling(*planet, zone) > *filling(*best, zone))) best = planet;
  return best;
}

Text temperature(const FigureStar& star) {
  return {{measured_text({star.teff.value, std::nullopt, std::nullopt}) + " K"}};
}

class Lanes {
public:
  Lanes(Canvas& canvas, const std::vector<FigureStar>& stars, const FigureOptions& options)
      : canvas_(canvas), stars_(stars), options_(options) {
    plan_.unit = 0.42 * canvas.size();
    plan_.zone = options.filled_by;
    plan_.clearance = 0.62 * canvas.size();
    plan_.letter = plan_.p = canvas.words();
    plan_.position = [](Point p) { return p; };
    set_columns();
  }

  Scene scene(const std::string& note) && {
    double y = page_margin + add_headings();
    for (const FigureStar& star : stars_) y = add_row(star, y);
    y = add_axis(y + 1);
    y = draw_key(canvas_, stars_, options_, {FigureKind::lanes, plan_.unit, note}, y + 9);
    return std::move(canvas_).finished(y + page_margin);
  }

private:
  [[nodiscard]] double widest(const std::vector<Text>& lines, const TextStyle& style) const {
    double width = 0;
    for (const Text& line : lines) width = std::max(width, canvas_.measure().advance(line, style));
    return width;
  }

  [[nodiscard]] Text name_of(const FigureStar& star) const {
    const TextMeasure& measure = canvas_.measure();
    return shortened(measure, measure.printable(star.name), canvas_.names(), 0.27 * canvas_.width());
  }

  [[nodiscard]] Text best_label(const FigurePlanet& planet) const {
    return label_text(canvas_, planet, canvas_.names(), 0.12 * canvas_.width());
  }

  void set_columns() {
    std::vector<Text> names;
    std::vector<Text> temperatures{{{options_.order}}};
    std::vector<Text> letters;
    std::vector<AxisNeed> needs;
    for (const FigureStar& star : stars_) {
      names.push_back(name_of(star));
      temperatures.push_back(temperature(star));
      if (const FigurePlanet* best = best_planet(star, plan_.zone)) letters.push_back(best_label(*best));
      const std::vector<AxisNeed> more = needs_of(star, plan_.unit);
      needs.insert(needs.end(), more.begin(), more.end());
    }
    columns_.names_right =
        page_margin + std::max(widest(names, canvas_.names()), widest(temperatures, canvas_.quiet_words()));
    columns_.tint_x = columns_.names_right + between_columns + tint_size;
    columns_.p_right = canvas_.width() - page_margin;
    columns_.letter_right = columns_.p_right - widest({{{"> 0.99"}}}, canvas_.names()) - 4;
    const double x1 = columns_.letter_right - widest(letters, canvas_.names()) - between_columns;
    plan_.axis = fitted_axis(needs, columns_.tint_x + tint_size + between_columns, x1);
  }

  /// Returns the height they take.
  double add_headings() {
    const double y = page_margin + cap_height * canvas_.size();
    canvas_.add_text("heading", {{options_.order}}, canvas_.quiet_words(), {columns_.names_right, y}, Align::right);
    canvas_.add_text("heading", {{"best planet, P"}}, canvas_.quiet_words(), {columns_.p_right, y}, Align::right);
    return canvas_.size() + 5;
  }

  /// One star, built about y = 0 and moved below `top`; returns where the next may begin.
  double add_row(const FigureStar& star, double top) {
    std::vector<Mark> row;
    add_zone(row, star);
    add_star(row, star);
    add_best(row, star);
    for (Mark& mark : planet_row(canvas_, star, plan_)) row.push_back(std::move(mark));
    Box box = extent(row.front().shape);
    for (const Mark& mark : row) box = box.united(extent(mark.shape));
    for (const Mark& mark : row) canvas_.add(mark.tag, moved(mark, 0, top - box.y).shape);
    return top + box.height + between_rows;
  }

  void add_zone(std::vector<Mark>& row, const FigureStar& star) const {
    const double half = plan_.clearance;
    const auto shade = zone_shade(star.limits, plan_.axis);
    if (!shade.empty())
      row.push_back({"zone:" + star.name,
                     BarMark{{shade.front().at, -half, shade.back().at - shade.front().at, 2 * half}, shade}});
    for (const FigureLimit& limit : star.limits) add_limit(row, limit);
  }

  void add_limit(std::vector<Mark>& row, const FigureLimit& limit) const {
    if (!on_axis(plan_.axis, limit.distance.value)) return;
    const double half = plan_.clearance;
    const double x = plan_.axis.x(limit.distance.value);
    row.push_back({"limit:" + limit.title, LineMark{{{x, -half}, {x, half}}, limit_stroke(limit.role)}});
    if (!limit.held) return;
    const double far = x + (is_inner(limit.role) ? tooth_length : -tooth_length);
    for (const double y : {-0.8 * half, 0.0, 0.8 * half})
      row.push_back({"tooth:" + limit.title, LineMark{{{x, y}, {far, y}}, tooth_stroke()}});
  }

  void add_star(std::vector<Mark>& row, const FigureStar& star) const {
    const Color tint = star_tint(star.teff.value);
    row.push_back({"star", DiscMark{{columns_.tint_x, 0}, tint_size, 0, 0, tint, tint, {palette::grey, 0.6, {}}, 0}});
    const Point name{columns_.names_right, -2};
    row.push_back({"star name", canvas_.text_at(name_of(star), canvas_.names(), name, Align::right)});
    const Point below{columns_.names_right, 2.6 + cap_height * canvas_.size()};
    row.push_back({"star fact", canvas_.text_at(temperature(star), canvas_.quiet_words(), below, Align::right)});
  }

  /// Bold where the planet is more likely inside than not.
  void add_best(std::vector<Mark>& row, const FigureStar& star) const {
    const FigurePlanet* best = best_planet(star, plan_.zone);
    if (!best) return;
    const double p = *filling(*best, plan_.zone);
    TextStyle style = canvas_.names();
    style.bold = p >= 0.5;
    const double y = cap_height * style.size / 2;
    row.push_back({"best", canvas_.text_at(best_label(*best), style, {columns_.letter_right, y}, Align::right)});
    row.push_back({"best p", canvas_.text_at({{probability_text(p)}}, style, {columns_.p_right, y}, Align::right)});
  }

  /// Returns the lower end.
  double add_axis(double y) {
    draw_ruler(canvas_, {"distance", plan_.axis, y, "", ""});
    const double baseline = y + ruler_depth(canvas_) + line_pitch * canvas_.size();
    const double middle = (plan_.axis.x0 + plan_.axis.x1) / 2;
    canvas_.add_text("axis", {{"distance from the star (au)"}}, canvas_.words(), {middle, baseline}, Align::center);
    return baseline + 2;
  }

  Canvas& canvas_;
  const std::vector<FigureStar>& stars_;
  const FigureOptions& options_;
  PlanetRowPlan plan_;
  LaneColumns columns_;
};

}  // namespace

Scene lanes_scene(const std::vector<FigureStar>& stars, const FigureOptions& options) {
  HZ_REQUIRE(!stars.empty());
  std::for_each(stars.begin(), stars.end(), require_drawable);
  const auto rows = static_cast<std::ptrdiff_t>(std::min(stars.size(), most_lanes));
  const std::vector<FigureStar> drawn(stars.begin(), stars.begin() + rows);
  const bool cut = stars.size() > drawn.size();
  const std::string note = cut ? fmt::format("the first {} of {} stars", drawn.size(), stars.size()) : "";
  const TextMeasure measure;
  Canvas canvas(measure, options.width);
  return Lanes(canvas, drawn, options).scene(note);
}

}  // namespace hz::plots
