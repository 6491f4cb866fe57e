// What became of the rows of a list, for the summary on standard error.
#pragma once
#include <cstddef>
#include <map>
#include <string>
#include <vector>

#include "hz/answer.hpp"

namespace hz::app {

/// Counts answers. Every row read is either answered or set aside; the numbers add up. Flags are those of answered
/// rows.
class Tally {
public:
  void count(const Answer& answer);

  [[nodiscard]] std::size_t read() const { return answered_ + set_aside_; }
  [[nodiscard]] std::size_t answered() const { return answered_; }
  [[nodiscard]] std::size_t set_aside() const { return set_aside_; }

  /// "read 60 rows: 57 answered, 3 set aside", then a line for the reasons and a line for the flags, if there are any.
  [[nodiscard]] std::vector<std::string> lines() const;

private:
  std::size_t answered_ = 0;
  std::size_t set_aside_ = 0;
  std::map<std::string, std::size_t> reasons_;
  std::map<std::string, std::size_t> flags_;
};

/// "no Teff 120, no luminosity 4": the most frequent first, equal ones by name.
[[nodiscard]] std::string most_frequent_first(const std::map<std::string, std::size_t>& counts);

}  // namespace hz::app
