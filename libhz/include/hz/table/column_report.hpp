// What a person wants to see of how a list is understood.
#pragma once
#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "hz/table/table.hpp"
#include "hz/table/understanding.hpp"

namespace hz {

/// Up to `count` different values of a column of these rows, as written, in file order; empty cells left out.
[[nodiscard]] std::vector<std::string> sample_values(const Chunk& chunk, std::size_t column, std::size_t count = 3);

struct ReportedColumn {
  std::string header;   // as the file spells it
  std::string meaning;  // canonical name with its part ("teff_err_plus"); empty when the column is not used
  std::string unit;     // as stated or assumed; empty without one
  bool unit_assumed = false;
  std::optional<KnownBy> known_by;  // empty when the column is not used
  std::string doubt;                // why a person must decide; empty when nothing is to decide
  std::vector<std::string> samples;
};

struct ColumnReport {
  std::vector<ReportedColumn> columns;           // in file order, every column of the file once
  std::vector<std::string> missing_for_stars;    // what zones of the stars still need; empty when nothing
  std::vector<std::string> missing_for_planets;  // what placing planets still needs
};

/// `first` holds the first rows of the table; nullopt for a table without rows.
[[nodiscard]] ColumnReport report_columns(const TableHead& head, const Understanding& understanding,
                                          const std::optional<Chunk>& first);

/// A column map to edit: what is understood, what is to decide and what is not used, all behind comment signs, so that
/// it changes nothing as it stands.
[[nodiscard]] std::string starter_map(const TableHead& head, const Understanding& understanding);

}  // namespace hz
