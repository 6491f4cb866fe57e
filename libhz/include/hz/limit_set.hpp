// Limits that belong together, and the catalogue of all of them.
#pragma once
#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "hz/flux_limit.hpp"

namespace hz {

/// Two of a set's limits, as indices into LimitSet::limits: the hot, inner one and the cold, outer one.
struct Zone {
  std::size_t inner = 0;
  std::size_t outer = 0;
};

/// Published limits that belong together.
struct LimitSet {
  std::string key;       // "K14"
  std::string title;     // one line
  std::string citation;  // authors, year, journal, volume, page
  std::string doi;
  std::string status;      // "current" or "superseded"
  std::string provenance;  // how the digits were checked, with the date
  std::string warning;     // ours; may be empty
  std::vector<FluxLimit> limits;
  std::optional<Zone> conservative;
  std::optional<Zone> optimistic;

  [[nodiscard]] bool bounds_a_zone() const { return conservative || optimistic; }

  /// The fitted range that the limits bounding its zones share (all its limits, in a set without a zone); empty when
  /// they have none.
  [[nodiscard]] std::optional<Range> teff_range() const;
  /// The fitted planet masses that those limits share; empty when none depends on it.
  [[nodiscard]] std::optional<Range> planet_mass_range() const;
};

/// Every known set, in file order; keys are unique.
class LimitCatalog {
public:
  /// The published sets of catalogs/limits.toml, embedded at build time.
  [[nodiscard]] static const LimitCatalog& published();

  /// These sets and those of a user's TOML text in the form of catalogs/limits.toml; `file` names it in messages.
  ///
  /// Throws hz::Error (input) as "file:line:column: what was found; what to do" at the first mistake. Beside wrong keys
  /// and types these are: a key that exists already; S not above 0, an inner limit not hotter than its outer one, or a
  /// conservative zone not within the optimistic one (touching is allowed) anywhere on a grid over the Teff range.
  [[nodiscard]] LimitCatalog with(std::string_view toml_text, const std::string& file) const;

  /// nullptr when there is none; keys are compared without regard to case.
  [[nodiscard]] const LimitSet* find(std::string_view key) const;
  [[nodiscard]] const std::vector<LimitSet>& sets() const { return sets_; }

private:
  std::vector<LimitSet> sets_;
};

/// The set used when nobody chooses.
inline constexpr std::string_view default_limit_set = "K14";

}  // namespace hz
