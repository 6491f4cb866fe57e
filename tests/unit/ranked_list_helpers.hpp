// A ranked list written and read back, for tests that the file is itself a list.
#pragma once
#include <algorithm>
#include <map>
#include <string>
#include <vector>

#include "hz/ranked_table.hpp"
#include "hz/ranking.hpp"
#include "list_files.hpp"

namespace hz::testing {

/// Every quantity there is: as if the list spoke of them all.
inline std::vector<Quantity> every_quantity() {
  std::vector<Quantity> all;
  for (const QuantityInfo& info : all_columns()) {
    if (const std::optional<Quantity> quantity = quantity_named(info.name)) all.push_back(*quantity);
  }
  return all;
}

inline std::vector<Candidate> answered(const std::vector<ListRow>& rows, const Settings& settings) {
  std::vector<Candidate> candidates;
  for (const ListRow& row : rows) candidates.push_back({row, answer(row, settings), false, ""});
  return candidates;
}

/// As `rank` does it.
inline std::vector<Place> ranked(std::vector<Candidate>& candidates) {
  keep_one_row_a_planet(candidates);
  humble_rows_without_errors(candidates);
  return places_of(candidates);
}

/// Ranked rows by place, then the others in file order.
inline std::vector<RankedRow> output_rows(const std::vector<Candidate>& candidates, const std::vector<Place>& places) {
  std::vector<RankedRow> rows;
  for (const Place& place : places) rows.push_back({candidates[place.candidate], place.rank});
  for (const Candidate& candidate : candidates) {
    if (!candidate.in_the_running()) rows.push_back({candidate, 0});
  }
  return rows;
}

inline void write_ranked(const std::string& path, const std::vector<Candidate>& candidates,
                         const std::vector<Place>& places, const Settings& settings) {
  const std::vector<OutputColumn> columns = ranked_columns(settings, every_quantity(), {});
  const auto writer = create_table(path, head_of(columns));
  writer->write(chunk_of(columns, output_rows(candidates, places)));
  writer->finish();
}

/// What a ranking decides of a row, as the file has it.
inline std::string decision(const RankedRow& row, const Settings& settings) {
  std::string words;
  for (const OutputColumn& column : ranked_columns(settings, {}, {})) {
    const CellValue value = column.value(row);
    if (column.head.name == "reason") continue;  // it may name a line of the file
    words += column.head.name + '=';
    if (const auto* const x = std::get_if<double>(&value)) words += std::to_string(*x);
    if (const auto* const x = std::get_if<std::int64_t>(&value)) words += std::to_string(*x);
    if (const auto* const x = std::get_if<std::string>(&value); x && column.head.name != "note") words += *x;
    words += ' ';
  }
  return words;
}

}  // namespace hz::testing
