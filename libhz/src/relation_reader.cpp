#include "relation_reader.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <limits>
#include <utility>

#include "main_sequence_table.hpp"

namespace hz {
namespace {

/// One of a few words that a key may hold.
bool is_word(const TomlTable& table, std::string_view key, std::string_view yes, std::string_view no) {
  const std::string word = table.text_or(key, no);
  if (word != yes && word != no) {
    table.fail(key, fmt::format("{}: '{}' is '{}'; write \"{}\" or \"{}\"", table.name(), key, word, yes, no));
  }
  return word == yes;
}

double number_or(const TomlTable& table, std::string_view key, double otherwise) {
  return table.has(key) ? table.number(key) : otherwise;
}

/// Ends of pieces stand as printed: in x, in log10 x where the paper counts in it, or in 10^x where x is a logarithm.
double in_x(const TomlTable& table, double end) {
  const std::string scale = table.text_or("ends_in", "x");
  if (scale == "x") return end;
  if (scale == "log10(x)") return std::pow(10, end);
  if (scale == "10^x") return std::log10(end);
  table.fail("ends_in",
             fmt::format("{}: 'ends_in' is '{}'; write \"x\", \"log10(x)\" or \"10^x\"", table.name(), scale));
}

Range read_range(const TomlTable& table) {
  const std::vector<double> ends = table.numbers("range");
  if (ends.size() != 2 || !(ends[0] < ends[1])) {
    table.fail("range", fmt::format("{}: 'range' is not two rising numbers; write [lowest, highest]", table.name()));
  }
  return {in_x(table, ends[0]), in_x(table, ends[1])};
}

}  // namespace

RelationReader::RelationReader(std::string_view toml_text, std::string file)
    : file_(std::move(file)), root_(parse_toml(toml_text, file_)) {}

std::vector<Relation> RelationReader::read() {
  const TomlTable all(root_, file_, "the file");
  all.allow_only({"relation"});
  std::vector<Relation> relations;
  for (const toml::node& node : all.tables("relation")) {
    const std::string key = TomlTable(node, file_, "a [[relation]]").text("key");
    relations.push_back(read_relation(TomlTable(node, file_, fmt::format("relation '{}'", key))));
  }
  return relations;
}

Relation RelationReader::read_relation(const TomlTable& table) const {
  // clang-format off
  table.allow_only({"key", "label", "x", "x_unit", "y", "y_unit", "citation", "doi", "provenance", "warning",
                    "holds_for", "solar_bolometric_magnitude", "range", "ends_in", "argument", "argument_minus",
                    "argument_over", "value", "value_times", "piece", "x_column", "y_column", "inverse_of", "scatter",
                    "scatter_is", "scatter_piece", "scatter_source"});
  // clang-format on
  Relation relation;
  read_words(table, relation);
  if (table.has("inverse_of")) {
    read_inverse(table, relation);
    return relation;
  }
  if (table.has("x_column")) {
    read_columns(table, relation);
  } else {
    read_polynomial(table, relation);
  }
  read_scatter(table, relation);
  return relation;
}

void RelationReader::read_words(const TomlTable& table, Relation& relation) const {
  relation.key = table.text("key");
  relation.label = table.text("label");
  relation.x = table.text("x");
  relation.y = table.text("y");
  relation.x_unit = table.text_or("x_unit", "");
  relation.y_unit = table.text_or("y_unit", "");
  relation.citation = table.text("citation");
  relation.doi = table.text("doi");
  relation.provenance = table.text("provenance");
  relation.scatter_source = table.text("scatter_source");
  relation.warning = table.text_or("warning", "");
  relation.main_sequence = is_word(table, "holds_for", "dwarfs", "all stars");
  if (table.has("solar_bolometric_magnitude")) {
    relation.solar_bolometric_magnitude = table.number("solar_bolometric_magnitude");
  }
}

PiecewisePolynomial RelationReader::pieces(const TomlTable& table, std::string_view key) const {
  const Argument argument{is_word(table, "argument", "log10(x)", "x"), number_or(table, "argument_minus", 0),
                          number_or(table, "argument_over", 1)};
  const double lowest = table.has("range") ? read_range(table).low : -std::numeric_limits<double>::infinity();
  std::vector<PolynomialPiece> pieces;
  for (const toml::node& node : table.tables(key)) {
    const TomlTable piece(node, file_, fmt::format("a piece of {}", table.name()));
    piece.allow_only({"from", "c"});
    const double from = pieces.empty() ? lowest : in_x(table, piece.number("from"));
    if (!pieces.empty() && from <= pieces.back().from) {
      piece.fail("from", fmt::format("{}: 'from' does not rise; order the pieces", table.name()));
    }
    pieces.push_back({from, piece.numbers("c")});
  }
  return {argument, std::move(pieces)};
}

void RelationReader::read_polynomial(const TomlTable& table, Relation& relation) const {
  relation.range_ = read_range(table);
  PiecewisePolynomial polynomial = pieces(table, "piece");
  for (const PolynomialPiece& piece : polynomial.pieces()) {
    if (piece.from > relation.range_.low) relation.breaks_.push_back(piece.from);
  }
  const bool power = is_word(table, "value", "10^c", "c");
  const double factor = number_or(table, "value_times", 1);
  relation.value_ = [polynomial = std::move(polynomial), power, factor](double x) {
    return factor * (power ? std::pow(10, polynomial(x)) : polynomial(x));
  };
}

void RelationReader::read_columns(const TomlTable& table, Relation& relation) const {
  const std::optional<Range> within = table.has("range") ? std::optional(read_range(table)) : std::nullopt;
  Polyline rows(main_sequence_points(table.text("x_column"), table.text("y_column"), within));
  relation.range_ = {rows.points().front().x, rows.points().back().x};
  relation.value_ = std::move(rows);
}

/// A relation of straight rising pieces, read backwards; its scatter is the other's over its slope.
void RelationReader::read_inverse(const TomlTable& table, Relation& relation) const {
  const std::string of = table.text("inverse_of");
  const toml::array& all = *root_["relation"].as_array();
  const auto named = [&of](const toml::node& node) { return (*node.as_table())["key"].value_or(std::string()) == of; };
  const auto found = std::find_if(all.begin(), all.end(), named);
  if (found == all.end()) {
    table.fail("inverse_of", fmt::format("{}: the file has no relation '{}'; name another", table.name(), of));
  }
  const TomlTable other(*found, file_, fmt::format("relation '{}'", of));
  const Relation forward = read_relation(other);
  const Polyline back = inverse(pieces(other, "piece"), forward.range().low, forward.range().high);
  relation.range_ = {back.points().front().x, back.points().back().x};
  relation.value_ = back;
  relation.scatter_ = [forward, back](double y) { return forward.scatter(back(y)) / forward.slope(back(y)); };
}

void RelationReader::read_scatter(const TomlTable& table, Relation& relation) const {
  const bool is_fraction = is_word(table, "scatter_is", "fraction", "absolute");
  const PiecewisePolynomial scatter = table.has("scatter_piece")
                                          ? pieces(table, "scatter_piece")
                                          : PiecewisePolynomial({}, {{relation.range_.low, {table.number("scatter")}}});
  relation.scatter_ = [scatter, is_fraction, value = relation.value_](double x) {
    return is_fraction ? scatter(x) * value(x) : scatter(x);
  };
}

}  // namespace hz
