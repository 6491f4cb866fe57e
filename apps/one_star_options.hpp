// One star, or one planet, typed on the command line.
#pragma once
#include <span>

#include "hz/quantity.hpp"
#include "hz/records.hpp"
#include "options.hpp"

namespace hz::app {

[[nodiscard]] std::span<const Option> star_value_options();    // with --name
[[nodiscard]] std::span<const Option> planet_value_options();  // orbit and planet

/// Whether any of these values is typed (a name alone does not count).
[[nodiscard]] bool has_typed_values(const Arguments& arguments);

/// The row that the typed values make, in canonical units. A value without half-widths is exact.
///
/// With any value of orbit or planet the row has a planet, and --name is its name ("planet" without one); else --name
/// is the star's. Throws hz::Error (usage) that names the option whose value cannot be read.
[[nodiscard]] ListRow typed_row(const Arguments& arguments);

/// One typed value in the canonical unit of `quantity`; for tests.
[[nodiscard]] Measured typed_value(std::string_view option, Quantity quantity, const std::string& text);

}  // namespace hz::app
