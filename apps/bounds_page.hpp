// The zones of one star, for a person to read.
#pragma once
#include <string>

#include "console.hpp"
#include "hz/answer.hpp"
#include "hz/records.hpp"
#include "hz/settings.hpp"

namespace hz::app {

/// One sentence with both zones; a table of every limit of the set, hot ones first; what was taken for granted; the
/// source.
[[nodiscard]] std::string bounds_page(const ListRow& row, const Answer& answer, const Settings& settings,
                                      const Console& console, std::size_t width);

/// "teff, luminosity": the typed values that carry no half-widths.
[[nodiscard]] std::string exact_values(const ListRow& row);

}  // namespace hz::app
