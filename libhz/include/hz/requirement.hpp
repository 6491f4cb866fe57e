// Conditions that cut a list: planet_radius<1.8, p_conservative>=0.5, verdict_optimistic=inside.
#pragma once
#include <optional>
#include <string>
#include <string_view>

#include "hz/ranking.hpp"

namespace hz {

enum class Comparison { less, less_or_equal, greater, greater_or_equal, equal };

struct Requirement {
  std::string text;  // as the user wrote it
  std::string name;  // a quantity, or a column of the ranked list
  Comparison comparison = Comparison::less;
  std::string value;             // as text
  std::optional<double> number;  // the same as a number, when it is one
};

/// Throws hz::Error (usage): no comparison in it, an unknown name (the closest is for the caller to offer), or a
/// comparison of text by order.
[[nodiscard]] Requirement parse_requirement(std::string_view text);

/// Why a row does not meet it; empty when it does. The quantity is taken as used, else as stated. What is not known is
/// not met; a limit meets it when everything the limit allows does.
[[nodiscard]] std::string why_not_met(const Requirement& requirement, const Candidate& candidate);

}  // namespace hz
