#include "derivation.hpp"

#include <fmt/format.h>

#include <algorithm>

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

void add_derived(std::string& text, const char* symbol, const std::optional<Derived>& derived, const char* unit) {
  if (!derived || derived->route.starts_with("stated")) return;
  text += fmt::format("{}{} from {}: {}{}", text.empty() ? "" : "; ", symbol, route_words(derived->route),
                      value_text(derived->measured), unit);
}

void add_stated(std::string& text, const char* symbol, const std::optional<Derived>& derived, const char* unit) {
  if (!derived || !derived->route.starts_with("stated")) return;
  text += fmt::format("{}{} {}{}", text.empty() ? "" : ", ", symbol, measured_text(derived->measured), unit);
}

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
  add_stated(text, "Teff", star.teff, " K");
  add_stated(text, "L", star.luminosity, " L☉");
  add_stated(text, "radius", star.stellar_radius, " R☉");
  add_stated(text, "mass", star.stellar_mass, " M☉");
  add_stated(text, "distance", star.distance, " pc");
  return text;
}

std::string derivation_sentence(const StarAnswer& star) {
  std::string text;
  add_derived(text, "Teff", star.teff, " K");
  add_derived(text, "L", star.luminosity, " L☉");
  add_derived(text, "radius", star.stellar_radius, " R☉");
  add_derived(text, "mass", star.stellar_mass, " M☉");
  add_derived(text, "distance", star.distance, " pc");
  return text.empty() ? text : "Derived: " + text + ".";
}

}  // namespace hz::app
