// A logarithmic scale along x, and the ticks that fit it.
#pragma once
#include <functional>
#include <vector>

#include "hz/plots/scene.hpp"

namespace hz::plots {

/// x runs linearly in ln(value); the values may fall to the right. Both values above 0 and different, x1 > x0.
struct LogScale {
  double value0 = 1;
  double value1 = 10;
  double x0 = 0;
  double x1 = 1;

  [[nodiscard]] double x(double value) const;
  [[nodiscard]] double value(double at) const;
};

struct Tick {
  double x = 0;
  int digit = 1;  // the value is digit * 10^exponent
  int exponent = 0;
  bool labelled = false;
};

/// Round ticks by rising value: the densest of 1-9, 1-2-3-5-7, 1-2-5, 1-3, 1 and every second, third, ... power of ten
/// whose labels keep `gap` between them, and unlabelled ones between as long as they stay apart.
[[nodiscard]] std::vector<Tick> log_ticks(const LogScale& scale, double gap,
                                          const std::function<double(const Tick&)>& label_width);

}  // namespace hz::plots
