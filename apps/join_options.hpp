// How two lists are joined, as the user says it.
#pragma once
#include <span>
#include <string>
#include <vector>

#include "options.hpp"

namespace hz::app {

[[nodiscard]] std::span<const Option> joining_options();  // --planets, --planet-columns, --join, --exact-names

/// One way to find the star of a planet.
struct JoinWay {
  enum class Kind {
    star_names,  // the names that each list's star column gives
    columns,     // the names in these two columns
    sky,         // positions at most `tolerance` apart
  };
  Kind kind = Kind::star_names;
  std::string planet_column;  // as the list of planets spells it
  std::string star_column;    // as the list of stars spells it
  double tolerance = 0;       // arcsec
  std::string typed;          // "5arcsec", as the user typed it
};

/// The ways to try, in this order; star names when --join says nothing.
/// Throws hz::Error (usage) for a way that is not understood.
[[nodiscard]] std::vector<JoinWay> read_join_ways(const Arguments& arguments);

/// The part of read_join_ways behind one --join; for tests.
[[nodiscard]] std::vector<JoinWay> read_join_ways(const std::string& text);

/// Throws hz::Error (usage) when an option of joining is given, but no list of planets to join; or a list of planets
/// and `typed` values of one star.
void check_join_options(const Arguments& arguments, bool typed);

}  // namespace hz::app
