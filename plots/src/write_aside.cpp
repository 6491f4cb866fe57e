#include "write_aside.hpp"

#include <cerrno>
#include <cstring>
#include <fstream>
#include <system_error>

#include "hz/error.hpp"

namespace hz::plots {

void write_aside(const std::filesystem::path& path, std::string_view bytes) {
  const std::filesystem::path aside = path.string() + ".part";
  const auto fail = [&](const std::string& why) {
    std::error_code unremoved;
    std::filesystem::remove(aside, unremoved);
    throw Error(Fault::output, "cannot write " + path.string() + ": " + why);
  };
  std::error_code ignored;
  if (std::filesystem::is_directory(path, ignored))
    throw Error(Fault::output, "cannot write " + path.string() + ": it is a folder");
  errno = 0;
  std::ofstream file(aside, std::ios::binary);
  file.write(bytes.data(), static_cast<std::streamsize>(bytes.size()));
  file.close();
  if (!file) fail(std::strerror(errno));
  std::error_code error;
  std::filesystem::rename(aside, path, error);
  if (error) fail(error.message());
}

}  // namespace hz::plots
