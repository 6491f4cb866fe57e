// What a planet list says twice, and differently. The list is not part of the source; without it these tests skip
// themselves.
#include <gtest/gtest.h>

#include <cmath>
#include <map>

#include "answer_helpers.hpp"
#include "hz/one_star.hpp"
#include "hz/orbit.hpp"
#include "list_files.hpp"

namespace hz {
namespace {

using testing::has_flag;

constexpr const char* composite = HZ_TEST_DIR "/../../shared/data/planets_composite_2023.csv";

#define HZ_NEEDS_THE_LIST() \
  if (!std::filesystem::exists(composite)) GTEST_SKIP() << "the list " << composite << " is not here"

struct Sides {
  double value = 0;
  double minus = 0;
  double plus = 0;
};

/// A stated value with its half-widths, or with the share of itself that stands for them where none is given.
Sides sides_of(const Field& field, double assumed) {
  const Measured& stated = *field.stated;
  const double minus = stated.minus.value_or(stated.plus.value_or(0));
  const double plus = stated.plus.value_or(minus);
  if (minus + plus > 0) return {stated.value, minus, plus};
  return {stated.value, assumed * stated.value, assumed * stated.value};
}

/// Semi-major axis from P and M, with half-widths: a ~ M^(1/3) P^(2/3).
Sides kepler_axis(const ListRow& row) {
  const Sides period = sides_of(row.planet.orbital_period, 0);
  const Sides mass = sides_of(row.star.stellar_mass, 0.056);
  const double axis = semi_major_axis_of(period.value, mass.value);
  const auto width = [&](double of_period, double of_mass) {
    return axis * std::hypot(2 * of_period / period.value, of_mass / mass.value) / 3;
  };
  return {axis, width(period.minus, mass.minus), width(period.plus, mass.plus)};
}

bool is_value(const Field& field) { return field.stated && field.stated->limit == LimitMark::none; }

/// Beyond three half-widths on the sides that face each other.
bool beyond_three_sigma(const Sides& a, const Sides& b) {
  const double facing = a.value < b.value ? std::hypot(a.plus, b.minus) : std::hypot(a.minus, b.plus);
  return std::abs(a.value - b.value) > 3 * facing;
}

/// The list's rows, read once.
const std::vector<ListRow>& planet_rows() {
  static const std::vector<ListRow> rows = testing::read_list(composite);
  return rows;
}

// Source of the counts: Python on the same file, with the constants of reference/constants.toml.
TEST(RealPlanetList, OrbitsThatContradictKeplersLawAreFoundAndOnlyThose) {
  HZ_NEEDS_THE_LIST();
  const Settings settings = testing::settings_of();
  std::size_t with_all = 0, differing = 0, beyond = 0, flagged = 0;
  for (const ListRow& row : planet_rows()) {
    const Answer answer = hz::answer(row, settings);
    const bool has = has_flag(answer, "inconsistent:semi_major_axis");
    flagged += has ? 1U : 0U;
    if (!row.planet.orbital_period.stated || !row.star.stellar_mass.stated || !row.planet.semi_major_axis.stated) {
      EXPECT_FALSE(has) << row.planet.name;
      continue;
    }
    ++with_all;
    const Sides stated = sides_of(row.planet.semi_major_axis, 0.023);
    const Sides kepler = kepler_axis(row);
    const bool differs = std::abs(kepler.value - stated.value) > 0.1 * stated.value;
    differing += differs ? 1U : 0U;
    const bool values =
        is_value(row.planet.orbital_period) && is_value(row.star.stellar_mass) && is_value(row.planet.semi_major_axis);
    const bool expected = values && differs && beyond_three_sigma(stated, kepler);
    beyond += expected ? 1U : 0U;
    EXPECT_EQ(has, expected && answer.status == Status::answered) << row.planet.name;
  }
  EXPECT_EQ(with_all, 4837U);
  EXPECT_EQ(differing, 212U);
  EXPECT_EQ(beyond, 73U);
  EXPECT_EQ(flagged, 71U);  // two of the 73 are set aside: their stars are hotter than the limits reach
}

TEST(RealPlanetList, HostsWhosePlanetsStateDifferentStarsAreFound) {
  HZ_NEEDS_THE_LIST();
  std::vector<Candidate> candidates;
  for (const ListRow& row : planet_rows()) candidates.push_back({row, {}, false, {}});
  const StarsCompared compared = compare_stars(candidates, OneStar::as_given);
  EXPECT_EQ(compared.conflicts.size(), 192U);
  std::map<Quantity, int> counts;
  std::size_t rows = 0;
  for (const StarConflict& conflict : compared.conflicts) {
    rows += conflict.rows.size();
    for (const Quantity quantity : conflict.quantities) ++counts[quantity];
  }
  EXPECT_EQ(counts[Quantity::teff], 169);
  EXPECT_EQ(counts[Quantity::stellar_radius], 162);
  EXPECT_EQ(counts[Quantity::stellar_mass], 131);
  EXPECT_EQ(rows, 538U);
}

}  // namespace
}  // namespace hz
