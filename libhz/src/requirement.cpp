#include "hz/requirement.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "hz/error.hpp"
#include "hz/measured_text.hpp"
#include "hz/ranked_table.hpp"
#include "stated_fields.hpp"

namespace hz {
namespace {

struct Spelling {
  std::string_view sign;
  Comparison comparison;
};
constexpr Spelling spellings[] = {{"<=", Comparison::less_or_equal}, {">=", Comparison::greater_or_equal},
                                  {"<", Comparison::less},           {">", Comparison::greater},
                                  {"==", Comparison::equal},         {"=", Comparison::equal}};

std::string trimmed(std::string_view text) {
  const std::size_t first = text.find_first_not_of(' ');
  if (first == std::string_view::npos) return "";
  return std::string(text.substr(first, text.find_last_not_of(' ') - first + 1));
}

/// Every column a row could have, whatever its list states.
const std::vector<OutputColumn>& known_columns() {
  static const std::vector<OutputColumn> columns = [] {
    std::vector<Quantity> quantities;
    for (const QuantityInfo& info : all_columns()) {
      if (const std::optional<Quantity> quantity = quantity_named(info.name)) quantities.push_back(*quantity);
    }
    return ranked_columns({}, quantities, {});
  }();
  return columns;
}

const OutputColumn* column_named(const std::string& name) {
  const auto found = std::find_if(known_columns().begin(), known_columns().end(),
                                  [&](const OutputColumn& column) { return column.head.name == name; });
  return found == known_columns().end() ? nullptr : &*found;
}

CellValue cell(const std::string& name, const RankedRow& row) {
  const OutputColumn* column = column_named(name);
  return column ? column->value(row) : CellValue();
}

bool is_known(const CellValue& value) { return !std::holds_alternative<std::monostate>(value); }

/// What was used of a quantity; nothing where that was assumed, for want of knowledge.
CellValue used_value(const std::string& name, const RankedRow& row) {
  if (cell(name + "_route", row) == CellValue(std::string(assumed_route))) return {};
  return cell(name + "_used", row);
}

bool holds(double x, Comparison comparison, double bound) {
  switch (comparison) {
    case Comparison::less: return x < bound;
    case Comparison::less_or_equal: return x <= bound;
    case Comparison::greater: return x > bound;
    case Comparison::greater_or_equal: return x >= bound;
    case Comparison::equal: return x == bound;
  }
  return false;
}

bool wants_less(Comparison comparison) {
  return comparison == Comparison::less || comparison == Comparison::less_or_equal;
}

bool wants_more(Comparison comparison) {
  return comparison == Comparison::greater || comparison == Comparison::greater_or_equal;
}

/// A value below x, whatever it is, is below any bound from x upwards.
bool limit_settles_it(const Measured& limit, const Requirement& requirement) {
  if (limit.limit == LimitMark::upper) return wants_less(requirement.comparison) && limit.value <= *requirement.number;
  return wants_more(requirement.comparison) && limit.value >= *requirement.number;
}

const Measured* limit_of(const Requirement& requirement, const Candidate& candidate) {
  const std::optional<Quantity> quantity = quantity_named(requirement.name);
  const Field* field = quantity ? stated_field(candidate.row, *quantity) : nullptr;
  return field && field->stated && field->stated->limit != LimitMark::none ? &*field->stated : nullptr;
}

std::string why_number_fails(const Requirement& requirement, double x) {
  if (holds(x, requirement.comparison, *requirement.number)) return "";
  return fmt::format("{} is not met: {:.6g}", requirement.text, x);
}

}  // namespace

Requirement parse_requirement(std::string_view text) {
  const std::size_t at = text.find_first_of("<>=");
  if (at == std::string_view::npos || at == 0) {
    throw Error(Fault::usage,
                fmt::format("--require '{}' has no comparison; write it like 'planet_radius<1.8' (< <= > >= =)", text));
  }
  Requirement requirement;
  requirement.text = trimmed(text);
  requirement.name = trimmed(text.substr(0, at));
  const auto* spelling = std::find_if(std::begin(spellings), std::end(spellings),
                                      [&](const Spelling& s) { return text.substr(at, s.sign.size()) == s.sign; });
  requirement.comparison = spelling->comparison;
  requirement.value = trimmed(text.substr(at + spelling->sign.size()));
  requirement.number = parse_number(requirement.value);
  if (column_named(requirement.name) == nullptr && column_named(requirement.name + "_used") == nullptr) {
    throw Error(Fault::usage,
                fmt::format("--require '{}': there is no quantity or column `{}`", text, requirement.name));
  }
  if (!requirement.number && requirement.comparison != Comparison::equal) {
    throw Error(Fault::usage, fmt::format("--require '{}': `{}` is not a number", text, requirement.value));
  }
  return requirement;
}

std::string why_not_met(const Requirement& requirement, const Candidate& candidate) {
  const RankedRow row{candidate, 0};
  CellValue value = used_value(requirement.name, row);
  const Measured* limit = is_known(value) ? nullptr : limit_of(requirement, candidate);
  if (!is_known(value)) value = cell(requirement.name, row);
  if (limit && requirement.number) {
    if (limit_settles_it(*limit, requirement)) return "";
    return fmt::format("{} is not known to be met: only a limit, {} {:.6g}", requirement.text,
                       limit->limit == LimitMark::upper ? "<" : ">", limit->value);
  }
  if (const double* x = std::get_if<double>(&value)) {
    if (!requirement.number) return fmt::format("{} is not met: {:.6g}", requirement.text, *x);
    return why_number_fails(requirement, *x);
  }
  if (const std::string* words = std::get_if<std::string>(&value)) {
    const std::optional<double> count = requirement.number ? parse_number(*words) : std::nullopt;  // number_of_stars
    if (count) return why_number_fails(requirement, *count);
    return *words == requirement.value ? "" : fmt::format("{} is not met: {}", requirement.text, *words);
  }
  return fmt::format("{} is not known to be met: no {}", requirement.text, requirement.name);
}

}  // namespace hz
