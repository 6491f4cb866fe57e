#include "hz/plots/fonts.hpp"

#include <array>
#include <string>
#include <system_error>

#include "font_faces.hpp"
#include "hz/error.hpp"

namespace hz::plots {
namespace fs = std::filesystem;
namespace {

bool holds_all_faces(const fs::path& folder) {
  std::error_code ignored;
  for (const auto& face : font_faces)
    if (!fs::is_regular_file(folder / face, ignored)) return false;
  return true;
}

/// <prefix>/bin/hzmap -> <prefix>/share/hzmap/fonts; empty when the program's own path cannot be read.
fs::path beside_the_program() {
  std::error_code error;
  const fs::path program = fs::read_symlink("/proc/self/exe", error);
  if (error) return {};
  return (program.parent_path() / HZ_FONTS_FROM_PROGRAM).lexically_normal();
}

}  // namespace

fs::path font_folder() {
  const std::array<fs::path, 3> places{beside_the_program(), HZ_FONTS_SOURCE, HZ_FONTS_INSTALLED};
  std::string tried;
  for (const fs::path& place : places) {
    if (holds_all_faces(place)) return place;
    tried += (tried.empty() ? "" : ", ") + place.string();
  }
  throw Error(Fault::output, "the fonts of the figures are missing (looked in " + tried + "); install hzmap again");
}

}  // namespace hz::plots
