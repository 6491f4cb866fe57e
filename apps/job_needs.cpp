#include "job_needs.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <span>

namespace hz::app {
namespace {

/// One way to a thing the job needs: a quantity, perhaps with a second one.
struct Way {
  Quantity first;
  std::optional<Quantity> with = std::nullopt;
};

struct Need {
  const char* what;
  std::span<const Way> ways;  // any of them will do, the first being the best
};

constexpr std::array<Way, 1> teff_ways{{{Quantity::teff}}};
constexpr std::array<Way, 3> luminosity_ways{
    {{Quantity::luminosity}, {Quantity::log_luminosity}, {Quantity::stellar_radius}}};
constexpr std::array<Way, 1> planet_ways{{{Quantity::planet}}};
constexpr std::array<Way, 4> orbit_ways{{{Quantity::orbital_period, Quantity::stellar_mass},
                                         {Quantity::semi_major_axis},
                                         {Quantity::scaled_semi_major_axis},
                                         {Quantity::insolation}}};

constexpr Need teff_need{"the effective temperature", teff_ways};
constexpr Need luminosity_need{"the luminosity", luminosity_ways};
constexpr Need planet_need{"names of planets", planet_ways};
constexpr Need orbit_need{"the orbit", orbit_ways};

bool met(const Need& need, const Understanding& understanding) {
  return std::any_of(need.ways.begin(), need.ways.end(), [&](const Way& way) {
    return understanding.knows(way.first) && (!way.with || understanding.knows(*way.with));
  });
}

std::string words(const Way& way) {
  return std::string(name(way.first)) + (way.with ? fmt::format(" with {}", name(*way.with)) : "");
}

std::string words(const Need& need) {
  std::string result;
  for (std::size_t i = 0; i < need.ways.size(); ++i)
    result += (i == 0 ? "" : i + 1 == need.ways.size() ? " or " : ", ") + words(need.ways[i]);
  return fmt::format("{} ({})", need.what, result);
}

std::string missing_for(const char* commands, std::span<const Need> needs, const Understanding& understanding) {
  std::string missing;
  for (const Need& need : needs) {
    if (!met(need, understanding)) missing += (missing.empty() ? " misses " : "; ") + words(need);
  }
  return fmt::format("{}{}.", commands, missing.empty() ? " has all it needs" : missing);
}

/// Insolation, or a scaled axis with Teff, places a planet without the star's luminosity.
bool luminosity_is_spared(const Understanding& understanding) {
  return understanding.knows(Quantity::insolation) || understanding.knows(Quantity::scaled_semi_major_axis);
}

}  // namespace

std::vector<std::string> what_is_missing(const Understanding& understanding) {
  std::vector<Need> for_planets = {planet_need, teff_need, orbit_need};
  if (!luminosity_is_spared(understanding)) for_planets.push_back(luminosity_need);
  return {missing_for("`bounds`", std::array{teff_need, luminosity_need}, understanding),
          missing_for("`rank` (also `check`, `draw`)", for_planets, understanding)};
}

}  // namespace hz::app
