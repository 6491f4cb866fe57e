#include "planet_list.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <map>
#include <optional>
#include <utility>

#include "hz/flags.hpp"
#include "hz/one_star.hpp"
#include "interrupt.hpp"
#include "list_rows.hpp"
#include "numbers.hpp"
#include "progress.hpp"
#include "tally.hpp"
#include "two_lists.hpp"

namespace hz::app {
namespace {

UnansweredList read_one_list(const std::string& path, const Arguments& arguments, const Console& console,
                             std::span<const std::string> written) {
  const OpenList list = open_list(path, arguments, planet_inputs());
  const TableHead& head = list.reader->head();
  UnansweredList unanswered;
  unanswered.planets = path;
  unanswered.stated = stated_quantities(list.understanding);
  refuse_unusable(unanswered.stated, head.source);
  RowReading reading;
  if (arguments.knows("keep")) reading.kept = kept_columns(arguments, head, written);
  reading.preference = read_preference(arguments, head);
  unanswered.kept = heads_of(reading.kept);
  unanswered.candidates = read_rows(list, reading, console).candidates;
  unanswered.remarks.resize(unanswered.candidates.size());
  return unanswered;
}

OneStar one_star_choice(const Arguments& arguments) {
  constexpr auto words = std::to_array<OptionWord<OneStar>>({{"first", OneStar::first}, {"best", OneStar::best}});
  const std::optional<std::string> text = arguments.knows("one-star") ? arguments.value("one-star") : std::nullopt;
  return text ? option_word<OneStar>("one-star", *text, words) : OneStar::as_given;
}

void add_words(std::string& text, const std::string& words) {
  if (!text.empty() && !words.empty()) text += "; ";
  text += words;
}

std::string conflict_line(const std::vector<StarConflict>& conflicts) {
  if (conflicts.empty()) return "";
  std::map<std::string, std::size_t> counts;
  std::size_t rows = 0;
  for (const StarConflict& conflict : conflicts) {
    rows += conflict.rows.size();
    for (const Quantity quantity : conflict.quantities) ++counts[std::string(name(quantity))];
  }
  return fmt::format("stars whose rows state different values: {} ({}; {})", count_text(conflicts.size()),
                     counted(rows, "row"), most_frequent_first(counts));
}

/// Rows of one star that differ are flagged and, if the user wants it so, given one star. Returns a line that counts
/// them.
std::string compare_stars(UnansweredList& list, OneStar choice) {
  const StarsCompared compared = hz::compare_stars(list.candidates, choice);
  for (const StarConflict& conflict : compared.conflicts) {
    for (const std::size_t row : conflict.rows) {
      list.remarks[row].flags.push_back(std::string(flag::inconsistent) + std::string(name(Quantity::star)));
      add_words(list.remarks[row].note, "rows of this star state " + conflict.what);
    }
  }
  for (std::size_t row = 0; row < list.candidates.size(); ++row) {
    const std::optional<std::size_t> source = compared.taken_from[row];
    if (source) add_words(list.remarks[row].note, "star values of " + place_in_file(list.candidates[*source].row));
  }
  return conflict_line(compared.conflicts);
}

/// A planet that found no star is answered from what its own row says of it, if that is enough.
bool own_row_suffices(const Answer& answer) {
  return answer.status == Status::answered || answer.star.luminosity.has_value();
}

void add_remark(Answer& answer, const Remark& remark) {
  answer.flags.insert(answer.flags.end(), remark.flags.begin(), remark.flags.end());
  add_words(answer.note, remark.note);
  if (remark.no_star.empty()) return;
  if (own_row_suffices(answer)) {
    add_words(answer.note, remark.no_star + "; the star is as the planet's own row has it");
  } else {
    answer.reason = fmt::format("{}; in the planet's own row: {}", remark.no_star, answer.reason);
    answer.reason_kind = remark.no_star_kind;
  }
}

void leave_unanswered(Answer& answer) {
  answer.status = Status::set_aside;
  answer.reason_kind = answer.reason = "not asked for";
}

void answer_rows(UnansweredList& list, const Settings& settings, const Console& console,
                 const std::function<bool(const ListRow&)>& wanted) {
  Progress progress(console, "answering", list.candidates.size());
  for (std::size_t i = 0; i < list.candidates.size(); ++i) {
    stop_if_asked();
    Candidate& candidate = list.candidates[i];
    if (wanted(candidate.row)) {
      candidate.answer = answer(candidate.row, settings);
      add_remark(candidate.answer, list.remarks[i]);
    } else {
      leave_unanswered(candidate.answer);
    }
    progress.update(i + 1);
  }
}

}  // namespace

AnsweredList answer_list(const std::string& path, const Arguments& arguments, const Settings& settings,
                         const Console& console, std::span<const std::string> written,
                         const std::function<bool(const ListRow&)>& wanted) {
  const OneStar choice = one_star_choice(arguments);  // a wrong word is told before the work
  UnansweredList list = arguments.has("planets") ? read_two_lists(path, arguments, console, written)
                                                 : read_one_list(path, arguments, console, written);
  std::string differing_stars = compare_stars(list, choice);
  answer_rows(list, settings, console, wanted);
  return {std::move(list.candidates), std::move(list.stated),  std::move(list.kept),
          std::move(list.planets),    std::move(list.joining), std::move(differing_stars)};
}

}  // namespace hz::app
