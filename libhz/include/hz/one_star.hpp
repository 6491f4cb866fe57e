// Planets of one star whose rows say different things of it.
#pragma once
#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "hz/quantity.hpp"
#include "hz/ranking.hpp"

namespace hz {

/// Which star the planets of one star are answered with.
enum class OneStar {
  as_given,  // each with its own
  first,     // all with that of the first row that states any of compared_star_values()
  best,      // all with that of the row that states most of them with an error (a luminosity and its logarithm count
             // once), then with the smallest relative error of Teff and radius together, then the first
};

/// teff, luminosity, log_luminosity, stellar_radius, stellar_mass: by these are the rows of a star compared.
[[nodiscard]] std::span<const Quantity> compared_star_values();

/// A star whose planets' rows state different values of one quantity or more; limits are not compared.
struct StarConflict {
  std::vector<std::size_t> rows;     // all of its planets', in list order
  std::vector<Quantity> quantities;  // those that differ
  std::string what;                  // "teff 5100 to 5230, stellar_mass 0.9 to 1.1"
};

/// The stars of a list, compared.
struct StarsCompared {
  std::vector<StarConflict> conflicts;                 // in the order in which the stars first appear
  std::vector<std::optional<std::size_t>> taken_from;  // a row: where its star now comes from, if that changed a value
};

/// Compares the rows of each star's planets and, if so chosen, gives all of them one whole star record; the names stay
/// as each row spells them. One star is one name as folded_name() has it; rows without a star's name are left alone,
/// and so are stars without planets. For rows that are not answered yet: answers are not looked at. O(n log n).
[[nodiscard]] StarsCompared compare_stars(std::vector<Candidate>& candidates, OneStar choice);

}  // namespace hz
