#include "hz/atomic_file.hpp"

#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <sys/stat.h>

#include "list_files.hpp"

namespace hz {
namespace {

using ::testing::HasSubstr;

TEST(AtomicFile, AppearsWholeUnderItsName) {
  const testing::Folder folder;
  write_file(folder.file("f.txt"), "all of it");
  EXPECT_EQ(testing::bytes_of(folder.file("f.txt")), "all of it");
  EXPECT_EQ(folder.entries(), 1U);
}

TEST(AtomicFile, UnfinishedLeavesTheOldFileAndNothingElse) {
  const testing::Folder folder;
  const auto path = folder.write("f.txt", "old");
  try {
    AtomicFile file(path);
    file.write(std::string(1'000'000, 'x'));  // more than is kept in memory
    EXPECT_EQ(folder.entries(), 2U);
    throw std::runtime_error("interrupted");
  } catch (const std::runtime_error&) {
    EXPECT_EQ(testing::bytes_of(path), "old");
    EXPECT_EQ(folder.entries(), 1U);
  }
}

TEST(AtomicFile, TwoWritersDoNotShareTheirFileAside) {
  const testing::Folder folder;
  AtomicFile first(folder.file("f.txt"));
  AtomicFile second(folder.file("f.txt"));
  first.write("first");
  second.write("second");
  second.finish();
  first.finish();
  EXPECT_EQ(testing::bytes_of(folder.file("f.txt")), "first");
  EXPECT_EQ(folder.entries(), 1U);
}

TEST(AtomicFile, NoSuchFolder) {
  EXPECT_THAT(testing::error_of([] { const AtomicFile file("/nowhere/f.txt"); }, Fault::output),
              HasSubstr("/nowhere/f.txt cannot be written: No such file"));
}

TEST(AtomicFile, Directory) {
  const testing::Folder folder;
  EXPECT_THAT(testing::error_of([&] { const AtomicFile file(folder.file("")); }, Fault::output),
              HasSubstr("is a directory"));
}

TEST(AtomicFile, FullDisk) {
  if (!std::filesystem::exists("/dev/full")) GTEST_SKIP() << "this system has no /dev/full";
  const auto fill = [](std::size_t count) {
    return testing::error_of(
        [&] {
          AtomicFile file("/dev/full");
          file.write(std::string(count, 'x'));
          file.finish();
        },
        Fault::output);
  };
  EXPECT_THAT(fill(10), HasSubstr("/dev/full could not be written to the end: No space left on device"));
  EXPECT_THAT(fill(10'000'000), HasSubstr("No space left on device"));
}

TEST(AtomicFile, DevicesAreWrittenAndStayDevices) {
  write_file("/dev/null", "gone");
  EXPECT_TRUE(std::filesystem::is_character_file("/dev/null"));
}

TEST(AtomicFile, LinksAreFollowed) {
  const testing::Folder folder;
  const auto target = folder.write("target.txt", "old");
  std::filesystem::create_symlink(target, folder.file("link.txt"));
  write_file(folder.file("link.txt"), "new");
  EXPECT_EQ(testing::bytes_of(target), "new");
  EXPECT_TRUE(std::filesystem::is_symlink(folder.file("link.txt")));
}

TEST(AtomicFile, StandardOutputIsWrittenDirectly) {
  ::testing::internal::CaptureStdout();
  write_file("-", "to the reader");
  EXPECT_EQ(::testing::internal::GetCapturedStdout(), "to the reader");
}

}  // namespace
}  // namespace hz
