#include "table/column_matching.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <map>
#include <set>
#include <utility>

#include "hz/error.hpp"
#include "hz/units.hpp"
#include "table/header_words.hpp"
#include "words.hpp"

namespace hz {
namespace {

// The unit a description states: what stands in its first square brackets.
std::string bracketed_unit(std::string_view description) {
  const auto open = description.find('[');
  const auto close = description.find(']', open);
  if (open == std::string_view::npos || close == std::string_view::npos) return {};
  return std::string(words::trimmed(description.substr(open + 1, close - open - 1)));
}

// "R" of "R [Rsun]".
std::string_view without_brackets(std::string_view header) {
  return words::trimmed(header.substr(0, header.find_first_of("[(")));
}

ColumnCandidate candidate(std::size_t column, HeaderMatch match, KnownBy known_by) {
  return {column,     match.quantity,        match.named,
          match.part, std::move(match.unit), match.unit_known,
          known_by,   std::move(match.base), std::move(match.meanings)};
}

class Matching {
public:
  Matching(const TableHead& head, const ColumnMap& map) : head_(head), map_(map), descriptions_(descriptions(head)) {
    for (std::size_t i = 0; i < head.columns.size(); ++i) {
      by_header_.emplace(head.columns[i].name, i);
      by_bare_header_.emplace(without_brackets(head.columns[i].name), i);
    }
  }

  std::vector<ColumnCandidate> all() {
    take_mapped();
    take_ignored();
    learn_from_values();
    for (std::size_t i = 0; i < head_.columns.size(); ++i) {
      if (taken_.contains(i)) continue;
      if (auto found = match(i)) candidates_.push_back(*std::move(found));
    }
    return std::move(candidates_);
  }

private:
  std::size_t column_named(const std::string& column, const std::string& place) const {
    const auto found = by_header_.find(column);
    if (found != by_header_.end()) return found->second;
    throw Error(Fault::input, fmt::format("{}: {} has no column named {}; write its header as the file spells it",
                                          place, head_.source, words::quoted(column)));
  }

  void take_mapped() {
    for (const auto& entry : map_.entries) {
      const auto column = column_named(entry.column, entry.place);
      if (!taken_.insert(column).second) {
        throw Error(Fault::input,
                    fmt::format("{}: column {} stands in the map twice", entry.place, words::quoted(entry.column)));
      }
      candidates_.push_back(mapped(entry, column));
      if (entry.part == ColumnPart::value) words_.learn(entry.column, candidates_.back().quantity);
    }
  }

  ColumnCandidate mapped(const ColumnMap::Entry& entry, std::size_t column) const {
    ColumnCandidate out{column,     entry.quantity, entry.quantity, entry.part,
                        entry.unit, true,           KnownBy::map,   words::folded(entry.column),
                        {}};
    if (!is_numeric(entry.quantity)) return out;
    // The file's own unit counts where the map says none; one that does not fit is an error as elsewhere.
    if (out.unit.empty()) out.unit = unit_in_file(column);
    out.quantity = told_by_unit(entry.quantity, out.unit);
    out.unit_known = conversion(out.quantity, out.unit).has_value();
    return out;
  }

  std::string unit_in_file(std::size_t column) const {
    if (!head_.columns[column].unit.empty()) return head_.columns[column].unit;
    // "[Fe/H]" is a name, not a unit.
    const auto& header = head_.columns[column].name;
    const auto in_header = header.starts_with('[') ? std::string() : bracketed_unit(header);
    return in_header.empty() ? bracketed_unit(descriptions_[column]) : in_header;
  }

  void take_ignored() {
    for (const auto& ignored : map_.ignored) taken_.insert(column_named(ignored.column, ignored.place));
  }

  // A value told by its unit ("R [Rsun]", "Lum [dex]") lends its words to its half-widths ("R err").
  void learn_from_values() {
    std::map<std::string, std::set<Quantity>> meanings;
    for (std::size_t i = 0; i < head_.columns.size(); ++i) {
      const auto found = taken_.contains(i) ? std::nullopt : match(i);
      if (found && found->part == ColumnPart::value && found->meanings.empty())
        meanings[found->base].insert(found->quantity);
    }
    for (const auto& [base, quantities] : meanings) {
      if (quantities.size() == 1) words_.learn(base, *quantities.begin());
    }
  }

  std::optional<ColumnCandidate> match(std::size_t i) const {
    const auto& column = head_.columns[i];
    const auto unit = column.unit.empty() ? bracketed_unit(descriptions_[i]) : column.unit;
    if (auto found = words_.match_canonical(column.name, unit)) return candidate(i, *std::move(found), KnownBy::name);
    if (auto found = prefixed(column.name, unit)) return candidate(i, *std::move(found), KnownBy::words);
    // A bare letter gives way to a description; its unit in a description is the last resort.
    const auto by_header = words_.match(column.name, column.unit);
    const bool is_bare = by_header && !by_header->meanings.empty();
    if (by_header && !is_bare) return candidate(i, *words_.match(column.name, unit), KnownBy::words);
    if (auto found = words_.match(descriptions_[i], column.unit))
      return candidate(i, *std::move(found), KnownBy::comment);
    if (is_bare) return candidate(i, *words_.match(column.name, unit), KnownBy::words);
    return std::nullopt;
  }

  std::optional<HeaderMatch> prefixed(std::string_view header, std::string_view unit) const {
    if (!header.starts_with("e_") && !header.starts_with("E_") && !header.starts_with("l_")) return std::nullopt;
    const auto value = by_bare_header_.find(header.substr(2));
    if (value == by_bare_header_.end()) return std::nullopt;
    return words_.match_prefixed(header.front(), head_.columns[value->second].name, unit);
  }

  const TableHead& head_;
  const ColumnMap& map_;
  std::vector<std::string> descriptions_;
  std::map<std::string_view, std::size_t> by_header_;  // the first of each name
  std::map<std::string_view, std::size_t> by_bare_header_;
  HeaderWords words_;
  std::set<std::size_t> taken_;
  std::vector<ColumnCandidate> candidates_;
};

// Comment lines "COLUMN pl_rade:  Planet Radius [Earth Radius]" and "pl_rade: Planet Radius" by the column they
// describe; the first of each.
std::map<std::string_view, std::string_view> described_in_comments(const TableHead& head) {
  std::map<std::string_view, std::string_view> out;
  for (const std::string_view comment : head.comments) {
    const auto colon = comment.find(':');
    if (colon == std::string_view::npos) continue;
    const auto words = words::trimmed(comment.substr(colon + 1));
    // A header may hold blanks, so that every end of what stands before the colon may be one.
    const auto before = words::trimmed(comment.substr(0, colon));
    out.emplace(before, words);
    for (std::size_t i = 0; i + 1 < before.size(); ++i) {
      if (before[i] == ' ' || before[i] == '\t') out.emplace(before.substr(i + 1), words);
    }
  }
  return out;
}

}  // namespace

std::vector<ColumnCandidate> match_columns(const TableHead& head, const ColumnMap& map) {
  return Matching(head, map).all();
}

std::vector<std::string> descriptions(const TableHead& head) {
  const auto described = described_in_comments(head);
  std::vector<std::string> out;
  for (const auto& column : head.columns) {
    const auto found = described.find(column.name);
    const bool in_comment = column.description.empty() && !column.name.empty() && found != described.end();
    out.push_back(in_comment ? std::string(found->second) : column.description);
  }
  return out;
}

}  // namespace hz
