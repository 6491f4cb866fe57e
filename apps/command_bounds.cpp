// hzmap bounds: how far from a star water can stay liquid.
#include "bounds_page.hpp"
#include "bounds_table.hpp"
#include "commands.hpp"
#include "hz/error.hpp"
#include "interrupt.hpp"
#include "list_options.hpp"
#include "one_star_options.hpp"
#include "progress.hpp"
#include "settings_options.hpp"
#include "tally.hpp"

namespace hz::app {
namespace {

int print_star(const ListRow& row, const Settings& settings, Console& console) {
  const Answer answer = answer_star(row, settings);
  if (answer.status == Status::set_aside) throw Error(Fault::input, "no answer for this star: " + answer.reason);
  console.print(bounds_page(row, answer, settings, console, terminal_width()));
  return exit_code::done;
}

int write_star(const ListRow& row, const Settings& settings, const std::string& output) {
  const BoundsTable table(*settings.limits, {});
  const Answer answer = answer_star(row, settings);
  if (answer.status == Status::set_aside) throw Error(Fault::input, "no answer for this star: " + answer.reason);
  const std::unique_ptr<TableWriter> writer = create_table(output, table.head());
  writer->write(table.chunk({row}, {answer}));
  writer->finish();
  return exit_code::done;
}

std::vector<ListRow> rows_of(const Chunk& chunk, const Understanding& understanding,
                             const std::vector<KeptColumn>& kept) {
  std::vector<ListRow> rows;
  for (std::size_t i = 0; i < chunk.rows(); ++i) {
    rows.push_back(understanding.row(chunk, i));
    for (const KeptColumn& column : kept)
      rows.back().kept.push_back(chunk.row_problems[i] ? "" : chunk.text(column.column, i));
  }
  return rows;
}

std::vector<Answer> answers_to(const std::vector<ListRow>& rows, const Settings& settings, Tally& tally) {
  std::vector<Answer> answers;
  for (const ListRow& row : rows) {
    answers.push_back(answer_star(row, settings));
    tally.count(answers.back());
  }
  return answers;
}

std::vector<ColumnHead> heads_of(const std::vector<KeptColumn>& kept) {
  std::vector<ColumnHead> heads;
  for (const KeptColumn& column : kept) heads.push_back(column.head);
  return heads;
}

/// Chunk by chunk, so that memory does not grow with the list.
Tally write_list(OpenList& list, const Settings& settings, const Arguments& arguments, const Console& console) {
  const std::vector<KeptColumn> kept = kept_columns(arguments, list.reader->head(), BoundsTable::own_names());
  const BoundsTable table(*settings.limits, heads_of(kept));
  const std::unique_ptr<TableWriter> writer = create_table(arguments.value("output").value_or("-"), table.head());
  Tally tally;
  Progress progress(console, "answering");
  while (const std::optional<Chunk> chunk = list.reader->next()) {
    stop_if_asked();
    const std::vector<ListRow> rows = rows_of(*chunk, list.understanding, kept);
    writer->write(table.chunk(rows, answers_to(rows, settings, tally)));
    progress.update(tally.read());
  }
  stop_if_asked();
  if (tally.read() == 0) throw Error(Fault::input, list.reader->head().source + " has a header but no rows");
  writer->finish();
  return tally;
}

int answer_list(const Arguments& arguments, const Settings& settings, Console& console) {
  OpenList list = open_list(arguments.words().front(), arguments, star_inputs());
  const Tally tally = write_list(list, settings, arguments, console);
  for (const std::string& line : tally.lines()) console.say(line);
  console.say(settings_line(settings));
  return arguments.has("strict") && tally.set_aside() > 0 ? exit_code::rows_set_aside : exit_code::done;
}

}  // namespace

int run_bounds(const Arguments& arguments, Console& console) {
  const bool typed = has_typed_values(arguments);
  if (typed != arguments.words().empty())
    throw Error(Fault::usage, typed ? "give a list or type a star, not both"
                                    : "give a list, or type a star such as --teff 5780 --luminosity 1");
  const Choices choices = read_choices(arguments);
  if (!typed) return answer_list(arguments, choices.settings, console);
  const ListRow row = typed_row(arguments);
  const std::optional<std::string> output = arguments.value("output");
  return output ? write_star(row, choices.settings, *output) : print_star(row, choices.settings, console);
}

}  // namespace hz::app
