// How rows become records: worked out once for a head, used for every row.
#pragma once
#include <array>
#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "hz/measured_text.hpp"
#include "hz/records.hpp"
#include "hz/table/understanding.hpp"
#include "hz/units.hpp"

namespace hz {

class ReadingPlan {
public:
  ReadingPlan(const TableHead& head, const std::vector<UnderstoodColumn>& columns, const ColumnMap& map);

  [[nodiscard]] ListRow read(const Chunk& chunk, std::size_t row) const;

  /// The number in a cell of a value column as printed, if it is one in the column's own unit: not missing, no limit,
  /// no unit of its own.
  [[nodiscard]] std::optional<double> printed(const Chunk& chunk, std::size_t row,
                                              const UnderstoodColumn& column) const;

private:
  // A half-width or bound; without a conversion of its own it is in the unit of its value.
  struct Side {
    std::size_t column = 0;
    std::optional<Conversion> own;
  };
  // One value column and what belongs to it.
  struct Choice {
    std::size_t column = 0;
    Conversion conversion;
    std::optional<Side> half_width, upper_half_width, lower_half_width, lower_bound, upper_bound;
    std::optional<std::size_t> limit_mark;
  };
  struct Cell;

  void add(const UnderstoodColumn& column);
  [[nodiscard]] const std::vector<Choice>& choices(Quantity quantity) const {
    return choices_[static_cast<std::size_t>(quantity)];
  }

  [[nodiscard]] static Result<MeasuredText> measured_in(const Cell& cell, const std::string& header);
  [[nodiscard]] Cell cell(const Chunk& chunk, std::size_t row, std::size_t column) const;
  [[nodiscard]] std::string text(const Chunk& chunk, std::size_t row, Quantity quantity) const;
  [[nodiscard]] Field field(const Chunk& chunk, std::size_t row, Quantity quantity) const;
  [[nodiscard]] Result<std::optional<Measured>> chosen(const Chunk& chunk, std::size_t row, Quantity quantity,
                                                       const Choice& choice) const;
  [[nodiscard]] Result<Measured> with_sides(const Chunk& chunk, std::size_t row, Measured measured,
                                            const Choice& choice, const Conversion& conversion) const;
  [[nodiscard]] Result<std::optional<double>> number(const Chunk& chunk, std::size_t row,
                                                     const std::optional<Side>& side) const;
  [[nodiscard]] Result<std::optional<double>> width(const Chunk& chunk, std::size_t row,
                                                    const std::optional<Side>& side,
                                                    const Conversion& conversion) const;
  [[nodiscard]] Result<std::optional<double>> half_width(const Chunk& chunk, std::size_t row,
                                                         const std::optional<Side>& side,
                                                         const Conversion& conversion) const;
  [[nodiscard]] Result<std::optional<double>> bound(const Chunk& chunk, std::size_t row,
                                                    const std::optional<Side>& side,
                                                    const Conversion& conversion) const;
  [[nodiscard]] Result<Measured> with_bounds(const Chunk& chunk, std::size_t row, Measured measured,
                                             const Choice& choice, const Conversion& conversion) const;
  [[nodiscard]] Problem not_bracketed(const Chunk& chunk, std::size_t row, const Choice& choice) const;
  [[nodiscard]] Result<LimitMark> limit(const Chunk& chunk, std::size_t row, std::size_t column) const;
  [[nodiscard]] bool is_missing_number(const Measured& measured, Quantity quantity) const;
  [[nodiscard]] std::string shown(const Chunk& chunk, std::size_t row, std::size_t column) const;
  [[nodiscard]] bool is_no_value(std::string_view text) const;

  std::vector<std::string> headers_;
  std::vector<std::string> missing_;  // trimmed, lower case
  std::vector<ColumnMap::MissingNumber> missing_numbers_;
  std::array<std::vector<Choice>, static_cast<std::size_t>(Quantity::note) + 1> choices_;
};

}  // namespace hz
