// Whether limits make sense together over the whole range they are fitted for.
#pragma once
#include <optional>
#include <string>

#include "hz/limit_set.hpp"

namespace hz {

/// What is wrong, as "what was found; what to do"; nullopt when all is well. Looked at on an even grid over the Teff
/// range and at every planet mass that has a row (between rows S is monotone in the mass, so nothing can hide there).
using Trouble = std::optional<std::string>;

/// S must be finite and above 0.
[[nodiscard]] Trouble trouble_of_limit(const FluxLimit& limit);

/// The inner limit must have the larger S.
[[nodiscard]] Trouble trouble_of_zone(const LimitSet& set, const Zone& zone);

/// The conservative zone must lie within the optimistic one; touching is allowed. Nothing to see in a set with one
/// zone.
[[nodiscard]] Trouble trouble_of_nesting(const LimitSet& set);

}  // namespace hz
