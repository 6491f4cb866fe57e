// Teff, luminosity, radius and mass of a star worked out anew for each draw of what its row states: the slow, plain
// way, which shares with the library the relations' values and nothing of how errors are carried.
#pragma once
#include <algorithm>
#include <cmath>
#include <random>
#include <string>
#include <vector>

#include "hz/records.hpp"
#include "hz/relation.hpp"

namespace hz::testing {

/// p(r) ~ r^2 exp(-r / length) N(parallax; 1000 / r, sigma), by its sum over a fine grid of ln r (Bailer-Jones 2015).
class PosteriorDistance {
public:
  PosteriorDistance(double parallax, double sigma, double length = 1350) {
    constexpr int steps = 20000;
    double sum = 0;
    for (int i = 0; i < steps; ++i) {
      const double log_r = std::log(0.1) + i * (std::log(1e5) - std::log(0.1)) / (steps - 1);
      const double r = std::exp(log_r);
      const double misfit = (parallax - 1000 / r) / sigma;
      sum += r * r * r * std::exp(-r / length - misfit * misfit / 2);  // one r more: the grid is even in ln r
      log_r_.push_back(log_r);
      sum_.push_back(sum);
    }
  }
  /// The distance with this share of the probability below it, pc.
  [[nodiscard]] double at(double share) const {
    const auto above = std::lower_bound(sum_.begin(), sum_.end(), share * sum_.back());
    return std::exp(log_r_[static_cast<std::size_t>(above - sum_.begin())]);
  }

private:
  std::vector<double> log_r_;
  std::vector<double> sum_;
};

/// Draws of a row's values, each from what it stands for.
class Draw {
public:
  Draw(const ListRow& row, std::uint64_t seed) : generator_(seed), posterior_(posterior_of(row.star.parallax)) {}

  /// A value whose half-widths reach its 16 and 84 per cent points; what falls below `least` is drawn anew.
  double of(const Field& field, double least = -HUGE_VAL) {
    const Measured& m = *field.stated;
    if (m.exact) return m.value;
    while (true) {
      const double side = uniform() < 0.5 ? -*m.minus : *m.plus;
      const double x = m.value + side * std::abs(normal());
      if (x > least) return x;
    }
  }
  double distance(const Field& parallax) {
    return posterior_.empty() ? 1000 / of(parallax) : posterior_[0].at(uniform());
  }
  /// A published relation with its scatter.
  double by(const Relation& y, double x) { return y(x) + y.scatter(x) * normal(); }
  double normal() { return normal_(generator_); }

private:
  static std::vector<PosteriorDistance> posterior_of(const Field& parallax) {
    if (!parallax.stated || *parallax.stated->plus < 0.1 * parallax.stated->value) return {};
    return {PosteriorDistance(parallax.stated->value, *parallax.stated->plus)};
  }
  double uniform() { return uniform_(generator_); }

  std::mt19937_64 generator_;
  std::normal_distribution<double> normal_;
  std::uniform_real_distribution<double> uniform_;
  std::vector<PosteriorDistance> posterior_;  // of a parallax with a large error, or none
};

/// A star as one draw has it; 0 for what its kind of row does not give.
struct DrawnStar {
  double teff = 0;                              // K
  double luminosity = 0, radius = 0, mass = 0;  // solar
};
using StarOf = DrawnStar (*)(const StarRecord&, Draw&);

/// m - M, and the extinction in V.
struct Dimming {
  double modulus = 0;
  double extinction = 0;
};

inline Dimming dimming(const StarRecord& star, Draw& draw) {
  Dimming dim;
  dim.modulus = 5 * std::log10(draw.distance(star.parallax) / 10);
  if (star.extinction_v.stated) dim.extinction = draw.of(star.extinction_v, 0);
  if (star.reddening_bv.stated) dim.extinction = 3.1 * draw.of(star.reddening_bv, 0);
  return dim;
}

inline double luminosity_of(double absolute_bolometric, double solar) {
  return std::pow(10, -0.4 * (absolute_bolometric - solar));
}

inline double mass_of(Draw& draw, double luminosity) {
  static const Relation& mass = relation("log_stellar_mass_luminosity_eker18");
  return std::pow(10, draw.by(mass, std::log10(luminosity)));
}

/// Radius and mass by the absolute magnitude in Ks.
inline DrawnStar sized_by_k(Draw& draw, double absolute_k) {
  static const Relation& radius = relation("stellar_radius_mk_mann15");
  static const Relation& mass = relation("log_stellar_mass_mk_mann19");
  DrawnStar star;
  star.radius = draw.by(radius, absolute_k);
  star.mass = std::pow(10, draw.by(mass, absolute_k));
  return star;
}

inline DrawnStar star_of_v_and_k(const StarRecord& star, Draw& draw) {
  static const Relation& teff = relation("teff_vk_pm13");
  static const Relation& correction = relation("bc_v_pm13_vk");
  const Dimming dim = dimming(star, draw);
  const double v = draw.of(star.magnitude_v) - dim.extinction;
  const double k = draw.of(star.magnitude_k) - 0.114 * dim.extinction;
  DrawnStar drawn = sized_by_k(draw, k - dim.modulus);
  drawn.teff = draw.by(teff, v - k);
  drawn.luminosity = luminosity_of(v + draw.by(correction, v - k) - dim.modulus, 4.74);
  return drawn;
}

inline DrawnStar star_of_gaia(const StarRecord& star, Draw& draw) {
  static const Relation& teff = relation("teff_bprp_pm13");
  static const Relation& correction = relation("bc_g_andrae18");
  const Dimming dim = dimming(star, draw);
  const double color = draw.of(star.magnitude_bp) - draw.of(star.magnitude_rp) - 0.79 / 2 * dim.extinction;
  DrawnStar drawn;
  drawn.teff = draw.by(teff, color);
  const double g = draw.of(star.magnitude_g) - 0.79 * dim.extinction;
  drawn.luminosity = luminosity_of(g + draw.by(correction, drawn.teff) - dim.modulus, 4.74);
  drawn.mass = mass_of(draw, drawn.luminosity);
  return drawn;
}

inline DrawnStar star_of_v_and_bv(const StarRecord& star, Draw& draw) {
  static const Relation& teff = relation("teff_bv_torres10");
  static const Relation& correction = relation("bc_v_flower96");
  const Dimming dim = dimming(star, draw);
  DrawnStar drawn;
  drawn.teff = draw.by(teff, draw.of(star.color_bv) - dim.extinction / 3.1);
  const double v = draw.of(star.magnitude_v) - dim.extinction;
  drawn.luminosity = luminosity_of(v + draw.by(correction, drawn.teff) - dim.modulus, 4.73);
  drawn.mass = mass_of(draw, drawn.luminosity);
  return drawn;
}

inline DrawnStar star_of_j_and_vj(const StarRecord& star, Draw& draw) {
  static const Relation& teff = relation("teff_vj_mann15");
  static const Relation& correction = relation("bc_j_mann15");
  const Dimming dim = dimming(star, draw);
  const double color = draw.of(star.color_vj) - (1 - 0.282) * dim.extinction;
  const double j = draw.of(star.magnitude_j) - 0.282 * dim.extinction;
  DrawnStar drawn;
  drawn.teff = draw.by(teff, color);
  drawn.luminosity = luminosity_of(j + draw.by(correction, color) - dim.modulus, 4.7554);
  drawn.mass = mass_of(draw, drawn.luminosity);
  return drawn;
}

inline DrawnStar star_of_k(const StarRecord& star, Draw& draw) {
  static const Relation& teff = relation("teff_mk_pm13");
  const Dimming dim = dimming(star, draw);
  const double absolute = draw.of(star.magnitude_k) - 0.114 * dim.extinction - dim.modulus;
  DrawnStar drawn = sized_by_k(draw, absolute);
  drawn.teff = star.teff.stated ? draw.of(star.teff, 0) : draw.by(teff, absolute);
  drawn.luminosity = drawn.radius * drawn.radius * std::pow(drawn.teff / 5772, 4);
  return drawn;
}

/// "M4V" alone.
inline DrawnStar star_of_type(const StarRecord& star, Draw& draw) {
  static const Relation& teff = relation("teff_subtype_pm13");
  static const Relation& light = relation("log_luminosity_subtype_pm13");
  const double central =
      10.0 * static_cast<double>(std::string("OBAFGKM").find(star.spectral_type[0])) + (star.spectral_type[1] - '0');
  const double subtype = central + 0.5 * draw.normal();
  DrawnStar drawn;
  drawn.teff = draw.by(teff, subtype);
  drawn.luminosity = std::pow(10, draw.by(light, subtype));
  drawn.mass = mass_of(draw, drawn.luminosity);
  return drawn;
}

inline DrawnStar star_of_mass(const StarRecord& star, Draw& draw) {
  static const Relation& teff = relation("teff_mass_pm13");
  static const Relation& light = relation("log_luminosity_mass_eker18");
  DrawnStar drawn;
  drawn.mass = draw.of(star.stellar_mass, 0);
  drawn.teff = draw.by(teff, drawn.mass);
  drawn.luminosity = std::pow(10, draw.by(light, std::log10(drawn.mass)));
  return drawn;
}

inline DrawnStar star_of_light_and_radius(const StarRecord& star, Draw& draw) {
  DrawnStar drawn;
  drawn.luminosity = draw.of(star.luminosity, 0);
  drawn.radius = draw.of(star.stellar_radius, 0);
  drawn.teff = 5772 * std::pow(drawn.luminosity / (drawn.radius * drawn.radius), 0.25);
  drawn.mass = draw.of(star.stellar_mass, 0);
  return drawn;
}

}  // namespace hz::testing
