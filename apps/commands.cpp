#include "commands.hpp"

#include <fmt/format.h>

#include <string>

#include "closest.hpp"
#include "hz/error.hpp"
#include "join_options.hpp"
#include "list_options.hpp"
#include "list_rows.hpp"
#include "one_star_options.hpp"
#include "settings_options.hpp"

namespace hz::app {
namespace {

constexpr auto common_table = std::to_array<Option>({
    {"quiet", 'q', OptionKind::flag, "", OptionGroup::output, "no summary and no progress on standard error"},
    {"color", '\0', OptionKind::value, "WHEN", OptionGroup::output,
     "auto, always or never (default auto, which honours NO_COLOR)"},
    {"help", 'h', OptionKind::flag, "", OptionGroup::output, "this page"},
});

constexpr auto set_file_table = std::to_array<Option>({
    {"limits", '\0', OptionKind::value, "FILE", OptionGroup::input,
     "add your own limit sets, in the TOML form of the built-in ones"},
});

constexpr auto write_map_table = std::to_array<Option>({
    {"write", '\0', OptionKind::value, "MAP.toml", OptionGroup::output, "write a column map to edit, for --columns"},
});

constexpr auto rank_table = std::to_array<Option>({
    {"require", '\0', OptionKind::list, "CONDITION", OptionGroup::answer,
     "keep only planets such as 'planet_radius<1.8' (< <= > >= =); may be given again"},
    {"duplicates", '\0', OptionKind::value, "WORD", OptionGroup::answer,
     "of several rows of one planet rank the best or all (default best)"},
    {"one-star", '\0', OptionKind::value, "WORD", OptionGroup::answer,
     "give all planets of one star the star of its first row or of its best measured one: first or best (default each "
     "row's own)"},
    {"top", '\0', OptionKind::value, "N", OptionGroup::output, "how many planets to print (default 20)"},
});

constexpr auto format_table = std::to_array<Option>({
    {"format", '\0', OptionKind::value, "WORD", OptionGroup::output,
     "text to read, or json for a program (default text)"},
});

constexpr auto draw_table = std::to_array<Option>({
    {"output", 'o', OptionKind::value, "FILE", OptionGroup::output,
     "the figure; .svg, .pdf or .png says of which kind"},
    {"width", '\0', OptionKind::value, "LENGTH", OptionGroup::output,
     "width in mm or in, such as 88mm (default 180mm)"},
    {"dpi", '\0', OptionKind::value, "N", OptionGroup::output, "dots an inch of a .png (default 300)"},
});

std::vector<Option> with_common(std::initializer_list<std::span<const Option>> tables) {
  std::vector<Option> result;
  for (const std::span<const Option> table : tables) result.insert(result.end(), table.begin(), table.end());
  result.insert(result.end(), common_table.begin(), common_table.end());
  return result;
}

constexpr std::string_view typed_note =
    "Values may carry half-widths (68 %): 4410+-70, 4410+80-60, 0.165(9) for 0.165+-0.009, or be limits: '<0.3'. A "
    "unit may "
    "follow: '1.1 RJ'. A value typed without half-widths is taken as exact.";
constexpr std::string_view verdict_note =
    "Verdicts by the probability P of lying in a zone: inside (P at least 0.95), likely inside (0.68), open, likely "
    "outside "
    "(at most 0.32), outside (0.05). P is given the limits of the set; it is not a probability of life or water.";

constexpr std::string_view two_lists_note =
    "With --planets each planet gets the values of its star, completed by what its own row says of it. A name that "
    "several stars have, or a place with several stars about as near, is no match: the row says so, and which they "
    "are.";

Command bounds_command() {
  return {"bounds",
          "how far out water can stay liquid: one star, or a list of them",
          {{"LIST", false, "a table of stars or planets; - is standard input; without it, one star is typed"}},
          with_common({star_value_options(), reading_options(), boundary_options(), writing_options()}),
          {{{"hzmap bounds --teff 5780 --luminosity 1", "the zones of a star like the Sun"},
            {"hzmap bounds stars.csv -o bounds.csv", "a table with the zones of every star of a list"}}},
          {typed_note,
           "A list gives one line for each of its rows, answered or set aside with the reason; half-widths are 68 %."},
          run_bounds};
}

Command check_command() {
  return {"check",
          "where one planet lies, now",
          {{"LIST", false, "a table that has the planet; without it, the planet is typed"},
           {"NAME", false, "the planet's name in the list"}},
          with_common({star_value_options(), planet_value_options(), reading_options(), joining_options(),
                       boundary_options(), placement_options(), preference_options(), format_table}),
          {{{"hzmap check --teff 4410+-70 --luminosity 0.165+-0.009 --semi-major-axis 0.412+-0.012 --planet-radius 1.3",
             "a planet from what its paper says"},
            {"hzmap check planets.csv 'Lantern 27 d'", "a planet of a list"}}},
          {typed_note, verdict_note},
          run_check};
}

Command rank_command() {
  return {"rank",
          "put the planets of a list in order, the surest first",
          {{"LIST", true, "a table of planets (of their stars, with --planets); - is standard input"}},
          with_common({reading_options(), joining_options(), boundary_options(), placement_options(), rank_table,
                       preference_options(), writing_options()}),
          {{{"hzmap rank planets.csv -o ranked.csv", "the first 20 on the terminal, all of them in a file"},
            {"hzmap rank planets.csv --require 'planet_radius<1.8' --top 5", "only small planets, five lines"}}},
          {"Merit is P of the conservative zone plus half of what the optimistic zone adds. Planets outside the planet "
           "masses "
           "that the limits were fitted for follow in a section of their own. A row without any error never stands "
           "above an "
           "equal row that has some: its merit is cut to that row's, and its note says so.",
           two_lists_note, verdict_note},
          run_rank};
}

Command draw_command() {
  return {
      "draw",
      "a figure of one system or of a whole list",
      {{"KIND", true, "wedge (one system) or lanes (one row a star)"},
       {"LIST", false, "a table of planets; without it, one system is typed"},
       {"NAME", false, "the star whose wedge is drawn"}},
      with_common({star_value_options(), planet_value_options(), reading_options(), joining_options(),
                   boundary_options(), placement_options(), preference_options(), draw_table}),
      {{{"hzmap draw wedge planets.csv 'Lantern 27' -o lantern-27.svg", "one system: zones, orbits and their ranges"},
        {"hzmap draw lanes planets.csv -o lanes.pdf --width 180mm", "every star of a list with its zone and planets"}}},
      {typed_note},
      run_draw};
}

Command columns_command() {
  return {"columns",
          "how each column of a list is understood, and what is missing",
          {{"LIST", true, "a table; - is standard input"}},
          with_common({reading_options(), write_map_table}),
          {{{"hzmap columns planets.csv", "each column, what it was taken for, and how that was known"},
            {"hzmap columns planets.csv --write map.toml", "a column map to edit; then use --columns map.toml"}}},
          {},
          run_columns};
}

Command limits_command() {
  return {"limits",
          "the published limits: where they hold and where they come from",
          {{"KEY", false, "a limit set to show in full"}},
          with_common({set_file_table}),
          {{{"hzmap limits", "every limit set in a line or two"},
            {"hzmap limits K14", "one set in full, with values from 2600 to 7200 K"}}},
          {},
          run_limits};
}

Command routes_command() {
  return {"routes",
          "the ways to every quantity, best first",
          {{"QUANTITY", false, "a quantity to show with the sources of its relations, such as luminosity"}},
          with_common({}),
          {{{"hzmap routes", "every quantity with its ways, in the order in which they are tried"},
            {"hzmap routes luminosity", "those of the luminosity, with their sources"}}},
          {},
          run_routes};
}

constexpr auto meanings = std::to_array<ExitMeaning>({
    {"0", "done"},
    {"1", "done, but rows were set aside and --strict was given"},
    {"2", "the command line is wrong"},
    {"3", "an input cannot be read or understood"},
    {"4", "an output cannot be written"},
    {"5", "a fault of hzmap itself: please report it"},
    {"130, 143", "stopped by Ctrl-C, by a request to terminate"},
});

}  // namespace

std::span<const ExitMeaning> exit_meanings() { return meanings; }

std::span<const Command> commands() {
  static const std::vector<Command> all = {check_command(),   rank_command(),   bounds_command(), draw_command(),
                                           columns_command(), limits_command(), routes_command()};
  return all;
}

const Command& command_named(std::string_view name) {
  std::vector<std::string> names;
  for (const Command& command : commands()) {
    if (command.name == name) return command;
    names.emplace_back(command.name);
  }
  throw Error(Fault::usage,
              fmt::format("there is no command `{}`{} (`hzmap --help` lists them)", name, did_you_mean(name, names)));
}

}  // namespace hz::app
