// Positions on the sky: reading them, how far they lie apart, and finding those near one.
#pragma once
#include <cstddef>
#include <span>
#include <string_view>
#include <vector>

#include "hz/result.hpp"

namespace hz {

struct SkyPosition {
  double ra = 0;   // right ascension, deg, 0 <= ra < 360
  double dec = 0;  // declination, deg, -90 to 90
};

/// Reads a right ascension: decimal degrees ("217.42895", "217.42895d"), decimal hours with their letter ("14.4952h"),
/// or hours, minutes and seconds ("14 29 42.95", "14:29:42.95", "14h29m42.95s", "14 29.7"). Degrees, minutes and
/// seconds of arc carry their sign of degrees ("217d25m44.2s").
///
/// Units     the result in deg; 360 deg and 24 h are 0.
/// Errors    missing; unreadable; out_of_range: below 0 or above 360 deg (24 h), minutes or seconds of 60 and more (60
///           seconds exactly are a rounded 59.999 and are read).
[[nodiscard]] Result<double> read_right_ascension(std::string_view text);

/// Reads a declination: decimal degrees ("-62.6795", "+4.69"), or degrees, minutes and seconds of arc ("-62 40 46.2",
/// "-62:40:46.2", "-62d40m46.2s", "-62°40′46.2″"). The sign counts for all of it, also in "-00 12 30".
///
/// Errors    as above; out_of_range beyond -90 to 90 deg.
[[nodiscard]] Result<double> read_declination(std::string_view text);

/// Angle between two positions, arcsec, 0 to 648000.
///
/// Error     1e-9 arcsec at every angle: differences are formed before their sines, so small angles keep their digits.
[[nodiscard]] double angular_distance(const SkyPosition& a, const SkyPosition& b);

/// Positions, sorted for finding those near a place.
class SkyIndex {
public:
  /// A position that was found: its place in the list the index was built from.
  struct Match {
    std::size_t index = 0;
    double distance = 0;  // arcsec
  };

  /// Each position as in SkyPosition; a broken precondition otherwise.
  explicit SkyIndex(std::span<const SkyPosition> positions);

  /// All positions within `radius` arcsec (that far included), the nearest first, equally near ones in the list's
  /// order.
  ///
  /// Poles and the meridian of 0 h are no borders. Time grows as log(size) and with the number of positions in the
  /// bands of declination that the radius reaches, within its reach in right ascension.
  [[nodiscard]] std::vector<Match> matches(const SkyPosition& position, double radius) const;

private:
  struct Entry {
    SkyPosition position;
    std::size_t index = 0;
  };
  /// Of one band, from one right ascension to another, both included.
  [[nodiscard]] std::span<const Entry> stretch(std::size_t band, double first_ra, double last_ra) const;

  std::vector<std::vector<Entry>> bands_;  // from the south, each by right ascension
};

}  // namespace hz
