// A published relation y(x) of stars or planets: where it holds, its scatter, and what it was built on. Read from
// catalogs/relations (embedded at build time).
#pragma once
#include <functional>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "hz/flux_limit.hpp"

namespace hz {

/// y = f(x) with everything a user of it must know. Units stand in `x_unit` and `y_unit`.
class Relation {
public:
  /// f at this x and the 68 per cent scatter of y about it, both in y's unit; x is first moved into the range and must
  /// be a number. Where pieces do not join, the end belongs to the piece above.
  [[nodiscard]] double operator()(double at) const;
  [[nodiscard]] double scatter(double at) const;
  /// dy/dx of the piece that this x lies on: a difference over a small step that crosses neither its ends nor the
  /// range's.
  [[nodiscard]] double slope(double at) const;
  [[nodiscard]] const Range& range() const { return range_; }

  std::string key;    // "bc_g_andrae18"
  std::string label;  // as it stands in a route: "BC_G(Teff)"
  std::string x;      // "teff", "color_vk", "absolute_magnitude_k", "spectral_subtype", "log_stellar_mass", …
  std::string y;      // "bc_g", "teff", "log_luminosity", "stellar_radius", …
  std::string x_unit, y_unit;
  std::string citation;  // "Andrae et al. 2018, A&A 616, A8"
  std::string doi;
  std::string provenance;      // how far the digits were checked
  std::string scatter_source;  // where the scatter comes from: printed, measured here on what, or adopted
  std::string warning;         // one sentence, or empty
  bool main_sequence = false;  // holds for dwarfs only
  /// Bolometric magnitude of the Sun that a bolometric correction was built with; empty for other relations.
  std::optional<double> solar_bolometric_magnitude;

private:
  friend class RelationReader;
  Range range_;
  std::vector<double> breaks_;             // where pieces meet, inside the range, rising
  std::function<double(double)> value_;    // inside the range
  std::function<double(double)> scatter_;  // inside the range, y's unit
};

/// The relation of this key; a broken precondition when there is none.
[[nodiscard]] const Relation& relation(std::string_view key);
[[nodiscard]] std::span<const Relation> all_relations();

}  // namespace hz
