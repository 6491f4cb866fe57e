#include "hz/quantity.hpp"

#include <algorithm>

#include "column_catalog.hpp"
#include "hz/require.hpp"
#include "words.hpp"

namespace hz::embedded {
extern const std::string_view columns_csv;
}

namespace hz {
namespace {

constexpr auto quantity_count = static_cast<std::size_t>(Quantity::note) + 1;

// Cells of the catalogue never hold a separator or a quote (a test reads it with the full reader).
enum Cell : std::size_t {
  name_cell,
  symbol_cell,
  unit_cell,
  unit_votable_cell,
  ucd_cell,
  ucd_also_cell,
  role_cell,
  accept_cell,
  description_cell,
  cell_count
};

std::vector<std::string> spellings(std::string_view cell) {
  std::vector<std::string> out;
  if (cell.empty()) return out;
  for (const auto word : words::split(cell, '|')) out.emplace_back(word);
  return out;
}

QuantityInfo parsed(const std::vector<std::string_view>& cells) {
  QuantityInfo info;
  info.name = cells[name_cell];
  info.symbol = cells[symbol_cell];
  info.unit = cells[unit_cell];
  info.ucd = cells[ucd_cell];
  info.accept = spellings(cells[accept_cell]);
  info.description = cells[description_cell];
  info.in = cells[role_cell] == "in" || cells[role_cell] == "both";
  info.out = cells[role_cell] == "out" || cells[role_cell] == "both";
  return info;
}

void add_row(ColumnCatalog& catalog, const std::vector<std::string_view>& cells) {
  HZ_REQUIRE(cells.size() == cell_count);
  if (cells[name_cell].starts_with("X_")) {
    catalog.patterns.push_back({std::string(cells[name_cell]), spellings(cells[accept_cell])});
    return;
  }
  catalog.columns.push_back(parsed(cells));
  // The enumerators stand in the order of the rows that can be read.
  if (catalog.columns.back().in) catalog.quantity_index.push_back(catalog.columns.size() - 1);
}

ColumnCatalog parse_catalog(std::string_view text) {
  ColumnCatalog catalog;
  bool header_seen = false;
  for (const auto line : words::split(text, '\n')) {
    if (line.empty() || line.front() == '#') continue;
    if (header_seen) add_row(catalog, words::split(line, ','));
    header_seen = true;
  }
  HZ_REQUIRE(catalog.quantity_index.size() == quantity_count);
  return catalog;
}

}  // namespace

const ColumnCatalog& column_catalog() {
  static const ColumnCatalog catalog = parse_catalog(embedded::columns_csv);
  return catalog;
}

std::span<const QuantityInfo> all_columns() { return column_catalog().columns; }

const QuantityInfo& info(Quantity quantity) {
  const auto& catalog = column_catalog();
  return catalog.columns[catalog.quantity_index[static_cast<std::size_t>(quantity)]];
}

std::string_view name(Quantity quantity) { return info(quantity).name; }

std::optional<Quantity> quantity_named(std::string_view canonical_name) {
  for (std::size_t i = 0; i < quantity_count; ++i) {
    if (name(static_cast<Quantity>(i)) == canonical_name) return static_cast<Quantity>(i);
  }
  return std::nullopt;
}

bool is_numeric(Quantity quantity) {
  switch (quantity) {
    case Quantity::star:
    case Quantity::star_id:
    case Quantity::planet:
    case Quantity::ra:
    case Quantity::dec:
    case Quantity::spectral_type:
    case Quantity::number_of_stars:
    case Quantity::circumbinary:
    case Quantity::planet_mass_kind:
    case Quantity::adopted:
    case Quantity::reference:
    case Quantity::note: return false;
    default: return true;
  }
}

}  // namespace hz
