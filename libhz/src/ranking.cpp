#include "hz/ranking.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>
#include <map>
#include <tuple>

#include "hz/flags.hpp"

namespace hz {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();

bool has_flag(const Answer& answer, std::string_view start) {
  return std::any_of(answer.flags.begin(), answer.flags.end(),
                     [&](const std::string& word) { return word.compare(0, start.size(), start) == 0; });
}

bool is_measured(const Field& field) {
  return field.stated && field.stated->limit == LimitMark::none &&
         (field.stated->minus.value_or(0) > 0 || field.stated->plus.value_or(0) > 0);
}

long measured_inputs(const ListRow& row) {
  const StarRecord& star = row.star;
  const PlanetRecord& planet = row.planet;
  const std::array<const Field*, 13> fields = {
      &star.teff,           &star.luminosity,       &star.log_luminosity,    &star.stellar_radius,
      &star.stellar_mass,   &planet.orbital_period, &planet.semi_major_axis, &planet.scaled_semi_major_axis,
      &planet.eccentricity, &planet.insolation,     &planet.planet_radius,   &planet.planet_mass,
      &planet.min_mass};
  return std::count_if(fields.begin(), fields.end(), [](const Field* field) { return is_measured(*field); });
}

/// Infinite where an error of the insolation's inputs had to be assumed.
double insolation_uncertainty(const Candidate& candidate) {
  static constexpr std::array inputs = {
      Quantity::teff,         Quantity::luminosity,      Quantity::log_luminosity,         Quantity::stellar_radius,
      Quantity::stellar_mass, Quantity::semi_major_axis, Quantity::scaled_semi_major_axis, Quantity::insolation};
  for (const Quantity quantity : inputs) {
    if (has_flag(candidate.answer, std::string(flag::assumed_error) + std::string(name(quantity)))) return infinity;
  }
  const Measured& insolation = candidate.answer.planet->insolation.measured;
  const double width = (insolation.minus.value_or(0) + insolation.plus.value_or(0)) / 2;
  return width > 0 ? width / insolation.value : infinity;
}

/// Better rows sort first.
auto solution_key(const Candidate& candidate) {
  return std::tuple(!candidate.row.planet.adopted.value_or(false), !candidate.preferred,
                    -measured_inputs(candidate.row), insolation_uncertainty(candidate), candidate.row.number);
}

std::string_view why_it_wins(const Candidate& winner, const Candidate& other) {
  if (winner.row.planet.adopted.value_or(false) && !other.row.planet.adopted.value_or(false)) return "adopted";
  if (winner.preferred && !other.preferred) return "preferred";
  if (measured_inputs(winner.row) > measured_inputs(other.row)) return "more inputs measured";
  if (insolation_uncertainty(winner) < insolation_uncertainty(other)) return "smaller error of insolation";
  return "it stands first";
}

/// A bare letter names a planet only beside its star.
std::string planet_key(const ListRow& row) {
  constexpr std::size_t longest_letter = 2;
  const std::string planet = folded_name(row.planet.name);
  return planet.size() > longest_letter ? planet : folded_name(row.star.name) + '\n' + planet;
}

double shown_probability(const Probabilities& p) { return p.conservative ? *p.conservative : p.optimistic.value_or(0); }

void add_note(Answer& answer, const std::string& words) {
  if (!answer.note.empty()) answer.note += "; ";
  answer.note += words;
}

void keep_one(std::vector<Candidate*> rows) {
  std::sort(rows.begin(), rows.end(),
            [](const Candidate* a, const Candidate* b) { return solution_key(*a) < solution_key(*b); });
  Candidate& winner = *rows.front();
  double least = 1;
  double greatest = 0;
  for (Candidate* candidate : rows) {
    const double p = shown_probability(candidate->answer.planet->probabilities);
    least = std::min(least, p);
    greatest = std::max(greatest, p);
    if (candidate == &winner) continue;
    candidate->answer.status = Status::set_aside;
    candidate->answer.reason_kind = "another row of this planet is used";
    candidate->answer.reason = fmt::format("another row of this planet is used: {} ({})", place_in_file(winner.row),
                                           why_it_wins(winner, *candidate));
  }
  add_note(winner.answer, fmt::format("{} rows of this planet, P from {:.2f} to {:.2f}", rows.size(), least, greatest));
}

/// What makes two rows equal but for their errors.
auto central_key(const Candidate& candidate) {
  const auto rounded = [](double x) { return std::round(std::log(x) * 1e8); };
  const PlanetAnswer& planet = *candidate.answer.planet;
  return std::tuple(rounded(planet.insolation.measured.value),
                    candidate.answer.star.teff ? rounded(candidate.answer.star.teff->measured.value) : 0.0,
                    rounded(planet.planet_mass.measured.value));
}

long merit_in_hundredths(const Candidate& candidate) { return std::lround(candidate.answer.planet->merit * 100); }

double distance_from_middle(const Candidate& candidate) {
  const std::optional<double>& position = candidate.answer.planet->zone_position;
  return position ? std::abs(*position - 0.5) : infinity;
}

auto order_key(const Candidate& candidate) {
  return std::tuple(has_flag(candidate.answer, flag::beyond_planet_mass), -merit_in_hundredths(candidate),
                    measured_inputs(candidate.row) == 0, distance_from_middle(candidate), candidate.row.planet.name,
                    candidate.row.number);
}

}  // namespace

std::string folded_name(std::string_view name) {
  std::string folded;
  for (const char c : name) {
    if (c == ' ' || c == '\t') continue;
    folded += c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
  }
  return folded;
}

std::string place_in_file(const ListRow& row) {
  return row.line > 0 ? fmt::format("line {}", row.line) : fmt::format("row {}", row.number);
}

void keep_one_row_a_planet(std::vector<Candidate>& candidates) {
  std::map<std::string, std::vector<Candidate*>> rows_of;
  for (Candidate& candidate : candidates) {
    if (candidate.in_the_running() && !candidate.row.planet.name.empty())
      rows_of[planet_key(candidate.row)].push_back(&candidate);
  }
  for (const auto& [key, rows] : rows_of) {
    if (rows.size() > 1) keep_one(rows);
  }
}

void humble_rows_without_errors(std::vector<Candidate>& candidates) {
  std::map<decltype(central_key(candidates.front())), const Candidate*>
      least;  // the least merit among equal rows with errors
  for (const Candidate& candidate : candidates) {
    if (!candidate.in_the_running() || measured_inputs(candidate.row) == 0) continue;
    const Candidate*& known = least[central_key(candidate)];
    if (known == nullptr || candidate.answer.planet->merit < known->answer.planet->merit) known = &candidate;
  }
  for (Candidate& candidate : candidates) {
    if (!candidate.in_the_running() || measured_inputs(candidate.row) != 0) continue;
    const auto equal = least.find(central_key(candidate));
    if (equal == least.end() || equal->second->answer.planet->merit >= candidate.answer.planet->merit) continue;
    candidate.answer.planet->merit = equal->second->answer.planet->merit;
    add_note(candidate.answer,
             fmt::format("merit cut to that of an equal row with errors ({})", place_in_file(equal->second->row)));
  }
}

std::vector<Place> places_of(const std::vector<Candidate>& candidates) {
  std::vector<Place> places;
  for (std::size_t i = 0; i < candidates.size(); ++i) {
    if (candidates[i].in_the_running())
      places.push_back({i, 0, false, has_flag(candidates[i].answer, flag::beyond_planet_mass)});
  }
  std::sort(places.begin(), places.end(), [&](const Place& a, const Place& b) {
    return order_key(candidates[a.candidate]) < order_key(candidates[b.candidate]);
  });
  const auto equal = [&](const Place& a, const Place& b) {
    return a.beyond_planet_mass == b.beyond_planet_mass &&
           merit_in_hundredths(candidates[a.candidate]) == merit_in_hundredths(candidates[b.candidate]);
  };
  for (std::size_t i = 0; i < places.size(); ++i) {
    places[i].rank = i > 0 && equal(places[i - 1], places[i]) ? places[i - 1].rank : i + 1;
    if (places[i].rank <= i) places[i].shared = places[i - 1].shared = true;
  }
  return places;
}

}  // namespace hz
