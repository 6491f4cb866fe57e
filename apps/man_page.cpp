#include "man_page.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "commands.hpp"
#include "flag_text.hpp"
#include "help.hpp"
#include "hz/require.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

/// Text that roff prints as it stands: no escape, no accent sign.
std::string plain(std::string_view text) {
  std::string result;
  for (const char c : text) {
    switch (c) {
      case '\\': result += "\\e"; break;
      case '`': result += "\\(ga"; break;
      case '\'': result += "\\(aq"; break;
      case '~': result += "\\(ti"; break;
      case '^': result += "\\(ha"; break;
      default: result += c;
    }
  }
  return result;
}

/// Text as one argument of a macro: quoted, so that no word of it is taken for a macro.
std::string argument(std::string_view text) {
  std::string result = "\"";
  for (const char c : plain(text)) result += c == '"' ? std::string("\"\"") : std::string(1, c);
  return result + "\"";
}

/// Text in short lines, each sentence on a line of its own as mdoc(7) wants it, none taken for a request.
std::string lines(std::string_view text) {
  constexpr std::size_t width = 78;
  std::string result;
  while (!text.empty()) {
    const std::size_t stop = text.find(". ");
    const std::string_view sentence = text.substr(0, stop == std::string_view::npos ? stop : stop + 1);
    text.remove_prefix(std::min(text.size(), sentence.size() + 1));
    result += wrapped(plain(sentence), width) + "\n";
  }
  for (std::size_t dot = 0; (dot = result.find("\n.", dot)) != std::string::npos;) result.insert(dot + 1, "\\&");
  return result.starts_with('.') ? "\\&" + result : result;
}

std::string sentence(std::string_view text) {
  std::string result = text.ends_with('.') ? std::string(text) : std::string(text) + ".";
  if (result[0] >= 'a' && result[0] <= 'z') result[0] = static_cast<char>(result[0] - 'a' + 'A');
  return lines(result);
}

std::string month_day_year(const std::string& date) {
  constexpr std::array months{"January", "February", "March",     "April",   "May",      "June",
                              "July",    "August",   "September", "October", "November", "December"};
  const auto month = static_cast<std::size_t>(std::stoi(date.substr(5, 2)));
  HZ_REQUIRE(month >= 1 && month <= months.size());
  return fmt::format("{} {}, {}", months[month - 1], std::stoi(date.substr(8, 2)), date.substr(0, 4));
}

std::string option_entry(const Option& option) {
  std::string result = ".It ";
  if (option.letter) result += fmt::format("Fl {} , ", option.letter);
  result += fmt::format("Fl -{}", option.name);
  if (!option.placeholder.empty()) result += " Ar " + argument(option.placeholder);
  return result + "\n" + sentence(option.help);
}

std::string command_section(const Command& command) {
  std::string result =
      fmt::format(".Ss {}\n.Bd -literal -compact\n{}\n.Ed\n.Pp\n", command.name, plain(synopsis(command)));
  result += sentence(command.summary) + ".Bl -tag -width Ds\n";
  for (const Positional& positional : command.positionals)
    result += fmt::format(".It Ar {}\n{}", argument(positional.name), sentence(positional.help));
  for (const OptionGroup group : option_groups) {
    for (const Option& option : command.options) {
      if (option.group == group) result += option_entry(option);
    }
  }
  result += ".El\n";
  for (const std::string_view note : command.notes) result += ".Pp\n" + sentence(note);
  return result;
}

std::string examples() {
  std::string result = ".Sh EXAMPLES\n.Bl -tag -width Ds\n";
  for (const Command& command : commands()) {
    for (const Example& example : command.examples)
      result += fmt::format(".It Li {}\n{}", argument(example.line), sentence(example.what));
  }
  return result + ".El\n";
}

std::string exit_status() {
  std::string result = ".Sh EXIT STATUS\n.Bl -tag -width \"130, 143\" -compact\n";
  for (const ExitMeaning& each : exit_meanings())
    result += fmt::format(".It {}\n{}", argument(each.code), sentence(each.meaning));
  return result + ".El\n";
}

std::string flag_list() {
  std::string result = ".Sh FLAGS\n.Bl -tag -width \"planet_mass_assumed\" -compact\n";
  for (const FlagInfo& each : all_flags())
    result += fmt::format(".It {}\n{}", argument(flag_word(each)), sentence(each.meaning));
  return result + ".El\n";
}

}  // namespace

std::string man_page(const std::string& version, const std::string& date) {
  std::string result = fmt::format(".Dd {}\n.Dt HZMAP 1\n.Os\n", month_day_year(date));
  result += ".Sh NAME\n.Nm hzmap\n.Nd where planets can keep liquid water, and how sure that is\n";
  result += ".Sh SYNOPSIS\n.Nm\n.Ar command\n.Op Ar argument ...\n.Op Ar option ...\n.Nm\n.Fl -help | -version\n";
  result += ".Sh DESCRIPTION\n.Nm\n";
  result += sentence(
      "reads what is known of stars and their planets, sets it against published limits of the liquid-water "
      "zone, and says with what probability each planet lies between them.");
  result += ".Sh COMMANDS\n";
  for (const Command& command : commands()) result += command_section(command);
  result +=
      ".Sh ENVIRONMENT\n.Bl -tag -width NO_COLOR\n.It Ev NO_COLOR\nIf set and not empty, no colour is used.\n.El\n";
  return result + exit_status() + flag_list() + examples() +
         fmt::format(".Sh CAVEATS\n{}.Pp\nThis page describes hzmap {}.\n", sentence(screening_note), version);
}

}  // namespace hz::app
