// What a list must tell before the work can be done.
#pragma once
#include <string>

#include "hz/table/understanding.hpp"

namespace hz::app {

/// What `bounds` misses, and which columns would give it; `draft` was made with star_inputs().
[[nodiscard]] std::string missing_for_stars(const Understanding& draft);

/// What the commands that place planets miss; `draft` was made with planet_inputs().
[[nodiscard]] std::string missing_for_planets(const Understanding& draft);

}  // namespace hz::app
