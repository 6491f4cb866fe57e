// --join: which ways of joining are meant.
#include "join_options.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "hz/error.hpp"

namespace hz::app {
namespace {

using testing::HasSubstr;
using Kind = JoinWay::Kind;

std::string error_of(const std::string& text) {
  try {
    static_cast<void>(read_join_ways(text));
  } catch (const Error& error) {
    EXPECT_EQ(error.fault(), Fault::usage);
    return error.what();
  }
  return "";
}

TEST(JoinWays, PairsOfColumnsInTheOrderGiven) {
  const std::vector<JoinWay> ways = read_join_ways("hip=HIP,Host name=Name (main)");
  ASSERT_EQ(ways.size(), 2U);
  EXPECT_EQ(ways[0].kind, Kind::columns);
  EXPECT_EQ(ways[0].planet_column, "hip");
  EXPECT_EQ(ways[0].star_column, "HIP");
  EXPECT_EQ(ways[1].planet_column, "Host name");
  EXPECT_EQ(ways[1].star_column, "Name (main)");
}

TEST(JoinWays, ATolerancesUnitIsTurnedIntoArcseconds) {
  EXPECT_EQ(read_join_ways("sky=5arcsec").front().kind, Kind::sky);
  EXPECT_DOUBLE_EQ(read_join_ways("sky=5arcsec").front().tolerance, 5);
  EXPECT_DOUBLE_EQ(read_join_ways("sky=250mas").front().tolerance, 0.25);
  EXPECT_DOUBLE_EQ(read_join_ways("sky=0.5 arcmin").front().tolerance, 30);
  EXPECT_DOUBLE_EQ(read_join_ways("sky=0.01deg").front().tolerance, 36);
  EXPECT_EQ(read_join_ways("sky=0.5 arcmin").front().typed, "0.5 arcmin");
}

TEST(JoinWays, NamesAndSkyMayBeMixed) {
  const std::vector<JoinWay> ways = read_join_ways("host=name,sky=2arcsec,sky=30arcsec");
  ASSERT_EQ(ways.size(), 3U);
  EXPECT_EQ(ways[0].kind, Kind::columns);
  EXPECT_DOUBLE_EQ(ways[2].tolerance, 30);
}

TEST(JoinWays, WhatIsNoPairIsRefused) {
  for (const char* const text : {"", "host", "=name", "host=", "host=name,", ",host=name"})
    EXPECT_THAT(error_of(text), HasSubstr("write HOST=NAME")) << text;
}

TEST(JoinWays, WhatIsNoAngleIsRefused) {
  for (const char* const text :
       {"5", "wide", "-5arcsec", "0arcsec", "5pc", "5d", "nan arcsec", "<5arcsec", "5+-1arcsec", "2deg"})
    EXPECT_THAT(error_of(std::string("sky=") + text), HasSubstr("give the tolerance as an angle")) << text;
}

}  // namespace
}  // namespace hz::app
