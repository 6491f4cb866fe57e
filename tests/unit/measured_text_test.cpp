#include "hz/measured_text.hpp"

#include <gtest/gtest.h>

#include <string>

namespace hz {
namespace {

struct Spelling {
  std::string text;
  double value;
  std::optional<double> minus;
  std::optional<double> plus;
  LimitMark limit = LimitMark::none;
  std::string unit = {};
};

std::ostream& operator<<(std::ostream& out, const Spelling& spelling) { return out << spelling.text; }

class Readable : public ::testing::TestWithParam<Spelling> {};

TEST_P(Readable, GivesItsNumbers) {
  const auto& expected = GetParam();
  const auto read = parse_measured(expected.text, "x");
  ASSERT_TRUE(read.has_value()) << read.error().what;
  EXPECT_EQ(read->measured.value, expected.value);
  EXPECT_EQ(read->measured.minus, expected.minus);
  EXPECT_EQ(read->measured.plus, expected.plus);
  EXPECT_EQ(read->measured.limit, expected.limit);
  EXPECT_EQ(read->unit, expected.unit);
  EXPECT_FALSE(read->measured.exact);
}

constexpr auto none = std::nullopt;
INSTANTIATE_TEST_SUITE_P(
    MeasuredText, Readable,
    ::testing::Values(
        Spelling{"4410", 4410, none, none}, Spelling{" +4410 ", 4410, none, none},
        Spelling{"-0.031", -0.031, none, none}, Spelling{".5", 0.5, none, none}, Spelling{"5.", 5, none, none},
        Spelling{"1e3", 1000, none, none}, Spelling{"1.2d3", 1200, none, none}, Spelling{"1.2D-3", 0.0012, none, none},
        Spelling{"1.302E+00", 1.302, none, none}, Spelling{"4410+-70", 4410, 70, 70},
        Spelling{"4410+/-70", 4410, 70, 70}, Spelling{"4410±70", 4410, 70, 70}, Spelling{"4410 ± 70", 4410, 70, 70},
        Spelling{"4410 +/- 70", 4410, 70, 70}, Spelling{"4410+80-60", 4410, 60, 80},
        Spelling{"4410 (+80/-60)", 4410, 60, 80}, Spelling{"4410(+80/-60)", 4410, 60, 80},
        Spelling{"4410 ( +80 / -60 )", 4410, 60, 80}, Spelling{"4410 +80 -60", 4410, 60, 80},
        Spelling{"4410+80/-60", 4410, 60, 80}, Spelling{"4410 (+80, -60)", 4410, 60, 80},
        Spelling{"4410\u00a0±\u00a070", 4410, 70, 70}, Spelling{"4410+80\u221260", 4410, 60, 80},
        Spelling{"\u22120.5", -0.5, none, none}, Spelling{"0.165(9)", 0.165, 0.009, 0.009},
        Spelling{"0.165(12)", 0.165, 0.012, 0.012}, Spelling{"4410(70)", 4410, 70, 70},
        Spelling{"<0.3", 0.3, none, none, LimitMark::upper}, Spelling{"> 0.04", 0.04, none, none, LimitMark::lower},
        Spelling{"<=0.3", 0.3, none, none, LimitMark::upper}, Spelling{"≥ 2", 2, none, none, LimitMark::lower},
        Spelling{"0+0.16-0", 0, 0.0, 0.16}, Spelling{"0.12+/-0", 0.12, 0.0, 0.0},
        Spelling{"91101+1.9e-05-1.7e-05", 91101, 1.7e-05, 1.9e-05},
        Spelling{"1276.46000 d", 1276.46, none, none, LimitMark::none, "d"},
        Spelling{"1.2d", 1.2, none, none, LimitMark::none, "d"},
        Spelling{"1.2 RJ", 1.2, none, none, LimitMark::none, "RJ"},
        Spelling{"1+0.2-0.19 ME", 1, 0.19, 0.2, LimitMark::none, "ME"},
        Spelling{"<25.3 ME", 25.3, none, none, LimitMark::upper, "ME"},
        Spelling{"6.1 ± 1 ME", 6.1, 1.0, 1.0, LimitMark::none, "ME"},
        Spelling{"0.193 (+0.008/-0.007) RJ", 0.193, 0.007, 0.008, LimitMark::none, "RJ"},
        Spelling{"12 %", 12, none, none, LimitMark::none, "%"},
        Spelling{"0.9 Earth radii", 0.9, none, none, LimitMark::none, "Earth radii"},
        Spelling{"2 R⊕", 2, none, none, LimitMark::none, "R⊕"},
        // All of these stand in worksheet_mixed.csv.
        Spelling{"6156.77 (+112.16/-112.16)", 6156.77, 112.16, 112.16}, Spelling{"3340 ± 150", 3340, 150, 150},
        Spelling{"0.27 +0.026 -0.02", 0.27, 0.02, 0.026},
        Spelling{"0.0850211+0.00794006-0.00669106 RJ", 0.0850211, 0.00669106, 0.00794006, LimitMark::none, "RJ"}));

class Unreadable : public ::testing::TestWithParam<std::string> {};

TEST_P(Unreadable, IsQuotedInItsProblem) {
  const auto read = parse_measured(GetParam(), "Teff [K]");
  ASSERT_FALSE(read.has_value());
  EXPECT_EQ(read.error().code, ProblemCode::unreadable);
  EXPECT_EQ(read.error().column, "Teff [K]");
  EXPECT_NE(read.error().what.find("Teff [K] holds \"" + GetParam().substr(0, 20)), std::string::npos)
      << read.error().what;
}

INSTANTIATE_TEST_SUITE_P(MeasuredText, Unreadable,
                         ::testing::Values("4553+15-", "13.9+0.3-", "4553+15", "4553-15", "4553+", "4553+-", "4553±",
                                           "hot", "inf", "-inf", "nan", "Infinity", "1e400", "+-70", "--5", "+-5",
                                           "4410+-70+80-60", "4410+-inf", "4410+nan-3", "4410(", "4410()", "4410(7",
                                           "4410 (70)", "4410(+80)", "1e3(5)", "0,165", "1.2.3", "1 2", "<", "<>3",
                                           "< 0.3+-0.1", "~0.3", "4410 K ± 70", "5;6", "1.2 (RJ)", "e5", "12:30:05"));

TEST(MeasuredText, LongTextIsCutToFortyCharacters) {
  const auto read = parse_measured(std::string(39, 'a') + "éb", "c");
  EXPECT_EQ(read.error().what, "c holds \"" + std::string(39, 'a') + "é…\", which is not a value");
}

TEST(CommaHint, SaysWhatToWrite) {
  EXPECT_EQ(comma_hint("4,62"), "; a decimal comma? write 4.62");
  EXPECT_EQ(comma_hint(" -0,5 "), "; a decimal comma? write -0.5");
  EXPECT_EQ(comma_hint("4,62 ± 0,03"), "; a decimal comma? write 4.62 ± 0.03");
  EXPECT_EQ(comma_hint("4,62 (+0,1/-0,2) RJ"), "; a decimal comma? write 4.62 (+0.1/-0.2) RJ");
  EXPECT_EQ(comma_hint("<0,3"), "; a decimal comma? write <0.3");
  EXPECT_EQ(comma_hint("0,123"), "; a decimal comma? write 0.123");
}

TEST(CommaHint, ThreeDigitsMayBeThousands) {
  EXPECT_EQ(comma_hint("5,772"), "; a comma in a number? write 5.772 or 5772");
  EXPECT_EQ(comma_hint("1,234.5"), "; a comma in a number? write 1234.5");
  EXPECT_EQ(comma_hint("1,234,567"), "; a comma in a number? write 1234567");
}

TEST(CommaHint, IsSilentWhereCommasAreNotTheTrouble) {
  for (const auto* const text : {"", "4.62", "hot", ",", "a,123", "1,2,3", "a,b", ",5", "5,", "4,62+5", "4410+80,-60"})
    EXPECT_EQ(comma_hint(text), "") << text;
}

TEST(CommaHint, StandsInTheProblem) {
  EXPECT_EQ(parse_measured("4,62", "L").error().what,
            "L holds \"4,62\", which is not a value; a decimal comma? write 4.62");
}

TEST(MissingText, DocumentedSpellingsInAnyCase) {
  for (const auto* const text :
       {"", "  ", "nan", "NaN", "null", "NULL", "none", "n/a", "N/A", "na", "NA", "-", " - ", "--", "...", "…"})
    EXPECT_TRUE(is_missing(text)) << text;
  for (const auto* const text : {"0", "-99", "inf", "x", "n.a.", "----", "-1"}) EXPECT_FALSE(is_missing(text)) << text;
}

TEST(NumberText, WholeTextOrNothing) {
  EXPECT_EQ(parse_number("+1.5"), 1.5);
  EXPECT_EQ(parse_number(" -2d2 "), -200.0);
  EXPECT_EQ(parse_number("\u22120.5"), -0.5);
  EXPECT_EQ(parse_number("1.7976931348623157e308"), 1.7976931348623157e308);
  for (const auto* const text : {"", "1 d", "1d", "nan", "inf", "1e400", "++1", "+-1", "1e", "0x1p3"})
    EXPECT_EQ(parse_number(text), std::nullopt) << text;
}

}  // namespace
}  // namespace hz
