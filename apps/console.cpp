#include "console.hpp"

#include <fmt/format.h>
#include <sys/ioctl.h>
#include <unistd.h>

#include <algorithm>
#include <cerrno>
#include <cstdio>
#include <cstdlib>
#include <cstring>

#include "hz/error.hpp"
#include "interrupt.hpp"

namespace hz::app {
namespace {

/// https://no-color.org: a NO_COLOR that is set and not empty wins over a terminal.
bool color_is_welcome() {
  const char* const no_color = std::getenv("NO_COLOR");
  const char* const term = std::getenv("TERM");
  const bool refused =
      (no_color != nullptr && *no_color != '\0') || (term != nullptr && std::strcmp(term, "dumb") == 0);
  return !refused && isatty(STDOUT_FILENO) == 1;
}

const char* escape_of(Style style) {
  switch (style) {
    case Style::strong: return "\x1b[1m";
    case Style::faint: return "\x1b[2m";
    case Style::water: return "\x1b[34m";
    case Style::plain: break;
  }
  return "";
}

[[noreturn]] void standard_output_failed(int number) {
  stop_if_asked();  // a closed pipe is no trouble worth a message
  throw Error(Fault::output, fmt::format("cannot write to standard output: {}", std::strerror(number)));
}

}  // namespace

Console::Console(bool quiet, ColorChoice color)
    : quiet_(quiet), color_(color == ColorChoice::always || (color == ColorChoice::automatic && color_is_welcome())) {}

void Console::print(std::string_view text) {
  if (std::fwrite(text.data(), 1, text.size(), stdout) != text.size()) standard_output_failed(errno);
}

void Console::say(std::string_view remark) {
  if (quiet_) return;
  std::fflush(stdout);  // where both go to one place, they stay in order
  fmt::print(stderr, "{}\n", remark);
}

std::string Console::styled(std::string_view text, Style style) const {
  if (!color_ || style == Style::plain) return std::string(text);
  return fmt::format("{}{}\x1b[0m", escape_of(style), text);
}

bool Console::shows_progress() const { return !quiet_ && isatty(STDERR_FILENO) == 1; }

void Console::finish() {
  if (std::fflush(stdout) != 0) standard_output_failed(errno);
}

std::size_t terminal_width() {
  constexpr std::size_t usual = 80, narrowest = 50, widest = 100;
  winsize size = {};
  if (ioctl(STDOUT_FILENO, TIOCGWINSZ, &size) != 0 || size.ws_col == 0) return usual;
  return std::min(widest, std::max(narrowest, static_cast<std::size_t>(size.ws_col)));
}

}  // namespace hz::app
