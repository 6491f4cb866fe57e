#include "systems.hpp"

#include <cmath>

namespace hz::plots::testing {
namespace {

Measured measured(double value, double half_width) { return {value, half_width, half_width}; }

FigureStar star(const std::string& name, double teff, double luminosity) {
  FigureStar star;
  star.name = name;
  star.teff = measured(teff, 0.016 * teff);
  star.luminosity = measured(luminosity, 0.055 * luminosity);
  star.stellar_mass = 0.68;
  star.limits = four_limits(luminosity, 0.03);
  return star;
}

void add_eight(FigureStar& star, const std::vector<double>& distances, double width) {
  const std::string letters = "bcdefghi";
  for (std::size_t i = 0; i < distances.size(); ++i) {
    star.planets.push_back(planet(letters.substr(i, 1), distances[i], width * distances[i]));
    star.planets.back().radius = 0.8 + 0.4 * static_cast<double>(i % 4);
    star.planets.back().p_conservative = 0.13 * static_cast<double>(i);
  }
}

}  // namespace

std::vector<FigureLimit> four_limits(double luminosity, double width, bool held) {
  const auto limit = [&](const std::string& title, LimitRole role, double at_one) {
    const double distance = at_one * std::sqrt(luminosity);
    return FigureLimit{title, role, measured(distance, width * distance), held};
  };
  return {limit("recent Venus", LimitRole::optimistic_inner, 0.75),
          limit("runaway greenhouse", LimitRole::conservative_inner, 0.95),
          limit("maximum greenhouse", LimitRole::conservative_outer, 1.68),
          limit("early Mars", LimitRole::optimistic_outer, 1.77)};
}

FigurePlanet planet(const std::string& label, double semi_major_axis, double half_width) {
  FigurePlanet planet;
  planet.name = "Lantern 27 " + label;
  planet.label = label;
  planet.semi_major_axis = measured(semi_major_axis, half_width);
  planet.radius = 1.3;
  planet.p_conservative = 0.64;
  planet.p_optimistic = 0.9;
  return planet;
}

FigureStar lantern_27() {
  FigureStar system = star("Lantern 27", 4410, 0.165);
  system.teff = measured(4410, 70);
  system.luminosity = measured(0.165, 0.009);
  system.planets = {planet("b", 0.0625, 0.0012), planet("c", 0.171, 0.003), planet("d", 0.412, 0.012),
                    planet("e", 0.79, 0.02)};
  system.planets[0].p_conservative = 0.0;
  system.planets[1].p_conservative = 0.004;
  system.planets[2].span = OrbitSpan{0.362, 0.462};
  system.planets[3].span = OrbitSpan{0.77, 0.81};
  system.planets[3].p_conservative = 0.26;
  system.planets[3].radius = 2.6;
  return system;
}

FigureStar without_planets() { return star("Lantern 1", 5772, 1); }

FigureStar with_one_planet() {
  FigureStar system = star("Lantern 2", 5100, 0.4);
  system.planets = {planet("b", 0.7, 0.02)};
  return system;
}

FigureStar compact_in_zone() {
  FigureStar system = star("Lantern 61", 2566, 0.00055);
  system.limits = four_limits(0.00055, 0.02, true);
  add_eight(system, {0.0115, 0.0158, 0.0223, 0.0293, 0.0385, 0.0468, 0.0619, 0.0652}, 0.01);
  system.planets[3].radius.reset();
  return system;
}

FigureStar compact_inside() {
  FigureStar system = star("Lantern 8", 5800, 1.1);
  add_eight(system, {0.05, 0.06, 0.075, 0.09, 0.11, 0.13, 0.16, 0.2}, 0.03);
  return system;
}

FigureStar nearly_equal() {
  FigureStar system = star("Lantern 5", 4500, 0.18);
  system.stellar_mass.reset();
  system.planets = {planet("b", 0.412, 0.012), planet("c", 0.415, 0.012), planet("d", 0.9, 0.1)};
  system.planets[1].radius = 11.2;
  system.planets[2].radius.reset();
  system.planets[2].p_conservative.reset();
  system.planets[2].p_optimistic.reset();
  return system;
}

FigureStar far_apart() {
  FigureStar system = star("Lantern 9", 4410, 0.165);
  system.planets = {planet("b", 0.005, 0.0001), planet("c", 0.5, 0.1), planet("d", 100, 20)};
  system.planets[2].radius = 11;
  system.planets[2].span = OrbitSpan{70, 130};
  return system;
}

FigureStar with_long_name() {
  FigureStar system = lantern_27();
  system.name = "Lantern survey southern field 0012345678901234567890 component A with a remark";
  for (FigurePlanet& planet : system.planets) planet.label.clear();  // their whole names are written
  system.luminosity = {0.16512345, 0.0091234, 0.0123456};
  return system;
}

FigureStar with_strange_names() {
  FigureStar system = lantern_27();
  system.name = "\u706F\u7C60 \u0424\u043E\u043D\u0430\u0440\u044C \u03B1\u2609\n\tA\xFF";
  system.planets[1].label = "\u706F";
  system.planets[2].name = "<&\"> \u2295";
  system.planets[2].label.clear();
  return system;
}

std::vector<FigureStar> awkward_systems() {
  return {lantern_27(),   without_planets(), with_one_planet(), compact_in_zone(),   compact_inside(),
          nearly_equal(), far_apart(),       with_long_name(),  with_strange_names()};
}

FigureStar random_system(std::mt19937& source) {
  const auto uniform = [&](double low, double high) { return std::uniform_real_distribution(low, high)(source); };
  const auto chance = [&](double p) { return uniform(0, 1) < p; };
  const auto spread = [&](double low, double high) { return std::exp(uniform(std::log(low), std::log(high))); };
  FigureStar system = star("Lantern " + std::to_string(source() % 1000), uniform(2400, 7400), spread(4e-4, 20));
  const double luminosity = system.luminosity.value;
  system.limits = four_limits(luminosity, uniform(0, 0.15), chance(0.2));
  if (chance(0.2)) system.limits.resize(2);
  if (chance(0.3)) system.stellar_mass.reset();
  const std::size_t count = source() % 9;
  for (std::size_t i = 0; i < count; ++i) {
    const double distance = spread(0.02, 5) * std::sqrt(luminosity);
    FigurePlanet one = planet(std::string(1, static_cast<char>('b' + i)), distance, uniform(0, 0.3) * distance);
    one.radius = spread(0.3, 20);
    one.radius_is_limit = chance(0.1);
    one.p_conservative = uniform(0, 1);
    if (chance(0.3)) one.span = OrbitSpan{0.8 * distance, 1.2 * distance};
    if (chance(0.2)) one.radius.reset();
    if (chance(0.1)) one.p_conservative.reset();
    if (chance(0.1)) one.semi_major_axis = {distance, std::nullopt, std::nullopt};
    system.planets.push_back(one);
  }
  return system;
}

FigureOptions options(double width_mm) {
  FigureOptions options;
  options.width = width_mm * 72 / 25.4;
  options.limit_set = "Kopparapu et al. 2014";
  options.runaway_planet_mass = "1 M\u2295";
  options.order = "hottest first";
  return options;
}

}  // namespace hz::plots::testing
