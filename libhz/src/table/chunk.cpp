#include <fmt/format.h>

#include <cmath>

#include "hz/table/table.hpp"

namespace hz {
namespace {

std::string as_text(std::string_view text) { return std::string(text); }
std::string as_text(double number) { return std::isfinite(number) ? fmt::format("{}", number) : std::string(); }
std::string as_text(const std::optional<std::int64_t>& number) {
  return number ? fmt::format("{}", *number) : std::string();
}

}  // namespace

std::string Chunk::text(std::size_t column, std::size_t row) const {
  return std::visit([row](const auto& cells) { return as_text(cells[row]); }, columns[column]);
}

}  // namespace hz
