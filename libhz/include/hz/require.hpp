// Preconditions that stay on in every build.
#pragma once
#include <stdexcept>

/// Throws std::logic_error when `condition` is false: a bug of ours, never the user's.
#define HZ_REQUIRE(condition)                                                         \
  do {                                                                                \
    if (!(condition)) throw std::logic_error("hz: broken precondition: " #condition); \
  } while (false)
