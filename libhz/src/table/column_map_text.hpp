// Lines of a column map.
#pragma once
#include <string>
#include <string_view>

namespace hz {

/// `teff = "Teff [K]"`, or with a unit `teff = { column = "Teff", unit = "K" }`.
[[nodiscard]] std::string map_line(std::string_view key, std::string_view column, std::string_view unit);

/// `ignore = ["K"]`.
[[nodiscard]] std::string ignore_line(std::string_view column);

}  // namespace hz
