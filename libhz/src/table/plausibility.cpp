#include "table/plausibility.hpp"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <array>
#include <set>

#include "hz/table/peeked_table.hpp"
#include "hz/units.hpp"
#include "record_fields.hpp"
#include "table/column_map_text.hpp"
#include "words.hpp"

namespace hz {
namespace {

// What else a column may hold.
struct Reading {
  Quantity quantity;
  std::string_view unit;
};

// Between which medians the lists of zone targets lie, in the canonical unit, and why. They are wide on purpose: a list
// that is merely unusual must pass. "Common practice" marks a bound that nature does not set.
struct Plausible {
  Quantity quantity;
  double low;
  double high;
  std::string_view reason;
  std::vector<Reading> others;
};

const std::vector<Plausible>& plausible_medians() {
  using enum Quantity;
  static const std::vector<Plausible> table{
      {teff, 300, 3e5, "stars are hotter than 300 K and cooler than 300,000 K", {{teff, "kK"}, {teff, "log(K)"}}},
      {luminosity, 0, 1e7, "no star reaches 1e7 Lsun", {{luminosity, "W"}, {luminosity, "erg/s"}}},
      {log_luminosity,
       -8,
       7,
       "no star reaches 1e7 Lsun",
       {{luminosity, "solLum"}, {log_luminosity, "log(W)"}, {log_luminosity, "log(erg/s)"}}},
      {stellar_radius,
       1e-3,
       3e3,
       "the smallest stars are white dwarfs of 0.01 Rsun, the largest have 2000 Rsun",
       {{stellar_radius, "km"}, {stellar_radius, "m"}, {stellar_radius, "cm"}}},
      {stellar_mass,
       1e-3,
       300,
       "no star exceeds 300 Msun",
       {{stellar_mass, "jupiterMass"}, {stellar_mass, "earthMass"}, {stellar_mass, "kg"}, {stellar_mass, "g"}}},
      // The densest stars of the main sequence have about 100 g cm^-3; lists of white dwarfs state radii.
      {stellar_density, 0, 300, "stars of the main sequence stay below 150 g/cm3", {{stellar_density, "kg/m3"}}},
      // A logarithm of anything from a supergiant to a neutron star; the thing itself has no map line.
      {log_g, -3, 15, "a supergiant has about 0 and a white dwarf 8; log10 of cm/s2 is meant", {}},
      // Common practice below: lists of nearby stars in arcsec have 0.01 to 0.77, so that a median below 0.8 is theirs
      // unless the file itself says mas.
      {parallax,
       0.8,
       800,
       "the nearest star has 769 mas, and a median below 0.8 mas lies beyond 1 kpc",
       {{parallax, "arcsec"}, {parallax, "mas"}, {parallax, "uas"}}},
      {distance,
       1.3,
       1e5,
       "the nearest star is at 1.30 pc, and the Galaxy ends within 1e5 pc",
       {{distance, "kpc"}, {parallax, "arcsec"}, {distance, "AU"}, {distance, "km"}, {distance, "m"}}},
      {orbital_period,
       0.2,
       1e6,
       "the shortest known orbit about a star like ours takes 0.2 d",
       {{orbital_period, "yr"}, {orbital_period, "h"}, {orbital_period, "s"}}},
      {semi_major_axis,
       3e-3,
       1e5,
       "0.005 AU is the surface of the Sun, and at 1e5 AU a planet is lost to other stars",
       {{semi_major_axis, "km"}, {semi_major_axis, "m"}, {semi_major_axis, "cm"}}},
      {eccentricity, 0, 1, "a closed orbit has less than 1", {{eccentricity, "%"}}},
      // Orbits in random directions: 0.2 % have less than 3.2 deg; transiting planets have nearly 90.
      {inclination, 3.2, 180, "few orbits are seen that nearly face-on", {{inclination, "rad"}}},
      // Common practice: a handful of planets are smaller than 0.3 or lighter than 0.05, no list's median.
      {planet_radius,
       0.3,
       60,
       "few known planets are smaller than 0.3 Rearth, and none reaches 60",
       {{planet_radius, "jupiterRad"}, {planet_radius, "solRad"}, {planet_radius, "km"}, {planet_radius, "m"}}},
      {planet_mass,
       0.05,
       5e4,
       "few known planets are lighter than 0.05 Mearth, and 5e4 is a star",
       {{planet_mass, "jupiterMass"}, {planet_mass, "solMass"}, {planet_mass, "kg"}, {planet_mass, "g"}}},
      {min_mass,
       0.05,
       5e4,
       "few known planets are lighter than 0.05 Mearth, and 5e4 is a star",
       {{min_mass, "jupiterMass"}, {min_mass, "solMass"}, {min_mass, "kg"}, {min_mass, "g"}}},
      {insolation,
       0,
       1e5,
       "the hottest known planets get 5e4 times Earth's sunlight",
       {{insolation, "W/m2"}, {insolation, "erg/s/cm2"}}},
      {transit_depth,
       5e-6,
       0.3,
       "a fraction of the star's light is meant; no planet hides a third of a star, and none of 5e-6 was seen",
       {{transit_depth, "%"}, {transit_depth, "ppt"}, {transit_depth, "ppm"}, {transit_depth, "mmag"}}},
  };
  return table;
}

// A file that says "mas" itself may mean it up to 10 kpc.
constexpr double smallest_stated_parallax = 0.1;

constexpr std::size_t fewest_numbers = 3;
constexpr std::size_t fewest_for_spread = 5;

bool is_logarithm(Quantity quantity) { return quantity == Quantity::log_luminosity || quantity == Quantity::log_g; }

double median(std::vector<double> numbers) {
  const auto middle = numbers.begin() + static_cast<std::ptrdiff_t>(numbers.size() / 2);
  std::nth_element(numbers.begin(), middle, numbers.end());
  return *middle;
}

// One value column, its numbers as printed.
class Judgement {
public:
  Judgement(const UnderstoodList& list, const UnderstoodColumn& column, std::span<const Chunk> first)
      : list_(list), column_(column), conversion_(conversion(column.quantity, column.unit).value_or(Conversion{})) {
    std::size_t rows = 0;
    for (const Chunk& chunk : first) {
      for (std::size_t row = 0; row < chunk.rows() && rows < telling_rows; ++row, ++rows) {
        if (const auto number = list.plan.printed(chunk, row, column)) numbers_.push_back(*number);
      }
    }
  }

  [[nodiscard]] std::optional<Doubt> doubt() const {
    if (column_.quantity == Quantity::luminosity && has_negatives()) return of_negatives();
    if (column_.quantity == Quantity::log_luminosity && looks_linear()) return of_linear();
    for (const Plausible& plausible : plausible_medians()) {
      if (plausible.quantity == column_.quantity) return of_median(plausible);
    }
    return std::nullopt;
  }

private:
  // Two different ones and a tenth of all: a single sentinel such as -99 is not a logarithm.
  [[nodiscard]] bool has_negatives() const {
    const auto negatives = below_zero();
    const std::set<double> different(negatives.begin(), negatives.end());
    return numbers_.size() >= fewest_numbers && different.size() >= 2 && 10 * negatives.size() >= numbers_.size();
  }
  [[nodiscard]] std::vector<double> below_zero() const {
    std::vector<double> out;
    std::copy_if(numbers_.begin(), numbers_.end(), std::back_inserter(out), [](double x) { return x < 0; });
    return out;
  }
  [[nodiscard]] Doubt of_negatives() const {
    return doubt_that(fmt::format("column {} holds numbers below 0 ({} of {}), which no luminosity is; it looks like "
                                  "log_luminosity",
                                  header(), below_zero().size(), numbers_.size()),
                      {map_line("log_luminosity", name_in_file(), {})});
  }

  // Common practice: logarithms about 0 have both signs, and few of them come near 0.
  [[nodiscard]] bool looks_linear() const {
    if (!column_.unit_assumed || numbers_.size() < fewest_for_spread) return false;
    const auto [least, greatest] = std::minmax_element(numbers_.begin(), numbers_.end());
    return *least > 0 && *greatest >= 30 * *least && median(numbers_) < 0.3;
  }
  [[nodiscard]] Doubt of_linear() const {
    const auto [least, greatest] = std::minmax_element(numbers_.begin(), numbers_.end());
    return doubt_that(fmt::format("column {} holds nothing below 0, but {:.3g} to {:.3g} with a median of {:.3g}; it "
                                  "looks like luminosity",
                                  header(), *least, *greatest, median(numbers_)),
                      {map_line("luminosity", name_in_file(), info(Quantity::luminosity).unit)});
  }

  // What must be above 0 is judged by what is.
  [[nodiscard]] std::vector<double> judged() const {
    if (is_logarithm(column_.quantity)) return numbers_;
    std::vector<double> out;
    std::copy_if(numbers_.begin(), numbers_.end(), std::back_inserter(out),
                 [&](double x) { return convert(x, conversion_) > 0; });
    return out;
  }

  [[nodiscard]] double low(const Plausible& plausible) const {
    const bool is_stated = plausible.quantity == Quantity::parallax && !column_.unit_assumed;
    return is_stated ? smallest_stated_parallax : plausible.low;
  }

  [[nodiscard]] std::optional<Doubt> of_median(const Plausible& plausible) const {
    const auto numbers = judged();
    if (numbers.size() < fewest_numbers) return std::nullopt;
    const double printed = median(numbers);
    const double canonical = convert(printed, conversion_);
    if (canonical >= low(plausible) && canonical <= plausible.high) return std::nullopt;
    const auto others = fitting(plausible, printed);
    return doubt_that(
        fmt::format("column {} has a median of {:.3g}{}{}; {}{}", header(), printed, unit_text(),
                    column_.unit_assumed ? " (no unit is stated)" : "", plausible.reason, looks_like(others)),
        lines(others));
  }

  [[nodiscard]] std::string unit_text() const { return column_.unit.empty() ? "" : " " + column_.unit; }

  // The readings under which the median is a usual one.
  [[nodiscard]] std::vector<Reading> fitting(const Plausible& plausible, double printed) const {
    std::vector<Reading> out;
    for (const Reading& other : plausible.others) {
      const auto meant = conversion(other.quantity, other.unit);
      if (!meant || (other.quantity == column_.quantity && meant == conversion_)) continue;
      const double canonical = convert(printed, *meant);
      const auto range = std::find_if(plausible_medians().begin(), plausible_medians().end(),
                                      [&](const Plausible& candidate) { return candidate.quantity == other.quantity; });
      if (canonical >= range->low && canonical <= range->high) out.push_back(other);
    }
    return out;
  }

  [[nodiscard]] std::string looks_like(const std::vector<Reading>& others) const {
    std::vector<std::string> words;
    for (const Reading& other : others) {
      const bool same = other.quantity == column_.quantity;
      words.push_back(same ? std::string(other.unit) : fmt::format("{} in {}", name(other.quantity), other.unit));
    }
    return words.empty() ? "" : fmt::format("; it looks like {}", fmt::join(words, " or "));
  }

  [[nodiscard]] std::vector<std::string> lines(const std::vector<Reading>& others) const {
    std::vector<std::string> out;
    for (const Reading& other : others) out.push_back(map_line(name(other.quantity), name_in_file(), other.unit));
    return out;
  }

  // The last line keeps the column as it is.
  [[nodiscard]] Doubt doubt_that(std::string what, std::vector<std::string> map_lines) const {
    map_lines.push_back(map_line(name(column_.quantity), name_in_file(), column_.unit.empty() ? "1" : column_.unit));
    return {column_.column, std::move(what), std::move(map_lines), blocks()};
  }

  // Whatever a route may start from.
  [[nodiscard]] bool blocks() const {
    const auto holds = [&](const auto& held) { return held.first == column_.quantity; };
    if (std::any_of(star_fields.begin(), star_fields.end(), holds)) return true;
    const bool places_planets =
        std::find(list_.needed.begin(), list_.needed.end(), Quantity::planet) != list_.needed.end();
    return places_planets && std::any_of(planet_fields.begin(), planet_fields.end(), holds);
  }

  [[nodiscard]] const std::string& name_in_file() const { return list_.head.columns[column_.column].name; }
  [[nodiscard]] std::string header() const { return words::quoted(name_in_file()); }

  const UnderstoodList& list_;
  const UnderstoodColumn& column_;
  Conversion conversion_;
  std::vector<double> numbers_;
};

bool is_unit_in_map(const UnderstoodList& list, const UnderstoodColumn& column) {
  return std::any_of(list.map.entries.begin(), list.map.entries.end(), [&](const ColumnMap::Entry& entry) {
    return entry.column == list.head.columns[column.column].name && !entry.unit.empty();
  });
}

}  // namespace

std::vector<Doubt> implausible_columns(const UnderstoodList& list, std::span<const Chunk> first) {
  std::vector<Doubt> out;
  for (const auto& column : list.columns) {
    if (column.part != ColumnPart::value || !is_numeric(column.quantity) || is_unit_in_map(list, column)) continue;
    if (auto doubt = Judgement(list, column, first).doubt()) out.push_back(*std::move(doubt));
  }
  return out;
}

}  // namespace hz
