// hzmap limits: every published limit set in brief, or one in full.
#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>

#include "aligned_table.hpp"
#include "commands.hpp"
#include "numbers.hpp"
#include "settings_options.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

constexpr std::array shown_teffs{2600.0, 3500.0, 4500.0, 5772.0, 7200.0};

std::string range_text(const Range& range, const char* unit) {
  if (range.low == range.high) return fmt::format("{} {}", short_number(range.low), unit);
  return fmt::format("{}\u2013{} {}", short_number(range.low), short_number(range.high), unit);
}

std::string validity(const LimitSet& set) {
  const std::optional<Range> teff = set.teff_range();
  const std::optional<Range> mass = set.planet_mass_range();
  return (teff ? range_text(*teff, "K") : "any Teff") + (mass ? ", " + range_text(*mass, "Earth masses") : "");
}

std::string marks(const LimitSet& set) {
  std::string result;
  const auto add = [&](const char* mark) { result += (result.empty() ? "" : ", ") + std::string(mark); };
  if (set.key == default_limit_set) add("default");
  if (set.status != "current") add(set.status.c_str());
  if (!set.bounds_a_zone()) add("no zone");
  if (!set.warning.empty()) add("has a warning");
  return result;
}

std::string limit_titles(const LimitSet& set) {
  std::string result;
  for (const FluxLimit& limit : set.limits) result += (result.empty() ? "" : "; ") + limit.title();
  return result;
}

/// A set in two or three lines: key and marks, what it holds, where it is from.
std::string brief(const LimitSet& set, const Console& console, std::size_t width) {
  constexpr std::size_t indent = 4;
  const std::string mark = marks(set);
  std::string result = console.styled(set.key, Style::strong) + (mark.empty() ? "" : "  (" + mark + ")") + "\n";
  for (const std::string& text : {limit_titles(set), validity(set) + "; " + set.citation})
    result += std::string(indent, ' ') + wrapped(text, width, indent) + "\n";
  return result;
}

std::string zone_text(const LimitSet& set, const std::optional<Zone>& zone) {
  if (!zone) return "none";
  return fmt::format("from {} to {}", set.limits[zone->inner].title(), set.limits[zone->outer].title());
}

std::string fact(const std::string& name, const std::string& text, std::size_t width) {
  constexpr std::size_t column = 19;
  if (text.empty()) return "";
  return name + std::string(column - name.size(), ' ') + wrapped(text, width, column) + "\n";
}

std::string facts(const LimitSet& set, std::size_t width) {
  return fact("Source", set.citation, width) + fact("DOI", set.doi, width) + fact("Status", set.status, width) +
         fact("Checked", set.provenance, width) + fact("Holds for", validity(set), width) +
         fact("Conservative zone", zone_text(set, set.conservative), width) +
         fact("Optimistic zone", zone_text(set, set.optimistic), width) + fact("Warning", set.warning, width);
}

/// The planet masses worth a line of their own: those of the fit, or just one.
std::vector<double> shown_masses(const FluxLimit& limit) {
  const std::optional<Range> range = limit.planet_mass_range();
  return range && limit.depends_on_planet_mass() ? std::vector<double>{range->low, 1.0, range->high}
                                                 : std::vector<double>{1.0};
}

std::string line_title(const FluxLimit& limit, double planet_mass) {
  if (!limit.depends_on_planet_mass()) return limit.title();
  return fmt::format("{}, {} Earth mass{}", limit.title(), short_number(planet_mass), planet_mass == 1 ? "" : "es");
}

using ValueOf = double (*)(double insolation);

/// A value at one Teff; what is held at the end of the fitted range has a star behind it.
std::string value_text(const FluxLimit& limit, double teff, double planet_mass, ValueOf value_of) {
  const Result<HeldValue> held = limit.insolation(teff, planet_mass, BeyondRange::hold);
  if (!held) return "";
  return fixed(value_of(held->value), 3) + (held->held ? "*" : " ");
}

AlignedTable value_table(const LimitSet& set, const std::string& what, ValueOf value_of) {
  std::vector<AlignedTable::Column> columns = {{what, Align::left}};
  for (const double teff : shown_teffs) columns.push_back({short_number(teff) + " K ", Align::right});
  AlignedTable table(columns);
  for (const FluxLimit& limit : set.limits) {
    for (const double mass : shown_masses(limit)) {
      std::vector<std::string> cells = {line_title(limit, mass)};
      for (const double teff : shown_teffs) cells.push_back(value_text(limit, teff, mass, value_of));
      table.add(std::move(cells));
    }
  }
  return table;
}

std::string in_full(const LimitSet& set, const Console& console, std::size_t width) {
  const auto insolation = value_table(set, "insolation (Earth = 1)", [](double s) { return s; });
  const auto distance = value_table(set, "distance at 1 L\u2609 (au)", [](double s) { return 1 / std::sqrt(s); });
  std::string result = console.styled(set.key, Style::strong) + ": " + set.title + "\n\n" + facts(set, width) + "\n";
  result += insolation.text(console) + "\n" + distance.text(console);
  if (result.find('*') != std::string::npos) result += "\n* held at the end of the fitted range\n";
  return result;
}

}  // namespace

int run_limits(const Arguments& arguments, Console& console) {
  const auto catalog = read_catalog(arguments);
  const std::size_t width = terminal_width();
  if (!arguments.words().empty()) {
    console.print(in_full(limit_set_named(*catalog, arguments.words().front()), console, width));
    return exit_code::done;
  }
  for (const LimitSet& set : catalog->sets()) console.print(brief(set, console, width) + "\n");
  console.print("`hzmap limits KEY` shows one in full; `--set KEY` chooses it.\n");
  return exit_code::done;
}

}  // namespace hz::app
