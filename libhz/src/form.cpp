#include "form.hpp"

#include <algorithm>
#include <cmath>

#include "hz/require.hpp"

namespace hz {
namespace {

void add(TeffCurve& curve, const TeffCurve& other) {
  curve.power += other.power;
  if (other.weight == 0) return;
  HZ_REQUIRE(curve.weight == 0 || curve.correction == other.correction);
  curve.correction = other.correction;
  curve.weight += other.weight;
}

}  // namespace

Form operator+(Form a, const Form& b) {
  a.value += b.value;
  for (const FormTerm& term : b.terms) {
    const auto same = std::find_if(a.terms.begin(), a.terms.end(),
                                   [&](const FormTerm& other) { return other.source == term.source; });
    if (same == a.terms.end()) {
      a.terms.push_back(term);
    } else {
      same->slope += term.slope;
    }
  }
  std::erase_if(a.terms, [](const FormTerm& term) { return term.slope == 0; });
  add(a.curve, b.curve);
  a.marks = a.marks | b.marks;
  return a;
}

Form operator-(const Form& a, const Form& b) { return a + -1.0 * b; }

Form operator*(double factor, Form form) {
  form.value *= factor;
  for (FormTerm& term : form.terms) term.slope *= factor;
  form.curve.power *= factor;
  form.curve.weight *= factor;
  return form;
}

Form operator+(Form form, double constant) {
  form.value += constant;
  return form;
}

Form raised(const Form& log_form) {
  HZ_REQUIRE(log_form.curve.is_flat());
  const double value = std::exp(log_form.value);
  Form form = value * log_form;
  form.value = value;
  return form;
}

Form logarithm(const Form& form) {
  HZ_REQUIRE(form.curve.is_flat() && form.value > 0);
  Form log_form = 1 / form.value * form;
  log_form.value = std::log(form.value);
  return log_form;
}

double slope_between(const TeffCurve& curve, double low, double teff, double high) {
  const double power_law = curve.power / teff;
  if (curve.weight == 0) return power_law;
  const Relation& correction = *curve.correction;
  const double bend = high > low ? (correction(high) - correction(low)) / (high - low) : correction.slope(teff);
  return power_law + curve.weight * bend;
}

}  // namespace hz
