#include "wedge_titles.hpp"

#include <algorithm>
#include <cmath>

#include "hz/error.hpp"
#include "palette.hpp"
#include "text_fit.hpp"
#include "zone_marks.hpp"

namespace hz::plots {
namespace {

constexpr double between_rows = 4;
constexpr double between_leaders = 2.5;  // where they turn down

}  // namespace

LimitTitles::LimitTitles(const Canvas& canvas, const FigureStar& star, const WedgeFrame& frame)
    : canvas_(canvas), frame_(frame) {
  for (const FigureLimit& limit : star.limits)
    if (on_axis(frame.axis, limit.distance.value)) limits_.push_back(&limit);
  std::stable_sort(limits_.begin(), limits_.end(),
                   [](const FigureLimit* a, const FigureLimit* b) { return a->distance.value < b->distance.value; });
  choose_lines();
}

double LimitTitles::height() const { return limits_.empty() ? 0 : static_cast<double>(rows_) * row_height() + drop_; }

std::vector<Mark> LimitTitles::marks(double top, double star_y) const {
  std::vector<Mark> all;
  for (std::size_t i = 0; i < limits_.size(); ++i) all.push_back(leader(i, top, star_y));
  for (std::size_t i = 0; i < limits_.size(); ++i) add_lines(all, i, top);
  return all;
}

TextStyle LimitTitles::style() const { return {canvas_.size(), palette::water}; }

double LimitTitles::row_height() const { return static_cast<double>(most_lines_) * line_height() + between_rows; }

double LimitTitles::row_bottom(std::size_t row, double top) const {
  return top + static_cast<double>(rows_ - row) * row_height() - between_rows;
}

Point LimitTitles::arc_end(std::size_t i) const {
  const double ring = frame_.ring(limits_[i]->distance.value);
  return {frame_.star_x + ring * std::cos(frame_.half_angle), -ring * std::sin(frame_.half_angle)};
}

std::vector<Curtain> LimitTitles::curtains() const {
  std::vector<Curtain> all;
  for (std::size_t i = 0; i < limits_.size(); ++i) {
    const Point end = arc_end(i);
    all.push_back({std::min(end.x, elbows_[i]) - 0.5, std::max(end.x, elbows_[i]) + 0.5, -end.y});
  }
  return all;
}

/// Names in one line each if their leaders stay steep, else broken at blanks, else in several rows.
void LimitTitles::choose_lines() {
  if (arrange(canvas_.width(), 1, 0.14 * canvas_.width()) && rows_ == 1) return;
  if (!arrange(0.19 * canvas_.width(), 3, canvas_.width()))
    throw Error(Fault::usage, "the page is too narrow for the names of the limits; choose a larger --width");
}

bool LimitTitles::arrange(double width, std::size_t most_lines, double most_shift) {
  lines_.clear();
  elbows_.clear();
  most_lines_ = 1;
  std::vector<Label> labels;
  std::vector<Label> ends;
  for (std::size_t i = 0; i < limits_.size(); ++i) {
    const Text title = canvas_.measure().printable(limits_[i]->title);
    lines_.push_back(wrapped(canvas_.measure(), title, style(), width, most_lines));
    double widest = 0;
    for (const Text& line : lines_.back()) widest = std::max(widest, canvas_.measure().advance(line, style()));
    labels.push_back({arc_end(i).x, widest});
    ends.push_back({arc_end(i).x, 0});
    most_lines_ = std::max(most_lines_, lines_.back().size());
  }
  const LabelSpace page{page_margin, canvas_.width() - page_margin, 6};
  const auto paths = label_rows(labels, page, most_shift);
  const auto elbows = spread(ends, {page.low, page.high, between_leaders});
  if (!paths || !elbows) return false;
  paths_ = *paths;
  elbows_ = *elbows;
  rows_ = 0;
  double shift = 0;
  for (std::size_t i = 0; i < limits_.size(); ++i) {
    rows_ = std::max(rows_, paths_[i].row() + 1);
    shift = std::max(shift, std::abs(paths_[i].path.front() - elbows_[i]));
  }
  drop_ = std::clamp(0.3 * shift, 10.0, 26.0);
  return true;
}

Mark LimitTitles::leader(std::size_t i, double top, double star_y) const {
  const std::vector<double>& path = paths_[i].path;
  LineMark line{{{path.back(), row_bottom(paths_[i].row(), top) + 1}}, {palette::water, 0.5, {}}};
  for (std::size_t row = paths_[i].row(); row-- > 0;) {
    line.points.push_back({path[row], row_bottom(row + 1, top) + between_rows});
    line.points.push_back({path[row], row_bottom(row, top) + 1});
  }
  line.points.push_back({elbows_[i], top + height()});
  line.points.push_back({arc_end(i).x, star_y + arc_end(i).y});
  return {"title leader:" + limits_[i]->title, std::move(line)};
}

void LimitTitles::add_lines(std::vector<Mark>& all, std::size_t i, double top) const {
  constexpr double descent = 0.24;
  double y = row_bottom(paths_[i].row(), top) - descent * canvas_.size() -
             static_cast<double>(lines_[i].size() - 1) * line_height();
  for (const Text& line : lines_[i]) {
    const Point anchor{paths_[i].path.back(), y};
    all.push_back({"title:" + limits_[i]->title, canvas_.text_at(line, style(), anchor, Align::center)});
    y += line_height();
  }
}

}  // namespace hz::plots
