// From a row of a list to its answer: what follows for the star and the planet, by which route, and what was assumed.
#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "hz/placement.hpp"
#include "hz/records.hpp"
#include "hz/settings.hpp"

namespace hz {

/// A quantity that follows from the row, with its 68 per cent half-widths and its route ("stated", "radius and teff",
/// …).
struct Derived {
  Measured measured;
  std::string route;
};

/// The route of a value that nothing in the row gives: 1 Earth mass.
inline constexpr std::string_view assumed_route = "assumed";

/// What a row's star comes to.
struct StarAnswer {
  std::optional<Derived> teff;
  std::optional<Derived> luminosity;
  std::optional<Derived> stellar_radius;
  std::optional<Derived> stellar_mass;
  std::optional<Derived> distance;
};

/// What a limit bounds.
enum class ZoneEdge { optimistic_inner, conservative_inner, conservative_outer, optimistic_outer };

/// One limit at one star.
struct LimitAtStar {
  const FluxLimit* limit = nullptr;
  std::vector<ZoneEdge> edges;  // empty for a further limit of the set
  double insolation = 0;        // Earth = 1
  bool held = false;
  std::optional<Measured> distance;          // au, when the luminosity is known
  std::optional<double> period;              // d, when the stellar mass is known too
  std::optional<double> angular_separation;  // mas, when the distance of the star is known too
};

enum class Verdict { inside, likely_inside, open, likely_outside, outside };
enum class Side { hot, cold };
[[nodiscard]] std::string_view word(Verdict verdict);
[[nodiscard]] std::string_view word(Side side);
[[nodiscard]] Verdict verdict_of(double probability, const VerdictThresholds& thresholds);

/// The zone limit nearest to a planet in ln S.
struct Margin {
  const FluxLimit* limit = nullptr;
  std::optional<double> distance;  // au from the planet to the limit; positive when the limit lies farther out
  double widths = 0;               // ln S - ln S_limit in its 68 per cent half-width on the side that faces the limit
};

/// All of the placement words for one planet.
struct PlanetAnswer {
  Derived insolation;                      // Earth = 1, orbit-averaged
  std::optional<Derived> semi_major_axis;  // au; empty when only an insolation is known
  std::optional<Derived> planet_radius;    // Earth
  Derived planet_mass;                     // Earth; what the planet-mass-dependent limit used
  double equilibrium_temperature = 0;      // K, at Settings::bond_albedo
  Probabilities probabilities;
  std::optional<double> zone_position;
  std::optional<Margin> margin;
  std::optional<Verdict> conservative;
  std::optional<Verdict> optimistic;
  std::optional<Side> side;
  std::optional<double>
      orbit_share;  // share of the orbit, in time, between the optimistic limits, central values; eccentric orbits only
  double merit = 0;
};

enum class Status { answered, set_aside };

/// The answer of one row. A row is set aside when `reason` is not empty; then only what could be had is filled in.
struct Answer {
  Status status = Status::answered;
  std::string reason;
  std::string reason_kind;  // a few words, the same for all rows of a kind: what the summary counts
  StarAnswer star;
  std::vector<LimitAtStar> limits;      // in the set's order; empty when the star has no answer
  std::optional<PlanetAnswer> planet;   // empty for a star without planet
  std::optional<PlacementInput> input;  // what the planet's placement was computed from
  std::vector<std::string> flags;       // words of the closed list in hz/flags.hpp
  std::string note;
};

/// Whether a row speaks of a planet: it names one or states something of an orbit. Otherwise it is a star.
[[nodiscard]] bool is_planet(const ListRow& row);

/// Answers a row; a pure function of the row and the settings. Rows whose planet cannot be answered are set
/// aside; the distances of the limits come without half-widths.
[[nodiscard]] Answer answer(const ListRow& row, const Settings& settings);

/// The star's part alone, for `bounds`: limits for a planet of 1 Earth mass, with half-widths of their distances.
[[nodiscard]] Answer answer_star(const ListRow& row, const Settings& settings);

/// The limit that bounds a zone at the answer's star; nullptr when the set has no such zone or the row no such answer.
[[nodiscard]] const LimitAtStar* find_edge(const Answer& answer, ZoneEdge edge);

}  // namespace hz
