#include "bounds_table.hpp"

#include <fmt/format.h>

#include <array>
#include <cmath>
#include <functional>
#include <limits>

#include "hz/quantity.hpp"
#include "numbers.hpp"

namespace hz::app {
namespace {

constexpr double no_value = std::numeric_limits<double>::quiet_NaN();  // the table layer writes an empty cell for it
constexpr int written_digits = 7;  // far below any half-width, and as far as the published fits carry

struct Source {
  const ListRow& row;
  const Answer& answer;
  const LimitSet& set;
};

/// A column of ours: its head and what a row has to say in it.
struct TextColumn {
  ColumnHead head;
  std::function<std::string(const Source&)> cell;
};
struct NumberColumn {
  ColumnHead head;
  std::function<std::optional<double>(const Source&)> cell;
};
using OwnColumn = std::variant<TextColumn, NumberColumn>;

enum class EdgePart { distance, minus, plus, insolation, period, angular_separation };

struct Edge {
  const char* name;
  std::optional<Zone> LimitSet::*zone;
  std::size_t Zone::*limit;
};
constexpr std::array<Edge, 4> edges{{{"optimistic_inner", &LimitSet::optimistic, &Zone::inner},
                                     {"conservative_inner", &LimitSet::conservative, &Zone::inner},
                                     {"conservative_outer", &LimitSet::conservative, &Zone::outer},
                                     {"optimistic_outer", &LimitSet::optimistic, &Zone::outer}}};

const LimitAtStar* edge_at_star(const Source& source, const Edge& edge) {
  const std::optional<Zone>& zone = source.set.*edge.zone;
  if (!zone) return nullptr;
  const FluxLimit* const wanted = &source.set.limits[(*zone).*edge.limit];
  for (const LimitAtStar& each : source.answer.limits) {
    if (each.limit == wanted) return &each;
  }
  return nullptr;
}

std::optional<double> edge_value(const Source& source, const Edge& edge, EdgePart part) {
  const LimitAtStar* const at_star = edge_at_star(source, edge);
  if (at_star == nullptr) return std::nullopt;
  switch (part) {
    case EdgePart::insolation:
      return at_star->insolation;
    case EdgePart::period:
      return at_star->period;
    case EdgePart::angular_separation:
      return at_star->angular_separation;
    default:
      break;
  }
  if (!at_star->distance) return std::nullopt;
  const Measured& distance = *at_star->distance;
  return part == EdgePart::distance ? distance.value : part == EdgePart::minus ? distance.minus : distance.plus;
}

NumberColumn edge_column(const Edge& edge, EdgePart part, const char* suffix, const char* unit) {
  return {{fmt::format("{}_{}", edge.name, suffix), unit, "", ""},
          [&edge, part](const Source& source) { return edge_value(source, edge, part); }};
}

void add_edge(std::vector<OwnColumn>& columns, const Edge& edge) {
  columns.emplace_back(edge_column(edge, EdgePart::distance, "edge", "AU"));
  columns.emplace_back(edge_column(edge, EdgePart::minus, "edge_err_minus", "AU"));
  columns.emplace_back(edge_column(edge, EdgePart::plus, "edge_err_plus", "AU"));
  columns.emplace_back(edge_column(edge, EdgePart::insolation, "insolation", ""));
  columns.emplace_back(edge_column(edge, EdgePart::period, "period", "d"));
  columns.emplace_back(edge_column(edge, EdgePart::angular_separation, "angular_separation", "mas"));
}

using StarValue = std::optional<Derived> StarAnswer::*;

NumberColumn star_column(Quantity quantity, const char* suffix, StarValue value,
                         std::optional<double> (*part)(const Measured&)) {
  return {{fmt::format("{}{}", name(quantity), suffix), info(quantity).unit, "", ""},
          [value, part](const Source& source) -> std::optional<double> {
            const std::optional<Derived>& derived = source.answer.star.*value;
            return derived ? part(derived->measured) : std::nullopt;
          }};
}

void add_star_value(std::vector<OwnColumn>& columns, Quantity quantity, StarValue value) {
  columns.emplace_back(star_column(quantity, "", value, [](const Measured& m) { return std::optional(m.value); }));
  columns.emplace_back(star_column(quantity, "_err_minus", value, [](const Measured& m) { return m.minus; }));
  columns.emplace_back(star_column(quantity, "_err_plus", value, [](const Measured& m) { return m.plus; }));
  columns.emplace_back(TextColumn{{fmt::format("{}_route", name(quantity)), "", "", ""}, [value](const Source& source) {
                                    const std::optional<Derived>& derived = source.answer.star.*value;
                                    return derived ? derived->route : std::string();
                                  }});
}

std::string joined(const std::vector<std::string>& words) {
  std::string result;
  for (const std::string& word : words) result += (result.empty() ? "" : ";") + word;
  return result;
}

void add_text(std::vector<OwnColumn>& columns, const char* column, std::string (*cell)(const Source&)) {
  columns.emplace_back(TextColumn{{column, "", "", ""}, cell});
}

std::vector<OwnColumn> own_columns() {
  std::vector<OwnColumn> columns;
  add_text(columns, "star", [](const Source& source) { return source.row.star.name; });
  add_text(columns, "planet", [](const Source& source) { return source.row.planet.name; });
  add_star_value(columns, Quantity::teff, &StarAnswer::teff);
  add_star_value(columns, Quantity::luminosity, &StarAnswer::luminosity);
  add_star_value(columns, Quantity::stellar_mass, &StarAnswer::stellar_mass);
  add_star_value(columns, Quantity::distance, &StarAnswer::distance);
  for (const Edge& edge : edges) add_edge(columns, edge);
  add_text(columns, "limit_set", [](const Source& source) { return source.set.key; });
  add_text(columns, "status", [](const Source& source) {
    return std::string(source.answer.status == Status::answered ? "answered" : "set aside");
  });
  add_text(columns, "reason", [](const Source& source) { return source.answer.reason; });
  add_text(columns, "flags", [](const Source& source) { return joined(source.answer.flags); });
  return columns;
}

const std::vector<OwnColumn>& all_own_columns() {
  static const std::vector<OwnColumn> columns = own_columns();
  return columns;
}

const ColumnHead& head_of(const OwnColumn& column) {
  return std::visit([](const auto& each) -> const ColumnHead& { return each.head; }, column);
}

std::string_view store(Chunk& chunk, std::string text) {
  chunk.storage.push_back(std::make_unique<std::string>(std::move(text)));
  return *chunk.storage.back();
}

Cells text_cells(Chunk& chunk, const std::vector<Source>& sources,
                 const std::function<std::string(const Source&)>& cell) {
  std::vector<std::string_view> cells;
  for (const Source& source : sources) cells.push_back(store(chunk, cell(source)));
  return cells;
}

Cells number_cells(const std::vector<Source>& sources, const NumberColumn& column) {
  std::vector<double> cells;
  for (const Source& source : sources) {
    const std::optional<double> value = column.cell(source);
    cells.push_back(value && std::isfinite(*value) ? rounded(*value, written_digits) : no_value);
  }
  return cells;
}

Cells cells_of(Chunk& chunk, const std::vector<Source>& sources, const OwnColumn& column) {
  if (const auto* const number = std::get_if<NumberColumn>(&column)) return number_cells(sources, *number);
  return text_cells(chunk, sources, std::get<TextColumn>(column).cell);
}

}  // namespace

BoundsTable::BoundsTable(const LimitSet& set, std::vector<ColumnHead> kept) : set_(&set), kept_(kept.size()) {
  for (const OwnColumn& column : all_own_columns()) head_.columns.push_back(head_of(column));
  for (ColumnHead& column : kept) head_.columns.push_back(std::move(column));
}

std::vector<std::string> BoundsTable::own_names() {
  std::vector<std::string> names;
  for (const OwnColumn& column : all_own_columns()) names.push_back(head_of(column).name);
  return names;
}

Chunk BoundsTable::chunk(const std::vector<ListRow>& rows, const std::vector<Answer>& answers) const {
  std::vector<Source> sources;
  for (std::size_t i = 0; i < rows.size(); ++i) sources.push_back({rows[i], answers[i], *set_});
  Chunk chunk;
  chunk.row_problems.resize(rows.size());
  for (const OwnColumn& column : all_own_columns()) chunk.columns.push_back(cells_of(chunk, sources, column));
  for (std::size_t k = 0; k < kept_; ++k)
    chunk.columns.push_back(text_cells(chunk, sources, [k](const Source& source) { return source.row.kept[k]; }));
  return chunk;
}

}  // namespace hz::app
