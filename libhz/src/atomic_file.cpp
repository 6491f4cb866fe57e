#include "hz/atomic_file.hpp"

#include <fcntl.h>
#include <fmt/format.h>
#include <sys/stat.h>
#include <unistd.h>

#include <cerrno>
#include <cstring>
#include <filesystem>
#include <system_error>
#include <utility>

#include "hz/error.hpp"

namespace hz {
namespace {

constexpr std::size_t buffer_size = 1 << 18;

std::string followed(const std::string& path) {
  std::error_code error;
  if (!std::filesystem::is_symlink(path, error)) return path;
  const auto target = std::filesystem::weakly_canonical(path, error);
  return error ? path : target.string();
}

std::string name_aside(const std::string& target, int attempt) {
  const std::filesystem::path path(target);
  const auto name = fmt::format(".{}.{}-{}.part", path.filename().string(), ::getpid(), attempt);
  return (path.parent_path() / name).string();
}

}  // namespace

AtomicFile::AtomicFile(std::string path) : path_(std::move(path)), target_(followed(path_)) {
  if (path_ == "-") {
    descriptor_ = STDOUT_FILENO;
    return;
  }
  open();
}

AtomicFile::~AtomicFile() {
  if (descriptor_ > STDERR_FILENO) ::close(descriptor_);
  if (!aside_.empty()) ::unlink(aside_.c_str());
}

// Renaming onto a device or a pipe would put a plain file in its place: these are written directly.
void AtomicFile::open() {
  struct stat status {};
  const bool exists = ::stat(target_.c_str(), &status) == 0;
  if (exists && S_ISDIR(status.st_mode)) fail("is a directory; name a file", 0);
  if (exists && !S_ISREG(status.st_mode)) {
    descriptor_ = ::open(target_.c_str(), O_WRONLY | O_CLOEXEC);
    if (descriptor_ < 0) fail("cannot be written", errno);
    return;
  }
  for (int attempt = 0; descriptor_ < 0; ++attempt) {
    auto aside = name_aside(target_, attempt);
    descriptor_ = ::open(aside.c_str(), O_WRONLY | O_CREAT | O_EXCL | O_CLOEXEC, 0666);
    if (descriptor_ < 0 && errno != EEXIST) fail("cannot be written", errno);
    if (descriptor_ >= 0) aside_ = std::move(aside);
  }
}

void AtomicFile::write(std::string_view bytes) {
  buffer_ += bytes;
  if (buffer_.size() >= buffer_size) flush();
}

void AtomicFile::flush() {
  std::string_view rest = buffer_;
  while (!rest.empty()) {
    const auto written = ::write(descriptor_, rest.data(), rest.size());
    if (written >= 0) {
      rest.remove_prefix(static_cast<std::size_t>(written));
    } else if (errno != EINTR) {
      fail("could not be written to the end", errno);
    }
  }
  buffer_.clear();
}

void AtomicFile::finish() {
  flush();
  if (path_ == "-") return;
  // Some disks say only here that they are full.
  if (::close(std::exchange(descriptor_, -1)) != 0) fail("could not be written to the end", errno);
  if (aside_.empty()) return;
  if (::rename(aside_.c_str(), target_.c_str()) != 0) fail("could not be put in place", errno);
  aside_.clear();
}

void AtomicFile::fail(const std::string& what, int error) const {
  const auto name = path_ == "-" ? std::string("standard output") : path_;
  throw Error(Fault::output, error == 0 ? fmt::format("{} {}", name, what)
                                        : fmt::format("{} {}: {}", name, what, std::strerror(error)));
}

void write_file(const std::string& path, std::string_view bytes) {
  AtomicFile file(path);
  file.write(bytes);
  file.finish();
}

}  // namespace hz
