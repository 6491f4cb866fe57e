#include "hz/decides.hpp"

#include <algorithm>
#include <cmath>

namespace hz {
namespace {

/// A distribution of an input, and whose it is.
struct Part {
  VarianceShare whose;
  Distribution* x = nullptr;

  [[nodiscard]] bool is(const VarianceShare& other) const {
    return whose.quantity == other.quantity && whose.scatter_of == other.scatter_of;
  }
};

std::vector<Part> parts_of(PlacementInput& input) {
  std::vector<Part> all = {{{Quantity::teff, {}, 0}, &input.teff},
                           {{Quantity::eccentricity, {}, 0}, &input.eccentricity},
                           {{Quantity::planet_mass, {}, 0}, &input.planet_mass}};
  for (InsolationTerm& term : input.terms) all.push_back({{term.quantity, term.scatter_of, 0}, &term.x});
  return all;
}

std::optional<double> log_limit(const FluxLimit& limit, const PlacementInput& input, const Settings& settings) {
  const double mass =
      input.planet_mass_decadic ? std::pow(10, input.planet_mass.central()) : input.planet_mass.central();
  const Result<HeldValue> at = limit.insolation(input.teff.central(), mass, settings.beyond);
  return at ? std::optional(std::log(at->value)) : std::nullopt;
}

/// Zone position at the central values.
std::optional<double> position(const PlacementInput& input, const Settings& settings) {
  const LimitSet& set = *settings.limits;
  const Zone zone = set.conservative ? *set.conservative : *set.optimistic;
  const auto inner = log_limit(set.limits[zone.inner], input, settings);
  const auto outer = log_limit(set.limits[zone.outer], input, settings);
  if (!inner || !outer) return std::nullopt;
  return (*inner - std::log(central_insolation(input))) / (*inner - *outer);
}

/// Half the change of zone position from the input's lower to its upper 68 per cent point.
double swing(const PlacementInput& input, const VarianceShare& which, const Settings& settings) {
  const auto moved = [&](double sign) {
    PlacementInput copy = input;
    for (const Part& part : parts_of(copy)) {
      if (!part.is(which)) continue;
      const Distribution& x = *part.x;
      *part.x = Distribution::exact(sign > 0 ? x.central() + x.plus() : x.central() - x.minus());
    }
    return position(copy, settings);
  };
  const auto up = moved(+1);
  const auto down = moved(-1);
  return up && down && std::isfinite(*up - *down) ? (*up - *down) / 2 : 0;
}

bool is_firm(const PlacementInput& input, const Settings& settings) {
  const Probabilities p = place(input, *settings.limits, settings.beyond);
  const Verdict verdict = verdict_of(p.conservative ? *p.conservative : *p.optimistic, settings.thresholds);
  return verdict == Verdict::inside || verdict == Verdict::outside;
}

}  // namespace

std::vector<VarianceShare> variance_shares(const PlacementInput& input, const Settings& settings) {
  PlacementInput copy = input;
  std::vector<VarianceShare> shares;
  double total = 0;
  for (const Part& part : parts_of(copy)) {
    if (part.x->is_exact()) continue;
    const double moved = swing(input, part.whose, settings);
    shares.push_back({part.whose.quantity, part.whose.scatter_of, moved * moved});
    total += moved * moved;
  }
  if (!(total > 0)) return {};
  for (VarianceShare& each : shares) each.share /= total;
  std::stable_sort(shares.begin(), shares.end(), [](const auto& a, const auto& b) { return a.share > b.share; });
  return shares;
}

std::optional<double> settling_factor(const PlacementInput& input, const VarianceShare& which,
                                      const Settings& settings) {
  const auto firm_at = [&](double factor) {
    PlacementInput copy = input;
    for (const Part& part : parts_of(copy)) {
      if (part.is(which)) *part.x = part.x->scaled(factor);
    }
    return is_firm(copy, settings);
  };
  if (firm_at(1) || !firm_at(0)) return std::nullopt;
  double firm = 0;
  double open = 1;
  while (open - firm > 0.01) {
    const double middle = (firm + open) / 2;
    (firm_at(middle) ? firm : open) = middle;
  }
  return firm > 0 ? std::optional(firm) : std::nullopt;
}

}  // namespace hz
