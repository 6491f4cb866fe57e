#include "hz/one_star.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>
#include <map>
#include <tuple>
#include <utility>

namespace hz {
namespace {

/// One cell converted by two ways may differ in its last digits.
constexpr double rounding = 1e-9;

struct Compared {
  Quantity quantity;
  Field StarRecord::*field;
};
constexpr auto compared = std::to_array<Compared>({
    {Quantity::teff, &StarRecord::teff},
    {Quantity::luminosity, &StarRecord::luminosity},
    {Quantity::log_luminosity, &StarRecord::log_luminosity},
    {Quantity::stellar_radius, &StarRecord::stellar_radius},
    {Quantity::stellar_mass, &StarRecord::stellar_mass},
});

using Rows = std::vector<std::size_t>;

/// The planets of each named star, in the order in which the stars first appear.
std::vector<Rows> rows_by_star(const std::vector<Candidate>& candidates) {
  std::map<std::string, std::size_t> known;
  std::vector<Rows> stars;
  for (std::size_t row = 0; row < candidates.size(); ++row) {
    const std::string name = folded_name(candidates[row].row.star.name);
    if (name.empty() || !is_planet(candidates[row].row)) continue;
    const auto [at, is_new] = known.emplace(name, stars.size());
    if (is_new) stars.emplace_back();
    stars[at->second].push_back(row);
  }
  return stars;
}

bool is_value(const Field& field) { return field.stated && field.stated->limit == LimitMark::none; }

/// The least and the greatest value that the rows state; nullopt where they agree.
std::optional<std::pair<double, double>> spread(const std::vector<Candidate>& candidates, const Rows& rows,
                                                Field StarRecord::*field) {
  std::vector<double> values;
  for (const std::size_t row : rows) {
    const Field& stated = candidates[row].row.star.*field;
    if (is_value(stated)) values.push_back(stated.stated->value);
  }
  if (values.empty()) return std::nullopt;
  const auto [least, greatest] = std::minmax_element(values.begin(), values.end());
  if (*greatest - *least <= rounding * std::max(std::abs(*least), std::abs(*greatest))) return std::nullopt;
  return std::pair(*least, *greatest);
}

std::optional<StarConflict> conflict_of(const std::vector<Candidate>& candidates, const Rows& rows) {
  StarConflict conflict{rows, {}, {}};
  for (const Compared& each : compared) {
    const auto range = spread(candidates, rows, each.field);
    if (!range) continue;
    conflict.quantities.push_back(each.quantity);
    conflict.what += fmt::format("{}{} {:.6g} to {:.6g}", conflict.what.empty() ? "" : ", ", name(each.quantity),
                                 range->first, range->second);
  }
  return conflict.quantities.empty() ? std::nullopt : std::optional(std::move(conflict));
}

bool states_any(const StarRecord& star) {
  return std::any_of(compared.begin(), compared.end(),
                     [&](const Compared& each) { return is_value(star.*each.field); });
}

double error_of(const Field& field) {
  return is_value(field) ? (field.stated->minus.value_or(0) + field.stated->plus.value_or(0)) / 2 : 0;
}

int stated_with_errors(const StarRecord& star) {
  const auto counts = [](const Field& field) { return error_of(field) > 0 ? 1 : 0; };
  return counts(star.teff) + std::max(counts(star.luminosity), counts(star.log_luminosity)) +
         counts(star.stellar_radius) + counts(star.stellar_mass);
}

double relative_error(const Field& field) {
  const double error = error_of(field);
  return error > 0 ? error / std::abs(field.stated->value) : std::numeric_limits<double>::infinity();
}

/// Better stars sort first.
auto quality_key(const StarRecord& star) {
  return std::tuple(-stated_with_errors(star), relative_error(star.teff) + relative_error(star.stellar_radius));
}

/// The row whose star stands for all.
std::size_t chosen(const std::vector<Candidate>& candidates, const Rows& rows, OneStar choice) {
  if (choice == OneStar::first) {
    const auto found =
        std::find_if(rows.begin(), rows.end(), [&](std::size_t row) { return states_any(candidates[row].row.star); });
    return found == rows.end() ? rows.front() : *found;
  }
  return *std::min_element(rows.begin(), rows.end(), [&](std::size_t a, std::size_t b) {
    return quality_key(candidates[a].row.star) < quality_key(candidates[b].row.star);
  });
}

bool same_values(const StarRecord& a, const StarRecord& b) {
  return std::all_of(compared.begin(), compared.end(),
                     [&](const Compared& each) { return (a.*each.field).stated == (b.*each.field).stated; });
}

void give_star(std::vector<Candidate>& candidates, const Rows& rows, std::size_t source, StarsCompared& result) {
  const StarRecord& star = candidates[source].row.star;
  for (const std::size_t row : rows) {
    StarRecord& own = candidates[row].row.star;
    if (row == source) continue;
    if (!same_values(own, star)) result.taken_from[row] = source;
    std::string spelling = std::move(own.name);
    own = star;
    own.name = std::move(spelling);
  }
}

}  // namespace

std::span<const Quantity> compared_star_values() {
  static constexpr auto quantities = [] {
    std::array<Quantity, compared.size()> all{};
    for (std::size_t i = 0; i < compared.size(); ++i) all[i] = compared[i].quantity;
    return all;
  }();
  return quantities;
}

StarsCompared compare_stars(std::vector<Candidate>& candidates, OneStar choice) {
  StarsCompared result;
  result.taken_from.resize(candidates.size());
  for (const Rows& rows : rows_by_star(candidates)) {
    if (auto conflict = conflict_of(candidates, rows)) result.conflicts.push_back(*std::move(conflict));
    if (choice != OneStar::as_given) give_star(candidates, rows, chosen(candidates, rows, choice), result);
  }
  return result;
}

}  // namespace hz
