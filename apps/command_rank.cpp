// hzmap rank: put the planets of a list in order.
#include <fmt/format.h>

#include <algorithm>

#include "commands.hpp"
#include "hz/error.hpp"
#include "hz/ranked_table.hpp"
#include "hz/requirement.hpp"
#include "interrupt.hpp"
#include "join_options.hpp"
#include "planet_list.hpp"
#include "rank_page.hpp"
#include "settings_options.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

std::vector<std::string> own_names() {
  std::vector<Quantity> all;
  for (const QuantityInfo& info : all_columns()) {
    if (const std::optional<Quantity> quantity = quantity_named(info.name)) all.push_back(*quantity);
  }
  std::vector<std::string> names;
  for (const OutputColumn& column : ranked_columns({}, all, {})) names.push_back(column.head.name);
  return names;
}

void cut(std::vector<Candidate>& candidates, const Arguments& arguments) {
  std::vector<Requirement> requirements;
  for (const std::string& text : arguments.values("require")) requirements.push_back(parse_requirement(text));
  for (Candidate& candidate : candidates) {
    if (!candidate.in_the_running()) continue;
    for (const Requirement& requirement : requirements) {
      candidate.cut_reason = why_not_met(requirement, candidate);
      if (!candidate.cut_reason.empty()) break;
    }
  }
}

/// A star without a planet has no place in a ranking of planets.
void set_stars_aside(std::vector<Candidate>& candidates) {
  for (Candidate& candidate : candidates) {
    if (candidate.answer.status != Status::answered || candidate.answer.planet) continue;
    candidate.answer.status = Status::set_aside;
    candidate.answer.reason = "no planet in this row; hzmap bounds answers stars";
    candidate.answer.reason_kind = "no planet";
  }
}

bool keeps_all_solutions(const Arguments& arguments) {
  constexpr auto words = std::to_array<OptionWord<bool>>({{"best", false}, {"all", true}});
  const std::optional<std::string> text = arguments.value("duplicates");
  return text && option_word<bool>("duplicates", *text, words);
}

/// Ranked rows by place, then the others in file order.
std::vector<RankedRow> output_rows(const std::vector<Candidate>& candidates, const std::vector<Place>& places) {
  std::vector<RankedRow> rows;
  for (const Place& place : places) rows.push_back({candidates[place.candidate], place.rank});
  for (const Candidate& candidate : candidates) {
    if (!candidate.in_the_running()) rows.push_back({candidate, 0});
  }
  return rows;
}

void write_ranking(const AnsweredList& list, const std::vector<Place>& places, const Settings& settings,
                   const std::string& path) {
  const std::vector<OutputColumn> columns = ranked_columns(settings, list.stated, list.kept);
  const std::vector<RankedRow> rows = output_rows(list.candidates, places);
  const std::unique_ptr<TableWriter> writer = create_table(path, head_of(columns));
  constexpr std::size_t rows_at_a_time = 1000;
  for (std::size_t first = 0; first < rows.size(); first += rows_at_a_time) {
    stop_if_asked();
    const std::size_t last = std::min(rows.size(), first + rows_at_a_time);
    writer->write(chunk_of(columns, std::vector<RankedRow>(rows.begin() + static_cast<std::ptrdiff_t>(first),
                                                           rows.begin() + static_cast<std::ptrdiff_t>(last))));
  }
  stop_if_asked();
  writer->finish();
}

void refuse_a_list_of_stars(const std::vector<Candidate>& candidates, const std::string& path) {
  const auto any = [&](auto holds) { return std::any_of(candidates.begin(), candidates.end(), holds); };
  const bool planets = any([](const Candidate& c) { return is_planet(c.row); });
  const bool stars = any([](const Candidate& c) { return !is_planet(c.row) && !c.row.problem; });
  if (stars && !planets) {
    throw Error(Fault::input, fmt::format("{} holds stars but no planets; `hzmap bounds {}` answers it", path, path));
  }
}

}  // namespace

int run_rank(const Arguments& arguments, Console& console) {
  check_join_options(arguments, false);
  const Choices choices = read_choices(arguments);
  const std::string& path = arguments.words().front();
  const std::optional<std::string> top = arguments.value("top");
  const std::size_t shown = top ? option_count("top", *top, 0) : 20;
  for (const std::string& text : arguments.values("require"))
    static_cast<void>(parse_requirement(text));  // before the work

  AnsweredList list = answer_list(path, arguments, choices.settings, console, own_names());
  refuse_a_list_of_stars(list.candidates, list.planets);
  set_stars_aside(list.candidates);
  cut(list.candidates, arguments);
  if (!keeps_all_solutions(arguments)) keep_one_row_a_planet(list.candidates);
  humble_rows_without_errors(list.candidates);
  const std::vector<Place> places = places_of(list.candidates);

  const std::optional<std::string> output = arguments.value("output");
  if (output) write_ranking(list, places, choices.settings, *output);
  if (output != "-") {
    console.print(ranking_table(list.candidates, places, shown, choices.settings, console));
    console.print("\n" + wrapped(basis_sentence(choices.settings), terminal_width()) + "\n");
  }
  for (const std::string& line : list.joining) console.say(line);
  for (const std::string& line : ranking_summary(list.candidates, places, choices.settings)) console.say(line);
  if (!list.differing_stars.empty()) console.say(list.differing_stars);
  const bool any_set_aside = std::any_of(list.candidates.begin(), list.candidates.end(),
                                         [](const Candidate& c) { return c.answer.status == Status::set_aside; });
  return arguments.has("strict") && any_set_aside ? exit_code::rows_set_aside : exit_code::done;
}

}  // namespace hz::app
