#include "bounds_page.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "aligned_table.hpp"
#include "hz/require.hpp"
#include "numbers.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

const LimitAtStar* at_star(const Answer& answer, const FluxLimit& limit) {
  const auto found = std::find_if(answer.limits.begin(), answer.limits.end(),
                                  [&](const LimitAtStar& each) { return each.limit == &limit; });
  return found == answer.limits.end() ? nullptr : &*found;
}

std::string role_in(const Zone& zone, const LimitSet& set, const FluxLimit& limit, const char* name) {
  if (&limit == &set.limits[zone.inner]) return fmt::format("{}, inner", name);
  if (&limit == &set.limits[zone.outer]) return fmt::format("{}, outer", name);
  return "";
}

/// "conservative, inner"; empty for a limit that bounds no zone.
std::string role(const LimitSet& set, const FluxLimit& limit) {
  std::string result = set.conservative ? role_in(*set.conservative, set, limit, "conservative") : "";
  const std::string wider = set.optimistic ? role_in(*set.optimistic, set, limit, "optimistic") : "";
  return result + (result.empty() || wider.empty() ? "" : "; ") + wider;
}

/// Decimals that suit every number of a column.
template <class Number>
int common_decimals(const Answer& answer, std::optional<Number> LimitAtStar::*value) {
  int decimals = 0;
  for (const LimitAtStar& each : answer.limits) {
    if (each.*value) decimals = std::max(decimals, decimals_for(*(each.*value), 3));
  }
  return decimals;
}

std::string cell(const std::optional<double>& value, int decimals) { return value ? fixed(*value, decimals) : ""; }

AlignedTable limit_table(const Answer& answer, const LimitSet& set) {
  AlignedTable table({{"limit"},
                      {"distance (au)", Align::right},
                      {"insolation", Align::right},
                      {"period (d)", Align::right},
                      {"on the sky (mas)", Align::right},
                      {"bounds the zone"},
                      {"held"}});
  const int distance = common_decimals(answer, &LimitAtStar::distance);
  const int period = common_decimals(answer, &LimitAtStar::period);
  const int angle = common_decimals(answer, &LimitAtStar::angular_separation);
  std::vector<LimitAtStar> limits = answer.limits;
  std::stable_sort(limits.begin(), limits.end(),
                   [](const auto& a, const auto& b) { return a.insolation > b.insolation; });
  for (const LimitAtStar& each : limits) {
    const std::string bounds = role(set, *each.limit);
    table.add(
        {each.limit->title(), each.distance ? measured_text(*each.distance, distance) : "", fixed(each.insolation, 3),
         cell(each.period, period), cell(each.angular_separation, angle), bounds, each.held ? "held" : ""},
        bounds.empty() ? Style::faint : Style::plain);
  }
  return table;
}

std::string zone_phrase(const Answer& answer, const LimitSet& set, const std::optional<Zone>& zone, const char* name) {
  if (!zone) return "";
  const LimitAtStar* const inner = at_star(answer, set.limits[zone->inner]);
  const LimitAtStar* const outer = at_star(answer, set.limits[zone->outer]);
  if (inner == nullptr || outer == nullptr || !inner->distance || !outer->distance) return "";
  const int decimals = std::max(decimals_for(inner->distance->value, 3), decimals_for(outer->distance->value, 3));
  return fmt::format("{} to {} au ({} zone)", fixed(inner->distance->value, decimals),
                     fixed(outer->distance->value, decimals), name);
}

std::string first_sentence(const Answer& answer, const LimitSet& set) {
  const std::string narrow = zone_phrase(answer, set, set.conservative, "conservative");
  const std::string wide = zone_phrase(answer, set, set.optimistic, "optimistic");
  return fmt::format("Liquid water from {}{}{}.", narrow, narrow.empty() || wide.empty() ? "" : ", from ", wide);
}

void add_value(std::string& text, const char* name, const std::optional<Derived>& derived, const char* unit) {
  if (!derived) return;
  const std::string route = derived->route == "stated" ? "" : " (" + derived->route + ")";
  text += fmt::format("{}{} {} {}{}", text.empty() ? "" : ", ", name, measured_text(derived->measured), unit, route);
}

std::string star_line(const ListRow& row, const Answer& answer) {
  std::string values;
  add_value(values, "Teff", answer.star.teff, "K");
  add_value(values, "L", answer.star.luminosity, "Lsun");
  add_value(values, "mass", answer.star.stellar_mass, "Msun");
  add_value(values, "distance", answer.star.distance, "pc");
  const std::string name = row.star.name.empty() ? "Star" : printable(row.star.name);
  return name + ": " + values;
}

std::string flag_list(const Answer& answer) {
  std::string result;
  for (const std::string& flag : answer.flags) result += (result.empty() ? "" : ", ") + flag;
  return result;
}

std::string held_sentence(const Answer& answer, const LimitSet& set) {
  const bool held = std::any_of(answer.limits.begin(), answer.limits.end(), [](const auto& each) { return each.held; });
  const std::optional<Range> range = set.teff_range();
  if (!held || !range) return "";
  return fmt::format(
      "Held: this Teff is outside the fitted {}\u2013{} K, so limits are those at the end of that range.",
      short_number(range->low), short_number(range->high));
}

std::string source_sentence(const LimitSet& set) {
  const bool by_mass = set.planet_mass_range().has_value();
  return fmt::format("Limits: {}, {}{}.", set.key, set.citation, by_mass ? ", for a planet of 1 Earth mass" : "");
}

}  // namespace

std::string exact_values(const ListRow& row) {
  const std::array<std::pair<const char*, const Field*>, 7> fields{{{"Teff", &row.star.teff},
                                                                    {"luminosity", &row.star.luminosity},
                                                                    {"log luminosity", &row.star.log_luminosity},
                                                                    {"stellar radius", &row.star.stellar_radius},
                                                                    {"stellar mass", &row.star.stellar_mass},
                                                                    {"log g", &row.star.log_g},
                                                                    {"distance", &row.star.distance}}};
  std::string result;
  for (const auto& [name, field] : fields) {
    if (field->stated && field->stated->exact) result += (result.empty() ? "" : ", ") + std::string(name);
  }
  return result;
}

std::string bounds_page(const ListRow& row, const Answer& answer, const Settings& settings, const Console& console,
                        std::size_t width) {
  HZ_REQUIRE(settings.limits != nullptr && answer.status == Status::answered);
  const LimitSet& set = *settings.limits;
  const auto paragraph = [&](const std::string& text) { return text.empty() ? "" : wrapped(text, width) + "\n"; };
  const std::string exact = exact_values(row), flags = flag_list(answer);
  std::string result = console.styled(wrapped(first_sentence(answer, set), width), Style::strong) + "\n";
  result += paragraph(star_line(row, answer)) + "\n" + limit_table(answer, set).text(console) + "\n";
  result += paragraph(source_sentence(set)) + paragraph(set.warning.empty() ? "" : "Warning: " + set.warning);
  result += paragraph(held_sentence(answer, set));
  result += paragraph(exact.empty() ? "" : "Taken as exact, being typed without half-widths: " + exact + ".");
  return result + paragraph(flags.empty() ? "" : "Flags: " + flags + ".");
}

}  // namespace hz::app
