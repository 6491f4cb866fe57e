#include "rank_page.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <map>

#include "aligned_table.hpp"
#include "hz/flags.hpp"
#include "numbers.hpp"
#include "tally.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

struct ShortFlag {
  std::string_view start;
  std::string_view words;
};
constexpr ShortFlag short_words[] = {{flag::evolved, "evolved"},
                                     {flag::held, "held"},
                                     {flag::inconsistent, "inconsistent"},
                                     {flag::close_companion, "close companion"},
                                     {flag::companion, "companion"},
                                     {flag::distance_prior, "distance prior"},
                                     {flag::main_sequence_assumed, "main sequence"},
                                     {flag::extinction_ignored, "no extinction"},
                                     {flag::beyond_planet_mass, "beyond mass"},
                                     {flag::min_mass_used, "m sin i"},
                                     {flag::mass_from_radius, "mass from R"},
                                     {flag::planet_mass_assumed, "mass 1"},
                                     {flag::eccentricity_limit, "e limit"},
                                     {flag::circular_assumed, "circular"},
                                     {flag::limit_ignored, "limit ignored"},
                                     {flag::assumed_error, "errors assumed"},
                                     {flag::wide_error, "wide error"}};

std::string size_text(const Candidate& candidate) {
  const PlanetRecord& planet = candidate.row.planet;
  const auto shown = [](const Field& field) { return field.stated && field.stated->value > 0; };
  const auto marked = [](const Measured& m, std::string_view unit) {
    const char* mark = m.limit == LimitMark::upper ? "< " : m.limit == LimitMark::lower ? "> " : "";
    return fmt::format("{}{:.3g} {}", mark, m.value, unit);
  };
  if (shown(planet.planet_radius)) return marked(*planet.planet_radius.stated, "R⊕");
  if (shown(planet.planet_mass)) return marked(*planet.planet_mass.stated, "M⊕");
  if (shown(planet.min_mass)) return marked(*planet.min_mass.stated, "M⊕ sin i");
  return "";
}

/// The verdict for the conservative zone, and the optimistic zone's where it says something else.
std::string verdict_text(const PlanetAnswer& planet) {
  std::string text(planet.conservative ? word(*planet.conservative) : word(*planet.optimistic));
  const bool firm = planet.conservative == Verdict::inside;
  if (planet.side && !firm) text += fmt::format(" ({})", word(*planet.side));
  if (planet.conservative && planet.optimistic && *planet.conservative != *planet.optimistic) {
    text += fmt::format("; {}", word(*planet.optimistic));
  }
  return text;
}

std::string place_text(const Place& place) { return fmt::format("{}{}", place.rank, place.shared ? "=" : ""); }

std::vector<std::string> cells_of(const Candidate& candidate, const Place& place) {
  const PlanetAnswer& planet = *candidate.answer.planet;
  const std::optional<Derived>& teff = candidate.answer.star.teff;
  const std::string& name = candidate.row.planet.name.empty() ? candidate.row.star.name : candidate.row.planet.name;
  return {place_text(place),
          printable(name),
          teff ? fmt::format("{:.0f}", teff->measured.value) : "",
          fmt::format("{:.3g}", planet.insolation.measured.value),
          size_text(candidate),
          probability_text(planet.probabilities.conservative),
          probability_text(planet.probabilities.optimistic),
          verdict_text(planet),
          short_flags(candidate.answer.flags)};
}

AlignedTable empty_table() {
  return AlignedTable({{"place", Align::right},
                       {"planet"},
                       {"Teff (K)", Align::right},
                       {"S (S⊕)", Align::right},
                       {"size", Align::right},
                       {"P cons.", Align::right},
                       {"P opt.", Align::right},
                       {"verdict: conservative; optimistic"},
                       {"flags"}});
}

std::string verdict_counts(const std::vector<Candidate>& candidates, const std::vector<Place>& places,
                           bool conservative) {
  std::map<Verdict, std::size_t> counts;
  for (const Place& place : places) {
    const PlanetAnswer& planet = *candidates[place.candidate].answer.planet;
    const std::optional<Verdict> verdict = conservative ? planet.conservative : planet.optimistic;
    if (verdict) ++counts[*verdict];
  }
  std::string text;
  for (const auto& [verdict, count] : counts) {
    text += fmt::format("{}{} {}", text.empty() ? "" : ", ", word(verdict), count_text(count));
  }
  return text;
}

}  // namespace

std::string short_flags(const std::vector<std::string>& flags) {
  std::string text;
  for (const ShortFlag& each : short_words) {
    const auto count = std::count_if(flags.begin(), flags.end(), [&](const std::string& word) {
      return word.compare(0, each.start.size(), each.start) == 0;
    });
    if (count == 0) continue;
    text += fmt::format("{}{}", text.empty() ? "" : ", ", each.words);
    if (count > 1) text += fmt::format(" ({})", count);
  }
  return text;
}

std::string ranking_table(const std::vector<Candidate>& candidates, const std::vector<Place>& places, std::size_t top,
                          const Settings& settings, const Console& console) {
  const Range masses = settings.limits->planet_mass_range().value_or(Range{0.1, 5});
  AlignedTable within = empty_table();
  AlignedTable beyond = empty_table();
  for (std::size_t i = 0; i < std::min(top, places.size()); ++i) {
    const Candidate& candidate = candidates[places[i].candidate];
    const bool water = candidate.answer.planet->merit >= 0.5;
    (places[i].beyond_planet_mass ? beyond : within)
        .add(cells_of(candidate, places[i]), water ? Style::water : Style::plain);
  }
  std::string text;
  if (!within.empty()) text += within.text(console);
  if (!beyond.empty()) {
    text += fmt::format("{}Beyond the fits' planet masses ({:g}-{:g} Earth masses):\n", within.empty() ? "" : "\n",
                        masses.low, masses.high);
    text += beyond.text(console);
  }
  return text;
}

std::string basis_sentence(const Settings& settings) {
  const bool median = settings.asymmetry == Asymmetry::median;
  const std::string errors =
      settings.assumed_errors.empty() ? "missing errors taken as none" : "missing errors assumed and flagged";
  return fmt::format(
      "Limits: {}, {}. Asymmetric values read as {}; {}. A zone is a screening aid, not proof of habitability.",
      settings.limits->key, settings.limits->citation, median ? "medians" : "modes", errors);
}

std::vector<std::string> ranking_summary(const std::vector<Candidate>& candidates, const std::vector<Place>& places,
                                         const Settings& settings) {
  Tally tally;
  std::size_t cut = 0;
  for (const Candidate& candidate : candidates) {
    if (candidate.cut_reason.empty()) {
      tally.count(candidate.answer);
    } else {
      ++cut;
    }
  }
  std::vector<std::string> lines = {fmt::format("read {}: {} answered, {} cut by --require, {} set aside",
                                                counted(candidates.size(), "row"), count_text(tally.answered()),
                                                count_text(cut), count_text(tally.set_aside()))};
  for (std::string& line : tally.lines()) {
    if (&line != &lines.front() && line.compare(0, 5, "read ") != 0) lines.push_back(std::move(line));
  }
  if (places.empty()) return lines;
  if (settings.limits->conservative) lines.push_back("conservative zone: " + verdict_counts(candidates, places, true));
  if (settings.limits->optimistic) lines.push_back("optimistic zone: " + verdict_counts(candidates, places, false));
  const auto beyond =
      std::count_if(places.begin(), places.end(), [](const Place& place) { return place.beyond_planet_mass; });
  lines.push_back(fmt::format("planets within the fits' planet masses: {}, beyond: {}",
                              count_text(places.size() - static_cast<std::size_t>(beyond)),
                              count_text(static_cast<std::size_t>(beyond))));
  return lines;
}

}  // namespace hz::app
