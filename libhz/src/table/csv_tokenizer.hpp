// Splits comma-separated text into rows and cells.
#pragma once
#include <array>
#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace hz {

/// One row as it stands in the text.
struct CsvRow {
  std::vector<std::string_view> cells;
  std::size_t line = 0;  // where it starts
  std::string trouble;   // what is wrong with its quoting; empty when nothing is
};

/// RFC 4180, and what people do beyond it: any separator, rows that end in LF, CRLF or CR, blanks around quoted cells.
///
/// It works in place: cells are views into the text, and doubled quotes are made single there, so the text must be
/// writable and must stay.
class CsvTokenizer {
public:
  /// `file` names the text in messages; `line` is the number of its first line.
  CsvTokenizer(std::string file, char separator, std::size_t line = 1);

  /// Reads the row that starts at `from` (an index into `text`) and returns where the next one starts; nullopt,
  /// changing nothing, when the text ends within the row and is not `whole`. Throws hz::Error (input) for a NUL byte
  /// and, when `whole`, for a quote that never closes.
  std::optional<std::size_t> row(std::string& text, std::size_t from, bool whole, CsvRow& row);

  /// Where the line that starts at `from` ends and the next one starts, counted as passed; nullopt as above.
  std::optional<std::size_t> skip_line(std::string_view text, std::size_t from, bool whole);

  /// The line that the next row starts in, from 1.
  [[nodiscard]] std::size_t line() const { return line_; }

  /// Where a quote still open at the end of the text was opened in the last row() that gave nullopt; 0 for none.
  [[nodiscard]] std::size_t open_quote_line() const { return open_quote_line_; }

private:
  struct Pass;
  std::string file_;
  char separator_;
  std::array<bool, 256> special_{};  // bytes that end an unquoted cell
  std::size_t line_;
  std::size_t open_quote_line_ = 0;
  std::vector<std::size_t> doubled_;  // cells of this row that hold doubled quotes
};

}  // namespace hz
