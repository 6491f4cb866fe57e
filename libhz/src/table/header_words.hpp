// What a header or a description says a column is.
#pragma once
#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "hz/table/understanding.hpp"

namespace hz {

/// A text recognised.
struct HeaderMatch {
  Quantity quantity{};  // as told_by_unit()
  ColumnPart part = ColumnPart::value;
  std::string unit;  // as written; empty without one
  std::string base;  // the folded words of the quantity itself, without part and unit
  bool unit_known = true;
  std::vector<Quantity>
      meanings;      // more than none: a bare letter or word that may mean any of these, `quantity` is unset
  Quantity named{};  // by the words alone
};

/// The quantity that a column called `quantity` holds when its numbers are in `unit`: "Lum [log(Lsun)]" is a logarithm,
/// and a distance in mas is a parallax, which need not even be above 0.
[[nodiscard]] Quantity told_by_unit(Quantity quantity, std::string_view unit);

/// The words of catalogs/columns.csv, and those a list adds for itself.
class HeaderWords {
public:
  HeaderWords();

  /// From now on these words mean this quantity in this list (a mapped header, so that "e_R" follows "R").
  void learn(std::string_view words, Quantity quantity);

  /// "Teff [K]", "Planet Mass (RJ) Upper Unc.": words, part and unit in any of the accepted ways. `stated_unit` is what
  /// the file says of the unit elsewhere; a unit in the text itself wins.
  [[nodiscard]] std::optional<HeaderMatch> match(std::string_view text, std::string_view stated_unit) const;

  /// "teff", "teff_err_plus [K]": our own name, letter by letter.
  [[nodiscard]] std::optional<HeaderMatch> match_canonical(std::string_view text, std::string_view stated_unit) const;

  /// "e_Teff", "E_Teff", "l_Teff" beside a column "Teff" (CDS): the part of what `value_column` is.
  [[nodiscard]] std::optional<HeaderMatch> match_prefixed(char prefix, std::string_view value_column,
                                                          std::string_view stated_unit) const;

private:
  struct Affix {
    std::string letters;  // folded
    bool in_front = false;
    ColumnPart part{};
  };
  void add_affix(std::string_view spelling, ColumnPart part);
  [[nodiscard]] std::optional<HeaderMatch> match_words(std::string_view words, std::string_view unit) const;
  [[nodiscard]] std::optional<HeaderMatch> match_value(const std::string& folded, std::string_view unit) const;
  [[nodiscard]] std::optional<HeaderMatch> match_part(const std::string& folded, std::string_view unit) const;

  std::map<std::string, Quantity, std::less<>> words_;
  std::vector<Affix> affixes_;  // longest first
};

}  // namespace hz
