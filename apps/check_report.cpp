#include "check_report.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "hz/error.hpp"
#include "hz/flags.hpp"

namespace hz::app {
namespace {

bool has_flag(const Answer& answer, std::string_view word) {
  return std::find(answer.flags.begin(), answer.flags.end(), word) != answer.flags.end();
}

double central_mass(const PlacementInput& input) {
  return input.planet_mass_decadic ? std::pow(10, input.planet_mass.central()) : input.planet_mass.central();
}

LimitLine line_of(const LimitAtStar& at, const Answer& answer, const Settings& settings) {
  LimitLine line{at.limit, at.insolation, at.held, std::nullopt, std::nullopt, std::nullopt};
  if (at.distance) line.limit_distance = at.distance->value;
  const PlanetAnswer& planet = *answer.planet;
  const double ratio = std::log(planet.insolation.measured.value / at.insolation);
  if (planet.semi_major_axis) line.margin_distance = planet.semi_major_axis->measured.value * std::expm1(ratio / 2);
  const double width =
      log_margin_width(*answer.input, *at.limit, settings.beyond, ratio > 0 ? Towards::colder : Towards::hotter);
  if (width > 0) line.margin_widths = ratio / width;
  return line;
}

std::vector<LimitLine> limit_lines(const Answer& answer, const Settings& settings) {
  std::vector<LimitLine> lines;
  for (const LimitAtStar& at : answer.limits) lines.push_back(line_of(at, answer, settings));
  std::stable_sort(lines.begin(), lines.end(),
                   [](const auto& a, const auto& b) { return a.insolation > b.insolation; });
  return lines;
}

Alternative compared(std::string what, const Probabilities& p, const Answer& main,
                     const VerdictThresholds& thresholds) {
  Alternative alternative{std::move(what), std::nullopt, std::nullopt, false, false};
  if (p.conservative) alternative.conservative = verdict_of(*p.conservative, thresholds);
  if (p.optimistic) alternative.optimistic = verdict_of(*p.optimistic, thresholds);
  // What a close companion takes off a verdict it takes off both.
  const auto changes = [&](const std::optional<double>& here, const std::optional<Verdict>& there) {
    return here && there && verdict_of(*here, thresholds) != *there;
  };
  alternative.changes_conservative = changes(main.planet->probabilities.conservative, alternative.conservative);
  alternative.changes_optimistic = changes(main.planet->probabilities.optimistic, alternative.optimistic);
  return alternative;
}

/// Current published fits that bound the same zones over a range of stars.
bool is_comparable(const LimitSet& other, const LimitSet& chosen) {
  const auto ranges_over_stars = [](const LimitSet& set) {
    const std::optional<Range> range = set.teff_range();
    return range && range->high > range->low;
  };
  return other.key != chosen.key && other.status == "current" && ranges_over_stars(other) &&
         other.conservative.has_value() == chosen.conservative.has_value() &&
         other.optimistic.has_value() == chosen.optimistic.has_value();
}

void try_other_sets(const ListRow& row, const Choices& choices, CheckReport& report) {
  if (!choices.settings.limits->teff_range()) return;  // chosen temperatures, not fits
  for (const LimitSet& set : choices.catalog->sets()) {
    if (!is_comparable(set, *choices.settings.limits)) continue;
    Settings other = choices.settings;
    other.limits = &set;
    const Answer answered = answer(row, other);
    if (!answered.planet) continue;
    report.alternatives.push_back(
        compared("limit set " + set.key, answered.planet->probabilities, report.answer, other.thresholds));
  }
}

void try_other_asymmetry(const ListRow& row, const Choices& choices, CheckReport& report) {
  Settings other = choices.settings;
  const bool median = other.asymmetry == Asymmetry::median;
  other.asymmetry = median ? Asymmetry::mode : Asymmetry::median;
  const Answer answered = answer(row, other);
  if (!answered.planet) return;
  report.alternatives.push_back(compared(median ? "asymmetric values as modes" : "asymmetric values as medians",
                                         answered.planet->probabilities, report.answer, other.thresholds));
}

/// Masses (Earth) that the row leaves plausible beside the one that was used.
std::vector<double> plausible_masses(const Answer& answer, const Range& fitted) {
  const PlacementInput& input = *answer.input;
  if (has_flag(answer, flag::planet_mass_assumed)) return {fitted.low, fitted.high};
  constexpr double twice_the_minimum = 2;  // an inclination of 30 degrees; 87 per cent of random orbits lie above it
  if (has_flag(answer, flag::min_mass_used)) return {twice_the_minimum * central_mass(input)};
  if (!has_flag(answer, flag::mass_from_radius) || input.planet_mass.is_exact()) return {};
  const auto mass_at = [&](double u) {
    const double x = input.planet_mass.quantile(u);
    return input.planet_mass_decadic ? std::pow(10, x) : x;
  };
  return {mass_at(0.025), mass_at(0.975)};
}

void try_other_masses(const Choices& choices, CheckReport& report) {
  const std::optional<Range> fitted = choices.settings.limits->planet_mass_range();
  if (!fitted) return;
  for (const double mass : plausible_masses(report.answer, *fitted)) {
    PlacementInput input = *report.answer.input;
    input.planet_mass = Distribution::exact(mass);
    input.planet_mass_decadic = false;
    report.alternatives.push_back(compared(fmt::format("planet mass {:.2g} Earth masses", mass),
                                           place(input, *choices.settings.limits, choices.settings.beyond),
                                           report.answer, choices.settings.thresholds));
  }
}

}  // namespace

CheckReport make_report(const ListRow& row, const Choices& choices, Answer answered) {
  CheckReport report{row, choices.settings, std::move(answered), {}, {}, {}, std::nullopt, std::nullopt};
  if (!report.answer.planet) {
    const std::string who = row.planet.name.empty() ? "this planet" : row.planet.name;
    throw Error(Fault::input,
                fmt::format("no answer for {}: {}", who,
                            report.answer.reason.empty() ? "the row speaks of no planet" : report.answer.reason));
  }
  report.limits = limit_lines(report.answer, choices.settings);
  try_other_sets(row, choices, report);
  try_other_asymmetry(row, choices, report);
  try_other_masses(choices, report);
  report.shares = variance_shares(*report.answer.input, choices.settings);
  const auto measured = std::find_if(report.shares.begin(), report.shares.end(),
                                     [](const VarianceShare& share) { return share.scatter_of.empty(); });
  if (measured != report.shares.end()) {
    report.leading = *measured;
    report.settling_factor = settling_factor(*report.answer.input, *measured, choices.settings);
  }
  return report;
}

}  // namespace hz::app
