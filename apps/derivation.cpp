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

void add(std::string& text, const char* symbol, const std::optional<Derived>& derived, const char* unit) {
  if (!derived || derived->route.starts_with("stated")) return;
  text += fmt::format("{}{} from {}: {}{}", text.empty() ? "" : "; ", symbol, route_words(derived->route),
                      measured_text(derived->measured), unit);
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

std::string derivation_sentence(const StarAnswer& star) {
  std::string text;
  add(text, "Teff", star.teff, " K");
  add(text, "L", star.luminosity, " L☉");
  add(text, "radius", star.stellar_radius, " R☉");
  add(text, "mass", star.stellar_mass, " M☉");
  add(text, "distance", star.distance, " pc");
  return text.empty() ? text : "How: " + text + ".";
}

}  // namespace hz::app
