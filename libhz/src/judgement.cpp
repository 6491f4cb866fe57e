#include "judgement.hpp"

#include <cmath>

#include "hz/constants.hpp"
#include "hz/orbit.hpp"

namespace hz {
namespace {

/// ln S over ln S_limit at the central values, for a limit that answers.
std::optional<double> log_ratio(const FluxLimit& limit, const PlacementInput& input, double insolation,
                                BeyondRange beyond) {
  const Result<HeldValue> at = limit.insolation(input.teff.central(), central_planet_mass(input), beyond);
  return at ? std::optional(std::log(insolation / at->value)) : std::nullopt;
}

std::optional<double> zone_position(const Zone& zone, const PlacementInput& input, double insolation,
                                    const Settings& settings) {
  const auto inner = log_ratio(settings.limits->limits[zone.inner], input, insolation, settings.beyond);
  const auto outer = log_ratio(settings.limits->limits[zone.outer], input, insolation, settings.beyond);
  if (!inner || !outer) return std::nullopt;
  return -*inner / (*outer - *inner);
}

std::vector<std::size_t> zone_limits(const LimitSet& set) {
  std::vector<std::size_t> indices;
  for (const std::optional<Zone>& zone : {set.conservative, set.optimistic}) {
    if (zone) indices.insert(indices.end(), {zone->inner, zone->outer});
  }
  return indices;
}

std::optional<Margin> margin_of(const PlacementInput& input, const PlanetAnswer& planet, const Settings& settings) {
  const double insolation = planet.insolation.measured.value;
  std::optional<Margin> nearest;
  double least = 0;
  for (const std::size_t index : zone_limits(*settings.limits)) {
    const FluxLimit& limit = settings.limits->limits[index];
    const auto ratio = log_ratio(limit, input, insolation, settings.beyond);
    if (!ratio || (nearest && std::abs(*ratio) >= std::abs(least))) continue;
    nearest = Margin{&limit, std::nullopt, 0};
    least = *ratio;
  }
  if (!nearest) return std::nullopt;
  // The limit lies colder than the planet when the planet is hotter than it.
  const double width =
      log_margin_width(input, *nearest->limit, settings.beyond, least > 0 ? Towards::colder : Towards::hotter);
  nearest->widths = width > 0 ? least / width : 0;
  // An eccentric orbit meets the limit's flux, on average, at another semi-major axis: a sqrt(S / S_limit).
  if (planet.semi_major_axis) nearest->distance = planet.semi_major_axis->measured.value * std::expm1(least / 2);
  return nearest;
}

/// Share of the orbit's time between a zone's limits at the central values.
std::optional<double> orbit_share(const Zone& zone, const PlacementInput& input, double insolation,
                                  const Settings& settings) {
  const double e = input.eccentricity.central();
  if (!(e > 0)) return std::nullopt;
  const auto inner = log_ratio(settings.limits->limits[zone.inner], input, insolation, settings.beyond);
  const auto outer = log_ratio(settings.limits->limits[zone.outer], input, insolation, settings.beyond);
  if (!inner || !outer) return std::nullopt;
  const double circular = -0.5 * std::log(mean_flux_factor(e));
  return time_share_within(std::exp(*outer / 2 + circular), e) - time_share_within(std::exp(*inner / 2 + circular), e);
}

std::optional<Side> side_of(double hot, double cold) {
  constexpr double hardly_outside = 0.005;
  if (hot + cold < hardly_outside) return std::nullopt;
  return hot >= cold ? Side::hot : Side::cold;
}

/// FNV-1a: draws are keyed by the target, so that they do not hang on the order of a list.
std::uint64_t target_key(const ListRow& row) {
  std::uint64_t hash = 14695981039346656037ULL;
  for (const std::string* text : {&row.star.name, &row.planet.name}) {
    for (const char c : *text) hash = (hash ^ static_cast<unsigned char>(c)) * 1099511628211ULL;
  }
  return hash;
}

Probabilities probabilities_of(const PlacementInput& input, const ListRow& row, const Settings& settings) {
  if (settings.method == Method::quadrature) return place(input, *settings.limits, settings.beyond);
  return place_by_sampling(input, *settings.limits, settings.beyond, settings.draws, settings.seed ^ target_key(row));
}

double merit_of(const Probabilities& p) {
  if (!p.optimistic) return p.conservative.value_or(0);
  if (!p.conservative) return *p.optimistic;
  return *p.conservative + 0.5 * (*p.optimistic - *p.conservative);
}

}  // namespace

void judge(PlanetAnswer& planet, const PlacementInput& input, const ListRow& row, const Settings& settings) {
  planet.probabilities = probabilities_of(input, row, settings);
  const LimitSet& set = *settings.limits;
  const double insolation = planet.insolation.measured.value;
  const Probabilities& p = planet.probabilities;
  if (p.conservative) planet.conservative = verdict_of(*p.conservative, settings.thresholds);
  if (p.optimistic) planet.optimistic = verdict_of(*p.optimistic, settings.thresholds);
  planet.side = p.conservative ? side_of(p.too_hot_conservative, p.too_cold_conservative)
                               : side_of(p.too_hot.value_or(0), p.too_cold.value_or(0));
  planet.zone_position =
      zone_position(set.conservative ? *set.conservative : *set.optimistic, input, insolation, settings);
  planet.orbit_share = orbit_share(set.optimistic ? *set.optimistic : *set.conservative, input, insolation, settings);
  planet.margin = margin_of(input, planet, settings);
  planet.equilibrium_temperature =
      constants::equilibrium_temperature_1au * std::pow((1 - settings.bond_albedo) * insolation, 0.25);
  planet.merit = merit_of(p);
}

void soften(PlanetAnswer& planet) {
  for (std::optional<Verdict>* verdict : {&planet.conservative, &planet.optimistic}) {
    if (*verdict == Verdict::inside) *verdict = Verdict::likely_inside;
    if (*verdict == Verdict::outside) *verdict = Verdict::likely_outside;
  }
}

double central_planet_mass(const PlacementInput& input) {
  return input.planet_mass_decadic ? std::pow(10, input.planet_mass.central()) : input.planet_mass.central();
}

std::string_view word(Verdict verdict) {
  switch (verdict) {
    case Verdict::inside: return "inside";
    case Verdict::likely_inside: return "likely inside";
    case Verdict::open: return "open";
    case Verdict::likely_outside: return "likely outside";
    case Verdict::outside: return "outside";
  }
  return "";
}

std::string_view word(Side side) { return side == Side::hot ? "hot" : "cold"; }

Verdict verdict_of(double probability, const VerdictThresholds& thresholds) {
  if (probability >= thresholds.inside) return Verdict::inside;
  if (probability >= thresholds.likely_inside) return Verdict::likely_inside;
  if (probability <= thresholds.outside) return Verdict::outside;
  if (probability <= thresholds.likely_outside) return Verdict::likely_outside;
  return Verdict::open;
}

}  // namespace hz
