#include "table/byte_source.hpp"

#include <fcntl.h>
#include <fmt/format.h>
#include <sys/stat.h>
#include <unistd.h>

#include <cerrno>
#include <cstring>
#include <utility>

#include "hz/error.hpp"

namespace hz {
namespace {

[[noreturn]] void fail(const std::string& name, const std::string& what) {
  throw Error(Fault::input, fmt::format("{}: {}", name, what));
}

}  // namespace

ByteSource::ByteSource(const std::string& path) : name_(path == "-" ? "standard input" : path) {
  descriptor_ = path == "-" ? STDIN_FILENO : ::open(path.c_str(), O_RDONLY | O_CLOEXEC);
  if (descriptor_ < 0) fail(name_, fmt::format("cannot be read: {}", std::strerror(errno)));
  struct stat status {};
  const bool is_directory = ::fstat(descriptor_, &status) == 0 && S_ISDIR(status.st_mode);
  if (!is_directory) return;
  if (path != "-") ::close(descriptor_);
  fail(name_, "is a directory; name a file in it");
}

ByteSource::~ByteSource() {
  if (descriptor_ > STDERR_FILENO) ::close(descriptor_);
}

ByteSource::ByteSource(ByteSource&& other) noexcept
    : name_(std::move(other.name_)),
      peeked_(std::move(other.peeked_)),
      descriptor_(std::exchange(other.descriptor_, -1)) {}

std::string_view ByteSource::peek(std::size_t count) {
  while (peeked_.size() < count) {
    const auto before = peeked_.size();
    peeked_.resize(count);
    const auto got = read_some(peeked_.data() + before, count - before);
    peeked_.resize(before + got);
    if (got == 0) break;
  }
  return std::string_view(peeked_).substr(0, count);
}

bool ByteSource::read(std::string& to, std::size_t count) {
  if (!peeked_.empty()) {
    to += std::exchange(peeked_, {});
    return true;
  }
  const auto before = to.size();
  to.resize(before + count);
  const auto got = read_some(to.data() + before, count);
  to.resize(before + got);
  return got > 0;
}

std::size_t ByteSource::read_some(char* to, std::size_t count) {
  const auto got = ::read(descriptor_, to, count);
  if (got < 0) fail(name_, fmt::format("reading stopped: {}", std::strerror(errno)));
  return static_cast<std::size_t>(got);
}

}  // namespace hz
