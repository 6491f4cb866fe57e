// Answering and ranking lists as astronomers have them. They are not part of the source; without them these tests skip
// themselves.
#include <gtest/gtest.h>

#include <cmath>

#include "answer_helpers.hpp"
#include "ranked_list_helpers.hpp"

namespace hz {
namespace {

using testing::settings_of;

std::string list_path(const std::string& name) { return std::string(HZ_TEST_DIR "/../../shared/data/") + name; }

struct RealList {
  const char* name;
  std::size_t rows;
  bool needs_map = false;
};

class RealRanking : public ::testing::TestWithParam<RealList> {
protected:
  void SetUp() override {
    const RealList& list = GetParam();
    const std::string path = list_path(list.name);
    if (!std::filesystem::exists(path)) GTEST_SKIP() << "the list " << list.name << " is not here";
    ColumnMap map;
    if (list.needs_map)
      map = ColumnMap::parse(testing::bytes_of(HZ_TEST_DIR "/cli/worksheet_map.toml"), "worksheet_map.toml");
    candidates_ = testing::answered(testing::read_list(path, map), settings_);
  }

  Settings settings_ = settings_of();
  std::vector<Candidate> candidates_;
};

double sum(const Probabilities& p) { return *p.too_hot + *p.optimistic + *p.too_cold + p.unanswered; }

bool is_finite(const Measured& m) {
  return std::isfinite(m.value) && std::isfinite(m.minus.value_or(0)) && std::isfinite(m.plus.value_or(0));
}

TEST_P(RealRanking, EveryRowIsAnsweredOrSetAsideWithAReason) {
  ASSERT_EQ(candidates_.size(), GetParam().rows);
  std::size_t answered = 0;
  for (const Candidate& c : candidates_) {
    const std::string& name = c.row.planet.name;
    if (c.answer.status == Status::set_aside) {
      EXPECT_FALSE(c.answer.reason.empty()) << name;
      EXPECT_FALSE(c.answer.reason_kind.empty()) << name;
      EXPECT_FALSE(c.answer.planet) << name;
      continue;
    }
    ++answered;
    ASSERT_TRUE(c.answer.planet) << name;
    const PlanetAnswer& planet = *c.answer.planet;
    EXPECT_NEAR(sum(planet.probabilities), 1, 1e-9) << name;
    EXPECT_LE(*planet.probabilities.conservative, *planet.probabilities.optimistic) << name;
    EXPECT_TRUE(is_finite(planet.insolation.measured)) << name;
    EXPECT_TRUE(is_finite(planet.planet_mass.measured)) << name;
    EXPECT_TRUE(std::isfinite(planet.zone_position.value_or(0)) && std::isfinite(planet.equilibrium_temperature))
        << name;
    ASSERT_TRUE(planet.margin) << name;
    EXPECT_TRUE(std::isfinite(planet.margin->widths)) << name;
    EXPECT_TRUE(c.answer.limits.size() == 4) << name;
  }
  EXPECT_GT(answered, GetParam().rows / 2);
}

TEST_P(RealRanking, EveryPlanetHasOnePlaceAndEveryRowOneLine) {
  const std::vector<Place> places = testing::ranked(candidates_);
  EXPECT_EQ(testing::output_rows(candidates_, places).size(), candidates_.size());
  std::map<std::string, int> seen;
  bool beyond = false;
  for (std::size_t i = 0; i < places.size(); ++i) {
    const Candidate& c = candidates_[places[i].candidate];
    EXPECT_EQ(++seen[folded_name(c.row.planet.name)], 1) << c.row.planet.name;
    EXPECT_TRUE(places[i].beyond_planet_mass || !beyond) << "the sections are mixed";
    beyond = places[i].beyond_planet_mass;
    EXPECT_LE(places[i].rank, i + 1);
    if (i > 0 && places[i - 1].beyond_planet_mass == beyond) {
      EXPECT_LE(std::lround(c.answer.planet->merit * 100),
                std::lround(candidates_[places[i - 1].candidate].answer.planet->merit * 100));
    }
  }
}

// A ranked file is itself a list: the same places, verdicts and probabilities.
TEST_P(RealRanking, RankedFileGivesTheSameRanking) {
  const testing::Folder folder;
  const std::vector<Place> places = testing::ranked(candidates_);
  testing::write_ranked(folder.file("ranked.csv"), candidates_, places, settings_);
  std::vector<Candidate> again = testing::answered(testing::read_list(folder.file("ranked.csv")), settings_);
  const std::vector<Place> places_again = testing::ranked(again);
  const auto before = testing::output_rows(candidates_, places);
  const auto after = testing::output_rows(again, places_again);
  ASSERT_EQ(places_again.size(), places.size());
  ASSERT_EQ(after.size(), before.size());
  for (std::size_t i = 0; i < places.size(); ++i) {
    ASSERT_EQ(after[i].candidate.row.planet.name, before[i].candidate.row.planet.name) << "line " << i + 1;
    EXPECT_EQ(testing::decision(after[i], settings_), testing::decision(before[i], settings_));
  }
}

INSTANTIATE_TEST_SUITE_P(Lists, RealRanking,
                         ::testing::Values(RealList{"planets_composite_2023.csv", 5347},
                                           RealList{"planets_solutions_2025.csv", 492},
                                           RealList{"worksheet_mixed.csv", 78, true}),
                         [](const auto& instance) { return std::string(instance.param.name, 9); });

// Source: the composite list's own row of TRAPPIST-1 e, Teff 2566 K (Agol et al. 2021, PSJ 2, 1): below the fits' 2600
// K.
TEST(RealLists, Trappist1eIsHeldOrRefused) {
  const std::string path = list_path("planets_composite_2023.csv");
  if (!std::filesystem::exists(path)) GTEST_SKIP() << "the list planets_composite_2023.csv is not here";
  Settings settings = settings_of();
  bool found = false;
  for (const ListRow& row : testing::read_list(path)) {
    if (row.planet.name != "TRAPPIST-1 e") continue;
    found = true;
    ASSERT_EQ(row.star.teff.stated->value, 2566);
    const Answer held = answer(row, settings);
    EXPECT_EQ(held.status, Status::answered);
    EXPECT_TRUE(testing::has_flag(held, "held"));
    settings.beyond = BeyondRange::refuse;
    EXPECT_EQ(answer(row, settings).reason_kind, "teff out of range");
  }
  EXPECT_TRUE(found);
}

}  // namespace
}  // namespace hz
