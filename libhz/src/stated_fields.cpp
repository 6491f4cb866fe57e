#include "stated_fields.hpp"

namespace hz {

const Field* stated_field(const ListRow& row, Quantity quantity) {
  switch (quantity) {
    case Quantity::teff: return &row.star.teff;
    case Quantity::luminosity: return &row.star.luminosity;
    case Quantity::log_luminosity: return &row.star.log_luminosity;
    case Quantity::stellar_radius: return &row.star.stellar_radius;
    case Quantity::stellar_mass: return &row.star.stellar_mass;
    case Quantity::log_g: return &row.star.log_g;
    case Quantity::distance: return &row.star.distance;
    case Quantity::orbital_period: return &row.planet.orbital_period;
    case Quantity::semi_major_axis: return &row.planet.semi_major_axis;
    case Quantity::scaled_semi_major_axis: return &row.planet.scaled_semi_major_axis;
    case Quantity::eccentricity: return &row.planet.eccentricity;
    case Quantity::insolation: return &row.planet.insolation;
    case Quantity::planet_radius: return &row.planet.planet_radius;
    case Quantity::planet_mass: return &row.planet.planet_mass;
    case Quantity::min_mass: return &row.planet.min_mass;
    default: return nullptr;
  }
}

bool has_stated_field(Quantity quantity) { return stated_field(ListRow{}, quantity) != nullptr; }

std::string stated_text(const ListRow& row, Quantity quantity) {
  switch (quantity) {
    case Quantity::star_id: return row.star.id;
    case Quantity::spectral_type: return row.star.spectral_type;
    case Quantity::number_of_stars: return row.star.number_of_stars ? std::to_string(*row.star.number_of_stars) : "";
    case Quantity::adopted: return row.planet.adopted ? (*row.planet.adopted ? "1" : "0") : "";
    case Quantity::reference: return row.reference;
    case Quantity::planet_mass_kind:
      switch (row.planet.planet_mass_kind) {
        case PlanetMassKind::unsaid: return "";
        case PlanetMassKind::measured: return "measured";
        case PlanetMassKind::minimum: return "m sin i";
        case PlanetMassKind::from_radius: return "from radius";
      }
      return "";
    default: return "";
  }
}

bool has_stated_text(Quantity quantity) {
  switch (quantity) {
    case Quantity::star_id:
    case Quantity::spectral_type:
    case Quantity::number_of_stars:
    case Quantity::adopted:
    case Quantity::reference:
    case Quantity::planet_mass_kind: return true;
    default: return false;
  }
}

}  // namespace hz
