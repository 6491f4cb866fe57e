#include "two_lists.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <utility>

#include "files.hpp"
#include "hz/error.hpp"
#include "hz/join.hpp"
#include "join_options.hpp"
#include "join_words.hpp"

namespace hz::app {
namespace {

void refuse_one_input_for_both(const std::string& stars, const std::string& planets) {
  if (stars == "-" && planets == "-")
    throw Error(Fault::usage, "only one of the two lists can come from standard input; name a file for the other");
}

/// Columns that travel along: those of the planets, then those of the stars whose names are not among them.
struct KeptOfBoth {
  std::vector<KeptColumn> of_planets;
  std::vector<KeptColumn> of_stars;  // both in full length; a column of the other list has no index
};

KeptOfBoth kept_of_both(const Arguments& arguments, const TableHead& planets, const TableHead& stars,
                        std::span<const std::string> written) {
  TableHead both = planets;
  both.source = fmt::format("{} with {}", planets.source, stars.source);
  std::vector<std::size_t> index_in_stars;
  for (std::size_t i = 0; i < stars.columns.size(); ++i) {
    const auto same = [&](const ColumnHead& column) { return column.name == stars.columns[i].name; };
    if (std::any_of(planets.columns.begin(), planets.columns.end(), same)) continue;
    both.columns.push_back(stars.columns[i]);
    index_in_stars.push_back(i);
  }
  KeptOfBoth kept;
  for (KeptColumn& column : kept_columns(arguments, both, written)) {
    const std::size_t index = *column.column;
    const bool of_planets = index < planets.columns.size();
    kept.of_planets.push_back({of_planets ? std::optional(index) : std::nullopt, column.head});
    kept.of_stars.push_back(
        {of_planets ? std::nullopt : std::optional(index_in_stars[index - planets.columns.size()]), column.head});
  }
  return kept;
}

bool has_column(const OpenList& list, const std::string& name) {
  const std::vector<ColumnHead>& columns = list.reader->head().columns;
  return std::any_of(columns.begin(), columns.end(), [&](const ColumnHead& column) { return column.name == name; });
}

void refuse_swapped(const JoinWay& way, const OpenList& planets, const OpenList& stars) {
  if (way.kind != JoinWay::Kind::columns) return;
  if (has_column(planets, way.planet_column) || !has_column(planets, way.star_column)) return;
  if (!has_column(stars, way.planet_column)) return;
  throw Error(Fault::usage, fmt::format("--join {0}={1}: the column of the list of planets comes first: {1}={0}",
                                        way.planet_column, way.star_column));
}

JoinedSides read_sides(const OpenList& stars, const OpenList& planets, const KeptOfBoth& kept,
                       const Arguments& arguments, const Console& console) {
  JoinedSides sides;
  sides.ways = read_join_ways(arguments);
  for (const JoinWay& way : sides.ways) refuse_swapped(way, planets, stars);
  const RowReading of_planets{kept.of_planets, read_preference(arguments, planets.reader->head()), {}};
  const RowReading of_stars{kept.of_stars, std::nullopt, {}};
  const JoinSideReading planet_side(planets, sides.ways, &JoinWay::planet_column, of_planets);
  const JoinSideReading star_side(stars, sides.ways, &JoinWay::star_column, of_stars);
  sides.planets = planet_side.read(console);
  sides.stars = star_side.read(console);
  return sides;
}

void refuse_lists_without_planets(const JoinSide& planets) {
  const bool any = std::any_of(planets.candidates.begin(), planets.candidates.end(),
                               [](const Candidate& candidate) { return is_planet(candidate.row); });
  if (any) return;
  throw Error(Fault::input,
              fmt::format("{} holds no planets; the list of stars comes first, the list of planets after --planets",
                          planets.file));
}

/// Only the stars of a list of stars count; the first of a star's names is shown.
void make_stars(std::vector<Candidate>& stars) {
  for (Candidate& star : stars) {
    star.row.planet = {};
    const Aliases names = aliases_of(star.row.star.name);
    if (!names.empty()) star.row.star.name = names.front();
  }
}

std::vector<std::optional<SkyPosition>> known_positions(const std::vector<Result<SkyPosition>>& positions) {
  std::vector<std::optional<SkyPosition>> known;
  for (const Result<SkyPosition>& position : positions)
    known.push_back(position ? std::optional(*position) : std::nullopt);
  return known;
}

Joiner join(const JoinedSides& sides, NameMatching matching) {
  Joiner joiner(sides.planets.candidates.size(), sides.stars.candidates.size());
  const auto planets = known_positions(sides.planets.positions);
  const auto stars = known_positions(sides.stars.positions);
  for (std::size_t way = 0; way < sides.ways.size(); ++way) {
    if (sides.ways[way].kind == JoinWay::Kind::sky) {
      joiner.by_position(planets, stars, sides.ways[way].tolerance);
    } else {
      joiner.by_name(sides.planets.names[way], sides.stars.names[way], matching);
    }
  }
  return joiner;
}

/// A planet's row with the values and kept cells of its star.
void give_star(ListRow& planet, const ListRow& star) {
  planet.star = completed(star.star, planet.star);
  if (planet.reference.empty()) planet.reference = star.reference;
  for (std::size_t i = 0; i < planet.kept.size(); ++i) {
    if (planet.kept[i].empty()) planet.kept[i] = star.kept[i];
  }
}

void add_planets(JoinedSides& sides, const Joiner& joiner, UnansweredList& list) {
  for (std::size_t i = 0; i < sides.planets.candidates.size(); ++i) {
    const StarFit& fit = joiner.planets()[i];
    list.remarks.push_back(why_no_star(sides, i, fit));
    if (fit.standing != Standing::matched) continue;
    ListRow& planet = sides.planets.candidates[i].row;
    const ListRow& star = sides.stars.candidates[fit.stars.front()].row;
    list.remarks.back().note = match_note(sides, i, fit);
    give_star(planet, star);
  }
  list.candidates = std::move(sides.planets.candidates);
}

/// Row numbers run on through both lists, so that each is one row's.
void add_stars_without_planets(JoinedSides& sides, const Joiner& joiner, UnansweredList& list) {
  const std::size_t planets = list.candidates.size();
  for (std::size_t i = 0; i < sides.stars.candidates.size(); ++i) {
    if (joiner.stars()[i] == Standing::matched) continue;
    const std::string note = star_note(sides, i, joiner.stars()[i]);
    Candidate& star = sides.stars.candidates[i];
    star.row.number += planets;
    list.candidates.push_back(std::move(star));
    list.remarks.push_back({{}, note, {}, {}});
  }
}

std::vector<Quantity> stated_by_both(const OpenList& stars, const OpenList& planets) {
  std::vector<Quantity> stated;
  for (const QuantityInfo& info : all_columns()) {
    const std::optional<Quantity> quantity = quantity_named(info.name);
    if (quantity && (stars.understanding.knows(*quantity) || planets.understanding.knows(*quantity)))
      stated.push_back(*quantity);
  }
  return stated;
}

}  // namespace

UnansweredList read_two_lists(const std::string& stars_path, const Arguments& arguments, const Console& console,
                              std::span<const std::string> written) {
  const std::string planets_path = *arguments.value("planets");
  refuse_one_input_for_both(stars_path, planets_path);
  const OpenList stars = open_list(stars_path, arguments, star_inputs());
  const OpenList planets = open_list(planets_path, arguments, planet_inputs(), "planet-columns");
  refuse_unusable(stated_quantities(stars.understanding), stars.reader->head().source);
  refuse_unusable(stated_quantities(planets.understanding), planets.reader->head().source);
  const KeptOfBoth kept = arguments.knows("keep")
                              ? kept_of_both(arguments, planets.reader->head(), stars.reader->head(), written)
                              : KeptOfBoth{};

  JoinedSides sides = read_sides(stars, planets, kept, arguments, console);
  refuse_lists_without_planets(sides.planets);
  make_stars(sides.stars.candidates);
  const Joiner joiner = join(sides, arguments.has("exact-names") ? NameMatching::exact : NameMatching::folded);
  UnansweredList list;
  list.stated = stated_by_both(stars, planets);
  list.kept = heads_of(kept.of_planets);
  list.planets = planets_path;
  list.joining = join_summary(sides, joiner);
  add_planets(sides, joiner, list);
  add_stars_without_planets(sides, joiner, list);
  return list;
}

}  // namespace hz::app
