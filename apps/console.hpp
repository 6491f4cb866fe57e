// Where words go: data to standard output, everything else to standard error.
#pragma once
#include <cstddef>
#include <string>
#include <string_view>

namespace hz::app {

enum class ColorChoice { automatic, always, never };

enum class Style {
  plain,
  strong,  // headings and the sentence to read first
  faint,   // what may be skipped
  water,   // planets and limits inside a zone
};

class Console {
public:
  Console(bool quiet, ColorChoice color);

  /// Text to standard output, as it is. Throws hz::Error (output) when it cannot be written.
  void print(std::string_view text);

  /// A remark to standard error, a line of its own; nothing when the user asked for quiet.
  void say(std::string_view remark);

  /// `text` as it should look on standard output: unchanged where colour is off.
  [[nodiscard]] std::string styled(std::string_view text, Style style) const;

  [[nodiscard]] bool quiet() const { return quiet_; }

  /// Whether a progress bar on standard error would be seen and is wanted.
  [[nodiscard]] bool shows_progress() const;

  /// Writes out what is still on its way; afterwards all of it has arrived. Throws hz::Error (output) otherwise.
  void finish();

private:
  bool quiet_;
  bool color_;
};

/// Columns of the terminal on standard output, at most 100; 80 where it is none.
[[nodiscard]] std::size_t terminal_width();

}  // namespace hz::app
