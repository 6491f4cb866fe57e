#include "hz/answer.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "contradictions.hpp"
#include "hz/companions.hpp"
#include "hz/constants.hpp"
#include "hz/orbit.hpp"
#include "hz/relations.hpp"
#include "hz/require.hpp"
#include "judgement.hpp"
#include "planet_mass_route.hpp"
#include "resolver.hpp"

namespace hz {
namespace {

/// Set where the fits for planet masses come from; other sets were computed for 1 Earth mass, and are judged alike.
constexpr Range default_planet_masses{0.1, 5};
constexpr double evolved_log_g = 4.0;
constexpr double evolved_radius_ratio = 2.0;
/// A star this much smaller than the main sequence at its Teff is none of it: a white dwarf, or a wrong colour.
constexpr double too_small = 0.4;
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

/// Why relations that could have helped were not used.
std::string because(const Resolver& resolver) {
  const std::string why = resolver.off_main_sequence();
  return why.empty() ? why : "; the star is " + why;
}

Problem no_teff(const Resolver& resolver) {
  const std::optional<Measured>& stated = resolver.row().star.teff.stated;
  if (stated && stated->limit != LimitMark::none) {
    return {ProblemCode::only_a_limit, "teff",
            "teff is only a limit, and nothing else leads to it" + because(resolver)};
  }
  return {ProblemCode::missing, "teff",
          "no effective temperature (teff), and no colour, spectral_type or other value within the range of a relation "
          "that leads to it" +
              because(resolver)};
}

using NamedFields = std::initializer_list<std::pair<Quantity, const Field*>>;

/// The first of these fields that is only a limit, as the reason why a row has no answer.
std::optional<Problem> only_a_limit(NamedFields fields) {
  for (const auto& [quantity, field] : fields) {
    if (!field->stated || field->stated->limit == LimitMark::none) continue;
    const std::string column(name(quantity));
    return Problem{ProblemCode::only_a_limit, column, column + " is only a limit, and nothing else stands in for it"};
  }
  return std::nullopt;
}

std::optional<Problem> light_only_a_limit(const StarRecord& star) {
  return only_a_limit({{Quantity::luminosity, &star.luminosity},
                       {Quantity::log_luminosity, &star.log_luminosity},
                       {Quantity::stellar_radius, &star.stellar_radius}});
}

std::optional<Problem> orbit_only_a_limit(const ListRow& row) {
  return only_a_limit({{Quantity::semi_major_axis, &row.planet.semi_major_axis},
                       {Quantity::orbital_period, &row.planet.orbital_period},
                       {Quantity::stellar_mass, &row.star.stellar_mass}});
}

std::optional<Problem> insolation_only_a_limit(const PlanetRecord& planet) {
  return only_a_limit(
      {{Quantity::scaled_semi_major_axis, &planet.scaled_semi_major_axis}, {Quantity::insolation, &planet.insolation}});
}

Problem no_luminosity(const Resolver& resolver) {
  if (auto limit = light_only_a_limit(resolver.row().star)) return *limit;
  return {
      ProblemCode::missing, "luminosity",
      "no luminosity (luminosity, log_luminosity, stellar_radius with teff, or a magnitude with distance or parallax)" +
          because(resolver)};
}

Problem no_insolation(const Resolver& resolver, bool dark) {
  const ListRow& row = resolver.row();
  std::optional<Problem> limit = dark ? light_only_a_limit(row.star) : orbit_only_a_limit(row);
  if (!limit) limit = insolation_only_a_limit(row.planet);
  if (limit) return *limit;
  if (!dark) {
    return {
        ProblemCode::missing, "semi_major_axis",
        "no orbit (semi_major_axis, orbital_period with a stellar mass, or scaled_semi_major_axis), and no insolation"};
  }
  return {ProblemCode::missing, "luminosity",
          "no luminosity (luminosity, log_luminosity, stellar_radius with teff, or a magnitude with distance or "
          "parallax), and neither scaled_semi_major_axis nor insolation" +
              because(resolver)};
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

/// A row being answered: what follows from it and the flags it raises.
struct Work {
  Work(const ListRow& list_row, const Settings& chosen) : settings(chosen), resolver(list_row, chosen, flags) {}
  Work(const Work&) = delete;
  Work& operator=(const Work&) = delete;
  ~Work() = default;

  [[nodiscard]] const Form* teff_form() const { return teff != nullptr ? &teff->form : nullptr; }
  [[nodiscard]] Derived derived(const Form& form) {
    return {exponential(form, teff_form(), resolver.sources()), form.route};
  }
  [[nodiscard]] std::optional<Derived> derived(Quantity quantity) {
    const Resolver::Quiet quiet(resolver);
    const std::optional<Form> form = resolver.find(quantity);
    return form ? std::optional(derived(*form)) : std::nullopt;
  }
  [[nodiscard]] PlacementInput input(const Form& form) {
    const Distribution sun = Distribution::exact(constants::solar_teff);
    return placement_input(form, teff_form(), teff != nullptr ? teff->x : sun, resolver.sources());
  }
  [[nodiscard]] double central_teff() const { return teff != nullptr ? teff->used.value : constants::solar_teff; }

  Flags flags;
  const Settings& settings;
  Resolver resolver;
  const TeffInput* teff = nullptr;
  std::optional<Form> light;
};

/// Teff. Returns the problem that sets the row aside, if any; a set without a Teff range can do without one.
std::optional<Problem> answer_teff(Work& work, Answer& answer) {
  const LimitSet& set = *work.settings.limits;
  work.teff = work.resolver.teff();
  if (work.resolver.problem()) return work.resolver.problem();
  if (work.teff == nullptr) return set.teff_range() ? std::optional(no_teff(work.resolver)) : std::nullopt;
  if (auto refused = teff_refused(work.teff->used.value, set, work.settings.beyond)) return refused;
  work.resolver.raise(work.teff->form);
  answer.star.teff = Derived{work.teff->used, work.teff->form.route};
  return std::nullopt;
}

/// Radius over that of the main sequence at the same Teff, when the star's light says so.
std::optional<double> radius_ratio(const Work& work, const Answer& answer) {
  if (work.teff == nullptr || !answer.star.stellar_radius) return std::nullopt;
  const std::optional<double> main_sequence = main_sequence_radius(work.teff->used.value);
  return main_sequence ? std::optional(answer.star.stellar_radius->measured.value / *main_sequence) : std::nullopt;
}

/// Colours and magnitudes of a white dwarf read like those of a faint dwarf star; its size gives it away.
std::optional<Problem> below_main_sequence(const Work& work, const Answer& answer) {
  const bool by_relation =
      (work.teff != nullptr && work.teff->form.marks.main_sequence) || (work.light && work.light->marks.main_sequence);
  const std::optional<double> ratio = radius_ratio(work, answer);
  if (!by_relation || !ratio || *ratio > too_small) return std::nullopt;
  return Problem{
      ProblemCode::out_of_range, "luminosity",
      fmt::format("luminosity by {} makes the star {:.2g} times the size of a main-sequence star of {:.0f} K "
                  "({}): a white dwarf, or a wrong colour, type, magnitude or distance",
                  answer.star.luminosity ? answer.star.luminosity->route : "", *ratio, work.teff->used.value,
                  work.teff->form.route)};
}

/// The star's part. Returns the problem that sets the row aside, if any.
std::optional<Problem> answer_light(Work& work, Answer& answer) {
  if (auto problem = answer_teff(work, answer)) return problem;
  work.light = work.resolver.find(Quantity::luminosity);
  if (work.resolver.problem()) return work.resolver.problem();
  if (work.light) {
    answer.star.luminosity = work.derived(*work.light);
    if (auto problem = not_a_number(Quantity::luminosity, answer.star.luminosity->measured.value)) return problem;
  }
  answer.star.stellar_radius = work.derived(Quantity::stellar_radius);
  answer.star.stellar_mass = work.derived(Quantity::stellar_mass);
  answer.star.distance = work.derived(Quantity::distance);
  return below_main_sequence(work, answer);
}

/// Off the main sequence by spectral type, by surface gravity, or by radius for its Teff.
bool is_evolved(const Work& work, const Answer& answer) {
  const StarRecord& star = work.resolver.row().star;
  const std::optional<SpectralType>& type = work.resolver.type();
  if (type && (type->kind == StarKind::giant || type->kind == StarKind::white_dwarf)) return true;
  if (star.log_g.stated && star.log_g.stated->limit == LimitMark::none && star.log_g.stated->value < evolved_log_g)
    return true;
  return radius_ratio(work, answer).value_or(1) > evolved_radius_ratio;
}

void raise_star_flags(Work& work, const Answer& answer) {
  if (is_evolved(work, answer)) work.flags.raise(flag::evolved);
  const std::optional<Range> fitted = work.settings.limits->teff_range();
  if (!fitted || work.teff == nullptr) return;
  const Distribution& teff = work.teff->x;
  const double outside = teff.is_exact() ? 0 : teff.below(fitted->low) + teff.above(fitted->high);
  if (!fitted->contains(teff.central()) || outside > noticeable_share) work.flags.raise(flag::held);
}

/// What the list says of other stars; a close one leaves no verdict firm. After the limits, whose outermost it needs.
void heed_companions(Work& work, Answer& answer) {
  std::optional<double> outer;
  for (const LimitAtStar& at : answer.limits) {
    if (at.distance && !at.edges.empty()) outer = std::max(outer.value_or(0), at.distance->value);
  }
  const ListRow& row = work.resolver.row();
  const std::optional<Derived>& distance = answer.star.distance;
  const Companions companions =
      companions_of(row.star, row.planet, distance ? std::optional(distance->measured.value) : std::nullopt, outer);
  if (!companions.present) return;
  work.flags.raise(flag::companion);
  if (!companions.close) return;
  work.flags.raise(flag::close_companion);
  if (answer.planet) soften(*answer.planet);
}

bool states_an_orbit(const PlanetRecord& planet) {
  const auto says = [](const Field& field) { return field.stated || field.problem; };
  return says(planet.orbital_period) || says(planet.semi_major_axis) || says(planet.scaled_semi_major_axis) ||
         says(planet.insolation);
}

bool beyond_planet_mass(const PlanetMassRoute& mass, const LimitSet& set) {
  const Range fitted = set.planet_mass_range().value_or(default_planet_masses);
  return !fitted.contains(mass.limit.value_or(mass.derived.measured.value));
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

/// What a planet of this mass measures on average; nothing for a mass that is itself a guess.
std::optional<Derived> radius_from_mass(const Derived& mass) {
  if (mass.route == assumed_route) return std::nullopt;
  const Measured decadic = log_radius_from_mass(mass.measured);
  const double radius = std::pow(10, decadic.value);
  return Derived{{radius, radius - std::pow(10, decadic.value - decadic.minus.value_or(0)),
                  std::pow(10, decadic.value + decadic.plus.value_or(0)) - radius, LimitMark::none, false},
                 "planet_mass (Chen & Kipping 2017)"};
}

/// The planet's part. Returns the problem that sets the row aside, if any.
std::optional<Problem> answer_planet(Work& work, Answer& answer) {
  Resolver& resolver = work.resolver;
  const std::optional<Form> form = resolver.find(Quantity::insolation);
  if (resolver.problem()) return resolver.problem();
  if (!form) return no_insolation(resolver, !work.light);
  resolver.raise(*form);
  PlacementInput input = work.input(*form);

  PlanetAnswer planet;
  planet.insolation = work.derived(*form);
  const ListRow& row = resolver.row();
  if (form->route != "stated") {
    const Result<Input> eccentricity = resolver.inputs().eccentricity(row.planet.eccentricity);
    if (!eccentricity) return eccentricity.error();
    input.eccentricity = eccentricity->x;
    planet.insolation.measured = averaged(planet.insolation.measured, *eccentricity);
  }
  if (auto problem = not_a_number(Quantity::insolation, planet.insolation.measured.value)) return problem;
  const Result<PlanetMassRoute> mass = planet_mass_route(resolver);
  if (!mass) return mass.error();
  input.planet_mass = mass->x;
  input.planet_mass_decadic = mass->decadic;
  if (beyond_planet_mass(*mass, *work.settings.limits)) work.flags.raise(flag::beyond_planet_mass);

  planet.semi_major_axis = work.derived(Quantity::semi_major_axis);
  planet.planet_radius = work.derived(Quantity::planet_radius);
  planet.planet_mass = mass->derived;
  if (!planet.planet_radius && !row.planet.planet_radius.stated) planet.planet_radius = radius_from_mass(mass->derived);
  judge(planet, input, row, work.settings);
  answer.note = contradictions(resolver, &planet.insolation.measured);
  answer.planet = std::move(planet);
  answer.input = std::move(input);
  return std::nullopt;
}

}  // namespace

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
  if (!problem) problem = answer_planet(work, answer);
  if (problem) {
    set_aside(answer, *problem);
  } else {
    raise_star_flags(work, answer);
    answer.limits = limits_at(answer.star, work.central_teff(), central_planet_mass(*answer.input), settings);
    heed_companions(work, answer);
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
  if (!problem && !work.light) problem = no_luminosity(work.resolver);
  if (problem) {
    set_aside(answer, *problem);
  } else {
    work.resolver.raise(*work.light);
    raise_star_flags(work, answer);
    answer.limits = limits_at(answer.star, work.central_teff(), 1, settings);
    add_half_widths(answer, work.input(*work.light), settings);
    heed_companions(work, answer);
    answer.note = contradictions(work.resolver, nullptr);
  }
  answer.flags = work.flags.words();
  return answer;
}

}  // namespace hz
