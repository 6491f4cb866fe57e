#include "hz/plots/length.hpp"

#include <array>
#include <charconv>
#include <cmath>
#include <string>

#include "hz/error.hpp"

namespace hz::plots {
namespace {

struct LengthUnit {
  std::string_view name;
  double points;
};
constexpr std::array<LengthUnit, 4> length_units{{{"mm", 72 / 25.4}, {"cm", 720 / 25.4}, {"in", 72}, {"pt", 1}}};

[[noreturn]] void refuse(std::string_view text) {
  throw Error(Fault::usage, "'" + std::string(text) + "' is not a length; write it as 88mm, 8.8cm, 3.5in or 250pt");
}

double points_of(std::string_view unit, std::string_view text) {
  for (const LengthUnit& known : length_units)
    if (unit == known.name) return known.points;
  refuse(text);
}

}  // namespace

double parse_length(std::string_view text) {
  double number = 0;
  const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), number);
  if (error != std::errc() || !std::isfinite(number) || number <= 0) refuse(text);
  std::string_view unit = text.substr(static_cast<std::size_t>(end - text.data()));
  unit.remove_prefix(std::min(unit.find_first_not_of(' '), unit.size()));
  const double length = number * points_of(unit, text);
  if (!std::isfinite(length)) refuse(text);
  return length;
}

}  // namespace hz::plots
