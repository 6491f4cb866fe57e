// Published insolation limits of the liquid-water zone.
#pragma once
#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "hz/limit_curve.hpp"
#include "hz/result.hpp"

namespace hz {

/// What to do up to 300 K outside the range of a fit; farther out every policy refuses.
enum class BeyondRange {
  hold,    // use the value at the end of the range, and say so
  refuse,  // no answer
};

/// How far outside a fitted range `hold` reaches, K.
inline constexpr double hold_reach = 300.0;

/// A number that may have been held at the end of a fitted range.
struct HeldValue {
  double value = 0;
  bool held = false;
};

/// S = s0 + a t + b t^2 + c t^3 + d t^4, t = teff - teff_reference (Kopparapu et al. 2013, eq. 2).
struct FluxQuartic {
  double s0 = 0, a = 0, b = 0, c = 0, d = 0;
};
struct MassRow {
  double planet_mass = 1;  // Earth masses
  FluxQuartic fit;
};
struct QuarticForm {
  double teff_reference = 0;
  std::vector<MassRow> rows;  // by rising planet mass; linear in S against ln(planet mass) between rows, held outside
};
/// distance at 1 solar luminosity = l_sun - a x - b x^2 au, x = teff - teff_reference (Selsis et al. 2007).
struct DistanceQuadraticForm {
  double l_sun = 0, a = 0, b = 0, teff_reference = 0;
};
/// S = t2 teff^2 + t1 teff + t0 (Underwood et al. 2003).
struct FluxQuadraticForm {
  double t2 = 0, t1 = 0, t0 = 0;
};
/// S as printed for one kind of star.
struct FluxPointForm {
  double insolation = 0;
};
/// A distance as printed for one kind of star of 1 solar luminosity: S = 1 / distance^2.
struct DistancePointForm {
  double distance = 0;  // au
};
/// The insolation at which a planet of this Bond albedo has this equilibrium temperature.
struct EquilibriumForm {
  double temperature = 0;  // K
  double bond_albedo = 0;
};
using LimitForm = std::variant<QuarticForm, DistanceQuadraticForm, FluxQuadraticForm, FluxPointForm, DistancePointForm,
                               EquilibriumForm>;

/// One limit as published, read from catalogs/limits.toml or a user's file of the same form.
class FluxLimit {
public:
  /// `teff_range` is empty where the source states none (equilibrium temperature).
  /// Requires low <= high, and in a QuarticForm at least one row, by rising planet mass above 0.
  FluxLimit(std::string key, std::string title, std::optional<Range> teff_range, LimitForm form);

  [[nodiscard]] const std::string& key() const { return key_; }      // "runaway_greenhouse"
  [[nodiscard]] const std::string& title() const { return title_; }  // "runaway greenhouse"
  [[nodiscard]] const std::optional<Range>& teff_range() const { return teff_range_; }
  [[nodiscard]] const LimitForm& form() const { return form_; }
  [[nodiscard]] bool depends_on_planet_mass() const;

  /// The fitted planet masses (0.1-5 Earth masses for the runaway greenhouse of 2014); empty without dependence.
  [[nodiscard]] std::optional<Range> planet_mass_range() const;

  /// Insolation at the limit.
  ///
  /// Units     teff in K; planet_mass in Earth masses; the result in solar constants (1 = the flux of one nominal
  ///           luminosity at 1 au).
  /// Validity  teff_range(), both ends in; planet_mass is held at the ends of planet_mass_range().
  /// Outside   up to and with hold_reach outside: held at the end, and says so, under BeyondRange::hold; otherwise, and
  ///           for arguments that are not finite or a planet_mass <= 0, Problem::out_of_range. Never extrapolated.
  [[nodiscard]] Result<HeldValue> insolation(double teff, double planet_mass, BeyondRange beyond) const;

  /// The same inside the range only, for integrals that have cut their domain already: teff is clamped to teff_range().
  /// Requires finite arguments and planet_mass > 0.
  [[nodiscard]] double clamped_insolation(double teff, double planet_mass) const;

  /// The limit at this planet mass, for loops over Teff: clamped_insolation without the search for the mass.
  /// Requires planet_mass > 0.
  [[nodiscard]] LimitCurve at_planet_mass(double planet_mass) const;

private:
  struct MassCurve {
    double planet_mass = 1;
    double ln_planet_mass = 0;
    LimitCurve curve;
  };

  std::string key_;
  std::string title_;
  std::optional<Range> teff_range_;
  LimitForm form_;
  std::vector<MassCurve> curves_;  // by rising planet mass; one for a form without planet mass
};

}  // namespace hz
