// Every choice that an answer depends on, in one place, so that it can be stated beside the answer.
#pragma once
#include <cstdint>
#include <map>
#include <optional>

#include "hz/distance.hpp"
#include "hz/distribution.hpp"
#include "hz/limit_set.hpp"
#include "hz/quantity.hpp"

namespace hz {

/// How probabilities are computed.
enum class Method { quadrature, sampling };

/// Which way to a quantity comes first.
enum class LuminosityFrom { stated, radius, photometry };
enum class SemiMajorAxisFrom { period, stated };
enum class InsolationFrom { computed, stated };

/// The words for a probability of lying in a zone.
struct VerdictThresholds {
  double inside = 0.95;
  double likely_inside = 0.68;
  double likely_outside = 0.32;
  double outside = 0.05;
};

/// Relative half-widths assumed where a list gives none or a printed 0: medians of a public composite list of 2023.
/// Eccentricity's is absolute. A period is exact. An empty map assumes nothing: such values count as exact.
using AssumedErrors = std::map<Quantity, double>;
[[nodiscard]] AssumedErrors default_assumed_errors();

struct Settings {
  const LimitSet* limits = nullptr;  // never null where an answer is computed; bounds at least one zone
  BeyondRange beyond = BeyondRange::hold;
  Asymmetry asymmetry = Asymmetry::median;
  AssumedErrors assumed_errors = default_assumed_errors();
  VerdictThresholds thresholds;
  double bond_albedo = 0.3;  // for the equilibrium temperature only
  LuminosityFrom luminosity_from = LuminosityFrom::stated;
  SemiMajorAxisFrom semi_major_axis_from = SemiMajorAxisFrom::period;
  double length_scale = default_length_scale;  // pc, of the prior for parallaxes not much larger than their errors
  InsolationFrom insolation_from = InsolationFrom::computed;
  Method method = Method::quadrature;
  std::uint64_t draws = 100000;
  std::uint64_t seed = 1;
};

}  // namespace hz
