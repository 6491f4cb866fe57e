#include "figure_stars.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <map>

namespace hz::app {
namespace {

constexpr double visible_eccentricity = 0.005;

plots::LimitRole role_of(ZoneEdge edge) {
  switch (edge) {
    case ZoneEdge::optimistic_inner: return plots::LimitRole::optimistic_inner;
    case ZoneEdge::conservative_inner: return plots::LimitRole::conservative_inner;
    case ZoneEdge::conservative_outer: return plots::LimitRole::conservative_outer;
    case ZoneEdge::optimistic_outer: return plots::LimitRole::optimistic_outer;
  }
  return plots::LimitRole::optimistic_inner;
}

std::vector<plots::FigureLimit> limits_of(const Answer& star) {
  std::vector<plots::FigureLimit> limits;
  for (const LimitAtStar& at : star.limits) {
    if (!at.distance) continue;
    for (const ZoneEdge edge : at.edges) limits.push_back({at.limit->title(), role_of(edge), *at.distance, at.held});
  }
  return limits;
}

/// "d" of "Lantern 27 d", and the whole name where it does not begin with the star's.
std::string letter_of(const ListRow& row) {
  const std::string& planet = row.planet.name;
  const std::string& star = row.star.name;
  if (star.empty() || planet.size() <= star.size() + 1 || planet.compare(0, star.size(), star) != 0) return planet;
  const std::size_t start = planet.find_first_not_of(' ', star.size());
  return start == std::string::npos ? planet : planet.substr(start);
}

/// Where the planet stands: its own semi-major axis, else where its star gives its insolation.
std::optional<Measured> place_of(const PlanetAnswer& planet, const Answer& star) {
  if (planet.semi_major_axis) return planet.semi_major_axis->measured;
  if (!star.star.luminosity) return std::nullopt;
  const Measured& insolation = planet.insolation.measured;
  const double distance = std::sqrt(star.star.luminosity->measured.value / insolation.value);
  const auto half = [&](const std::optional<double>& width) {
    return distance * width.value_or(0) / insolation.value / 2;
  };
  return Measured{distance, half(insolation.plus), half(insolation.minus), LimitMark::none, false};
}

plots::FigurePlanet planet_of(const Candidate& candidate, const Measured& place) {
  const PlanetAnswer& answer = *candidate.answer.planet;
  plots::FigurePlanet planet;
  planet.name = candidate.row.planet.name;
  planet.label = letter_of(candidate.row);
  planet.semi_major_axis = place;
  const double e = candidate.answer.input->eccentricity.central();
  if (e > visible_eccentricity) planet.span = plots::OrbitSpan{place.value * (1 - e), place.value * (1 + e)};
  const std::optional<Measured>& radius = candidate.row.planet.planet_radius.stated;
  if (radius && radius->value > 0) {
    planet.radius = radius->value;
    planet.radius_is_limit = radius->limit != LimitMark::none;
  }
  planet.p_conservative = answer.probabilities.conservative;
  planet.p_optimistic = answer.probabilities.optimistic;
  return planet;
}

std::string name_of(const Candidate& candidate) {
  return candidate.row.planet.name.empty() ? candidate.row.star.name : candidate.row.planet.name;
}

/// Rows without a star's name stand for a star each.
std::string star_key(const Candidate& candidate) {
  const std::string folded = folded_name(candidate.row.star.name);
  return folded.empty() ? fmt::format("\n{}", candidate.row.number) : folded;
}

/// The star of some rows: from the first of them that says enough of it.
struct StarOfRows {
  Answer answer;
  plots::FigureStar figure;
};
std::optional<StarOfRows> star_of(const std::vector<const Candidate*>& rows, const Settings& settings) {
  for (const Candidate* candidate : rows) {
    Answer star = answer_star(candidate->row, settings);
    if (star.status != Status::answered || !star.star.luminosity || !star.star.teff) continue;
    plots::FigureStar figure;
    figure.name = candidate->row.star.name;
    figure.teff = star.star.teff->measured;
    figure.luminosity = star.star.luminosity->measured;
    if (star.star.stellar_mass) figure.stellar_mass = star.star.stellar_mass->measured.value;
    figure.limits = limits_of(star);
    return StarOfRows{std::move(star), std::move(figure)};
  }
  return std::nullopt;
}

void add_planets(const std::vector<const Candidate*>& rows, StarOfRows& star, std::vector<std::string>& left_out) {
  for (const Candidate* candidate : rows) {
    if (!is_planet(candidate->row)) continue;
    if (!candidate->in_the_running()) {
      left_out.push_back(fmt::format("{}: {}", name_of(*candidate), candidate->answer.reason));
      continue;
    }
    const std::optional<Measured> place = place_of(*candidate->answer.planet, star.answer);
    if (place) star.figure.planets.push_back(planet_of(*candidate, *place));
  }
}

}  // namespace

FigureStars figure_stars(const std::vector<Candidate>& candidates, const Settings& settings) {
  std::map<std::string, std::vector<const Candidate*>> rows_of;
  std::vector<std::string> order;
  for (const Candidate& candidate : candidates) {
    const std::string key = star_key(candidate);
    if (rows_of[key].empty()) order.push_back(key);
    rows_of[key].push_back(&candidate);
  }
  FigureStars result;
  for (const std::string& key : order) {
    const std::vector<const Candidate*>& rows = rows_of[key];
    std::optional<StarOfRows> star = star_of(rows, settings);
    if (!star) {
      const std::string& found = rows.front()->answer.reason;  // it knows more than the row: why no star was joined
      const std::string reason = found.empty() ? answer_star(rows.front()->row, settings).reason : found;
      result.left_out.push_back(
          fmt::format("{}: {}", name_of(*rows.front()), reason.empty() ? "no effective temperature" : reason));
      continue;
    }
    add_planets(rows, *star, result.left_out);
    result.stars.push_back(std::move(star->figure));
  }
  return result;
}

}  // namespace hz::app
