// Whole files or none.
#pragma once
#include <filesystem>
#include <string_view>

namespace hz::plots {

/// Writes the bytes beside `path` and renames them onto it. Throws hz::Error (output) and leaves nothing behind.
void write_aside(const std::filesystem::path& path, std::string_view bytes);

}  // namespace hz::plots
