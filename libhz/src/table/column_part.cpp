// Names of quantities with their parts, both ways.
#include <array>
#include <utility>

#include "hz/require.hpp"
#include "hz/table/understanding.hpp"

namespace hz {
namespace {

// Longer suffixes stand before the ones they end in.
constexpr std::array<std::pair<ColumnPart, std::string_view>, 8> suffixes{{
    {ColumnPart::upper_half_width, "_err_plus"},
    {ColumnPart::lower_half_width, "_err_minus"},
    {ColumnPart::half_width, "_err"},
    {ColumnPart::lower_bound, "_lower"},
    {ColumnPart::upper_bound, "_upper"},
    {ColumnPart::limit_mark, "_limit"},
    {ColumnPart::route, "_route"},
    {ColumnPart::value, ""},
}};

}  // namespace

std::string_view text(KnownBy known_by) {
  static constexpr std::array<std::string_view, 5> words{"map", "name", "ucd", "words", "comment"};
  return words[static_cast<std::size_t>(known_by)];
}

std::string canonical_name(Quantity quantity, ColumnPart part) {
  for (const auto& [suffix_part, suffix] : suffixes) {
    if (suffix_part == part) return std::string(name(quantity)).append(suffix);
  }
  throw std::logic_error("hz: a part without a suffix");
}

std::optional<QuantityPart> part_named(std::string_view canonical_name) {
  for (const auto& [part, suffix] : suffixes) {
    if (!canonical_name.ends_with(suffix)) continue;
    const auto quantity = quantity_named(canonical_name.substr(0, canonical_name.size() - suffix.size()));
    if (quantity && (part == ColumnPart::value || is_numeric(*quantity))) return QuantityPart{*quantity, part};
  }
  return std::nullopt;
}

}  // namespace hz
