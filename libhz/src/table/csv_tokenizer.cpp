#include "table/csv_tokenizer.hpp"

#include <fmt/format.h>

#include <utility>

#include "hz/error.hpp"

namespace hz {
namespace {

constexpr unsigned char byte(char c) { return static_cast<unsigned char>(c); }

// Makes "" into " within a cell; only called once for each cell.
std::string_view with_single_quotes(std::string& text, std::string_view cell) {
  const auto first = static_cast<std::size_t>(cell.data() - text.data());
  std::size_t to = first;
  for (std::size_t from = first; from < first + cell.size(); ++from) {
    text[to++] = text[from];
    if (text[from] == '"') ++from;
  }
  return std::string_view(text).substr(first, to - first);
}

}  // namespace

// One way through one row. Nothing outside is changed until it is known to be complete.
struct CsvTokenizer::Pass {
  CsvTokenizer& owner;
  std::string_view text;
  bool whole;
  std::size_t at;
  std::size_t line;
  CsvRow& row;

  [[nodiscard]] bool at_end() const { return at == text.size(); }

  [[noreturn]] void refuse_nul() const {
    throw Error(Fault::input, fmt::format("{}:{}: holds a NUL byte, so it is not a text table; save it as UTF-8 text",
                                          owner.file_, line));
  }

  void skip_blanks() {
    while (!at_end() && (text[at] == ' ' || text[at] == '\t') && text[at] != owner.separator_) ++at;
  }

  // The next cell, up to its separator or line end; false when the text ends too early.
  bool cell() {
    const auto start = at;
    skip_blanks();
    if (!at_end() && text[at] == '"') return quoted_cell();
    while (!at_end() && !owner.special_[byte(text[at])]) ++at;
    row.cells.push_back(text.substr(start, at - start));
    return !at_end() || whole;
  }

  bool quoted_cell() {
    const auto opened = line;
    const auto start = ++at;
    bool doubled = false;
    for (;; ++at) {
      if (at_end()) return unclosed(opened);
      if (text[at] == '\n') ++line;
      if (text[at] == '\0') refuse_nul();
      if (text[at] != '"') continue;
      if (at + 1 == text.size() && !whole) return false;
      if (at + 1 == text.size() || text[at + 1] != '"') break;
      doubled = true;
      ++at;
    }
    if (doubled) owner.doubled_.push_back(row.cells.size());
    row.cells.push_back(text.substr(start, at - start));
    ++at;
    return end_of_quoted_cell();
  }

  bool end_of_quoted_cell() {
    skip_blanks();
    if (!at_end() && !owner.special_[byte(text[at])]) row.trouble = "text stands behind a closing quote";
    while (!at_end() && !owner.special_[byte(text[at])]) ++at;
    return !at_end() || whole;
  }

  bool unclosed(std::size_t opened) const {
    owner.open_quote_line_ = opened;
    if (!whole) return false;
    throw Error(Fault::input, fmt::format("{}:{}: a quote opens here and never closes; close it or take it out",
                                          owner.file_, opened));
  }

  // At a line end or the end of the text: passes it. False when CR LF may be cut in two.
  bool line_end() {
    if (at_end()) return true;
    if (text[at] == '\0') refuse_nul();
    if (text[at] == '\r') {
      if (at + 1 == text.size() && !whole) return false;
      if (at + 1 < text.size() && text[at + 1] == '\n') ++at;
    }
    ++at;
    ++line;
    return true;
  }
};

CsvTokenizer::CsvTokenizer(std::string file, char separator, std::size_t line)
    : file_(std::move(file)), separator_(separator), line_(line) {
  for (const char c : {separator, '\n', '\r', '\0'}) special_[byte(c)] = true;
}

std::optional<std::size_t> CsvTokenizer::row(std::string& text, std::size_t from, bool whole, CsvRow& row) {
  row.cells.clear();
  row.trouble.clear();
  row.line = line_;
  doubled_.clear();
  open_quote_line_ = 0;
  Pass pass{*this, text, whole, from, line_, row};
  for (;;) {
    if (!pass.cell()) return std::nullopt;
    if (pass.at_end() || text[pass.at] != separator_) break;
    ++pass.at;
  }
  if (!pass.line_end()) return std::nullopt;
  for (const auto cell : doubled_) row.cells[cell] = with_single_quotes(text, row.cells[cell]);
  line_ = pass.line;
  return pass.at;
}

std::optional<std::size_t> CsvTokenizer::skip_line(std::string_view text, std::size_t from, bool whole) {
  CsvRow none;
  Pass pass{*this, text, whole, from, line_, none};
  while (!pass.at_end() && text[pass.at] != '\n' && text[pass.at] != '\r' && text[pass.at] != '\0') ++pass.at;
  if (pass.at_end() && !whole) return std::nullopt;
  if (!pass.line_end()) return std::nullopt;
  line_ = pass.line;
  return pass.at;
}

}  // namespace hz
