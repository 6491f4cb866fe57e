// 200 awkward placements: what real lists do at their worst.
#pragma once
#include <cmath>
#include <string>
#include <vector>

#include "hz/constants.hpp"
#include "hz/placement.hpp"

namespace hz::test {

struct AwkwardCase {
  std::string name;
  PlacementInput input;
  BeyondRange beyond = BeyondRange::hold;
};

inline constexpr double infinite = HUGE_VAL;
inline constexpr Domain positive{0, infinite};

inline Distribution spread(double value, double minus, double plus, Asymmetry asymmetry, Domain domain = positive) {
  if (minus + plus == 0) return Distribution::exact(value);
  return Distribution::two_piece(value, minus * value, plus * value, asymmetry, domain);
}

/// Relative half-widths of the main input: tiny, usual, huge, asymmetric 5:1 both ways, one-sided both ways.
struct Widths {
  const char* name;
  double minus, plus;
};
inline constexpr Widths main_widths[] = {{"tiny", 1e-4, 1e-4},  {"usual", 0.06, 0.06},   {"huge", 0.6, 0.8},
                                         {"up 5:1", 0.04, 0.2}, {"down 5:1", 0.2, 0.04}, {"only up", 0, 0.1},
                                         {"only down", 0.1, 0}};

/// Teff, its half-width (K) and the policy: inside the fits, straddling both ends, wide, known.
struct Star {
  const char* name;
  double teff, minus, plus;
  BeyondRange beyond;
};
inline constexpr Star stars[] = {{"G", 5700, 60, 60, BeyondRange::hold},
                                 {"at 2600", 2600, 80, 60, BeyondRange::hold},
                                 {"at 2600 refused", 2600, 80, 60, BeyondRange::refuse},
                                 {"below 2400", 2380, 60, 120, BeyondRange::hold},
                                 {"at 7200", 7190, 150, 150, BeyondRange::hold},
                                 {"wide", 4400, 900, 500, BeyondRange::hold},
                                 {"known", 3500, 0, 0, BeyondRange::hold}};

/// What kind of row it is.
enum class Kind {
  luminosity_and_axis,
  radius_and_period,
  scaled_axis,
  stated_insolation,
  log_luminosity_eccentric,
  eccentric
};

inline PlacementInput make(Kind kind, const Star& star, const Widths& widths, Asymmetry asymmetry, double insolation,
                           double mass_sigma) {
  PlacementInput input;
  input.teff = star.minus + star.plus == 0
                   ? Distribution::exact(star.teff)
                   : Distribution::two_piece(star.teff, star.minus, star.plus, asymmetry, positive);
  const double ln_teff = 4 * std::log(star.teff / constants::solar_teff);
  input.planet_mass = mass_sigma > 0
                          ? Distribution::two_piece(1.2, std::min(1.0, mass_sigma), mass_sigma, asymmetry, positive)
                          : Distribution::exact(1);
  switch (kind) {
    case Kind::luminosity_and_axis:
      input.terms = {
          {Quantity::luminosity, spread(0.3, widths.minus, widths.plus, asymmetry), 1, false},
          {Quantity::semi_major_axis, spread(std::sqrt(0.3 / insolation), 0.023, 0.03, asymmetry), -2, false}};
      break;
    case Kind::radius_and_period: {
      input.curve.power = 4;
      input.offset = -4 * std::log(constants::solar_teff);
      const double radius = 0.5;
      const double axis_squared = radius * radius * std::exp(ln_teff) / insolation;
      const double mass = 0.5;
      const double period = std::pow(axis_squared, 0.75) / std::sqrt(mass);
      input.terms = {{Quantity::stellar_radius, spread(radius, widths.minus, widths.plus, asymmetry), 2, false},
                     {Quantity::stellar_mass, spread(mass, 0.05, 0.09, asymmetry), -2.0 / 3, false},
                     {Quantity::orbital_period, spread(period, 1e-3, 1e-3, asymmetry), -4.0 / 3, false}};
      break;
    }
    case Kind::scaled_axis: {
      input.curve.power = 4;
      const double scaled = 50;
      input.offset = std::log(insolation * scaled * scaled) - ln_teff - 4 * std::log(constants::solar_teff);
      input.terms = {
          {Quantity::scaled_semi_major_axis, spread(scaled, widths.minus, widths.plus, asymmetry), -2, false}};
      break;
    }
    case Kind::stated_insolation:
      input.terms = {{Quantity::insolation, spread(insolation, widths.minus, widths.plus, asymmetry), 1, false}};
      break;
    case Kind::log_luminosity_eccentric:
      input.terms = {
          {Quantity::log_luminosity,
           Distribution::two_piece(-1, std::max(widths.minus, 0.01), widths.plus, asymmetry, {-infinite, infinite}), 1,
           true},
          {Quantity::semi_major_axis, spread(std::sqrt(0.1 / insolation), 0.05, 0.05, asymmetry), -2, false}};
      input.eccentricity = Distribution::below(0.4, {0, 1});
      break;
    case Kind::eccentric:
      input.terms = {
          {Quantity::luminosity, spread(0.3, widths.minus, widths.plus, asymmetry), 1, false},
          {Quantity::semi_major_axis, spread(std::sqrt(0.3 / insolation) * 1.5, 0.01, 0.01, asymmetry), -2, false}};
      input.eccentricity = Distribution::two_piece(0.9, 0.15, 0.05, asymmetry, {0, 1});
      break;
  }
  return input;
}

/// The grid, walked with strides that share no factor so that 200 cases meet every pair of neighbours.
inline std::vector<AwkwardCase> awkward_cases() {
  constexpr Kind kinds[] = {Kind::luminosity_and_axis, Kind::radius_and_period,        Kind::scaled_axis,
                            Kind::stated_insolation,   Kind::log_luminosity_eccentric, Kind::eccentric};
  constexpr double insolations[] = {0.92, 1.0, 0.25, 0.21, 1.6, 0.5, 1.1, 0.33};  // on edges, between them, far in
  constexpr double mass_sigmas[] = {0, 0.3, 3, 0, 0.05};
  std::vector<AwkwardCase> cases;
  for (std::size_t i = 0; i < 200; ++i) {
    const Kind kind = kinds[i % std::size(kinds)];
    const Widths& widths = main_widths[(i / 2) % std::size(main_widths)];
    const Star& star = stars[(i / 3) % std::size(stars)];
    const Asymmetry asymmetry = i % 4 < 2 ? Asymmetry::median : Asymmetry::mode;
    const double insolation = insolations[(i / 5) % std::size(insolations)];
    const double mass_sigma = mass_sigmas[(i / 7) % std::size(mass_sigmas)];
    AwkwardCase found;
    found.name =
        std::to_string(i) + " kind " + std::to_string(static_cast<int>(kind)) + ", " + star.name + ", " + widths.name;
    found.input = make(kind, star, widths, asymmetry, insolation, mass_sigma);
    found.beyond = star.beyond;
    cases.push_back(found);
  }
  return cases;
}

}  // namespace hz::test
