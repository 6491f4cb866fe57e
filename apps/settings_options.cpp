#include "settings_options.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>

#include "closest.hpp"
#include "files.hpp"
#include "hz/error.hpp"
#include "hz/measured_text.hpp"

namespace hz::app {
namespace {

constexpr auto boundary_table = std::to_array<Option>({
    {"limits", '\0', OptionKind::value, "FILE", OptionGroup::input,
     "add your own limit sets, in the TOML form of the built-in ones"},
    {"set", '\0', OptionKind::value, "KEY", OptionGroup::answer,
     "the limit set that answers (default K14); `hzmap limits` lists them"},
    {"beyond", '\0', OptionKind::value, "WORD", OptionGroup::answer,
     "up to 300 K outside the fitted range: hold the limits at their end value, or refuse (default hold)"},
    {"asymmetry", '\0', OptionKind::value, "WORD", OptionGroup::answer,
     "what the number in 4410+80-60 is: the median, half the weight each side, or the mode (default median)"},
    {"assume-error", '\0', OptionKind::value, "LIST", OptionGroup::answer,
     "half-widths where a list states none, such as semi_major_axis=5%,teff=2%; with none they are exact"},
    {"luminosity-from", '\0', OptionKind::value, "WORD", OptionGroup::answer,
     "which comes first: the stated luminosity, radius and Teff, or photometry (stated, radius, photometry; default "
     "stated)"},
    {"length-scale", '\0', OptionKind::value, "PC", OptionGroup::answer,
     "of the space density that steadies parallaxes below ten times their error (default 1350)"},
});

constexpr auto placement_table = std::to_array<Option>({
    {"semi-major-axis-from", '\0', OptionKind::value, "WORD", OptionGroup::answer,
     "which comes first: period with stellar mass, or the stated axis (default period)"},
    {"insolation-from", '\0', OptionKind::value, "WORD", OptionGroup::answer,
     "which comes first: computed from star and orbit, or the stated insolation (default computed)"},
    {"albedo", '\0', OptionKind::value, "A", OptionGroup::answer,
     "Bond albedo of the equilibrium temperature; no zone depends on it (default 0.3)"},
    {"verdict-at", '\0', OptionKind::value, "P,P,P,P", OptionGroup::answer,
     "least P of inside and likely inside, greatest P of likely outside and outside (default 0.95,0.68,0.32,0.05)"},
    {"method", '\0', OptionKind::value, "WORD", OptionGroup::answer,
     "quadrature, or sampling as an independent check (default quadrature)"},
    {"draws", '\0', OptionKind::value, "N", OptionGroup::answer, "draws a planet when sampling (default 100000)"},
    {"seed", '\0', OptionKind::value, "N", OptionGroup::answer, "seed of the draws (default 1)"},
});

constexpr auto beyond_words =
    std::to_array<OptionWord<BeyondRange>>({{"hold", BeyondRange::hold}, {"refuse", BeyondRange::refuse}});
constexpr auto asymmetry_words =
    std::to_array<OptionWord<Asymmetry>>({{"median", Asymmetry::median}, {"mode", Asymmetry::mode}});
constexpr auto luminosity_words =
    std::to_array<OptionWord<LuminosityFrom>>({{"stated", LuminosityFrom::stated},
                                               {"radius", LuminosityFrom::radius},
                                               {"photometry", LuminosityFrom::photometry}});
constexpr auto axis_words = std::to_array<OptionWord<SemiMajorAxisFrom>>(
    {{"period", SemiMajorAxisFrom::period}, {"stated", SemiMajorAxisFrom::stated}});
constexpr auto insolation_words = std::to_array<OptionWord<InsolationFrom>>(
    {{"computed", InsolationFrom::computed}, {"stated", InsolationFrom::stated}});
constexpr auto method_words =
    std::to_array<OptionWord<Method>>({{"quadrature", Method::quadrature}, {"sampling", Method::sampling}});

/// The option's value; nullopt when it is not given or the command does not have it.
std::optional<std::string> given(const Arguments& arguments, std::string_view option) {
  return arguments.knows(option) ? arguments.value(option) : std::nullopt;
}

template <class T, std::size_t N>
void set_word(const Arguments& arguments, std::string_view option, const std::array<OptionWord<T>, N>& words,
              T& target) {
  if (const auto text = given(arguments, option)) target = option_word<T>(option, *text, words);
}

std::vector<std::string> parts(const std::string& text) {
  std::vector<std::string> result;
  for (std::size_t start = 0; start <= text.size();) {
    const std::size_t comma = std::min(text.find(',', start), text.size());
    result.push_back(text.substr(start, comma - start));
    start = comma + 1;
  }
  return result;
}

/// "5%" and "0.05" are the same half-width.
std::optional<double> half_width(std::string_view text) {
  const bool percent = text.ends_with('%');
  if (percent) text.remove_suffix(1);
  const std::optional<double> number = parse_number(text);
  if (!number || *number < 0) return std::nullopt;
  return percent ? *number / 100 : *number;
}

[[noreturn]] void unknown_assumed_error(const std::string& name, const AssumedErrors& known) {
  std::string list;
  for (const auto& each : known) list += fmt::format("{}{}", list.empty() ? "" : ", ", hz::name(each.first));
  throw Error(Fault::usage, fmt::format("--assume-error knows no half-width of `{}`, only of {}", name, list));
}

void read_assumed_error(const std::string& part, AssumedErrors& errors) {
  const std::size_t sign = std::min(part.find('='), part.size());
  const std::string name = part.substr(0, sign);
  const std::optional<Quantity> quantity = quantity_named(name);
  if (!quantity || !errors.contains(*quantity)) unknown_assumed_error(name, default_assumed_errors());
  const std::optional<double> width = half_width(std::string_view(part).substr(std::min(sign + 1, part.size())));
  if (!width || *width >= 1)
    throw Error(Fault::usage, fmt::format("--assume-error needs {}=N%, from 0 to below 100 %, not `{}`", name, part));
  errors[*quantity] = *width;
}

double read_albedo(const std::string& text) {
  const double albedo = option_number("albedo", text);
  if (albedo >= 0 && albedo < 1) return albedo;
  throw Error(Fault::usage, fmt::format("--albedo is at least 0 and below 1, not {}", text));
}

double read_length_scale(const std::string& text) {
  const double scale = option_number("length-scale", text);
  if (scale > 0 && std::isfinite(scale)) return scale;
  throw Error(Fault::usage, fmt::format("--length-scale is in pc and above 0, not {}", text));
}

void read_sampling(const Arguments& arguments, Settings& settings) {
  if (const auto draws = given(arguments, "draws")) settings.draws = option_count("draws", *draws, 1);
  if (const auto seed = given(arguments, "seed")) settings.seed = option_count("seed", *seed, 0);
  const bool asked = given(arguments, "draws") || given(arguments, "seed");
  if (asked && settings.method != Method::sampling)
    throw Error(Fault::usage, "--draws and --seed mean something only with --method sampling");
}

}  // namespace

std::span<const Option> boundary_options() { return boundary_table; }
std::span<const Option> placement_options() { return placement_table; }

std::shared_ptr<const LimitCatalog> read_catalog(const Arguments& arguments) {
  const LimitCatalog& published = LimitCatalog::published();
  const std::optional<std::string> file = arguments.value("limits");
  if (!file) return std::make_shared<const LimitCatalog>(published);
  return std::make_shared<const LimitCatalog>(published.with(read_text_file(*file), *file));
}

const LimitSet& limit_set_named(const LimitCatalog& catalog, const std::string& key) {
  if (const LimitSet* const set = catalog.find(key)) return *set;
  std::vector<std::string> keys;
  for (const LimitSet& set : catalog.sets()) keys.push_back(set.key);
  throw Error(Fault::usage,
              fmt::format("there is no limit set {}{} (`hzmap limits` lists them)", key, did_you_mean(key, keys)));
}

AssumedErrors read_assumed_errors(const std::string& text) {
  if (text == "none") return {};
  AssumedErrors errors = default_assumed_errors();
  for (const std::string& part : parts(text)) read_assumed_error(part, errors);
  std::erase_if(errors, [](const auto& each) { return each.second == 0; });
  return errors;
}

VerdictThresholds read_thresholds(const std::string& text) {
  std::vector<double> p;
  for (const std::string& part : parts(text)) p.push_back(option_number("verdict-at", part));
  const bool falling = p.size() == 4 && 1 >= p[0] && p[0] >= p[1] && p[1] > p[2] && p[2] >= p[3] && p[3] >= 0;
  if (falling) return {.inside = p[0], .likely_inside = p[1], .likely_outside = p[2], .outside = p[3]};
  throw Error(Fault::usage,
              fmt::format("--verdict-at needs four falling probabilities such as 0.95,0.68,0.32,0.05, not `{}`", text));
}

Choices read_choices(const Arguments& arguments) {
  Choices choices{read_catalog(arguments), {}};
  Settings& settings = choices.settings;
  settings.limits = &limit_set_named(*choices.catalog, arguments.value("set").value_or(std::string(default_limit_set)));
  if (!settings.limits->bounds_a_zone())
    throw Error(Fault::usage, fmt::format("the limit set {} bounds no zone; take another", settings.limits->key));
  set_word(arguments, "beyond", beyond_words, settings.beyond);
  set_word(arguments, "asymmetry", asymmetry_words, settings.asymmetry);
  set_word(arguments, "luminosity-from", luminosity_words, settings.luminosity_from);
  set_word(arguments, "semi-major-axis-from", axis_words, settings.semi_major_axis_from);
  set_word(arguments, "insolation-from", insolation_words, settings.insolation_from);
  set_word(arguments, "method", method_words, settings.method);
  if (const auto text = given(arguments, "length-scale")) settings.length_scale = read_length_scale(*text);
  if (const auto text = given(arguments, "assume-error")) settings.assumed_errors = read_assumed_errors(*text);
  if (const auto text = given(arguments, "verdict-at")) settings.thresholds = read_thresholds(*text);
  if (const auto text = given(arguments, "albedo")) settings.bond_albedo = read_albedo(*text);
  read_sampling(arguments, settings);
  return choices;
}

std::string settings_line(const Settings& settings) {
  return fmt::format("limits: {}, {}; {} beyond the fitted range; asymmetric values: the number is the {}",
                     settings.limits->key, settings.limits->citation,
                     settings.beyond == BeyondRange::hold ? "held up to 300 K" : "refused",
                     settings.asymmetry == Asymmetry::median ? "median" : "mode");
}

}  // namespace hz::app
