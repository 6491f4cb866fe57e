// Everything `check` says of one planet, before it is put into words or JSON.
#pragma once
#include <optional>
#include <string>
#include <vector>

#include "hz/answer.hpp"
#include "hz/decides.hpp"
#include "settings_options.hpp"

namespace hz::app {

/// Another plausible choice, and the verdicts under it.
struct Alternative {
  std::string what;  // "limit set RK18", "asymmetric values as modes", "planet mass 5 Earth masses"
  std::optional<Verdict> conservative;
  std::optional<Verdict> optimistic;
  bool changes_conservative = false;
  bool changes_optimistic = false;
  [[nodiscard]] bool changes() const { return changes_conservative || changes_optimistic; }
};

/// The planet against one limit of the set.
struct LimitLine {
  const FluxLimit* limit = nullptr;
  double insolation = 0;
  bool held = false;
  std::optional<double> limit_distance;   // au
  std::optional<double> margin_distance;  // au from the planet; positive when the limit lies farther out
  std::optional<double> margin_widths;    // (ln S - ln S_limit) in its half-width that faces the limit
};

struct CheckReport {
  const ListRow& row;
  const Settings& settings;
  Answer answer;
  std::vector<LimitLine> limits;          // from the hottest to the coldest
  std::vector<Alternative> alternatives;  // every one that was tried
  std::vector<VarianceShare> shares;
  std::optional<VarianceShare> leading;   // the measured value with the largest share
  std::optional<double> settling_factor;  // for it
};

/// Throws hz::Error (input) with the reason when the row has no answer.
[[nodiscard]] CheckReport make_report(const ListRow& row, const Choices& choices, Answer answer);

}  // namespace hz::app
