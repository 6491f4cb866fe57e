// Two real, well-measured stars, each stated in every way a list may state a star: do the routes agree with what was
// measured without any of them, and with one another?
#include <gtest/gtest.h>

#include <cmath>
#include <string>
#include <vector>

#include "hz/answer.hpp"

namespace {

using hz::Answer;
using hz::Field;
using hz::Measured;
using hz::StarRecord;

Field value(double x, double half_width) {
  return {Measured{x, half_width, half_width, hz::LimitMark::none, false}, {}};
}

/// What is published of a star.
struct Published {
  std::string name;
  std::string spectral_type;
  Field luminosity, teff, stellar_radius, stellar_mass;
  Field parallax;
  Field v, color_bv, color_vj, j, ks;
  Field g, bp, rp;
};

// 16 Cyg B, a solar analogue:
//   radius, Teff, mass by interferometry and oscillations: White et al. 2013, MNRAS 433, 1262, abstract.
//   luminosity 1.25 +- 0.05 by oscillations alone: Metcalfe et al. 2015 as an encyclopaedia quotes it (seen there).
//   parallax 47.3302 +- 0.0171 mas: Gaia DR3 (seen quoted). G 6.0643, V 6.215 +- 0.016 and Ks 4.651 +- 0.016: a public
//   composite list of planet hosts of 2023; J 4.99 and B-V 0.66: a public catalogue of planet hosts, half-widths from
//   memory. BP-RP 0.82 (Gaia DR2) from memory: BP and RP are set to give it, with its half-width; type: the same list.
Published solar_analogue() {
  Published star;
  star.name = "16 Cyg B";
  star.spectral_type = "G3 V";
  star.luminosity = value(1.25, 0.05);
  star.teff = value(5809, 39);
  star.stellar_radius = value(1.12, 0.02);
  star.stellar_mass = value(1.05, 0.04);
  star.parallax = value(47.3302, 0.0171);
  star.v = value(6.215, 0.016);
  star.color_bv = value(0.66, 0.01);
  star.color_vj = value(6.215 - 4.99, 0.04);
  star.j = value(4.99, 0.037);
  star.ks = value(4.651, 0.016);
  star.g = value(6.0643, 0.01);
  star.bp = value(6.37, 0.01);
  star.rp = value(5.55, 0.01);
  return star;
}

// GJ 687, an M dwarf:
//   radius 0.4183 +- 0.0070, Teff 3413 +- 28 K by interferometry: Boyajian et al. 2012, ApJ 757, 112 (from memory; a
//   public composite list of planet hosts of 2023 rounds them to 0.42 +- 0.01 and the same Teff).
//   bolometric flux 3.363e-11 W/m2, mass 0.405 +- 0.041, V 9.182: Mann et al. 2015, table 5 (see mann2015_stars.csv);
//   luminosity 4 pi d^2 f = 0.02177 with the flux's 1 per cent (from memory). V's half-width from memory.
//   parallax, G, BP, RP (Gaia DR2), J, Ks (2MASS), type: Cifuentes et al. 2020, A&A 642, A115, their table of stars.
//   B-V 10.65 - 9.18: list of Reyle et al. 2021, A&A 650, A201, half-width from memory.
Published m_dwarf() {
  Published star;
  star.name = "GJ 687";
  star.spectral_type = "M3.0 V";
  star.luminosity = value(0.02177, 0.0003);
  star.teff = value(3413, 28);
  star.stellar_radius = value(0.4183, 0.0070);
  star.stellar_mass = value(0.405, 0.041);
  star.parallax = value(219.780727, 0.03241);
  star.v = value(9.182, 0.02);
  star.color_bv = value(1.47, 0.03);
  star.color_vj = value(9.182 - 5.335, 0.03);
  star.j = value(5.335, 0.021);
  star.ks = value(4.548, 0.021);
  star.g = value(8.0275, 0.01);
  star.bp = value(9.4119, 0.01);
  star.rp = value(6.886, 0.01);
  return star;
}

/// One way to state a star.
struct Way {
  std::string name;
  StarRecord star;
};

std::vector<Way> ways(const Published& p) {
  std::vector<Way> all;
  const auto add = [&all](const std::string& name, const StarRecord& star) { all.push_back({name, star}); };
  StarRecord star;
  star.luminosity = p.luminosity, star.teff = p.teff;
  add("L, Teff", star);
  star = {};
  star.stellar_radius = p.stellar_radius, star.teff = p.teff;
  add("R, Teff", star);
  star = {};
  star.magnitude_v = p.v, star.color_bv = p.color_bv, star.parallax = p.parallax;
  add("V, B-V, parallax", star);
  star = {};
  star.magnitude_g = p.g, star.magnitude_bp = p.bp, star.magnitude_rp = p.rp, star.parallax = p.parallax;
  add("G, BP-RP, parallax", star);
  star = {};
  star.magnitude_k = p.ks, star.parallax = p.parallax;
  add("Ks, parallax", star);
  star = {};
  star.magnitude_v = p.v, star.magnitude_k = p.ks, star.parallax = p.parallax;
  add("V, Ks, parallax", star);
  star = {};
  star.magnitude_j = p.j, star.color_vj = p.color_vj, star.parallax = p.parallax;
  add("J, V-J, parallax", star);
  star = {};
  star.spectral_type = p.spectral_type;
  add("spectral type", star);
  star = {};
  star.stellar_mass = p.stellar_mass;
  add("mass", star);
  return all;
}

Answer answer_of(const StarRecord& star) {
  hz::ListRow row;
  row.number = 1;
  row.star = star;
  hz::Settings settings;
  settings.limits = hz::LimitCatalog::published().find(hz::default_limit_set);
  return hz::answer_star(row, settings);
}
TEST(P, P) {
  for (const auto& p : {solar_analogue(), m_dwarf()})
    for (const Way& way : ways(p)) {
      const Answer a = answer_of(way.star);
      std::printf("%-9s %-20s ", p.name.c_str(), way.name.c_str());
      if (a.star.luminosity)
        std::printf("L %.5f -%.5f +%.5f (%s) ", a.star.luminosity->measured.value, *a.star.luminosity->measured.minus,
                    *a.star.luminosity->measured.plus, a.star.luminosity->route.c_str());
      if (a.star.teff)
        std::printf("T %.0f -%.0f +%.0f (%s) ", a.star.teff->measured.value, *a.star.teff->measured.minus,
                    *a.star.teff->measured.plus, a.star.teff->route.c_str());
      std::printf(" | %s\n", a.reason.c_str());
    }
}
}  // namespace
