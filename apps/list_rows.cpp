#include "list_rows.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "hz/error.hpp"
#include "interrupt.hpp"
#include "progress.hpp"

namespace hz::app {
namespace {

constexpr auto preference_table = std::to_array<Option>({
    {"prefer", '\0', OptionKind::value, "COLUMN=VALUE", OptionGroup::answer,
     "of several rows of one planet, take the one with this cell, unless one is marked as adopted"},
});

Candidate candidate_of(const Chunk& chunk, std::size_t index, const Understanding& understanding,
                       const RowReading& reading) {
  Candidate candidate;
  candidate.row = understanding.row(chunk, index);
  candidate.row.kept = kept_cells(chunk, index, reading.kept);
  const std::optional<Preference>& preference = reading.preference;
  candidate.preferred =
      preference && !chunk.row_problems[index] && chunk.text(preference->column, index) == preference->value;
  return candidate;
}

std::vector<std::string> identifiers_of(const Chunk& chunk, std::size_t index, const RowReading& reading) {
  std::vector<std::string> cells;
  for (const std::size_t column : reading.identifiers)
    cells.push_back(chunk.row_problems[index] ? "" : chunk.text(column, index));
  return cells;
}

}  // namespace

std::span<const Option> preference_options() { return preference_table; }

std::optional<Preference> read_preference(const Arguments& arguments, const TableHead& head) {
  const std::optional<std::string> text = arguments.knows("prefer") ? arguments.value("prefer") : std::nullopt;
  if (!text) return std::nullopt;
  const std::size_t at = text->find('=');
  if (at == std::string::npos) {
    throw Error(Fault::usage,
                fmt::format("--prefer '{}' has no =; write it like --prefer reference='Lantern DR1'", *text));
  }
  return Preference{column_named("prefer", text->substr(0, at), head), text->substr(at + 1)};
}

ListRows read_rows(const OpenList& list, const RowReading& reading, const Console& console) {
  ListRows rows;
  Progress progress(console, "reading");
  while (const std::optional<Chunk> chunk = list.reader->next()) {
    for (std::size_t i = 0; i < chunk->rows(); ++i) {
      stop_if_asked();
      rows.candidates.push_back(candidate_of(*chunk, i, list.understanding, reading));
      if (!reading.identifiers.empty()) rows.identifiers.push_back(identifiers_of(*chunk, i, reading));
      progress.update(rows.candidates.size());
    }
  }
  if (rows.candidates.empty())
    throw Error(Fault::input, fmt::format("{} has a header but no rows", list.reader->head().source));
  return rows;
}

std::vector<Quantity> stated_quantities(const Understanding& understanding) {
  std::vector<Quantity> stated;
  for (const QuantityInfo& info : all_columns()) {
    const std::optional<Quantity> quantity = quantity_named(info.name);
    if (quantity && understanding.knows(*quantity)) stated.push_back(*quantity);
  }
  return stated;
}

void refuse_unusable(std::span<const Quantity> stated, const std::string& file) {
  const ListRow nothing;
  const bool usable = std::any_of(stated.begin(), stated.end(), [&](Quantity quantity) {
    return quantity == Quantity::spectral_type || stated_field(nothing, quantity) != nullptr;
  });
  if (usable) return;
  throw Error(Fault::input, fmt::format("{0} has no column that hzmap can use; `hzmap columns {0}` shows how each is "
                                        "understood, and writes a map to edit",
                                        file));
}

}  // namespace hz::app
