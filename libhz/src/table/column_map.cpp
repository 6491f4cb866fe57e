#include <fmt/format.h>
#include <toml++/toml.h>

#include <cmath>
#include <string>

#include "hz/error.hpp"
#include "hz/table/understanding.hpp"
#include "hz/units.hpp"
#include "table/column_map_text.hpp"
#include "words.hpp"

namespace hz {
namespace {

std::string in_toml_quotes(std::string_view text) {
  std::string out = "\"";
  for (const char c : text) {
    if (c == '"' || c == '\\') out += '\\';
    if (static_cast<unsigned char>(c) < 0x20U) {
      out += fmt::format("\\u{:04X}", static_cast<unsigned>(c));
    } else {
      out += c;
    }
  }
  return out + '"';
}

class MapParser {
public:
  explicit MapParser(const std::string& file) : file_(file) {}

  ColumnMap parse(std::string_view text) {
    try {
      const auto table = toml::parse(text, file_);
      for (const auto& [key, node] : table) take(key, node);
    } catch (const toml::parse_error& error) {
      throw Error(Fault::input, fmt::format("{}: {}", place(error.source()), error.description()));
    }
    return std::move(map_);
  }

private:
  [[nodiscard]] std::string place(const toml::source_region& source) const {
    return fmt::format("{}:{}:{}", file_, source.begin.line, source.begin.column);
  }
  [[noreturn]] void fail(const toml::source_region& source, const std::string& what) const {
    throw Error(Fault::input, fmt::format("{}: {}", place(source), what));
  }

  void take(const toml::key& key, const toml::node& node) {
    if (key == "missing") {
      for (auto& [text, where] : texts(key, node)) map_.missing_values.push_back(std::move(text));
    } else if (key == "ignore") {
      for (auto& [text, where] : texts(key, node)) map_.ignored.push_back({std::move(text), place(where)});
    } else if (key == "columns") {
      take_columns(key, node);
    } else if (key == "missing_values") {
      take_missing_numbers(key, node);
    } else {
      fail(key.source(), fmt::format("{} is not a key of a column map; the keys are missing, ignore, [columns] and "
                                     "[missing_values]",
                                     words::quoted(key.str())));
    }
  }

  void take_missing_numbers(const toml::key& key, const toml::node& node) {
    const auto* const table = node.as_table();
    if (table == nullptr) fail(key.source(), "missing_values must be a section [missing_values]");
    for (const auto& [name, value] : *table) {
      const auto quantity = quantity_named(name.str());
      if (!quantity || !is_numeric(*quantity))
        fail(name.source(), fmt::format("{} is not a quantity with a number; write it like parallax = [0, -1]",
                                        words::quoted(name.str())));
      if (const auto* const array = value.as_array()) {
        for (const auto& item : *array) map_.missing_numbers.push_back({*quantity, number(item, name.str())});
      } else {
        map_.missing_numbers.push_back({*quantity, number(value, name.str())});
      }
    }
  }

  [[nodiscard]] double number(const toml::node& node, std::string_view what) const {
    const auto value = node.value<double>();
    if (value && std::isfinite(*value)) return *value;
    fail(node.source(), fmt::format("{} must be a number or a list of numbers, as in {} = [0, -1]", what, what));
  }

  std::vector<std::pair<std::string, toml::source_region>> texts(const toml::key& key, const toml::node& node) const {
    std::vector<std::pair<std::string, toml::source_region>> out;
    const auto* const array = node.as_array();
    if (array == nullptr)
      fail(node.source(), fmt::format("{} must be a list of texts, as in {} = [\"…\"]", key.str(), key.str()));
    for (const auto& item : *array) out.emplace_back(text(item, key.str()), item.source());
    return out;
  }

  std::string text(const toml::node& node, std::string_view what) const {
    const auto* const value = node.as_string();
    if (value == nullptr) fail(node.source(), fmt::format("{} must be text in quotes", what));
    return value->get();
  }

  void take_columns(const toml::key& key, const toml::node& node) {
    const auto* const table = node.as_table();
    if (table == nullptr) fail(key.source(), "columns must be a section [columns]");
    for (const auto& [name, value] : *table) {
      if (const auto* const columns = value.as_array()) {
        take_alternatives(name, *columns);
      } else {
        map_.entries.push_back(entry(name, value));
      }
    }
  }

  // Half-widths could not be told apart, so that only text has alternatives.
  void take_alternatives(const toml::key& key, const toml::array& columns) {
    for (const auto& column : columns) {
      map_.entries.push_back(entry(key, column));
      if (!is_numeric(map_.entries.back().quantity)) continue;
      fail(key.source(), fmt::format("{} takes one column; only text, such as star, takes a list of them", key.str()));
    }
  }

  [[nodiscard]] ColumnMap::Entry entry(const toml::key& key, const toml::node& node) const {
    const auto named = part_named(key.str());
    if (!named)
      fail(
          key.source(),
          fmt::format(
              "{} is not a column name of hzmap (with _err, _err_plus, _err_minus, _lower, _upper or _limit behind it)",
              words::quoted(key.str())));
    ColumnMap::Entry out{named->quantity, named->part, {}, {}, place(key.source())};
    if (const auto* const table = node.as_table()) {
      take_details(key, *table, out);
    } else {
      out.column = text(node, key.str());
    }
    return out;
  }

  void take_details(const toml::key& key, const toml::table& table, ColumnMap::Entry& entry) const {
    for (const auto& [name, value] : table) {
      if (name == "column") {
        entry.column = text(value, "column");
      } else if (name == "unit") {
        entry.unit = unit(entry.quantity, value);
      } else {
        fail(name.source(), fmt::format("{} is not known here; a column has {{ column = \"…\", unit = \"…\" }}",
                                        words::quoted(name.str())));
      }
    }
    if (!table.contains("column"))
      fail(key.source(), fmt::format("{} names no column; write {{ column = \"…\", unit = \"…\" }}", key.str()));
  }

  [[nodiscard]] std::string unit(Quantity quantity, const toml::node& node) const {
    auto out = text(node, "unit");
    if (conversion(quantity, out)) return out;
    fail(node.source(), is_numeric(quantity)
                            ? fmt::format("{} is not a unit of {}; the canonical one is {}", words::quoted(out),
                                          name(quantity), words::quoted(info(quantity).unit))
                            : fmt::format("{} has no unit", name(quantity)));
  }

  std::string file_;
  ColumnMap map_;
};

}  // namespace

ColumnMap ColumnMap::parse(std::string_view toml_text, const std::string& file) {
  return MapParser(file).parse(toml_text);
}

std::string map_line(std::string_view key, std::string_view column, std::string_view unit) {
  if (unit.empty()) return fmt::format("{} = {}", key, in_toml_quotes(column));
  return fmt::format("{} = {{ column = {}, unit = {} }}", key, in_toml_quotes(column), in_toml_quotes(unit));
}

std::string ignore_line(std::string_view column) {
  return fmt::format("ignore = [{}]  # above [columns]", in_toml_quotes(column));
}

}  // namespace hz
