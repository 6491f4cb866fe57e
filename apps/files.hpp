// Small files read whole, and paths compared.
#pragma once
#include <string>

namespace hz::app {

/// The whole of a text file. Throws hz::Error (input) that names it when it cannot be read.
[[nodiscard]] std::string read_text_file(const std::string& path);

/// Throws hz::Error (usage) when `output` is the very file that `input` names: it would be lost.
void refuse_to_overwrite(const std::string& input, const std::string& output);

}  // namespace hz::app
