#include <cmath>
#include <nlohmann/json.hpp>

#include "check_page.hpp"
#include "hz/ranked_table.hpp"

namespace hz::app {
namespace {

using Json = nlohmann::ordered_json;

Json number(const std::optional<double>& x) { return x && std::isfinite(*x) ? Json(six_digits(*x)) : Json(); }

Json probability(const std::optional<double>& p) { return p ? Json(std::round(*p * 1e6) / 1e6) : Json(); }

template <class Word>
Json words(const std::optional<Word>& value) {
  return value ? Json(word(*value)) : Json();
}

Json derived(const std::optional<Derived>& quantity, const char* unit) {
  if (!quantity) return {};
  return {{"value", number(quantity->measured.value)},
          {"err_minus", number(quantity->measured.minus)},
          {"err_plus", number(quantity->measured.plus)},
          {"unit", unit},
          {"route", quantity->route}};
}

Json limits_of(const CheckReport& report) {
  Json all = Json::array();
  for (const LimitLine& line : report.limits) {
    all.push_back({{"limit", line.limit->key()},
                   {"insolation", number(line.insolation)},
                   {"held", line.held},
                   {"distance_au", number(line.limit_distance)},
                   {"margin_distance_au", number(line.margin_distance)},
                   {"margin_widths", number(line.margin_widths)}});
  }
  return all;
}

Json alternatives_of(const CheckReport& report) {
  Json all = Json::array();
  for (const Alternative& each : report.alternatives) {
    all.push_back({{"what", each.what},
                   {"verdict_conservative", words(each.conservative)},
                   {"verdict_optimistic", words(each.optimistic)},
                   {"changes_a_verdict", each.changes()}});
  }
  return all;
}

Json shares_of(const CheckReport& report) {
  Json all = Json::object();
  for (const VarianceShare& each : report.shares)
    all[each.scatter_of.empty() ? std::string(name(each.quantity)) : "scatter of " + std::string(each.scatter_of)] =
        number(each.share);
  return all;
}

}  // namespace

std::string check_json(const CheckReport& report) {
  const Answer& answer = report.answer;
  const PlanetAnswer& planet = *answer.planet;
  const LimitSet& set = *report.settings.limits;
  const Json json = {{"planet", report.row.planet.name},
                     {"star", report.row.star.name},
                     {"verdict_conservative", words(planet.conservative)},
                     {"verdict_optimistic", words(planet.optimistic)},
                     {"side", words(planet.side)},
                     {"p_conservative", probability(planet.probabilities.conservative)},
                     {"p_optimistic", probability(planet.probabilities.optimistic)},
                     {"p_too_hot", probability(planet.probabilities.too_hot)},
                     {"p_too_cold", probability(planet.probabilities.too_cold)},
                     {"p_unanswered", probability(planet.probabilities.unanswered)},
                     {"zone_position", number(planet.zone_position)},
                     {"orbit_share", probability(planet.orbit_share)},
                     {"insolation", derived(planet.insolation, "S of the Earth")},
                     {"semi_major_axis", derived(planet.semi_major_axis, "au")},
                     {"planet_mass", derived(planet.planet_mass, "Earth masses")},
                     {"planet_radius", derived(planet.planet_radius, "Earth radii")},
                     {"teff", derived(answer.star.teff, "K")},
                     {"luminosity", derived(answer.star.luminosity, "solar")},
                     {"stellar_radius", derived(answer.star.stellar_radius, "solar")},
                     {"stellar_mass", derived(answer.star.stellar_mass, "solar")},
                     {"distance", derived(answer.star.distance, "pc")},
                     {"equilibrium_temperature_k", number(planet.equilibrium_temperature)},
                     {"bond_albedo", number(report.settings.bond_albedo)},
                     {"limits", limits_of(report)},
                     {"alternatives", alternatives_of(report)},
                     {"variance_shares", shares_of(report)},
                     {"settling_factor", number(report.settling_factor)},
                     {"flags", answer.flags},
                     {"note", answer.note.empty() ? Json() : Json(answer.note)},
                     {"limit_set", set.key},
                     {"asymmetry", report.settings.asymmetry == Asymmetry::median ? "median" : "mode"},
                     {"citation", set.citation},
                     {"doi", set.doi}};
  // Names come from the user's file; bytes that are not UTF-8 are replaced rather than refused.
  return json.dump(2, ' ', false, Json::error_handler_t::replace) + "\n";
}

}  // namespace hz::app
