#include "hz/sky.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <optional>
#include <string>
#include <utility>

#include "hz/constants.hpp"
#include "hz/measured_text.hpp"
#include "hz/require.hpp"
#include "words.hpp"

namespace hz {
namespace {

constexpr double degree = constants::pi / 180;  // rad
constexpr double arcsec_in_degrees = 1.0 / 3600;
constexpr std::size_t band_count = 1800;      // of 0.1 deg
constexpr double rounding_in_degrees = 1e-9;  // more than any error of the arithmetic, less than any star list's

// --- reading ---

enum class Unit { none, hours, degrees };

/// An angle as written: a sign, and one to three numbers.
struct WrittenAngle {
  bool negative = false;
  std::array<double, 3> parts{};
  std::size_t count = 0;
  Unit unit = Unit::none;

  [[nodiscard]] double value() const { return (negative ? -1 : 1) * (parts[0] + parts[1] / 60 + parts[2] / 3600); }
  /// 60 seconds are read: lists print a rounded 59.999 so.
  [[nodiscard]] bool carries() const { return parts[1] >= 60 || parts[2] > 60; }
};

/// The signs of degrees, minutes and seconds as the letters d, m and s, all letters small.
std::string in_letters(std::string_view text) {
  static constexpr std::array<std::pair<std::string_view, std::string_view>, 12> signs{{{"°", "d"},
                                                                                        {"º", "d"},
                                                                                        {"deg", "d"},
                                                                                        {"''", "s"},
                                                                                        {"\"", "s"},
                                                                                        {"″", "s"},
                                                                                        {"'", "m"},
                                                                                        {"′", "m"},
                                                                                        {"\u2212", "-"},
                                                                                        {"\u2013", "-"},
                                                                                        {"\u00a0", " "},
                                                                                        {"\t", " "}}};
  std::string out = words::lower_case(text);
  for (const auto& [from, to] : signs) out = words::replaced(out, from, to);
  return std::string(words::trimmed(out));
}

/// Walks along an angle in letters; what it takes never comes back.
class AngleReader {
public:
  explicit AngleReader(std::string_view text) : rest_(text) {}

  /// Empty when the text is not an angle from its first character to its last.
  std::optional<WrittenAngle> read() {
    angle_.negative = take('-');
    if (!angle_.negative) take('+');
    skip_blanks();
    while (angle_.count < 3 && !rest_.empty()) {
      if (!part()) return std::nullopt;
    }
    if (angle_.count == 0 || !rest_.empty()) return std::nullopt;
    return angle_;
  }

private:
  bool take(char c) {
    if (!rest_.starts_with(c)) return false;
    rest_.remove_prefix(1);
    return true;
  }
  void skip_blanks() {
    while (take(' ')) {
    }
  }
  /// A number and what stands behind it; only the last number may have decimals.
  bool part() {
    const auto digits = rest_.substr(0, rest_.find_first_not_of("0123456789."));
    const auto value = parse_number(digits);
    if (!value) return false;
    rest_.remove_prefix(digits.size());
    angle_.parts[angle_.count] = *value;
    skip_blanks();
    const bool colon = angle_.count < 2 && take(':');
    if (!colon) letter();
    skip_blanks();
    ++angle_.count;
    return rest_.empty() ? !colon : digits.find('.') == std::string_view::npos;
  }
  void letter() {
    if (angle_.count == 1) take('m');
    if (angle_.count == 2) take('s');
    if (angle_.count > 0) return;
    if (take('h')) {
      angle_.unit = Unit::hours;
    } else if (take('d')) {
      angle_.unit = Unit::degrees;
    }
  }

  std::string_view rest_;
  WrittenAngle angle_;
};

Problem refused(ProblemCode code, std::string_view column, std::string_view text, std::string_view why) {
  return {code, std::string(column),
          std::string(column) + " holds " + words::quoted(words::trimmed(text)) + ", " + std::string(why)};
}

/// One number alone, with its exponent if it has one.
std::optional<WrittenAngle> decimal(std::string_view text) {
  const auto value = text.find_first_of("dh: ") == std::string_view::npos ? parse_number(text) : std::nullopt;
  if (!value) return std::nullopt;
  return WrittenAngle{std::signbit(*value), {std::abs(*value)}, 1, Unit::none};
}

Result<WrittenAngle> read_angle(std::string_view text, std::string_view column) {
  if (is_missing(text)) return Problem{ProblemCode::missing, std::string(column), "no " + std::string(column)};
  const std::string letters = in_letters(text);
  auto angle = decimal(letters);
  if (!angle) angle = AngleReader(letters).read();
  if (!angle) return refused(ProblemCode::unreadable, column, text, "which is not an angle");
  if (angle->carries())
    return refused(ProblemCode::out_of_range, column, text, "with minutes or seconds of 60 and more");
  return *angle;
}

// --- finding ---

bool is_valid(const SkyPosition& position) {
  return position.ra >= 0 && position.ra < 360 && std::abs(position.dec) <= 90;
}

/// How far in right ascension, in deg, a circle reaches on either side of its centre.
double reach_in_ra(double dec, double radius_deg) {
  if (std::abs(dec) + radius_deg >= 90) return 360;  // a pole lies within
  const double sine = std::sin(radius_deg * degree) / std::cos(dec * degree);
  return std::asin(std::min(sine, 1.0)) / degree + rounding_in_degrees;
}

std::size_t band_of(double dec) {
  const double place = (dec + 90) / 180 * static_cast<double>(band_count);
  return static_cast<std::size_t>(std::clamp(place, 0.0, static_cast<double>(band_count - 1)));
}

}  // namespace

Result<double> read_right_ascension(std::string_view text) {
  const Result<WrittenAngle> angle = read_angle(text, "ra");
  if (!angle) return angle.error();
  const bool hours = angle->unit == Unit::hours || (angle->unit == Unit::none && angle->count > 1);
  const double value = angle->value() * (hours ? 15 : 1);
  if (!(value >= 0 && value <= 360)) {
    return refused(ProblemCode::out_of_range, "ra", text, hours ? "beyond 0 to 24 hours" : "beyond 0 to 360 degrees");
  }
  return value == 360 ? 0 : std::abs(value);  // never -0
}

Result<double> read_declination(std::string_view text) {
  const Result<WrittenAngle> angle = read_angle(text, "dec");
  if (!angle) return angle.error();
  if (angle->unit == Unit::hours) return refused(ProblemCode::unreadable, "dec", text, "which is in hours");
  const double value = angle->value();
  if (!(std::abs(value) <= 90)) return refused(ProblemCode::out_of_range, "dec", text, "beyond -90 to 90 degrees");
  return value;
}

double angular_distance(const SkyPosition& a, const SkyPosition& b) {
  const double half_ra = std::sin(std::remainder(b.ra - a.ra, 360.0) * degree / 2);
  const double across = std::sin(std::remainder(b.ra - a.ra, 360.0) * degree) * std::cos(b.dec * degree);
  const double rise = (b.dec - a.dec) * degree;
  // The usual atan2 form, its sine and cosine written as those of the rise and a rest, so that nothing cancels.
  const double rest = 2 * half_ra * half_ra * std::cos(b.dec * degree);
  const double along = std::sin(rise) + rest * std::sin(a.dec * degree);
  const double cosine = std::cos(rise) - rest * std::cos(a.dec * degree);
  return std::atan2(std::hypot(across, along), cosine) / degree / arcsec_in_degrees;
}

SkyIndex::SkyIndex(std::span<const SkyPosition> positions) : bands_(band_count) {
  for (std::size_t i = 0; i < positions.size(); ++i) {
    HZ_REQUIRE(is_valid(positions[i]));
    bands_[band_of(positions[i].dec)].push_back({positions[i], i});
  }
  for (auto& band : bands_) {
    std::sort(band.begin(), band.end(), [](const Entry& a, const Entry& b) { return a.position.ra < b.position.ra; });
  }
}

std::span<const SkyIndex::Entry> SkyIndex::stretch(std::size_t band, double first_ra, double last_ra) const {
  const auto& entries = bands_[band];
  const auto first = std::lower_bound(entries.begin(), entries.end(), first_ra,
                                      [](const Entry& entry, double ra) { return entry.position.ra < ra; });
  const auto last = std::upper_bound(first, entries.end(), last_ra,
                                     [](double ra, const Entry& entry) { return ra < entry.position.ra; });
  return {first, last};
}

std::vector<SkyIndex::Match> SkyIndex::matches(const SkyPosition& position, double radius) const {
  HZ_REQUIRE(is_valid(position) && radius >= 0);
  const double radius_deg = std::min(radius * arcsec_in_degrees + rounding_in_degrees, 180.0);
  const double reach = reach_in_ra(position.dec, radius_deg);
  std::vector<Match> found;
  for (std::size_t band = band_of(position.dec - radius_deg); band <= band_of(position.dec + radius_deg); ++band) {
    // As it stands and beyond 0 h on either side; a reach all around has seen the whole band at once.
    for (const double turn : {0.0, -360.0, 360.0}) {
      if (turn != 0 && reach >= 180) continue;
      const double centre = position.ra + turn;
      for (const Entry& entry : stretch(band, centre - reach, centre + reach)) {
        const double distance = angular_distance(position, entry.position);
        if (distance <= radius) found.push_back({entry.index, distance});
      }
    }
  }
  std::sort(found.begin(), found.end(), [](const Match& a, const Match& b) {
    return std::pair(a.distance, a.index) < std::pair(b.distance, b.index);
  });
  return found;
}

}  // namespace hz
