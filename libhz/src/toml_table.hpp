// A table of a TOML file, read with messages that say where, what was found and what to do.
#pragma once
#include <initializer_list>
#include <string>
#include <string_view>
#include <vector>

#define TOML_ENABLE_FORMATTERS 0
#include <toml++/toml.h>

namespace hz {

/// Parses TOML. Throws hz::Error (input), "file:line:column: ...", when the text is not TOML.
[[nodiscard]] toml::table parse_toml(std::string_view text, const std::string& file);

/// Throws hz::Error (input): "file:line:column: " of the node, then `what`.
[[noreturn]] void fail_at(const toml::node& node, const std::string& file, const std::string& what);

/// One table; every getter throws hz::Error (input) at the offending value, or at the table when a key is missing.
class TomlTable {
public:
  /// `name` stands for the table in messages: "limit 'early_mars'". The table must outlive this.
  TomlTable(const toml::table& table, std::string file, std::string name);

  /// The table that `node`, an element of a list, is.
  TomlTable(const toml::node& node, const std::string& file, const std::string& name);

  /// Refuses any key that is not one of these.
  void allow_only(std::initializer_list<std::string_view> keys) const;

  [[nodiscard]] bool has(std::string_view key) const { return table_->contains(key); }
  [[nodiscard]] std::string text(std::string_view key) const;  // not empty
  [[nodiscard]] std::string text_or(std::string_view key, std::string_view otherwise) const;
  [[nodiscard]] double number(std::string_view key) const;  // finite
  [[nodiscard]] std::vector<double> numbers(std::string_view key) const;
  [[nodiscard]] std::vector<std::string> texts(std::string_view key) const;
  [[nodiscard]] const toml::array& tables(std::string_view key) const;  // not empty, written [[key]] or [{...}, ...]

  [[nodiscard]] const std::string& name() const { return name_; }

  /// Throws with the place of `key`, or of the table when it has no such key.
  [[noreturn]] void fail(std::string_view key, const std::string& what) const;

private:
  [[nodiscard]] const toml::node& need(std::string_view key) const;
  [[nodiscard]] const toml::array& need_list(std::string_view key, std::string_view of_what) const;

  const toml::table* table_;
  std::string file_;
  std::string name_;
};

}  // namespace hz
