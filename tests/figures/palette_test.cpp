// Words at least 4.5:1 and marks 3:1 against every ground they can stand on; the tint of stars.
#include "palette.hpp"

#include <gmock/gmock.h>

#include <array>
#include <cmath>

#include "star_tint.hpp"

namespace hz::plots {
namespace {

// WCAG 2.1, W3C: relative luminance and contrast ratio.
double luminance(const Color& color) {
  const auto linear = [](double c) { return c <= 0.03928 ? c / 12.92 : std::pow((c + 0.055) / 1.055, 2.4); };
  return 0.2126 * linear(color.red) + 0.7152 * linear(color.green) + 0.0722 * linear(color.blue);
}
double contrast(const Color& a, const Color& b) {
  const double high = std::max(luminance(a), luminance(b));
  const double low = std::min(luminance(a), luminance(b));
  return (high + 0.05) / (low + 0.05);
}

const std::array<Color, 3> grounds{palette::white, palette::conservative, palette::optimistic};

TEST(Palette, ContrastIsThatOfTheStandard) { EXPECT_NEAR(contrast(palette::white, {0, 0, 0}), 21, 1e-9); }

TEST(Palette, WordsCanBeRead) {
  for (const Color& ground : grounds) EXPECT_GE(contrast(palette::ink, ground), 4.5);
  EXPECT_GE(contrast(palette::grey, palette::white), 4.5);
  EXPECT_GE(contrast(palette::water, palette::white), 4.5);
}

TEST(Palette, MarksCanBeSeen) {
  for (const Color& ground : grounds)
    for (const Color& mark : {palette::water, palette::grey, palette::ink}) EXPECT_GE(contrast(mark, ground), 3);
  EXPECT_GE(contrast(palette::grey, palette::unknown), 3);
  EXPECT_GE(contrast(palette::guide, palette::white), 3);
}

// Source: CIE 15:2004, standard illuminant A (a black body of 2855.5 K): x = 0.44757, y = 0.40745 (from memory, as are
// the Planckian chromaticities of 6500 K, 0.3135, 0.3237). The cubic splines are good to about 0.001.
TEST(StarTint, FollowsTheBlackBody) {
  EXPECT_NEAR(black_body_chromaticity(2855.5).x, 0.44757, 0.001);
  EXPECT_NEAR(black_body_chromaticity(2855.5).y, 0.40745, 0.001);
  EXPECT_NEAR(black_body_chromaticity(6500).x, 0.3135, 0.001);
  EXPECT_NEAR(black_body_chromaticity(6500).y, 0.3237, 0.001);
}

TEST(StarTint, HasNoSeamsBetweenThePieces) {
  for (const double teff : {2222.0, 4000.0}) {
    EXPECT_NEAR(black_body_chromaticity(teff).x, black_body_chromaticity(teff + 0.01).x, 2e-4) << teff;
    EXPECT_NEAR(black_body_chromaticity(teff).y, black_body_chromaticity(teff + 0.01).y, 5e-4) << teff;
  }
}

TEST(StarTint, IsOrangeForCoolAndBluishForHotStars) {
  EXPECT_DOUBLE_EQ(star_tint(2600).red, 1);
  EXPECT_LT(star_tint(2600).blue, 0.45);
  EXPECT_DOUBLE_EQ(star_tint(9500).blue, 1);
  EXPECT_LT(star_tint(9500).red, 0.9);
}

}  // namespace
}  // namespace hz::plots
