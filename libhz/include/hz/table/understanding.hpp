// How each column of a list is understood, and how that was known.
#pragma once
#include <cstddef>
#include <memory>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "hz/quantity.hpp"
#include "hz/records.hpp"
#include "hz/table/table.hpp"

namespace hz {

/// How a column was recognised, in order of precedence.
enum class KnownBy { map, name, ucd, words, comment };

/// "map", "name", ...
[[nodiscard]] std::string_view text(KnownBy known_by);

/// What part of a quantity a column holds.
enum class ColumnPart {
  value,
  half_width,
  upper_half_width,
  lower_half_width,
  lower_bound,
  upper_bound,
  limit_mark,
  route
};

/// "teff", "teff_err_plus", ...: the canonical column name of a part.
[[nodiscard]] std::string canonical_name(Quantity quantity, ColumnPart part);

/// The other way round; nullopt for a name that is not in the list, and for parts of what is no number.
struct QuantityPart {
  Quantity quantity{};
  ColumnPart part = ColumnPart::value;
};
[[nodiscard]] std::optional<QuantityPart> part_named(std::string_view canonical_name);

/// One column understood.
struct UnderstoodColumn {
  std::size_t column = 0;  // index in the head
  Quantity quantity{};
  ColumnPart part = ColumnPart::value;
  std::string unit;           // the unit its numbers are in, as stated or assumed
  bool unit_assumed = false;  // nothing states it: canonical, or that of the value for a half-width
  KnownBy known_by = KnownBy::name;
  std::size_t choice = 0;  // 0, 1, ...: several columns may give one quantity; the first that is filled counts
};

/// A column that a person has to decide on.
struct Doubt {
  std::size_t column = 0;
  std::string what;                    // one sentence without a full stop
  std::vector<std::string> map_lines;  // lines of a column map that would settle it, one of them to be chosen
  bool blocks = false;                 // a needed quantity hangs on it
};

/// A user's column map, for `--columns MAP.toml`:
///
///     missing = ["-99", "unknown"]    # further spellings of "no value", in any column
///     ignore = ["K"]                  # columns to leave alone
///     [columns]                       # canonical name (with _err, _err_plus, ... behind it) = column of the file
///     teff = "T (phot)"
///     distance = { column = "d", unit = "pc" }
///     star = ["Name", "HIP"]          # of text: the first that is filled
///     [missing_values]                # numbers that stand for "no value" of one quantity
///     parallax = [0, -1]
struct ColumnMap {
  struct Entry {
    Quantity quantity{};
    ColumnPart part = ColumnPart::value;
    std::string column;  // the header as the file spells it
    std::string unit;    // empty: as the file says, else canonical
    std::string place;   // "file:line:column" of the entry, for messages
  };
  struct Ignored {
    std::string column;
    std::string place;
  };
  /// A cell that holds nothing but this number, in whatever unit, states no value.
  struct MissingNumber {
    Quantity quantity{};
    double number = 0;
    friend bool operator==(const MissingNumber&, const MissingNumber&) = default;
  };
  std::vector<Entry> entries;
  std::vector<Ignored> ignored;
  std::vector<std::string> missing_values;
  std::vector<MissingNumber> missing_numbers;
  /// Throws hz::Error (input) as "file:line:column: …".
  [[nodiscard]] static ColumnMap parse(std::string_view toml_text, const std::string& file);
};

/// What hzmap reads of a star alone, and of stars with planets: a doubt about one of these stops the work.
[[nodiscard]] std::span<const Quantity> star_inputs();
[[nodiscard]] std::span<const Quantity> planet_inputs();  // star_inputs() among them

class ReadingPlan;

/// A head understood: which columns give which quantity, in which unit, and how to read a row.
class Understanding {
public:
  /// `first` holds the first rows, if they can be looked at (PeekedTable): they tell columns that are not in the unit
  /// they seem to be in.
  ///
  /// Throws hz::Error (input) when two columns compete for one needed quantity, a needed column's unit is unknown, its
  /// header ambiguous, or the median of a star's or planet's column implausible in its unit; the message prints the map
  /// line to write. Also when the map names a column that is not there.
  [[nodiscard]] static Understanding of(const TableHead& head, const ColumnMap& map = {},
                                        std::span<const Quantity> needed = planet_inputs(),
                                        std::span<const Chunk> first = {});

  /// The same, with doubts() instead of an error. Columns with a doubtful meaning are not used; those with implausible
  /// numbers are, and are doubted.
  [[nodiscard]] static Understanding draft(const TableHead& head, const ColumnMap& map = {},
                                           std::span<const Quantity> needed = planet_inputs(),
                                           std::span<const Chunk> first = {});

  /// The columns used, in file order.
  [[nodiscard]] const std::vector<UnderstoodColumn>& columns() const { return columns_; }
  /// The columns that are not used, as indices in the head.
  [[nodiscard]] const std::vector<std::size_t>& others() const { return others_; }
  [[nodiscard]] const std::vector<Doubt>& doubts() const { return doubts_; }
  /// Some column gives its value.
  [[nodiscard]] bool knows(Quantity quantity) const;

  /// One row as records in canonical units; unreadable cells become problems in their fields. A row with a problem of
  /// its own has empty records. `kept` stays empty: what travels along is the caller's choice.
  ///
  /// A unit in a cell ("1.2 RJ") wins over the column's. A ranked file is itself a list: what was derived stands there
  /// in X_used, and X is what the list stated.
  [[nodiscard]] ListRow row(const Chunk& chunk, std::size_t index) const;

private:
  std::vector<UnderstoodColumn> columns_;
  std::vector<std::size_t> others_;
  std::vector<Doubt> doubts_;
  std::shared_ptr<const ReadingPlan> plan_;
};

}  // namespace hz
