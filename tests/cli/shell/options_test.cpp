#include "options.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <array>
#include <functional>

#include "hz/error.hpp"

namespace hz::app {
namespace {

using testing::ElementsAre;
using testing::HasSubstr;

constexpr auto options = std::to_array<Option>({
    {"value", 'v', OptionKind::value, "X", OptionGroup::input, "a value"},
    {"list", '\0', OptionKind::list, "X", OptionGroup::answer, "a list"},
    {"flag", 'f', OptionKind::flag, "", OptionGroup::output, "a flag"},
});
const std::array<Positional, 2> positionals{{{"FIRST", true, "the first word"}, {"SECOND", false, "the second"}}};

Arguments read(std::vector<std::string> words) { return Arguments::read("test", options, positionals, words); }

std::string usage_error(const std::function<void()>& act) {
  try {
    act();
  } catch (const Error& error) {
    EXPECT_EQ(error.fault(), Fault::usage);
    return error.what();
  }
  return "no error";
}
std::string trouble(std::vector<std::string> words) {
  return usage_error([&] { static_cast<void>(read(std::move(words))); });
}

TEST(Arguments, ReadsOptionsInEitherForm) {
  EXPECT_EQ(read({"a", "--value", "1"}).value("value"), "1");
  EXPECT_EQ(read({"a", "--value=1"}).value("value"), "1");
  EXPECT_EQ(read({"a", "-v1"}).value("value"), "1");
  EXPECT_TRUE(read({"a", "-f"}).has("flag"));
  EXPECT_FALSE(read({"a"}).has("flag"));
}

TEST(Arguments, NegativeNumbersAreValues) {
  EXPECT_EQ(read({"a", "--value", "-0.5+-0.1"}).value("value"), "-0.5+-0.1");
  EXPECT_EQ(read({"a", "--value=-0.5"}).value("value"), "-0.5");
}

TEST(Arguments, AnOptionIsNoValue) {
  EXPECT_THAT(trouble({"a", "--value", "-f"}), HasSubstr("--value needs a value"));
  EXPECT_THAT(trouble({"a", "--value", "--list", "x"}), HasSubstr("--value needs a value"));
}

TEST(Arguments, ListsKeepTheirOrder) {
  EXPECT_THAT(read({"a", "--list", "y", "--list", "x"}).values("list"), ElementsAre("y", "x"));
}

TEST(Arguments, GivenTwiceIsAnError) {
  EXPECT_THAT(trouble({"a", "--value", "1", "--value", "2"}), HasSubstr("--value is given more than once"));
  EXPECT_THAT(trouble({"a", "-f", "--flag"}), HasSubstr("--flag is given more than once"));
}

TEST(Arguments, WordsAfterTwoDashesAreNoOptions) { EXPECT_THAT(read({"--", "--flag"}).words(), ElementsAre("--flag")); }
TEST(Arguments, ASingleDashIsAWord) { EXPECT_THAT(read({"-"}).words(), ElementsAre("-")); }

TEST(Arguments, UnknownOptionOffersTheClosest) {
  EXPECT_THAT(trouble({"a", "--vlaue", "1"}), HasSubstr("`test` has no option --vlaue; did you mean --value?"));
  EXPECT_THAT(trouble({"a", "--val", "1"}), HasSubstr("no option --val"));  // no silent guessing
  EXPECT_THAT(trouble({"a", "-x"}), HasSubstr("no option -x"));
}

TEST(Arguments, MissingAndSurplusWordsAreNamed) {
  EXPECT_THAT(trouble({}), HasSubstr("`test` needs FIRST: the first word"));
  EXPECT_THAT(trouble({"a", "b", "c"}), HasSubstr("`c` is one word too many"));
}

TEST(Arguments, FlagsTakeNoValue) { EXPECT_THAT(trouble({"a", "--flag=yes"}), HasSubstr("--flag takes no value")); }
TEST(Arguments, AskingForAnUnknownOptionIsABug) { EXPECT_THROW((void)read({"a"}).has("typo"), std::logic_error); }

TEST(OptionNumber, RefusesWhatIsNotAFiniteNumber) {
  EXPECT_EQ(option_number("albedo", "0.3"), 0.3);
  for (const char* const text : {"", "x", "nan", "inf", "1e999", "0.3x"})
    EXPECT_THAT(usage_error([&] { (void)option_number("albedo", text); }), HasSubstr("--albedo needs a number"))
        << text;
}

TEST(OptionCount, RefusesWhatIsNotAWholeNumber) {
  EXPECT_EQ(option_count("draws", "1000", 1), 1000U);
  for (const char* const text : {"0", "-5", "1.5", "1e3", "", "99999999999999999999999"})
    EXPECT_THAT(usage_error([&] { (void)option_count("draws", text, 1); }), HasSubstr("--draws needs a whole number"))
        << text;
}

TEST(OptionWord, ListsWhatIsAllowed) {
  constexpr auto words = std::to_array<OptionWord<int>>({{"a", 1}, {"b", 2}, {"c", 3}});
  EXPECT_EQ(option_word<int>("x", "b", words), 2);
  EXPECT_EQ(usage_error([&] { (void)option_word<int>("x", "d", words); }), "--x takes a, b or c, not `d`");
}

}  // namespace
}  // namespace hz::app
