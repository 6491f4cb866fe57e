#include "bounds_page.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <limits>

#include "aligned_table.hpp"
#include "derivation.hpp"
#include "flag_text.hpp"
#include "hz/require.hpp"
#include "numbers.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

std::string_view words(ZoneEdge edge) {
  switch (edge) {
    case ZoneEdge::optimistic_inner: return "optimistic, inner";
    case ZoneEdge::conservative_inner: return "conservative, inner";
    case ZoneEdge::conservative_outer: return "conservative, outer";
    case ZoneEdge::optimistic_outer: break;
  }
  return "optimistic, outer";
}

/// "conservative, inner"; empty for a limit that bounds no zone.
std::string role(const LimitAtStar& limit) {
  std::string result;
  for (const ZoneEdge edge : limit.edges) result += (result.empty() ? "" : "; ") + std::string(words(edge));
  return result;
}

/// Decimals that suit every number of a column: three digits of the smallest.
int common_decimals(const Answer& answer, std::optional<double> LimitAtStar::*value) {
  int decimals = 0;
  for (const LimitAtStar& each : answer.limits) {
    if (each.*value) decimals = std::max(decimals, decimals_for(*(each.*value), 3));
  }
  return decimals;
}

/// The same for distances: as many as the least precise of them deserves, if they have half-widths.
int distance_decimals(const Answer& answer) {
  int fewest = std::numeric_limits<int>::max(), most = 0;
  for (const LimitAtStar& each : answer.limits) {
    if (!each.distance) continue;
    const bool exact = each.distance->minus.value_or(0) == 0 && each.distance->plus.value_or(0) == 0;
    const int decimals = decimals_for(*each.distance, 3);
    if (exact) most = std::max(most, decimals);
    if (!exact) fewest = std::min(fewest, decimals);
  }
  return std::max(fewest == std::numeric_limits<int>::max() ? 0 : fewest, most);
}

std::string cell(const std::optional<double>& value, int decimals) { return value ? fixed(*value, decimals) : ""; }

AlignedTable limit_table(const Answer& answer) {
  AlignedTable table({{"limit"},
                      {"distance (au)", Align::right},
                      {"insolation", Align::right},
                      {"period (d)", Align::right},
                      {"on the sky (mas)", Align::right},
                      {"bounds the zone"},
                      {"held"}});
  const int distance = distance_decimals(answer);
  const int period = common_decimals(answer, &LimitAtStar::period);
  const int angle = common_decimals(answer, &LimitAtStar::angular_separation);
  std::vector<LimitAtStar> limits = answer.limits;
  std::stable_sort(limits.begin(), limits.end(),
                   [](const auto& a, const auto& b) { return a.insolation > b.insolation; });
  for (const LimitAtStar& each : limits) {
    const std::string bounds = role(each);
    table.add(
        {each.limit->title(), each.distance ? measured_text(*each.distance, distance) : "", fixed(each.insolation, 3),
         cell(each.period, period), cell(each.angular_separation, angle), bounds, each.held ? "held" : ""},
        bounds.empty() ? Style::faint : Style::plain);
  }
  return table;
}

std::string zone_phrase(const Answer& answer, ZoneEdge inner_edge, ZoneEdge outer_edge, const char* name) {
  const LimitAtStar* const inner = find_edge(answer, inner_edge);
  const LimitAtStar* const outer = find_edge(answer, outer_edge);
  if (inner == nullptr || outer == nullptr || !inner->distance || !outer->distance) return "";
  const int decimals = decimals_for(inner->distance->value, 3);
  return fmt::format("{} to {} au ({} zone)", fixed(inner->distance->value, decimals),
                     fixed(outer->distance->value, decimals), name);
}

std::string first_sentence(const Answer& answer) {
  const std::string narrow =
      zone_phrase(answer, ZoneEdge::conservative_inner, ZoneEdge::conservative_outer, "conservative");
  const std::string wide = zone_phrase(answer, ZoneEdge::optimistic_inner, ZoneEdge::optimistic_outer, "optimistic");
  return fmt::format("Liquid water from {}{}{}.", narrow, narrow.empty() || wide.empty() ? "" : ", from ", wide);
}

std::string star_line(const ListRow& row, const Answer& answer) {
  const std::string values = stated_values(answer.star);
  const std::string name = row.star.name.empty() ? "Star" : printable(row.star.name);
  return values.empty() ? "" : name + ": " + values + ".";
}

std::string source_sentence(const LimitSet& set) {
  const bool by_mass = set.planet_mass_range().has_value();
  return fmt::format("Limits: {}, {}{}. A zone is a screening aid, not proof of habitability.", set.key, set.citation,
                     by_mass ? ", for a planet of 1 Earth mass" : "");
}

}  // namespace

std::string exact_values(const ListRow& row) {
  std::string result;
  for (const QuantityInfo& about : all_columns()) {
    const std::optional<Quantity> quantity = quantity_named(about.name);
    const Field* field = quantity ? stated_field(row, *quantity) : nullptr;
    if (field != nullptr && field->stated && field->stated->exact)
      result += (result.empty() ? "" : ", ") + route_words(about.name);
  }
  return result;
}

std::string bounds_page(const ListRow& row, const Answer& answer, const Settings& settings, const Console& console,
                        std::size_t width) {
  HZ_REQUIRE(settings.limits != nullptr && answer.status == Status::answered);
  const LimitSet& set = *settings.limits;
  const auto paragraph = [&](const std::string& text) { return text.empty() ? "" : wrapped(text, width) + "\n"; };
  const std::string exact = exact_values(row);
  std::string result = console.styled(wrapped(first_sentence(answer), width), Style::strong) + "\n";
  result += paragraph(star_line(row, answer)) + paragraph(derivation_sentence(answer.star)) + "\n" +
            limit_table(answer).text(console) + "\n";
  result += paragraph(source_sentence(set)) + paragraph(set.warning.empty() ? "" : "Warning: " + set.warning);
  result += paragraph(exact.empty() ? "" : "Taken as exact, being typed without half-widths: " + exact + ".");
  for (const std::string& flag : answer.flags) result += paragraph(flag_sentence(flag));
  result += paragraph(answer.note.empty() ? "" : "Note: " + answer.note + ".");
  return result;
}

}  // namespace hz::app
