#include "hz/spectral_type.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <ostream>
#include <set>

#include "list_files.hpp"

namespace hz {
namespace {

using enum StarKind;

struct Case {
  std::string text;
  StarKind kind;
  std::optional<double> subtype;
  double half_width = 0.5;
  bool class_stated = true;
  std::optional<std::string> second = {};
};

void expect_read(const Case& expected) {
  const auto found = read_spectral_type(expected.text);
  ASSERT_TRUE(found.has_value()) << expected.text << ": " << found.error().what;
  EXPECT_EQ(word(found->kind), word(expected.kind)) << expected.text;
  EXPECT_EQ(found->subtype.has_value(), expected.subtype.has_value()) << expected.text;
  EXPECT_NEAR(found->subtype.value_or(-1), expected.subtype.value_or(-1), 1e-12) << expected.text;
  EXPECT_NEAR(found->half_width, expected.half_width, 1e-12) << expected.text;
  EXPECT_EQ(found->class_stated, expected.class_stated) << expected.text;
  EXPECT_EQ(found->second, expected.second) << expected.text;
}

std::string refusal(const std::string& text) {
  const auto found = read_spectral_type(text);
  return found ? "read" : found.error().what;
}

TEST(SpectralType, Dwarfs) {
  for (const Case& x : std::vector<Case>{{"M5.5V", dwarf, 65.5},
                                         {"K7 V", dwarf, 57},
                                         {"M2.5 V", dwarf, 62.5},
                                         {"O9.5V", dwarf, 9.5},
                                         {"M 4.5V", dwarf, 64.5},
                                         {"m3 V", dwarf, 63},
                                         {"G V", dwarf, {}},
                                         {"G8IV-V", dwarf, 48},
                                         {"F9 IV/V", dwarf, 39},
                                         {"k7", dwarf, 57, 0.5, false},
                                         {"M7.25", dwarf, 67.25, 0.5, false},
                                         {"T8", dwarf, 88, 0.5, false},
                                         {"Y0", dwarf, 90, 0.5, false},
                                         {"m", dwarf, {}, 0.5, false},
                                         {"  G2\tV ", dwarf, 42}}) {
    expect_read(x);
  }
}

TEST(SpectralType, OtherLuminosityClasses) {
  for (const Case& x : std::vector<Case>{{"K0 IV", subgiant, 50},
                                         {"G8/K0 IV", subgiant, 49, 1},
                                         {"K2III", giant, 52},
                                         {"F5 III", giant, 35},
                                         {"K0 III-IV", giant, 50},
                                         {"G8 III/IV", giant, 48},
                                         {"K1 IIIb-IV", giant, 51},
                                         {"F5 Ib", giant, 35},
                                         {"B2Iab", giant, 12},
                                         {"A0Ia+", giant, 20},
                                         {"B0Ia0", giant, 10},
                                         {"k0iii", giant, 50},
                                         {"K1III:", giant, 51, 1},
                                         {"G0 VI", subdwarf, 40},
                                         {"A0VII", white_dwarf, {}},
                                         {"K0(III)", giant, 50}}) {
    expect_read(x);
  }
}

TEST(SpectralType, LuminosityClassInFront) {
  for (const Case& x : std::vector<Case>{{"dM4e", dwarf, 64},
                                         {"dm4", dwarf, 64},
                                         {"sdM1", subdwarf, 61},
                                         {"sdM1V", subdwarf, 61},
                                         {"sdm1", subdwarf, 61},
                                         {"esdK5", subdwarf, 55},
                                         {"usdM3", subdwarf, 63},
                                         {"d/sdM4", subdwarf, 64},
                                         {"sdBV", subdwarf, {}},
                                         {"sgG5", subgiant, 45},
                                         {"gK5", giant, 55},
                                         {"cF8", giant, 38},
                                         {"g5", dwarf, 45, 0.5, false}}) {
    expect_read(x);
  }
}

TEST(SpectralType, WhiteDwarfsAndOthersHaveNoSubtype) {
  for (const char* const text : {"DA2", "DA", "DA1.9", "DA8P", "DQZ", "DQ9P", "DC", "DAH", "DZ11", "DZA", "WD", "D",
                                 "DC:", "DA?", "DAe", "DBAV4"}) {
    const auto found = read_spectral_type(text);
    ASSERT_TRUE(found.has_value()) << text;
    EXPECT_EQ(word(found->kind), "a white dwarf") << text;
    EXPECT_FALSE(found->subtype.has_value()) << text;
  }
  for (const char* const text : {"WC8", "WN5h", "WR", "C5", "C5,2", "C-N5", "S6/2", "R3", "N5", "S3,9e"}) {
    const auto found = read_spectral_type(text);
    ASSERT_TRUE(found.has_value()) << text;
    EXPECT_EQ(found->kind, other) << text;
    EXPECT_FALSE(found->subtype.has_value()) << text;
  }
}

TEST(SpectralType, UncertaintyAsWrittenOrMarked) {
  for (const Case& x : std::vector<Case>{{"M0.0&plusmn0.5 V", dwarf, 60, 0.5},
                                         {"M4 &#177; 0.3 V", dwarf, 64, 0.3},
                                         {"M(6.1+/-0.7) V", dwarf, 66.1, 0.7},
                                         {"M(6.1 +/- 0.7) V", dwarf, 66.1, 0.7},
                                         {"M4 ± 0.75", dwarf, 64, 0.75, false},
                                         {"M4 ± 0", dwarf, 64, 0.5, false},
                                         {"L4::", dwarf, 74, 1, false},
                                         {"M0V:", dwarf, 60, 1},
                                         {"M2?V", dwarf, 62, 1},
                                         {"(M4)", dwarf, 64, 1, false}}) {
    expect_read(x);
  }
}

TEST(SpectralType, RangesGiveTheirMiddleAndHalfTheirSpan) {
  for (const Case& x : std::vector<Case>{{"M3-M4V", dwarf, 63.5, 0.5},
                                         {"K2-3V", dwarf, 52.5, 0.5},
                                         {"G5/6 V", dwarf, 45.5, 0.5},
                                         {"M0.5-1.0 V", dwarf, 60.75, 0.5},  // never surer than a single subtype
                                         {"G0/F9 V", dwarf, 39.5, 0.5},
                                         {"K9 V/M0 V", dwarf, 59.5, 0.5},
                                         {"F5V-G0V", dwarf, 37.5, 2.5},
                                         {"M9-L1", dwarf, 70, 1, false},
                                         {"G2/G3 IV/V", dwarf, 42.5, 0.5},
                                         {"G3-8V:", dwarf, 45.5, 2.5},
                                         {"F/G V", dwarf, {}}}) {
    expect_read(x);
  }
}

TEST(SpectralType, CompanionsAreBehindAPlus) {
  for (const Case& x : std::vector<Case>{{"M8+L3", dwarf, 68, 0.5, false, "L3"},
                                         {"K2 V+M4", dwarf, 52, 0.5, true, "M4"},
                                         {"G2V + K1V", dwarf, 42, 0.5, true, "K1V"},
                                         {"M3V+M4V+M5V", dwarf, 63, 0.5, true, "M4V+M5V"},
                                         {"DA2+M4", white_dwarf, {}, 0.5, true, "M4"},
                                         {"M4V & DA", dwarf, 64, 0.5, true, "DA"},
                                         {"K1III(+M)", giant, 51, 0.5, true, "M"},
                                         {"G8 IV (+ G)", subgiant, 48, 0.5, true, "G"},
                                         {"K1III+...", giant, 51, 0.5, true, "..."},
                                         {"G8III+", giant, 48, 0.5, true, ""}}) {
    expect_read(x);
  }
}

TEST(SpectralType, MarksAreReadOver) {
  for (const Case& x : std::vector<Case>{{"M4.5Ve", dwarf, 64.5},
                                         {"K7.5eV", dwarf, 57.5},
                                         {"A0Vp", dwarf, 20},
                                         {"B9 Vne", dwarf, 19},
                                         {"G0Vvar", dwarf, 40},
                                         {"K1 V(P)", dwarf, 51},
                                         {"O4If+", giant, 4},
                                         {"O6V((f))", dwarf, 6},
                                         {"G2 V Fe-0.5", dwarf, 42},
                                         {"G7 V Fe-1 CH-0.5", dwarf, 47},
                                         {"F8 V CH+0.4", dwarf, 38},
                                         {"A0VpSiSr", dwarf, 20},
                                         {"M5  e", dwarf, 65, 0.5, false},
                                         {"M4   K", dwarf, 64, 0.5, false}}) {
    expect_read(x);
  }
}

TEST(SpectralType, RefusalsSayWhatCannotBeRead) {
  const std::string holds = "spectral_type holds ";
  EXPECT_EQ(refusal("giant"), holds + "\"giant\", which is not a spectral type");
  EXPECT_EQ(refusal("Be9.5/AO"), holds + "\"Be9.5/AO\", of which \"9.5/AO\" cannot be read");
  EXPECT_EQ(refusal("G2 V or K"), holds + "\"G2 V or K\", of which \"or K\" cannot be read");
  EXPECT_EQ(refusal("M10V"), holds + "\"M10V\", of which \"10V\" cannot be read");
  EXPECT_EQ(refusal("M4 (V"), holds + "\"M4 (V\", in which a bracket stays open");
  EXPECT_EQ(refusal("dA2"), holds + "\"dA2\", which may be a dwarf or a white dwarf: write A2V or DA2");
  for (const char* const text :
       {"yes",    "Sun",     "sun",      "SB2",     "none known", "open", "K5-",     "K5/",   "-",   "+",     "M4)",
        "5",      "V",       "M4..5",    "M4.5.5",  "G2IIII",     "G2VV", "M4±",     "M4±99", "DM4", "dwarf", "G2 V 5",
        "M4+0.5", "G2V\xff", "\xc2\xb1", "M1e400V", "(((",        ")",    "M-dwarf", "S",     "C",   "N"}) {
    EXPECT_FALSE(read_spectral_type(text).has_value()) << text;
  }
}

TEST(SpectralType, EmptyIsMissing) {
  for (const char* const text : {"", "  ", "nan", "N/A", "--", "..."}) {
    const auto found = read_spectral_type(text);
    ASSERT_FALSE(found.has_value()) << text;
    EXPECT_EQ(found.error().code, ProblemCode::missing) << text;
    EXPECT_EQ(found.error().column, "spectral_type");
  }
}

// Every text of three of these pieces, alone and behind a subtype: no crash, and what is read keeps its promises.
TEST(SpectralType, KeepsItsPromisesForWhateverIsPutTogether) {
  const std::vector<std::string> pieces{"M",  "g",   "D",  "sd", "d", "5", "9.5", ".", "V",    "III",
                                        "Ia", "e",   " ",  "-",  "/", "+", "(",   ")", ":",    "±",
                                        "W",  "0.5", "Fe", "K",  "C", "v", "iv",  ",", "\xc3", "&plusmn"};
  std::size_t read = 0;
  for (std::size_t n = 0; n < 2 * pieces.size() * pieces.size() * pieces.size(); ++n) {
    std::string text = n % 2 == 0 ? "" : "M5";
    for (std::size_t rest = n / 2, place = 0; place < 3; ++place, rest /= pieces.size()) {
      text += pieces[rest % pieces.size()];
    }
    const auto found = read_spectral_type(text);
    if (!found) continue;
    ++read;
    EXPECT_GT(found->half_width, 0) << text;
    const double subtype = found->subtype.value_or(0);
    EXPECT_TRUE(subtype >= 0 && subtype < 100) << text;
  }
  EXPECT_GT(read, 1000U);
}

TEST(SpectralType, TimeGrowsWithTheLength) {
  for (const char* const piece : {"M5-", "(", "+", "M5V ", "&plusmn", "e", "5", "IV-"}) {
    std::string text = "M5V";
    while (text.size() < 1000000) text += piece;
    (void)read_spectral_type(text);  // a reader that starts over would take hours
  }
}

// --- real lists ---

std::string list_path(const std::string& name) { return std::string(HZ_TEST_DIR "/../../shared/data/") + name; }

/// The distinct spellings of a list's column that are not read.
std::set<std::string> refused(const std::string& list, const std::string& column, std::size_t& spellings) {
  const auto table = testing::read_whole(list_path(list));
  std::set<std::string> seen;
  for (std::size_t i = 0; i < table.head.columns.size(); ++i) {
    if (table.head.columns[i].name != column) continue;
    for (const auto& row : table.rows) seen.insert(row[i]);
  }
  spellings = seen.size();
  std::set<std::string> out;
  for (const auto& text : seen) {
    const auto found = read_spectral_type(text);
    if (!found && found.error().code == ProblemCode::unreadable) out.insert(text);
  }
  return out;
}

struct List {
  std::string name;
  std::string column;
  std::size_t spellings;  // counted with Python's csv module, the empty cell among them
  std::set<std::string> refused;
  friend std::ostream& operator<<(std::ostream& out, const List& list) { return out << list.name; }
};

class SpectralTypesOfList : public ::testing::TestWithParam<List> {};

TEST_P(SpectralTypesOfList, AreReadButForThoseThatAreNone) {
  const List& list = GetParam();
  if (!std::filesystem::exists(list_path(list.name))) GTEST_SKIP() << "the list " << list.name << " is not here";
  std::size_t spellings = 0;
  EXPECT_EQ(refused(list.name, list.column, spellings), list.refused);
  EXPECT_EQ(spellings, list.spellings);
}

// Refused: an O where a 0 is meant, and a C that no notation has.
INSTANTIATE_TEST_SUITE_P(All, SpectralTypesOfList,
                         ::testing::Values(List{"nearest_10pc.csv", "Spec", 95, {}},
                                           List{"planets_composite_2023.csv", "st_spectype", 272, {"Am C", "Be9.5/AO"}},
                                           List{"planets_solutions_2025.csv", "st_spectype", 60, {}},
                                           List{"mdwarfs_bright_2011.csv", "psp", 11, {}},
                                           List{"worksheet_mixed.csv", "SpT", 42, {}}),
                         [](const auto& list) { return list.param.name.substr(0, list.param.name.find('.')); });

}  // namespace
}  // namespace hz
