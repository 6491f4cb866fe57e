#include "check_page.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "aligned_table.hpp"
#include "bounds_page.hpp"
#include "derivation.hpp"
#include "flag_text.hpp"
#include "numbers.hpp"
#include "rank_page.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

std::string zone_verdict(const std::optional<Verdict>& verdict, const std::optional<double>& p, const char* zone) {
  if (!verdict) return "";
  return fmt::format("{} {}the {} zone (P {})", word(*verdict), *verdict == Verdict::open ? "for " : "", zone,
                     probability_text(p));
}

std::string joined(const std::vector<std::string>& parts, const char* between) {
  std::string text;
  for (const std::string& part : parts) {
    if (!part.empty()) text += (text.empty() ? "" : between) + part;
  }
  return text;
}

/// "K13ERR and RK18", for the alternatives that change a zone's verdict.
std::string change_phrase(const CheckReport& report) {
  const auto changes = [&](bool Alternative::*zone) {
    return std::any_of(report.alternatives.begin(), report.alternatives.end(),
                       [&](const Alternative& a) { return a.*zone; });
  };
  const bool conservative = changes(&Alternative::changes_conservative);
  const bool optimistic = changes(&Alternative::changes_optimistic);
  if (!conservative && !optimistic) return "";
  const char* which = conservative && optimistic ? "both verdicts would"
                      : conservative             ? "the conservative verdict would"
                                                 : "the optimistic verdict would";
  return fmt::format("; {} change under other plausible choices", which);
}

std::string first_sentence(const CheckReport& report) {
  const PlanetAnswer& planet = *report.answer.planet;
  const std::string& name = report.row.planet.name;
  std::string verdicts = joined({zone_verdict(planet.conservative, planet.probabilities.conservative, "conservative"),
                                 zone_verdict(planet.optimistic, planet.probabilities.optimistic, "optimistic")},
                                ", ");
  if (planet.side && (planet.conservative ? *planet.conservative : *planet.optimistic) != Verdict::inside) {
    verdicts += fmt::format("; what lies outside is on the {} side", word(*planet.side));
  }
  return fmt::format("{}: {}{}.", name.empty() ? "This planet" : printable(name), verdicts, change_phrase(report));
}

std::string change_line(const CheckReport& report) {
  std::vector<std::string> parts;
  for (const Alternative& each : report.alternatives) {
    if (!each.changes()) continue;
    std::vector<std::string> zones;
    if (each.changes_conservative) zones.push_back(fmt::format("{} (conservative)", word(*each.conservative)));
    if (each.changes_optimistic) zones.push_back(fmt::format("{} (optimistic)", word(*each.optimistic)));
    parts.push_back(fmt::format("{}: {}", each.what, joined(zones, ", ")));
  }
  if (parts.empty()) {
    std::vector<std::string> tried;
    for (const Alternative& each : report.alternatives) tried.push_back(each.what);
    return tried.empty() ? "" : "No verdict changes under " + joined(tried, ", ") + ".";
  }
  return "Would change: " + joined(parts, "; ") + ".";
}

std::string signed_number(double x, int decimals) { return (x > 0 ? "+" : "") + fixed(x, decimals); }

AlignedTable limits_table(const CheckReport& report) {
  AlignedTable table({{"limit"},
                      {"S (S⊕)", Align::right},
                      {"distance (au)", Align::right},
                      {"from the planet (au)", Align::right},
                      {"in half-widths of ln S", Align::right},
                      {"the planet is"},
                      {"held"}});
  int decimals = 0;
  for (const LimitLine& line : report.limits) {
    if (line.limit_distance) decimals = std::max(decimals, decimals_for(*line.limit_distance, 3));
  }
  const double insolation = report.answer.planet->insolation.measured.value;
  for (const LimitLine& line : report.limits) {
    table.add({line.limit->title(), fixed(line.insolation, 3),
               line.limit_distance ? fixed(*line.limit_distance, decimals) : "",
               line.margin_distance ? signed_number(*line.margin_distance, decimals) : "",
               line.margin_widths ? signed_number(*line.margin_widths, 1) : "",
               insolation >= line.insolation ? "hotter" : "colder", line.held ? "held" : ""});
  }
  return table;
}

std::string quantity_text(const char* words, const std::optional<Derived>& derived, const char* unit) {
  if (!derived) return "";
  const std::string route = derived->route == "stated" ? "" : fmt::format(" (from {})", route_words(derived->route));
  return fmt::format("{} {}{}{}", words, measured_text(derived->measured), unit, route);
}

std::string planet_line(const CheckReport& report) {
  const PlanetAnswer& planet = *report.answer.planet;
  return joined(
             {quantity_text("Insolation", planet.insolation, " S⊕"),
              quantity_text("semi-major axis", planet.semi_major_axis, " au"),
              fmt::format("equilibrium temperature {:.0f} K for a Bond albedo of {:g}", planet.equilibrium_temperature,
                          report.settings.bond_albedo),
              planet.zone_position
                  ? fmt::format("zone position {} (0 inner, 1 outer limit)", fixed(*planet.zone_position, 2))
                  : "",
              planet.orbit_share ? fmt::format("{:.0f} % of its time between the {} limits", 100 * *planet.orbit_share,
                                               planet.optimistic ? "optimistic" : "conservative")
                                 : ""},
             ", ") +
         ".";
}

std::string star_line(const CheckReport& report) {
  const std::string values = stated_values(report.answer.star);
  const std::string& name = report.row.star.name;
  return values.empty() ? "" : fmt::format("{}: {}.", name.empty() ? "Star" : printable(name), values);
}

/// A measured value by its name; a relation's scatter, which no measurement betters, by its label.
std::string input_words(const VarianceShare& share) {
  if (share.scatter_of.empty()) return route_words(name(share.quantity));
  return "scatter of " + relation(share.scatter_of).label;
}

/// Whether the probability itself leaves the conservative zone unsettled, companions apart.
bool is_unsettled(const CheckReport& report) {
  const std::optional<double>& p = report.answer.planet->probabilities.conservative;
  if (!p) return false;
  const Verdict verdict = verdict_of(*p, report.settings.thresholds);
  return verdict != Verdict::inside && verdict != Verdict::outside;
}

std::string decides_line(const CheckReport& report) {
  if (report.shares.empty()) return "";
  std::vector<std::string> parts;
  for (const VarianceShare& each : report.shares) {
    if (each.share >= 0.01) parts.push_back(fmt::format("{} {:.0f} %", input_words(each), 100 * each.share));
  }
  std::string text = "Decided by (share of the variance of zone position): " + joined(parts, ", ");
  if (report.settling_factor) {
    text += fmt::format("; an error of {} {:.2g} times as large would make the verdict firm",
                        input_words(*report.leading), *report.settling_factor);
  } else if (report.leading && is_unsettled(report)) {
    text += fmt::format("; a better {} alone would not settle it", input_words(*report.leading));
  }
  return text + ".";
}

std::string exact_line(const CheckReport& report) {
  std::string exact = exact_values(report.row);
  return exact.empty() ? "" : "Taken as exact, being typed without half-widths: " + exact + ".";
}

std::string mass_line(const CheckReport& report) {
  const Derived& mass = report.answer.planet->planet_mass;
  return fmt::format("Planet mass {} M⊕ ({}).", measured_text(mass.measured), route_words(mass.route));
}

std::string source_line(const CheckReport& report) {
  const LimitSet& set = *report.settings.limits;
  return basis_sentence(report.settings) + (set.doi.empty() ? "" : " (doi:" + set.doi + ")");
}

}  // namespace

std::string check_page(const CheckReport& report, const Console& console, std::size_t width) {
  const auto paragraph = [&](const std::string& text) { return text.empty() ? "" : wrapped(text, width) + "\n"; };
  std::string page = console.styled(wrapped(first_sentence(report), width), Style::strong) + "\n";
  page += paragraph(change_line(report)) + "\n" + limits_table(report).text(console) + "\n";
  page += paragraph(planet_line(report)) + paragraph(star_line(report)) +
          paragraph(derivation_sentence(report.answer.star)) + paragraph(decides_line(report));
  page += paragraph(mass_line(report)) + paragraph(exact_line(report));
  for (const std::string& flag : report.answer.flags) page += paragraph(flag_sentence(flag));
  page += paragraph(report.answer.note.empty() ? "" : "Note: " + report.answer.note + ".");
  page += paragraph(report.settings.limits->warning.empty() ? "" : "Warning: " + report.settings.limits->warning);
  return page + paragraph(source_line(report));
}

}  // namespace hz::app
