// The top of a ranking as a table to read, and the summary of what became of the rows.
#pragma once
#include <cstddef>
#include <string>
#include <vector>

#include "console.hpp"
#include "hz/ranking.hpp"
#include "hz/settings.hpp"

namespace hz::app {

/// The first `top` places: place, planet, Teff, insolation, radius or mass, P of both zones, verdict, flags. A line
/// marks where the planets beyond the fits' masses begin.
[[nodiscard]] std::string ranking_table(const std::vector<Candidate>& candidates, const std::vector<Place>& places,
                                        std::size_t top, const Settings& settings, const Console& console);

/// "Limits: K14, …; asymmetric values read as medians; …": what every output of a placement names.
[[nodiscard]] std::string basis_sentence(const Settings& settings);

/// Rows read, answered, cut, set aside by reason; flags; planets per verdict; planets within and beyond the fits'
/// masses.
[[nodiscard]] std::vector<std::string> ranking_summary(const std::vector<Candidate>& candidates,
                                                       const std::vector<Place>& places, const Settings& settings);

/// Flags in words short enough for a line of a table: "evolved, errors assumed (2)".
[[nodiscard]] std::string short_flags(const std::vector<std::string>& flags);

}  // namespace hz::app
