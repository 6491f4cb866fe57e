// Where a list gives positions on the sky, and the positions of its rows.
#pragma once
#include <cstddef>
#include <span>
#include <string>
#include <vector>

#include "hz/result.hpp"
#include "hz/sky.hpp"
#include "list_options.hpp"

namespace hz::app {

/// The columns of right ascension and declination; of several for one, the first that is filled counts.
class SkyColumns {
public:
  /// Throws hz::Error (usage) for a list that lacks one of the two, or gives one in a unit that is not understood.
  explicit SkyColumns(const OpenList& list);

  /// The columns whose cells position() reads.
  [[nodiscard]] std::vector<std::size_t> columns() const;

  /// A column in hours ("RA [h]") holds hours; else numbers are degrees, and text says itself what it is
  /// (hz/sky.hpp). `cells` are a row's, of columns().
  [[nodiscard]] Result<SkyPosition> position(std::span<const std::string> cells) const;

private:
  struct Axis {
    std::vector<std::size_t> columns;
    std::vector<bool> in_hours;
  };
  [[nodiscard]] static Axis axis(const OpenList& list, Quantity quantity);

  Axis ra_;
  Axis dec_;
};

}  // namespace hz::app
