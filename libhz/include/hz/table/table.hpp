// The one idea of a table: a head, and chunks of typed columns that stream past. Every format reads into it and writes
// from it.
#pragma once
#include <cstddef>
#include <cstdint>
#include <memory>
#include <optional>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

#include "hz/result.hpp"

namespace hz {

/// What a file says of one column; text fields are empty where it says nothing.
struct ColumnHead {
  std::string name;  // as the file spells it
  std::string unit;
  std::string ucd;
  std::string description;
};

struct TableHead {
  std::string source;  // the file's name in messages
  std::vector<ColumnHead> columns;
  std::vector<std::string> comments;  // comment lines before the header, without their mark
};

/// The cells of one column of one chunk. NaN stands for "no value" in a column of numbers, as in the binary formats; it
/// never leaves the table layer. Text cells are views into the chunk's own storage.
using Cells =
    std::variant<std::vector<std::string_view>, std::vector<double>, std::vector<std::optional<std::int64_t>>>;

/// Some consecutive rows.
class Chunk {
public:
  std::size_t first_row = 1;                         // number of its first row, counting data rows from 1
  std::vector<Cells> columns;                        // one entry a column of the head, all of the same length
  std::vector<std::size_t> lines;                    // line of each row in a text file; empty where lines mean nothing
  std::vector<std::optional<Problem>> row_problems;  // a ragged or over-long row keeps its place with its problem

  [[nodiscard]] std::size_t rows() const { return row_problems.size(); }

  /// Text of a cell, for names and notes; numbers in shortest round-trip form.
  [[nodiscard]] std::string text(std::size_t column, std::size_t row) const;

  /// Storage that text cells may point into; moving a chunk keeps the views valid.
  std::vector<std::unique_ptr<std::string>> storage;
};

/// A table being read. Errors of the file as a whole are thrown as hz::Error (input), naming file, line and what to do.
class TableReader {
public:
  virtual ~TableReader() = default;
  [[nodiscard]] virtual const TableHead& head() const = 0;
  /// The next rows, at most about a megabyte of them; nullopt at the end.
  [[nodiscard]] virtual std::optional<Chunk> next() = 0;
};

/// Opens a table, its format recognised by content. Throws hz::Error (input).
[[nodiscard]] std::unique_ptr<TableReader> open_table(const std::string& path);

/// A table being written. Nothing appears under the final name before finish(); destroying an unfinished writer removes
/// what was written aside. Throws hz::Error (output) when the disk or folder refuses.
class TableWriter {
public:
  virtual ~TableWriter() = default;
  virtual void write(const Chunk& chunk) = 0;
  virtual void finish() = 0;
};

/// Creates a table with these columns; path "-" is standard output. Throws hz::Error (output).
[[nodiscard]] std::unique_ptr<TableWriter> create_table(const std::string& path, const TableHead& head);

}  // namespace hz
