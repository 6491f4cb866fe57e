#include "closest.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <vector>

namespace hz::app {
namespace {

std::string lower(std::string_view text) {
  std::string result(text);
  for (char& c : result) {
    if (c >= 'A' && c <= 'Z') c = static_cast<char>(c - 'A' + 'a');
  }
  return result;
}

/// A word of four letters may be two edits away, a longer one a few more.
std::size_t near_enough(std::string_view word) { return 1 + word.size() / 4; }

/// The beginning of a word stands for the whole of it as well as a single slip would.
std::size_t distance_between(std::string_view word, std::string_view candidate) {
  constexpr std::size_t telling = 3;
  const bool begins = word.size() >= telling && candidate.starts_with(word);
  return begins ? std::min<std::size_t>(1, candidate.size() - word.size()) : edit_distance(word, candidate);
}

}  // namespace

std::size_t edit_distance(std::string_view from, std::string_view to) {
  std::vector<std::size_t> before_last, last(to.size() + 1), row(to.size() + 1);
  for (std::size_t j = 0; j <= to.size(); ++j) last[j] = j;
  for (std::size_t i = 1; i <= from.size(); ++i) {
    row[0] = i;
    for (std::size_t j = 1; j <= to.size(); ++j) {
      const bool same = from[i - 1] == to[j - 1];
      row[j] = std::min({last[j] + 1, row[j - 1] + 1, last[j - 1] + (same ? 0 : 1)});
      const bool swapped = i > 1 && j > 1 && from[i - 1] == to[j - 2] && from[i - 2] == to[j - 1];
      if (swapped) row[j] = std::min(row[j], before_last[j - 2] + 1);
    }
    before_last = last;
    last = row;
  }
  return last[to.size()];
}

std::optional<std::string> closest(std::string_view word, std::span<const std::string> candidates) {
  const std::string wanted = lower(word);
  std::optional<std::string> best;
  std::size_t best_distance = near_enough(word) + 1;
  for (const std::string& candidate : candidates) {
    const std::size_t distance = distance_between(wanted, lower(candidate));
    if (distance >= best_distance) continue;
    best = candidate;
    best_distance = distance;
  }
  return best;
}

std::string did_you_mean(std::string_view word, std::span<const std::string> candidates) {
  const std::optional<std::string> offer = closest(word, candidates);
  return offer ? fmt::format("; did you mean {}?", *offer) : std::string();
}

}  // namespace hz::app
