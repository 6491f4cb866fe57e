#include "toml_table.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <utility>

#include "hz/error.hpp"

namespace hz {
namespace {

[[noreturn]] void fail_at_region(const toml::source_region& region, const std::string& file, const std::string& what) {
  const toml::source_position& place = region.begin;
  throw Error(Fault::input, fmt::format("{}:{}:{}: {}", file, place.line, place.column, what));
}

std::string_view kind(const toml::node& node) {
  switch (node.type()) {
    case toml::node_type::table: return "a table";
    case toml::node_type::array: return "a list";
    case toml::node_type::string: return "text";
    case toml::node_type::integer:
    case toml::node_type::floating_point: return "a number";
    case toml::node_type::boolean: return "true or false";
    default: return "a date or time";
  }
}

const toml::table& as_table(const toml::node& node, const std::string& file, const std::string& name) {
  if (!node.is_table()) fail_at(node, file, fmt::format("{} is {}; write it as a table", name, kind(node)));
  return *node.as_table();
}

}  // namespace

toml::table parse_toml(std::string_view text, const std::string& file) {
  try {
    return toml::parse(text, std::string_view(file));
  } catch (const toml::parse_error& error) {
    fail_at_region(error.source(), file, fmt::format("{}; mend the TOML there", error.description()));
  }
}

void fail_at(const toml::node& node, const std::string& file, const std::string& what) {
  fail_at_region(node.source(), file, what);
}

TomlTable::TomlTable(const toml::table& table, std::string file, std::string name)
    : table_(&table), file_(std::move(file)), name_(std::move(name)) {}

TomlTable::TomlTable(const toml::node& node, const std::string& file, const std::string& name)
    : TomlTable(as_table(node, file, name), file, name) {}

void TomlTable::allow_only(std::initializer_list<std::string_view> keys) const {
  for (const auto& [key, node] : *table_) {
    if (std::find(keys.begin(), keys.end(), key.str()) != keys.end()) continue;
    fail_at_region(key.source(), file_,
                   fmt::format("{} has an unknown key '{}'; known here: {}", name_, key.str(), fmt::join(keys, ", ")));
  }
}

std::string TomlTable::text(std::string_view key) const {
  const toml::node& node = need(key);
  const auto* text = node.as_string();
  if (text == nullptr) fail(key, fmt::format("{}: '{}' is {}; write text in quotes", name_, key, kind(node)));
  if (text->get().empty()) fail(key, fmt::format("{}: '{}' is empty; fill it in", name_, key));
  return text->get();
}

std::string TomlTable::text_or(std::string_view key, std::string_view otherwise) const {
  return has(key) ? text(key) : std::string(otherwise);
}

double TomlTable::number(std::string_view key) const {
  const toml::node& node = need(key);
  if (!node.is_number()) fail(key, fmt::format("{}: '{}' is {}; write a number", name_, key, kind(node)));
  const double value = node.value<double>().value();
  if (!std::isfinite(value)) fail(key, fmt::format("{}: '{}' is not finite; write a finite number", name_, key));
  return value;
}

std::vector<double> TomlTable::numbers(std::string_view key) const {
  std::vector<double> values;
  for (const toml::node& node : need_list(key, "numbers")) {
    const auto value = node.is_number() ? node.value<double>() : std::nullopt;
    if (value && std::isfinite(*value)) {
      values.push_back(*value);
    } else {
      fail_at(node, file_, fmt::format("{}: '{}' holds what is not a finite number; write numbers only", name_, key));
    }
  }
  return values;
}

std::vector<std::string> TomlTable::texts(std::string_view key) const {
  std::vector<std::string> values;
  for (const toml::node& node : need_list(key, "texts in quotes")) {
    const auto value = node.is_string() ? node.value<std::string>() : std::nullopt;
    if (!value) fail_at(node, file_, fmt::format("{}: '{}' holds {}; write texts in quotes", name_, key, kind(node)));
    values.push_back(*value);
  }
  return values;
}

const toml::array& TomlTable::tables(std::string_view key) const {
  const toml::array& list = need_list(key, "tables");
  if (list.empty()) fail(key, fmt::format("{}: '{}' is empty; give at least one", name_, key));
  return list;
}

void TomlTable::fail(std::string_view key, const std::string& what) const {
  fail_at(has(key) ? *table_->get(key) : *table_, file_, what);
}

const toml::node& TomlTable::need(std::string_view key) const {
  if (!has(key)) fail(key, fmt::format("{} has no '{}'; add it", name_, key));
  return *table_->get(key);
}

const toml::array& TomlTable::need_list(std::string_view key, std::string_view of_what) const {
  const toml::node& node = need(key);
  if (!node.is_array()) fail(key, fmt::format("{}: '{}' is {}; write a list of {}", name_, key, kind(node), of_what));
  return *node.as_array();
}

}  // namespace hz
