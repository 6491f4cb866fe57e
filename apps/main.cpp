// hzmap: the first word is the command; everything that goes wrong ends here, as one sentence and an exit code.
#include <fmt/format.h>

#include <algorithm>
#include <csignal>
#include <cstdio>
#include <string>
#include <vector>

#include "commands.hpp"
#include "help.hpp"
#include "hz/error.hpp"
#include "hz/limit_set.hpp"
#include "interrupt.hpp"
#include "man_page.hpp"

namespace {

using namespace hz::app;

ColorChoice color_choice(const Arguments& arguments) {
  constexpr auto words = std::to_array<OptionWord<ColorChoice>>(
      {{"auto", ColorChoice::automatic}, {"always", ColorChoice::always}, {"never", ColorChoice::never}});
  const std::optional<std::string> text = arguments.value("color");
  return text ? option_word<ColorChoice>("color", *text, words) : ColorChoice::automatic;
}

int run_command(const Command& command, std::span<const std::string> words) {
  const Arguments arguments = Arguments::read(command.name, command.options, command.positionals, words);
  Console console(arguments.has("quiet"), color_choice(arguments));
  int code = exit_code::done;
  if (arguments.has("help")) {
    console.print(command_help(command, console, terminal_width()));
  } else {
    code = command.run(arguments, console);
  }
  console.finish();
  return code;
}

std::string version() {
  return fmt::format("hzmap {}\nlimit set {} unless told; constants of IAU 2012 B2 and 2015 B3\n", HZMAP_VERSION,
                     hz::default_limit_set);
}

int print_page(const std::string& page, Console& console) {
  console.print(page);
  console.finish();
  return exit_code::done;
}

int run(std::span<const std::string> words) {
  if (words.empty()) throw hz::Error(hz::Fault::usage, "what is to be done? (`hzmap --help` lists the commands)");
  Console console(false, ColorChoice::automatic);
  const std::string& first = words.front();
  if (first == "--help" || first == "-h") return print_page(program_help(console, terminal_width()), console);
  if (first == "--version") return print_page(version(), console);
  if (first == "--man-page") return print_page(man_page(HZMAP_VERSION, HZMAP_RELEASED), console);  // the build's
  return run_command(command_named(first), words.subspan(1));
}

int complain(const std::string& sentence, int code) {
  fmt::print(stderr, "hzmap: {}\n", sentence);
  return code;
}

/// A closed pipe ends the program without a word: whoever read it has what they wanted.
int stopped() {
  const int code = exit_code::signal + stop_signal();
  return stop_signal() == SIGPIPE ? code : complain("stopped before the end", code);
}

}  // namespace

int main(int argc, char** argv) {
  remember_stop_signals();
  try {
    return run(std::vector<std::string>(argv + std::min(argc, 1), argv + argc));
  } catch (const Stopped&) {
    return stopped();
  } catch (const hz::Error& error) {
    return stop_signal() != 0 ? stopped() : complain(error.what(), static_cast<int>(error.fault()));
  } catch (const std::exception& error) {
    return complain(
        fmt::format("this is a fault of hzmap itself, please report it with the command you typed: {}", error.what()),
        exit_code::internal);
  }
}
