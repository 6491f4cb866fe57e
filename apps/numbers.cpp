#include "numbers.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <charconv>
#include <cmath>
#include <cstdlib>

namespace hz::app {
namespace {

constexpr const char* minus_sign = "\u2212";
constexpr const char* plus_minus = "\u00B1";
constexpr int most_decimals = 9;

/// Decimal exponent of the value once it is rounded, so that 9.996 with three digits counts as 10.0.
int exponent_of(double value, int significant) {
  const std::string text = fmt::format("{:.{}e}", std::abs(value), significant - 1);
  return std::atoi(text.c_str() + text.find('e') + 1);
}

std::optional<double> known(std::optional<double> half_width) {
  return half_width && std::isfinite(*half_width) && *half_width > 0 ? half_width : std::nullopt;
}

}  // namespace

int decimals_for(double value, int significant) {
  if (!std::isfinite(value) || value == 0) return 0;
  return std::clamp(significant - 1 - exponent_of(value, significant), 0, most_decimals);
}

int decimals_for(const Measured& measured, int significant) {
  const std::optional<double> minus = known(measured.minus), plus = known(measured.plus);
  if (!minus && !plus) return decimals_for(measured.value, significant);
  const double larger = std::max(minus.value_or(0), plus.value_or(0));
  const double smaller = std::min(minus.value_or(larger), plus.value_or(larger));
  return std::max(decimals_for(larger, 2), decimals_for(smaller, 1));
}

std::string fixed(double value, int decimals) {
  if (!std::isfinite(value)) return "-";
  const std::string digits = fmt::format("{:.{}f}", std::abs(value), decimals);
  const bool rounds_to_zero = digits.find_first_not_of("0.") == std::string::npos;
  return value < 0 && !rounds_to_zero ? minus_sign + digits : digits;
}

std::string short_number(double value) {
  if (!std::isfinite(value)) return "-";
  return (value < 0 ? minus_sign : "") + fmt::format("{:.6g}", std::abs(value));
}

std::string measured_text(const Measured& measured, int decimals) {
  std::string value = fixed(measured.value, decimals);
  if (measured.limit != LimitMark::none) return (measured.limit == LimitMark::upper ? "< " : "> ") + value;
  const std::optional<double> minus = known(measured.minus), plus = known(measured.plus);
  if (!minus && !plus) return value;
  const std::string down = fixed(minus.value_or(0), decimals), up = fixed(plus.value_or(0), decimals);
  if (up == down) return fmt::format("{} {} {}", value, plus_minus, up);
  return fmt::format("{} +{} {}{}", value, up, minus_sign, down);
}

std::string measured_text(const Measured& measured) {
  const bool bare = !known(measured.minus) && !known(measured.plus);
  if (bare && measured.limit == LimitMark::none) return short_number(measured.value);
  if (bare) return (measured.limit == LimitMark::upper ? "< " : "> ") + short_number(measured.value);
  return measured_text(measured, decimals_for(measured, 4));
}

std::string probability_text(std::optional<double> probability) {
  if (!probability || !std::isfinite(*probability)) return "-";
  if (*probability > 0.99) return "> 0.99";
  if (*probability < 0.01) return "< 0.01";
  return fixed(*probability, 2);
}

std::string count_text(std::size_t count) {
  std::string digits = std::to_string(count);
  for (std::size_t place = digits.size(); place > 3; place -= 3) digits.insert(place - 3, ",");
  return digits;
}

std::string counted(std::size_t count, const std::string& thing) {
  return fmt::format("{} {}{}", count_text(count), thing, count == 1 ? "" : "s");
}

double rounded(double value, int significant) {
  const std::string text = fmt::format("{:.{}e}", value, significant - 1);
  double result = value;
  std::from_chars(text.data(), text.data() + text.size(), result);
  return result;
}

}  // namespace hz::app
