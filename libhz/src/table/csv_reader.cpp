#include "table/csv_reader.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <map>
#include <utility>

#include "hz/error.hpp"
#include "words.hpp"

namespace hz {
namespace {

constexpr std::size_t block_size = 1 << 20;
constexpr std::string_view byte_order_mark = "\xEF\xBB\xBF";

// The one of , ; and tab that the header line holds most of, outside quotes.
char guessed_separator(std::string_view line) {
  static constexpr std::string_view separators = ",;\t";
  std::array<std::size_t, separators.size()> counts{};
  bool in_quotes = false;
  for (const char c : line) {
    if (c == '"') in_quotes = !in_quotes;
    const auto which = separators.find(c);
    if (!in_quotes && which != std::string_view::npos) ++counts[which];
  }
  return separators[static_cast<std::size_t>(std::max_element(counts.begin(), counts.end()) - counts.begin())];
}

bool is_comment(std::string_view text, std::size_t at) { return at < text.size() && text[at] == '#'; }

// Only blanks up to the line's end: no row. (A line of tabs in a tab-separated file is a row of empty cells.)
bool is_blank_line(std::string_view text, std::size_t at) {
  const auto end = text.find_first_not_of(' ', at);
  return end == std::string_view::npos || text[end] == '\n' || text[end] == '\r';
}

}  // namespace

CsvReader::CsvReader(ByteSource source) : source_(std::move(source)), tokenizer_(source_.name(), ',') {
  head_.source = source_.name();
  read_head();
}

void CsvReader::read_more(std::string& text) { at_end_ = !source_.read(text, block_size); }

void CsvReader::refuse_long_row(std::size_t length) const {
  if (length <= longest_row) return;
  const auto quote = tokenizer_.open_quote_line();
  throw Error(Fault::input, fmt::format("{}:{}: this row is longer than {} MB; {}", head_.source,
                                        quote > 0 ? quote : tokenizer_.line(), longest_row / 1'000'000,
                                        quote > 0 ? "a quote opens here and does not close"
                                                  : "check that the file is a table with line ends"));
}

void CsvReader::refuse_headless() const {
  const auto* const what =
      pending_.empty() ? "the file is empty" : "there is no header line, only comments or blank lines";
  throw Error(Fault::input,
              fmt::format("{}: {}; a table starts with a line that names its columns", head_.source, what));
}

void CsvReader::read_head() {
  std::size_t from = 0;
  while (head_.columns.empty()) {
    const auto after = head_line(from);
    if (after) from = *after;
    if (after) continue;
    if (at_end_) refuse_headless();
    refuse_long_row(pending_.size() - from);
    read_more(pending_);
  }
  pending_.erase(0, from);
}

// Takes one comment, blank line or header; nullopt when more text is needed or none is left.
std::optional<std::size_t> CsvReader::head_line(std::size_t from) {
  if (from == 0 && pending_.starts_with(byte_order_mark)) from = byte_order_mark.size();
  if (from == pending_.size()) return std::nullopt;
  auto probe = tokenizer_;
  const auto end_of_line = probe.skip_line(pending_, from, at_end_);
  if (!end_of_line) return std::nullopt;
  const auto line = std::string_view(pending_).substr(from, *end_of_line - from);
  if (is_comment(pending_, from) || is_blank_line(pending_, from)) {
    if (line.front() == '#') head_.comments.emplace_back(words::trimmed(line.substr(1)));
    tokenizer_ = std::move(probe);
    return end_of_line;
  }
  CsvTokenizer with_separator(head_.source, guessed_separator(line), tokenizer_.line());
  const auto after = with_separator.row(pending_, from, at_end_, row_);
  if (!after) return std::nullopt;
  tokenizer_ = std::move(with_separator);
  take_names(row_);
  return after;
}

void CsvReader::take_names(const CsvRow& row) {
  std::map<std::string_view, std::size_t> seen;
  for (std::size_t i = 0; i < row.cells.size(); ++i) {
    const auto name = words::trimmed(row.cells[i]);
    const auto [first, is_new] = seen.emplace(name, i);
    if (!is_new && !name.empty()) {
      throw Error(Fault::input, fmt::format("{}:{}: columns {} and {} are both named {}; rename one", head_.source,
                                            row.line, first->second + 1, i + 1, words::quoted(name)));
    }
    head_.columns.push_back({std::string(name), {}, {}, {}});
  }
  if (!row.trouble.empty())
    throw Error(Fault::input, fmt::format("{}:{}: {} in the header", head_.source, row.line, row.trouble));
}

std::optional<Chunk> CsvReader::next() {
  Chunk chunk;
  chunk.first_row = rows_read_ + 1;
  chunk.columns.assign(head_.columns.size(), std::vector<std::string_view>());
  auto text = std::make_unique<std::string>(std::exchange(pending_, {}));
  if (text->size() < block_size / 2) read_more(*text);
  auto from = read_rows(*text, 0, chunk);
  while (chunk.rows() == 0 && !at_end_) {
    refuse_long_row(text->size() - from);
    read_more(*text);  // may move the text: no cell points into it yet
    from = read_rows(*text, from, chunk);
  }
  if (chunk.rows() == 0) return std::nullopt;
  pending_ = text->substr(from);
  rows_read_ += chunk.rows();
  chunk.storage.push_back(std::move(text));
  return chunk;
}

// Every row that is complete; returns where the first incomplete one starts.
std::size_t CsvReader::read_rows(std::string& text, std::size_t from, Chunk& chunk) {
  while (from < text.size()) {
    const bool is_row = !is_comment(text, from) && !is_blank_line(text, from);
    const auto after = is_row ? tokenizer_.row(text, from, at_end_, row_) : tokenizer_.skip_line(text, from, at_end_);
    if (!after) break;
    if (is_row) refuse_long_row(*after - from);
    if (is_row) add(row_, chunk);
    from = *after;
  }
  return from;
}

void CsvReader::add(const CsvRow& row, Chunk& chunk) const {
  const auto expected = head_.columns.size();
  for (std::size_t i = 0; i < expected; ++i) {
    std::get<std::vector<std::string_view>>(chunk.columns[i])
        .push_back(i < row.cells.size() ? row.cells[i] : std::string_view());
  }
  chunk.lines.push_back(row.line);
  std::optional<Problem> problem;
  if (row.cells.size() != expected) {
    problem =
        Problem{ProblemCode::unreadable,
                {},
                fmt::format("line {} holds {} cells where the header names {}", row.line, row.cells.size(), expected)};
  } else if (!row.trouble.empty()) {
    problem = Problem{ProblemCode::unreadable, {}, fmt::format("in line {} {}", row.line, row.trouble)};
  }
  chunk.row_problems.push_back(std::move(problem));
}

}  // namespace hz
