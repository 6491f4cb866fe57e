#include "join_words.hpp"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <array>

#include "numbers.hpp"

namespace hz::app {
namespace {

/// "is called `Lantern 4`" of one star, "are called `Lantern 4`" of several.
std::string fitting(const JoinedSides& sides, std::size_t way_index, std::size_t planet, bool several) {
  const JoinWay& way = sides.ways[way_index];
  if (way.kind == JoinWay::Kind::sky)
    return several ? fmt::format("lie about as near, within {}", way.typed) : "lies within " + way.typed;
  const std::string name = fmt::format("{}", fmt::join(sides.planets.names[way_index][planet], "; "));
  if (way.kind == JoinWay::Kind::star_names) return fmt::format("{} called `{}`", several ? "are" : "is", name);
  return fmt::format("{} `{}` under {}", several ? "have" : "has", name, way.star_column);
}

bool has_something_to_find(const JoinedSides& sides, std::size_t way, std::size_t planet) {
  if (sides.ways[way].kind == JoinWay::Kind::sky) return sides.planets.positions[planet].has_value();
  return !sides.planets.names[way][planet].empty();
}

bool is_unreadable(const Result<SkyPosition>& position) {
  return !position && position.error().code != ProblemCode::missing;
}

std::string what_is_lacking(const JoinedSides& sides, std::size_t way_index, std::size_t planet) {
  const JoinWay& way = sides.ways[way_index];
  if (way.kind == JoinWay::Kind::star_names) return "no name of a star";
  if (way.kind == JoinWay::Kind::columns) return "no " + way.planet_column;
  const Result<SkyPosition>& position = sides.planets.positions[planet];
  return is_unreadable(position) ? fmt::format("no position ({})", position.error().what) : "no position";
}

std::string none_fits(const JoinedSides& sides, std::size_t planet) {
  std::vector<std::string> tried;
  std::vector<std::string> lacking;
  for (std::size_t way = 0; way < sides.ways.size(); ++way) {
    if (has_something_to_find(sides, way, planet)) {
      tried.push_back(fitting(sides, way, planet, false));
    } else {
      lacking.push_back(what_is_lacking(sides, way, planet));
    }
  }
  if (tried.empty()) return fmt::format("the row has {} to find its star by", fmt::join(lacking, ", "));
  return fmt::format("no star of {} {}", sides.stars.file, fmt::join(tried, " or "));
}

/// "lines 4 and 9"; "rows 3 and 8" where lines mean nothing.
std::string places_in_file(const JoinSide& side, const std::vector<std::size_t>& rows) {
  const bool lines = side.candidates[rows.front()].row.line > 0;
  std::string text = lines ? "lines" : "rows";
  for (std::size_t i = 0; i < rows.size(); ++i) {
    const ListRow& row = side.candidates[rows[i]].row;
    text += fmt::format("{} {}", i == 0 ? "" : i + 1 == rows.size() ? " and" : ",", lines ? row.line : row.number);
  }
  return text;
}

std::string several_fit(const JoinedSides& sides, std::size_t planet, const StarFit& fit) {
  return fmt::format("{} stars of {} {}: {}", fit.stars.size() > 2 ? "three or more" : "two", sides.stars.file,
                     fitting(sides, fit.way, planet, true), places_in_file(sides.stars, fit.stars));
}

/// Rows by what became of them; those that could not be read apart.
class Counts {
public:
  void add(const ListRow& row, Standing standing) {
    ++(row.problem ? unreadable_ : by_standing_[static_cast<std::size_t>(standing)]);
  }

  [[nodiscard]] std::string line(const JoinSide& side) const {
    constexpr std::array<std::string_view, 3> words{"unmatched", "matched", "ambiguous"};
    const auto part = [&](Standing standing) {
      const auto index = static_cast<std::size_t>(standing);
      return fmt::format("{} {}", count_text(by_standing_[index]), words[index]);
    };
    std::string text = fmt::format("{}: {}, {}, {}, {}", side.file, counted(side.candidates.size(), "row"),
                                   part(Standing::matched), part(Standing::unmatched), part(Standing::ambiguous));
    if (unreadable_ > 0) text += fmt::format(", {} unreadable", count_text(unreadable_));
    return text;
  }

private:
  std::array<std::size_t, 3> by_standing_{};
  std::size_t unreadable_ = 0;
};

}  // namespace

Remark why_no_star(const JoinedSides& sides, std::size_t planet, const StarFit& fit) {
  Remark remark;
  if (fit.standing == Standing::matched || sides.planets.candidates[planet].row.problem) return remark;
  const bool several = fit.standing == Standing::ambiguous;
  remark.no_star = several ? several_fit(sides, planet, fit) : none_fits(sides, planet);
  remark.no_star_kind = several ? "several stars fit" : "no star found";
  return remark;
}

std::string star_note(const JoinedSides& sides, std::size_t star, Standing standing) {
  if (standing == Standing::ambiguous)
    return fmt::format("a planet of {} fits this star and others", sides.planets.file);
  const bool told = !sides.stars.positions.empty() && !sides.stars.candidates[star].row.problem;
  return told && is_unreadable(sides.stars.positions[star]) ? sides.stars.positions[star].error().what : "";
}

std::string match_note(const JoinedSides& sides, std::size_t planet, const StarFit& fit) {
  const std::string& name = sides.planets.candidates[planet].row.star.name;
  const std::string& star = sides.stars.candidates[fit.stars.front()].row.star.name;
  std::string note;
  if (fit.distance) note = fmt::format("star found {} arcsec away", short_number(rounded(*fit.distance, 2)));
  if (name.empty() || folded_name(name) == folded_name(star)) return note;
  return fmt::format("{}{}the list of planets calls its star `{}`", note, note.empty() ? "" : "; ", name);
}

std::vector<std::string> join_summary(const JoinedSides& sides, const Joiner& joiner) {
  Counts planets;
  Counts stars;
  for (std::size_t i = 0; i < joiner.planets().size(); ++i)
    planets.add(sides.planets.candidates[i].row, joiner.planets()[i].standing);
  for (std::size_t i = 0; i < joiner.stars().size(); ++i) stars.add(sides.stars.candidates[i].row, joiner.stars()[i]);
  const auto alone = static_cast<std::size_t>(std::count_if(
      joiner.stars().begin(), joiner.stars().end(), [](Standing standing) { return standing != Standing::matched; }));
  const std::size_t of_planets = sides.planets.candidates.size();
  return {planets.line(sides.planets), stars.line(sides.stars),
          fmt::format("joined into {}: {} of {}, {} without a planet", counted(of_planets + alone, "row"),
                      count_text(of_planets), sides.planets.file, counted(alone, "star"))};
}

}  // namespace hz::app
