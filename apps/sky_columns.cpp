#include "sky_columns.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <string_view>

#include "hz/error.hpp"
#include "hz/measured_text.hpp"

namespace hz::app {
namespace {

template <std::size_t N>
bool is_one_of(const std::array<std::string_view, N>& words, std::string_view word) {
  return std::find(words.begin(), words.end(), word) != words.end();
}

constexpr auto hours = std::to_array<std::string_view>({"h", "hr", "hrs", "hour", "hours", "hourangle"});
/// Units of numbers in degrees, and words for text in sexagesimal form.
constexpr auto degrees = std::to_array<std::string_view>({"", "deg", "degree", "degrees", "°", "h m s", "d m s"});

bool is_hours(const UnderstoodColumn& column) {
  return column.quantity == Quantity::ra && is_one_of(hours, column.unit);
}

bool is_understood(const UnderstoodColumn& column) {
  const bool sexagesimal = column.unit.find(':') != std::string::npos;
  return sexagesimal || is_one_of(degrees, column.unit) || is_hours(column);
}

}  // namespace

SkyColumns::Axis SkyColumns::axis(const OpenList& list, Quantity quantity) {
  const TableHead& head = list.reader->head();
  Axis axis;
  for (const UnderstoodColumn& column : list.understanding.columns()) {
    if (column.quantity != quantity || column.part != ColumnPart::value) continue;
    if (!is_understood(column)) {
      throw Error(Fault::usage, fmt::format("--join sky: the unit `{}` of column `{}` in {} is not one of degrees, "
                                            "hours or sexagesimal text",
                                            column.unit, head.columns[column.column].name, head.source));
    }
    axis.columns.push_back(column.column);
    axis.in_hours.push_back(is_hours(column));
  }
  if (!axis.columns.empty()) return axis;
  throw Error(Fault::usage, fmt::format("--join sky: {} has no column that is known as {}; name it in a column map, "
                                        "such as {} = \"RA_ICRS\"",
                                        head.source, name(quantity), name(quantity)));
}

SkyColumns::SkyColumns(const OpenList& list) : ra_(axis(list, Quantity::ra)), dec_(axis(list, Quantity::dec)) {}

std::vector<std::size_t> SkyColumns::columns() const {
  std::vector<std::size_t> all = ra_.columns;
  all.insert(all.end(), dec_.columns.begin(), dec_.columns.end());
  return all;
}

Result<SkyPosition> SkyColumns::position(std::span<const std::string> cells) const {
  const auto filled = [](std::span<const std::string> of_axis) {
    const auto found =
        std::find_if(of_axis.begin(), of_axis.end(), [](const std::string& c) { return !is_missing(c); });
    return static_cast<std::size_t>(found - of_axis.begin());
  };
  const std::span<const std::string> ra_cells = cells.first(ra_.columns.size());
  const std::span<const std::string> dec_cells = cells.subspan(ra_.columns.size(), dec_.columns.size());
  const std::size_t ra_choice = filled(ra_cells);
  const std::size_t dec_choice = filled(dec_cells);
  if (ra_choice == ra_cells.size() || dec_choice == dec_cells.size())
    return Problem{ProblemCode::missing, "ra", "no position"};
  const std::string& ra_text = ra_cells[ra_choice];
  const bool bare_hours = ra_.in_hours[ra_choice] && parse_number(ra_text);
  const Result<double> ra = read_right_ascension(bare_hours ? ra_text + "h" : ra_text);
  if (!ra) return ra.error();
  const Result<double> dec = read_declination(dec_cells[dec_choice]);
  if (!dec) return dec.error();
  return SkyPosition{*ra, *dec};
}

}  // namespace hz::app
