// hzmap check: where one planet lies, now.
#include <fmt/format.h>

#include "bounds_page.hpp"
#include "check_page.hpp"
#include "closest.hpp"
#include "commands.hpp"
#include "hz/error.hpp"
#include "join_options.hpp"
#include "one_star_options.hpp"
#include "planet_list.hpp"

namespace hz::app {
namespace {

bool is_called(const ListRow& row, const std::string& folded) {
  const std::string planet = folded_name(row.planet.name);
  return !planet.empty() && (planet == folded || folded_name(row.star.name) + planet == folded);
}

[[noreturn]] void refuse_name(const AnsweredList& list, const std::string& name) {
  std::vector<std::string> planets;
  std::string of_star;
  for (const Candidate& candidate : list.candidates) {
    const std::string& planet = candidate.row.planet.name;
    if (planet.empty()) continue;
    planets.push_back(planet);
    if (folded_name(candidate.row.star.name) == folded_name(name)) of_star += (of_star.empty() ? "" : ", ") + planet;
  }
  if (!of_star.empty())
    throw Error(Fault::usage, fmt::format("{} is a star; its planets in {}: {}", name, list.planets, of_star));
  throw Error(Fault::usage, fmt::format("{} has no planet `{}`{}", list.planets, name, did_you_mean(name, planets)));
}

/// The planet's row; of several the one that would be ranked.
Candidate find_planet(const AnsweredList& list, const std::string& name) {
  std::vector<Candidate> found;
  for (const Candidate& candidate : list.candidates) {
    if (is_called(candidate.row, folded_name(name))) found.push_back(candidate);
  }
  if (found.empty()) refuse_name(list, name);
  keep_one_row_a_planet(found);
  for (Candidate& candidate : found) {
    if (candidate.in_the_running()) return candidate;
  }
  return found.front();
}

bool wants_json(const Arguments& arguments) {
  constexpr auto words = std::to_array<OptionWord<bool>>({{"text", false}, {"json", true}});
  const std::optional<std::string> format = arguments.value("format");
  return format && option_word<bool>("format", *format, words);
}

int print_report(const CheckReport& report, const Arguments& arguments, Console& console) {
  console.print(wants_json(arguments) ? check_json(report) : check_page(report, console, terminal_width()));
  return exit_code::done;
}

/// A star without a planet: where its zone lies, and how that is known.
int print_star(const ListRow& row, const Settings& settings, Console& console) {
  const Answer answer = answer_star(row, settings);
  if (answer.status == Status::set_aside) throw Error(Fault::input, "no answer for this star: " + answer.reason);
  console.print(bounds_page(row, answer, settings, console, terminal_width()));
  return exit_code::done;
}

}  // namespace

int run_check(const Arguments& arguments, Console& console) {
  const std::vector<std::string>& words = arguments.words();
  if (has_typed_values(arguments) == !words.empty()) {
    throw Error(Fault::usage, words.empty()
                                  ? "give a list and a planet's name, or type a planet such as --teff 4410+-70 "
                                    "--luminosity 0.165 --semi-major-axis 0.412"
                                  : "give a list or type a planet, not both");
  }
  check_join_options(arguments, words.empty());
  const Choices choices = read_choices(arguments);
  if (words.empty()) {
    const ListRow row = typed_row(arguments);
    if (!is_planet(row) && !wants_json(arguments)) return print_star(row, choices.settings, console);
    return print_report(make_report(row, choices, answer(row, choices.settings)), arguments, console);
  }
  if (words.size() < 2)
    throw Error(Fault::usage, fmt::format("which planet of {}? Give its name after the list", words[0]));
  const auto wanted = [&](const ListRow& row) { return is_called(row, folded_name(words[1])); };
  const AnsweredList list = answer_list(words[0], arguments, choices.settings, console, {}, wanted);
  const Candidate planet = find_planet(list, words[1]);
  return print_report(make_report(planet.row, choices, planet.answer), arguments, console);
}

}  // namespace hz::app
