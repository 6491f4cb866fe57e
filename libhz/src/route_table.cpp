// The table of routes: what leads where, best first. Words and ways side by side, so that neither can run ahead.
#include "route_table.hpp"

#include "hz/routes.hpp"
#include "ways.hpp"

namespace hz {
namespace {

struct Line {
  RouteInfo info;
  std::string_view family;
  Way way;
};

constexpr std::string_view as_it_stands = "as it stands in the list";
constexpr std::string_view stefan_boltzmann = "Stefan-Boltzmann law";
constexpr std::string_view kepler = "Kepler's third law";
constexpr std::string_view chen_kipping = "Chen & Kipping 2017, with its scatter";
constexpr std::string_view gravity = "g = G M / R^2";

const std::vector<Line>& lines() {
  using enum Quantity;
  using namespace ways;
  static const std::vector<Line> all = {
      {{teff, "teff", as_it_stands, {}, ""}, "stated", stated_teff},
      {{teff, "luminosity and stellar_radius", stefan_boltzmann, {}, "both stated"},
       "radius",
       teff_from_luminosity_and_radius},
      {{teff,
        "color_vk, or magnitude_v and magnitude_k",
        "",
        {"teff_vk_boyajian13", "teff_vk_pm13"},
        "the first below V-Ks 3.0, the second above"},
       "color",
       teff_from_vk},
      {{teff, "color_vj, or magnitude_v and magnitude_j", "", {"teff_vj_mann15", "teff_vj_boyajian13"}, ""},
       "color",
       teff_from_vj},
      {{teff, "color_bp_rp, or magnitude_bp and magnitude_rp", "", {"teff_bprp_pm13"}, ""}, "color", teff_from_bp_rp},
      {{teff, "spectral_type", "", {"teff_subtype_pm13"}, ""}, "spectral_type", teff_from_type},
      {{teff, "color_bv, or magnitude_b and magnitude_v", "", {"teff_bv_torres10", "teff_bv_boyajian13"}, ""},
       "color",
       teff_from_bv},
      {{teff, "magnitude_k and distance", "", {"teff_mk_pm13"}, ""}, "photometry", teff_from_absolute_k},
      {{teff, "stellar_mass", "", {"teff_mass_pm13"}, ""}, "mass", teff_from_mass},

      {{luminosity, "luminosity", as_it_stands, {}, ""}, "stated", stated_luminosity},
      {{luminosity, "log_luminosity", as_it_stands, {}, ""}, "stated", stated_log_luminosity},
      {{luminosity, "stellar_radius and teff", stefan_boltzmann, {}, "the radius stated"},
       "radius",
       luminosity_from_radius},
      {{luminosity, "magnitude_bol and distance", "IAU 2015 Resolution B2 zero point", {}, ""},
       "photometry",
       luminosity_from_bolometric},
      {{luminosity, "magnitude_v, color_vk and distance", "", {"bc_v_pm13_vk"}, "teff up to 4000 K"},
       "photometry",
       luminosity_from_v_and_vk},
      {{luminosity, "magnitude_v, distance and teff", "", {"bc_v_flower96"}, ""}, "photometry", luminosity_from_hot_v},
      {{luminosity, "magnitude_j, color_vj and distance", "", {"bc_j_mann15"}, ""}, "photometry", luminosity_from_j},
      {{luminosity, "magnitude_g, distance and teff", "", {"bc_g_andrae18"}, ""}, "photometry", luminosity_from_g},
      {{luminosity, "magnitude_v, distance and teff", "", {"bc_v_pm13_teff"}, ""},
       "photometry",
       luminosity_from_cool_v},
      {{luminosity, "magnitude_k, distance and teff", stefan_boltzmann, {"stellar_radius_mk_mann15"}, ""},
       "photometry",
       luminosity_from_derived_radius},
      {{luminosity, "spectral_type", "", {"log_luminosity_subtype_pm13"}, ""}, "spectral_type", luminosity_from_type},
      {{luminosity, "stellar_mass", "", {"log_luminosity_mass_eker18"}, ""}, "mass", luminosity_from_mass},

      {{stellar_radius, "stellar_radius", as_it_stands, {}, ""}, "stated", stated_radius},
      {{stellar_radius, "magnitude_k and distance", "", {"stellar_radius_mk_mann15"}, ""},
       "photometry",
       radius_from_absolute_k},
      {{stellar_radius, "luminosity and teff", stefan_boltzmann, {}, ""}, "radius", radius_from_light},
      {{stellar_radius, "log_g and stellar_mass", gravity, {}, ""}, "gravity", radius_from_log_g},
      {{stellar_radius, "stellar_mass", "", {"stellar_radius_mass_eker18", "radius_mass_pm13"}, ""},
       "mass",
       radius_from_mass},

      {{stellar_mass, "stellar_mass", as_it_stands, {}, ""}, "stated", stated_mass},
      {{stellar_mass, "magnitude_k and distance", "", {"log_stellar_mass_mk_mann19"}, ""},
       "photometry",
       mass_from_absolute_k},
      {{stellar_mass, "stellar_density and stellar_radius", "density = M / volume", {}, "the radius stated"},
       "density",
       mass_from_density},
      {{stellar_mass, "scaled_semi_major_axis, orbital_period and stellar_radius", kepler, {}, "the radius stated"},
       "density",
       mass_from_transit},
      {{stellar_mass, "luminosity", "", {"log_stellar_mass_luminosity_eker18"}, ""},
       "luminosity",
       mass_from_luminosity},
      {{stellar_mass, "log_g and stellar_radius", gravity, {}, ""}, "gravity", mass_from_log_g},

      {{distance, "distance", as_it_stands, {}, ""}, "stated", stated_distance},
      {{distance, "parallax", "1 / parallax; up to ten errors a posterior (Bailer-Jones 2015)", {}, ""},
       "parallax",
       distance_from_parallax},

      {{semi_major_axis, "orbital_period and stellar_mass", kepler, {}, "the mass stated"}, "period", axis_from_period},
      {{semi_major_axis, "semi_major_axis", as_it_stands, {}, ""}, "stated", stated_axis},
      {{semi_major_axis, "orbital_period and stellar_mass", kepler, {}, "the mass by its own routes"},
       "derived",
       axis_from_period_and_derived_mass},
      {{semi_major_axis, "scaled_semi_major_axis and stellar_radius", "a = a/R R", {}, ""}, "scaled", axis_from_scaled},

      {{insolation,
        "luminosity and semi_major_axis",
        "S = L / a^2",
        {},
        "the luminosity not by spectral_type or stellar_mass alone"},
       "computed",
       insolation_from_luminosity},
      {{insolation, "scaled_semi_major_axis and teff", "S = Teff^4 / (a/R)^2", {}, ""},
       "computed",
       insolation_from_scaled},
      {{insolation, "insolation", as_it_stands, {}, ""}, "stated", stated_insolation},
      {{insolation,
        "luminosity and semi_major_axis",
        "S = L / a^2",
        {},
        "the luminosity by spectral_type or stellar_mass alone"},
       "rough",
       insolation_from_rough_luminosity},

      {{planet_radius, "planet_radius", as_it_stands, {}, ""}, "stated", stated_planet_radius},
      {{planet_radius, "radius_ratio and stellar_radius", "R_p = (R_p/R) R", {}, ""},
       "transit",
       planet_radius_from_ratio},
      {{planet_radius, "transit_depth and stellar_radius", "depth = (R_p/R)^2, limb darkening left out", {}, ""},
       "transit",
       planet_radius_from_depth},
      // What follows is walked by planet_mass_route.cpp and answer.cpp: a planet's mass has a scale of its own.
      {{planet_radius, "planet_mass", chen_kipping, {}, "nothing else is known; it moves no zone"}, "mass", nullptr},

      {{planet_mass, "planet_mass", as_it_stands, {}, ""}, "stated", nullptr},
      {{planet_mass, "min_mass and inclination", "M = M sin i / sin i", {}, ""}, "minimum", nullptr},
      {{planet_mass, "min_mass", "isotropic inclination: 1 / sin i has the median 1.155, 68 % in 1.013-1.850", {}, ""},
       "minimum",
       nullptr},
      {{planet_mass, "planet_radius", chen_kipping, {}, ""}, "radius", nullptr},
      {{planet_mass, "nothing", "1 Earth mass assumed", {}, ""}, "assumed", nullptr},

  };
  return all;
}

}  // namespace

std::span<const RouteInfo> all_routes() {
  static const std::vector<RouteInfo> infos = [] {
    std::vector<RouteInfo> all;
    for (const Line& line : lines()) all.push_back(line.info);
    return all;
  }();
  return infos;
}

std::span<const RouteEntry> route_entries() {
  static const std::vector<RouteEntry> entries = [] {
    std::vector<RouteEntry> all;
    for (const Line& line : lines()) all.push_back({line.info.gives, line.family, line.way});
    return all;
  }();
  return entries;
}

}  // namespace hz
