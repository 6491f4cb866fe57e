// What the Teff-free part of ln S must reach to lie at a limit: ln S_limit(Teff, planet mass) minus what Teff itself
// adds to ln S.
#pragma once
#include <vector>

#include "hz/limit_curve.hpp"
#include "hz/placement.hpp"
#include "measure.hpp"

namespace hz {

/// The Teff for which the limits answer under a policy, and the fitted part of it.
struct AnsweredRange {
  Range fitted;
  Range answered;
};
[[nodiscard]] AnsweredRange answered_range(const std::optional<Range>& fitted, BeyondRange beyond);

/// Share of a Teff distribution inside a range.
[[nodiscard]] double share_in(const Distribution& teff, const Range& range);

/// The threshold's distribution over the Teff for which the limit answers; its mass is the answered share.
class Threshold {
public:
  Threshold(const PlacementInput& input, const FluxLimit& limit, const AnsweredRange& range, Effort effort);

  /// 68 per cent half-width.
  [[nodiscard]] double width() const { return width_; }
  [[nodiscard]] double least() const { return least_; }
  [[nodiscard]] double greatest() const { return greatest_; }

  /// As weighted points, for when another variable is wider.
  [[nodiscard]] Rule points(const Smoothness& smoothness) const;

  /// Prepares at_most().
  void make_tracks();

  /// Probability that the limit answers and the threshold is at most y, through the distribution function of whichever
  /// of Teff and planet mass moves the threshold more.
  [[nodiscard]] double at_most(double y) const;

private:
  /// The threshold along one variable x between two neighbouring places.
  struct Step {
    double x_low = 0, x_high = 0;
    double y_low = 0, y_high = 0;
    double mass = 0;
  };
  struct Track {
    double weight = 0;  // of the other variable's node
    std::vector<Step> steps;
  };

  [[nodiscard]] double value(double teff, const LimitCurve& curve) const;
  [[nodiscard]] Rule teff_points(const Smoothness& smoothness) const;
  [[nodiscard]] Rule mass_points(std::size_t order) const;
  [[nodiscard]] Track teff_track(double planet_mass, double weight) const;
  [[nodiscard]] Track mass_track(double teff, double weight) const;
  [[nodiscard]] double at_most_on(const Track& track, const Distribution& x, double y) const;

  const PlacementInput& input_;
  const FluxLimit& limit_;
  AnsweredRange range_;
  Effort effort_;
  double teff_width_ = 0;
  double mass_width_ = 0;
  double width_ = 0;
  double least_ = 0;
  double greatest_ = 0;
  std::vector<Track> tracks_;
};

}  // namespace hz
