#include "join_side.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <span>
#include <utility>

#include "hz/error.hpp"

namespace hz::app {
namespace {

bool is_of_kind(const JoinWay& way, JoinWay::Kind kind) { return way.kind == kind; }

void refuse_without_star_names(const OpenList& list) {
  if (list.understanding.knows(Quantity::star)) return;
  throw Error(Fault::usage, fmt::format("{} has no column of star names to join on; name a column of each list with "
                                        "--join HOST=NAME",
                                        list.reader->head().source));
}

}  // namespace

JoinSideReading::JoinSideReading(const OpenList& list, const std::vector<JoinWay>& ways, std::string JoinWay::*column,
                                 RowReading reading)
    : list_(list), ways_(ways), reading_(std::move(reading)) {
  for (const JoinWay& way : ways) {
    if (is_of_kind(way, JoinWay::Kind::star_names)) refuse_without_star_names(list);
    if (is_of_kind(way, JoinWay::Kind::columns))
      reading_.identifiers.push_back(column_named("join", way.*column, list.reader->head()));
    if (is_of_kind(way, JoinWay::Kind::sky)) sky_.emplace(list);
  }
  if (!sky_) return;
  for (const std::size_t position : sky_->columns()) reading_.identifiers.push_back(position);
}

JoinSide JoinSideReading::read(const Console& console) const {
  ListRows rows = read_rows(list_, reading_, console);
  JoinSide side;
  side.file = list_.reader->head().source;
  side.names = names_of(rows);
  if (sky_) side.positions = positions_of(rows);
  side.candidates = std::move(rows.candidates);
  for (Candidate& candidate : side.candidates) {  // a line's number alone does not say in which list
    std::optional<Problem>& problem = candidate.row.problem;
    if (problem) problem->what = fmt::format("{}: {}", side.file, problem->what);
  }
  return side;
}

std::vector<std::vector<Aliases>> JoinSideReading::names_of(const ListRows& rows) const {
  std::vector<std::vector<Aliases>> names(ways_.size());
  std::size_t identifier = 0;
  for (std::size_t way = 0; way < ways_.size(); ++way) {
    if (is_of_kind(ways_[way], JoinWay::Kind::sky)) continue;
    const bool by_column = is_of_kind(ways_[way], JoinWay::Kind::columns);
    for (std::size_t row = 0; row < rows.candidates.size(); ++row) {
      const std::string& cell = by_column ? rows.identifiers[row][identifier] : rows.candidates[row].row.star.name;
      names[way].push_back(aliases_of(cell, list_.map.missing_values));
    }
    if (by_column) ++identifier;
  }
  return names;
}

std::vector<Result<SkyPosition>> JoinSideReading::positions_of(const ListRows& rows) const {
  std::vector<Result<SkyPosition>> positions;
  for (const std::vector<std::string>& cells : rows.identifiers)
    positions.push_back(sky_->position(std::span(cells).last(sky_->columns().size())));
  return positions;
}

}  // namespace hz::app
