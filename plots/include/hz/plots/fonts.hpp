// Where the bundled fonts are.
#pragma once
#include <filesystem>

namespace hz::plots {

/// The folder with the four faces: beside the running program (<prefix>/share/hzmap/fonts, wherever the prefix was
/// moved to), else in the source tree of a build, else where `install` put them. Reads no environment variable.
///
/// Throws hz::Error (output), naming the places, when none holds them.
[[nodiscard]] std::filesystem::path font_folder();

}  // namespace hz::plots
