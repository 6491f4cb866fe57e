#include "planet_shelf.hpp"

#include <algorithm>
#include <cmath>

#include "palette.hpp"

namespace hz::plots {
namespace {

constexpr double most_shift = 12;
constexpr double between_labels = 3.5;
constexpr double between_lines = 3.2;  // of one label
constexpr double slant = 5;            // height in which a leader moves sideways
constexpr double before_words = 1.2;

double cap(const TextStyle& style) { return cap_height * style.size; }
double descent(const TextStyle& style) { return 0.24 * style.size; }

}  // namespace

std::optional<std::vector<Mark>> PlanetShelf::filled(const std::vector<const PlanetSpot*>& spots) const {
  std::vector<Label> labels;
  for (const PlanetSpot* spot : spots) labels.push_back({spot->x, width(*spot)});
  const LabelSpace space{plan_.axis.x0 - 6, std::min(plan_.axis.x1 + 10, canvas_.width() - page_margin),
                         between_labels};
  const auto paths = label_rows(labels, space, most_shift, obstacles());
  if (!paths) return std::nullopt;
  std::vector<Mark> marks;
  for (std::size_t i = 0; i < spots.size(); ++i) marks.push_back(leader(*spots[i], (*paths)[i]));
  for (std::size_t i = 0; i < spots.size(); ++i) add_words(marks, *spots[i], (*paths)[i]);
  return marks;
}

/// A curtain hangs in the rows that reach higher than its end.
std::vector<Obstacle> PlanetShelf::obstacles() const {
  std::vector<Obstacle> all;
  if (side_ > 0) return all;
  for (const Curtain& curtain : plan_.curtains) {
    std::size_t row = 0;
    while (std::abs(far(row)) + before_words < curtain.height) ++row;
    all.push_back({curtain.low, curtain.high, row});
  }
  return all;
}

double PlanetShelf::width(const PlanetSpot& spot) const {
  return std::max(canvas_.measure().advance(spot.letter, plan_.letter), canvas_.measure().advance(spot.p, plan_.p));
}

double PlanetShelf::height() const {
  return cap(plan_.letter) + (plan_.labels_at_side ? between_lines + cap(plan_.p) : descent(plan_.letter));
}

double PlanetShelf::near(std::size_t row) const {
  return side_ * (reach_ + slant + static_cast<double>(row) * (height() + slant));
}

Mark PlanetShelf::leader(const PlanetSpot& spot, const LabelPath& label) const {
  const double from = spot.whisker ? spot.whisker->y : spot.y + side_ * spot.size;
  LineMark line{{{spot.x, from}, {spot.x, side_ * reach_}}, {palette::guide, 0.5, {}}};
  for (std::size_t row = 0; row <= label.row(); ++row) {
    line.points.push_back({label.path[row], near(row) - side_ * before_words});
    if (row < label.row()) line.points.push_back({label.path[row], far(row)});
  }
  return {"leader:" + spot.planet->name, std::move(line)};
}

void PlanetShelf::add_words(std::vector<Mark>& marks, const PlanetSpot& spot, const LabelPath& label) const {
  const double top = std::min(near(label.row()), far(label.row()));
  const double middle = label.path.back();
  const bool alone_above = spot.p.empty() && side_ < 0;  // then it stands where P would, at the end of its leader
  const Point letter{middle, alone_above ? top + height() - descent(plan_.letter) : top + cap(plan_.letter)};
  marks.push_back(over_ground(plan_, "label:" + spot.planet->name,
                              canvas_.text_at(spot.letter, plan_.letter, letter, Align::center)));
  if (spot.p.empty()) return;
  const Point p{middle, top + height()};
  marks.push_back(over_ground(plan_, "p:" + spot.planet->name, canvas_.text_at(spot.p, plan_.p, p, Align::center)));
}

}  // namespace hz::plots
