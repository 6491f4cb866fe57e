#include "hz/table/column_report.hpp"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>

#include "hz/measured_text.hpp"
#include "table/column_map_text.hpp"
#include "words.hpp"

namespace hz {
namespace {

bool knows_any(const Understanding& known, std::initializer_list<Quantity> quantities) {
  return std::any_of(quantities.begin(), quantities.end(), [&](Quantity quantity) { return known.knows(quantity); });
}

bool knows_distance(const Understanding& known) { return knows_any(known, {Quantity::distance, Quantity::parallax}); }

/// Of a main-sequence star these tell everything, roughly.
bool knows_type_or_mass(const Understanding& known) {
  return knows_any(known, {Quantity::spectral_type, Quantity::stellar_mass});
}

bool knows_color(const Understanding& known) {
  const bool v = known.knows(Quantity::magnitude_v);
  const bool from_magnitudes =
      (v && knows_any(known, {Quantity::magnitude_b, Quantity::magnitude_j, Quantity::magnitude_k})) ||
      (known.knows(Quantity::magnitude_bp) && known.knows(Quantity::magnitude_rp));
  return from_magnitudes ||
         knows_any(known, {Quantity::color_bv, Quantity::color_vk, Quantity::color_vj, Quantity::color_bp_rp});
}

bool knows_teff(const Understanding& known) {
  return known.knows(Quantity::teff) || knows_color(known) || knows_type_or_mass(known) ||
         (known.knows(Quantity::magnitude_k) && knows_distance(known));
}

bool knows_luminosity(const Understanding& known) {
  const bool stated = knows_any(known, {Quantity::luminosity, Quantity::log_luminosity, Quantity::stellar_radius});
  const bool magnitude = knows_any(known, {Quantity::magnitude_v, Quantity::magnitude_g, Quantity::magnitude_j,
                                           Quantity::magnitude_k, Quantity::magnitude_bol});
  return stated || knows_type_or_mass(known) || (magnitude && knows_distance(known));
}

bool knows_semi_major_axis(const Understanding& known) {
  return known.knows(Quantity::semi_major_axis) ||
         (known.knows(Quantity::orbital_period) && (known.knows(Quantity::stellar_mass) || knows_luminosity(known)));
}

bool knows_insolation(const Understanding& known) {
  return known.knows(Quantity::insolation) || known.knows(Quantity::scaled_semi_major_axis);
}

constexpr auto teff_choices = "teff, a colour, spectral_type or stellar_mass";
constexpr auto luminosity_choices =
    "luminosity, log_luminosity, stellar_radius, a magnitude with distance or parallax, spectral_type or stellar_mass";
constexpr auto orbit_choices =
    "semi_major_axis, orbital_period with stellar_mass, scaled_semi_major_axis or insolation";

std::vector<std::string> missing_for_stars(const Understanding& known) {
  std::vector<std::string> missing;
  if (!knows_teff(known)) missing.emplace_back(teff_choices);
  if (!knows_luminosity(known)) missing.emplace_back(luminosity_choices);
  return missing;
}

std::vector<std::string> missing_for_planets(const Understanding& known) {
  std::vector<std::string> missing;
  if (!known.knows(Quantity::planet)) missing.emplace_back("planet");
  if (!knows_teff(known)) missing.emplace_back(teff_choices);
  if (knows_insolation(known)) return missing;
  if (!knows_semi_major_axis(known)) missing.emplace_back(orbit_choices);
  if (!knows_luminosity(known)) missing.emplace_back(luminosity_choices);
  return missing;
}

ReportedColumn reported(const TableHead& head, const UnderstoodColumn& column) {
  return {head.columns[column.column].name,
          canonical_name(column.quantity, column.part),
          column.unit,
          column.unit_assumed,
          column.known_by,
          {},
          {}};
}

std::string line_of(const TableHead& head, const UnderstoodColumn& column) {
  return map_line(canonical_name(column.quantity, column.part), head.columns[column.column].name,
                  column.unit_assumed ? std::string() : column.unit);
}

bool is_doubted(const Understanding& understanding, std::size_t column) {
  const auto& doubts = understanding.doubts();
  return std::any_of(doubts.begin(), doubts.end(), [&](const Doubt& doubt) { return doubt.column == column; });
}

std::string understood_lines(const TableHead& head, const Understanding& understanding) {
  std::string out;
  for (const auto& column : understanding.columns()) {
    if (is_doubted(understanding, column.column)) continue;
    const auto* const again = column.choice > 0 ? "(where the first is empty) " : "";
    out += fmt::format("# {}{}\n", again, line_of(head, column));
  }
  return out;
}

std::string doubt_lines(const Understanding& understanding) {
  std::string out;
  for (const auto& doubt : understanding.doubts()) {
    out += fmt::format("#\n# {}:\n", doubt.what);
    for (const auto& line : doubt.map_lines) {
      if (!line.starts_with("ignore")) out += fmt::format("# {}\n", line);
    }
  }
  return out;
}

std::string unused_lines(const TableHead& head, const Understanding& understanding) {
  std::string out;
  for (const auto other : understanding.others())
    out += fmt::format("#   {}\n", words::quoted(head.columns[other].name));
  return out;
}

}  // namespace

std::vector<std::string> sample_values(const Chunk& chunk, std::size_t column, std::size_t count) {
  std::vector<std::string> out;
  for (std::size_t row = 0; row < chunk.rows() && out.size() < count; ++row) {
    auto text = std::string(words::trimmed(chunk.text(column, row)));
    const bool seen = std::find(out.begin(), out.end(), text) != out.end();
    if (!seen && !is_missing(text)) out.push_back(std::move(text));
  }
  return out;
}

ColumnReport report_columns(const TableHead& head, const Understanding& understanding,
                            const std::optional<Chunk>& first) {
  ColumnReport report;
  for (const auto& column : head.columns) report.columns.push_back({column.name, {}, {}, false, {}, {}, {}});
  for (const auto& column : understanding.columns()) report.columns[column.column] = reported(head, column);
  for (const auto& doubt : understanding.doubts()) report.columns[doubt.column].doubt = doubt.what;
  for (std::size_t i = 0; first && i < head.columns.size(); ++i) report.columns[i].samples = sample_values(*first, i);
  report.missing_for_stars = missing_for_stars(understanding);
  report.missing_for_planets = missing_for_planets(understanding);
  return report;
}

std::string starter_map(const TableHead& head, const Understanding& understanding) {
  std::string out =
      fmt::format("# Column map for {}. It changes nothing until you take comment signs away.\n\n", head.source);
  out +=
      "# Further spellings of \"no value\", and columns to leave alone:\n# missing = [\"-99\"]\n# ignore = "
      "[\"…\"]\n\n# Numbers that stand for \"no value\" of one quantity:\n# [missing_values]\n# parallax = [0, "
      "-1]\n\n[columns]\n";
  if (!understanding.columns().empty())
    out += "# Understood without this map:\n" + understood_lines(head, understanding);
  if (!understanding.doubts().empty()) out += "\n# To be decided, one line of each:\n" + doubt_lines(understanding);
  if (!understanding.others().empty())
    out += "\n# Not used, as in  teff = { column = \"…\", unit = \"K\" }:\n" + unused_lines(head, understanding);
  return out;
}

}  // namespace hz
