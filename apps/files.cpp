#include "files.hpp"

#include <fmt/format.h>

#include <cerrno>
#include <cstdio>
#include <cstring>
#include <filesystem>
#include <memory>

#include "hz/error.hpp"

namespace hz::app {
namespace {

struct CloseFile {
  void operator()(std::FILE* file) const { std::fclose(file); }
};
using File = std::unique_ptr<std::FILE, CloseFile>;

[[noreturn]] void cannot_read(const std::string& path, int number) {
  throw Error(Fault::input, fmt::format("cannot read {}: {}", path, std::strerror(number)));
}

}  // namespace

std::string read_text_file(const std::string& path) {
  const File file(std::fopen(path.c_str(), "rb"));
  if (!file) cannot_read(path, errno);
  std::string text;
  char buffer[65536];
  while (const std::size_t count = std::fread(buffer, 1, sizeof buffer, file.get())) text.append(buffer, count);
  if (std::ferror(file.get()) != 0) cannot_read(path, errno);
  return text;
}

void refuse_to_overwrite(const std::string& input, const std::string& output) {
  std::error_code no_such_file;
  if (!std::filesystem::equivalent(input, output, no_such_file)) return;
  throw Error(Fault::usage, fmt::format("{} is the input; name another file after -o, or it would be lost", output));
}

}  // namespace hz::app
