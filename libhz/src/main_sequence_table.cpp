#include "main_sequence_table.hpp"

#include <algorithm>
#include <charconv>
#include <cstddef>
#include <iterator>
#include <utility>

#include "hz/require.hpp"

namespace hz {
namespace embedded {
extern const std::string_view main_sequence;
}  // namespace embedded

namespace {

/// Takes what stands before `separator` off the front of `text`.
std::string_view take(std::string_view& text, char separator) {
  const std::string_view part = text.substr(0, text.find(separator));
  text.remove_prefix(std::min(text.size(), part.size() + 1));
  return part;
}

/// Lines without comments and blank ones; the first is the header.
std::vector<std::string_view> lines() {
  std::vector<std::string_view> found;
  for (std::string_view rest = embedded::main_sequence; !rest.empty();) {
    const std::string_view line = take(rest, '\n');
    if (!line.empty() && line.front() != '#') found.push_back(line);
  }
  return found;
}

std::string_view cell(std::string_view line, std::size_t index) {
  for (; index > 0; --index) take(line, ',');
  return take(line, ',');
}

std::size_t column_index(std::string_view header, std::string_view name) {
  std::size_t index = 0;
  while (!header.empty()) {
    if (take(header, ',') == name) return index;
    ++index;
  }
  HZ_REQUIRE(!"the main-sequence table has this column");
  return index;
}

double number(std::string_view text) {
  double value = 0;
  const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), value);
  HZ_REQUIRE(error == std::errc());
  return value;
}

/// "M5.5V" is 65.5.
double subtype(std::string_view type) {
  constexpr std::string_view classes = "OBAFGKML";
  const std::size_t index = classes.find(type.front());
  HZ_REQUIRE(index != std::string_view::npos);
  return 10 * static_cast<double>(index) + number(type.substr(1));
}

double value_of(std::string_view text, std::string_view column) {
  return column == "spt" ? subtype(text) : number(text);
}

/// The rows that have both columns, in the table's order.
std::vector<Point> read_points(std::string_view x_column, std::string_view y_column) {
  const std::vector<std::string_view> rows = lines();
  const std::size_t x_index = column_index(rows.front(), x_column);
  const std::size_t y_index = column_index(rows.front(), y_column);
  std::vector<Point> points;
  for (auto row = rows.begin() + 1; row != rows.end(); ++row) {
    const std::string_view x = cell(*row, x_index);
    const std::string_view y = cell(*row, y_index);
    if (!x.empty() && !y.empty()) points.push_back({value_of(x, x_column), value_of(y, y_column)});
  }
  return points;
}

/// The longest stretch of neighbours over which x rises.
std::vector<Point> rising_run(const std::vector<Point>& points) {
  auto best = std::pair(points.begin(), points.begin());
  for (auto first = points.begin(); first != points.end();) {
    const auto last =
        std::adjacent_find(first, points.end(), [](const Point& a, const Point& b) { return b.x <= a.x; });
    const auto end = last == points.end() ? last : std::next(last);
    if (end - first > best.second - best.first) best = {first, end};
    first = end;
  }
  return {best.first, best.second};
}

}  // namespace

std::vector<Point> main_sequence_points(std::string_view x_column, std::string_view y_column,
                                        const std::optional<Range>& range) {
  std::vector<Point> points = read_points(x_column, y_column);
  std::vector<Point> run = rising_run(points);
  std::reverse(points.begin(), points.end());
  const std::vector<Point> falling = rising_run(points);
  if (falling.size() > run.size()) run = falling;
  const auto is_outside = [&range](const Point& point) { return point.x < range->low || point.x > range->high; };
  if (range) std::erase_if(run, is_outside);
  return run;
}

}  // namespace hz
