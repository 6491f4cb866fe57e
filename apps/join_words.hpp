// What became of the rows of two joined lists, in words.
#pragma once
#include <string>
#include <vector>

#include "hz/join.hpp"
#include "join_options.hpp"
#include "join_side.hpp"
#include "list_rows.hpp"

namespace hz::app {

/// Two lists and how they are joined.
struct JoinedSides {
  std::vector<JoinWay> ways;
  JoinSide planets;
  JoinSide stars;
};

/// Why this planet has no star of its own: none fits, or several do. Empty for a planet that has one, and for a row
/// that could not be read.
[[nodiscard]] Remark why_no_star(const JoinedSides& sides, std::size_t planet, const StarFit& fit);

/// What is to be said of a star that is not matched: that it is ambiguous, or that its position could not be read.
[[nodiscard]] std::string star_note(const JoinedSides& sides, std::size_t star, Standing standing);

/// What is to be said of a planet that has its star: what else the list of planets calls it, how far away it stands.
[[nodiscard]] std::string match_note(const JoinedSides& sides, std::size_t planet, const StarFit& fit);

/// How many rows of both lists were matched, unmatched, ambiguous, and how many make up the joined list.
[[nodiscard]] std::vector<std::string> join_summary(const JoinedSides& sides, const Joiner& joiner);

}  // namespace hz::app
