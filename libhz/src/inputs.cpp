#include "inputs.hpp"

#include <fmt/format.h>

#include <cmath>
#include <limits>

namespace hz {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();
constexpr double ln10 = 2.302585092994045684;

bool is_logarithm(Quantity quantity) { return quantity == Quantity::log_luminosity || quantity == Quantity::log_g; }

bool is_extinction(Quantity quantity) {
  return quantity == Quantity::extinction_v || quantity == Quantity::reddening_bv;
}

/// Quantities that may as well be negative; half-widths larger than the value are nothing strange there.
bool is_signed(Quantity quantity) {
  return is_logarithm(quantity) || quantity == Quantity::parallax || quantity == Quantity::metallicity ||
         (info(quantity).unit == "mag" && !is_extinction(quantity));
}

/// Assumed errors of these are half-widths, not shares of the value.
bool has_absolute_error(Quantity quantity) {
  return quantity == Quantity::eccentricity || (is_signed(quantity) && quantity != Quantity::parallax);
}

/// Whose assumed error a quantity shares.
Quantity error_source(Quantity quantity) {
  if (quantity == Quantity::log_luminosity) return Quantity::luminosity;
  if (quantity == Quantity::min_mass) return Quantity::planet_mass;
  return quantity;
}

/// The assumed half-width on the quantity's own scale.
std::optional<double> assumed_half_width(Quantity quantity, double value, const AssumedErrors& errors) {
  const auto found = errors.find(error_source(quantity));
  if (found == errors.end() || !(found->second > 0)) return std::nullopt;
  if (quantity == Quantity::log_luminosity) return found->second / ln10;
  return has_absolute_error(quantity) ? found->second : found->second * std::abs(value);
}

bool gives_no_error(const Measured& measured) {
  return !(measured.minus.value_or(0) > 0) && !(measured.plus.value_or(0) > 0);
}

}  // namespace

AssumedErrors default_assumed_errors() {
  // Medians of a public composite list of 2023 (luminosity from radius and Teff; for a/R the errors of a and R
  // together; magnitudes, log g and metallicity absolute). Adopted: B as V, J and H as K; Gaia's 0.01 mag for zero
  // points and variability, far above its formal errors; colours, extinctions, density, depth and ratio.
  return {{Quantity::teff, 0.016},
          {Quantity::stellar_radius, 0.06},
          {Quantity::stellar_mass, 0.056},
          {Quantity::semi_major_axis, 0.023},
          {Quantity::scaled_semi_major_axis, 0.064},
          {Quantity::planet_radius, 0.09},
          {Quantity::planet_mass, 0.13},
          {Quantity::insolation, 0.06},
          {Quantity::luminosity, 0.14},
          {Quantity::distance, 0.012},
          {Quantity::eccentricity, 0.05},
          {Quantity::parallax, 0.012},
          {Quantity::magnitude_v, 0.08},
          {Quantity::magnitude_b, 0.08},
          {Quantity::magnitude_g, 0.01},
          {Quantity::magnitude_bp, 0.01},
          {Quantity::magnitude_rp, 0.01},
          {Quantity::magnitude_j, 0.023},
          {Quantity::magnitude_h, 0.023},
          {Quantity::magnitude_k, 0.023},
          {Quantity::magnitude_bol, 0.1},
          {Quantity::color_bv, 0.03},
          {Quantity::color_vk, 0.08},
          {Quantity::color_vj, 0.08},
          {Quantity::color_bp_rp, 0.015},
          {Quantity::extinction_v, 0.1},
          {Quantity::reddening_bv, 0.1},
          {Quantity::log_g, 0.075},
          {Quantity::metallicity, 0.1},
          {Quantity::stellar_density, 0.15},
          {Quantity::inclination, 0.01},
          {Quantity::radius_ratio, 0.05},
          {Quantity::transit_depth, 0.1}};
}

Domain domain_of(Quantity quantity) {
  if (is_signed(quantity)) return {-infinity, infinity};
  if (quantity == Quantity::eccentricity) return {0, 1};
  return {0, infinity};
}

std::optional<Problem> Inputs::refusal(Quantity quantity, const Measured& measured) const {
  const auto out_of_range = [&](std::string_view wanted) {
    return Problem{ProblemCode::out_of_range, std::string(name(quantity)),
                   fmt::format("{} is {}, but {}", name(quantity), measured.value, wanted)};
  };
  if (quantity == Quantity::eccentricity) {
    if (measured.value >= 0 && measured.value < 1) return std::nullopt;
    return out_of_range("a bound orbit has 0 <= eccentricity < 1");
  }
  if (is_signed(quantity) || measured.value > 0) return std::nullopt;
  if (is_extinction(quantity) && measured.value == 0) return std::nullopt;
  return out_of_range("it must be above 0");
}

Input Inputs::settle(Quantity quantity, const Measured& measured) const {
  Input input;
  input.used = measured;
  if (measured.exact) {
    input.used.minus = input.used.plus = 0;
    input.x = Distribution::exact(measured.value);
    return input;
  }
  if (gives_no_error(measured)) {
    const std::optional<double> assumed = assumed_half_width(quantity, measured.value, settings_.assumed_errors);
    input.assumed = assumed.has_value();
    input.used.minus = input.used.plus = assumed.value_or(0);
  } else {
    // One half-width given serves both sides; a zero beside a positive one stays a zero.
    input.used.minus = measured.minus ? measured.minus : measured.plus;
    input.used.plus = measured.plus ? measured.plus : measured.minus;
  }
  input.wide = !is_signed(quantity) && *input.used.minus > measured.value && measured.value > 0;
  if (*input.used.minus + *input.used.plus > 0) {
    input.x = Distribution::two_piece(measured.value, *input.used.minus, *input.used.plus, settings_.asymmetry,
                                      domain_of(quantity));
  } else {
    input.x = Distribution::exact(measured.value);
  }
  return input;
}

Result<std::optional<Input>> Inputs::take(Quantity quantity, const Field& field) const {
  if (field.problem) return *field.problem;
  if (!field.stated) return std::optional<Input>();
  if (field.stated->limit != LimitMark::none) {
    flags_.raise(flag::limit_ignored, quantity);
    return std::optional<Input>();
  }
  if (const std::optional<Problem> problem = refusal(quantity, *field.stated)) return *problem;
  return std::optional<Input>(settle(quantity, *field.stated));
}

std::optional<Input> Inputs::peek(Quantity quantity, const Field& field) const {
  if (!field.stated || field.stated->limit != LimitMark::none || refusal(quantity, *field.stated)) return std::nullopt;
  return settle(quantity, *field.stated);
}

void Inputs::raise(Quantity quantity, const Input& input) const {
  if (input.assumed) flags_.raise(flag::assumed_error, quantity);
  if (input.wide) flags_.raise(flag::wide_error, quantity);
}

Result<Input> Inputs::eccentricity(const Field& field) const {
  Input circular;
  circular.used.minus = circular.used.plus = 0;
  if (field.problem) return *field.problem;
  const bool upper = field.stated && field.stated->limit == LimitMark::upper;
  if (!field.stated || field.stated->limit == LimitMark::lower) {
    if (field.stated) flags_.raise(flag::limit_ignored, Quantity::eccentricity);
    flags_.raise(flag::circular_assumed);
    return circular;
  }
  if (const std::optional<Problem> problem = refusal(Quantity::eccentricity, *field.stated)) return *problem;
  if (!upper) {
    Input settled = settle(Quantity::eccentricity, *field.stated);
    raise(Quantity::eccentricity, settled);
    return settled;
  }
  flags_.raise(flag::eccentricity_limit);
  if (!(field.stated->value > 0)) return circular;
  Input input = circular;
  input.x = Distribution::below(field.stated->value, domain_of(Quantity::eccentricity));
  input.used.plus = input.x.plus();
  return input;
}

}  // namespace hz
