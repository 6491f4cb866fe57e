#include "hz/measured_text.hpp"

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>
#include <utility>

#include "words.hpp"

namespace hz {
namespace {

constexpr bool is_digit(char c) { return c >= '0' && c <= '9'; }

// Signs beyond ASCII that stand for one of ours.
std::string in_ascii(std::string_view text) {
  static constexpr std::array<std::pair<std::string_view, std::string_view>, 9> signs{{
      {"±", "+-"},
      {"\u2212", "-"},
      {"\u2013", "-"},
      {"≤", "<"},
      {"≥", ">"},
      {"\u00a0", " "},
      {"\u2009", " "},
      {"\u202f", " "},
      {"\u2007", " "},
  }};
  std::string out(text);
  for (const auto& [from, to] : signs) out = words::replaced(out, from, to);
  return out;
}

bool is_ascii(std::string_view text) {
  return std::all_of(text.begin(), text.end(), [](char c) { return static_cast<unsigned char>(c) < 0x80U; });
}

// Walks along ASCII text. What it takes never comes back.
class Scanner {
public:
  explicit Scanner(std::string_view text) : rest_(text) {}

  bool take(std::string_view token) {
    if (!rest_.starts_with(token)) return false;
    rest_.remove_prefix(token.size());
    return true;
  }
  void skip_blanks() {
    while (take(" ") || take("\t")) {
    }
  }
  [[nodiscard]] std::string_view rest() const { return rest_; }
  [[nodiscard]] bool at_end() const { return rest_.empty(); }
  [[nodiscard]] bool at_digit() const { return !rest_.empty() && is_digit(rest_.front()); }

  // Starting with a digit or point, so that neither a second sign nor "inf" or "nan" gets through.
  std::optional<double> unsigned_number() {
    if (!at_digit() && !rest_.starts_with('.')) return std::nullopt;
    double value = 0;
    const auto [end, error] = std::from_chars(rest_.data(), rest_.data() + rest_.size(), value);
    if (error != std::errc{} || !std::isfinite(value)) return std::nullopt;
    const auto mantissa = rest_.substr(0, static_cast<std::size_t>(end - rest_.data()));
    rest_.remove_prefix(mantissa.size());
    return at_fortran_exponent() ? with_fortran_exponent(mantissa) : value;
  }

  std::optional<double> signed_number() {
    const bool negative = take("-");
    if (!negative) take("+");
    const auto value = unsigned_number();
    return value && negative ? -*value : value;
  }

  std::string_view digits() {
    std::size_t count = 0;
    while (count < rest_.size() && is_digit(rest_[count])) ++count;
    const auto taken = rest_.substr(0, count);
    rest_.remove_prefix(count);
    return taken;
  }

private:
  // `1.2d3` is Fortran's 1200; `1.2d` is 1.2 days.
  [[nodiscard]] bool at_fortran_exponent() const {
    if (rest_.empty() || (rest_[0] != 'd' && rest_[0] != 'D')) return false;
    const std::size_t first = rest_.size() > 1 && (rest_[1] == '+' || rest_[1] == '-') ? 2 : 1;
    return rest_.size() > first && is_digit(rest_[first]);
  }
  std::optional<double> with_fortran_exponent(std::string_view mantissa) {
    rest_.remove_prefix(1);
    std::string text = std::string(mantissa) + 'e';
    if (take("-")) text += '-';
    take("+");
    text += digits();
    double value = 0;
    const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), value);
    const bool whole = error == std::errc{} && end == text.data() + text.size();
    return whole ? std::optional(value) : std::nullopt;
  }

  std::string_view rest_;
};

LimitMark limit_mark(Scanner& scan) {
  const LimitMark mark = scan.take("<") ? LimitMark::upper : scan.take(">") ? LimitMark::lower : LimitMark::none;
  if (mark != LimitMark::none) scan.take("=");
  scan.skip_blanks();
  return mark;
}

// `+-h`, `+/-h`, `+h-h`, `+h -h`, `+h/-h`; false when something else or nothing stands there.
bool signed_half_widths(Scanner& scan, Measured& measured) {
  if (scan.take("+-") || scan.take("+/-")) {
    scan.skip_blanks();
    measured.plus = measured.minus = scan.unsigned_number();
    return measured.plus.has_value();
  }
  if (!scan.take("+")) return false;
  measured.plus = scan.unsigned_number();
  scan.skip_blanks();
  if (scan.take("/") || scan.take(",")) scan.skip_blanks();
  if (!scan.take("-")) return false;
  measured.minus = scan.unsigned_number();
  return measured.plus && measured.minus;
}

// `(9)` behind `0.165` counts units of the last digit: 0.009.
bool last_digit_half_width(Scanner& scan, std::string_view number, Measured& measured) {
  if (number.find_first_of("eEdD") != std::string_view::npos) return false;
  const auto point = number.find('.');
  const auto decimals = point == std::string_view::npos ? 0 : number.size() - point - 1;
  measured.plus = measured.minus = parse_number(std::string(scan.digits()) + "e-" + std::to_string(decimals));
  return measured.plus.has_value();
}

// Everything between the number and the unit; false when it is broken.
bool half_widths(Scanner& scan, std::string_view number, Measured& measured) {
  const bool attached = scan.rest().starts_with("(");
  scan.skip_blanks();
  if (scan.take("(")) {
    const bool digits_meant = attached && scan.at_digit();
    scan.skip_blanks();
    const bool read = digits_meant ? last_digit_half_width(scan, number, measured) : signed_half_widths(scan, measured);
    scan.skip_blanks();
    return read && scan.take(")");
  }
  return !scan.rest().starts_with("+") || signed_half_widths(scan, measured);
}

bool is_unit_word(std::string_view word) {
  const auto first = static_cast<unsigned char>(word.front());
  const bool starts_well =
      (first >= 'a' && first <= 'z') || (first >= 'A' && first <= 'Z') || first == '%' || first >= 0x80U;
  return starts_well && word.find_first_of("+<>,;=") == std::string_view::npos;
}

std::optional<MeasuredText> read(std::string_view text) {
  Scanner scan(text);
  MeasuredText out;
  out.measured.limit = limit_mark(scan);
  const auto before = scan.rest();
  const auto value = scan.signed_number();
  if (!value) return std::nullopt;
  out.measured.value = *value;
  if (!half_widths(scan, before.substr(0, before.size() - scan.rest().size()), out.measured)) return std::nullopt;
  if (out.measured.limit != LimitMark::none && out.measured.plus) return std::nullopt;
  scan.skip_blanks();
  if (!scan.at_end() && !is_unit_word(scan.rest())) return std::nullopt;
  out.unit = scan.rest();
  return out;
}

// Most cells by far: digits and a point.
std::optional<double> plain_number(std::string_view text) {
  double value = 0;
  const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), value);
  const bool whole = error == std::errc{} && end == text.data() + text.size() && std::isfinite(value);
  return whole ? std::optional(value) : std::nullopt;
}

std::optional<MeasuredText> read_any(std::string_view bare) {
  return is_ascii(bare) ? read(bare) : read(words::trimmed(in_ascii(bare)));
}

bool is_between_digits(std::string_view text, std::size_t at) {
  return at > 0 && at + 1 < text.size() && is_digit(text[at - 1]) && is_digit(text[at + 1]);
}

// Every comma between digits made `to`.
std::string commas_made(std::string_view text, std::string_view to) {
  std::string out;
  for (std::size_t i = 0; i < text.size(); ++i) {
    if (text[i] == ',' && is_between_digits(text, i)) {
      out += to;
    } else {
      out += text[i];
    }
  }
  return out;
}

// "5,772" and "1,234,567", not "0,165": three digits behind each comma.
bool groups_thousands(std::string_view text) {
  const auto first = text.find_first_of("0123456789");
  if (first == std::string_view::npos || text[first] == '0') return false;
  for (auto at = text.find(','); at != std::string_view::npos; at = text.find(',', at + 1)) {
    const auto group = text.substr(at + 1);
    const auto digits = std::min(group.find_first_not_of("0123456789"), group.size());
    if (digits != 3) return false;
  }
  return true;
}

}  // namespace

Result<MeasuredText> parse_measured(std::string_view text, std::string_view column) {
  const auto bare = words::trimmed(text);
  if (const auto value = plain_number(bare)) return MeasuredText{Measured{*value, {}, {}, LimitMark::none, false}, {}};
  if (auto found = read_any(bare)) return *std::move(found);
  return Problem{ProblemCode::unreadable, std::string(column),
                 std::string(column) + " holds " + words::quoted(bare) + ", which is not a value" + comma_hint(bare)};
}

std::string comma_hint(std::string_view text) {
  const auto bare = words::trimmed(text);
  if (bare.find(',') == std::string_view::npos || read_any(bare)) return {};
  const auto with_point = commas_made(bare, ".");
  const auto without = commas_made(bare, "");
  const bool as_decimal = read_any(with_point).has_value();
  const bool as_thousands = groups_thousands(bare) && read_any(without).has_value();
  if (as_decimal && as_thousands) return "; a comma in a number? write " + with_point + " or " + without;
  if (as_decimal) return "; a decimal comma? write " + with_point;
  if (as_thousands) return "; a comma in a number? write " + without;
  return {};
}

bool is_missing(std::string_view text) {
  static constexpr std::array<std::string_view, 10> spellings{"",   "nan", "null", "none", "n/a",
                                                              "na", "-",   "--",   "...",  "…"};
  const auto bare = words::trimmed(text);
  if (bare.size() > 4 || (!bare.empty() && bare.front() >= '0' && bare.front() <= '9')) return false;
  return std::find(spellings.begin(), spellings.end(), words::lower_case(bare)) != spellings.end();
}

std::optional<double> parse_number(std::string_view text) {
  const auto bare = words::trimmed(text);
  if (const auto value = plain_number(bare)) return value;
  const auto ascii = in_ascii(bare);
  Scanner scan(ascii);
  const auto value = scan.signed_number();
  return value && scan.at_end() ? value : std::nullopt;
}

}  // namespace hz
