#include "hz/flags.hpp"

#include <algorithm>

namespace hz {
namespace {

constexpr FlagInfo infos[] = {
    {flag::held, "Teff lies outside the fitted range by up to 300 K; the limits are held at its end"},
    {flag::beyond_planet_mass,
     "the planet's mass lies outside the fits' 0.1-5 Earth masses, or only a limit that leaves it there is known"},
    {flag::evolved,
     "the host is not on the main sequence (log g below 4.0 or radius above twice the main sequence's); the fits are "
     "for dwarfs"},
    {flag::min_mass_used, "the planet's mass follows from its minimum mass, the inclination being isotropic"},
    {flag::mass_from_radius, "the planet's mass follows from its radius (Chen & Kipping 2017, with its scatter)"},
    {flag::planet_mass_assumed, "no usable mass or radius: 1 Earth mass assumed"},
    {flag::circular_assumed, "no eccentricity given: a circular orbit assumed"},
    {flag::eccentricity_limit, "the eccentricity is an upper limit: a half-normal with 95 % below it"},
    {flag::main_sequence_assumed, "a relation that holds for main-sequence stars gave a value that was used"},
    {flag::extinction_ignored, "photometry of a star beyond 100 pc was used without an extinction, none being given"},
    {flag::distance_prior,
     "the parallax is not above ten times its error: the distance leans on a prior (Bailer-Jones 2015)"},
    {flag::companion, "the list says that the star is not single; the light of other stars is left out"},
    {flag::close_companion,
     "a companion within ten times the outer zone limit, or a planet that circles both stars: no verdict is firmer "
     "than "
     "likely"},
    {flag::assumed_error,
     "the list gives no half-width (or a printed 0) for this quantity; the documented one was assumed"},
    {flag::wide_error,
     "the lower half-width is larger than the value; the distribution is cut where the quantity ends, at 0"},
    {flag::limit_ignored, "this quantity is only a limit; another route was taken"},
    {flag::inconsistent,
     "the list states this quantity twice, beyond 3 sigma and 10 % apart, and both values stand in the note; for star: "
     "rows of its planets state different stars"},
};

}  // namespace

std::span<const FlagInfo> all_flags() { return infos; }

void Flags::raise(std::string_view word) {
  if (std::find(words_.begin(), words_.end(), word) == words_.end()) words_.emplace_back(word);
}

void Flags::raise(std::string_view word, Quantity quantity) { raise(std::string(word) + std::string(name(quantity))); }

}  // namespace hz
