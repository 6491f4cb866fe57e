#include "join_options.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <optional>
#include <string_view>

#include "hz/error.hpp"
#include "hz/measured_text.hpp"
#include "hz/units.hpp"

namespace hz::app {
namespace {

constexpr auto joining_table = std::to_array<Option>({
    {"planets", '\0', OptionKind::value, "PLANETS", OptionGroup::input,
     "a list of planets; LIST is then a list of their stars, and the two are joined"},
    {"planet-columns", '\0', OptionKind::value, "MAP.toml", OptionGroup::input, "as --columns, for PLANETS"},
    {"join", '\0', OptionKind::list, "HOST=NAME,...", OptionGroup::input,
     "join where column HOST of PLANETS and NAME of LIST hold one name, or sky=5arcsec by position; tried in turn "
     "(default: each list's star names)"},
    {"exact-names", '\0', OptionKind::flag, "", OptionGroup::input,
     "names join only if they agree in blanks and case too"},
});

constexpr std::string_view sky_word = "sky";
constexpr double widest_arcsec = 3600;  // a degree: farther apart, two positions are not one star's

/// An angle in arcsec, with its unit.
std::optional<double> angle(const std::string& text) {
  const Result<MeasuredText> parsed = parse_measured(text, "--join");
  if (!parsed || parsed->unit.empty() || parsed->measured.plus || parsed->measured.limit != LimitMark::none)
    return std::nullopt;
  const std::optional<Conversion> to_arcsec = conversion(Quantity::companion_separation, parsed->unit);
  if (!to_arcsec) return std::nullopt;
  return parsed->measured.value * to_arcsec->number;
}

JoinWay sky_way(const std::string& text) {
  const std::optional<double> tolerance = angle(text);
  if (!tolerance || !(*tolerance > 0) || *tolerance > widest_arcsec) {
    throw Error(Fault::usage, fmt::format("--join sky={}: give the tolerance as an angle of at most a degree, such as "
                                          "sky=5arcsec (mas, arcsec, arcmin or deg)",
                                          text));
  }
  return {JoinWay::Kind::sky, {}, {}, *tolerance, text};
}

JoinWay way_of(const std::string& text) {
  const std::size_t at = text.find('=');
  if (at == std::string::npos || at == 0 || at + 1 == text.size()) {
    throw Error(Fault::usage, fmt::format("--join '{}': write HOST=NAME, a column of the list of planets and one of "
                                          "the list of stars, or sky=5arcsec",
                                          text));
  }
  const std::string host = text.substr(0, at);
  const std::string name = text.substr(at + 1);
  return host == sky_word ? sky_way(name) : JoinWay{JoinWay::Kind::columns, host, name, 0, {}};
}

}  // namespace

std::span<const Option> joining_options() { return joining_table; }

std::vector<JoinWay> read_join_ways(const std::string& text) {
  std::vector<JoinWay> ways;
  for (std::size_t start = 0; start <= text.size();) {
    const std::size_t comma = std::min(text.find(',', start), text.size());
    ways.push_back(way_of(text.substr(start, comma - start)));
    start = comma + 1;
  }
  return ways;
}

std::vector<JoinWay> read_join_ways(const Arguments& arguments) {
  std::vector<JoinWay> ways;
  for (const std::string& text : arguments.values("join")) {
    for (JoinWay& way : read_join_ways(text)) ways.push_back(std::move(way));
  }
  if (ways.empty()) ways.emplace_back();
  return ways;
}

void check_join_options(const Arguments& arguments, bool typed) {
  const bool joins = arguments.has("planets");
  if (joins && typed)
    throw Error(Fault::usage, "--planets joins a list of planets to a list of stars, not to a typed star");
  for (const std::string_view option : {"planet-columns", "join", "exact-names"}) {
    if (arguments.has(option) && !joins)
      throw Error(Fault::usage,
                  fmt::format("--{} is for two lists; give the list of planets as --planets PLANETS", option));
  }
}

}  // namespace hz::app
