// The bundled faces, and the only ones used.
#pragma once
#include <array>
#include <string_view>

namespace hz::plots {

inline constexpr std::array<std::string_view, 4> font_faces{"NotoSans-Regular.ttf", "NotoSans-Italic.ttf",
                                                            "NotoSans-Bold.ttf", "NotoSansMath-Regular.ttf"};
/// Their families, the second for signs that the first lacks.
inline constexpr const char* font_families = "Noto Sans, Noto Sans Math";

}  // namespace hz::plots
