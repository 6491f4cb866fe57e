#include "hz/plots/figure_file.hpp"

#include <cairo-pdf.h>
#include <cairo-svg.h>
#include <cairo.h>
#include <fmt/format.h>

#include <algorithm>
#include <cctype>
#include <cmath>
#include <memory>

#include "hz/atomic_file.hpp"
#include "hz/error.hpp"
#include "hz/require.hpp"
#include "painter.hpp"
#include "png_chunks.hpp"
#include "svg_finish.hpp"

namespace hz::plots {
namespace {

constexpr int largest_side = 30000;  // pixels; cairo ends at 32767

struct Release {
  void operator()(cairo_surface_t* surface) const { cairo_surface_destroy(surface); }
  void operator()(cairo_t* cr) const { cairo_destroy(cr); }
};
using Surface = std::unique_ptr<cairo_surface_t, Release>;
using Context = std::unique_ptr<cairo_t, Release>;

cairo_status_t append(void* target, const unsigned char* bytes, unsigned int count) {
  static_cast<std::string*>(target)->append(reinterpret_cast<const char*>(bytes), count);
  return CAIRO_STATUS_SUCCESS;
}

void paint_on(cairo_surface_t* surface, const Scene& scene, double scale) {
  const TextMeasure measure;
  const Context cr(cairo_create(surface));
  cairo_scale(cr.get(), scale, scale);
  paint(cr.get(), scene, measure);
  HZ_REQUIRE(cairo_status(cr.get()) == CAIRO_STATUS_SUCCESS);
}

/// Cairo writes the end of a file when the surface is finished.
void finish(cairo_surface_t* surface) {
  cairo_surface_finish(surface);
  HZ_REQUIRE(cairo_surface_status(surface) == CAIRO_STATUS_SUCCESS);
}

std::string svg_bytes(const Scene& scene, const FigureFile& about) {
  std::string bytes;
  const Surface surface(cairo_svg_surface_create_for_stream(append, &bytes, scene.width, scene.height));
  paint_on(surface.get(), scene, 1);
  finish(surface.get());
  return finished_svg(bytes, about.title, about.description);
}

std::string pdf_bytes(const Scene& scene, const FigureFile& about) {
  std::string bytes;
  const Surface surface(cairo_pdf_surface_create_for_stream(append, &bytes, scene.width, scene.height));
  cairo_pdf_surface_set_metadata(surface.get(), CAIRO_PDF_METADATA_TITLE, about.title.c_str());
  cairo_pdf_surface_set_metadata(surface.get(), CAIRO_PDF_METADATA_SUBJECT, about.description.c_str());
  // No date at all: today's would make other bytes every day.
  cairo_pdf_surface_set_metadata(surface.get(), CAIRO_PDF_METADATA_CREATE_DATE, nullptr);
  paint_on(surface.get(), scene, 1);
  finish(surface.get());
  return bytes;
}

int pixels(double points, double dpi) {
  const double count = std::ceil(points * dpi / 72 - 1e-6);
  if (count > largest_side)
    throw Error(Fault::usage, fmt::format("a PNG of this size at {:g} dpi would be {:.0f} pixels long (at most {}); "
                                          "choose a smaller --dpi or write PDF or SVG",
                                          dpi, count, largest_side));
  return static_cast<int>(count);
}

std::string png_bytes(const Scene& scene, const FigureFile& about) {
  if (!(about.dpi >= 36 && about.dpi <= 2400))
    throw Error(Fault::usage, fmt::format("{:g} dpi is out of range; choose 36 to 2400", about.dpi));
  const int width = pixels(scene.width, about.dpi);
  const int height = pixels(scene.height, about.dpi);
  const Surface surface(cairo_image_surface_create(CAIRO_FORMAT_RGB24, width, height));
  paint_on(surface.get(), scene, about.dpi / 72);
  std::string bytes;
  HZ_REQUIRE(cairo_surface_write_to_png_stream(surface.get(), append, &bytes) == CAIRO_STATUS_SUCCESS);
  return finished_png(bytes, about.dpi, about.title);
}

}  // namespace

FigureFormat figure_format(const std::filesystem::path& path) {
  std::string ending = path.extension().string();
  std::transform(ending.begin(), ending.end(), ending.begin(),
                 [](unsigned char c) { return static_cast<char>(std::tolower(c)); });
  if (ending == ".svg") return FigureFormat::svg;
  if (ending == ".pdf") return FigureFormat::pdf;
  if (ending == ".png") return FigureFormat::png;
  throw Error(Fault::usage,
              "cannot tell the kind of figure from '" + path.string() + "'; let its name end in .svg, .pdf or .png");
}

std::string render(const Scene& scene, FigureFormat format, const FigureFile& about) {
  if (format == FigureFormat::svg) return svg_bytes(scene, about);
  if (format == FigureFormat::pdf) return pdf_bytes(scene, about);
  return png_bytes(scene, about);
}

void write_figure(const Scene& scene, const FigureFile& file) {
  write_file(file.path.string(), render(scene, figure_format(file.path), file));
}

}  // namespace hz::plots
