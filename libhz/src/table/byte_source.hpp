// The bytes of a file or of standard input.
#pragma once
#include <cstddef>
#include <string>
#include <string_view>

namespace hz {

/// Throws hz::Error (input) when the path cannot be opened or read, and when a signal interrupts the reading.
class ByteSource {
public:
  /// "-" is standard input.
  explicit ByteSource(const std::string& path);
  ~ByteSource();
  ByteSource(ByteSource&& other) noexcept;
  ByteSource(const ByteSource&) = delete;
  ByteSource& operator=(const ByteSource&) = delete;
  ByteSource& operator=(ByteSource&&) = delete;

  /// The path, or "standard input".
  [[nodiscard]] const std::string& name() const { return name_; }

  /// Up to `count` of the next bytes without taking them.
  [[nodiscard]] std::string_view peek(std::size_t count);

  /// Appends up to `count` bytes to `to`; false at the end of the input.
  bool read(std::string& to, std::size_t count);

private:
  std::size_t read_some(char* to, std::size_t count);

  std::string name_;
  std::string peeked_;
  int descriptor_ = -1;
};

}  // namespace hz
