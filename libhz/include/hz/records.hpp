// What a list says of a star and a planet, row by row, before anything follows from it.
#pragma once
#include <cstddef>
#include <memory>
#include <optional>
#include <string>
#include <vector>

#include "hz/measured.hpp"
#include "hz/quantity.hpp"
#include "hz/result.hpp"

namespace hz {

/// A cell that could not be read, as it stands in the list. Rare, so that fields only point to it.
struct Unread : Problem {
  std::string cell;
};

/// One quantity of one row: stated, absent, or present but unreadable. Canonical units (hz/quantity.hpp).
struct Field {
  std::optional<Measured> stated;
  std::shared_ptr<const Unread> problem;  // the cell holds something that is not a value; `stated` is then empty
};

/// How a list's planet mass came about.
enum class PlanetMassKind { unsaid, measured, minimum, from_radius };

struct StarRecord {
  std::string name;
  std::string id;
  std::string spectral_type;
  Field teff;                                                               // K
  Field luminosity;                                                         // nominal solar
  Field log_luminosity;                                                     // dex of nominal solar
  Field stellar_radius;                                                     // nominal solar
  Field stellar_mass;                                                       // solar
  Field log_g;                                                              // dex of cm s^-2
  Field stellar_density;                                                    // g cm^-3
  Field metallicity;                                                        // dex
  Field parallax;                                                           // mas
  Field distance;                                                           // pc
  Field magnitude_v, magnitude_b, magnitude_g, magnitude_bp, magnitude_rp;  // apparent, mag
  Field magnitude_j, magnitude_h, magnitude_k, magnitude_bol;
  Field color_bv, color_vk, color_vj, color_bp_rp;  // mag
  Field extinction_v;                               // A_V, mag
  Field reddening_bv;                               // E(B-V), mag
  Field companion_separation;                       // arcsec
  std::optional<int> number_of_stars;
};

struct PlanetRecord {
  std::string name;              // empty: the row is a star without a planet
  Field orbital_period;          // d
  Field semi_major_axis;         // au
  Field scaled_semi_major_axis;  // semi-major axis / stellar radius
  Field eccentricity;
  Field insolation;     // Earth = 1
  Field planet_radius;  // Earth
  Field planet_mass;    // Earth
  Field min_mass;       // Earth
  Field inclination;    // deg
  Field radius_ratio;   // planet radius / stellar radius
  Field transit_depth;  // fraction of the star's light
  std::optional<bool> circumbinary;
  PlanetMassKind planet_mass_kind = PlanetMassKind::unsaid;
  std::optional<bool> adopted;  // the solution adopted among several rows of one planet
};

/// A row of a list, read.
struct ListRow {
  std::size_t number = 0;  // 1 for the first data row
  std::size_t line = 0;    // where it starts in the file; 0 where lines mean nothing
  StarRecord star;
  PlanetRecord planet;
  std::string reference;
  std::optional<Problem>
      problem;                    // the row as a whole could not be read (ragged, over-long); it is set aside with this
  std::vector<std::string> kept;  // the input's own cells that travel along, as text
};

/// The field that holds a quantity; nullptr for one that records do not hold as a number.
[[nodiscard]] const Field* stated_field(const ListRow& row, Quantity quantity);
[[nodiscard]] Field* stated_field(ListRow& row, Quantity quantity);

}  // namespace hz
