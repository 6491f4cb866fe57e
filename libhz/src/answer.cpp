#include "hz/answer.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "hz/constants.hpp"
#include "hz/orbit.hpp"
#include "hz/relations.hpp"
#include "hz/require.hpp"
#include "routes.hpp"

namespace hz {
namespace {

/// Set where the fits for planet masses come from; other sets were computed for 1 Earth mass, and are judged alike.
constexpr Range default_planet_masses{0.1, 5};
constexpr double evolved_log_g = 4.0;
constexpr double evolved_radius_ratio = 2.0;
/// A share of the Teff distribution that would not show in two digits is not worth a flag.
constexpr double noticeable_share = 0.001;

void set_aside(Answer& answer, const Problem& problem) {
  answer.status = Status::set_aside;
  answer.reason = problem.what;
  switch (problem.code) {
    case ProblemCode::unreadable:
      answer.reason_kind = "unreadable " + (problem.column.empty() ? "row" : problem.column);
      break;
    case ProblemCode::out_of_range: answer.reason_kind = problem.column + " out of range"; break;
    case ProblemCode::missing: answer.reason_kind = "no " + problem.column; break;
    case ProblemCode::only_a_limit: answer.reason_kind = problem.column + " is only a limit"; break;
  }
}

Problem teff_problem(const StarRecord& star) {
  if (star.teff.stated && star.teff.stated->limit != LimitMark::none) {
    return {ProblemCode::only_a_limit, "teff", "teff is only a limit, and the limits of the zone need a value"};
  }
  return {ProblemCode::missing, "teff", "no effective temperature (teff)"};
}

/// Teff, or its problem; a set without a Teff range can do without one.
Result<std::optional<Input>> take_teff(const Inputs& inputs, const StarRecord& star, const LimitSet& set) {
  const auto teff = inputs.take(Quantity::teff, star.teff);
  if (!teff) return teff.error();
  if (!*teff && set.teff_range()) return teff_problem(star);
  return *teff;
}

std::optional<Problem> teff_refused(double teff, const LimitSet& set, BeyondRange beyond) {
  const std::optional<Range> fitted = set.teff_range();
  if (!fitted || fitted->contains(teff)) return std::nullopt;
  const double outside = teff < fitted->low ? fitted->low - teff : teff - fitted->high;
  if (beyond == BeyondRange::hold && outside <= hold_reach) return std::nullopt;
  return Problem{ProblemCode::out_of_range, "teff",
                 fmt::format("teff {:.0f} K lies {:.0f} K outside the fits of {} ({:.0f}-{:.0f} K){}", teff, outside,
                             set.key, fitted->low, fitted->high,
                             beyond == BeyondRange::hold ? ", farther than the 300 K over which a limit is held"
                                                         : ", and limits beyond them are refused")};
}

std::optional<double> radius_of(const RowInputs& row, const std::optional<Derived>& luminosity) {
  if (const auto stated = row.inputs.peek(Quantity::stellar_radius, row.star.stellar_radius)) return stated->used.value;
  if (!luminosity || !row.teff) return std::nullopt;
  return std::sqrt(luminosity->measured.value) * std::pow(constants::solar_teff / row.teff->used.value, 2);
}

/// Off the main sequence by surface gravity, or by radius for its Teff.
bool is_evolved(const RowInputs& row, const std::optional<Derived>& luminosity) {
  const Field& log_g = row.star.log_g;
  if (log_g.stated && log_g.stated->limit == LimitMark::none && log_g.stated->value < evolved_log_g) return true;
  const std::optional<double> radius = radius_of(row, luminosity);
  if (!radius || !row.teff) return false;
  const std::optional<double> main_sequence = main_sequence_radius(row.teff->used.value);
  return main_sequence && *radius > evolved_radius_ratio * *main_sequence;
}

std::optional<Derived> stated(const RowInputs& row, Quantity quantity, const Field& field) {
  const auto input = row.inputs.peek(quantity, field);
  return input ? std::optional(Derived{input->used, "stated"}) : std::nullopt;
}

std::vector<ZoneEdge> edges_of(const LimitSet& set, std::size_t limit) {
  std::vector<ZoneEdge> edges;
  if (set.optimistic && set.optimistic->inner == limit) edges.push_back(ZoneEdge::optimistic_inner);
  if (set.conservative && set.conservative->inner == limit) edges.push_back(ZoneEdge::conservative_inner);
  if (set.conservative && set.conservative->outer == limit) edges.push_back(ZoneEdge::conservative_outer);
  if (set.optimistic && set.optimistic->outer == limit) edges.push_back(ZoneEdge::optimistic_outer);
  return edges;
}

/// Central distances of every limit of the set, and what follows from them.
std::vector<LimitAtStar> limits_at(const StarAnswer& star, double teff, double planet_mass, const Settings& settings) {
  std::vector<LimitAtStar> found;
  for (std::size_t index = 0; index < settings.limits->limits.size(); ++index) {
    const FluxLimit& limit = settings.limits->limits[index];
    const Result<HeldValue> insolation = limit.insolation(teff, planet_mass, settings.beyond);
    if (!insolation) continue;
    LimitAtStar at;
    at.limit = &limit;
    at.edges = edges_of(*settings.limits, index);
    at.insolation = insolation->value;
    at.held = insolation->held;
    if (star.luminosity) {
      const double distance = std::sqrt(star.luminosity->measured.value / at.insolation);
      at.distance = Measured{distance, {}, {}, LimitMark::none, false};
      if (star.stellar_mass) at.period = period_of(distance, star.stellar_mass->measured.value);
      if (star.distance) at.angular_separation = 1000 * distance / star.distance->measured.value;
    }
    found.push_back(std::move(at));
  }
  return found;
}

/// ln of the light at 1 au, as a placement input: what the distances of the limits hang on.
PlacementInput light_input(const Route& light, const std::optional<Input>& teff) {
  PlacementInput input;
  input.offset = light.offset;
  input.terms = light.terms;
  input.teff_power = light.teff_power;
  input.teff = teff ? teff->x : Distribution::exact(constants::solar_teff);
  return input;
}

/// The limits' distances follow ln(L / S_limit) / 2.
void add_half_widths(Answer& answer, const PlacementInput& light, const Settings& settings) {
  for (LimitAtStar& at : answer.limits) {
    if (!at.distance) continue;
    const auto half = [&](Towards towards) { return log_margin_width(light, *at.limit, settings.beyond, towards) / 2; };
    at.distance->minus = -at.distance->value * std::expm1(-half(Towards::colder));
    at.distance->plus = at.distance->value * std::expm1(half(Towards::hotter));
  }
}

/// Inputs far beyond anything real carry products out of the range of numbers; such a row has no answer.
std::optional<Problem> not_a_number(Quantity quantity, double value) {
  if (std::isfinite(value) && value > 0) return std::nullopt;
  return Problem{
      ProblemCode::out_of_range, std::string(name(quantity)),
      fmt::format("{} cannot be computed: the row's values carry it out of the range of numbers", name(quantity))};
}

/// A row being answered: its inputs and the flags they raise.
struct Work {
  Work(const ListRow& list_row, const Settings& chosen)
      : settings(chosen), row{list_row.star, list_row.planet, settings, Inputs(settings, flags), std::nullopt} {}
  Work(const Work&) = delete;
  Work& operator=(const Work&) = delete;
  ~Work() = default;

  Flags flags;
  const Settings& settings;
  RowInputs row;
  std::optional<Route> light;
};

/// The star's part: Teff, luminosity, evolved, held. Returns the problem that sets the row aside, if any.
std::optional<Problem> answer_light(Work& work, Answer& answer) {
  const LimitSet& set = *work.settings.limits;
  const auto teff = take_teff(work.row.inputs, work.row.star, set);
  if (!teff) return teff.error();
  work.row.teff = *teff;
  if (*teff) {
    if (auto refused = teff_refused((*teff)->used.value, set, work.settings.beyond)) return refused;
    answer.star.teff = Derived{(*teff)->used, "stated"};
  }
  const std::size_t raised = work.flags.words().size();
  const auto light = luminosity_route(work.row);
  work.flags.forget_since(raised);  // whoever uses the luminosity raises its flags
  if (!light) return light.error();
  if (*light) {
    if (auto problem = not_a_number(Quantity::luminosity, (*light)->value.value)) return problem;
    work.light = **light;
    answer.star.luminosity = Derived{work.light->value, work.light->name};
  }
  answer.star.stellar_mass = stated(work.row, Quantity::stellar_mass, work.row.star.stellar_mass);
  answer.star.distance = stated(work.row, Quantity::distance, work.row.star.distance);
  return std::nullopt;
}

void raise_star_flags(Work& work, const Answer& answer) {
  if (is_evolved(work.row, answer.star.luminosity)) work.flags.raise(flag::evolved);
  const std::optional<Range> fitted = work.settings.limits->teff_range();
  if (!fitted || !work.row.teff) return;
  const Distribution& teff = work.row.teff->x;
  const double outside = teff.is_exact() ? 0 : teff.below(fitted->low) + teff.above(fitted->high);
  if (!fitted->contains(teff.central()) || outside > noticeable_share) work.flags.raise(flag::held);
}

bool states_an_orbit(const PlanetRecord& planet) {
  const auto says = [](const Field& field) { return field.stated || field.problem; };
  return says(planet.orbital_period) || says(planet.semi_major_axis) || says(planet.scaled_semi_major_axis) ||
         says(planet.insolation);
}

double central_planet_mass(const PlacementInput& input) {
  return input.planet_mass_decadic ? std::pow(10, input.planet_mass.central()) : input.planet_mass.central();
}

bool beyond_planet_mass(const PlanetMassRoute& mass, const LimitSet& set) {
  const Range fitted = set.planet_mass_range().value_or(default_planet_masses);
  return !fitted.contains(mass.limit.value_or(mass.derived.measured.value));
}

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

void judge(PlanetAnswer& planet, const PlacementInput& input, const Settings& settings) {
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

Measured averaged(const Measured& insolation, const Input& eccentricity) {
  const double e = eccentricity.used.value;
  const double up = mean_flux_factor(std::min(0.999, e + eccentricity.used.plus.value_or(0)));
  const double down = mean_flux_factor(std::max(0.0, e - eccentricity.used.minus.value_or(0)));
  const double here = mean_flux_factor(e);
  Measured result = insolation;
  result.value *= here;
  result.minus = std::hypot(insolation.minus.value_or(0) * here, insolation.value * (here - down));
  result.plus = std::hypot(insolation.plus.value_or(0) * here, insolation.value * (up - here));
  return result;
}

/// The planet's part. Returns the problem that sets the row aside, if any.
std::optional<Problem> answer_planet(Work& work, const ListRow& list_row, Answer& answer) {
  const Result<InsolationRoute> found = insolation_route(work.row);
  if (!found) return found.error();
  PlacementInput input = light_input(found->route, work.row.teff);

  Measured insolation = found->route.value;
  if (!found->averaged) {
    const Result<Input> eccentricity = work.row.inputs.eccentricity(work.row.planet.eccentricity);
    if (!eccentricity) return eccentricity.error();
    input.eccentricity = eccentricity->x;
    insolation = averaged(insolation, *eccentricity);
  }
  if (auto problem = not_a_number(Quantity::insolation, insolation.value)) return problem;
  const Result<PlanetMassRoute> mass = planet_mass_route(work.row);
  if (!mass) return mass.error();
  input.planet_mass = mass->x;
  input.planet_mass_decadic = mass->decadic;
  if (beyond_planet_mass(*mass, *work.settings.limits)) work.flags.raise(flag::beyond_planet_mass);

  PlanetAnswer planet;
  planet.insolation = {insolation, found->route.name};
  planet.semi_major_axis = found->semi_major_axis;
  planet.planet_mass = mass->derived;
  planet.probabilities = probabilities_of(input, list_row, work.settings);
  judge(planet, input, work.settings);
  answer.note = contradictions(work.row, insolation);
  answer.planet = std::move(planet);
  answer.input = std::move(input);
  return std::nullopt;
}

}  // namespace

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

const LimitAtStar* find_edge(const Answer& answer, ZoneEdge edge) {
  for (const LimitAtStar& at : answer.limits) {
    if (std::find(at.edges.begin(), at.edges.end(), edge) != at.edges.end()) return &at;
  }
  return nullptr;
}

bool is_planet(const ListRow& row) { return !row.planet.name.empty() || states_an_orbit(row.planet); }

Answer answer(const ListRow& row, const Settings& settings) {
  HZ_REQUIRE(settings.limits != nullptr && settings.limits->bounds_a_zone());
  if (!is_planet(row)) return answer_star(row, settings);
  Answer answer;
  Work work(row, settings);
  std::optional<Problem> problem = row.problem;
  if (!problem) problem = answer_light(work, answer);
  if (!problem) problem = answer_planet(work, row, answer);
  if (problem) {
    set_aside(answer, *problem);
  } else {
    raise_star_flags(work, answer);
    const double teff = work.row.teff ? work.row.teff->used.value : constants::solar_teff;
    answer.limits = limits_at(answer.star, teff, central_planet_mass(*answer.input), settings);
  }
  answer.flags = work.flags.words();
  return answer;
}

Answer answer_star(const ListRow& row, const Settings& settings) {
  HZ_REQUIRE(settings.limits != nullptr);
  Answer answer;
  Work work(row, settings);
  std::optional<Problem> problem = row.problem;
  if (!problem) problem = answer_light(work, answer);
  if (!problem && !work.light) problem = no_luminosity(row.star);
  if (problem) {
    set_aside(answer, *problem);
  } else {
    static_cast<void>(luminosity_route(work.row));  // raises the flags of what it uses
    raise_star_flags(work, answer);
    const double teff = work.row.teff ? work.row.teff->used.value : constants::solar_teff;
    answer.limits = limits_at(answer.star, teff, 1, settings);
    add_half_widths(answer, light_input(*work.light, work.row.teff), settings);
  }
  answer.flags = work.flags.words();
  return answer;
}

}  // namespace hz
