// Help and man page against the tables they come from.
#include "help.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <set>
#include <sstream>

#include "man_page.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

using testing::HasSubstr;
using testing::StartsWith;

const Console plain(false, ColorChoice::never);

std::size_t widest_line(const std::string& text) {
  std::istringstream lines(text);
  std::size_t widest = 0;
  for (std::string line; std::getline(lines, line);) widest = std::max(widest, text_width(line));
  return widest;
}

TEST(ProgramHelp, NamesEveryCommandAndExitCode) {
  const std::string page = program_help(plain, 80);
  for (const Command& command : commands()) EXPECT_THAT(page, HasSubstr(std::string(command.summary)));
  for (const ExitMeaning& each : exit_meanings()) EXPECT_THAT(page, HasSubstr(std::string(each.meaning)));
  EXPECT_THAT(page, HasSubstr("screening aid"));
}

TEST(CommandHelp, NamesEveryOptionPositionalAndExample) {
  for (const Command& command : commands()) {
    const std::string page = command_help(command, plain, 100);
    for (const Option& option : command.options) EXPECT_THAT(page, HasSubstr("--" + std::string(option.name)));
    for (const Positional& positional : command.positionals) EXPECT_THAT(page, HasSubstr(std::string(positional.name)));
    for (const Example& example : command.examples) EXPECT_THAT(page, HasSubstr(std::string(example.what)));
  }
}

TEST(CommandHelp, KeepsToTheWidth) {
  for (const Command& command : commands()) {
    for (const std::size_t width : {60U, 80U, 100U}) EXPECT_LE(widest_line(command_help(command, plain, width)), width);
  }
}

TEST(Commands, OptionNamesAndLettersAreUnique) {
  for (const Command& command : commands()) {
    std::set<std::string_view> names;
    std::set<char> letters;
    for (const Option& option : command.options) {
      EXPECT_TRUE(names.insert(option.name).second) << command.name << " --" << option.name;
      EXPECT_TRUE(option.letter == '\0' || letters.insert(option.letter).second) << command.name << " -" << option.letter;
      EXPECT_EQ(option.placeholder.empty(), option.kind == OptionKind::flag) << option.name;
    }
  }
}

TEST(Commands, ExamplesBeginWithTheirCommand) {
  for (const Command& command : commands()) {
    for (const Example& example : command.examples)
      EXPECT_THAT(std::string(example.line), StartsWith("hzmap " + std::string(command.name)));
  }
}

TEST(ManPage, NamesEveryOption) {
  const std::string page = man_page("1.2.3", "2024-02-29");
  EXPECT_THAT(page, StartsWith(".Dd February 29, 2024\n"));
  for (const Command& command : commands()) {
    EXPECT_THAT(page, HasSubstr(".Ss " + std::string(command.name) + "\n"));
    for (const Option& option : command.options) EXPECT_THAT(page, HasSubstr("Fl -" + std::string(option.name)));
  }
}

}  // namespace
}  // namespace hz::app
