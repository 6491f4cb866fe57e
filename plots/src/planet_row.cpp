#include "planet_row.hpp"

#include <algorithm>
#include <cmath>
#include <iterator>

#include "hz/error.hpp"
#include "number_text.hpp"
#include "planet_marks.hpp"
#include "planet_shelf.hpp"
#include "planet_spot.hpp"

namespace hz::plots {
namespace {

constexpr double whisker_distance = 3.4;  // from the disc
constexpr double between_discs = 2.3;
constexpr double widest_label = 60;

Text p_text(const FigurePlanet& planet, const PlanetRowPlan& plan) {
  const auto p = filling(planet, plan.zone);
  return p && plan.labels_at_side ? Text{{probability_text(*p)}} : Text{};
}

double whisker_y(double size, const PlanetRowPlan& plan) {
  return std::max(size + whisker_distance, plan.clearance + whisker_cap + 1.2);
}

std::vector<PlanetSpot> spots_of(const Canvas& canvas, const FigureStar& star, const PlanetRowPlan& plan) {
  std::vector<PlanetSpot> spots;
  for (const FigurePlanet* planet : by_distance(star)) {
    PlanetSpot spot{planet,
                    plan.axis.x(planet->semi_major_axis.value),
                    disc_radius(measured_radius(*planet), plan.unit),
                    0,
                    1,
                    {},
                    {},
                    {}};
    spot.letter = label_text(canvas, *planet, plan.letter, widest_label);
    spot.p = p_text(*planet, plan);
    spot.whisker = whisker(planet->semi_major_axis, plan.axis, whisker_y(spot.size, plan));
    spots.push_back(std::move(spot));
  }
  return spots;
}

Box disc_box(const PlanetSpot& spot) { return Box{spot.x, spot.y, 0, 0}.grown(spot.size + 0.5); }

/// Letter and P at the right of the disc, or the letter above it.
std::vector<Mark> words_beside(const Canvas& canvas, const PlanetSpot& spot, const PlanetRowPlan& plan) {
  const std::string& name = spot.planet->name;
  if (!plan.labels_at_side) {
    const Point above{spot.x, -std::max(spot.size, plan.clearance) - 2};
    return {over_ground(plan, "label:" + name, canvas.text_at(spot.letter, plan.letter, above, Align::center))};
  }
  const Point upper{spot.x + 0.75 * spot.size + 2, -0.55 * spot.size - 1.5};
  std::vector<Mark> words{
      over_ground(plan, "label:" + name, canvas.text_at(spot.letter, plan.letter, upper, Align::left))};
  if (spot.p.empty()) return words;
  const double below = whisker_y(spot.size, plan) + whisker_cap + 2 + cap_height * plan.p.size;
  const Point lower{spot.x + 0.6 * spot.size + 2.5, below};
  words.push_back(over_ground(plan, "p:" + name, canvas.text_at(spot.p, plan.p, lower, Align::left)));
  return words;
}

bool any_overlap(const std::vector<Box>& some, const std::vector<Box>& others) {
  return std::any_of(some.begin(), some.end(), [&](const Box& one) {
    return std::any_of(others.begin(), others.end(), [&](const Box& other) { return one.grown(0.8).overlaps(other); });
  });
}

/// All beside their discs; nullopt when anything of two planets would touch, or leave the page.
std::optional<std::vector<Mark>> labels_beside(const Canvas& canvas, const std::vector<PlanetSpot>& spots,
                                               const PlanetRowPlan& plan) {
  std::vector<std::vector<Box>> planets;
  std::vector<Mark> all;
  for (const PlanetSpot& spot : spots) {
    std::vector<Box> boxes{disc_box(spot)};
    if (spot.whisker) boxes.push_back(extent(*spot.whisker));
    for (Mark& mark : words_beside(canvas, spot, plan)) {
      boxes.push_back(extent(mark.shape));
      if (boxes.back().right() > canvas.width() - page_margin) return std::nullopt;
      all.push_back(std::move(mark));
    }
    for (const auto& other : planets)
      if (any_overlap(boxes, other)) return std::nullopt;
    planets.push_back(std::move(boxes));
  }
  return all;
}

/// By turns above and below.
double turn(std::size_t index) { return index % 2 == 0 ? -1 : 1; }

bool covers(const PlanetSpot& one, const PlanetSpot& other, const PlanetRowPlan& plan) {
  const Point a = plan.position({one.x, one.y});
  const Point b = plan.position({other.x, other.y});
  return std::hypot(a.x - b.x, a.y - b.y) < one.size + other.size + between_discs;
}

/// Neighbours that would cover each other step apart, by turns up and down; where that is not enough, farther.
void step_apart(std::vector<PlanetSpot>& spots, const PlanetRowPlan& plan) {
  for (std::size_t i = 1; i < spots.size(); ++i) {
    if (!covers(spots[i - 1], spots[i], plan)) continue;
    const double apart = spots[i - 1].size + spots[i].size + between_discs + 0.1;
    const double dx = spots[i].x - spots[i - 1].x;
    const double step = std::sqrt(std::max(0.0, apart * apart - dx * dx)) / 2;
    for (const std::size_t which : {i - 1, i})
      if (std::abs(spots[which].y) < step) spots[which].y = turn(which) * step;
  }
  for (std::size_t i = 1; i < spots.size(); ++i) {
    const auto free = [&] {
      return std::none_of(spots.begin(), spots.begin() + static_cast<std::ptrdiff_t>(i),
                          [&](const PlanetSpot& before) { return covers(before, spots[i], plan); });
    };
    while (!free()) spots[i].y += 0.5 * turn(i);
  }
}

/// Each whisker on its planet's side of the disc, farther out where others are in the way.
void place_whiskers(std::vector<PlanetSpot>& spots, const PlanetRowPlan& plan) {
  std::vector<Box> taken;
  for (const PlanetSpot& spot : spots) taken.push_back(disc_box(spot));
  for (PlanetSpot& spot : spots) {
    if (!spot.whisker) continue;
    spot.whisker->y = spot.y + spot.side * whisker_y(spot.size, plan);
    const auto free = [&] {
      return std::none_of(taken.begin(), taken.end(),
                          [&](const Box& box) { return box.overlaps(extent(*spot.whisker).grown(0.8)); });
    };
    while (!free()) spot.whisker->y += spot.side;
    taken.push_back(extent(*spot.whisker));
  }
}

/// How far the discs and whiskers of one side reach from the axis.
double reach(const std::vector<PlanetSpot>& spots, double side, double clearance) {
  double farthest = clearance;
  for (const PlanetSpot& spot : spots) {
    farthest = std::max(farthest, side * spot.y + spot.size);
    if (spot.whisker && spot.side == side) farthest = std::max(farthest, side * spot.whisker->y + whisker_cap);
  }
  return farthest + 1;
}

/// Labels in rows on the sides that the planets have; nullopt when they find no room.
std::optional<std::vector<Mark>> labels_on_shelves(const Canvas& canvas, const std::vector<PlanetSpot>& spots,
                                                   const PlanetRowPlan& plan) {
  std::vector<Mark> marks;
  for (const double side : {-1.0, 1.0}) {
    std::vector<const PlanetSpot*> here;
    for (const PlanetSpot& spot : spots)
      if (spot.side == side) here.push_back(&spot);
    auto shelf = PlanetShelf(canvas, plan, side, reach(spots, side, plan.clearance)).filled(here);
    if (!shelf) return std::nullopt;
    std::move(shelf->begin(), shelf->end(), std::back_inserter(marks));
  }
  return marks;
}

/// Above and below by turns; where something hangs in the way above, all below.
std::vector<Mark> labels_apart(const Canvas& canvas, std::vector<PlanetSpot>& spots, const PlanetRowPlan& plan) {
  step_apart(spots, plan);
  for (const bool all_below : {false, true}) {
    for (std::size_t i = 0; i < spots.size(); ++i) spots[i].side = all_below ? 1 : turn(i);
    place_whiskers(spots, plan);
    if (auto labels = labels_on_shelves(canvas, spots, plan)) return std::move(*labels);
  }
  throw Error(Fault::usage, "the page is too narrow for the labels of so many planets; choose a larger --width");
}

Mark disc_mark(const PlanetSpot& spot, const PlanetRowPlan& plan) {
  const bool known = measured_radius(*spot.planet).has_value();
  return {"disc:" + spot.planet->name,
          disc(plan.position({spot.x, spot.y}), spot.size, filling(*spot.planet, plan.zone), known)};
}

}  // namespace

Mark over_ground(const PlanetRowPlan& plan, std::string tag, TextMark text) {
  text.ground = plan.ground;
  return {std::move(tag), std::move(text)};
}

double room_at_side(const Canvas& canvas, const FigurePlanet& planet, const PlanetRowPlan& plan) {
  const double letter = canvas.measure().advance(label_text(canvas, planet, plan.letter, widest_label), plan.letter);
  const double p = canvas.measure().advance(p_text(planet, plan), plan.p);
  return 0.75 * disc_radius(measured_radius(planet), plan.unit) + 3 + std::max(letter, p);
}

std::vector<Mark> planet_row(const Canvas& canvas, const FigureStar& star, const PlanetRowPlan& plan) {
  std::vector<PlanetSpot> spots = spots_of(canvas, star, plan);
  auto labels = labels_beside(canvas, spots, plan);
  if (!labels) labels = labels_apart(canvas, spots, plan);
  std::vector<Mark> marks;
  const auto is_leader = [](const Mark& mark) { return std::holds_alternative<LineMark>(mark.shape); };
  std::copy_if(labels->begin(), labels->end(), std::back_inserter(marks), is_leader);
  for (const PlanetSpot& spot : spots) marks.push_back(disc_mark(spot, plan));
  for (const PlanetSpot& spot : spots)
    if (spot.whisker) marks.push_back({"whisker:" + spot.planet->name, *spot.whisker});
  std::remove_copy_if(labels->begin(), labels->end(), std::back_inserter(marks), is_leader);
  return marks;
}

}  // namespace hz::plots
