#include "hz/plots/fonts.hpp"

#include <gmock/gmock.h>

#include "font_faces.hpp"

namespace hz::plots {
namespace {

TEST(FontFolder, HoldsEveryFaceAndTheLicence) {
  const auto folder = font_folder();
  for (const auto& face : font_faces) EXPECT_TRUE(std::filesystem::is_regular_file(folder / face)) << face;
  EXPECT_TRUE(std::filesystem::is_regular_file(folder / "OFL.txt"));
}

}  // namespace
}  // namespace hz::plots
