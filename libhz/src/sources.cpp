#include "sources.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "hz/constants.hpp"
#include "hz/require.hpp"

namespace hz {
namespace {

constexpr double ln10 = 2.302585092994045684;
constexpr double infinity = std::numeric_limits<double>::infinity();

double slope_of(const Form& form, std::size_t source) {
  const auto found =
      std::find_if(form.terms.begin(), form.terms.end(), [&](const FormTerm& term) { return term.source == source; });
  return found == form.terms.end() ? 0 : found->slope;
}

double width(const Sources& sources, std::size_t source) { return (sources.minus(source) + sources.plus(source)) / 2; }

double variance(const Form& form, const Sources& sources) {
  double sum = 0;
  for (const FormTerm& term : form.terms) sum += std::pow(term.slope * width(sources, term.source), 2);
  return sum;
}

InsolationTerm insolation_term(const FormTerm& term, const Source& source) {
  const double power = source.logarithmic ? term.slope : term.slope / ln10;
  return {source.quantity, source.input.x, power, !source.logarithmic, source.scatter_of};
}

/// What the sources shared with Teff do to ln S beyond it.
struct Shared {
  double slope = 0;   // per K, through Teff
  double factor = 1;  // what is left of their widths
};

Shared shared_with(const Form& teff, const Form& form, const Sources& sources) {
  const double total = variance(teff, sources);
  if (!(total > 0)) return {};
  double own = 0;
  double common = 0;
  for (const FormTerm& term : form.terms) {
    const double through_teff = slope_of(teff, term.source);
    if (through_teff == 0) continue;
    const double square = std::pow(width(sources, term.source), 2);
    own += term.slope * term.slope * square;
    common += term.slope * through_teff * square;
  }
  if (!(own > 0)) return {};
  return {common / total, std::sqrt(std::max(0.0, 1 - common * common / (total * own)))};
}

}  // namespace

std::size_t Sources::of(Quantity quantity, const Input& input, bool logarithmic) {
  for (std::size_t i = 0; i < all_.size(); ++i) {
    if (all_[i].quantity != quantity || !all_[i].scatter_of.empty()) continue;
    HZ_REQUIRE(all_[i].logarithmic == logarithmic);  // slopes in ln x and in x must not meet
    return i;
  }
  all_.push_back({quantity, {}, input, logarithmic});
  return all_.size() - 1;
}

std::size_t Sources::scatter(Quantity quantity, const Relation& relation, double half_width) {
  for (std::size_t i = 0; i < all_.size(); ++i) {
    if (all_[i].scatter_of == relation.key) return i;
  }
  Source source{quantity, relation.key, {}, false};
  source.input.used = {0, half_width, half_width, LimitMark::none, false};
  if (half_width > 0) {
    source.input.x = Distribution::two_piece(0, half_width, half_width, Asymmetry::median, {-infinity, infinity});
  }
  all_.push_back(source);
  return all_.size() - 1;
}

double Sources::minus(std::size_t index) const {
  const Source& source = all_[index];
  const double half = source.input.used.minus.value_or(0);
  return source.logarithmic ? half / source.input.used.value : half;
}

double Sources::plus(std::size_t index) const {
  const Source& source = all_[index];
  const double half = source.input.used.plus.value_or(0);
  return source.logarithmic ? half / source.input.used.value : half;
}

HalfWidths half_widths(const Form& form, const Form* teff, const Sources& sources) {
  Form whole = form;
  whole.curve = {};
  if (teff != nullptr) {
    const HalfWidths range = half_widths(*teff, nullptr, sources);
    const double t = teff->value;
    whole = whole + slope_between(form.curve, t - range.minus, t, t + range.plus) * *teff;
  }
  HalfWidths sides;
  for (const FormTerm& term : whole.terms) {
    const double down =
        std::abs(term.slope) * (term.slope > 0 ? sources.minus(term.source) : sources.plus(term.source));
    const double up = std::abs(term.slope) * (term.slope > 0 ? sources.plus(term.source) : sources.minus(term.source));
    sides.minus = std::hypot(sides.minus, down);
    sides.plus = std::hypot(sides.plus, up);
  }
  return sides;
}

Measured exponential(const Form& form, const Form* teff, const Sources& sources) {
  if (form.terms.size() == 1 && form.terms.front().slope == 1 && form.curve.is_flat()) {
    const Source& only = sources[form.terms.front().source];
    if (only.logarithmic && std::log(only.input.used.value) == form.value) return only.input.used;  // digit for digit
  }
  const HalfWidths sides = half_widths(form, teff, sources);
  const double value = std::exp(form.value);
  return {value, value * std::min(1.0, sides.minus), value * sides.plus, LimitMark::none, false};
}

Measured plain(const Form& form, const Sources& sources) {
  const HalfWidths sides = half_widths(form, nullptr, sources);
  return {form.value, sides.minus, sides.plus, LimitMark::none, false};
}

PlacementInput placement_input(const Form& log_insolation, const Form* teff, const Distribution& teff_x,
                               const Sources& sources) {
  PlacementInput input;
  input.teff = teff_x;
  input.curve = log_insolation.curve;
  const Shared shared = teff != nullptr ? shared_with(*teff, log_insolation, sources) : Shared{};
  input.curve.centre = teff_x.central();
  input.curve.slope += shared.slope;
  input.offset = log_insolation.value - input.curve(teff_x.central());
  for (const FormTerm& term : log_insolation.terms) {
    InsolationTerm made = insolation_term(term, sources[term.source]);
    const double x = made.x.central();
    input.offset -= made.power * (made.decadic ? ln10 * x : std::log(x));
    if (teff != nullptr && slope_of(*teff, term.source) != 0) made.x = made.x.scaled(shared.factor);
    input.terms.push_back(made);
  }
  return input;
}

}  // namespace hz
