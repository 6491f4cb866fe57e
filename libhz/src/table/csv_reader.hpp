// Comma-separated text as a table.
#pragma once
#include <optional>
#include <string>

#include "hz/table/table.hpp"
#include "table/byte_source.hpp"
#include "table/csv_tokenizer.hpp"

namespace hz {

/// The longest row that is read; a longer one means a file that is no table or a quote left open.
inline constexpr std::size_t longest_row = 4'000'000;

/// Separator `,` `;` or tab, told from the header line; `#` lines are comments, before the header and between rows;
/// blank lines are skipped; a byte-order mark is passed over.
class CsvReader : public TableReader {
public:
  /// Reads the head. Throws hz::Error (input) when there is none.
  explicit CsvReader(ByteSource source);

  [[nodiscard]] const TableHead& head() const override { return head_; }
  [[nodiscard]] std::optional<Chunk> next() override;

private:
  void read_more(std::string& text);
  void read_head();
  std::optional<std::size_t> head_line(std::size_t from);
  void take_names(const CsvRow& row);
  std::size_t read_rows(std::string& text, std::size_t from, Chunk& chunk);
  void add(const CsvRow& row, Chunk& chunk) const;
  [[noreturn]] void refuse_headless() const;
  void refuse_long_row(std::size_t length) const;

  ByteSource source_;
  TableHead head_;
  CsvTokenizer tokenizer_;
  CsvRow row_;
  std::string pending_;  // read, but not yet part of a chunk
  bool at_end_ = false;
  std::size_t rows_read_ = 0;
};

}  // namespace hz
