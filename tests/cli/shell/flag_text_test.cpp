#include "flag_text.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "hz/flags.hpp"

namespace hz::app {
namespace {

TEST(FlagSentence, EveryFlagHasAMeaning) {
  for (const FlagInfo& info : all_flags()) {
    const std::string flag = std::string(info.word) + (info.word.ends_with(':') ? "teff" : "");
    EXPECT_EQ(flag_sentence(flag), flag + ": " + std::string(info.meaning) + ".");
  }
}

TEST(FlagSentence, AnUnknownFlagIsABug) { EXPECT_THROW((void)flag_sentence("hold"), std::logic_error); }

}  // namespace
}  // namespace hz::app
