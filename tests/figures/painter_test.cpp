// Marks as pixels.
#include "painter.hpp"

#include <cairo.h>
#include <gmock/gmock.h>

#include <cstddef>
#include <cstdint>
#include <memory>
#include <string>

#include "palette.hpp"

namespace hz::plots {
namespace {

class Picture {
public:
  Picture(const Scene& scene, int width, int height)
      : surface_(cairo_image_surface_create(CAIRO_FORMAT_RGB24, width, height), cairo_surface_destroy) {
    const TextMeasure measure;
    cairo_t* cr = cairo_create(surface_.get());
    paint(cr, scene, measure);
    cairo_destroy(cr);
    cairo_surface_flush(surface_.get());
  }

  [[nodiscard]] std::uint32_t rgb(int x, int y) const {
    const std::ptrdiff_t stride = cairo_image_surface_get_stride(surface_.get());
    const unsigned char* row = cairo_image_surface_get_data(surface_.get()) + y * stride;
    return reinterpret_cast<const std::uint32_t*>(row)[x] & 0xffffffU;
  }

  [[nodiscard]] int count_in_column(int x, std::uint32_t color, int height) const {
    int count = 0;
    for (int y = 0; y < height; ++y) count += rgb(x, y) == color;
    return count;
  }

private:
  std::unique_ptr<cairo_surface_t, decltype(&cairo_surface_destroy)> surface_;
};

constexpr std::uint32_t water = 0x004488;
constexpr std::uint32_t white = 0xffffff;

Scene with_disc(double filled, double gap) {
  const Stroke thin{palette::grey, 0.5, {}};
  return {220, 220, {{"disc", DiscMark{{110, 110}, 100, gap, filled, palette::water, palette::white, thin, 0}}}};
}

// A disc of 200 pixels' diameter holds 128 rows of water for P = 0.64; one row at each end is half covered.
TEST(Painter, FillsADiscToTheHeightOfP) {
  for (const double p : {0.1, 0.26, 0.5, 0.64, 0.99}) {
    const Picture picture(with_disc(p, 0), 220, 220);
    EXPECT_NEAR(picture.count_in_column(110, water, 220), 200 * p, 2) << p;
  }
}

TEST(Painter, FillsFromBelow) {
  const Picture picture(with_disc(0.5, 0), 220, 220);
  EXPECT_EQ(picture.rgb(110, 105), white);
  EXPECT_EQ(picture.rgb(110, 115), water);
}

TEST(Painter, KeepsWaterInsideTheGap) {
  const Picture picture(with_disc(1, 40), 220, 220);
  EXPECT_NEAR(picture.count_in_column(110, water, 220), 120, 2);
}

TEST(Painter, ShadesASectorAlongItsRadius) {
  const SectorMark sector{{0, 50}, 20, 80, 0.5, {{20, palette::white}, {40, palette::water}, {80, palette::water}}};
  const Picture picture({100, 100, {{"zone", sector}}}, 100, 100);
  EXPECT_EQ(picture.rgb(60, 50), water);
  EXPECT_EQ(picture.rgb(10, 50), white);
  EXPECT_EQ(picture.rgb(90, 50), white);
  EXPECT_NE(picture.rgb(30, 50), white);
  EXPECT_NE(picture.rgb(30, 50), water);
}

TEST(Painter, LetsLinesStopBehindWords) {
  const TextMeasure measure;
  const Stroke stroke{palette::water, 1, {}};
  const SectorMark far_away{{0, 0}, 1, 2, 0.1, {{1, palette::white}, {2, palette::white}}};
  TextMark text = measure.placed({{"m"}}, {40, palette::ink}, {30, 70});
  const LineMark line{{{0, 60.5}, {100, 60.5}}, stroke};
  const auto line_pixels = [&](const TextMark& words) {
    const Picture picture({100, 100, {{"line", line}, {"words", words}}}, 100, 100);
    int count = 0;
    for (int x = 0; x < 100; ++x) count += picture.rgb(x, 60) == water;
    return count;
  };
  const int before = line_pixels(text);
  text.ground = far_away;
  EXPECT_LT(line_pixels(text), before - 10);
}

}  // namespace
}  // namespace hz::plots
