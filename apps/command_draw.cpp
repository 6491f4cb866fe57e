// hzmap draw: figures of one system or of a whole list.
#include <fmt/format.h>

#include <algorithm>

#include "closest.hpp"
#include "commands.hpp"
#include "figure_stars.hpp"
#include "hz/error.hpp"
#include "hz/plots/figure_file.hpp"
#include "hz/plots/length.hpp"
#include "join_options.hpp"
#include "one_star_options.hpp"
#include "planet_list.hpp"

namespace hz::app {
namespace {

enum class Kind { wedge, lanes };

Kind kind_named(const std::string& word) {
  if (word == "wedge") return Kind::wedge;
  if (word == "lanes") return Kind::lanes;
  throw Error(Fault::usage, fmt::format("draw has the kinds wedge and lanes, not `{}`", word));
}

/// "Underwood, Jones & Sleep 2003": a citation as far as its year.
std::string authors_and_year(const std::string& citation) {
  for (std::size_t comma = citation.find(','); comma != std::string::npos; comma = citation.find(',', comma + 1)) {
    if (comma > 0 && citation[comma - 1] >= '0' && citation[comma - 1] <= '9') return citation.substr(0, comma);
  }
  return citation;
}

plots::FigureOptions figure_options(const Arguments& arguments, const Settings& settings) {
  const LimitSet& set = *settings.limits;
  plots::FigureOptions options;
  options.width = plots::parse_length(arguments.value("width").value_or("180mm"));
  options.filled_by = set.conservative ? plots::FilledZone::conservative : plots::FilledZone::optimistic;
  options.limit_set = authors_and_year(set.citation);
  if (set.planet_mass_range()) options.runaway_planet_mass = "1 M⊕";
  options.order = "hottest first";
  return options;
}

std::vector<Candidate> typed_candidates(const Arguments& arguments, const Settings& settings) {
  Candidate candidate;
  candidate.row = typed_row(arguments);
  candidate.row.number = 1;
  candidate.answer = answer(candidate.row, settings);
  return {candidate};
}

std::vector<Candidate> listed_candidates(const Arguments& arguments, const Settings& settings, Console& console) {
  AnsweredList list = answer_list(arguments.words()[1], arguments, settings, console);
  for (const std::string& line : list.joining) console.say(line);
  std::vector<Candidate> candidates = std::move(list.candidates);
  keep_one_row_a_planet(candidates);
  // A planet's other solutions are not missing from a figure.
  std::erase_if(candidates,
                [](const Candidate& c) { return c.answer.reason_kind == "another row of this planet is used"; });
  return candidates;
}

/// The rows of one star, named itself or through a planet of it.
std::vector<Candidate> system_of(std::vector<Candidate> candidates, const std::string& name, const std::string& path) {
  const std::string wanted = folded_name(name);
  std::string star;
  std::vector<std::string> names;
  for (const Candidate& candidate : candidates) {
    names.push_back(candidate.row.star.name);
    const bool is_it =
        folded_name(candidate.row.star.name) == wanted || folded_name(candidate.row.planet.name) == wanted;
    if (star.empty() && is_it) star = folded_name(candidate.row.star.name);
  }
  std::erase_if(candidates, [&](const Candidate& c) { return folded_name(c.row.star.name) != star; });
  if (star.empty() || candidates.empty()) {
    throw Error(Fault::usage, fmt::format("{} has no star `{}`{}", path, name, did_you_mean(name, names)));
  }
  return candidates;
}

void say_what_is_left_out(const std::vector<std::string>& left_out, Console& console) {
  constexpr std::size_t shown = 5;
  for (std::size_t i = 0; i < std::min(shown, left_out.size()); ++i) console.say("not drawn: " + left_out[i]);
  if (left_out.size() > shown) console.say(fmt::format("not drawn: {} more", left_out.size() - shown));
}

plots::FigureFile figure_file(const Arguments& arguments, Kind kind, const FigureStars& stars,
                              const Settings& settings) {
  plots::FigureFile file;
  file.path = *arguments.value("output");
  if (const auto dpi = arguments.value("dpi")) file.dpi = option_number("dpi", *dpi);
  const std::string& name = stars.stars.front().name;
  const std::string of =
      kind == Kind::wedge ? (name.empty() ? "a star" : name) : fmt::format("{} stars", stars.stars.size());
  file.title = fmt::format("Liquid-water zone of {}", of);
  std::size_t planets = 0;
  for (const plots::FigureStar& star : stars.stars) planets += star.planets.size();
  file.description =
      fmt::format("{} with {} planets; limits of {}. A zone is a screening aid, not proof of habitability.", of,
                  planets, settings.limits->citation);
  return file;
}

int write_drawing(Kind kind, FigureStars stars, const plots::FigureOptions& options, const Arguments& arguments,
                  const Settings& settings, Console& console) {
  say_what_is_left_out(stars.left_out, console);
  if (stars.stars.empty())
    throw Error(Fault::input, "there is nothing to draw: no star has an effective temperature and a luminosity");
  std::stable_sort(stars.stars.begin(), stars.stars.end(),
                   [](const auto& a, const auto& b) { return a.teff.value > b.teff.value; });
  const plots::Scene scene =
      kind == Kind::wedge ? plots::wedge_scene(stars.stars.front(), options) : plots::lanes_scene(stars.stars, options);
  plots::write_figure(scene, figure_file(arguments, kind, stars, settings));
  return exit_code::done;
}

}  // namespace

int run_draw(const Arguments& arguments, Console& console) {
  const std::vector<std::string>& words = arguments.words();
  const Kind kind = kind_named(words[0]);
  const bool typed = has_typed_values(arguments);
  if (!arguments.has("output"))
    throw Error(Fault::usage, "where should the figure go? Add -o FILE.svg (or .pdf, .png)");
  static_cast<void>(plots::figure_format(*arguments.value("output")));  // before the work
  const bool listed = words.size() > 1;
  if (typed == listed)
    throw Error(Fault::usage, typed ? "give a list or type a star, not both"
                                    : "give a list, or type a star such as --teff 5780 --luminosity 1");
  if (!typed && kind == Kind::wedge && words.size() < 3) {
    throw Error(Fault::usage, fmt::format("which star of {}? Give its name after the list", words[1]));
  }
  if (!typed && kind == Kind::lanes && words.size() > 2)
    throw Error(Fault::usage, "lanes draws every star of the list; leave the name out");

  check_join_options(arguments, typed);
  const Choices choices = read_choices(arguments);
  const plots::FigureOptions options = figure_options(arguments, choices.settings);
  std::vector<Candidate> candidates =
      typed ? typed_candidates(arguments, choices.settings) : listed_candidates(arguments, choices.settings, console);
  if (words.size() == 3) candidates = system_of(std::move(candidates), words[2], words[1]);
  return write_drawing(kind, figure_stars(candidates, choices.settings), options, arguments, choices.settings, console);
}

}  // namespace hz::app
