#include "bounds_table.hpp"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <array>
#include <cmath>
#include <string>
#include <utility>

namespace hz::app {
namespace {

using Columns = std::vector<OutputColumn>;

CellValue number(const std::optional<double>& x) {
  return x && std::isfinite(*x) ? CellValue(six_digits(*x)) : CellValue();
}

CellValue text(std::string words) { return words.empty() ? CellValue() : CellValue(std::move(words)); }

/// A column whose name stands in catalogs/columns.csv, with the unit and description it has there.
template <class Get>
void add(Columns& columns, const std::string& name, Get get) {
  ColumnHead head{name, "", "", ""};
  for (const QuantityInfo& info : all_columns()) {
    if (info.name == name) head = {info.name, info.unit, info.ucd, info.description};
  }
  columns.push_back({head, std::move(get)});
}

/// What was used of the star: it may differ from what the list states, so it has a name of its own and its route beside
/// it.
void add_used(Columns& columns, Quantity quantity, std::optional<Derived> StarAnswer::*value) {
  const QuantityInfo& about = info(quantity);
  const auto part = [&](const std::string& suffix, const std::string& words,
                        std::optional<double> (*of)(const Measured&)) {
    columns.push_back({{about.name + suffix, about.unit, "", words + about.name}, [value, of](const RankedRow& row) {
                         const std::optional<Derived>& derived = row.candidate.answer.star.*value;
                         return derived ? number(of(derived->measured)) : CellValue();
                       }});
  };
  part("_used", "used: ", [](const Measured& m) { return std::optional(m.value); });
  part("_used_err_minus", "lower half-width of the used ", [](const Measured& m) { return m.minus; });
  part("_used_err_plus", "upper half-width of the used ", [](const Measured& m) { return m.plus; });
  add(columns, about.name + "_route", [value](const RankedRow& row) {
    const std::optional<Derived>& derived = row.candidate.answer.star.*value;
    return derived ? text(derived->route) : CellValue();
  });
}

template <class Get>
void add_edge_part(Columns& columns, const std::string& name, ZoneEdge edge, Get get) {
  add(columns, name, [edge, get](const RankedRow& row) {
    const LimitAtStar* const at_star = find_edge(row.candidate.answer, edge);
    return at_star != nullptr ? number(get(*at_star)) : CellValue();
  });
}

void add_edge(Columns& columns, const std::string& name, ZoneEdge edge) {
  using At = LimitAtStar;
  using Part = std::optional<double>;
  add_edge_part(columns, name + "_edge", edge,
                [](const At& at) { return at.distance ? Part(at.distance->value) : Part(); });
  add_edge_part(columns, name + "_edge_err_minus", edge,
                [](const At& at) { return at.distance ? at.distance->minus : Part(); });
  add_edge_part(columns, name + "_edge_err_plus", edge,
                [](const At& at) { return at.distance ? at.distance->plus : Part(); });
  add_edge_part(columns, name + "_insolation", edge, [](const At& at) { return Part(at.insolation); });
  add_edge_part(columns, name + "_period", edge, [](const At& at) { return at.period; });
  add_edge_part(columns, name + "_angular_separation", edge, [](const At& at) { return at.angular_separation; });
}

void add_outcome(Columns& columns) {
  add(columns, "status", [](const RankedRow& row) {
    return CellValue(row.candidate.answer.status == Status::answered ? "answered" : "set aside");
  });
  add(columns, "reason", [](const RankedRow& row) { return text(row.candidate.answer.reason); });
  add(columns, "note", [](const RankedRow& row) { return text(row.candidate.answer.note); });
  add(columns, "flags",
      [](const RankedRow& row) { return text(fmt::format("{}", fmt::join(row.candidate.answer.flags, ";"))); });
}

/// What the answers hang on beside the row.
void add_basis(Columns& columns, const Settings& settings) {
  add(columns, "limit_set", [key = settings.limits->key](const RankedRow&) { return CellValue(key); });
  const std::string asymmetry = settings.asymmetry == Asymmetry::median ? "median" : "mode";
  add(columns, "asymmetry", [asymmetry](const RankedRow&) { return CellValue(asymmetry); });
}

}  // namespace

std::vector<OutputColumn> bounds_columns(const Settings& settings, const std::vector<ColumnHead>& kept) {
  Columns columns;
  add(columns, "star", [](const RankedRow& row) { return text(row.candidate.row.star.name); });
  add(columns, "planet", [](const RankedRow& row) { return text(row.candidate.row.planet.name); });
  add_outcome(columns);
  add_used(columns, Quantity::teff, &StarAnswer::teff);
  add_used(columns, Quantity::luminosity, &StarAnswer::luminosity);
  add_used(columns, Quantity::stellar_radius, &StarAnswer::stellar_radius);
  add_used(columns, Quantity::stellar_mass, &StarAnswer::stellar_mass);
  add_used(columns, Quantity::distance, &StarAnswer::distance);
  add_edge(columns, "optimistic_inner", ZoneEdge::optimistic_inner);
  add_edge(columns, "conservative_inner", ZoneEdge::conservative_inner);
  add_edge(columns, "conservative_outer", ZoneEdge::conservative_outer);
  add_edge(columns, "optimistic_outer", ZoneEdge::optimistic_outer);
  add_basis(columns, settings);
  for (std::size_t i = 0; i < kept.size(); ++i)
    columns.push_back({kept[i], [i](const RankedRow& row) { return text(row.candidate.row.kept.at(i)); }});
  return columns;
}

}  // namespace hz::app
