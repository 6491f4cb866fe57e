#include "hz/flux_limit.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <iterator>
#include <utility>

#include "hz/constants.hpp"
#include "hz/require.hpp"

namespace hz {
namespace {

/// One curve a planet mass, in the order of the form.
using MassCurves = std::vector<std::pair<double, LimitCurve>>;

MassCurves single(const LimitCurve& curve) { return {{1.0, curve}}; }

LimitCurve polynomial(const std::array<double, 5>& coefficients, double teff_reference = 0) {
  LimitCurve curve;
  curve.coefficients = coefficients;
  curve.teff_reference = teff_reference;
  return curve;
}

LimitCurve in_distance(LimitCurve curve) {
  curve.in_distance = true;
  return curve;
}

struct ToCurves {
  MassCurves operator()(const QuarticForm& form) const {
    MassCurves curves;
    for (const auto& [planet_mass, fit] : form.rows) {
      curves.emplace_back(planet_mass, polynomial({fit.s0, fit.a, fit.b, fit.c, fit.d}, form.teff_reference));
    }
    return curves;
  }
  MassCurves operator()(const DistanceQuadraticForm& form) const {
    return single(in_distance(polynomial({form.l_sun, -form.a, -form.b}, form.teff_reference)));
  }
  MassCurves operator()(const FluxQuadraticForm& form) const { return single(polynomial({form.t0, form.t1, form.t2})); }
  MassCurves operator()(const FluxPointForm& form) const { return single(polynomial({form.insolation})); }
  MassCurves operator()(const DistancePointForm& form) const {
    return single(in_distance(polynomial({form.distance})));
  }
  /// From T_eq = equilibrium_temperature_1au (1 - A)^(1/4) S^(1/4).
  MassCurves operator()(const EquilibriumForm& form) const {
    const double ratio = form.temperature / constants::equilibrium_temperature_1au;
    return single(polynomial({std::pow(ratio, 4) / (1.0 - form.bond_albedo)}));
  }
};

/// Linear in S at every Teff is linear in each coefficient: the rows of one limit share teff_reference and kind.
LimitCurve between(const LimitCurve& low, const LimitCurve& high, double weight) {
  LimitCurve curve = low;
  for (std::size_t i = 0; i < curve.coefficients.size(); ++i) {
    curve.coefficients[i] += weight * (high.coefficients[i] - low.coefficients[i]);
  }
  return curve;
}

Problem outside_range(double teff, const Range& range, double reach) {
  const std::string more = reach > 0 ? fmt::format("more than {:g} K ", reach) : "";
  return {ProblemCode::out_of_range, "teff",
          fmt::format("Teff {:g} K lies {}outside the fitted range {:g}-{:g} K", teff, more, range.low, range.high)};
}

}  // namespace

FluxLimit::FluxLimit(std::string key, std::string title, std::optional<Range> teff_range, LimitForm form)
    : key_(std::move(key)), title_(std::move(title)), teff_range_(teff_range), form_(std::move(form)) {
  HZ_REQUIRE(!teff_range_ || teff_range_->low <= teff_range_->high);
  for (auto& [planet_mass, curve] : std::visit(ToCurves{}, form_)) {
    HZ_REQUIRE(planet_mass > (curves_.empty() ? 0.0 : curves_.back().planet_mass));
    if (teff_range_) curve.teff_range = *teff_range_;
    curves_.push_back({planet_mass, std::log(planet_mass), curve});
  }
  HZ_REQUIRE(!curves_.empty());
}

bool FluxLimit::depends_on_planet_mass() const { return curves_.size() > 1; }

std::optional<Range> FluxLimit::planet_mass_range() const {
  if (!depends_on_planet_mass()) return std::nullopt;
  return Range{curves_.front().planet_mass, curves_.back().planet_mass};
}

Result<HeldValue> FluxLimit::insolation(double teff, double planet_mass, BeyondRange beyond) const {
  if (!std::isfinite(teff)) return Problem{ProblemCode::out_of_range, "teff", "Teff is not a finite number"};
  if (!std::isfinite(planet_mass) || planet_mass <= 0) {
    return Problem{ProblemCode::out_of_range, "planet_mass", "planet mass is not a finite number above 0"};
  }
  const double outside = teff_range_ ? std::max(teff_range_->low - teff, teff - teff_range_->high) : 0.0;
  const double reach = beyond == BeyondRange::hold ? hold_reach : 0.0;
  if (outside > reach) return outside_range(teff, *teff_range_, reach);
  return HeldValue{clamped_insolation(teff, planet_mass), outside > 0};
}

double FluxLimit::clamped_insolation(double teff, double planet_mass) const {
  return curves_.size() == 1 ? curves_.front().curve(teff) : at_planet_mass(planet_mass)(teff);
}

LimitCurve FluxLimit::at_planet_mass(double planet_mass) const {
  HZ_REQUIRE(planet_mass > 0);
  const auto reaches = [planet_mass](const MassCurve& row) { return row.planet_mass >= planet_mass; };
  const auto high = std::find_if(curves_.begin(), curves_.end(), reaches);
  if (high == curves_.end()) return curves_.back().curve;
  if (high == curves_.begin() || high->planet_mass <= planet_mass) return high->curve;
  const auto low = std::prev(high);
  const double weight = (std::log(planet_mass) - low->ln_planet_mass) / (high->ln_planet_mass - low->ln_planet_mass);
  return between(low->curve, high->curve, weight);
}

}  // namespace hz
