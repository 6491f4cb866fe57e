// What cairo leaves out of a PNG.
#pragma once
#include <string>

namespace hz::plots {

/// The picture with its resolution (pHYs) and title (tEXt, or iTXt when it is not plain ASCII) behind the header.
[[nodiscard]] std::string finished_png(const std::string& png, double dpi, const std::string& title);

}  // namespace hz::plots
