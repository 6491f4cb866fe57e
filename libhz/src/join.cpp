#include "hz/join.hpp"

#include <algorithm>
#include <array>
#include <unordered_map>
#include <utility>

#include "hz/measured_text.hpp"
#include "hz/ranking.hpp"
#include "hz/require.hpp"
#include "record_fields.hpp"
#include "words.hpp"

namespace hz {
namespace {

/// As many of the stars that a planet fits as a message names. More are not kept: a hundred thousand planets of one
/// name, in a list with as many stars of that name, would fill any memory.
constexpr std::size_t most_fits = 3;

/// The stars of one name, in list order.
struct Namesakes {
  std::vector<std::size_t> stars;
  bool disputed = false;  // a planet of this name fits others too
};
using NameIndex = std::unordered_map<std::string, Namesakes>;

std::string key_of(const std::string& name, NameMatching matching) {
  return matching == NameMatching::folded ? folded_name(name) : name;
}

NameIndex index_of(std::span<const Aliases> stars, NameMatching matching) {
  NameIndex index;
  for (std::size_t star = 0; star < stars.size(); ++star) {
    for (const std::string& name : stars[star]) {
      std::vector<std::size_t>& namesakes = index[key_of(name, matching)].stars;
      if (namesakes.empty() || namesakes.back() != star) namesakes.push_back(star);
    }
  }
  return index;
}

std::vector<Namesakes*> found(NameIndex& index, const Aliases& names, NameMatching matching) {
  std::vector<Namesakes*> groups;
  for (const std::string& name : names) {
    const auto at = index.find(key_of(name, matching));
    if (at != index.end()) groups.push_back(&at->second);
  }
  return groups;
}

/// The first few stars of all groups together, in list order.
std::vector<std::size_t> first_of(const std::vector<Namesakes*>& groups) {
  std::vector<std::size_t> stars;
  for (const Namesakes* group : groups) {
    const std::size_t count = std::min(most_fits, group->stars.size());
    stars.insert(stars.end(), group->stars.begin(), group->stars.begin() + static_cast<std::ptrdiff_t>(count));
  }
  std::sort(stars.begin(), stars.end());
  stars.erase(std::unique(stars.begin(), stars.end()), stars.end());
  stars.resize(std::min(most_fits, stars.size()));
  return stars;
}

/// Stars that lie so near to a position are as near as each other.
constexpr double indistinct = 0.1;  // arcsec

/// The stars with a position, for finding those near a planet.
class StarFinder {
public:
  explicit StarFinder(std::span<const std::optional<SkyPosition>> stars)
      : star_of_(with_position(stars)), index_(positions(stars, star_of_)) {}

  /// The nearest star within the tolerance with those that are about as near; the nearest first.
  [[nodiscard]] std::vector<SkyIndex::Match> about_as_near(const SkyPosition& place, double tolerance) const {
    std::vector<SkyIndex::Match> found = index_.matches(place, tolerance);
    if (found.empty()) return found;
    const double reach = std::max(2 * found.front().distance, indistinct);
    std::erase_if(found, [&](const SkyIndex::Match& match) { return match.distance > reach; });
    for (SkyIndex::Match& match : found) match.index = star_of_[match.index];
    return found;
  }

private:
  static std::vector<std::size_t> with_position(std::span<const std::optional<SkyPosition>> stars) {
    std::vector<std::size_t> rows;
    for (std::size_t star = 0; star < stars.size(); ++star) {
      if (stars[star]) rows.push_back(star);
    }
    return rows;
  }
  static std::vector<SkyPosition> positions(std::span<const std::optional<SkyPosition>> stars,
                                            const std::vector<std::size_t>& rows) {
    std::vector<SkyPosition> places;
    for (const std::size_t row : rows) places.push_back(*stars[row]);
    return places;
  }

  std::vector<std::size_t> star_of_;
  SkyIndex index_;
};

bool says(const Field& field) { return field.stated || field.problem; }

/// Two forms of one quantity.
constexpr auto forms = std::to_array<std::pair<Field StarRecord::*, Field StarRecord::*>>({
    {&StarRecord::luminosity, &StarRecord::log_luminosity},
    {&StarRecord::distance, &StarRecord::parallax},
});

void take_text(std::string& text, const std::string& other) {
  if (text.empty()) text = other;
}

}  // namespace

Aliases aliases_of(std::string_view cell, std::span<const std::string> missing) {
  Aliases names;
  for (const std::string_view part : words::split(cell, ';')) {
    const std::string_view name = words::trimmed(part);
    const auto is_name = [&](const std::string& word) { return words::lower_case(name) == words::lower_case(word); };
    if (!is_missing(name) && std::none_of(missing.begin(), missing.end(), is_name)) names.emplace_back(name);
  }
  return names;
}

void Joiner::settle(StarFit& planet, std::vector<std::size_t> fits) {
  if (fits.empty()) return;
  planet.standing = fits.size() == 1 ? Standing::matched : Standing::ambiguous;
  planet.way = ways_;
  planet.stars = std::move(fits);
  if (planet.standing == Standing::matched) stars_[planet.stars.front()] = Standing::matched;
}

void Joiner::dispute(std::size_t star) {
  if (stars_[star] == Standing::unmatched) stars_[star] = Standing::ambiguous;
}

void Joiner::by_name(std::span<const Aliases> planets, std::span<const Aliases> stars, NameMatching matching) {
  HZ_REQUIRE(planets.size() == planets_.size() && stars.size() == stars_.size());
  NameIndex index = index_of(stars, matching);
  for (std::size_t i = 0; i < planets.size(); ++i) {
    if (planets_[i].standing != Standing::unmatched) continue;
    const std::vector<Namesakes*> groups = found(index, planets[i], matching);
    settle(planets_[i], first_of(groups));
    if (planets_[i].standing != Standing::ambiguous) continue;
    for (Namesakes* group : groups) group->disputed = true;
  }
  for (const auto& [name, group] : index) {
    if (!group.disputed) continue;
    for (const std::size_t star : group.stars) dispute(star);
  }
  ++ways_;
}

void Joiner::by_position(std::span<const std::optional<SkyPosition>> planets,
                         std::span<const std::optional<SkyPosition>> stars, double tolerance) {
  HZ_REQUIRE(planets.size() == planets_.size() && stars.size() == stars_.size());
  const StarFinder finder(stars);
  for (std::size_t i = 0; i < planets.size(); ++i) {
    if (planets_[i].standing != Standing::unmatched || !planets[i]) continue;
    const std::vector<SkyIndex::Match> near = finder.about_as_near(*planets[i], tolerance);
    std::vector<std::size_t> fits;
    for (const SkyIndex::Match& match : near) fits.push_back(match.index);
    if (fits.size() > 1) std::for_each(fits.begin(), fits.end(), [&](std::size_t star) { dispute(star); });
    fits.resize(std::min(most_fits, fits.size()));
    std::sort(fits.begin(), fits.end());
    settle(planets_[i], std::move(fits));
    if (planets_[i].standing == Standing::matched) planets_[i].distance = near.front().distance;
  }
  ++ways_;
}

StarRecord completed(StarRecord star, const StarRecord& other) {
  const StarRecord listed = star;
  take_text(star.name, other.name);
  take_text(star.id, other.id);
  take_text(star.spectral_type, other.spectral_type);
  if (!star.number_of_stars) star.number_of_stars = other.number_of_stars;
  for (const auto& [quantity, field] : star_fields) {
    if (!says(star.*field)) star.*field = other.*field;
  }
  for (const auto& [one, another] : forms) {
    if (!says(listed.*one) && !says(listed.*another)) continue;
    star.*one = listed.*one;
    star.*another = listed.*another;
  }
  return star;
}

}  // namespace hz
