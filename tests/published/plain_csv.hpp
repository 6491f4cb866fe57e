// Reads the small tables that stand beside these tests: '#' comments, one header line, no quoting.
#pragma once
#include <fstream>
#include <map>
#include <sstream>
#include <stdexcept>
#include <string>
#include <vector>

namespace hz_test {

using CsvRow = std::map<std::string, std::string>;

inline std::vector<std::string> split(const std::string& line) {
  std::vector<std::string> cells;
  std::istringstream stream(line + ",");
  for (std::string cell; std::getline(stream, cell, ',');) cells.push_back(cell);
  return cells;
}

/// Rows by column name. Throws when the file is missing or a row is ragged: a table that is not read tests nothing.
inline std::vector<CsvRow> plain_csv(const std::string& name) {
  std::ifstream file(std::string(HZ_TEST_DIR) + "/published/" + name);
  std::vector<std::string> header;
  std::vector<CsvRow> rows;
  for (std::string line; std::getline(file, line);) {
    if (line.empty() || line.front() == '#') continue;
    const std::vector<std::string> cells = split(line);
    if (header.empty()) {
      header = cells;
      continue;
    }
    if (cells.size() != header.size())
      throw std::runtime_error(std::string(name).append(": ragged row: ").append(line));
    CsvRow row;
    for (std::size_t i = 0; i < cells.size(); ++i) row[header[i]] = cells[i];
    rows.push_back(row);
  }
  if (rows.empty()) throw std::runtime_error(name + ": no rows");
  return rows;
}

/// One unit of the last printed digit: 0.01 for "1.70".
inline double last_digit(const std::string& printed) {
  const std::size_t point = printed.find('.');
  double unit = 1;
  for (std::size_t i = point; i != std::string::npos && i + 1 < printed.size(); ++i) unit /= 10;
  return unit;
}

}  // namespace hz_test
