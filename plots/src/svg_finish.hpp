// What cairo leaves out of an SVG.
#pragma once
#include <string>

namespace hz::plots {

/// Gives the picture a role, a title and a description for people who do not see it, and its ids a prefix of its own,
/// so that several figures can stand in one HTML page.
[[nodiscard]] std::string finished_svg(const std::string& svg, const std::string& title,
                                       const std::string& description);

}  // namespace hz::plots
