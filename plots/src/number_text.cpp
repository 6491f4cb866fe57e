#include "number_text.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <vector>

namespace hz::plots {
namespace {

int exponent_of(double value) { return static_cast<int>(std::floor(std::log10(value))); }

/// To a decimal place; a negative place rounds to tens, hundreds.
std::string to_place(double value, int decimals) {
  if (decimals >= 0) return fmt::format("{:.{}f}", value, decimals);
  const double unit = std::pow(10.0, -decimals);
  return fmt::format("{:.0f}", std::round(value / unit) * unit);
}

/// Takes away the zeros that end every one of these decimals.
void trim_together(std::vector<std::string>& numbers) {
  const auto ends_in_zero = [](const std::string& s) { return s.find('.') != s.npos && s.back() == '0'; };
  const auto ends_in_point = [](const std::string& s) { return s.back() == '.'; };
  while (std::all_of(numbers.begin(), numbers.end(), ends_in_zero))
    for (std::string& number : numbers) number.pop_back();
  if (std::all_of(numbers.begin(), numbers.end(), ends_in_point))
    for (std::string& number : numbers) number.pop_back();
}

std::string four_digits(double value) {
  if (value == 0 || std::abs(value) >= 1e6 || std::abs(value) < 1e-6) return fmt::format("{:.4g}", value);
  std::vector<std::string> one{to_place(value, std::max(0, 3 - exponent_of(std::abs(value))))};
  trim_together(one);
  return one.front();
}

}  // namespace

std::string measured_text(const Measured& measured) {
  const double minus = measured.minus.value_or(0);
  const double plus = measured.plus.value_or(0);
  const double narrower = minus > 0 && plus > 0 ? std::min(minus, plus) : std::max(minus, plus);
  if (!(narrower > 0)) return four_digits(measured.value);
  const int decimals = 1 - exponent_of(narrower);
  std::vector<std::string> parts{to_place(measured.value, decimals), to_place(plus, decimals),
                                 to_place(minus, decimals)};
  trim_together(parts);
  if (parts[1] == parts[2]) return parts[0] + " ±\u00A0" + parts[1];
  return parts[0] + " +" + parts[1] + "/−" + parts[2];
}

std::string probability_text(double p) {
  if (p > 0.99) return "> 0.99";
  if (p < 0.01) return "< 0.01";
  return fmt::format("{:.2f}", p);
}

Text tick_text(int digit, int exponent) {
  if (exponent >= 4 || exponent < -4)
    return {{digit == 1 ? "10" : fmt::format("{}×10", digit)},
            {(exponent < 0 ? "−" : "") + std::to_string(std::abs(exponent)), Script::super}};
  if (exponent >= 0) return {{std::to_string(digit) + std::string(static_cast<std::size_t>(exponent), '0')}};
  return {{"0." + std::string(static_cast<std::size_t>(-exponent - 1), '0') + std::to_string(digit)}};
}

}  // namespace hz::plots
