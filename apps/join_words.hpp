// What became of the rows of two joined lists, in words.
#pragma once
#include <string>
#include <vector>

#include "hz/join.hpp"
#include "join_options.hpp"
#include "list_rows.hpp"

namespace hz::app {

/// One of the two lists, with the names its rows go by.
struct JoinSide {
  std::string file;
  std::vector<Candidate> candidates;
  std::vector<std::vector<Aliases>> names;  // for each way of joining, of each row; a way by position has none
};

/// Two lists and how they are joined.
struct JoinedSides {
  std::vector<JoinWay> ways;
  JoinSide planets;
  JoinSide stars;
};

/// Why this planet has no star of its own: none fits, or several do. Empty for a planet that has one, and for a row
/// that could not be read.
[[nodiscard]] Remark why_no_star(const JoinedSides& sides, std::size_t planet, const StarFit& fit);

/// How many rows of both lists were matched, unmatched, ambiguous, and how many make up the joined list.
[[nodiscard]] std::vector<std::string> join_summary(const JoinedSides& sides, const Joiner& joiner);

}  // namespace hz::app
