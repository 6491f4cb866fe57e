// One of two lists to be joined: its rows, and what they are joined on.
#pragma once
#include <optional>
#include <string>
#include <vector>

#include "console.hpp"
#include "hz/join.hpp"
#include "join_options.hpp"
#include "list_rows.hpp"
#include "sky_columns.hpp"

namespace hz::app {

/// A list read.
struct JoinSide {
  std::string file;
  std::vector<Candidate> candidates;
  std::vector<std::vector<Aliases>> names;     // for each way of joining, of each row; none for a way by position
  std::vector<Result<SkyPosition>> positions;  // of each row; none when no way is by position
};

/// A list about to be read for the ways of joining.
class JoinSideReading {
public:
  /// `column` is the list's column in a way of joining. `list` must outlive the reading.
  /// Throws hz::Error (usage) for a column or position that the list does not have.
  JoinSideReading(const OpenList& list, const std::vector<JoinWay>& ways, std::string JoinWay::*column,
                  RowReading reading);

  [[nodiscard]] JoinSide read(const Console& console) const;

private:
  [[nodiscard]] std::vector<std::vector<Aliases>> names_of(const ListRows& rows) const;
  [[nodiscard]] std::vector<Result<SkyPosition>> positions_of(const ListRows& rows) const;

  const OpenList& list_;
  const std::vector<JoinWay>& ways_;
  RowReading reading_;  // its identifiers: the columns of names in the order of the ways, then those of positions
  std::optional<SkyColumns> sky_;
};

}  // namespace hz::app
