// Which star of one list is the host of which planet of another: by name, or by place on the sky.
#pragma once
#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "hz/records.hpp"
#include "hz/sky.hpp"

namespace hz {

/// What one row is called: names of equal standing, none of them empty. A row without a name has none.
using Aliases = std::vector<std::string>;

/// The names of a cell such as "Lantern 4; LTN 4": parted by `;`, without blanks around, those that mean "no value"
/// left out (is_missing() and the words of `missing`, in any case).
[[nodiscard]] Aliases aliases_of(std::string_view cell, std::span<const std::string> missing = {});

/// How names compare: folded_name() of both, or byte for byte.
enum class NameMatching { folded, exact };

/// What became of a row of either list.
enum class Standing {
  unmatched,  // a planet without a star, or the other way round
  matched,
  ambiguous,  // the planet fits several stars; the star has no planet but fits such a one
};

/// A planet's star.
struct StarFit {
  Standing standing = Standing::unmatched;
  std::size_t way = 0;             // by which call, counted from 0, the planet was found to fit
  std::vector<std::size_t> stars;  // matched: the one; ambiguous: two or three of those it fits, in list order
  std::optional<double> distance;  // arcsec to that star, where a position told it
};

/// Joins the planets of one list to the stars of another, one way after another: a planet that fits any star by one way
/// is not looked for by the next. Several planets may have one star. Stars and planets are known by their index.
class Joiner {
public:
  Joiner(std::size_t planets, std::size_t stars) : planets_(planets), stars_(stars, Standing::unmatched) {}

  /// A planet fits the stars with which it shares any name. Both lists in full length; O(n) in the number of names.
  void by_name(std::span<const Aliases> planets, std::span<const Aliases> stars, NameMatching matching);

  /// A planet fits the star nearest to it, if that lies within `tolerance` arcsec. It fits others as well, and is
  /// ambiguous, if they lie within the tolerance and not more than twice as far, or within 0.1 arcsec like the nearest:
  /// positions of different epochs or precision cannot tell those apart. Rows without a position fit nothing.
  void by_position(std::span<const std::optional<SkyPosition>> planets,
                   std::span<const std::optional<SkyPosition>> stars, double tolerance);

  [[nodiscard]] const std::vector<StarFit>& planets() const { return planets_; }
  [[nodiscard]] const std::vector<Standing>& stars() const { return stars_; }

private:
  void settle(StarFit& planet, std::vector<std::size_t> fits);
  void dispute(std::size_t star);

  std::vector<StarFit> planets_;
  std::vector<Standing> stars_;
  std::size_t ways_ = 0;
};

/// A star as its list has it, completed with what only `other` says of it. What the list says in another form
/// (log_luminosity for luminosity, parallax for distance) is not taken from `other` as well.
[[nodiscard]] StarRecord completed(StarRecord star, const StarRecord& other);

}  // namespace hz
