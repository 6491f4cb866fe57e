// The pages of --help.
#pragma once
#include <string>

#include "commands.hpp"
#include "console.hpp"

namespace hz::app {

/// `hzmap --help`: the commands, a line each.
[[nodiscard]] std::string program_help(const Console& console, std::size_t width);

/// `hzmap COMMAND --help`.
[[nodiscard]] std::string command_help(const Command& command, const Console& console, std::size_t width);

/// "hzmap rank LIST [OPTIONS]".
[[nodiscard]] std::string synopsis(const Command& command);

/// "What goes in" and so on.
[[nodiscard]] std::string_view heading(OptionGroup group);

inline constexpr std::array option_groups{OptionGroup::input, OptionGroup::answer, OptionGroup::output};

}  // namespace hz::app
