#include "options.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <boost/program_options.hpp>
#include <charconv>
#include <cmath>

#include "closest.hpp"
#include "hz/error.hpp"
#include "hz/measured_text.hpp"
#include "hz/require.hpp"

namespace hz::app {
namespace {

namespace po = boost::program_options;

/// Guessing would let `--tef` pass for `--teff` without a word.
constexpr int style = po::command_line_style::unix_style & ~po::command_line_style::allow_guessing;

po::options_description describe(std::span<const Option> options) {
  po::options_description description;
  for (const Option& option : options) {
    const std::string names =
        option.letter ? fmt::format("{},{}", option.name, option.letter) : std::string(option.name);
    if (option.kind == OptionKind::flag) description.add_options()(names.c_str(), po::bool_switch());
    if (option.kind == OptionKind::value) description.add_options()(names.c_str(), po::value<std::string>());
    if (option.kind == OptionKind::list)
      description.add_options()(names.c_str(), po::value<std::vector<std::string>>()->composing());
  }
  return description;
}

std::vector<std::string> spellings(std::span<const Option> options) {
  std::vector<std::string> result;
  for (const Option& option : options) result.push_back(fmt::format("--{}", option.name));
  return result;
}

[[noreturn]] void usage_error(std::string_view command, const std::string& what) {
  throw Error(Fault::usage, fmt::format("{} (see `hzmap {} --help`)", what, command));
}

/// Boost names an option now with dashes and now without, and drops the value of `--x=1` only sometimes.
std::string dashed(const std::string& option) {
  std::string name = option.substr(0, option.find('='));
  if (name.starts_with("-")) return name;
  return name.size() == 1 ? "-" + name : "--" + name;
}

std::string syntax_trouble(const po::invalid_command_line_syntax& error) {
  const std::string option = dashed(error.get_option_name());
  switch (error.kind()) {
    case po::invalid_syntax::missing_parameter:
    case po::invalid_syntax::empty_adjacent_parameter: return fmt::format("{} needs a value", option);
    case po::invalid_syntax::extra_parameter: return fmt::format("{} takes no value", option);
    default: return fmt::format("{} is not understood", option);
  }
}

po::parsed_options parse(std::string_view command, std::span<const Option> options,
                         const po::options_description& description, std::span<const std::string> words) {
  try {
    const std::vector<std::string> copy(words.begin(), words.end());
    return po::command_line_parser(copy).options(description).style(style).run();
  } catch (const po::unknown_option& error) {
    const std::string option = dashed(error.get_option_name());
    usage_error(command,
                fmt::format("`{}` has no option {}{}", command, option, did_you_mean(option, spellings(options))));
  } catch (const po::invalid_command_line_syntax& error) {
    usage_error(command, syntax_trouble(error));
  }
}

po::variables_map store(std::string_view command, const po::parsed_options& parsed) {
  po::variables_map map;
  try {
    po::store(parsed, map);
  } catch (const po::multiple_occurrences& error) {
    usage_error(command, fmt::format("{} is given more than once", dashed(error.get_option_name())));
  }
  return map;
}

/// Boost takes `--teff --luminosity` for a value of --teff; a person has forgotten the value.
void check_is_no_option(std::string_view command, std::span<const Option> options, const Option& option,
                        const std::string& value) {
  const auto is_meant = [&](const Option& other) { return value == fmt::format("--{}", other.name); };
  if (std::any_of(options.begin(), options.end(), is_meant))
    usage_error(command, fmt::format("--{} needs a value", option.name));
}

std::vector<std::string> values_of(const po::variables_map& map, const Option& option) {
  const po::variable_value& value = map[std::string(option.name)];
  if (value.empty()) return {};
  if (option.kind == OptionKind::flag)
    return value.as<bool>() ? std::vector<std::string>{""} : std::vector<std::string>{};
  if (option.kind == OptionKind::value) return {value.as<std::string>()};
  return value.as<std::vector<std::string>>();
}

void check_number_of_words(std::string_view command, std::span<const Positional> positionals,
                           std::span<const std::string> words) {
  if (words.size() > positionals.size())
    usage_error(command, fmt::format("`{}` is one word too many for `{}`", words[positionals.size()], command));
  if (words.size() < positionals.size() && positionals[words.size()].required)
    usage_error(command, fmt::format("`{}` needs {}: {}", command, positionals[words.size()].name,
                                     positionals[words.size()].help));
}

}  // namespace

Arguments Arguments::read(std::string_view command, std::span<const Option> options,
                          std::span<const Positional> positionals, std::span<const std::string> words) {
  const po::options_description description = describe(options);
  const po::parsed_options parsed = parse(command, options, description, words);
  const po::variables_map map = store(command, parsed);
  Arguments result;
  for (const Option& option : options) {
    std::vector<std::string>& values = result.given_[std::string(option.name)];
    values = values_of(map, option);
    for (const std::string& value : values) check_is_no_option(command, options, option, value);
  }
  result.words_ = po::collect_unrecognized(parsed.options, po::include_positional);
  if (!result.knows("help") || !result.has("help")) check_number_of_words(command, positionals, result.words_);
  return result;
}

bool Arguments::has(std::string_view option) const { return !values(option).empty(); }

std::optional<std::string> Arguments::value(std::string_view option) const {
  const std::vector<std::string> all = values(option);
  return all.empty() ? std::nullopt : std::optional(all.front());
}

std::vector<std::string> Arguments::values(std::string_view option) const {
  const auto found = given_.find(option);
  HZ_REQUIRE(found != given_.end());
  return found->second;
}

bool Arguments::knows(std::string_view option) const { return given_.find(option) != given_.end(); }

double option_number(std::string_view option, std::string_view text) {
  const std::optional<double> number = parse_number(text);
  if (number && std::isfinite(*number)) return *number;
  throw Error(Fault::usage, fmt::format("--{} needs a number, not `{}`", option, text));
}

unsigned long long option_count(std::string_view option, std::string_view text, unsigned long long least) {
  unsigned long long number = 0;
  const char* const end = text.data() + text.size();
  const auto [stop, trouble] = std::from_chars(text.data(), end, number);
  if (trouble == std::errc() && stop == end && number >= least) return number;
  throw Error(Fault::usage, fmt::format("--{} needs a whole number of at least {}, not `{}`", option, least, text));
}

std::size_t option_word_index(std::string_view option, std::string_view text,
                              std::span<const std::string_view> allowed) {
  std::string list;
  for (std::size_t i = 0; i < allowed.size(); ++i) {
    if (allowed[i] == text) return i;
    list += fmt::format("{}{}", i == 0 ? "" : i + 1 == allowed.size() ? " or " : ", ", allowed[i]);
  }
  throw Error(Fault::usage, fmt::format("--{} takes {}, not `{}`", option, list, text));
}

}  // namespace hz::app
