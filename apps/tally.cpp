#include "tally.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "numbers.hpp"

namespace hz::app {

void Tally::count(const Answer& answer) {
  if (answer.status == Status::answered) {
    ++answered_;
    for (const std::string& flag : answer.flags) ++flags_[flag];
    return;
  }
  ++set_aside_;
  ++reasons_[answer.reason_kind];
}

std::vector<std::string> Tally::lines() const {
  std::vector<std::string> result = {fmt::format("read {}: {} answered, {} set aside", counted(read(), "row"),
                                                 count_text(answered_), count_text(set_aside_))};
  if (!reasons_.empty()) result.push_back("set aside: " + most_frequent_first(reasons_));
  if (!flags_.empty()) result.push_back("flags: " + most_frequent_first(flags_));
  return result;
}

std::string most_frequent_first(const std::map<std::string, std::size_t>& counts) {
  std::vector<std::pair<std::string, std::size_t>> sorted(counts.begin(), counts.end());
  std::stable_sort(sorted.begin(), sorted.end(), [](const auto& a, const auto& b) { return a.second > b.second; });
  std::string result;
  for (const auto& [what, count] : sorted)
    result += fmt::format("{}{} {}", result.empty() ? "" : ", ", what, count_text(count));
  return result;
}

}  // namespace hz::app
