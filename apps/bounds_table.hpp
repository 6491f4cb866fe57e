// The zones of many stars, a line each.
#pragma once
#include <string>
#include <vector>

#include "hz/answer.hpp"
#include "hz/records.hpp"
#include "hz/settings.hpp"
#include "hz/table/table.hpp"

namespace hz::app {

/// Lays answers out as columns: star, its values, each edge with half-widths, insolation, period and angular
/// separation, then status, reason and flags. Names are those of catalogs/columns.csv; a number that is not known is an
/// empty cell.
class BoundsTable {
public:
  /// `kept`: heads of the input's columns that travel along, behind ours.
  BoundsTable(const LimitSet& set, std::vector<ColumnHead> kept);

  [[nodiscard]] const TableHead& head() const { return head_; }
  /// Names of our own columns, without those kept.
  [[nodiscard]] static std::vector<std::string> own_names();

  /// `rows[i].kept` holds one text for each kept column.
  [[nodiscard]] Chunk chunk(const std::vector<ListRow>& rows, const std::vector<Answer>& answers) const;

private:
  const LimitSet* set_;
  TableHead head_;
  std::size_t kept_ = 0;
};

}  // namespace hz::app
