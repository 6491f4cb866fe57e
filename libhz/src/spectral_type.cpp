#include "hz/spectral_type.hpp"

#include <algorithm>
#include <array>
#include <charconv>
#include <utility>

#include "hz/measured_text.hpp"
#include "words.hpp"

namespace hz {
namespace {

constexpr std::string_view plus_minus = "±";
constexpr std::string_view hot_to_cool = "OBAFGKMLTY";

constexpr bool is_digit(char c) { return c >= '0' && c <= '9'; }
constexpr bool is_lower(char c) { return c >= 'a' && c <= 'z'; }
constexpr bool is_one_of(char c, std::string_view characters) { return characters.find(c) != std::string_view::npos; }
constexpr char upper(char c) { return is_lower(c) ? static_cast<char>(c - 'a' + 'A') : c; }

/// Plus-minus, minus and blank signs of lists and of their markup, each in one spelling.
std::string in_one_spelling(std::string_view text) {
  static constexpr std::array<std::pair<std::string_view, std::string_view>, 11> signs{{
      {"&plusmn;", plus_minus},
      {"&plusmn", plus_minus},
      {"&#177;", plus_minus},
      {"&#177", plus_minus},
      {"+/-", plus_minus},
      {"+-", plus_minus},
      {"\u2212", "-"},
      {"\u2013", "-"},
      {"\u2026", "..."},
      {"\u00a0", " "},
      {"\t", " "},
  }};
  std::string out(text);
  for (const auto& [from, to] : signs) out = words::replaced(out, from, to);
  return std::string(words::trimmed(out));
}

StarKind kind_of_class(double number) {
  if (number < 4) return StarKind::giant;
  if (number < 4.5) return StarKind::subgiant;
  if (number < 5.5) return StarKind::dwarf;
  return number < 6.5 ? StarKind::subdwarf : StarKind::white_dwarf;
}

/// Small letters behind a type that say nothing of temperature or size: emission, rotation, peculiarity, variability.
bool is_peculiarity(std::string_view letters) {
  static constexpr std::array<std::string_view, 5> longer{"var", "pec", "wk", "wl", "sh"};
  return letters.find_first_not_of("efhkmnpqrsvw") == std::string_view::npos ||
         std::find(longer.begin(), longer.end(), letters) != longer.end();
}

/// From the lowest to the highest value added.
class Span {
public:
  void add(double value) {
    low_ = empty_ ? value : std::min(low_, value);
    high_ = empty_ ? value : std::max(high_, value);
    empty_ = false;
  }
  [[nodiscard]] bool empty() const { return empty_; }
  [[nodiscard]] double middle() const { return (low_ + high_) / 2; }
  [[nodiscard]] double half() const { return (high_ - low_) / 2; }

private:
  double low_ = 0;
  double high_ = 0;
  bool empty_ = true;
};

/// Walks along a spelling once; what it takes never comes back.
class TypeReader {
public:
  explicit TypeReader(std::string_view text) : rest_(text) {}

  /// False where something cannot be read: rest() begins there.
  bool read() {
    while (take("(")) ++open_brackets_;
    uncertain_ = open_brackets_ > 0;
    if (!white_dwarf() && !off_the_main_sequence() && !star()) return false;
    while (!rest_.empty()) {
      if (!mark()) return false;
    }
    return open_brackets_ == 0;
  }
  [[nodiscard]] std::string_view rest() const { return rest_; }

  [[nodiscard]] SpectralType type() const {
    SpectralType out;
    out.kind = kind();
    out.class_stated = remnant_or_other_ || prefix_ || !classes_.empty();
    if (!subtypes_.empty() && !subtype_missing_ && out.kind != StarKind::white_dwarf) out.subtype = subtypes_.middle();
    out.half_width = written_half_width_.value_or(std::max(uncertain_ ? 1.0 : 0.5, subtypes_.half()));
    out.second = second_;
    return out;
  }

private:
  // --- characters ---
  [[nodiscard]] char at(std::size_t place) const { return place < rest_.size() ? rest_[place] : '\0'; }
  bool take(std::string_view token) {
    if (!rest_.starts_with(token)) return false;
    rest_.remove_prefix(token.size());
    return true;
  }
  bool take_any(std::string_view characters) {
    if (rest_.empty() || !is_one_of(at(0), characters)) return false;
    rest_.remove_prefix(1);
    return true;
  }
  std::string_view take_while(bool (*wanted)(char)) {
    std::size_t count = 0;
    while (count < rest_.size() && wanted(rest_[count])) ++count;
    const auto taken = rest_.substr(0, count);
    rest_.remove_prefix(count);
    return taken;
  }
  bool take_blanks() {
    return !take_while([](char c) { return c == ' '; }).empty();
  }
  /// Without sign or exponent: the e of "M5e" is emission.
  std::optional<double> number() {
    double value = 0;
    const auto digits = take_while([](char c) { return is_digit(c) || c == '.'; });
    const auto [end, error] =
        std::from_chars(digits.data(), digits.data() + digits.size(), value, std::chars_format::fixed);
    const bool whole = error == std::errc{} && end == digits.data() + digits.size() && is_digit(digits.front());
    return whole ? std::optional(value) : std::nullopt;
  }

  // --- what is no main-sequence star ---
  /// "DA2", "DQZ", "DQ9P", "WD", or a lone D.
  bool white_dwarf() {
    const bool lone = at(0) == 'D' && (rest_.size() == 1 || is_one_of(at(1), " :?+("));
    const bool named = at(0) == 'D' && is_one_of(at(1), "ABCOQZX");
    if (!take("WD") && !((lone || named) && take("D"))) return false;
    take_while([](char c) { return is_one_of(c, "ABCOQZXPHVE"); });
    if (is_digit(at(0)) && !number()) return false;
    take_while([](char c) { return is_one_of(c, "PHVE"); });
    remnant_or_other_ = StarKind::white_dwarf;
    return true;
  }
  /// "WC8", "C5,2", "C-N5", "S6/2", and the older R and N.
  bool off_the_main_sequence() {
    static constexpr std::array<std::string_view, 8> two_letters{"WR", "WN", "WC", "WO", "C-N", "C-R", "C-J", "C-H"};
    const bool named = std::any_of(two_letters.begin(), two_letters.end(), [this](auto head) { return take(head); });
    if (!named && !(is_digit(at(1)) && take_any("CSRN"))) return false;
    if (is_digit(at(0)) && !number()) return false;
    if (is_one_of(at(0), ",/") && is_digit(at(1)) && take_any(",/") && !number()) return false;
    remnant_or_other_ = StarKind::other;
    return true;
  }

  // --- O to Y ---
  bool star() {
    take_prefix();
    // "m", "k7" and "m3 V", but no word that begins with such a letter.
    const char next = at(1);
    if (is_lower(at(0)) && next != '\0' && !is_digit(next) && !is_one_of(next, " :?-/+()")) return false;
    return spectral_class();
  }
  /// Small letters before the class that stand for a luminosity class. A d before O, B or A is left: it may be the D of
  /// a white dwarf.
  void take_prefix() {
    static constexpr std::array<std::pair<std::string_view, StarKind>, 8> prefixes{{{"d/sd", StarKind::subdwarf},
                                                                                    {"usd", StarKind::subdwarf},
                                                                                    {"esd", StarKind::subdwarf},
                                                                                    {"sd", StarKind::subdwarf},
                                                                                    {"sg", StarKind::subgiant},
                                                                                    {"d", StarKind::dwarf},
                                                                                    {"g", StarKind::giant},
                                                                                    {"c", StarKind::giant}}};
    for (const auto& [letters, kind] : prefixes) {
      const char next = upper(at(letters.size()));
      if (!rest_.starts_with(letters) || !is_one_of(next, letters == "d" ? "FGKMLTY" : hot_to_cool)) continue;
      rest_.remove_prefix(letters.size());
      prefix_ = kind;
      return;
    }
  }
  bool spectral_class() {
    const auto place = rest_.empty() ? std::string_view::npos : hot_to_cool.find(upper(at(0)));
    if (place == std::string_view::npos) return false;
    rest_.remove_prefix(1);
    decade_ = 10 * static_cast<double>(place);
    const auto behind_the_letter = rest_;
    take_blanks();
    const bool bracket = at(0) == '(' && is_digit(at(1)) && take("(");
    if (is_digit(at(0))) {
      open_brackets_ += bracket ? 1 : 0;
      return subtype();
    }
    rest_ = behind_the_letter;
    subtype_missing_ = true;
    return true;
  }
  bool subtype() {
    const auto start = rest_;
    const auto value = number();
    if (value && *value < 10) {
      subtypes_.add(decade_ + *value);
      return true;
    }
    rest_ = start;
    return false;
  }

  // --- what follows ---
  bool mark() {
    if (take_blanks()) {
      if (rest_ == "K") rest_ = {};  // a source's mark in lists of nearby stars: "M4   K"
      return true;
    }
    if (take_any(":?")) return uncertain_ = true;
    if (take(plus_minus)) return half_width();
    if (is_one_of(at(0), "+&")) return companion();
    if (is_one_of(at(0), "()")) return bracket();
    if (is_one_of(at(0), "-/")) return range();
    return luminosity_class() || abundance() || peculiarity();
  }
  bool bracket() {
    open_brackets_ += at(0) == '(' ? 1 : -1;
    rest_.remove_prefix(1);
    return open_brackets_ >= 0;
  }
  bool half_width() {
    take_blanks();
    const auto value = number();
    if (!value || *value > 10 || subtypes_.empty()) return false;
    if (*value > 0) written_half_width_ = *value;
    return true;
  }
  /// All that stands behind a "+", to the end or to its bracket's.
  bool companion() {
    rest_.remove_prefix(1);
    take_blanks();
    if (is_digit(at(0))) return false;
    const auto end = open_brackets_ > 0 ? std::min(rest_.find(')'), rest_.size()) : rest_.size();
    second_ = words::trimmed(rest_.substr(0, end));
    rest_.remove_prefix(end);
    return true;
  }
  /// Another subtype, class or luminosity class: "G5/6", "K7-M0", "IV-V", "F5V-G0V".
  bool range() {
    const auto start = rest_;
    rest_.remove_prefix(1);
    take_blanks();
    const bool read =
        !subtypes_.empty() && is_digit(at(0)) ? subtype() : luminosity_class() || (at_class() && spectral_class());
    if (!read) rest_ = start;
    return read;
  }
  [[nodiscard]] bool at_class() const { return !remnant_or_other_ && (!is_lower(at(0)) || is_digit(at(1))); }

  bool luminosity_class() {
    static constexpr std::array<std::string_view, 7> numerals{"I", "II", "III", "IV", "V", "VI", "VII"};
    static constexpr std::array<std::string_view, 7> small{"i", "ii", "iii", "iv", "v", "vi", "vii"};
    const auto start = rest_;
    const auto letters = is_lower(at(0)) ? take_while([](char c) { return c == 'i' || c == 'v'; })
                                         : take_while([](char c) { return c == 'I' || c == 'V'; });
    const auto& known = is_lower(start.empty() ? '\0' : start.front()) ? small : numerals;
    const auto* const found = std::find(known.begin(), known.end(), letters);
    if (found == known.end() || letters == "i" || letters == "v") {  // i and v alone: interstellar lines, variable
      rest_ = start;
      return false;
    }
    classes_.add(static_cast<double>(found - known.begin()) + 1);
    if (!take("ab") && take_any("ab")) take("0");    // "Ia0"
    if (rest_ == "+" && letters == "I") rest_ = {};  // "Ia+"
    return true;
  }
  /// "Fe-0.5", "CH+0.4", "CN1", "Ba", "Si".
  bool abundance() {
    static constexpr std::array<std::string_view, 17> species{"Fe", "CH", "CN", "C2", "Ba", "Ca", "Si", "Cr", "Eu",
                                                              "Sr", "Hg", "Mn", "He", "Ti", "Li", "Na", "Mg"};
    if (std::none_of(species.begin(), species.end(), [this](auto symbol) { return take(symbol); })) return false;
    if (is_one_of(at(0), "+-") && is_digit(at(1))) rest_.remove_prefix(1);
    return !is_digit(at(0)) || number().has_value();
  }
  bool peculiarity() {
    if (take_any("PE")) return true;  // in lists that write all in capitals
    const auto start = rest_;
    const auto letters = take_while(is_lower);
    if (letters.empty() || !is_peculiarity(letters)) {
      rest_ = start;
      return false;
    }
    if (letters.back() == 'f' && !is_class_behind_plus()) take_any("+*");  // "O4If+"
    return true;
  }
  [[nodiscard]] bool is_class_behind_plus() const { return at(0) == '+' && at(1) != '\0'; }

  [[nodiscard]] StarKind kind() const {
    if (remnant_or_other_) return *remnant_or_other_;
    if (prefix_ == StarKind::subdwarf || classes_.empty()) return prefix_.value_or(StarKind::dwarf);
    return kind_of_class(classes_.middle());
  }

  std::string_view rest_;
  double decade_ = 0;
  Span subtypes_;
  Span classes_;
  std::optional<StarKind> remnant_or_other_;
  std::optional<StarKind> prefix_;
  std::optional<double> written_half_width_;
  std::optional<std::string> second_;
  bool uncertain_ = false;
  bool subtype_missing_ = false;
  int open_brackets_ = 0;
};

Problem unreadable(std::string_view text, std::string_view rest) {
  const std::string start = "spectral_type holds " + words::quoted(text);
  const bool may_be_either = rest.size() > 1 && rest.front() == 'd' && is_one_of(upper(rest[1]), "OBA");
  std::string what = start + ", which is not a spectral type";
  if (may_be_either) {
    what = start + ", which may be a dwarf or a white dwarf: write A2V or DA2";
  } else if (rest.empty()) {
    what = start + ", in which a bracket stays open";
  } else if (rest.size() < text.size()) {
    what = start + ", of which " + words::quoted(rest) + " cannot be read";
  }
  return {ProblemCode::unreadable, "spectral_type", what};
}

}  // namespace

std::string_view word(StarKind kind) {
  switch (kind) {
    case StarKind::dwarf: return "a dwarf";
    case StarKind::subdwarf: return "a subdwarf";
    case StarKind::subgiant: return "a subgiant";
    case StarKind::giant: return "a giant";
    case StarKind::white_dwarf: return "a white dwarf";
    case StarKind::other: break;
  }
  return "a Wolf-Rayet, carbon or S star";
}

Result<SpectralType> read_spectral_type(std::string_view text) {
  if (is_missing(text)) return Problem{ProblemCode::missing, "spectral_type", "no spectral_type"};
  const std::string spelling = in_one_spelling(text);
  TypeReader reader(spelling);
  if (!reader.read()) return unreadable(spelling, reader.rest());
  return reader.type();
}

}  // namespace hz
