// A file that appears whole or not at all.
#pragma once
#include <cstddef>
#include <string>
#include <string_view>

namespace hz {

/// Writes aside, in the folder of the final file, and renames in finish().
///
/// Until finish() returns nothing is seen under the final name, and an older file there stays as it is. Destroying an
/// unfinished file removes what was written aside, so unwinding by an exception leaves nothing behind. Path "-" is
/// standard output; it and devices or pipes are written directly. A link is followed. Every failure (no such folder,
/// full disk, reader gone) throws hz::Error (output) with the system's words.
class AtomicFile {
public:
  explicit AtomicFile(std::string path);
  ~AtomicFile();
  AtomicFile(const AtomicFile&) = delete;
  AtomicFile& operator=(const AtomicFile&) = delete;

  void write(std::string_view bytes);
  void finish();

  [[nodiscard]] const std::string& path() const { return path_; }

private:
  void open();
  void flush();
  [[noreturn]] void fail(const std::string& what, int error) const;

  std::string path_;
  std::string target_;  // path_ with links followed
  std::string aside_;   // empty when written directly
  std::string buffer_;
  int descriptor_ = -1;
};

/// All of `bytes` into the file at `path`, as AtomicFile does it.
void write_file(const std::string& path, std::string_view bytes);

}  // namespace hz
