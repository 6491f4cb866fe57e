#include "hz/table/column_report.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "hz/table/peeked_table.hpp"
#include "list_files.hpp"

namespace hz {
namespace {

using ::testing::Contains;
using ::testing::ElementsAre;
using ::testing::HasSubstr;
using ::testing::IsEmpty;
using ::testing::SizeIs;

struct Understood {
  TableHead head;
  Understanding understanding;
  std::optional<Chunk> first;
};

Understood understood(std::string_view bytes) {
  const testing::Folder folder;
  const auto reader = open_table(folder.write("list.csv", bytes));
  return {reader->head(), Understanding::draft(reader->head()), reader->next()};
}

TEST(ColumnReport, ShowsEveryColumnOnce) {
  const auto list =
      understood("star,Teff [K],e,what\nx,5000,0.1,\nx,5000,N/A,\ny,6000,0.2,\nz,7000,0.3,\nw,8000,0.4,\n");
  const auto report = report_columns(list.head, list.understanding, list.first);
  ASSERT_EQ(report.columns.size(), 4U);
  EXPECT_EQ(report.columns[1].meaning, "teff");
  EXPECT_EQ(report.columns[1].unit, "K");
  EXPECT_EQ(report.columns[1].known_by, KnownBy::words);
  EXPECT_THAT(report.columns[1].samples, ElementsAre("5000", "6000", "7000"));
  EXPECT_EQ(report.columns[2].meaning, "");
  EXPECT_EQ(report.columns[2].doubt, "column \"e\" may be eccentricity");
  EXPECT_EQ(report.columns[3].known_by, std::nullopt);
  EXPECT_THAT(report.columns[3].samples, IsEmpty());
}

TEST(ColumnReport, SaysWhatIsMissing) {
  const auto missing = [](std::string_view header) {
    const auto list = understood(header);
    return report_columns(list.head, list.understanding, list.first);
  };
  EXPECT_THAT(missing("star,teff,stellar_radius\n").missing_for_stars, IsEmpty());
  EXPECT_THAT(missing("star,teff\n").missing_for_stars,
              ElementsAre("luminosity, log_luminosity, stellar_radius, a magnitude with distance or parallax, "
                          "spectral_type or stellar_mass"));
  EXPECT_THAT(missing("star,log_g\n").missing_for_stars, Contains("teff, a colour, spectral_type or stellar_mass"));
  EXPECT_THAT(missing("star,V mag,B-V,parallax\n").missing_for_stars, IsEmpty());
  EXPECT_THAT(missing("star,Ks mag,parallax\n").missing_for_stars, IsEmpty());
  EXPECT_THAT(missing("star,V mag,B-V\n").missing_for_stars, SizeIs(1));
  EXPECT_THAT(missing("star,spectral type\n").missing_for_stars, IsEmpty());
  EXPECT_THAT(missing("planet,teff,insolation\n").missing_for_planets, IsEmpty());
  EXPECT_THAT(missing("planet,teff,luminosity,orbital_period,stellar_mass\n").missing_for_planets, IsEmpty());
  EXPECT_THAT(
      missing("teff,luminosity\n").missing_for_planets,
      ElementsAre("planet", "semi_major_axis, orbital_period with stellar_mass, scaled_semi_major_axis or insolation"));
}

TEST(StarterMap, ChangesNothingAsItStands) {
  const auto list = understood("star,Teff [K],Teff err,e,\"two\nlines \"\"x\"\"\"\nx,5000,70,0.1,\n");
  const auto text = starter_map(list.head, list.understanding);
  const auto map = ColumnMap::parse(text, "map.toml");
  EXPECT_TRUE(map.entries.empty());
  EXPECT_THAT(text, HasSubstr("# teff = { column = \"Teff [K]\", unit = \"K\" }\n"));
  EXPECT_THAT(text, HasSubstr("# teff_err = \"Teff err\"\n"));
  EXPECT_THAT(text, HasSubstr("# column \"e\" may be eccentricity:\n# eccentricity = \"e\"\n"));
  EXPECT_THAT(text, HasSubstr("#   \"two lines"));
}

TEST(StarterMap, LeavesADoubtedColumnToBeDecided) {
  const testing::Folder folder;
  PeekedTable table(open_table(folder.write("list.csv", "star,plx,e_plx\na,0.02,0.001\nb,0.03,\nc,0.04,\n")));
  const auto draft = Understanding::draft(table.head(), {}, planet_inputs(), table.peek());
  const auto text = starter_map(table.head(), draft);
  EXPECT_THAT(text, ::testing::Not(HasSubstr("# parallax = \"plx\"\n")));
  EXPECT_THAT(text, HasSubstr("# parallax_err = \"e_plx\"\n"));
  EXPECT_THAT(text, HasSubstr("it looks like arcsec:\n# parallax = { column = \"plx\", unit = \"arcsec\" }\n"));
}

TEST(StarterMap, ItsLinesGiveTheSameUnderstanding) {
  const auto list = understood("star,Teff [K],Teff err,R* [Rsun],Orbital period (days),l\"x\n");
  auto text = starter_map(list.head, list.understanding);
  std::istringstream lines(text.substr(text.find("[columns]")));
  std::string uncommented;
  for (std::string line; std::getline(lines, line);)
    uncommented += line.find(" = ") != std::string::npos && line.find("Not used") == std::string::npos
                       ? line.substr(2) + '\n'
                       : line + '\n';
  const auto again = Understanding::of(list.head, ColumnMap::parse(uncommented, "map.toml"));
  ASSERT_EQ(again.columns().size(), list.understanding.columns().size());
  for (std::size_t i = 0; i < again.columns().size(); ++i) {
    EXPECT_EQ(again.columns()[i].quantity, list.understanding.columns()[i].quantity);
    EXPECT_EQ(again.columns()[i].part, list.understanding.columns()[i].part);
    EXPECT_EQ(again.columns()[i].unit, list.understanding.columns()[i].unit);
    EXPECT_EQ(again.columns()[i].known_by, KnownBy::map);
  }
}

}  // namespace
}  // namespace hz
