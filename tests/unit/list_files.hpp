// A table in a file of its own, for tests.
#pragma once
#include <gtest/gtest.h>
#include <unistd.h>

#include <filesystem>
#include <fstream>
#include <memory>
#include <sstream>
#include <string>
#include <string_view>
#include <vector>

#include "hz/error.hpp"
#include "hz/table/table.hpp"
#include "hz/table/understanding.hpp"

namespace hz::testing {

/// A folder that goes away with the test.
class Folder {
public:
  Folder() {
    const auto* const test = ::testing::UnitTest::GetInstance()->current_test_info();
    const auto name =
        std::string("hz_") + test->test_suite_name() + '_' + test->name() + '_' + std::to_string(::getpid());
    path_ = std::filesystem::temp_directory_path() / name;
    std::filesystem::remove_all(path_);
    std::filesystem::create_directories(path_);
  }
  ~Folder() { std::filesystem::remove_all(path_); }
  Folder(const Folder&) = delete;
  Folder& operator=(const Folder&) = delete;

  [[nodiscard]] std::string file(const std::string& name) const { return (path_ / name).string(); }
  std::string write(const std::string& name, std::string_view bytes) const {
    std::ofstream(file(name), std::ios::binary) << bytes;
    return file(name);
  }
  [[nodiscard]] std::size_t entries() const {
    return static_cast<std::size_t>(
        std::distance(std::filesystem::directory_iterator(path_), std::filesystem::directory_iterator()));
  }

private:
  std::filesystem::path path_;
};

inline std::string bytes_of(const std::string& path) {
  std::ostringstream out;
  out << std::ifstream(path, std::ios::binary).rdbuf();
  return out.str();
}

/// Every cell of a table as text, row by row, and the problems of its rows.
struct WholeTable {
  TableHead head;
  std::vector<std::vector<std::string>> rows;
  std::vector<std::size_t> lines;
  std::vector<std::string> problems;
};

inline WholeTable read_whole(const std::string& path) {
  const auto reader = open_table(path);
  WholeTable out;
  out.head = reader->head();
  while (const auto chunk = reader->next()) {
    for (std::size_t row = 0; row < chunk->rows(); ++row) {
      std::vector<std::string> cells;
      for (std::size_t i = 0; i < out.head.columns.size(); ++i) cells.push_back(chunk->text(i, row));
      out.rows.push_back(std::move(cells));
      out.lines.push_back(chunk->lines[row]);
      out.problems.push_back(chunk->row_problems[row] ? chunk->row_problems[row]->what : std::string());
    }
  }
  return out;
}

/// All rows of a list, read as records.
inline std::vector<ListRow> read_list(const std::string& path, const ColumnMap& map = {}) {
  const auto reader = open_table(path);
  const auto understanding = Understanding::of(reader->head(), map);
  std::vector<ListRow> rows;
  while (const auto chunk = reader->next()) {
    for (std::size_t row = 0; row < chunk->rows(); ++row) rows.push_back(understanding.row(*chunk, row));
  }
  return rows;
}

/// The text of the hz::Error that `action` throws; empty when it throws none. Its fault is checked.
template <class Action>
std::string error_of(Action action, Fault fault = Fault::input) {
  try {
    action();
  } catch (const Error& error) {
    EXPECT_EQ(error.fault(), fault);
    return error.what();
  }
  return {};
}

}  // namespace hz::testing
