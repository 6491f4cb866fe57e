#include "hz/companions.hpp"

#include <fmt/format.h>

#include "hz/spectral_type.hpp"
#include "words.hpp"

namespace hz {
namespace {

std::optional<Measured> separation_of(const StarRecord& star) {
  const auto& stated = star.companion_separation.stated;
  return stated && stated->value >= 0 ? stated : std::nullopt;
}

bool is_close(const Measured& separation, std::optional<double> distance, std::optional<double> outer_limit) {
  if (!distance || !outer_limit || separation.limit == LimitMark::lower) return false;
  return separation.value * *distance <= close_companion_factor * *outer_limit;  // arcsec pc = au
}

std::string in_words(const Measured& separation, std::optional<double> distance) {
  const char* const mark = separation.limit == LimitMark::upper   ? "less than "
                           : separation.limit == LimitMark::lower ? "more than "
                                                                  : "";
  const std::string text = fmt::format("a companion {}{} arcsec away", mark, separation.value);
  return distance ? fmt::format("{} ({:.3g} au on the sky)", text, separation.value * *distance) : text;
}

bool names_two(const std::string& spectral_type) {
  const auto type = read_spectral_type(spectral_type);
  return type && type->second;
}

}  // namespace

Companions companions_of(const StarRecord& star, const PlanetRecord& planet, std::optional<double> distance,
                         std::optional<double> outer_limit) {
  Companions found;
  const auto note = [&found](const std::string& reason) {
    found.why += (found.present ? "; " : "") + reason;
    found.present = true;
  };
  if (star.number_of_stars.value_or(1) >= 2) note(fmt::format("the list counts {} stars", *star.number_of_stars));
  if (names_two(star.spectral_type)) note("the spectral type " + words::quoted(star.spectral_type) + " names two");
  if (const auto separation = separation_of(star)) {
    note(in_words(*separation, distance));
    found.close = is_close(*separation, distance, outer_limit);
  }
  if (planet.circumbinary.value_or(false)) {
    note("the planet circles both stars");
    found.close = true;
  }
  return found;
}

}  // namespace hz
