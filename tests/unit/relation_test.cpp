#include "hz/relation.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>
#include <set>
#include <stdexcept>
#include <string>
#include <vector>

#include "hz/error.hpp"
#include "relation_reader.hpp"

namespace hz {
namespace {

/// `count` points from one end of the range to the other.
std::vector<double> points(const Relation& found, int count = 500) {
  std::vector<double> xs;
  for (int i = 0; i < count; ++i) {
    xs.push_back(found.range().low + (found.range().high - found.range().low) * i / (count - 1));
  }
  return xs;
}

TEST(Relations, AreTheseAndEachOnce) {
  const std::set<std::string> expected = {"bc_v_flower96",
                                          "bc_v_pm13_teff",
                                          "bc_v_pm13_vk",
                                          "bc_g_andrae18",
                                          "bc_j_mann15",
                                          "teff_bv_torres10",
                                          "teff_bv_boyajian13",
                                          "teff_vk_boyajian13",
                                          "teff_vk_pm13",
                                          "teff_vj_boyajian13",
                                          "teff_vj_mann15",
                                          "teff_bprp_pm13",
                                          "teff_bprp_mann15",
                                          "teff_mk_pm13",
                                          "teff_subtype_pm13",
                                          "log_luminosity_subtype_pm13",
                                          "stellar_radius_mk_mann15",
                                          "log_stellar_mass_mk_mann19",
                                          "log_luminosity_mass_eker18",
                                          "log_stellar_mass_luminosity_eker18",
                                          "stellar_radius_mass_eker18",
                                          "log_teff_mass_eker18",
                                          "teff_mass_pm13",
                                          "radius_mass_pm13",
                                          "radius_teff_pm13"};
  std::set<std::string> keys;
  for (const Relation& found : all_relations()) keys.insert(found.key);
  EXPECT_EQ(keys, expected);
  EXPECT_EQ(all_relations().size(), expected.size());
}

TEST(Relations, UnknownKeyIsABug) { EXPECT_THROW((void)relation("teff_by_guess"), std::logic_error); }

TEST(Relations, SayWhereTheyComeFrom) {
  for (const Relation& found : all_relations()) {
    EXPECT_FALSE(found.label.empty()) << found.key;
    EXPECT_NE(found.citation.find("20"), std::string::npos) << found.key << ": a year";
    EXPECT_TRUE(found.doi.starts_with("10.")) << found.key;
    EXPECT_NE(found.provenance.find("2026-12-01"), std::string::npos) << found.key;
    EXPECT_FALSE(found.scatter_source.empty()) << found.key;
    EXPECT_LT(found.range().low, found.range().high) << found.key;
  }
}

TEST(Relations, OnlyBolometricCorrectionsCarryTheSun) {
  for (const Relation& found : all_relations()) {
    EXPECT_EQ(found.solar_bolometric_magnitude.has_value(), found.y.starts_with("bc_")) << found.key;
  }
}

TEST(Relations, ValuesAndScattersAreSaneAllOverTheRange) {
  for (const Relation& found : all_relations()) {
    for (const double x : points(found)) {
      EXPECT_TRUE(std::isfinite(found(x))) << found.key << " at " << x;
      EXPECT_TRUE(std::isfinite(found.slope(x))) << found.key << " at " << x;
      EXPECT_GT(found.scatter(x), 0) << found.key << " at " << x;
      if (found.y == "teff" || found.y == "stellar_radius") {
        EXPECT_LT(found.scatter(x), 0.25 * found(x)) << found.key << " at " << x;
      }
    }
  }
}

TEST(Relations, AreHeldAtTheirEnds) {
  for (const Relation& found : all_relations()) {
    const Range range = found.range();
    EXPECT_EQ(found(range.low - 1e6), found(range.low)) << found.key;
    EXPECT_EQ(found(range.high + 1e6), found(range.high)) << found.key;
    EXPECT_EQ(found.scatter(range.high + 1e6), found.scatter(range.high)) << found.key;
    EXPECT_EQ(found.slope(range.low - 1e6), found.slope(range.low)) << found.key;
  }
}

TEST(Relations, NotANumberIsABug) {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  EXPECT_THROW((void)relation("bc_g_andrae18")(nan), std::logic_error);
  EXPECT_THROW((void)relation("bc_g_andrae18").scatter(nan), std::logic_error);
  EXPECT_THROW((void)relation("bc_g_andrae18").slope(nan), std::logic_error);
}

/// Largest step of y between neighbours of 4,000 points.
double largest_step(const Relation& found) {
  double largest = 0;
  const std::vector<double> xs = points(found, 4000);
  for (std::size_t i = 1; i < xs.size(); ++i) largest = std::max(largest, std::abs(found(xs[i]) - found(xs[i - 1])));
  return largest;
}

TEST(Relations, OnlyThreeHaveStepsAndTheirWarningsOrSourcesSaySo) {
  for (const Relation& found : all_relations()) {
    if (found.key.ends_with("_pm13")) continue;  // straight lines between rows cannot step
    // The steepest slope of all, over the range, in 4,000 parts; a step in the value stands out of that.
    double steepest = 0;
    for (const double x : points(found, 4000)) steepest = std::max(steepest, std::abs(found.slope(x)));
    const double smooth = 1.01 * steepest * (found.range().high - found.range().low) / 3999;
    const bool has_steps = largest_step(found) > smooth + 1e-4;
    const std::set<std::string> known = {"bc_v_flower96", "bc_g_andrae18", "log_luminosity_mass_eker18"};
    EXPECT_EQ(has_steps, known.contains(found.key)) << found.key;
  }
}

TEST(Relations, RedderAndFainterIsCooler) {
  for (const char* key : {"teff_bv_torres10", "teff_bv_boyajian13", "teff_vk_boyajian13", "teff_vj_boyajian13",
                          "teff_vk_pm13", "teff_vj_mann15", "teff_bprp_pm13", "teff_mk_pm13", "teff_subtype_pm13"}) {
    const Relation& found = relation(key);
    for (const double x : points(found)) EXPECT_LT(found.slope(x), 0) << key << " at " << x;
  }
}

TEST(Relations, HeavierIsLarger) {
  for (const char* key : {"log_stellar_mass_luminosity_eker18", "stellar_radius_mass_eker18", "log_teff_mass_eker18"}) {
    const Relation& found = relation(key);
    for (const double x : points(found)) EXPECT_GE(found.slope(x), 0) << key << " at " << x;
  }
  for (const char* key : {"stellar_radius_mk_mann15", "log_stellar_mass_mk_mann19"}) {
    const Relation& found = relation(key);
    for (const double x : points(found)) EXPECT_LT(found.slope(x), 0) << key << " at " << x;
  }
}

// Derivatives by hand: 8984 - 2914 c + 588 c^2 - 47.4 c^3, and 10^(b0 + b1 c + …) at c = 0.
TEST(Slope, IsTheDerivative) {
  const double c = 2;
  EXPECT_NEAR(relation("teff_vk_boyajian13").slope(c), -2914 + 2 * 588 * c - 3 * 47.4 * c * c, 1e-3);
  const double teff = std::pow(10, 3.979145106714099);
  EXPECT_NEAR(relation("teff_bv_torres10").slope(0), teff * std::log(10) * -0.654992268598245, 1);
  EXPECT_NEAR(relation("bc_g_andrae18").slope(5772), 6.731e-5, 1e-10);
}

TEST(Slope, DoesNotCrossAStep) {
  const Relation& luminosity = relation("log_luminosity_mass_eker18");
  const double at = std::log10(0.72);
  EXPECT_NEAR(luminosity.slope(at), 5.743, 1e-6);
  EXPECT_NEAR(luminosity.slope(at - 1e-9), 4.572, 1e-3);
  EXPECT_NEAR(luminosity.slope(luminosity.range().low), 2.028, 1e-6);
  EXPECT_NEAR(luminosity.slope(luminosity.range().high), 2.865, 1e-6);
}

TEST(MassFromLuminosity, UndoesTheLuminosityBetweenTheJoins) {
  const Relation& luminosity = relation("log_luminosity_mass_eker18");
  const Relation& mass = relation("log_stellar_mass_luminosity_eker18");
  for (const double m : {0.18, 0.3, 0.44, 0.5, 0.65, 0.8, 1.0, 1.2, 2.0, 3.0, 6.0, 8.0, 30.9}) {
    EXPECT_NEAR(std::pow(10, mass(luminosity(std::log10(m)))), m, 1e-9 * m) << m;
  }
}

TEST(MassFromLuminosity, RisesOverTheJoinsAndStaysInTheGap) {
  const Relation& mass = relation("log_stellar_mass_luminosity_eker18");
  double last = -1;
  for (const double log_luminosity : points(mass, 5000)) {
    EXPECT_GE(mass(log_luminosity), last);
    last = mass(log_luminosity);
  }
  // Between 3.446 and 3.526 dex no mass has this luminosity; both pieces end at 7 solar masses.
  EXPECT_NEAR(std::pow(10, mass(3.48)), 7, 1e-9);
  // -0.79 dex is 0.707 solar masses on one piece and 0.731 on the other.
  EXPECT_GT(std::pow(10, mass(-0.79)), 0.707);
  EXPECT_LT(std::pow(10, mass(-0.79)), 0.731);
}

TEST(MassFromLuminosity, ScatterIsThatOfTheLuminosityOverItsSlope) {
  EXPECT_NEAR(relation("log_stellar_mass_luminosity_eker18").scatter(0), 0.129 / 5.743, 1e-6);
  EXPECT_NEAR(relation("log_stellar_mass_luminosity_eker18").scatter(1), 0.140 / 4.329, 1e-6);
}

// ---- reading ------------------------------------------------------------------------------------------------------

constexpr const char* words =
    "[[relation]]\nkey = \"k\"\nlabel = \"y(x)\"\nx = \"x\"\ny = \"y\"\ncitation = \"c\"\ndoi = \"10.1/1\"\n"
    "provenance = \"p\"\nscatter_source = \"s\"\n";

std::string trouble(const std::string& rest) {
  try {
    (void)RelationReader(words + rest, "some.toml").read();
  } catch (const Error& error) {
    return error.what();
  }
  return "";
}

TEST(RelationReader, ReadsTheSmallestRelation) {
  const std::vector<Relation> read =
      RelationReader(std::string(words) + "range = [0, 2]\nscatter = 0.5\n[[relation.piece]]\nc = [1, 2]\n", "f")
          .read();
  ASSERT_EQ(read.size(), 1U);
  EXPECT_DOUBLE_EQ(read[0](1.5), 4);
  EXPECT_DOUBLE_EQ(read[0].scatter(1.5), 0.5);
  EXPECT_FALSE(read[0].main_sequence);
}

TEST(RelationReader, SaysWhatIsWrongAndWhere) {
  EXPECT_EQ(trouble("range = [2, 0]\nscatter = 1\n[[relation.piece]]\nc = [1]\n"),
            "some.toml:10:9: relation 'k': 'range' is not two rising numbers; write [lowest, highest]");
  EXPECT_EQ(trouble("range = [0, 2]\nscatter = 1\nvalue = \"ln\"\n[[relation.piece]]\nc = [1]\n"),
            "some.toml:12:9: relation 'k': 'value' is 'ln'; write \"10^c\" or \"c\"");
  EXPECT_EQ(trouble("range = [0, 2]\nscatter = 1\nends_in = \"m\"\n[[relation.piece]]\nc = [1]\n"),
            "some.toml:12:11: relation 'k': 'ends_in' is 'm'; write \"x\", \"log10(x)\" or \"10^x\"");
  EXPECT_EQ(
      trouble("range = [0, 2]\nscatter = 1\n[[relation.piece]]\nc = [1]\n[[relation.piece]]\nfrom = 0\nc = [2]\n"),
      "some.toml:15:8: relation 'k': 'from' does not rise; order the pieces");
  EXPECT_EQ(trouble("inverse_of = \"other\"\n"),
            "some.toml:10:14: relation 'k': the file has no relation 'other'; name another");
  EXPECT_NE(trouble("rnge = [0, 2]\n").find("unknown key 'rnge'"), std::string::npos);
  EXPECT_NE(trouble("range = [0, 2]\n[[relation.piece]]\nc = [1]\n").find("has no 'scatter'"), std::string::npos);
}

}  // namespace
}  // namespace hz
