// Relations from TOML text: the form of catalogs/relations/*.toml, described in catalogs/README.md.
#pragma once
#include <string>
#include <string_view>
#include <vector>

#include "hz/relation.hpp"
#include "piecewise.hpp"
#include "toml_table.hpp"

namespace hz {

/// Reads the relations of one file. Throws hz::Error (input) that names file, line and column.
class RelationReader {
public:
  RelationReader(std::string_view toml_text, std::string file);

  [[nodiscard]] std::vector<Relation> read();

private:
  [[nodiscard]] Relation read_relation(const TomlTable& table) const;
  void read_words(const TomlTable& table, Relation& relation) const;
  void read_polynomial(const TomlTable& table, Relation& relation) const;
  void read_columns(const TomlTable& table, Relation& relation) const;
  void read_inverse(const TomlTable& table, Relation& relation) const;
  void read_scatter(const TomlTable& table, Relation& relation) const;
  [[nodiscard]] PiecewisePolynomial pieces(const TomlTable& table, std::string_view key) const;

  std::string file_;
  toml::table root_;
};

}  // namespace hz
