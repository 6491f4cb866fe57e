#include "table/reading_plan.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>
#include <utility>

#include "hz/measured_text.hpp"
#include "hz/require.hpp"
#include "record_fields.hpp"
#include "words.hpp"

namespace hz {
namespace {

bool holds(std::string_view text, std::string_view word) { return text.find(word) != std::string_view::npos; }

// "Mass", "Msini", "Msin(i)/sin(i)", "M-R relationship" and their like. What is neither stays unsaid.
PlanetMassKind mass_kind(std::string_view text) {
  const auto kind = words::folded(text);
  if (holds(kind, "relation") || holds(kind, "radius") || kind == "mr") return PlanetMassKind::from_radius;
  if (kind == "msinisini" || kind == "masssinisini") return PlanetMassKind::measured;
  if (holds(kind, "sini") || holds(kind, "minimum") || kind == "minmass" || kind == "min")
    return PlanetMassKind::minimum;
  if (kind == "mass" || kind == "truemass" || holds(kind, "measured") || holds(kind, "dynamical"))
    return PlanetMassKind::measured;
  return PlanetMassKind::unsaid;
}

std::optional<bool> yes_or_no(std::string_view text) {
  const auto word = words::lower_case(words::trimmed(text));
  if (word == "1" || word == "true" || word == "yes" || word == "y") return true;
  if (word == "0" || word == "false" || word == "no" || word == "n") return false;
  return std::nullopt;
}

std::optional<int> whole_number(std::string_view text) {
  const auto number = parse_number(text);
  if (!number || *number != std::floor(*number) || *number < 0 || *number > 1000) return std::nullopt;
  return static_cast<int>(*number);
}

Problem problem(const std::string& column, const std::string& what, ProblemCode code = ProblemCode::unreadable) {
  return {code, column, column + ' ' + what};
}

// How many units of the value's column one unit of the half-width's is; both conversions are of one kind.
double ratio(const Conversion& half_width, const Conversion& value) {
  const bool is_log = value.kind == ConversionKind::offset || value.kind == ConversionKind::antilog;
  if (is_log) return 1;
  return value.kind == ConversionKind::reciprocal ? value.number / half_width.number : half_width.number / value.number;
}

bool is_finite(const Measured& measured) {
  return std::isfinite(measured.value) && std::isfinite(measured.minus.value_or(0)) &&
         std::isfinite(measured.plus.value_or(0));
}

}  // namespace

// A cell as text, or as the number a binary format holds; empty where there is no value.
struct ReadingPlan::Cell {
  std::string_view text;
  std::optional<double> number;
  [[nodiscard]] bool empty() const { return text.empty() && !number; }
};

Result<MeasuredText> ReadingPlan::measured_in(const Cell& cell, const std::string& header) {
  if (!cell.number) return parse_measured(cell.text, header);
  return MeasuredText{Measured{*cell.number, {}, {}, LimitMark::none, false}, {}};
}

ReadingPlan::ReadingPlan(const TableHead& head, const std::vector<UnderstoodColumn>& columns, const ColumnMap& map)
    : missing_numbers_(map.missing_numbers) {
  for (const auto& column : head.columns) headers_.push_back(column.name);
  for (const auto& text : map.missing_values) missing_.push_back(words::lower_case(words::trimmed(text)));
  for (const auto& column : columns) {
    if (column.part == ColumnPart::value) add(column);
  }
  for (const auto& column : columns) {
    if (column.part != ColumnPart::value) add(column);
  }
}

void ReadingPlan::add(const UnderstoodColumn& column) {
  auto& choices = choices_[static_cast<std::size_t>(column.quantity)];
  if (choices.size() <= column.choice) choices.resize(column.choice + 1);
  auto& choice = choices[column.choice];
  const auto conversion = hz::conversion(column.quantity, column.unit);
  const Side side{column.column, column.unit_assumed ? std::nullopt : conversion};
  switch (column.part) {
    case ColumnPart::value:
      choice.column = column.column;
      choice.conversion = conversion.value_or(Conversion{});
      break;
    case ColumnPart::half_width: choice.half_width = side; break;
    case ColumnPart::upper_half_width: choice.upper_half_width = side; break;
    case ColumnPart::lower_half_width: choice.lower_half_width = side; break;
    case ColumnPart::lower_bound: choice.lower_bound = side; break;
    case ColumnPart::upper_bound: choice.upper_bound = side; break;
    case ColumnPart::limit_mark: choice.limit_mark = column.column; break;
    case ColumnPart::route: break;  // how an earlier run of ours came by a value, which stands in a column of its own
  }
}

bool ReadingPlan::is_no_value(std::string_view text) const {
  if (is_missing(text)) return true;
  return !missing_.empty() && std::find(missing_.begin(), missing_.end(), words::lower_case(text)) != missing_.end();
}

ReadingPlan::Cell ReadingPlan::cell(const Chunk& chunk, std::size_t row, std::size_t column) const {
  const auto& cells = chunk.columns[column];
  if (const auto* const texts = std::get_if<std::vector<std::string_view>>(&cells)) {
    const auto text = words::trimmed((*texts)[row]);
    return is_no_value(text) ? Cell{} : Cell{text, {}};
  }
  if (const auto* const numbers = std::get_if<std::vector<double>>(&cells)) {
    return std::isnan((*numbers)[row]) ? Cell{} : Cell{{}, (*numbers)[row]};
  }
  const auto& whole = std::get<std::vector<std::optional<std::int64_t>>>(cells)[row];
  return whole ? Cell{{}, static_cast<double>(*whole)} : Cell{};
}

// A number with half-widths or a limit of its own is meant.
bool ReadingPlan::is_missing_number(const Measured& measured, Quantity quantity) const {
  if (measured.plus || measured.minus || measured.limit != LimitMark::none) return false;
  return std::any_of(missing_numbers_.begin(), missing_numbers_.end(), [&](const auto& missing) {
    return missing.quantity == quantity && missing.number == measured.value;
  });
}

std::string ReadingPlan::shown(const Chunk& chunk, std::size_t row, std::size_t column) const {
  return words::quoted(words::trimmed(chunk.text(column, row)));
}

std::optional<double> ReadingPlan::printed(const Chunk& chunk, std::size_t row, const UnderstoodColumn& column) const {
  if (chunk.row_problems[row]) return std::nullopt;
  const auto content = cell(chunk, row, column.column);
  if (content.empty()) return std::nullopt;
  const auto parsed = measured_in(content, headers_[column.column]);
  const bool is_plain = parsed && parsed->unit.empty() && parsed->measured.limit == LimitMark::none;
  if (!is_plain || !std::isfinite(parsed->measured.value)) return std::nullopt;
  if (is_missing_number(parsed->measured, column.quantity)) return std::nullopt;
  return parsed->measured.value;
}

std::string ReadingPlan::text(const Chunk& chunk, std::size_t row, Quantity quantity) const {
  for (const auto& choice : choices(quantity)) {
    if (!cell(chunk, row, choice.column).empty()) return std::string(words::trimmed(chunk.text(choice.column, row)));
  }
  return {};
}

Field ReadingPlan::field(const Chunk& chunk, std::size_t row, Quantity quantity) const {
  for (const auto& choice : choices(quantity)) {
    const auto found = chosen(chunk, row, quantity, choice);
    if (!found) {
      std::string cell(words::trimmed(chunk.text(choice.column, row)));
      // Trouble beside the value stays with it, or a second reading would take the value for sound.
      if (found.error().column != headers_[choice.column]) cell += fmt::format(" [{}]", found.error().what);
      return {{}, std::make_shared<const Unread>(Unread{found.error(), std::move(cell)})};
    }
    if (*found) return {**found, nullptr};
  }
  return {};
}

// Empty when this choice says nothing in this row.
Result<std::optional<Measured>> ReadingPlan::chosen(const Chunk& chunk, std::size_t row, Quantity quantity,
                                                    const Choice& choice) const {
  const auto value = cell(chunk, row, choice.column);
  if (value.empty()) return std::optional<Measured>();
  const auto& header = headers_[choice.column];
  const auto parsed = measured_in(value, header);
  if (!parsed) return parsed.error();
  if (is_missing_number(parsed->measured, quantity)) return std::optional<Measured>();
  auto conversion = std::optional(choice.conversion);
  if (!parsed->unit.empty()) conversion = hz::conversion(quantity, parsed->unit);
  if (!conversion)
    return problem(header,
                   fmt::format("holds {}, whose unit is not one of {}", words::quoted(value.text), name(quantity)));
  const auto measured = with_sides(chunk, row, parsed->measured, choice, *conversion);
  if (!measured) return measured.error();
  const auto shown = this->shown(chunk, row, choice.column);
  if (conversion->kind == ConversionKind::reciprocal && measured->value <= 0) {
    return problem(header, fmt::format("holds {}, and a parallax that is not above 0 gives no distance", shown),
                   ProblemCode::out_of_range);
  }
  const auto converted = convert(*measured, *conversion);
  if (is_finite(converted)) return std::optional(converted);
  return problem(header, fmt::format("holds {}, which is not a finite value", shown));
}

// Half-widths written in the cell itself win over those of other columns.
Result<Measured> ReadingPlan::with_sides(const Chunk& chunk, std::size_t row, Measured measured, const Choice& choice,
                                         const Conversion& conversion) const {
  if (choice.limit_mark && measured.limit == LimitMark::none) {
    const auto mark = limit(chunk, row, *choice.limit_mark);
    if (!mark) return mark.error();
    measured.limit = *mark;
  }
  if (measured.plus) return measured;
  const auto both = half_width(chunk, row, choice.half_width, conversion);
  const auto plus = half_width(chunk, row, choice.upper_half_width, conversion);
  // A lower half-width is often printed with its sign.
  const auto minus = width(chunk, row, choice.lower_half_width, conversion);
  for (const auto* const read : {&both, &plus, &minus}) {
    if (!*read) return read->error();
  }
  measured.plus = *plus ? *plus : *both;
  measured.minus = *minus ? std::optional(std::abs(**minus)) : *both;
  return with_bounds(chunk, row, measured, choice, conversion);
}

// Bounds are values: the ends of the interval. They give the half-widths that nothing else gives.
Result<Measured> ReadingPlan::with_bounds(const Chunk& chunk, std::size_t row, Measured measured, const Choice& choice,
                                          const Conversion& conversion) const {
  const auto lower = bound(chunk, row, choice.lower_bound, conversion);
  const auto upper = bound(chunk, row, choice.upper_bound, conversion);
  for (const auto* const read : {&lower, &upper}) {
    if (!*read) return read->error();
  }
  if (lower->value_or(measured.value) > measured.value || upper->value_or(measured.value) < measured.value)
    return not_bracketed(chunk, row, choice);
  if (!measured.minus && *lower) measured.minus = measured.value - **lower;
  if (!measured.plus && *upper) measured.plus = **upper - measured.value;
  return measured;
}
Problem ReadingPlan::not_bracketed(const Chunk& chunk, std::size_t row, const Choice& choice) const {
  const auto bound_text = [&](const Side& side) {
    return fmt::format("{} {}", headers_[side.column], shown(chunk, row, side.column));
  };
  const auto& lower = choice.lower_bound;
  const auto& upper = choice.upper_bound;
  const auto where = lower && upper ? fmt::format("not between {} and {}", bound_text(*lower), bound_text(*upper))
                     : lower        ? fmt::format("below {}", bound_text(*lower))
                                    : fmt::format("above {}", bound_text(*upper));
  return problem(headers_[choice.column], fmt::format("holds {}, which lies {}; bounds are the ends of an interval "
                                                      "around the value, not half-widths",
                                                      shown(chunk, row, choice.column), where));
}

// As printed; empty when there is none.
Result<std::optional<double>> ReadingPlan::number(const Chunk& chunk, std::size_t row,
                                                  const std::optional<Side>& side) const {
  if (!side) return std::optional<double>();
  const auto content = cell(chunk, row, side->column);
  if (content.empty()) return std::optional<double>();
  const auto number = content.number ? content.number : parse_number(content.text);
  if (number && std::isfinite(*number)) return number;
  return problem(headers_[side->column], fmt::format("holds {}, which is not a number{}",
                                                     shown(chunk, row, side->column), comma_hint(content.text)));
}

// A half-width in the unit of its value, with its sign.
Result<std::optional<double>> ReadingPlan::width(const Chunk& chunk, std::size_t row, const std::optional<Side>& side,
                                                 const Conversion& conversion) const {
  auto printed = number(chunk, row, side);
  if (!printed || !*printed || !side->own) return printed;
  if (side->own->kind == conversion.kind) return std::optional(**printed * ratio(*side->own, conversion));
  return problem(headers_[side->column],
                 fmt::format("holds {} in a unit that does not go with that of the value: one is a logarithm or a "
                             "parallax, the other is not",
                             shown(chunk, row, side->column)));
}

Result<std::optional<double>> ReadingPlan::half_width(const Chunk& chunk, std::size_t row,
                                                      const std::optional<Side>& side,
                                                      const Conversion& conversion) const {
  auto read = width(chunk, row, side, conversion);
  if (!read || read->value_or(0) >= 0) return read;
  return problem(headers_[side->column],
                 fmt::format("holds {}, and a half-width is never below 0", shown(chunk, row, side->column)));
}

// The end of an interval in the unit of its value.
Result<std::optional<double>> ReadingPlan::bound(const Chunk& chunk, std::size_t row, const std::optional<Side>& side,
                                                 const Conversion& conversion) const {
  auto printed = number(chunk, row, side);
  if (!printed || !*printed || !side->own || *side->own == conversion) return printed;
  return std::optional(convert_back(convert(**printed, *side->own), conversion));
}

Result<LimitMark> ReadingPlan::limit(const Chunk& chunk, std::size_t row, std::size_t column) const {
  const auto mark = cell(chunk, row, column);
  if (mark.empty() || mark.text == "=") return LimitMark::none;
  if (mark.text == "<") return LimitMark::upper;
  if (mark.text == ">") return LimitMark::lower;
  const auto code = mark.number ? mark.number : parse_number(mark.text);
  if (code == 0) return LimitMark::none;
  if (code == 1) return LimitMark::upper;
  if (code == -1) return LimitMark::lower;
  return problem(headers_[column], fmt::format("holds {}, which is not one of 1, 0, -1, < and >",
                                               words::quoted(chunk.text(column, row))));
}

ListRow ReadingPlan::read(const Chunk& chunk, std::size_t row) const {
  HZ_REQUIRE(row < chunk.rows() && chunk.columns.size() == headers_.size());
  ListRow out;
  out.number = chunk.first_row + row;
  out.line = chunk.lines.empty() ? 0 : chunk.lines[row];
  out.problem = chunk.row_problems[row];
  if (out.problem) return out;
  out.star.name = text(chunk, row, Quantity::star);
  out.star.id = text(chunk, row, Quantity::star_id);
  out.star.spectral_type = text(chunk, row, Quantity::spectral_type);
  out.star.number_of_stars = whole_number(text(chunk, row, Quantity::number_of_stars));
  for (const auto& [quantity, field] : star_fields) out.star.*field = this->field(chunk, row, quantity);
  out.planet.name = text(chunk, row, Quantity::planet);
  for (const auto& [quantity, field] : planet_fields) out.planet.*field = this->field(chunk, row, quantity);
  out.planet.planet_mass_kind = mass_kind(text(chunk, row, Quantity::planet_mass_kind));
  out.planet.circumbinary = yes_or_no(text(chunk, row, Quantity::circumbinary));
  out.planet.adopted = yes_or_no(text(chunk, row, Quantity::adopted));
  out.reference = text(chunk, row, Quantity::reference);
  return out;
}

}  // namespace hz
