// The manual page, from the same tables as the help.
#pragma once
#include <string>

namespace hz::app {

/// hzmap(1) in mdoc. `date` is the day of the release, "2024-01-31".
[[nodiscard]] std::string man_page(const std::string& version, const std::string& date);

}  // namespace hz::app
