// What a list must tell before the work can be done.
#pragma once
#include <string>
#include <vector>

#include "hz/table/understanding.hpp"

namespace hz::app {

/// One sentence for the boundaries of stars and one for planets: what is missing, and which columns would give it.
[[nodiscard]] std::vector<std::string> what_is_missing(const Understanding& understanding);

}  // namespace hz::app
