#include "table/header_words.hpp"

#include <algorithm>
#include <array>
#include <initializer_list>
#include <utility>

#include "column_catalog.hpp"
#include "hz/require.hpp"
#include "hz/units.hpp"
#include "words.hpp"

namespace hz {
namespace {

// Letters and words that mean several things. A unit that belongs to just one of them settles it.
struct Bare {
  std::string_view word;
  Quantity quantity;
  std::string_view unit;  // one that tells it from the others; empty when none does
};
constexpr auto bare_words = std::to_array<Bare>({
    {"k", Quantity::magnitude_k, "mag"},
    {"k", Quantity::rv_semi_amplitude, "m/s"},
    {"k", Quantity::rv_semi_amplitude, "km/s"},
    {"g", Quantity::magnitude_g, ""},  // or the Sloan g band
    {"a", Quantity::semi_major_axis, "AU"},
    {"a", Quantity::extinction_v, "mag"},
    {"e", Quantity::eccentricity, ""},
    {"r", Quantity::stellar_radius, "solRad"},
    {"r", Quantity::planet_radius, "earthRad"},
    {"r", Quantity::planet_radius, "jupiterRad"},
    {"radius", Quantity::stellar_radius, "solRad"},
    {"radius", Quantity::planet_radius, "earthRad"},
    {"radius", Quantity::planet_radius, "jupiterRad"},
    {"rp", Quantity::planet_radius, "earthRad"},
    {"rp", Quantity::planet_radius, "jupiterRad"},
    {"rp", Quantity::magnitude_rp, "mag"},
    {"m", Quantity::stellar_mass, "solMass"},
    {"m", Quantity::planet_mass, "earthMass"},
    {"m", Quantity::planet_mass, "jupiterMass"},
    {"mass", Quantity::stellar_mass, "solMass"},
    {"mass", Quantity::planet_mass, "earthMass"},
    {"mass", Quantity::planet_mass, "jupiterMass"},
    {"p", Quantity::orbital_period, "d"},
    {"p", Quantity::orbital_period, "yr"},
    {"d", Quantity::distance, "pc"},
    {"d", Quantity::distance, "ly"},
    {"l", Quantity::luminosity, "solLum"},
});

bool settles(const Bare& bare, std::string_view unit) {
  if (bare.unit.empty() || unit.empty()) return false;
  const auto meant = conversion(bare.quantity, unit);
  return meant && meant == conversion(bare.quantity, bare.unit);
}

std::optional<HeaderMatch> match_bare(const std::string& folded, std::string_view unit) {
  HeaderMatch match;
  match.base = folded;
  match.unit = unit;
  for (const Bare& bare : bare_words) {
    if (bare.word != folded) continue;
    if (settles(bare, unit)) return HeaderMatch{bare.quantity, ColumnPart::value, match.unit, folded, true, {}, {}};
    if (match.meanings.empty() || match.meanings.back() != bare.quantity) match.meanings.push_back(bare.quantity);
  }
  if (match.meanings.empty()) return std::nullopt;
  return match;
}

struct Group {
  std::string_view inside;
  std::string around;  // the text without it
};

// The bracketed groups of a text, last first; brackets within brackets belong to the outer group.
std::vector<Group> bracket_groups(std::string_view text) {
  std::vector<Group> groups;
  for (std::size_t open = 0; open < text.size(); ++open) {
    if (text[open] != '[' && text[open] != '(') continue;
    const char closing = text[open] == '[' ? ']' : ')';
    std::size_t depth = 0;
    for (auto at = open; at < text.size(); ++at) {
      if (text[at] == text[open]) ++depth;
      if (text[at] != closing || --depth > 0) continue;
      groups.push_back({text.substr(open + 1, at - open - 1),
                        std::string(text.substr(0, open)) + ' ' + std::string(text.substr(at + 1))});
      open = at;
      break;
    }
  }
  std::reverse(groups.begin(), groups.end());
  return groups;
}

std::optional<ColumnPart> pattern_part(std::string_view pattern) {
  constexpr std::array<std::pair<std::string_view, ColumnPart>, 6> parts{{
      {"X_err", ColumnPart::half_width},
      {"X_err_plus", ColumnPart::upper_half_width},
      {"X_err_minus", ColumnPart::lower_half_width},
      {"X_lower", ColumnPart::lower_bound},
      {"X_upper", ColumnPart::upper_bound},
      {"X_limit", ColumnPart::limit_mark},
  }};
  for (const auto& [name, part] : parts) {
    if (name == pattern) return part;
  }
  return std::nullopt;
}

bool has_unit(ColumnPart part) { return part != ColumnPart::limit_mark && part != ColumnPart::route; }

void check_unit(HeaderMatch& match) {
  match.named = match.quantity;
  if (!match.meanings.empty() || !is_numeric(match.quantity) || !has_unit(match.part)) return;
  match.quantity = told_by_unit(match.quantity, match.unit);
  match.unit_known = conversion(match.quantity, match.unit).has_value();
}

}  // namespace

Quantity told_by_unit(Quantity quantity, std::string_view unit) {
  const auto known = conversion(quantity, unit);
  if (quantity == Quantity::luminosity && !known && conversion(Quantity::log_luminosity, unit))
    return Quantity::log_luminosity;
  if (known && known->kind == ConversionKind::reciprocal) return Quantity::parallax;
  return quantity;
}

HeaderWords::HeaderWords() {
  for (std::size_t i = 0; i < column_catalog().quantity_index.size(); ++i) {
    const auto quantity = static_cast<Quantity>(i);
    learn(name(quantity), quantity);
    for (const auto& words : info(quantity).accept) learn(words, quantity);
  }
  for (const auto& pattern : column_catalog().patterns) {
    const auto part = pattern_part(pattern.name);
    if (!part) continue;  // routes are known by their canonical name only
    for (const auto& spelling : pattern.accept) add_affix(spelling, *part);
  }
  std::stable_sort(affixes_.begin(), affixes_.end(),
                   [](const Affix& a, const Affix& b) { return a.letters.size() > b.letters.size(); });
}

void HeaderWords::learn(std::string_view words, Quantity quantity) { words_[words::folded(words)] = quantity; }

// "X err" or "err X". "e_X" and its like need the other columns: match_prefixed().
void HeaderWords::add_affix(std::string_view spelling, ColumnPart part) {
  if (spelling.starts_with("X ")) affixes_.push_back({words::folded(spelling.substr(2)), false, part});
  if (spelling.ends_with(" X"))
    affixes_.push_back({words::folded(spelling.substr(0, spelling.size() - 2)), true, part});
}

std::optional<HeaderMatch> HeaderWords::match(std::string_view text, std::string_view stated_unit) const {
  std::optional<HeaderMatch> with_doubt;
  for (const Group& group : bracket_groups(text)) {
    auto found = match_words(group.around, words::trimmed(group.inside));
    if (found && found->unit_known && found->meanings.empty()) return found;
    if (found && !with_doubt) with_doubt = std::move(found);
  }
  // A bracket that is no unit may be part of the words: "Mass*sin(i)", "E(B-V)", "V (Johnson) magnitude".
  if (auto found = match_words(text, stated_unit)) return found;
  return with_doubt;
}

std::optional<HeaderMatch> HeaderWords::match_canonical(std::string_view text, std::string_view stated_unit) const {
  auto named = part_named(text);
  std::string unit(stated_unit);
  for (const Group& group : bracket_groups(text)) {
    if (named) break;
    named = part_named(words::trimmed(group.around));
    unit = words::trimmed(group.inside);
  }
  if (!named) return std::nullopt;
  HeaderMatch match{named->quantity, named->part, unit, words::folded(name(named->quantity)), true, {}, {}};
  check_unit(match);
  return match;
}

std::optional<HeaderMatch> HeaderWords::match_prefixed(char prefix, std::string_view value_column,
                                                       std::string_view stated_unit) const {
  auto found = match_canonical(value_column, {});
  if (!found) found = match(value_column, {});
  if (!found || found->part != ColumnPart::value || !found->meanings.empty() || !is_numeric(found->quantity))
    return std::nullopt;
  found->part = prefix == 'e'   ? ColumnPart::half_width
                : prefix == 'E' ? ColumnPart::upper_half_width
                                : ColumnPart::limit_mark;
  if (!stated_unit.empty()) found->unit = stated_unit;
  check_unit(*found);
  return found;
}

std::optional<HeaderMatch> HeaderWords::match_words(std::string_view words, std::string_view unit) const {
  const auto folded = words::folded(words);
  auto found = match_value(folded, unit);
  if (!found) found = match_part(folded, unit);
  if (found) check_unit(*found);
  return found;
}

std::optional<HeaderMatch> HeaderWords::match_value(const std::string& folded, std::string_view unit) const {
  if (const auto found = words_.find(folded); found != words_.end()) {
    return HeaderMatch{found->second, ColumnPart::value, std::string(unit), folded, true, {}, {}};
  }
  return match_bare(folded, unit);
}

std::optional<HeaderMatch> HeaderWords::match_part(const std::string& folded, std::string_view unit) const {
  for (const Affix& affix : affixes_) {
    const bool fits = affix.in_front ? folded.starts_with(affix.letters) : folded.ends_with(affix.letters);
    if (!fits) continue;
    const auto base =
        affix.in_front ? folded.substr(affix.letters.size()) : folded.substr(0, folded.size() - affix.letters.size());
    const auto found = words_.find(base);
    if (found == words_.end() || !is_numeric(found->second)) continue;
    return HeaderMatch{found->second, affix.part, std::string(unit), base, true, {}, {}};
  }
  return std::nullopt;
}

}  // namespace hz
