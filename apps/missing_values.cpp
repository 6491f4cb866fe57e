#include "missing_values.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <optional>

#include "closest.hpp"
#include "hz/error.hpp"
#include "hz/measured_text.hpp"
#include "hz/quantity.hpp"

namespace hz::app {
namespace {

std::vector<std::string> numeric_names() {
  std::vector<std::string> names;
  for (const QuantityInfo& info : all_columns()) {
    const std::optional<Quantity> quantity = quantity_named(info.name);
    if (quantity && is_numeric(*quantity)) names.push_back(info.name);
  }
  return names;
}

Quantity read_quantity(const std::string& name) {
  const std::optional<Quantity> quantity = quantity_named(name);
  if (quantity && is_numeric(*quantity)) return *quantity;
  if (quantity) {
    throw Error(Fault::usage,
                fmt::format("--missing-value: {} is text; its spellings of \"no value\" stand in a column "
                            "map: missing = [\"…\"]",
                            name));
  }
  throw Error(Fault::usage,
              fmt::format("--missing-value: there is no quantity `{}`{}", name, did_you_mean(name, numeric_names())));
}

void read_numbers(const std::string& text, std::size_t start, Quantity quantity,
                  std::vector<ColumnMap::MissingNumber>& result) {
  while (start <= text.size()) {
    const std::size_t comma = std::min(text.find(',', start), text.size());
    const std::optional<double> number = parse_number(text.substr(start, comma - start));
    if (!number) {
      throw Error(Fault::usage, fmt::format("--missing-value {} needs numbers; write it like parallax=0 or "
                                            "parallax=0,-1",
                                            text));
    }
    result.push_back({quantity, *number});
    start = comma + 1;
  }
}

}  // namespace

std::vector<ColumnMap::MissingNumber> read_missing_values(std::span<const std::string> texts) {
  std::vector<ColumnMap::MissingNumber> result;
  for (const std::string& text : texts) {
    const std::size_t sign = text.find('=');
    const Quantity quantity = read_quantity(text.substr(0, sign));
    read_numbers(text, sign == std::string::npos ? text.size() : sign + 1, quantity, result);
  }
  return result;
}

}  // namespace hz::app
