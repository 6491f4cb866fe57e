#include "stated_fields.hpp"

#include "record_fields.hpp"

namespace hz {

namespace {

/// A pointer to a field of a row, const where the row is.
template <class Row>
auto field_of(Row& row, Quantity quantity) -> decltype(&row.star.teff) {
  for (const auto& [held, field] : star_fields) {
    if (held == quantity) return &(row.star.*field);
  }
  for (const auto& [held, field] : planet_fields) {
    if (held == quantity) return &(row.planet.*field);
  }
  return nullptr;
}

}  // namespace

const Field* stated_field(const ListRow& row, Quantity quantity) { return field_of(row, quantity); }
Field* stated_field(ListRow& row, Quantity quantity) { return field_of(row, quantity); }

bool has_stated_field(Quantity quantity) { return stated_field(ListRow{}, quantity) != nullptr; }

std::string stated_text(const ListRow& row, Quantity quantity) {
  switch (quantity) {
    case Quantity::star_id: return row.star.id;
    case Quantity::spectral_type: return row.star.spectral_type;
    case Quantity::number_of_stars: return row.star.number_of_stars ? std::to_string(*row.star.number_of_stars) : "";
    case Quantity::circumbinary: return row.planet.circumbinary ? (*row.planet.circumbinary ? "1" : "0") : "";
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
    case Quantity::circumbinary:
    case Quantity::adopted:
    case Quantity::reference:
    case Quantity::planet_mass_kind: return true;
    default: return false;
  }
}

}  // namespace hz
