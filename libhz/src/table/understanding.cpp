#include "hz/table/understanding.hpp"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <array>
#include <map>
#include <set>
#include <utility>

#include "hz/error.hpp"
#include "hz/require.hpp"
#include "hz/units.hpp"
#include "table/column_map_text.hpp"
#include "table/column_matching.hpp"
#include "table/plausibility.hpp"
#include "table/reading_plan.hpp"
#include "words.hpp"

namespace hz {
namespace {

constexpr auto all_inputs = std::to_array<Quantity>({
    Quantity::star,
    Quantity::teff,
    Quantity::luminosity,
    Quantity::log_luminosity,
    Quantity::stellar_radius,
    Quantity::stellar_mass,
    Quantity::log_g,
    Quantity::distance,
    // of a planet
    Quantity::planet,
    Quantity::orbital_period,
    Quantity::semi_major_axis,
    Quantity::scaled_semi_major_axis,
    Quantity::eccentricity,
    Quantity::insolation,
    Quantity::planet_radius,
    Quantity::planet_mass,
    Quantity::min_mass,
    Quantity::planet_mass_kind,
    Quantity::adopted,
});
constexpr std::size_t star_input_count = 8;

// Single letters so common for other things that they are mentioned, but stop nobody.
constexpr std::array<std::string_view, 4> common_letters{"p", "d", "l", "m"};

template <class Container, class Value>
bool contains(const Container& container, const Value& value) {
  return std::find(container.begin(), container.end(), value) != container.end();
}

// A value column with the columns that belong to it.
struct Group {
  ColumnCandidate value;
  std::map<ColumnPart, ColumnCandidate> parts;
  std::set<ColumnPart> contested;  // more than one column for it: none is used
};

// Keeps those that satisfy the condition, if any does.
template <class Condition>
void narrow(std::vector<Group*>& pool, Condition condition) {
  std::vector<Group*> kept;
  std::copy_if(pool.begin(), pool.end(), std::back_inserter(kept),
               [&](const Group* group) { return condition(*group); });
  if (!kept.empty()) pool = std::move(kept);
}

// Compares the candidates and decides.
class Assembly {
public:
  Assembly(const TableHead& head, const ColumnMap& map, std::span<const Quantity> needed)
      : head_(head), needed_(needed) {
    const auto candidates = match_columns(head, map);
    for (const auto& candidate : candidates) {
      if (is_settled(candidate) && candidate.part == ColumnPart::value) groups_.push_back({candidate, {}, {}});
    }
    for (const auto& candidate : candidates) {
      if (is_settled(candidate) && candidate.part != ColumnPart::value) attach(candidate);
    }
    for (std::size_t i = 0; i <= static_cast<std::size_t>(Quantity::note); ++i) {
      choose(static_cast<Quantity>(i));
    }
    for (const auto& candidate : candidates) doubt_meaning_or_unit(candidate);
  }

  std::vector<UnderstoodColumn> columns() {
    std::sort(columns_.begin(), columns_.end(), [](const auto& a, const auto& b) { return a.column < b.column; });
    return std::move(columns_);
  }
  std::vector<Doubt> doubts() { return std::move(doubts_); }

private:
  static bool is_settled(const ColumnCandidate& candidate) {
    return candidate.unit_known && candidate.meanings.empty();
  }
  [[nodiscard]] const std::string& header(std::size_t column) const { return head_.columns[column].name; }
  [[nodiscard]] bool needs(Quantity quantity) const { return contains(needed_, quantity); }
  [[nodiscard]] bool knows(Quantity quantity) const {
    return std::any_of(columns_.begin(), columns_.end(),
                       [&](const auto& column) { return column.quantity == quantity; });
  }

  // "distance_err" beside "distance [mas]", which is a parallax, has no value of its own quantity.
  std::vector<Group*> possible_owners(const ColumnCandidate& part) {
    std::vector<Group*> same, same_name;
    for (auto& group : groups_) {
      if (group.value.quantity == part.quantity) same.push_back(&group);
      if (group.value.named == part.quantity && conversion(group.value.quantity, part.unit))
        same_name.push_back(&group);
    }
    return same.empty() ? same_name : same;
  }

  // The value a half-width, bound or mark belongs to: that with the same words, unit and beginning of the header, the
  // nearest before it.
  Group* owner(const ColumnCandidate& part) {
    auto pool = possible_owners(part);
    if (pool.empty()) return nullptr;
    if (part.known_by == KnownBy::map) {
      const auto best = best_level(pool.front()->value.quantity);
      narrow(pool, [&](const Group& group) { return group.value.known_by == best; });
    } else {
      narrow(pool, [&](const Group& group) { return group.value.base == part.base; });
    }
    if (!part.unit.empty()) narrow(pool, [&](const Group& group) { return same_unit(group.value, part); });
    narrow(pool, [&](const Group& group) { return header(part.column).starts_with(header(group.value.column)); });
    narrow(pool, [&](const Group& group) { return group.value.column < part.column; });
    return pool.back();
  }

  static bool same_unit(const ColumnCandidate& a, const ColumnCandidate& b) {
    return is_numeric(a.quantity) ? conversion(a.quantity, a.unit) == conversion(b.quantity, b.unit) : a.unit == b.unit;
  }

  void attach(ColumnCandidate part) {
    auto* const group = owner(part);
    if (group == nullptr) return;
    part.quantity = group->value.quantity;
    const auto [there, is_new] = group->parts.emplace(part.part, part);
    if (is_new || there->second.known_by < part.known_by) return;
    if (there->second.known_by == part.known_by) {
      group->contested.insert(part.part);
      compete(part.quantity, part.part, {there->second.column, part.column});
    } else {
      there->second = part;
    }
  }

  [[nodiscard]] KnownBy best_level(Quantity quantity) const {
    auto best = KnownBy::comment;
    for (const auto& group : groups_) {
      if (group.value.quantity == quantity) best = std::min(best, group.value.known_by);
    }
    return best;
  }

  void choose(Quantity quantity) {
    const auto level = best_level(quantity);
    std::vector<const Group*> best;
    for (const auto& group : groups_) {
      if (group.value.quantity == quantity && group.value.known_by == level) best.push_back(&group);
    }
    const bool is_list_in_map = level == KnownBy::map && !is_numeric(quantity);
    for (std::size_t i = 0; !is_list_in_map && i < best.size(); ++i) {
      for (std::size_t j = i + 1; j < best.size(); ++j) {
        if (!same_unit(best[i]->value, best[j]->value)) continue;
        compete(quantity, ColumnPart::value, {best[i]->value.column, best[j]->value.column});
        return;
      }
    }
    for (std::size_t i = 0; i < best.size(); ++i) use(*best[i], i);
  }

  void use(const Group& group, std::size_t choice) {
    add(group.value, group.value.unit, choice);
    for (const auto& [part, candidate] : group.parts) {
      if (!group.contested.contains(part)) add(candidate, group.value.unit, choice);
    }
  }

  void add(const ColumnCandidate& candidate, const std::string& value_unit, std::size_t choice) {
    // A position may be text in degrees or in hours: only what the file says of its unit counts.
    const bool is_position = candidate.quantity == Quantity::ra || candidate.quantity == Quantity::dec;
    const bool has_unit = candidate.part != ColumnPart::limit_mark && candidate.part != ColumnPart::route &&
                          (is_numeric(candidate.quantity) || is_position);
    auto unit = candidate.unit.empty() ? value_unit : candidate.unit;
    if (unit.empty() && !is_position) unit = info(candidate.quantity).unit;
    columns_.push_back({candidate.column, candidate.quantity, candidate.part, has_unit ? unit : std::string(),
                        has_unit && candidate.unit.empty() && !unit.empty(), candidate.known_by, choice});
  }

  void compete(Quantity quantity, ColumnPart part, std::array<std::size_t, 2> columns) {
    const auto key = canonical_name(quantity, part);
    Doubt doubt{columns[1],
                fmt::format("columns {} and {} both look like {}", words::quoted(header(columns[0])),
                            words::quoted(header(columns[1])), key),
                {},
                // Whatever a row may state can decide its answer: two columns for it are never passed over.
                needs(quantity) || stated_field(ListRow{}, quantity) != nullptr};
    for (const auto column : columns) doubt.map_lines.push_back(map_line(key, header(column), {}));
    doubts_.push_back(std::move(doubt));
  }

  void doubt_meaning_or_unit(const ColumnCandidate& candidate) {
    if (!candidate.meanings.empty()) {
      doubt_meaning(candidate);
    } else if (!candidate.unit_known) {
      doubt_unit(candidate);
    }
  }

  void doubt_meaning(const ColumnCandidate& candidate) {
    Doubt doubt;
    doubt.column = candidate.column;
    std::vector<std::string_view> names;
    for (const auto meaning : candidate.meanings) {
      names.push_back(name(meaning));
      doubt.map_lines.push_back(map_line(name(meaning), header(candidate.column), candidate.unit));
      doubt.blocks = doubt.blocks || (needs(meaning) && !knows(meaning) && !contains(common_letters, candidate.base));
    }
    doubt.map_lines.push_back(ignore_line(header(candidate.column)));
    doubt.what = fmt::format("column {} may be {}", words::quoted(header(candidate.column)), fmt::join(names, " or "));
    doubts_.push_back(std::move(doubt));
  }

  void doubt_unit(const ColumnCandidate& candidate) {
    const auto& canonical = info(candidate.quantity).unit;
    const auto key = canonical_name(candidate.quantity, candidate.part);
    Doubt doubt;
    doubt.column = candidate.column;
    doubt.what = fmt::format("the unit {} of column {} is not one of {}", words::quoted(candidate.unit),
                             words::quoted(header(candidate.column)), key);
    doubt.map_lines = {map_line(key, header(candidate.column), canonical.empty() ? "1" : canonical),
                       ignore_line(header(candidate.column))};
    const bool is_value = candidate.part == ColumnPart::value;
    doubt.blocks = needs(candidate.quantity) && (is_value ? !knows(candidate.quantity) : knows(candidate.quantity));
    doubts_.push_back(std::move(doubt));
  }

  const TableHead& head_;
  std::span<const Quantity> needed_;
  std::vector<Group> groups_;
  std::vector<UnderstoodColumn> columns_;
  std::vector<Doubt> doubts_;
};

std::vector<std::size_t> unused(const TableHead& head, const std::vector<UnderstoodColumn>& columns) {
  std::vector<bool> used(head.columns.size());
  for (const auto& column : columns) used[column.column] = true;
  std::vector<std::size_t> out;
  for (std::size_t i = 0; i < used.size(); ++i) {
    if (!used[i]) out.push_back(i);
  }
  return out;
}

// One sentence about the first; the others are named behind it.
void refuse_doubts(const TableHead& head, const std::vector<Doubt>& doubts) {
  std::vector<const Doubt*> blocking;
  for (const auto& doubt : doubts) {
    if (doubt.blocks) blocking.push_back(&doubt);
  }
  if (blocking.empty()) return;
  auto what = fmt::format("{}: {}; say which in a column map (--columns MAP.toml): {}", head.source,
                          blocking.front()->what, fmt::join(blocking.front()->map_lines, "  or  "));
  for (std::size_t i = 1; i < blocking.size(); ++i) what += fmt::format("; also, {}", blocking[i]->what);
  throw Error(Fault::input, what);
}

}  // namespace

std::span<const Quantity> star_inputs() { return std::span(all_inputs).first(star_input_count); }
std::span<const Quantity> planet_inputs() { return all_inputs; }

Understanding Understanding::draft(const TableHead& head, const ColumnMap& map, std::span<const Quantity> needed,
                                   std::span<const Chunk> first) {
  Assembly assembly(head, map, needed);
  Understanding out;
  out.doubts_ = assembly.doubts();
  out.columns_ = assembly.columns();
  out.others_ = unused(head, out.columns_);
  out.plan_ = std::make_shared<const ReadingPlan>(head, out.columns_, map);
  auto implausible = implausible_columns({head, out.columns_, *out.plan_, map, needed}, first);
  std::move(implausible.begin(), implausible.end(), std::back_inserter(out.doubts_));
  return out;
}

Understanding Understanding::of(const TableHead& head, const ColumnMap& map, std::span<const Quantity> needed,
                                std::span<const Chunk> first) {
  auto out = draft(head, map, needed, first);
  refuse_doubts(head, out.doubts());
  return out;
}

bool Understanding::knows(Quantity quantity) const {
  return std::any_of(columns_.begin(), columns_.end(), [&](const auto& column) {
    return column.quantity == quantity && column.part == ColumnPart::value;
  });
}

ListRow Understanding::row(const Chunk& chunk, std::size_t index) const {
  HZ_REQUIRE(plan_ != nullptr);
  return plan_->read(chunk, index);
}

}  // namespace hz
