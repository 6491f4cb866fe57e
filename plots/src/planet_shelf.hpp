// Rows of labels on one side of an axis.
#pragma once
#include <optional>
#include <vector>

#include "label_rows.hpp"
#include "planet_row.hpp"
#include "planet_spot.hpp"

namespace hz::plots {

/// Labels of letter over P, with leaders; `reach` is what discs and whiskers take of that side.
class PlanetShelf {
public:
  /// `side` is -1 above the axis and 1 below.
  PlanetShelf(const Canvas& canvas, const PlanetRowPlan& plan, double side, double reach)
      : canvas_(canvas), plan_(plan), side_(side), reach_(reach) {}

  /// Leaders first; nullopt when no number of rows has room.
  [[nodiscard]] std::optional<std::vector<Mark>> filled(const std::vector<const PlanetSpot*>& spots) const;

private:
  [[nodiscard]] double width(const PlanetSpot& spot) const;
  [[nodiscard]] double height() const;
  /// The edge of a row that faces the axis, and the opposite one.
  [[nodiscard]] double near(std::size_t row) const;
  [[nodiscard]] double far(std::size_t row) const { return near(row) + side_ * height(); }
  [[nodiscard]] std::vector<Obstacle> obstacles() const;
  [[nodiscard]] Mark leader(const PlanetSpot& spot, const LabelPath& label) const;
  void add_words(std::vector<Mark>& marks, const PlanetSpot& spot, const LabelPath& label) const;

  const Canvas& canvas_;
  const PlanetRowPlan& plan_;
  double side_;
  double reach_;
};

}  // namespace hz::plots
