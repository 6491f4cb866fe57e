// hzmap bounds: how far from a star water can stay liquid.
#include <fmt/format.h>

#include "bounds_page.hpp"
#include "bounds_table.hpp"
#include "commands.hpp"
#include "hz/error.hpp"
#include "hz/table/column_report.hpp"
#include "interrupt.hpp"
#include "list_options.hpp"
#include "one_star_options.hpp"
#include "progress.hpp"
#include "settings_options.hpp"
#include "tally.hpp"

namespace hz::app {
namespace {

void write_rows(TableWriter& writer, const std::vector<OutputColumn>& columns, const std::vector<Candidate>& answered) {
  std::vector<RankedRow> rows;
  for (const Candidate& each : answered) rows.push_back({each, 0});
  writer.write(chunk_of(columns, rows));
}

int answer_typed_star(const Arguments& arguments, const Settings& settings, Console& console) {
  Candidate star;
  star.row = typed_row(arguments);
  star.answer = answer_star(star.row, settings);
  if (star.answer.status == Status::set_aside)
    throw Error(Fault::input, "no answer for this star: " + star.answer.reason);
  const std::optional<std::string> output = arguments.value("output");
  if (!output) {
    console.print(bounds_page(star.row, star.answer, settings, console, terminal_width()));
    return exit_code::done;
  }
  const std::vector<OutputColumn> columns = bounds_columns(settings, {});
  const std::unique_ptr<TableWriter> writer = create_table(*output, head_of(columns));
  write_rows(*writer, columns, {star});
  writer->finish();
  return exit_code::done;
}

/// A list that could answer no row at all is an error of the whole, not of each of its rows.
void refuse_useless_list(const OpenList& list, const std::string& path) {
  const TableHead& head = list.reader->head();
  const std::vector<std::string> missing = report_columns(head, list.understanding, std::nullopt).missing_for_stars;
  if (missing.empty()) return;
  throw Error(Fault::input,
              fmt::format("{} has no column for {}; `hzmap columns {}` shows how its columns are understood",
                          head.source, missing.front(), path));
}

std::vector<Candidate> answers_to(const Chunk& chunk, const OpenList& list, const std::vector<KeptColumn>& kept,
                                  const Settings& settings, Tally& tally) {
  std::vector<Candidate> answered(chunk.rows());
  for (std::size_t i = 0; i < chunk.rows(); ++i) {
    answered[i].row = list.understanding.row(chunk, i);
    answered[i].row.kept = kept_cells(chunk, i, kept);
    answered[i].answer = answer_star(answered[i].row, settings);
    tally.count(answered[i].answer);
  }
  return answered;
}

std::vector<std::string> own_names(const Settings& settings) {
  std::vector<std::string> names;
  for (const OutputColumn& column : bounds_columns(settings, {})) names.push_back(column.head.name);
  return names;
}

/// Chunk by chunk, so that memory does not grow with the list.
Tally write_list(OpenList& list, const Settings& settings, const Arguments& arguments, const Console& console) {
  const std::vector<KeptColumn> kept = kept_columns(arguments, list.reader->head(), own_names(settings));
  const std::vector<OutputColumn> columns = bounds_columns(settings, heads_of(kept));
  const std::unique_ptr<TableWriter> writer = create_table(arguments.value("output").value_or("-"), head_of(columns));
  Tally tally;
  Progress progress(console, "answering");
  while (const std::optional<Chunk> chunk = list.reader->next()) {
    stop_if_asked();
    write_rows(*writer, columns, answers_to(*chunk, list, kept, settings, tally));
    progress.update(tally.read());
  }
  stop_if_asked();
  if (tally.read() == 0) throw Error(Fault::input, list.reader->head().source + " has a header but no rows");
  writer->finish();
  return tally;
}

int answer_list(const Arguments& arguments, const Settings& settings, Console& console) {
  const std::string& path = arguments.words().front();
  OpenList list = open_list(path, arguments, star_inputs());
  refuse_useless_list(list, path);
  const Tally tally = write_list(list, settings, arguments, console);
  for (const std::string& line : tally.lines()) console.say(line);
  console.say(settings_line(settings));
  return arguments.has("strict") && tally.set_aside() > 0 ? exit_code::rows_set_aside : exit_code::done;
}

}  // namespace

int run_bounds(const Arguments& arguments, Console& console) {
  const bool typed = has_typed_values(arguments);
  const bool listed = !arguments.words().empty();
  if (typed && listed) throw Error(Fault::usage, "give a list or type a star, not both");
  if (!typed && !listed) throw Error(Fault::usage, "give a list, or type a star such as --teff 5780 --luminosity 1");
  const Choices choices = read_choices(arguments);
  return typed ? answer_typed_star(arguments, choices.settings, console)
               : answer_list(arguments, choices.settings, console);
}

}  // namespace hz::app
