// Scenes as files.
#pragma once
#include <filesystem>
#include <string>

#include "hz/plots/scene.hpp"

namespace hz::plots {

enum class FigureFormat { svg, pdf, png };

/// Where a figure goes and what is said about it inside the file.
struct FigureFile {
  std::filesystem::path path;
  double dpi = 300;         // of a PNG; 36 to 2400
  std::string title;        // one line, for people who do not see the picture
  std::string description;  // SVG only
};

/// By the ending of the file's name, in any case. Throws hz::Error (usage) for another ending.
[[nodiscard]] FigureFormat figure_format(const std::filesystem::path& path);

/// The bytes of the file: the same for the same scene and words, on every run.
///
/// Throws hz::Error: usage for a dpi out of range or a PNG beyond 30000 pixels a side, output when fonts are missing.
[[nodiscard]] std::string render(const Scene& scene, FigureFormat format, const FigureFile& about);

/// Writes the figure aside and renames it, so that the path holds a whole figure or what it held before.
///
/// Throws hz::Error: as render and figure_format; output when the path cannot be written.
void write_figure(const Scene& scene, const FigureFile& file);

}  // namespace hz::plots
