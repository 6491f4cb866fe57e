// A derived quantity as what it hangs on: its central value, its slope in every raw input, and what Teff adds exactly.
#pragma once
#include <cstddef>
#include <string>
#include <vector>

#include "hz/placement.hpp"

namespace hz {

/// d value / d u of one source; u = ln x for a logarithmic source, x itself otherwise (magnitudes, scatters).
struct FormTerm {
  std::size_t source = 0;  // index in Sources
  double slope = 0;
};

/// What a value owes to more than its row.
struct Marks {
  bool main_sequence = false;       // a relation of main-sequence stars was used
  bool extinction_ignored = false;  // photometry without an extinction
  bool distance_prior = false;      // a parallax that needed a prior
  bool rough = false;               // a luminosity by nothing but the spectral type or the mass

  friend Marks operator|(const Marks& a, const Marks& b) {
    return {a.main_sequence || b.main_sequence, a.extinction_ignored || b.extinction_ignored,
            a.distance_prior || b.distance_prior, a.rough || b.rough};
  }
};

/// The natural logarithm of a luminosity, radius, mass, distance, axis or insolation; or a plain magnitude or colour;
/// or a Teff in K (then without curve).
struct Form {
  double value = 0;  // at the central values of all sources and of Teff
  std::vector<FormTerm> terms;
  TeffCurve curve;  // without a linear slope: that is the placement's
  Marks marks;
  std::string route;  // "stated", "stellar_radius and teff", …
};

/// Sums with the terms of shared sources put together. The route is that of the first.
[[nodiscard]] Form operator+(Form a, const Form& b);
[[nodiscard]] Form operator-(const Form& a, const Form& b);
[[nodiscard]] Form operator*(double factor, Form form);
[[nodiscard]] Form operator+(Form form, double constant);

/// exp of the form of a logarithm, and back, to first order in the terms. A curve is that of a logarithm: neither takes
/// one.
[[nodiscard]] Form raised(const Form& log_form);
[[nodiscard]] Form logarithm(const Form& form);

/// The slope of a curve at a Teff above 0, its correction's as the mean from `low` to `high`: tables have kinks.
[[nodiscard]] double slope_between(const TeffCurve& curve, double low, double teff, double high);

}  // namespace hz
