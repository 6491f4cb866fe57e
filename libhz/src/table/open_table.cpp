// The formats that can be read, told apart by how a file begins.
#include <fmt/format.h>

#include <array>

#include "hz/error.hpp"
#include "hz/table/table.hpp"
#include "table/byte_source.hpp"
#include "table/csv_reader.hpp"
#include "words.hpp"

namespace hz {
namespace {

using Opener = std::unique_ptr<TableReader> (*)(ByteSource);

std::unique_ptr<TableReader> open_csv(ByteSource source) { return std::make_unique<CsvReader>(std::move(source)); }

struct Format {
  std::string_view name;
  bool (*begins)(std::string_view start);
  Opener open;  // nullptr: known, but not read
};

bool begins_gzip(std::string_view start) { return start.starts_with("\x1f\x8b"); }
bool begins_zip(std::string_view start) { return start.starts_with("PK\x03\x04"); }
bool begins_fits(std::string_view start) { return start.starts_with("SIMPLE  ="); }
bool begins_xml(std::string_view start) { return start.starts_with("<?xml") || start.starts_with("<VOTABLE"); }
bool begins_utf16(std::string_view start) { return start.starts_with("\xff\xfe") || start.starts_with("\xfe\xff"); }
bool begins_any(std::string_view) { return true; }

// The first that fits is taken.
constexpr std::array<Format, 6> formats{{
    {"gzip-compressed", begins_gzip, nullptr},
    {"a spreadsheet or zip archive", begins_zip, nullptr},
    {"a FITS file", begins_fits, nullptr},
    {"XML or a VOTable", begins_xml, nullptr},
    {"UTF-16 text", begins_utf16, nullptr},
    {"comma-separated text", begins_any, open_csv},
}};

constexpr std::size_t longest_mark = 9;

}  // namespace

std::unique_ptr<TableReader> open_table(const std::string& path) {
  ByteSource source(path);
  const auto start = source.peek(longest_mark);
  for (const Format& format : formats) {
    if (!format.begins(start)) continue;
    if (format.open != nullptr) return format.open(std::move(source));
    throw Error(Fault::input,
                fmt::format("{}: this is {}, not a text table; save it as comma-separated text (CSV, UTF-8)",
                            source.name(), format.name));
  }
  throw std::logic_error("hz: a format that takes anything must stand last");
}

}  // namespace hz
