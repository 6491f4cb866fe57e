#include "settings_options.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <functional>

#include "commands.hpp"
#include "hz/error.hpp"

namespace hz::app {
namespace {

using testing::HasSubstr;

Arguments arguments(std::vector<std::string> words) {
  const Command& check = command_named("check");
  return Arguments::read(check.name, check.options, check.positionals, words);
}
Settings settings(std::vector<std::string> words) { return read_choices(arguments(std::move(words))).settings; }

std::string usage_error(const std::function<void()>& act) {
  try {
    act();
  } catch (const Error& error) {
    EXPECT_EQ(error.fault(), Fault::usage);
    return error.what();
  }
  return "no error";
}

TEST(Choices, DefaultsAreThoseOfTheLibrary) {
  const Choices choices = read_choices(arguments({}));
  EXPECT_EQ(choices.settings.limits->key, default_limit_set);
  EXPECT_EQ(choices.settings.beyond, BeyondRange::hold);
  EXPECT_EQ(choices.settings.assumed_errors, default_assumed_errors());
}

TEST(Choices, EveryOptionReachesItsSetting) {
  const Settings s = settings({"--beyond=refuse", "--asymmetry=mode", "--luminosity-from=radius", "--albedo=0.1",
                               "--semi-major-axis-from=stated", "--insolation-from=stated", "--method=sampling",
                               "--draws=77", "--seed=5", "--verdict-at=0.9,0.6,0.4,0.1", "--assume-error=none"});
  EXPECT_EQ(s.beyond, BeyondRange::refuse);
  EXPECT_EQ(s.asymmetry, Asymmetry::mode);
  EXPECT_EQ(s.luminosity_from, LuminosityFrom::radius);
  EXPECT_EQ(s.semi_major_axis_from, SemiMajorAxisFrom::stated);
  EXPECT_EQ(s.insolation_from, InsolationFrom::stated);
  EXPECT_EQ(s.method, Method::sampling);
  EXPECT_EQ(s.draws, 77U);
  EXPECT_EQ(s.seed, 5U);
  EXPECT_EQ(s.bond_albedo, 0.1);
  EXPECT_EQ(s.thresholds.likely_outside, 0.4);
  EXPECT_TRUE(s.assumed_errors.empty());
}

TEST(Choices, UnknownSetOffersTheClosest) {
  EXPECT_THAT(usage_error([] { (void)settings({"--set", "K15"}); }), HasSubstr("did you mean K1"));
}

TEST(Choices, ASetWithoutAZoneCannotAnswer) {
  EXPECT_THAT(usage_error([] { (void)settings({"--set", "RK17"}); }), HasSubstr("bounds no zone"));
}

TEST(Choices, SamplingOptionsAloneAreAMistake) {
  EXPECT_THAT(usage_error([] { (void)settings({"--draws", "5"}); }), HasSubstr("--method sampling"));
}

TEST(Choices, AlbedoStaysInItsDomain) {
  for (const char* const text : {"1", "-0.1", "2"})
    EXPECT_THAT(usage_error([&] { (void)settings({"--albedo", text}); }), HasSubstr("--albedo")) << text;
}

TEST(AssumedErrors, PerCentAndPartsAreTheSame) {
  EXPECT_EQ(read_assumed_errors("semi_major_axis=5%").at(Quantity::semi_major_axis), 0.05);
  EXPECT_EQ(read_assumed_errors("semi_major_axis=0.05").at(Quantity::semi_major_axis), 0.05);
}

TEST(AssumedErrors, TheOthersStay) {
  const AssumedErrors errors = read_assumed_errors("teff=2%,luminosity=0");
  EXPECT_EQ(errors.at(Quantity::teff), 0.02);
  EXPECT_FALSE(errors.contains(Quantity::luminosity));  // 0: exact
  EXPECT_EQ(errors.at(Quantity::stellar_mass), default_assumed_errors().at(Quantity::stellar_mass));
}

TEST(AssumedErrors, NamesWhatItDoesNotKnow) {
  EXPECT_THAT(usage_error([] { (void)read_assumed_errors("tef=2%"); }), HasSubstr("`tef`, only of teff"));
  EXPECT_THAT(usage_error([] { (void)read_assumed_errors("orbital_period=2%"); }), HasSubstr("`orbital_period`"));
}

TEST(AssumedErrors, RefusesSenselessWidths) {
  for (const char* const text : {"teff", "teff=", "teff=-1%", "teff=100%", "teff=nan", "teff=5%%"})
    EXPECT_THAT(usage_error([&] { (void)read_assumed_errors(text); }), HasSubstr("needs teff=N%")) << text;
}

TEST(Thresholds, MustFall) {
  EXPECT_EQ(read_thresholds("0.9,0.6,0.4,0.1").inside, 0.9);
  for (const char* const text : {"0.9,0.6,0.4", "0.9,0.6,0.4,0.1,0", "0.6,0.9,0.4,0.1", "1.2,0.6,0.4,0.1", "0.9,0.5,0.5,0.1"})
    EXPECT_THAT(usage_error([&] { (void)read_thresholds(text); }), HasSubstr("four falling probabilities")) << text;
}

}  // namespace
}  // namespace hz::app
