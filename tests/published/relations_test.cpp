// The published relations against a second transcription, and against what papers and their own logic say of them.
#include "hz/relations.hpp"

#include <gtest/gtest.h>

#include <cmath>
#include <fstream>
#include <functional>
#include <map>
#include <regex>
#include <string>
#include <vector>

#include "hz/relation.hpp"
#include "plain_csv.hpp"

namespace {

using hz::relation;
using hz_test::CsvRow;
using hz_test::plain_csv;

// ---- digits -------------------------------------------------------------------------------------------------------

/// "key/list/index" -> "from:c0;c1;…" as text.
using Pieces = std::map<std::string, std::string>;

std::string place(const std::string& key, const std::string& list, std::size_t index) {
  return key + "/" + list + "/" + std::to_string(index);
}

Pieces second_transcription() {
  Pieces pieces;
  for (const CsvRow& row : plain_csv("relations_second_transcription.csv")) {
    pieces[place(row.at("key"), row.at("list"), std::stoul(row.at("index")))] = row.at("from") + ":" + row.at("c");
  }
  return pieces;
}

/// All polynomials of one file as text, read line by line and not by a TOML parser, which would lose digits.
void add_file(const std::string& name, Pieces& pieces) {
  static const std::regex key_line(R"re(^key = "(.*)"$)re");
  static const std::regex list_line(R"re(^\[\[relation\.(\w+)\]\]$)re");
  static const std::regex from_line(R"re(^from = (\S+)$)re");
  static const std::regex numbers_line(R"re(^c = \[(.*)\]$)re");
  std::ifstream file(std::string(HZ_TEST_DIR) + "/../catalogs/relations/" + name);
  std::string key;
  std::string list;
  std::string from;
  std::map<std::string, std::size_t> count;
  for (std::string line; std::getline(file, line);) {
    std::smatch match;
    if (std::regex_match(line, match, key_line)) {
      key = match[1];
      count.clear();
    } else if (std::regex_match(line, match, list_line)) {
      list = match[1];
      from.clear();
    } else if (std::regex_match(line, match, from_line)) {
      from = match[1];
    } else if (std::regex_match(line, match, numbers_line)) {
      pieces[place(key, list, count[list]++)] = from + ":" + std::regex_replace(match[1].str(), std::regex(", "), ";");
    }
  }
}

TEST(PublishedRelations, TextAgreesWithTheSecondTranscriptionDigitForDigit) {
  Pieces catalogue;
  for (const char* name : {"bolometric_corrections.toml", "color_temperature.toml", "m_dwarfs.toml",
                           "mass_luminosity.toml", "main_sequence.toml"}) {
    add_file(name, catalogue);
  }
  // Scatters of one number a piece are measured here or from memory: no publication to transcribe.
  std::erase_if(catalogue, [](const auto& entry) {
    return entry.first.find("scatter_piece") != std::string::npos && entry.second.find(';') == std::string::npos;
  });
  const Pieces second = second_transcription();
  EXPECT_EQ(second.size(), 24U);
  EXPECT_EQ(catalogue, second);
}

// ---- values -------------------------------------------------------------------------------------------------------

/// How a source reads its polynomial: what it is a polynomial of, where pieces begin, what the sum stands for.
struct Reading {
  std::function<double(double)> argument = [](double x) { return x; };
  std::function<double(double)> begins = [](double from) { return from; };  // printed beginning -> x
  std::function<double(double)> value = [](double sum) { return sum; };
};

std::map<std::string, Reading> readings() {
  const auto same = [](double x) { return x; };
  const auto log = [](double x) { return std::log10(x); };
  const auto power = [](double x) { return std::pow(10, x); };
  const auto of_3500 = [](double sum) { return 3500 * sum; };
  const Reading plain;
  return {{"bc_v_flower96", {log, power, same}},
          {"bc_g_andrae18", {[](double teff) { return teff - 5772; }, same, same}},
          {"bc_j_mann15", plain},
          {"teff_bv_torres10", {same, same, power}},
          {"teff_bv_boyajian13", plain},
          {"teff_vj_boyajian13", plain},
          {"teff_vk_boyajian13", plain},
          {"teff_vj_mann15", {same, same, of_3500}},
          {"teff_bprp_mann15", {same, same, of_3500}},
          {"stellar_radius_mk_mann15", plain},
          {"log_stellar_mass_mk_mann19", {[](double mk) { return mk - 7.5; }, same, same}},
          {"log_luminosity_mass_eker18", {same, log, same}},
          {"stellar_radius_mass_eker18", plain},
          {"log_teff_mass_eker18", plain}};
}

struct Piece {
  double begins = 0;
  std::vector<double> c;
};

std::vector<Piece> second_pieces(const std::string& key, const std::string& list, const Reading& reading) {
  std::vector<Piece> pieces;
  for (const CsvRow& row : plain_csv("relations_second_transcription.csv")) {
    if (row.at("key") != key || row.at("list") != list) continue;
    Piece piece;
    piece.begins = row.at("from").empty() ? -1e9 : reading.begins(std::stod(row.at("from")));
    std::istringstream numbers(row.at("c"));
    for (std::string c; std::getline(numbers, c, ';');) piece.c.push_back(std::stod(c));
    pieces.push_back(piece);
  }
  return pieces;
}

double evaluate(const std::vector<Piece>& pieces, const Reading& reading, double x) {
  const Piece* piece = nullptr;
  for (const Piece& candidate : pieces) {
    if (x >= candidate.begins) piece = &candidate;
  }
  double sum = 0;
  for (std::size_t i = 0; i < piece->c.size(); ++i) {
    sum += piece->c[i] * std::pow(reading.argument(x), static_cast<double>(i));
  }
  return reading.value(sum);
}

TEST(PublishedRelations, ValuesAreThoseOfTheSecondTranscription) {
  for (const auto& [key, reading] : readings()) {
    const hz::Relation& found = relation(key);
    const std::vector<Piece> pieces = second_pieces(key, "piece", reading);
    ASSERT_FALSE(pieces.empty()) << key;
    for (int i = 0; i < 400; ++i) {
      const double x = found.range().low + (found.range().high - found.range().low) * (i + 0.37) / 400;
      const double expected = evaluate(pieces, reading, x);
      // Sums of terms up to 1e5 that cancel to about 1 lose eleven of sixteen digits in either order of adding.
      EXPECT_NEAR(found(x), expected, 1e-9 * std::max(1.0, std::abs(expected))) << key << " at " << x;
    }
  }
}

TEST(PublishedRelations, ScatterOfTheGaiaCorrectionIsThePrintedPolynomial) {
  const Reading reading = readings().at("bc_g_andrae18");
  const std::vector<Piece> pieces = second_pieces("bc_g_andrae18", "scatter_piece", reading);
  for (double teff = 3300; teff <= 8000; teff += 47) {
    EXPECT_NEAR(relation("bc_g_andrae18").scatter(teff), evaluate(pieces, reading, teff), 1e-12) << teff;
  }
}

// ---- what the sources say -----------------------------------------------------------------------------------------

// Source: Torres 2010, AJ 140, 1158, section 5: BC_V of the Sun (5777 K) is -0.080 with these coefficients, M_bol 4.73.
TEST(BolometricCorrections, FlowersOfTheSun) {
  const hz::Relation& bc = relation("bc_v_flower96");
  EXPECT_NEAR(bc(5777), -0.080, 0.0005);
  EXPECT_DOUBLE_EQ(*bc.solar_bolometric_magnitude, 4.73);
}

// Evaluated in other code from the printed coefficients: -0.2783 and -0.3007 at log Teff 3.70, 0.0203 and 0.0234
// at 3.90.
TEST(BolometricCorrections, FlowersPiecesMeetAsPrinted) {
  const hz::Relation& bc = relation("bc_v_flower96");
  EXPECT_NEAR(bc(std::pow(10, 3.70) - 1e-6), -0.2783, 5e-5);
  EXPECT_NEAR(bc(std::pow(10, 3.70)), -0.3007, 5e-5);
  EXPECT_NEAR(bc(std::pow(10, 3.90) - 1e-6), 0.0203, 5e-5);
  EXPECT_NEAR(bc(std::pow(10, 3.90)), 0.0234, 5e-5);
}

// Source: notes under the main-sequence table of Pecaut & Mamajek 2013 (version 2024.05.15): Flower gives -3.12 at 3300
// K. The library does not go there (it starts at 4000 K), so the transcription is evaluated.
TEST(BolometricCorrections, FlowersCoolPieceIsTheOneOthersQuote) {
  const Reading reading = readings().at("bc_v_flower96");
  EXPECT_NEAR(evaluate(second_pieces("bc_v_flower96", "piece", reading), reading, 3300), -3.12, 0.02);
  EXPECT_DOUBLE_EQ(relation("bc_v_flower96")(3300), relation("bc_v_flower96")(4000));
}

// Source: Andrae et al. 2018, A&A 616, A8, section 2.3: BC_G of the Sun (5772 K) is +0.06 by construction, M_bol 4.74.
// The join at 4000 K evaluated in other code: -0.4980 from above, -0.4944 from below.
TEST(BolometricCorrections, GaiasOfTheSunAndAtTheJoin) {
  const hz::Relation& bc = relation("bc_g_andrae18");
  EXPECT_DOUBLE_EQ(bc(5772), 0.060);
  EXPECT_DOUBLE_EQ(*bc.solar_bolometric_magnitude, 4.74);
  EXPECT_NEAR(bc(4000 - 1e-6), -0.4944, 5e-5);
  EXPECT_NEAR(bc(4000), -0.4980, 5e-5);
}

// Source: the Sun's colours among solar twins: B-V 0.653 (Ramirez et al. 2012, ApJ 752, 5), V-J 1.198 and V-Ks 1.560
// (Casagrande et al. 2012, ApJ 761, 16); from memory. Evaluated in other code: 5755, 5611, 5689 K.
TEST(ColorTemperature, OfTheSun) {
  EXPECT_NEAR(relation("teff_bv_boyajian13")(0.653), 5755, 0.5);
  EXPECT_NEAR(relation("teff_vj_boyajian13")(1.198), 5611, 0.5);
  EXPECT_NEAR(relation("teff_vk_boyajian13")(1.560), 5689, 0.5);
  for (const auto& [key, color] : std::map<std::string, double>{{"teff_bv_boyajian13", 0.653},
                                                                {"teff_bv_torres10", 0.653},
                                                                {"teff_vk_boyajian13", 1.560},
                                                                {"teff_vk_pm13", 1.560}}) {
    EXPECT_NEAR(relation(key)(color), 5772, relation(key).scatter(color)) << key;
  }
}

// Source: Mann et al. 2019, ApJ 871, 63, and Mann et al. 2015 (erratum); evaluated in other code.
TEST(MDwarfs, MassesAndRadiiAtRoundMagnitudes) {
  const std::map<double, std::pair<double, double>> mass_radius = {
      {5, {0.597, 0.612}}, {6, {0.440, 0.444}}, {7, {0.289, 0.311}}, {8, {0.180, 0.211}}, {9, {0.117, 0.144}}};
  for (const auto& [magnitude, expected] : mass_radius) {
    EXPECT_NEAR(std::pow(10, relation("log_stellar_mass_mk_mann19")(magnitude)), expected.first, 5.1e-4) << magnitude;
    EXPECT_NEAR(relation("stellar_radius_mk_mann15")(magnitude), expected.second, 5.1e-4) << magnitude;
  }
}

// Source: Eker et al. 2018, MNRAS 479, 5491; both sides of each join, and the Sun, evaluated in other code.
TEST(MassLuminosity, PiecesMeetAsPublished) {
  const hz::Relation& luminosity = relation("log_luminosity_mass_eker18");
  const std::map<double, std::pair<double, double>> joins = {{0.45, {-1.679, -1.688}},
                                                             {0.72, {-0.754, -0.826}},
                                                             {1.05, {0.115, 0.102}},
                                                             {2.40, {1.656, 1.601}},
                                                             {7, {3.446, 3.526}}};
  for (const auto& [mass, sides] : joins) {
    EXPECT_NEAR(luminosity(std::log10(mass) - 1e-9), sides.first, 5.1e-4) << mass;
    EXPECT_NEAR(luminosity(std::log10(mass)), sides.second, 5.1e-4) << mass;
  }
  EXPECT_NEAR(std::pow(10, luminosity(0)), 0.984, 5e-4);
  EXPECT_NEAR(relation("stellar_radius_mass_eker18")(1), 0.992, 1e-12);
}

// Source: Chen & Kipping 2017, ApJ 834, 17; evaluated in other code at 1, 10, 318 Earth masses and at the breaks.
TEST(PlanetRadius, FromTheMass) {
  const std::map<double, std::pair<double, double>> radii = {{1, {1.008, 5e-4}},      {10, {3.137, 5e-4}},
                                                             {318, {13.77, 5e-3}},    {2.04, {1.230, 5e-4}},
                                                             {131.58, {14.31, 5e-3}}, {26636, {11.33, 5e-3}}};
  for (const auto& [mass, radius] : radii) {
    hz::Measured planet_mass;
    planet_mass.value = mass;
    EXPECT_NEAR(std::pow(10, hz::log_radius_from_mass(planet_mass).value), radius.first, radius.second) << mass;
  }
}

// ---- the main-sequence table --------------------------------------------------------------------------------------

std::vector<CsvRow> main_sequence() { return plain_csv("../../catalogs/relations/main_sequence.csv"); }

double number(const CsvRow& row, const std::string& column) { return std::stod(row.at(column)); }

// Source: the table's own logic, M_bol of the Sun 4.74 and Teff 5772 K (IAU 2015 B2, B3). What the table breaks itself
// is named with how far.
TEST(MainSequenceTable, AgreesWithItself) {
  const std::map<std::string, double> loose_luminosity = {{"G8V", 0.037}, {"M1V", 0.057}};
  const std::map<std::string, double> loose_magnitude = {{"K7V", 0.041}, {"M9.5V", 0.051}};
  const std::map<std::string, double> loose_radius = {{"O3V", 0.075}, {"O7V", 0.075}, {"B6V", 0.075}, {"B8V", 0.075},
                                                      {"G8V", 0.075}, {"K3V", 0.075}, {"M1V", 0.075}};
  const auto allowed = [](const std::map<std::string, double>& loose, const std::string& type, double otherwise) {
    return loose.contains(type) ? loose.at(type) : otherwise;
  };
  const std::vector<CsvRow> rows = main_sequence();
  EXPECT_EQ(rows.size(), 88U);
  for (const CsvRow& row : rows) {
    const std::string& type = row.at("spt");
    const double log_luminosity = number(row, "log_l_lsun");
    EXPECT_NEAR(0.4 * (4.74 - number(row, "m_bol")), log_luminosity, allowed(loose_luminosity, type, 0.0165)) << type;
    EXPECT_NEAR(number(row, "m_v") + number(row, "bc_v"), number(row, "m_bol"), allowed(loose_magnitude, type, 0.0101))
        << type;
    const double radius = std::pow(10, log_luminosity / 2) * std::pow(5772 / number(row, "teff_k"), 2);
    EXPECT_NEAR(number(row, "radius_rsun") / radius, 1, allowed(loose_radius, type, 0.03)) << type;
  }
}

struct Columns {
  std::string x, y;
  int rows = 0;  // that the relation covers: those with both numbers, of the stretch over which x rises or falls
};

TEST(MainSequenceTable, RelationsGiveItsRows) {
  const std::map<std::string, Columns> columns = {
      {"bc_v_pm13_teff", {"teff_k", "bc_v", 88}},         {"bc_v_pm13_vk", {"v_ks", "bc_v", 78}},       // O9V to L0V
      {"teff_vk_pm13", {"v_ks", "teff_k", 78}},           {"teff_bprp_pm13", {"bp_rp", "teff_k", 60}},  // B9V to M8V
      {"teff_mk_pm13", {"m_ks", "teff_k", 54}},                                                         // A8V to L0V
      {"teff_mass_pm13", {"mass_msun", "teff_k", 88}},    {"radius_mass_pm13", {"mass_msun", "radius_rsun", 88}},
      {"radius_teff_pm13", {"teff_k", "radius_rsun", 88}}};
  for (const auto& [key, names] : columns) {
    int rows_met = 0;
    for (const CsvRow& row : main_sequence()) {
      if (row.at(names.x).empty() || row.at(names.y).empty()) continue;
      const double x = number(row, names.x);
      if (x < relation(key).range().low || x > relation(key).range().high) continue;
      if (relation(key)(x) == number(row, names.y)) ++rows_met;
    }
    EXPECT_EQ(rows_met, names.rows) << key;
  }
}

// Source: as above, rows G2V, K7V, M5.5V and B0.5V.
TEST(MainSequenceTable, SubtypesStandForTheirRows) {
  EXPECT_DOUBLE_EQ(relation("teff_subtype_pm13")(42), 5770);
  EXPECT_DOUBLE_EQ(relation("teff_subtype_pm13")(57), 4090);
  EXPECT_DOUBLE_EQ(relation("teff_subtype_pm13")(65.5), 2930);
  EXPECT_DOUBLE_EQ(relation("log_luminosity_subtype_pm13")(10.5), 4.428);
  EXPECT_DOUBLE_EQ(relation("log_luminosity_subtype_pm13")(65.5), -2.792);
}

}  // namespace
