// Star lists as astronomers have them, answered and held against one another. They are not part of the source; without
// them these tests skip themselves.
#include <gtest/gtest.h>

#include <cmath>
#include <cstdio>

#include "answer_helpers.hpp"
#include "hz/flags.hpp"
#include "hz/relations.hpp"
#include "hz/sky.hpp"
#include "list_files.hpp"

namespace hz {
namespace {

using testing::has_flag;

std::string list_path(const std::string& name) { return std::string(HZ_TEST_DIR "/../../shared/data/") + name; }

#define HZ_NEEDS_LIST(name) \
  if (!std::filesystem::exists(list_path(name))) GTEST_SKIP() << "the list " << (name) << " is not here"

const Settings& settings() {
  static const Settings chosen = testing::settings_of();
  return chosen;
}

/// A list with its rows as records and, by header, as text.
struct StarList {
  StarList(const std::string& name, const std::string& map)
      : rows(testing::read_list(list_path(name), ColumnMap::parse(testing::bytes_of(HZ_TEST_DIR "/cli/" + map), map))),
        text(testing::read_whole(list_path(name))) {}

  [[nodiscard]] const std::string& cell(std::size_t row, const std::string& column) const {
    const auto& heads = text.head.columns;
    const auto found =
        std::find_if(heads.begin(), heads.end(), [&](const ColumnHead& head) { return head.name == column; });
    return text.rows[row][static_cast<std::size_t>(found - heads.begin())];
  }
  [[nodiscard]] std::vector<SkyPosition> positions(const std::string& ra, const std::string& dec) const {
    std::vector<SkyPosition> found;
    for (std::size_t row = 0; row < rows.size(); ++row)
      found.push_back({*read_right_ascension(cell(row, ra)), *read_declination(cell(row, dec))});
    return found;
  }

  std::vector<ListRow> rows;
  testing::WholeTable text;
};

constexpr const char* bright = "mdwarfs_bright_2011.csv";
constexpr const char* spectra = "mdwarfs_spectra_2015.csv";
constexpr const char* nearest = "nearest_10pc.csv";

const StarList& bright_list() {
  static const StarList list(bright, "bright_2011_map.toml");
  return list;
}
const StarList& spectra_list() {
  static const StarList list(spectra, "spectra_2015_map.toml");
  return list;
}

// --- Every row ---------------------------------------------------------------------------------------------------

void expect_answer_or_reason(const ListRow& row, std::size_t& answered) {
  const Answer answer = answer_star(row, settings());
  if (answer.status == Status::set_aside) {
    EXPECT_FALSE(answer.reason.empty()) << row.line;
    EXPECT_FALSE(answer.reason_kind.empty()) << row.line;
    return;
  }
  ++answered;
  ASSERT_TRUE(answer.star.teff && answer.star.luminosity) << row.line;
  ASSERT_EQ(answer.limits.size(), 4U) << row.line;
  for (const LimitAtStar& at : answer.limits) {
    ASSERT_TRUE(at.distance) << row.line;
    EXPECT_TRUE(std::isfinite(at.distance->value) && at.distance->value > 0) << row.line;
    EXPECT_TRUE(std::isfinite(*at.distance->minus) && *at.distance->minus >= 0) << row.line;
    EXPECT_TRUE(std::isfinite(*at.distance->plus) && *at.distance->plus >= 0) << row.line;
  }
}

std::size_t answered_rows(const std::vector<ListRow>& rows) {
  std::size_t answered = 0;
  for (const ListRow& row : rows) expect_answer_or_reason(row, answered);
  return answered;
}

TEST(RealStarLists, EveryRowIsAnsweredOrSetAsideWithAReason) {
  HZ_NEEDS_LIST(bright);
  EXPECT_GT(answered_rows(bright_list().rows), 8800U);  // of 8889
  EXPECT_GT(answered_rows(spectra_list().rows), 400U);  // of 447: 41 radii are negative, and 94 have no Teff
  const StarList list(nearest, "nearest_10pc_map.toml");
  EXPECT_GT(answered_rows(list.rows), 280U);  // of 380: 65 have neither V nor a type of an ordinary dwarf
}

// --- White dwarfs ------------------------------------------------------------------------------------------------

TEST(RealStarLists, NoWhiteDwarfGetsAZone) {
  HZ_NEEDS_LIST(nearest);
  const StarList list(nearest, "nearest_10pc_map.toml");
  std::size_t white_dwarfs = 0;
  for (ListRow row : list.rows) {
    if (!row.star.spectral_type.starts_with("D")) continue;
    ++white_dwarfs;
    const Answer answer = answer_star(row, settings());
    EXPECT_EQ(answer.status, Status::set_aside) << row.star.name;
    EXPECT_NE(answer.reason.find("white dwarf"), std::string::npos) << row.star.name << ": " << answer.reason;
    row.star.spectral_type.clear();  // its faintness for its colour must give it away
    EXPECT_EQ(answer_star(row, settings()).status, Status::set_aside) << row.star.name;
  }
  EXPECT_EQ(white_dwarfs, 20U);
}

TEST(RealStarLists, StarsWithoutATypeGetAZoneOnlyNearTheMainSequence) {
  HZ_NEEDS_LIST(nearest);
  const StarList list(nearest, "nearest_10pc_map.toml");
  std::size_t untyped = 0;
  for (const ListRow& row : list.rows) {
    if (!row.star.spectral_type.empty()) continue;
    ++untyped;
    const Answer answer = answer_star(row, settings());
    if (answer.status == Status::set_aside) continue;
    const double radius = answer.star.stellar_radius->measured.value;
    EXPECT_GT(radius, 0.4 * *main_sequence_radius(answer.star.teff->measured.value)) << row.star.name;
  }
  EXPECT_EQ(untyped, 34U);
}

// --- Luminosities of two lists -----------------------------------------------------------------------------------

/// Ours less theirs, and the same over both half-widths in quadrature.
struct Difference {
  double value = 0;
  double sigmas = 0;
};

/// A star of both lists: what photometry and the parallax of the bright list give, against the spectra list.
struct Pair {
  Difference log_l;                                // dex
  std::optional<Difference> log_l_their_parallax;  // with that of the spectra list, where it is known to 10 per cent
  std::optional<Difference> teff;                  // K
  double their_log_l = 0;
  bool by_parallax = false;  // else by the type, for want of a parallax
  bool by_prior = false;     // the parallax is known to 10 per cent or worse
  bool photographic = false;
  double separation = 0;  // arcsec
};

double half_width(const Measured& m) { return (m.minus.value_or(0) + m.plus.value_or(0)) / 2; }

Difference difference(const Measured& ours, const Measured& theirs) {
  const double value = ours.value - theirs.value;
  return {value, value / std::hypot(half_width(ours), half_width(theirs))};
}

Measured log_luminosity(const Answer& answer) {
  const Measured& light = answer.star.luminosity->measured;
  const double width = half_width(light) / light.value / std::log(10.0);
  return {std::log10(light.value), width, width, LimitMark::none, false};
}

Pair compare(const ListRow& ours, const ListRow& theirs) {
  const Answer answer = answer_star(ours, settings());
  const Measured& their_log_l = *theirs.star.log_luminosity.stated;
  Pair pair;
  pair.log_l = difference(log_luminosity(answer), their_log_l);
  pair.their_log_l = their_log_l.value;
  pair.by_parallax = answer.star.distance.has_value();
  pair.by_prior = has_flag(answer, flag::distance_prior);
  if (theirs.star.teff.stated) pair.teff = difference(answer.star.teff->measured, *theirs.star.teff.stated);
  if (const auto& parallax = theirs.star.parallax.stated; parallax && half_width(*parallax) < 0.1 * parallax->value) {
    ListRow mixed = ours;
    mixed.star.parallax = theirs.star.parallax;
    pair.log_l_their_parallax = difference(log_luminosity(answer_star(mixed, settings())), their_log_l);
  }
  return pair;
}

std::vector<Pair> joined() {
  const StarList& ours = bright_list();
  const StarList& theirs = spectra_list();
  const SkyIndex index(ours.positions("RA_ICRS", "DE_ICRS"));
  const std::vector<SkyPosition> sought = theirs.positions("_RA", "_DE");
  std::vector<Pair> pairs;
  for (std::size_t row = 0; row < sought.size(); ++row) {
    const auto matches = index.matches(sought[row], 30);
    if (matches.empty()) continue;
    const std::size_t found = matches.front().index;
    Pair pair = compare(ours.rows[found], theirs.rows[row]);
    pair.photographic = ours.cell(found, "VTmag").empty();
    pair.separation = matches.front().distance;
    pairs.push_back(pair);
  }
  return pairs;
}

/// Of some of the differences: their median, 68 per cent half-range, and share within one combined half-width.
struct Spread {
  std::size_t count = 0;
  double median = 0;
  double half = 0;
  double within = 0;
};

Spread spread(const char* what, std::vector<Difference> all) {
  if (all.empty()) return {};
  std::sort(all.begin(), all.end(), [](const Difference& a, const Difference& b) { return a.value < b.value; });
  const auto at = [&](double u) {
    return all[static_cast<std::size_t>(u * static_cast<double>(all.size() - 1))].value;
  };
  const auto within =
      std::count_if(all.begin(), all.end(), [](const Difference& each) { return std::abs(each.sigmas) < 1; });
  const Spread found{all.size(), at(0.5), (at(0.84) - at(0.16)) / 2,
                     static_cast<double>(within) / static_cast<double>(all.size())};
  std::printf("  %-60s %4zu  %+8.3f  %7.3f  %8.2f\n", what, found.count, found.median, found.half, found.within);
  return found;
}

template <class Keep>
Spread log_l_spread(const char* what, const std::vector<Pair>& pairs, Keep keep) {
  std::vector<Difference> kept;
  for (const Pair& pair : pairs) {
    if (keep(pair)) kept.push_back(pair.log_l);
  }
  return spread(what, kept);
}

template <class Keep>
Spread spread_with(std::optional<Difference> Pair::*value, const char* what, const std::vector<Pair>& pairs,
                   Keep keep) {
  std::vector<Difference> kept;
  for (const Pair& pair : pairs) {
    if (pair.*value && keep(pair)) kept.push_back(*(pair.*value));
  }
  return spread(what, kept);
}

/// Source: Newton et al. 2015, ApJ 800, 85 (abstract, from memory): calibrated for log L of -2.5 to -0.5, radii of 0.18
/// to 0.8 solar radii.
bool in_their_range(const Pair& pair) { return pair.their_log_l > -2.5 && pair.their_log_l < -0.5; }

class TwoLists : public ::testing::Test {
protected:
  void SetUp() override {
    HZ_NEEDS_LIST(bright);
    HZ_NEEDS_LIST(spectra);
    static const std::vector<Pair> found = joined();
    pairs_ = &found;
    std::printf("  %-60s %4s  %8s  %7s  %8s\n", "ours less theirs", "n", "median", "68 %", "in sigma");
  }
  [[nodiscard]] const std::vector<Pair>& pairs() const { return *pairs_; }

private:
  const std::vector<Pair>* pairs_ = nullptr;
};

TEST_F(TwoLists, AboutThreeHundredStarsAreInBoth) {
  EXPECT_EQ(pairs().size(), 291U);  // Source: all pairs of positions by brute force in Python
  const Spread all = log_l_spread("log L, all", pairs(), [](const Pair&) { return true; });
  EXPECT_LT(std::abs(all.median), 0.1);
  EXPECT_LT(all.half, 0.5);
}

// Where the bright list has a parallax known to 10 per cent and the spectra list is within the range of its own
// relations, the two agree within what both say of themselves: 0.03 and 0.06-0.1 dex.
TEST_F(TwoLists, MeasuredParallaxesGiveTheSameLuminosity) {
  const Spread found = log_l_spread("log L, parallax known to 10 %, in their range", pairs(), [](const Pair& pair) {
    return pair.by_parallax && !pair.by_prior && in_their_range(pair);
  });
  EXPECT_GT(found.count, 30U);
  EXPECT_LT(std::abs(found.median), 0.05);
  EXPECT_LT(found.half, 0.12);
  EXPECT_GT(found.within, 0.5);
}

// The faint end is theirs to explain: below its relations' range the spectra list's log L is too low (41 of its radii
// come out negative), and the more so the lower it is.
TEST_F(TwoLists, DifferenceFollowsTheRangeOfTheirRelations) {
  const auto part = [&](const char* what, double low, double high) {
    return spread_with(&Pair::log_l_their_parallax, what, pairs(),
                       [=](const Pair& pair) { return pair.their_log_l > low && pair.their_log_l <= high; });
  };
  const Spread bright_end = part("log L with their parallax, log L -2.1 to -0.5", -2.1, -0.5);
  const Spread middle = part("log L with their parallax, log L -2.5 to -2.1", -2.5, -2.1);
  const Spread below = part("log L with their parallax, log L -2.8 to -2.5", -2.8, -2.5);
  const Spread far_below = part("log L with their parallax, log L below -2.8", -9, -2.8);
  EXPECT_LT(std::abs(bright_end.median), 0.08);
  EXPECT_LT(bright_end.half, 0.16);
  EXPECT_LT(std::abs(middle.median), 0.08);
  EXPECT_LT(middle.half, 0.25);
  EXPECT_GT(below.median, middle.median + 0.05);
  EXPECT_GT(far_below.median, below.median + 0.1);
}

// With one parallax for both, the source of V and the distance between the positions do not move the median: an error
// of V moves the bolometric correction the other way, which takes back most of it. The stars with photographic V are
// the fainter ones, whose log L by spectra is less sure; 14 of them are by 0.25 dex and more brighter than there, and 7
// fainter: the light of an unresolved companion counts in photometry and hardly in the strengths of lines.
TEST_F(TwoLists, LuminosityHardlyFollowsTheSourceOfV) {
  const auto part = [&](const char* what, auto keep) {
    return spread_with(&Pair::log_l_their_parallax, what, pairs(),
                       [=](const Pair& pair) { return in_their_range(pair) && keep(pair); });
  };
  const Spread plates = part("log L with their parallax, photographic V", [](const Pair& p) { return p.photographic; });
  const Spread others = part("log L with their parallax, other V", [](const Pair& p) { return !p.photographic; });
  const Spread near =
      part("log L with their parallax, within 1 arcsec", [](const Pair& p) { return p.separation <= 1; });
  const Spread far = part("log L with their parallax, 1 to 30 arcsec", [](const Pair& p) { return p.separation > 1; });
  EXPECT_LT(std::abs(plates.median - others.median), 0.1);
  EXPECT_LT(std::abs(near.median - far.median), 0.1);
  EXPECT_GT(plates.within, 0.4);
  EXPECT_GT(others.within, 0.5);
}

// Most parallaxes known to 10 per cent or worse are photometric ones with an error of 20 per cent. The prior puts such
// stars farther off, as it should for stars spread evenly through space; these were chosen for their brightness and
// motion, which favours near ones. Our half-widths of 0.3 dex cover it.
TEST_F(TwoLists, ImpreciseParallaxesAgreeWithinTheirWidths) {
  const Spread found =
      log_l_spread("log L, parallax known to 10 % or worse", pairs(), [](const Pair& pair) { return pair.by_prior; });
  EXPECT_GT(found.count, 100U);
  EXPECT_LT(std::abs(found.median), 0.4);
  EXPECT_LT(found.half, 0.4);
  EXPECT_GT(found.within, 0.5);
}

// Without a parallax log L comes from the type, which the bright list has from V-J. Most of its V are photographic and
// 0.31 mag too faint in the median (59 of its stars in nearest_10pc.csv; those of Tycho and Hipparcos: 0.00 in 87), so
// that the types are late by up to one subtype and Teff from V-Ks is low: log L and Teff miss together. The list states
// no error of V and none of the type, and ours fall short for it.
TEST_F(TwoLists, PhotographicMagnitudesMakeTypesLateAndStarsCool) {
  const auto by_type = [](const Pair& pair) { return !pair.by_parallax; };
  const auto is_cool = [](const Pair& pair) { return pair.teff && pair.teff->value < -150; };
  const Spread found = log_l_spread("log L by the type", pairs(), by_type);
  EXPECT_GT(found.count, 120U);
  EXPECT_LT(std::abs(found.median), 0.4);
  EXPECT_LT(found.half, 0.4);
  EXPECT_GT(found.within, 0.3);
  const Spread cool = log_l_spread("log L by the type, our Teff over 150 K below theirs", pairs(),
                                   [&](const Pair& pair) { return by_type(pair) && is_cool(pair); });
  const Spread warm = log_l_spread("log L by the type, other stars", pairs(),
                                   [&](const Pair& pair) { return by_type(pair) && !is_cool(pair); });
  EXPECT_LT(cool.median, warm.median - 0.1);
}

TEST_F(TwoLists, TeffFollowsTheSourceOfV) {
  const auto part = [&](const char* what, bool photographic) {
    return spread_with(&Pair::teff, what, pairs(), [=](const Pair& p) { return p.photographic == photographic; });
  };
  const Spread plates = part("Teff (K), photographic V", true);
  const Spread others = part("Teff (K), V of Tycho or Hipparcos", false);
  EXPECT_LT(std::abs(plates.median), 200);
  EXPECT_LT(plates.half, 200);
  EXPECT_LT(std::abs(others.median), 80);
  EXPECT_LT(others.half, 150);
  EXPECT_LT(plates.median, others.median - 30);
  EXPECT_GT(others.within, 0.6);
}

}  // namespace
}  // namespace hz
