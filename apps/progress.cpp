#include "progress.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <cstdio>

#include "numbers.hpp"

namespace hz::app {
namespace {

constexpr std::chrono::milliseconds silent_for{1000};
constexpr std::chrono::milliseconds drawn_every{100};
constexpr std::size_t bar_width = 24;

}  // namespace

std::string progress_line(const std::string& doing, std::size_t done, std::optional<std::size_t> total) {
  if (!total || *total == 0) return fmt::format("{}  {}", doing, counted(done, "row"));
  const double share = std::min(1.0, static_cast<double>(done) / static_cast<double>(*total));
  const auto filled = static_cast<std::size_t>(share * bar_width);
  const std::string bar = std::string(filled, '=') + std::string(bar_width - filled, ' ');
  return fmt::format("{}  [{}] {:3.0f} %  {} of {}", doing, bar, std::floor(100 * share), count_text(done),
                     counted(*total, "row"));
}

Progress::Progress(const Console& console, std::string doing, std::optional<std::size_t> total)
    : wanted_(console.shows_progress()), doing_(std::move(doing)), total_(total), next_(Clock::now() + silent_for) {}

void Progress::update(std::size_t done) {
  if (!wanted_ || Clock::now() < next_) return;
  fmt::print(stderr, "\r\x1b[K{}", progress_line(doing_, done, total_));
  std::fflush(stderr);
  next_ = Clock::now() + drawn_every;
  drawn_ = true;
}

Progress::~Progress() {
  if (drawn_) std::fputs("\r\x1b[K", stderr);
}

}  // namespace hz::app
