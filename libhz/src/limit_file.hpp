// Limit sets from TOML text: the form of catalogs/limits.toml, described at its top.
#pragma once
#include <string>
#include <string_view>
#include <vector>

#include "hz/limit_set.hpp"

namespace hz {

/// `known` followed by the sets of the text. Throws hz::Error (input) as LimitCatalog::with says.
[[nodiscard]] std::vector<LimitSet> read_limit_sets(std::string_view toml_text, const std::string& file,
                                                    std::vector<LimitSet> known);

/// Keys are the same without regard to (ASCII) case.
[[nodiscard]] bool same_key(std::string_view a, std::string_view b);

}  // namespace hz
