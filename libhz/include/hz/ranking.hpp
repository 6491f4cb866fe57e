// From answered rows to an order that an observer can defend.
#pragma once
#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

#include "hz/answer.hpp"
#include "hz/records.hpp"

namespace hz {

/// A row of a list with its answer, on its way to a place.
struct Candidate {
  ListRow row;
  Answer answer;
  bool preferred = false;  // the user's own choice among several rows of one planet
  std::string cut_reason;  // not empty: a requirement of the user's is not met

  [[nodiscard]] bool in_the_running() const {
    return answer.status == Status::answered && answer.planet && cut_reason.empty();
  }
};

/// A name without blanks and in lower case, for comparing names as people write them.
[[nodiscard]] std::string folded_name(std::string_view name);

/// "line 12", or "row 11" where lines mean nothing: where a message sends the reader.
[[nodiscard]] std::string place_in_file(const ListRow& row);

/// Keeps one row of every planet that has several: the adopted one, else the preferred one, else the one with most
/// measured inputs, then the smallest relative uncertainty of insolation (an assumed error counts as infinite), then
/// file order. The others are set aside by line; the winner's note says how many there were and over what range their P
/// run.
void keep_one_row_a_planet(std::vector<Candidate>& candidates);

/// A row without any measured half-width never beats an equal row that has some: its merit is cut down to that row's.
/// Equal means the same central insolation, Teff and planet mass.
void humble_rows_without_errors(std::vector<Candidate>& candidates);

/// A place in the ranked list.
struct Place {
  std::size_t candidate = 0;  // index
  std::size_t rank = 0;       // 1 is first; equal merit to two decimals shares a place
  bool shared = false;
  bool beyond_planet_mass = false;  // in the section that follows the planets within the fits' masses
};

/// The order: planets within the fits' planet masses, then the others; by merit to two decimals; within a place by
/// closeness to the middle of the zone, then by name, which only fix the order of the lines. Ranks run on through both
/// sections.
[[nodiscard]] std::vector<Place> places_of(const std::vector<Candidate>& candidates);

}  // namespace hz
