#include "derivation.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "numbers.hpp"

namespace hz::app {
namespace {

bool is_name_letter(char c) { return (c >= 'a' && c <= 'z') || c == '_'; }

std::string with_blanks(std::string_view name) {
  std::string words(name);
  std::replace(words.begin(), words.end(), '_', ' ');
  return words;
}

/// Magnitudes, colours and Teff have symbols that people say; of the others the names say more.
std::string word_for(std::string_view name) {
  if (name == "teff") return "Teff";
  const std::optional<Quantity> quantity = quantity_named(name);
  if (!quantity) return std::string(name);
  const QuantityInfo& about = info(*quantity);
  return about.unit == "mag" && !about.symbol.empty() ? about.symbol : with_blanks(name);
}

/// A value that follows from exact ones has no half-widths to round it by.
std::string value_text(const Measured& measured) {
  constexpr int digits = 4;
  const bool exact = measured.minus.value_or(0) == 0 && measured.plus.value_or(0) == 0;
  return exact ? short_number(rounded(measured.value, digits)) : measured_text(measured);
}

/// What a page shows of a star, in this order.
struct Shown {
  const char* symbol;
  std::optional<Derived> StarAnswer::*value;
  const char* unit;
};
constexpr auto shown_values = std::to_array<Shown>({{"Teff", &StarAnswer::teff, "K"},
                                                    {"L", &StarAnswer::luminosity, "L☉"},
                                                    {"radius", &StarAnswer::stellar_radius, "R☉"},
                                                    {"mass", &StarAnswer::stellar_mass, "M☉"},
                                                    {"distance", &StarAnswer::distance, "pc"}});

bool is_stated(const Derived& derived) { return derived.route.starts_with("stated"); }

}  // namespace

std::string route_words(std::string_view route) {
  std::string words;
  for (std::size_t i = 0; i < route.size();) {
    const std::size_t start = i;
    while (i < route.size() && is_name_letter(route[i])) ++i;
    words += word_for(route.substr(start, i - start));
    if (i < route.size()) words += route[i++];
  }
  return words;
}

std::string stated_values(const StarAnswer& star) {
  std::string text;
  for (const auto& [symbol, value, unit] : shown_values) {
    const std::optional<Derived>& derived = star.*value;
    if (!derived || !is_stated(*derived)) continue;
    text += fmt::format("{}{} {} {}", text.empty() ? "" : ", ", symbol, measured_text(derived->measured), unit);
  }
  return text;
}

std::string derivation_sentence(const StarAnswer& star) {
  std::string text;
  for (const auto& [symbol, value, unit] : shown_values) {
    const std::optional<Derived>& derived = star.*value;
    if (!derived || is_stated(*derived)) continue;
    text += fmt::format("{}{} from {}: {} {}", text.empty() ? "" : "; ", symbol, route_words(derived->route),
                        value_text(derived->measured), unit);
  }
  return text.empty() ? text : "Derived: " + text + ".";
}

}  // namespace hz::app
