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

/// A source's half-widths as they are on the scale of its slopes: cut where its domain ends, and skewed by a logarithm.
HalfWidths ends(const Source& source) {
  const Distribution& x = source.input.x;
  if (!source.logarithmic) return {x.minus(), x.plus()};
  return {-std::log1p(-x.minus() / x.central()), std::log1p(x.plus() / x.central())};
}

double width(const Sources& sources, std::size_t source) {
  const HalfWidths sides = ends(sources[source]);
  return (sides.minus + sides.plus) / 2;
}

/// Half the difference of a source's half-widths.
double skew(const Sources& sources, std::size_t source) {
  const HalfWidths sides = ends(sources[source]);
  return (sides.plus - sides.minus) / 2;
}

HalfWidths sides_of(double width, double skew) {
  constexpr double most = 0.9;  // neither side may vanish
  const double held = std::clamp(skew, -most * width, most * width);
  return {width - held, width + held};
}

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
  double slope = 0;     // per K, through Teff
  double variance = 0;  // of ln S, from them
  double factor = 1;    // what is left of their widths
  double skew = 0;      // of what is left, from all sources of Teff
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
  Shared shared{common / total, own, std::sqrt(std::max(0.0, 1 - common * common / (total * own))), 0};
  for (const FormTerm& term : teff.terms) {
    shared.skew += (slope_of(form, term.source) - shared.slope * term.slope) * skew(sources, term.source);
  }
  return shared;
}

/// A shared source with what is left of its width, and its part of the skewness that is left.
Distribution rest_of(const FormTerm& term, const Shared& shared, const Sources& sources) {
  const Source& source = sources[term.source];
  const double part = std::pow(term.slope * width(sources, term.source), 2) / shared.variance;
  const HalfWidths sides = sides_of(shared.factor * width(sources, term.source), part * shared.skew / term.slope);
  if (!(sides.minus + sides.plus > 0)) return Distribution::exact(source.input.x.central());
  const double x = source.input.x.central();
  const double minus = source.logarithmic ? -x * std::expm1(-sides.minus) : sides.minus;
  const double plus = source.logarithmic ? x * std::expm1(sides.plus) : sides.plus;
  return Distribution::two_piece(x, minus, plus, Asymmetry::median, {source.logarithmic ? 0 : -infinity, infinity});
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

std::size_t Sources::scatter(Quantity quantity, const Relation& relation, double half_width, double skew) {
  for (std::size_t i = 0; i < all_.size(); ++i) {
    if (all_[i].scatter_of == relation.key) return i;
  }
  Source source{quantity, relation.key, {}, false};
  const HalfWidths sides = sides_of(half_width, skew);
  source.input.used = {0, sides.minus, sides.plus, LimitMark::none, false};
  if (half_width > 0) {
    source.input.x = Distribution::two_piece(0, sides.minus, sides.plus, Asymmetry::median, {-infinity, infinity});
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

HalfWidths skewed_half_widths(const Form& form, const Sources& sources) {
  double skewness = 0;
  for (const FormTerm& term : form.terms) skewness += term.slope * skew(sources, term.source);
  return sides_of(std::sqrt(variance(form, sources)), skewness);
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
    if (teff != nullptr && slope_of(*teff, term.source) != 0) made.x = rest_of(term, shared, sources);
    input.terms.push_back(made);
  }
  return input;
}

}  // namespace hz
