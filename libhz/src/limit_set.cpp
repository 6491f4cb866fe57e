#include "hz/limit_set.hpp"

#include <algorithm>

#include "limit_file.hpp"

namespace hz {
namespace embedded {
extern const std::string_view limits_toml;  // catalogs/limits.toml
}
namespace {

/// The limits that bound a set's zones; all of them when it has no zone.
std::vector<const FluxLimit*> bounding_limits(const LimitSet& set) {
  std::vector<const FluxLimit*> limits;
  for (const auto& zone : {set.conservative, set.optimistic}) {
    if (zone) limits.insert(limits.end(), {&set.limits.at(zone->inner), &set.limits.at(zone->outer)});
  }
  if (limits.empty()) {
    for (const FluxLimit& limit : set.limits) limits.push_back(&limit);
  }
  return limits;
}

std::optional<Range> overlap(const std::optional<Range>& a, const std::optional<Range>& b) {
  if (!a || !b) return a ? a : b;
  return Range{std::max(a->low, b->low), std::min(a->high, b->high)};
}

}  // namespace

std::optional<Range> LimitSet::teff_range() const {
  std::optional<Range> range;
  for (const FluxLimit* limit : bounding_limits(*this)) range = overlap(range, limit->teff_range());
  return range;
}

std::optional<Range> LimitSet::planet_mass_range() const {
  std::optional<Range> range;
  for (const FluxLimit* limit : bounding_limits(*this)) range = overlap(range, limit->planet_mass_range());
  return range;
}

const LimitCatalog& LimitCatalog::published() {
  static const LimitCatalog catalog = LimitCatalog{}.with(embedded::limits_toml, "catalogs/limits.toml");
  return catalog;
}

LimitCatalog LimitCatalog::with(std::string_view toml_text, const std::string& file) const {
  LimitCatalog catalog;
  catalog.sets_ = read_limit_sets(toml_text, file, sets_);
  return catalog;
}

const LimitSet* LimitCatalog::find(std::string_view key) const {
  const auto named = [key](const LimitSet& set) { return same_key(set.key, key); };
  const auto found = std::find_if(sets_.begin(), sets_.end(), named);
  return found == sets_.end() ? nullptr : &*found;
}

}  // namespace hz
