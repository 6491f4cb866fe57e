#include "hz/companions.hpp"

#include <gtest/gtest.h>

namespace hz {
namespace {

const PlanetRecord no_planet;

StarRecord with_separation(double arcsec, LimitMark limit = LimitMark::none) {
  StarRecord star;
  star.companion_separation.stated = Measured{arcsec, {}, {}, limit, false};
  return star;
}

TEST(Companions, AStarOfWhichTheListSaysNothingIsAlone) {
  StarRecord star;
  star.spectral_type = "G5/6 V";
  star.number_of_stars = 1;
  PlanetRecord planet;
  planet.circumbinary = false;
  const Companions found = companions_of(star, planet, 10, 1);
  EXPECT_FALSE(found.present);
  EXPECT_FALSE(found.close);
  EXPECT_EQ(found.why, "");
}

TEST(Companions, NumberOfStars) {
  StarRecord star;
  star.number_of_stars = 3;
  const Companions found = companions_of(star, no_planet, 10, 1);
  EXPECT_TRUE(found.present);
  EXPECT_FALSE(found.close);
  EXPECT_EQ(found.why, "the list counts 3 stars");
  star.number_of_stars = 0;
  EXPECT_FALSE(companions_of(star, no_planet, 10, 1).present);
}

TEST(Companions, SpectralTypeThatNamesTwo) {
  StarRecord star;
  for (const char* const type : {"M8+L3", "DA2+M4", "K1III(+M)", "G8III+"}) {
    star.spectral_type = type;
    const Companions found = companions_of(star, no_planet, 10, 1);
    EXPECT_TRUE(found.present) << type;
    EXPECT_FALSE(found.close) << type;
    EXPECT_EQ(found.why, "the spectral type \"" + star.spectral_type + "\" names two");
  }
  for (const char* const type : {"G5/6 V", "K0III-IV", "M4 +/- 0.5", "F8 V CH+0.4", "no type + at all", ""}) {
    star.spectral_type = type;
    EXPECT_FALSE(companions_of(star, no_planet, 10, 1).present) << type;
  }
}

TEST(Companions, SeparationIsCloseInsideTenTimesTheOuterLimit) {
  // 2 arcsec at 5 pc are 10 au, ten times 1 au.
  EXPECT_TRUE(companions_of(with_separation(2), no_planet, 5, 1).close);
  EXPECT_FALSE(companions_of(with_separation(2), no_planet, 5, 0.999).close);
  EXPECT_FALSE(companions_of(with_separation(2.01), no_planet, 5, 1).close);
  EXPECT_EQ(companions_of(with_separation(2), no_planet, 5, 1).why, "a companion 2 arcsec away (10 au on the sky)");
}

TEST(Companions, SeparationWithoutDistanceOrLimitIsPresentOnly) {
  for (const Companions& found :
       {companions_of(with_separation(0.5), no_planet, {}, 1), companions_of(with_separation(0.5), no_planet, 5, {})}) {
    EXPECT_TRUE(found.present);
    EXPECT_FALSE(found.close);
  }
  EXPECT_EQ(companions_of(with_separation(0.5), no_planet, {}, 1).why, "a companion 0.5 arcsec away");
}

TEST(Companions, LimitsOfTheSeparation) {
  const Companions below = companions_of(with_separation(0.5, LimitMark::upper), no_planet, 5, 1);
  EXPECT_TRUE(below.close);
  EXPECT_EQ(below.why, "a companion less than 0.5 arcsec away (2.5 au on the sky)");
  const Companions above = companions_of(with_separation(0.5, LimitMark::lower), no_planet, 5, 1);
  EXPECT_TRUE(above.present);
  EXPECT_FALSE(above.close);
}

TEST(Companions, SeparationOfZeroIsTooSmallToBePrinted) {
  EXPECT_TRUE(companions_of(with_separation(0), no_planet, 5, 1).close);
  EXPECT_FALSE(companions_of(with_separation(-1), no_planet, 5, 1).present);
}

TEST(Companions, PlanetThatCirclesBothIsClose) {
  PlanetRecord planet;
  planet.circumbinary = true;
  const Companions found = companions_of({}, planet, {}, {});
  EXPECT_TRUE(found.present);
  EXPECT_TRUE(found.close);
  EXPECT_EQ(found.why, "the planet circles both stars");
}

TEST(Companions, AllReasonsAreTold) {
  // alpha Centauri: 1.346 pc after Reyle et al. 2021, A&A 650, A201; separation of 5.5 arcsec (about 2016) and types
  // from memory.
  StarRecord star = with_separation(5.5);
  star.number_of_stars = 2;
  star.spectral_type = "G2V+K1V";
  const Companions found = companions_of(star, no_planet, 1.346, 2.0);
  EXPECT_TRUE(found.close);
  EXPECT_EQ(found.why,
            "the list counts 2 stars; the spectral type \"G2V+K1V\" names two; a companion 5.5 arcsec away (7.4 au on "
            "the sky)");
}

}  // namespace
}  // namespace hz
