// Rows written in a line, for tests of what follows from them.
#pragma once
#include <algorithm>
#include <string>

#include "hz/answer.hpp"

namespace hz::testing {

/// A value as a list prints it, with whatever half-widths it has.
inline Field value(double x, std::optional<double> minus = {}, std::optional<double> plus = {}) {
  return {Measured{x, minus, plus, LimitMark::none, false}, {}};
}
/// A value typed by hand without half-widths.
inline Field exactly(double x) { return {Measured{x, {}, {}, LimitMark::none, true}, {}}; }
inline Field below(double x) { return {Measured{x, {}, {}, LimitMark::upper, false}, {}}; }
inline Field above(double x) { return {Measured{x, {}, {}, LimitMark::lower, false}, {}}; }
inline Field unreadable(const std::string& column) {
  const Problem problem{ProblemCode::unreadable, column, column + " holds \"4553+15-\", which is not a value"};
  return {{}, std::make_shared<const Unread>(Unread{problem, "4553+15-"})};
}

inline const LimitSet& set_named(std::string_view key) { return *LimitCatalog::published().find(key); }

inline Settings settings_of(std::string_view key = default_limit_set) {
  Settings settings;
  settings.limits = &set_named(key);
  return settings;
}

/// Everything known exactly: L = 1, a = 1 au, so S = 1.
inline ListRow earth() {
  ListRow row;
  row.number = 1;
  row.star.name = "Sun";
  row.planet.name = "Earth";
  row.star.teff = exactly(5772);
  row.star.luminosity = exactly(1);
  row.planet.semi_major_axis = exactly(1);
  row.planet.eccentricity = exactly(0);
  row.planet.planet_mass = exactly(1);
  return row;
}

/// The same without a luminosity and an orbit, for routes to fill in.
inline ListRow bare_earth() {
  ListRow row = earth();
  row.star.luminosity = {};
  row.planet.semi_major_axis = {};
  return row;
}

inline bool has_flag(const Answer& answer, std::string_view word) {
  return std::find(answer.flags.begin(), answer.flags.end(), word) != answer.flags.end();
}

/// A flag that begins so.
inline bool has_flag_like(const Answer& answer, std::string_view start) {
  return std::any_of(answer.flags.begin(), answer.flags.end(),
                     [&](const std::string& f) { return f.starts_with(start); });
}

}  // namespace hz::testing
