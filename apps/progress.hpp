// A sign of life while the work is long.
#pragma once
#include <chrono>
#include <cstddef>
#include <optional>
#include <string>

#include "console.hpp"

namespace hz::app {

/// A line on standard error that is rewritten as the work goes on: a bar where the end is known, a count where it is
/// not. Seen only on a terminal, and only once the work has lasted more than a second; gone without trace at the end.
class Progress {
public:
  /// `doing` says what goes on: "answering". `total` is the number of rows, when it is known.
  Progress(const Console& console, std::string doing, std::optional<std::size_t> total = std::nullopt);
  ~Progress();
  Progress(const Progress&) = delete;
  Progress& operator=(const Progress&) = delete;

  /// `done` rows are finished.
  void update(std::size_t done);

private:
  using Clock = std::chrono::steady_clock;
  bool wanted_;
  std::string doing_;
  std::optional<std::size_t> total_;
  Clock::time_point next_;  // not before this is the line drawn (again)
  bool drawn_ = false;
};

/// What update() draws: "answering  [======    ]  60 %  3,000 of 5,000 rows" or "answering  3,000 rows".
[[nodiscard]] std::string progress_line(const std::string& doing, std::size_t done, std::optional<std::size_t> total);

}  // namespace hz::app
