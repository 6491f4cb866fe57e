#include "help.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "flag_text.hpp"
#include "hz/flags.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

constexpr std::size_t margin = 2;
constexpr std::size_t widest_term = 26;

/// A term and what is said of it, the second in a column of its own; a long term has a line to itself.
std::string entry(std::string_view term, std::string_view text, std::size_t column, std::size_t width) {
  std::string result = std::string(margin, ' ') + std::string(term);
  const std::size_t used = text_width(result);
  result += used + margin > column ? "\n" + std::string(column, ' ') : std::string(column - used, ' ');
  return result + wrapped(text, width, column) + "\n";
}

std::string paragraph(std::string_view text, std::size_t width) {
  return std::string(margin, ' ') + wrapped(text, width, margin) + "\n";
}

std::string option_term(const Option& option) {
  const std::string letter = option.letter ? fmt::format("-{}, ", option.letter) : std::string();
  return letter + "--" + std::string(option.name) + (option.placeholder.empty() ? "" : " ") +
         std::string(option.placeholder);
}

std::size_t option_column(const Command& command) {
  std::size_t widest = 0;
  for (const Option& option : command.options) widest = std::max(widest, text_width(option_term(option)));
  return margin + std::min(widest, widest_term) + margin;
}

std::string group_help(const Command& command, OptionGroup group, const Console& console, std::size_t width) {
  std::string entries;
  for (const Option& option : command.options) {
    if (option.group == group) entries += entry(option_term(option), option.help, option_column(command), width);
  }
  return entries.empty() ? entries : "\n" + console.styled(heading(group), Style::strong) + "\n" + entries;
}

std::string positional_help(const Command& command, std::size_t width) {
  std::string result;
  for (const Positional& positional : command.positionals)
    result += entry(positional.name, positional.help, option_column(command), width);
  return result.empty() ? result : "\n" + result;
}

std::string examples_help(const Command& command, const Console& console, std::size_t width) {
  std::string result = "\n" + console.styled("For example", Style::strong) + "\n";
  for (const Example& example : command.examples)
    result += paragraph(example.line, width) + "      " + wrapped(example.what, width, 6) + "\n";
  return result;
}

}  // namespace

std::string_view heading(OptionGroup group) {
  switch (group) {
    case OptionGroup::input: return "What goes in";
    case OptionGroup::answer: return "How it is answered";
    case OptionGroup::output: break;
  }
  return "What comes out";
}

std::string synopsis(const Command& command) {
  std::string result = fmt::format("hzmap {}", command.name);
  for (const Positional& positional : command.positionals)
    result += positional.required ? fmt::format(" {}", positional.name) : fmt::format(" [{}]", positional.name);
  return result + " [OPTIONS]";
}

std::string command_help(const Command& command, const Console& console, std::size_t width) {
  std::string result = console.styled(synopsis(command), Style::strong) + "\n";
  result += paragraph(command.summary, width) + positional_help(command, width);
  for (const OptionGroup group : option_groups) result += group_help(command, group, console, width);
  result += examples_help(command, console, width);
  for (const std::string_view note : command.notes) result += "\n" + wrapped(note, width) + "\n";
  return result;
}

std::string program_help(const Console& console, std::size_t width) {
  constexpr std::size_t column = 12;
  std::string result = wrapped("hzmap: where planets can keep liquid water, and how sure that is", width) + "\n\n";
  result += console.styled("hzmap COMMAND ...", Style::strong) + "\n";
  for (const Command& command : commands()) result += entry(command.name, command.summary, column, width);
  result +=
      "\n" + wrapped("`hzmap COMMAND --help` has its options and two examples; `hzmap --version` the version.", width);
  result += "\n\n" + console.styled("Exit codes", Style::strong) + "\n";
  for (const ExitMeaning& each : exit_meanings()) result += entry(each.code, each.meaning, column, width);
  result += "\n" + console.styled("Flags, in every answer that needs them", Style::strong) + "\n";
  constexpr std::size_t flag_column = 22;
  for (const FlagInfo& each : all_flags()) result += entry(flag_word(each), each.meaning, flag_column, width);
  return result + "\n" + wrapped(screening_note, width) + "\n";
}

}  // namespace hz::app
