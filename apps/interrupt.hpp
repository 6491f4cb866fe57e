// Ctrl-C, termination and a closed pipe: noticed between pieces of work, so that everything is put away on the way out.
#pragma once
#include <exception>

namespace hz::app {

/// Thrown where the work stops because a signal asked for it. Unwinding removes what was written aside.
class Stopped : public std::exception {
public:
  [[nodiscard]] const char* what() const noexcept override { return "stopped by a signal"; }
};

/// From here on SIGINT, SIGTERM and SIGPIPE are remembered; a second SIGINT or SIGTERM ends the program at once.
void remember_stop_signals();

/// The signal that asked to stop; 0 when none did.
[[nodiscard]] int stop_signal();

/// Throws Stopped when a signal asked to stop. Long loops call it once a chunk.
void stop_if_asked();

}  // namespace hz::app
