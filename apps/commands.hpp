// The only list of commands.
#pragma once
#include <array>
#include <span>
#include <string_view>
#include <vector>

#include "console.hpp"
#include "options.hpp"

namespace hz::app {

/// What the program's exit code says. Those of a fault are the numbers of hz::Fault.
namespace exit_code {
inline constexpr int done = 0;
inline constexpr int rows_set_aside = 1;  // under --strict
inline constexpr int usage = 2;
inline constexpr int input = 3;
inline constexpr int output = 4;
inline constexpr int internal = 5;
inline constexpr int signal = 128;  // plus the number of the signal
}  // namespace exit_code

struct ExitMeaning {
  std::string_view code;
  std::string_view meaning;
};
[[nodiscard]] std::span<const ExitMeaning> exit_meanings();

/// A command line that works, and what it does.
struct Example {
  std::string_view line;
  std::string_view what;
};

struct Command {
  std::string_view name;
  std::string_view summary;  // one line, no full stop
  std::vector<Positional> positionals;
  std::vector<Option> options;  // its own, then those of every command
  std::array<Example, 2> examples;
  std::vector<std::string_view> notes;                                 // paragraphs below the options
  int (*run)(const Arguments& arguments, Console& console) = nullptr;  // its exit code
};

[[nodiscard]] std::span<const Command> commands();

/// Throws hz::Error (usage) that offers the closest command.
[[nodiscard]] const Command& command_named(std::string_view name);

int run_bounds(const Arguments& arguments, Console& console);
int run_check(const Arguments& arguments, Console& console);
int run_columns(const Arguments& arguments, Console& console);
int run_draw(const Arguments& arguments, Console& console);
int run_limits(const Arguments& arguments, Console& console);
int run_rank(const Arguments& arguments, Console& console);
int run_routes(const Arguments& arguments, Console& console);

/// What every zone is good for; said once in the help, once in the man page.
inline constexpr std::string_view screening_note =
    "A zone is a screening aid: it says where a planet with the right air could keep liquid water, not that one does.";

}  // namespace hz::app
