#include "routes.hpp"

#include <algorithm>
#include <cmath>

#include "hz/constants.hpp"
#include "hz/orbit.hpp"
#include "hz/relations.hpp"

namespace hz {
namespace {

constexpr double ln10 = 2.302585092994045684;

InsolationTerm term(Quantity quantity, const Input& input, double power, bool decadic = false) {
  return {quantity, input.x, power, decadic};
}

using MaybeRoute = Result<std::optional<Route>>;

MaybeRoute stated_luminosity(const RowInputs& row) {
  const auto linear = row.inputs.take(Quantity::luminosity, row.star.luminosity);
  if (!linear) return linear.error();
  if (*linear) return std::optional(Route{"stated", 0, 0, {term(Quantity::luminosity, **linear, 1)}, (*linear)->used});
  const auto decadic = row.inputs.take(Quantity::log_luminosity, row.star.log_luminosity);
  if (!decadic) return decadic.error();
  if (!*decadic) return std::optional<Route>();
  return std::optional(Route{"stated logarithm",
                             0,
                             0,
                             {term(Quantity::log_luminosity, **decadic, 1, true)},
                             product(1, {{(*decadic)->used, 1, true}})});
}

MaybeRoute luminosity_from_radius(const RowInputs& row) {
  if (!row.teff) return std::optional<Route>();
  const auto radius = row.inputs.take(Quantity::stellar_radius, row.star.stellar_radius);
  if (!radius) return radius.error();
  if (!*radius) return std::optional<Route>();
  const double offset = -4 * std::log(constants::solar_teff);
  return std::optional(Route{"stellar_radius and teff",
                             offset,
                             4,
                             {term(Quantity::stellar_radius, **radius, 2)},
                             product(std::exp(offset), {{(*radius)->used, 2}, {row.teff->used, 4}})});
}

MaybeRoute orbit_from_period(const RowInputs& row) {
  const auto period = row.inputs.take(Quantity::orbital_period, row.planet.orbital_period);
  if (!period) return period.error();
  if (!*period) return std::optional<Route>();
  const auto mass = row.inputs.take(Quantity::stellar_mass, row.star.stellar_mass);
  if (!mass) return mass.error();
  if (!*mass) return std::optional<Route>();
  const double years = 1 / constants::period_1au_d;
  return std::optional(
      Route{"orbital_period and stellar_mass",
            -4.0 / 3 * std::log(years),
            0,
            {term(Quantity::orbital_period, **period, -4.0 / 3), term(Quantity::stellar_mass, **mass, -2.0 / 3)},
            product(std::cbrt(years * years), {{(*period)->used, 2.0 / 3}, {(*mass)->used, 1.0 / 3}})});
}

MaybeRoute stated_orbit(const RowInputs& row) {
  const auto axis = row.inputs.take(Quantity::semi_major_axis, row.planet.semi_major_axis);
  if (!axis) return axis.error();
  if (!*axis) return std::optional<Route>();
  return std::optional(Route{"stated", 0, 0, {term(Quantity::semi_major_axis, **axis, -2)}, (*axis)->used});
}

MaybeRoute orbit_from_scaled(const RowInputs& row) {
  const auto scaled = row.inputs.take(Quantity::scaled_semi_major_axis, row.planet.scaled_semi_major_axis);
  if (!scaled) return scaled.error();
  if (!*scaled) return std::optional<Route>();
  const auto radius = row.inputs.take(Quantity::stellar_radius, row.star.stellar_radius);
  if (!radius) return radius.error();
  if (!*radius) return std::optional<Route>();
  return std::optional(
      Route{"scaled_semi_major_axis and stellar_radius",
            2 * std::log(constants::au_in_solar_radii),
            0,
            {term(Quantity::scaled_semi_major_axis, **scaled, -2), term(Quantity::stellar_radius, **radius, -2)},
            product(1 / constants::au_in_solar_radii, {{(*scaled)->used, 1}, {(*radius)->used, 1}})});
}

/// The first of some ways that leads anywhere.
template <class... Ways>
MaybeRoute first_of(const RowInputs& row, Ways... ways) {
  MaybeRoute found = std::optional<Route>();
  for (const auto way : {ways...}) {
    found = way(row);
    if (!found || *found) return found;
  }
  return found;
}

bool is_from_scaled(const Route& orbit) { return orbit.terms.front().quantity == Quantity::scaled_semi_major_axis; }

Result<std::optional<InsolationRoute>> from_luminosity_and_orbit(const RowInputs& row) {
  const MaybeRoute light = luminosity_route(row);
  if (!light) return light.error();
  if (!*light) return std::optional<InsolationRoute>();
  const MaybeRoute orbit = orbit_route(row);
  if (!orbit) return orbit.error();
  if (!*orbit) return std::optional<InsolationRoute>();
  // With L from the radius and a from a/R the radius cancels: the next route says the same with less error.
  if ((*light)->teff_power > 0 && is_from_scaled(**orbit)) return std::optional<InsolationRoute>();

  InsolationRoute found;
  found.luminosity = Derived{(*light)->value, (*light)->name};
  found.semi_major_axis = Derived{(*orbit)->value, (*orbit)->name};
  found.route = **light;
  found.route.name = "luminosity and semi_major_axis";
  found.route.offset += (*orbit)->offset;
  found.route.terms.insert(found.route.terms.end(), (*orbit)->terms.begin(), (*orbit)->terms.end());
  found.route.value = product(1, {{(*light)->value, 1}, {(*orbit)->value, -2}});
  return std::optional(found);
}

Result<std::optional<InsolationRoute>> from_scaled_and_teff(const RowInputs& row) {
  if (!row.teff) return std::optional<InsolationRoute>();
  const auto scaled = row.inputs.take(Quantity::scaled_semi_major_axis, row.planet.scaled_semi_major_axis);
  if (!scaled) return scaled.error();
  if (!*scaled) return std::optional<InsolationRoute>();
  const double offset = 2 * std::log(constants::au_in_solar_radii) - 4 * std::log(constants::solar_teff);
  InsolationRoute found;
  found.route = {"scaled_semi_major_axis and teff",
                 offset,
                 4,
                 {term(Quantity::scaled_semi_major_axis, **scaled, -2)},
                 product(std::exp(offset), {{(*scaled)->used, -2}, {row.teff->used, 4}})};
  // The radius cancels from the insolation, but it still says how many au that is.
  if (const auto radius = row.inputs.peek(Quantity::stellar_radius, row.star.stellar_radius)) {
    found.semi_major_axis =
        Derived{product(1 / constants::au_in_solar_radii, {{(*scaled)->used, 1}, {radius->used, 1}}),
                "scaled_semi_major_axis and stellar_radius"};
  }
  return std::optional(found);
}

Result<std::optional<InsolationRoute>> stated_insolation(const RowInputs& row) {
  const auto stated = row.inputs.take(Quantity::insolation, row.planet.insolation);
  if (!stated) return stated.error();
  if (!*stated) return std::optional<InsolationRoute>();
  InsolationRoute found;
  found.route = {"stated", 0, 0, {term(Quantity::insolation, **stated, 1)}, (*stated)->used};
  found.averaged = true;
  return std::optional(found);
}

using NamedFields = std::vector<std::pair<Quantity, const Field*>>;

/// The first of these fields that is only a limit, as the reason why a row has no answer.
std::optional<Problem> only_a_limit(const NamedFields& fields) {
  for (const auto& [quantity, field] : fields) {
    if (!field->stated || field->stated->limit == LimitMark::none) continue;
    const std::string column(name(quantity));
    return Problem{ProblemCode::only_a_limit, column, column + " is only a limit, and nothing else stands in for it"};
  }
  return std::nullopt;
}

NamedFields light_fields(const StarRecord& star) {
  return {{Quantity::luminosity, &star.luminosity},
          {Quantity::log_luminosity, &star.log_luminosity},
          {Quantity::stellar_radius, &star.stellar_radius}};
}

NamedFields orbit_fields(const RowInputs& row) {
  return {{Quantity::semi_major_axis, &row.planet.semi_major_axis},
          {Quantity::orbital_period, &row.planet.orbital_period},
          {Quantity::stellar_mass, &row.star.stellar_mass}};
}

Problem no_insolation(const RowInputs& row) {
  const MaybeRoute light = luminosity_route(row);
  const bool dark = light && !*light;
  NamedFields fields = dark ? light_fields(row.star) : orbit_fields(row);
  fields.emplace_back(Quantity::scaled_semi_major_axis, &row.planet.scaled_semi_major_axis);
  fields.emplace_back(Quantity::insolation, &row.planet.insolation);
  if (auto limit = only_a_limit(fields)) return *limit;
  return {ProblemCode::missing, dark ? "luminosity" : "semi_major_axis",
          dark ? "no luminosity (luminosity, log_luminosity, or stellar_radius with teff), and neither "
                 "scaled_semi_major_axis nor insolation"
               : "no orbit (semi_major_axis, orbital_period with stellar_mass, or scaled_semi_major_axis), and no "
                 "insolation"};
}

}  // namespace

Problem no_luminosity(const StarRecord& star) {
  return only_a_limit(light_fields(star))
      .value_or(Problem{ProblemCode::missing, "luminosity",
                        "no luminosity (luminosity, log_luminosity, or stellar_radius with teff)"});
}

Measured product(double constant, const std::vector<Factor>& factors) {
  double log_value = std::log(constant);
  double below = 0;
  double above = 0;
  for (const Factor& factor : factors) {
    const double value = factor.value.value;
    const double scale = factor.decadic ? ln10 : 1 / value;
    log_value += factor.power * (factor.decadic ? ln10 * value : std::log(value));
    const double minus = std::abs(factor.power) * scale * factor.value.minus.value_or(0);
    const double plus = std::abs(factor.power) * scale * factor.value.plus.value_or(0);
    below = std::hypot(below, factor.power > 0 ? minus : plus);
    above = std::hypot(above, factor.power > 0 ? plus : minus);
  }
  Measured result;
  result.value = std::exp(log_value);
  result.minus = result.value * std::min(1.0, below);
  result.plus = result.value * above;
  return result;
}

MaybeRoute luminosity_route(const RowInputs& row) {
  if (row.settings.luminosity_from == LuminosityFrom::radius)
    return first_of(row, luminosity_from_radius, stated_luminosity);
  return first_of(row, stated_luminosity, luminosity_from_radius);
}

MaybeRoute orbit_route(const RowInputs& row) {
  if (row.settings.semi_major_axis_from == SemiMajorAxisFrom::stated) {
    return first_of(row, stated_orbit, orbit_from_period, orbit_from_scaled);
  }
  return first_of(row, orbit_from_period, stated_orbit, orbit_from_scaled);
}

Result<InsolationRoute> insolation_route(const RowInputs& row) {
  const bool stated_first = row.settings.insolation_from == InsolationFrom::stated;
  for (const auto way : {stated_first ? stated_insolation : from_luminosity_and_orbit,
                         stated_first ? from_luminosity_and_orbit : from_scaled_and_teff,
                         stated_first ? from_scaled_and_teff : stated_insolation}) {
    const std::size_t raised = row.inputs.flags().words().size();
    const Result<std::optional<InsolationRoute>> found = way(row);
    if (!found) return found.error();
    if (*found) return **found;
    row.inputs.flags().forget_assumptions_since(raised);
  }
  return no_insolation(row);
}

}  // namespace hz
