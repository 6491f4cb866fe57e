// The page that `check` prints, to be read in ten seconds, and the same for a program.
#pragma once
#include <cstddef>
#include <string>

#include "check_report.hpp"
#include "console.hpp"

namespace hz::app {

[[nodiscard]] std::string check_page(const CheckReport& report, const Console& console, std::size_t width);
[[nodiscard]] std::string check_json(const CheckReport& report);

}  // namespace hz::app
