#include "planet_list.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <optional>

#include "closest.hpp"
#include "hz/error.hpp"
#include "interrupt.hpp"
#include "progress.hpp"

namespace hz::app {
namespace {

constexpr auto preference_table = std::to_array<Option>({
    {"prefer", '\0', OptionKind::value, "COLUMN=VALUE", OptionGroup::answer,
     "of several rows of one planet, take the one with this cell, unless one is marked as adopted"},
});

/// A cell that makes a row the user's own choice.
struct Preference {
  std::size_t column = 0;
  std::string value;
};

std::optional<Preference> read_preference(const Arguments& arguments, const TableHead& head) {
  const std::optional<std::string> text = arguments.knows("prefer") ? arguments.value("prefer") : std::nullopt;
  if (!text) return std::nullopt;
  const std::size_t at = text->find('=');
  if (at == std::string::npos) {
    throw Error(Fault::usage,
                fmt::format("--prefer '{}' has no =; write it like --prefer reference='Lantern DR1'", *text));
  }
  const std::string name = text->substr(0, at);
  std::vector<std::string> names;
  for (std::size_t column = 0; column < head.columns.size(); ++column) {
    if (head.columns[column].name == name) return Preference{column, text->substr(at + 1)};
    names.push_back(head.columns[column].name);
  }
  throw Error(Fault::usage,
              fmt::format("--prefer: {} has no column `{}`{}", head.source, name, did_you_mean(name, names)));
}

std::vector<Quantity> stated_quantities(const Understanding& understanding) {
  std::vector<Quantity> stated;
  for (const QuantityInfo& info : all_columns()) {
    const std::optional<Quantity> quantity = quantity_named(info.name);
    if (quantity && understanding.knows(*quantity)) stated.push_back(*quantity);
  }
  return stated;
}

/// A list must say something of light or of an orbit.
void refuse_unusable(const std::vector<Quantity>& stated, const TableHead& head) {
  const auto needed = planet_inputs();
  const bool usable = std::any_of(stated.begin(), stated.end(), [&](Quantity quantity) {
    return is_numeric(quantity) && std::find(needed.begin(), needed.end(), quantity) != needed.end();
  });
  if (usable) return;
  throw Error(Fault::input, fmt::format("{0} has no column that hzmap can use; `hzmap columns {0}` shows how each is "
                                        "understood, and writes a map to edit",
                                        head.source));
}

Candidate candidate_of(const Chunk& chunk, std::size_t index, const OpenList& list, const std::vector<KeptColumn>& kept,
                       const std::optional<Preference>& preference, const Settings& settings,
                       const std::function<bool(const ListRow&)>& wanted) {
  Candidate candidate;
  candidate.row = list.understanding.row(chunk, index);
  candidate.row.kept = kept_cells(chunk, index, kept);
  candidate.preferred =
      preference && !chunk.row_problems[index] && chunk.text(preference->column, index) == preference->value;
  if (wanted(candidate.row)) {
    candidate.answer = answer(candidate.row, settings);
  } else {
    candidate.answer.status = Status::set_aside;
    candidate.answer.reason_kind = candidate.answer.reason = "not asked for";
  }
  return candidate;
}

}  // namespace

std::span<const Option> preference_options() { return preference_table; }

AnsweredList answer_list(const std::string& path, const Arguments& arguments, const Settings& settings,
                         const Console& console, std::span<const std::string> written,
                         const std::function<bool(const ListRow&)>& wanted) {
  OpenList list = open_list(path, arguments, planet_inputs());
  AnsweredList answered;
  answered.stated = stated_quantities(list.understanding);
  refuse_unusable(answered.stated, list.reader->head());
  if (arguments.knows("keep")) answered.kept = kept_columns(arguments, list.reader->head(), written);
  const std::optional<Preference> preference = read_preference(arguments, list.reader->head());
  Progress progress(console, "answering");
  while (const std::optional<Chunk> chunk = list.reader->next()) {
    for (std::size_t i = 0; i < chunk->rows(); ++i) {
      stop_if_asked();
      answered.candidates.push_back(candidate_of(*chunk, i, list, answered.kept, preference, settings, wanted));
      progress.update(answered.candidates.size());
    }
  }
  if (answered.candidates.empty()) {
    throw Error(Fault::input, fmt::format("{} has a header but no rows", list.reader->head().source));
  }
  return answered;
}

}  // namespace hz::app
