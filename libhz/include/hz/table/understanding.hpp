// How each column of a list is understood, and how that was known.
#pragma once
#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "hz/quantity.hpp"
#include "hz/records.hpp"
#include "hz/table/table.hpp"

namespace hz {

/// How a column was recognised, in order of precedence.
enum class KnownBy { map, name, ucd, words, comment };

/// What part of a quantity a column holds.
enum class ColumnPart { value, half_width, upper_half_width, lower_half_width, lower_bound, upper_bound, limit_mark, route };

/// One column understood.
struct UnderstoodColumn {
  std::size_t column = 0;  // index in the head
  Quantity quantity{};
  ColumnPart part = ColumnPart::value;
  std::string unit;        // the unit its numbers are in, as stated or assumed
  bool unit_assumed = false;
  KnownBy known_by = KnownBy::name;
};

/// A user's column map (TOML), for `--columns MAP.toml`.
struct ColumnMap {
  struct Entry {
    Quantity quantity{};
    ColumnPart part = ColumnPart::value;
    std::string column;  // the header as the file spells it
    std::string unit;    // empty: as the file says, else canonical
  };
  std::vector<Entry> entries;
  std::vector<std::string> missing_values;  // further spellings of "no value" in this list
  /// Throws hz::Error (input) as "file:line:column: …".
  [[nodiscard]] static ColumnMap parse(std::string_view toml_text, const std::string& file);
};

/// A head understood: which columns give which quantity, in which unit, and how to read a row.
class Understanding {
public:
  /// Throws hz::Error (input) when two columns compete for one quantity or a needed column's unit is unknown or ambiguous;
  /// the message prints the map line to write.
  [[nodiscard]] static Understanding of(const TableHead& head, const ColumnMap& map = {});

  [[nodiscard]] const std::vector<UnderstoodColumn>& columns() const { return columns_; }
  /// The columns that mean nothing to hzmap, as indices in the head.
  [[nodiscard]] const std::vector<std::size_t>& others() const { return others_; }
  [[nodiscard]] bool knows(Quantity quantity) const;

  /// One row as records in canonical units; unreadable cells become problems in their fields.
  ///
  /// A derived value of an earlier run of ours (its X_route column is filled and is not "stated") is left out, so that a
  /// ranked file is itself a list.
  [[nodiscard]] ListRow row(const Chunk& chunk, std::size_t index) const;

private:
  std::vector<UnderstoodColumn> columns_;
  std::vector<std::size_t> others_;
  std::vector<std::string> missing_values_;
};

}  // namespace hz
