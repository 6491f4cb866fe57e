#include "hz/ranked_table.hpp"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <cmath>
#include <cstdlib>
#include <limits>

#include "hz/require.hpp"
#include "stated_fields.hpp"

namespace hz {
namespace {

using Getter = std::function<CellValue(const RankedRow&)>;

CellValue number(const std::optional<double>& x) {
  return x && std::isfinite(*x) ? CellValue(six_digits(*x)) : CellValue();
}

CellValue probability(const std::optional<double>& p) {
  return p ? CellValue(std::round(*p * 1e6) / 1e6) : CellValue();
}

CellValue text(std::string_view words) { return words.empty() ? CellValue() : CellValue(std::string(words)); }

/// Head of a column of catalogs/columns.csv.
ColumnHead head(std::string_view name) {
  for (const QuantityInfo& info : all_columns()) {
    if (info.name == name) return {info.name, info.unit, info.ucd, info.description};
  }
  return {std::string(name), "", "", ""};
}

/// A getter that is empty for rows without a planet's answer.
template <class Get>
Getter of_planet(Get get) {
  return [get](const RankedRow& row) {
    const std::optional<PlanetAnswer>& planet = row.candidate.answer.planet;
    return planet ? get(*planet) : CellValue();
  };
}

void add_names(std::vector<OutputColumn>& columns) {
  columns.push_back({head("rank"), [](const RankedRow& row) {
                       return row.rank > 0 ? CellValue(static_cast<std::int64_t>(row.rank)) : CellValue();
                     }});
  columns.push_back({head("planet"), [](const RankedRow& row) { return text(row.candidate.row.planet.name); }});
  columns.push_back({head("star"), [](const RankedRow& row) { return text(row.candidate.row.star.name); }});
  columns.push_back({head("status"), [](const RankedRow& row) {
                       if (!row.candidate.cut_reason.empty()) return CellValue("cut");
                       return CellValue(row.candidate.answer.status == Status::answered ? "answered" : "set aside");
                     }});
  columns.push_back({head("reason"), [](const RankedRow& row) {
                       const std::string& cut = row.candidate.cut_reason;
                       return text(cut.empty() ? row.candidate.answer.reason : cut);
                     }});
}

void add_decision(std::vector<OutputColumn>& columns) {
  const auto add = [&](std::string_view name, auto get) { columns.push_back({head(name), of_planet(get)}); };
  add("merit", [](const PlanetAnswer& p) { return probability(p.merit); });
  add("p_conservative", [](const PlanetAnswer& p) { return probability(p.probabilities.conservative); });
  add("p_optimistic", [](const PlanetAnswer& p) { return probability(p.probabilities.optimistic); });
  add("p_too_hot", [](const PlanetAnswer& p) { return probability(p.probabilities.too_hot); });
  add("p_too_cold", [](const PlanetAnswer& p) { return probability(p.probabilities.too_cold); });
  add("p_unanswered", [](const PlanetAnswer& p) { return probability(p.probabilities.unanswered); });
  add("verdict_conservative",
      [](const PlanetAnswer& p) { return p.conservative ? text(word(*p.conservative)) : CellValue(); });
  add("verdict_optimistic",
      [](const PlanetAnswer& p) { return p.optimistic ? text(word(*p.optimistic)) : CellValue(); });
  add("side", [](const PlanetAnswer& p) { return p.side ? text(word(*p.side)) : CellValue(); });
  add("zone_position", [](const PlanetAnswer& p) { return number(p.zone_position); });
  add("nearest_limit", [](const PlanetAnswer& p) { return p.margin ? text(p.margin->limit->key()) : CellValue(); });
  add("margin_distance", [](const PlanetAnswer& p) { return p.margin ? number(p.margin->distance) : CellValue(); });
  add("margin_widths", [](const PlanetAnswer& p) { return p.margin ? number(p.margin->widths) : CellValue(); });
  add("orbit_share", [](const PlanetAnswer& p) { return probability(p.orbit_share); });
  add("equilibrium_temperature_used", [](const PlanetAnswer& p) { return number(p.equilibrium_temperature); });
  columns.push_back({head("flags"), [](const RankedRow& row) {
                       return text(fmt::format("{}", fmt::join(row.candidate.answer.flags, ";")));
                     }});
  columns.push_back({head("note"), [](const RankedRow& row) { return text(row.candidate.answer.note); }});
}

/// X_used with its half-widths and route. X itself stays what the list states, so that the file is itself a list.
template <class Get>
void add_used(std::vector<OutputColumn>& columns, Quantity quantity, Get get) {
  const QuantityInfo& about = info(quantity);
  const std::string used = about.name + "_used";
  const auto part = [&](const std::string& suffix, const std::string& words, auto of) {
    columns.push_back({{used + suffix, about.unit, suffix.empty() ? about.ucd : "stat.error;" + about.ucd, words},
                       [get, of](const RankedRow& row) {
                         const std::optional<Derived> derived = get(row.candidate.answer);
                         return derived ? number(of(derived->measured)) : CellValue();
                       }});
  };
  part("", about.description + ", as used", [](const Measured& m) { return std::optional(m.value); });
  part("_err_minus", "lower half-width of " + used, [](const Measured& m) { return m.minus; });
  part("_err_plus", "upper half-width of " + used, [](const Measured& m) { return m.plus; });
  columns.push_back(
      {{about.name + "_route", "", "meta.note", "how " + used + " was obtained"}, [get](const RankedRow& row) {
         const std::optional<Derived> derived = get(row.candidate.answer);
         return derived ? text(derived->route) : CellValue();
       }});
}

void add_all_used(std::vector<OutputColumn>& columns) {
  add_used(columns, Quantity::teff, [](const Answer& a) { return a.star.teff; });
  add_used(columns, Quantity::luminosity, [](const Answer& a) { return a.star.luminosity; });
  add_used(columns, Quantity::stellar_radius, [](const Answer& a) { return a.star.stellar_radius; });
  add_used(columns, Quantity::stellar_mass, [](const Answer& a) { return a.star.stellar_mass; });
  add_used(columns, Quantity::distance, [](const Answer& a) { return a.star.distance; });
  add_used(columns, Quantity::semi_major_axis,
           [](const Answer& a) { return a.planet ? a.planet->semi_major_axis : std::nullopt; });
  add_used(columns, Quantity::insolation,
           [](const Answer& a) { return a.planet ? std::optional(a.planet->insolation) : std::nullopt; });
  add_used(columns, Quantity::planet_radius,
           [](const Answer& a) { return a.planet ? a.planet->planet_radius : std::nullopt; });
  add_used(columns, Quantity::planet_mass,
           [](const Answer& a) { return a.planet ? std::optional(a.planet->planet_mass) : std::nullopt; });
}

/// The zone limits' distances and insolations at the star, for this planet's mass.
void add_edges(std::vector<OutputColumn>& columns) {
  struct Named {
    std::string_view name;
    ZoneEdge edge;
  };
  for (const Named edge : {Named{"optimistic_inner", ZoneEdge::optimistic_inner},
                           Named{"conservative_inner", ZoneEdge::conservative_inner},
                           Named{"conservative_outer", ZoneEdge::conservative_outer},
                           Named{"optimistic_outer", ZoneEdge::optimistic_outer}}) {
    const auto find = [edge](const RankedRow& row) { return find_edge(row.candidate.answer, edge.edge); };
    columns.push_back({head(std::string(edge.name) + "_edge"), [find](const RankedRow& row) {
                         const LimitAtStar* at = find(row);
                         return at && at->distance ? number(at->distance->value) : CellValue();
                       }});
    columns.push_back({head(std::string(edge.name) + "_insolation"), [find](const RankedRow& row) {
                         const LimitAtStar* at = find(row);
                         return at ? number(at->insolation) : CellValue();
                       }});
  }
}

/// What the answers hang on beside the row: the limit set and the meaning of asymmetric values.
void add_basis(std::vector<OutputColumn>& columns, const Settings& settings) {
  const auto add = [&](const char* name, const char* words, const std::string& value) {
    columns.push_back({{name, "", "meta.note", words}, [value](const RankedRow&) { return text(value); }});
  };
  add("limit_set", "key of the limit set", settings.limits ? settings.limits->key : "");
  add("asymmetry", "what an asymmetric value is taken for: median or mode",
      settings.asymmetry == Asymmetry::median ? "median" : "mode");
}

Getter stated_part(Quantity quantity, std::function<CellValue(const Measured&)> part) {
  return [quantity, part = std::move(part)](const RankedRow& row) {
    const Field* field = stated_field(row.candidate.row, quantity);
    return field && field->stated ? part(*field->stated) : CellValue();
  };
}

/// The value, or the cell as it stands where it could not be read: a second reading meets the same trouble.
Getter stated_value(Quantity quantity) {
  return [quantity](const RankedRow& row) {
    const Field* field = stated_field(row.candidate.row, quantity);
    if (field == nullptr) return CellValue();
    if (field->problem) return text(field->problem->cell);
    return field->stated ? CellValue(field->stated->value) : CellValue();
  };
}

CellValue exact_number(const std::optional<double>& x) { return x ? CellValue(*x) : CellValue(); }

/// The stated value comes back digit for digit, so that the file is itself a list.
void add_stated(std::vector<OutputColumn>& columns, Quantity quantity) {
  const ColumnHead about = head(name(quantity));
  if (!is_numeric(quantity)) {
    columns.push_back(
        {about, [quantity](const RankedRow& row) { return text(stated_text(row.candidate.row, quantity)); }});
    return;
  }
  const auto part = [&](const std::string& suffix, const std::string& words,
                        std::function<CellValue(const Measured&)> of) {
    const bool number_like = suffix != "_limit";
    columns.push_back({{about.name + suffix, number_like ? about.unit : "",
                        (number_like ? "stat.error;" : "meta.code.error;") + about.ucd, words},
                       stated_part(quantity, std::move(of))});
  };
  columns.push_back({about, stated_value(quantity)});
  part("_err_minus", "lower half-width of " + about.name, [](const Measured& m) { return exact_number(m.minus); });
  part("_err_plus", "upper half-width of " + about.name, [](const Measured& m) { return exact_number(m.plus); });
  part("_limit", "< or > where " + about.name + " is only a limit", [](const Measured& m) {
    return m.limit == LimitMark::none ? CellValue() : text(m.limit == LimitMark::upper ? "<" : ">");
  });
}

void add_kept(std::vector<OutputColumn>& columns, const std::vector<ColumnHead>& kept) {
  for (std::size_t i = 0; i < kept.size(); ++i) {
    columns.push_back({kept[i], [i](const RankedRow& row) { return text(row.candidate.row.kept.at(i)); }});
  }
}

/// One output column's cells, as numbers when all of them are.
Cells cells_of(const OutputColumn& column, const std::vector<RankedRow>& rows, Chunk& chunk) {
  std::vector<CellValue> values;
  bool reals = true;
  bool whole = true;
  for (const RankedRow& row : rows) {
    values.push_back(column.value(row));
    const CellValue& value = values.back();
    reals = reals && !std::holds_alternative<std::string>(value) && !std::holds_alternative<std::int64_t>(value);
    whole = whole && !std::holds_alternative<std::string>(value) && !std::holds_alternative<double>(value);
  }
  if (reals) {
    std::vector<double> cells;
    for (const CellValue& value : values) {
      const double* x = std::get_if<double>(&value);
      cells.push_back(x ? *x : std::numeric_limits<double>::quiet_NaN());
    }
    return cells;
  }
  if (whole) {
    std::vector<std::optional<std::int64_t>> cells;
    for (const CellValue& value : values) {
      const std::int64_t* x = std::get_if<std::int64_t>(&value);
      cells.push_back(x ? std::optional(*x) : std::nullopt);
    }
    return cells;
  }
  std::vector<std::string_view> cells;
  for (CellValue& value : values) {
    if (const double* x = std::get_if<double>(&value))
      value = fmt::format("{}", *x);  // beside cells that are no numbers
    std::string* words = std::get_if<std::string>(&value);
    if (words == nullptr || words->empty()) {
      cells.emplace_back();
      continue;
    }
    chunk.storage.push_back(std::make_unique<std::string>(std::move(*words)));
    cells.emplace_back(*chunk.storage.back());
  }
  return cells;
}

}  // namespace

std::vector<OutputColumn> ranked_columns(const Settings& settings, const std::vector<Quantity>& stated,
                                         const std::vector<ColumnHead>& kept) {
  std::vector<OutputColumn> columns;
  add_names(columns);
  add_decision(columns);
  add_all_used(columns);
  add_edges(columns);
  add_basis(columns, settings);
  for (const Quantity quantity : stated) {
    if (quantity == Quantity::planet || quantity == Quantity::star || quantity == Quantity::note) continue;
    if (is_numeric(quantity) ? has_stated_field(quantity) : has_stated_text(quantity)) add_stated(columns, quantity);
  }
  add_kept(columns, kept);
  return columns;
}

TableHead head_of(const std::vector<OutputColumn>& columns) {
  TableHead head;
  for (const OutputColumn& column : columns) head.columns.push_back(column.head);
  return head;
}

Chunk chunk_of(const std::vector<OutputColumn>& columns, const std::vector<RankedRow>& rows) {
  Chunk chunk;
  chunk.row_problems.resize(rows.size());
  for (const OutputColumn& column : columns) chunk.columns.push_back(cells_of(column, rows, chunk));
  return chunk;
}

double six_digits(double x) { return std::strtod(fmt::format("{:.6g}", x).c_str(), nullptr); }

}  // namespace hz
