#include "log_scale.hpp"

#include <algorithm>
#include <cmath>

namespace hz::plots {
namespace {

/// Digits that carry a label, in every `stride`-th power of ten.
struct TickPattern {
  std::vector<int> digits;
  int stride = 1;
};

const std::vector<TickPattern>& patterns() {
  static const std::vector<TickPattern> densest_first{{{1, 2, 3, 4, 5, 6, 7, 8, 9}},
                                                      {{1, 2, 3, 5, 7}},
                                                      {{1, 2, 5}},
                                                      {{1, 3}},
                                                      {{1}},
                                                      {{1}, 2},
                                                      {{1}, 3},
                                                      {{1}, 5},
                                                      {{1}, 10}};
  return densest_first;
}

bool belongs(const Tick& tick, const TickPattern& pattern) {
  return tick.exponent % pattern.stride == 0 &&
         std::find(pattern.digits.begin(), pattern.digits.end(), tick.digit) != pattern.digits.end();
}

std::vector<Tick> all_ticks(const LogScale& scale) {
  const double low = std::min(scale.value0, scale.value1);
  const double high = std::max(scale.value0, scale.value1);
  std::vector<Tick> ticks;
  for (int exponent = static_cast<int>(std::floor(std::log10(low))); std::pow(10.0, exponent) <= high; ++exponent) {
    for (int digit = 1; digit <= 9; ++digit) {
      const double value = digit * std::pow(10.0, exponent);
      if (value >= low && value <= high) ticks.push_back({scale.x(value), digit, exponent, false});
    }
  }
  return ticks;
}

bool labels_keep_apart(const std::vector<Tick>& ticks, double gap,
                       const std::function<double(const Tick&)>& label_width) {
  const Tick* before = nullptr;
  for (const Tick& tick : ticks) {
    if (!tick.labelled) continue;
    if (before && std::abs(tick.x - before->x) < (label_width(*before) + label_width(tick)) / 2 + gap) return false;
    before = &tick;
  }
  return true;
}

/// Ticks closer than this melt into one.
constexpr double closest_ticks = 1.8;

/// Where 9 and 10 would touch, 1-2-5 and then the powers of ten alone are left.
void thin_out(std::vector<Tick>& ticks, double points_per_decade) {
  const double finest = points_per_decade * std::log10(10.0 / 9.0);
  const double coarser = points_per_decade * std::log10(2.0);
  if (finest >= closest_ticks) return;
  const TickPattern left = coarser >= closest_ticks ? TickPattern{{1, 2, 5}} : TickPattern{{1}};
  std::erase_if(ticks, [&](const Tick& tick) { return !tick.labelled && !belongs(tick, left); });
}

}  // namespace

double LogScale::x(double value) const { return x0 + (x1 - x0) * std::log(value / value0) / std::log(value1 / value0); }

double LogScale::value(double at) const { return value0 * std::pow(value1 / value0, (at - x0) / (x1 - x0)); }

std::vector<Tick> log_ticks(const LogScale& scale, double gap, const std::function<double(const Tick&)>& label_width) {
  std::vector<Tick> ticks = all_ticks(scale);
  for (const TickPattern& pattern : patterns()) {
    for (Tick& tick : ticks) tick.labelled = belongs(tick, pattern);
    if (labels_keep_apart(ticks, gap, label_width)) break;
  }
  thin_out(ticks, (scale.x1 - scale.x0) / std::abs(std::log10(scale.value1 / scale.value0)));
  return ticks;
}

}  // namespace hz::plots
