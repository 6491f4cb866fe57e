#include <array>
#include <charconv>
#include <cmath>

#include "hz/atomic_file.hpp"
#include "hz/require.hpp"
#include "hz/table/table.hpp"

namespace hz {
namespace {

// RFC 4180, and what our own reader would otherwise take for a comment or trim away.
bool needs_quotes(std::string_view cell) {
  if (cell.empty()) return false;
  if (cell.front() == '#' || cell.front() == ' ' || cell.back() == ' ') return true;
  return cell.find_first_of(",\"\r\n") != std::string_view::npos;
}

void append_cell(std::string& line, std::string_view cell) {
  if (!needs_quotes(cell)) {
    line += cell;
    return;
  }
  line += '"';
  for (const char c : cell) {
    if (c == '"') line += '"';
    line += c;
  }
  line += '"';
}

template <class Number>
void append_number(std::string& line, Number number) {
  std::array<char, 32> digits{};
  const auto [end, error] = std::to_chars(digits.data(), digits.data() + digits.size(), number);
  HZ_REQUIRE(error == std::errc{});
  line.append(digits.data(), end);
}

void append_value(std::string& line, std::string_view cell) { append_cell(line, cell); }
void append_value(std::string& line, double cell) {
  if (std::isfinite(cell)) append_number(line, cell);  // no value and no infinity is ever written as a number
}
void append_value(std::string& line, const std::optional<std::int64_t>& cell) {
  if (cell) append_number(line, *cell);
}

class CsvWriter : public TableWriter {
public:
  CsvWriter(const std::string& path, const TableHead& head) : file_(path), width_(head.columns.size()) {
    for (std::size_t i = 0; i < width_; ++i) {
      if (i > 0) line_ += ',';
      append_cell(line_, head.columns[i].name);
    }
    end_line();
  }

  void write(const Chunk& chunk) override {
    HZ_REQUIRE(chunk.columns.size() == width_);
    for (std::size_t row = 0; row < chunk.rows(); ++row) {
      for (std::size_t i = 0; i < width_; ++i) {
        if (i > 0) line_ += ',';
        std::visit([this, row](const auto& cells) { append_value(line_, cells[row]); }, chunk.columns[i]);
      }
      end_line();
    }
  }

  void finish() override { file_.finish(); }

private:
  void end_line() {
    if (line_.empty()) line_ = "\"\"";  // one empty cell must not read as a blank line
    line_ += '\n';
    file_.write(line_);
    line_.clear();
  }

  AtomicFile file_;
  std::size_t width_;
  std::string line_;
};

}  // namespace

std::unique_ptr<TableWriter> create_table(const std::string& path, const TableHead& head) {
  return std::make_unique<CsvWriter>(path, head);
}

}  // namespace hz
