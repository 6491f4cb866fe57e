#include <gmock/gmock.h>

#include <cmath>
#include <filesystem>
#include <fstream>
#include <functional>
#include <iterator>
#include <regex>
#include <set>

#include "hz/error.hpp"
#include "hz/plots/figure_file.hpp"
#include "hz/plots/figures.hpp"
#include "systems.hpp"

namespace hz::plots::testing {
namespace {

namespace fs = std::filesystem;
using ::testing::HasSubstr;
using ::testing::Not;

constexpr FigureFormat formats[] = {FigureFormat::svg, FigureFormat::pdf, FigureFormat::png};

FigureFile about(const std::string& title) { return {"", 150, title, "One star & <four> limits"}; }

/// Big-endian number in a PNG.
unsigned number_at(const std::string& bytes, std::size_t at) {
  unsigned number = 0;
  for (std::size_t i = 0; i < 4; ++i) number = number << 8 | static_cast<unsigned char>(bytes.at(at + i));
  return number;
}

Fault fault_of(const std::function<void()>& action) {
  try {
    action();
  } catch (const Error& error) {
    return error.fault();
  }
  ADD_FAILURE() << "nothing was thrown";
  return Fault::input;
}

class Files : public ::testing::Test {
protected:
  Scene scene = wedge_scene(compact_in_zone(), options(88));
  // A folder a test: ctest runs each in a process of its own, side by side.
  fs::path folder = fs::path(::testing::TempDir()) /
                    (std::string("hz_figures_") + ::testing::UnitTest::GetInstance()->current_test_info()->name());

  void SetUp() override {
    fs::remove_all(folder);
    fs::create_directories(folder);
  }
  void TearDown() override { fs::remove_all(folder); }

  static std::string bytes(const fs::path& path) {
    std::ifstream file(path, std::ios::binary);
    return {std::istreambuf_iterator<char>(file), {}};
  }
};

TEST_F(Files, HaveTheSameBytesOnEveryRun) {
  const Scene lanes = lanes_scene({lantern_27(), compact_in_zone()}, options(120));
  const Scene again = lanes_scene({lantern_27(), compact_in_zone()}, options(120));
  for (const FigureFormat format : formats) {
    const Scene same = wedge_scene(compact_in_zone(), options(88));
    EXPECT_TRUE(render(scene, format, about("a")) == render(same, format, about("a")));
    EXPECT_TRUE(render(lanes, format, about("a")) == render(again, format, about("a")));
  }
}

TEST_F(Files, DifferForDifferentFigures) {
  const Scene other = wedge_scene(lantern_27(), options(88));
  for (const FigureFormat format : formats)
    EXPECT_TRUE(render(scene, format, about("a")) != render(other, format, about("a")));
}

TEST_F(Files, HoldNoDate) { EXPECT_THAT(render(scene, FigureFormat::pdf, about("a")), Not(HasSubstr("CreationDate"))); }

TEST_F(Files, SvgSpeaksToThoseWhoDoNotSee) {
  const std::string svg = render(scene, FigureFormat::svg, about("Zone of <Lantern> & \"61\""));
  EXPECT_THAT(svg, HasSubstr("role=\"img\""));
  EXPECT_THAT(svg, HasSubstr(">Zone of &lt;Lantern&gt; &amp; &quot;61&quot;</title>"));
  EXPECT_THAT(svg, HasSubstr(">One star &amp; &lt;four&gt; limits</desc>"));
}

TEST_F(Files, SvgIdsAreItsOwnAndComplete) {
  const std::string svg = render(scene, FigureFormat::svg, about("a"));
  std::set<std::string> ids;
  const std::regex id("[ <]id=\"([^\"]*)\"");
  for (auto it = std::sregex_iterator(svg.begin(), svg.end(), id); it != std::sregex_iterator(); ++it) {
    EXPECT_TRUE(ids.insert((*it)[1]).second) << (*it)[1] << " occurs twice";
    EXPECT_EQ((*it)[1].str().rfind("hz", 0), 0U) << (*it)[1];
  }
  EXPECT_GT(ids.size(), 20U);
  const std::regex reference("(?:href=\"#|url\\(#)([^\")]*)");
  for (auto it = std::sregex_iterator(svg.begin(), svg.end(), reference); it != std::sregex_iterator(); ++it)
    EXPECT_EQ(ids.count((*it)[1]), 1U) << (*it)[1] << " is missing";
  const std::string other = render(wedge_scene(lantern_27(), options(88)), FigureFormat::svg, about("a"));
  for (const std::string& one : ids) EXPECT_THAT(other, Not(HasSubstr("\"" + one + "\"")));
}

TEST_F(Files, PdfEmbedsItsFontsAsOutlinesOfGlyphs) {
  const std::string pdf = render(scene, FigureFormat::pdf, about("a"));
  EXPECT_THAT(pdf, HasSubstr("/FontFile2"));
  EXPECT_THAT(pdf, Not(HasSubstr("/Type3")));
  EXPECT_THAT(pdf, HasSubstr("NotoSans-Regular"));
}

// 150 dpi are 5906 pixels a metre; 88 mm are 519.7 pixels.
TEST_F(Files, PngSaysHowLargeItIs) {
  const std::string png = render(scene, FigureFormat::png, about("a"));
  EXPECT_EQ(number_at(png, 16), 520U);
  const std::size_t at = png.find("pHYs");
  ASSERT_NE(at, std::string::npos);
  EXPECT_EQ(number_at(png, at + 4), 5906U);
  EXPECT_EQ(number_at(png, at + 8), 5906U);
  EXPECT_EQ(png.at(at + 12), '\1');  // the unit is the metre
  EXPECT_LT(at, png.find("IDAT"));
}

TEST_F(Files, PngCarriesItsTitle) {
  EXPECT_THAT(render(scene, FigureFormat::png, about("Lantern 61")),
              HasSubstr(std::string("tEXtTitle\0Lantern 61", 20)));
  EXPECT_THAT(render(scene, FigureFormat::png, about("灯籠")), HasSubstr("iTXtTitle"));
}

TEST_F(Files, RefuseResolutionsOutOfRange) {
  FigureFile file = about("a");
  for (const double dpi : {0.0, 35.0, 2401.0, std::nan("")}) {
    file.dpi = dpi;
    EXPECT_EQ(fault_of([&] { (void)render(scene, FigureFormat::png, file); }), Fault::usage) << dpi;
  }
  file.dpi = 2400;
  const Scene wide = wedge_scene(lantern_27(), options(400));
  EXPECT_EQ(fault_of([&] { (void)render(wide, FigureFormat::png, file); }), Fault::usage);
}

TEST_F(Files, AreChosenByTheirEnding) {
  EXPECT_EQ(figure_format("a.svg"), FigureFormat::svg);
  EXPECT_EQ(figure_format("a.b.PDF"), FigureFormat::pdf);
  EXPECT_EQ(figure_format("x/a.Png"), FigureFormat::png);
  for (const char* name : {"a", "a.jpg", "svg", "a.svg.gz", ""})
    EXPECT_EQ(fault_of([&] { (void)figure_format(name); }), Fault::usage) << name;
}

TEST_F(Files, AreWrittenWhole) {
  const FigureFile file{folder / "a.svg", 150, "a", "b"};
  write_figure(scene, file);
  EXPECT_TRUE(bytes(file.path) == render(scene, FigureFormat::svg, file));
  EXPECT_EQ(std::distance(fs::directory_iterator(folder), {}), 1);
}

TEST_F(Files, LeaveNothingWhereTheyCannotBeWritten) {
  EXPECT_EQ(fault_of([&] { write_figure(scene, {folder / "none" / "a.svg", 150, "a", "b"}); }), Fault::output);
  fs::create_directory(folder / "a.png");
  EXPECT_EQ(fault_of([&] { write_figure(scene, {folder / "a.png", 150, "a", "b"}); }), Fault::output);
  EXPECT_EQ(std::distance(fs::directory_iterator(folder), {}), 1);
}

}  // namespace
}  // namespace hz::plots::testing
