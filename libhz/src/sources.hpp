// The independent inputs of one row: stated values and the scatters of relations.
#pragma once
#include <cstddef>
#include <string_view>
#include <vector>

#include "form.hpp"
#include "inputs.hpp"

namespace hz {

struct Source {
  Quantity quantity{};
  std::string_view scatter_of;  // key of the relation; empty for a value of the row
  Input input;
  bool logarithmic = true;  // a form's slope is taken in ln x
};

class Sources {
public:
  /// Index of the source of a stated field, made at its first use.
  [[nodiscard]] std::size_t of(Quantity quantity, const Input& input, bool logarithmic);
  /// A relation's scatter about it, in the unit of its y, with half-widths half_width - skew and half_width + skew;
  /// `quantity` is what the relation served for.
  [[nodiscard]] std::size_t scatter(Quantity quantity, const Relation& relation, double half_width, double skew);
  [[nodiscard]] const Source& operator[](std::size_t index) const { return all_[index]; }

  /// 68 per cent half-widths of u.
  [[nodiscard]] double minus(std::size_t index) const;
  [[nodiscard]] double plus(std::size_t index) const;

private:
  std::vector<Source> all_;
};

/// A form's first-order half-widths; each side from the side of each source that moves it that way. `teff` is the form
/// of Teff, which the curve is followed through; null when the form has no curve.
struct HalfWidths {
  double minus = 0;
  double plus = 0;
};
[[nodiscard]] HalfWidths half_widths(const Form& form, const Form* teff, const Sources& sources);

/// Those of the distribution that a form without curve stands for: widths add in quadrature, and half the differences
/// of the sides as they are, because the medians of skewed terms move their sum's.
[[nodiscard]] HalfWidths skewed_half_widths(const Form& form, const Sources& sources);

/// A form of a logarithm as the quantity itself.
[[nodiscard]] Measured exponential(const Form& form, const Form* teff, const Sources& sources);
/// A plain form (a Teff, a magnitude) as it is.
[[nodiscard]] Measured plain(const Form& form, const Sources& sources);

/// ln S and Teff as the placement takes them. A source that moves both goes into the curve by its regression on Teff,
/// and keeps the width and the skewness that Teff does not explain.
[[nodiscard]] PlacementInput placement_input(const Form& log_insolation, const Form* teff, const Distribution& teff_x,
                                             const Sources& sources);

}  // namespace hz
