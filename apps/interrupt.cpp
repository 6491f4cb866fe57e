#include "interrupt.hpp"

#include <csignal>
#include <initializer_list>

namespace hz::app {
namespace {

volatile std::sig_atomic_t asked_to_stop = 0;  // a signal handler can reach nothing else

extern "C" void remember(int signal) { asked_to_stop = signal; }

void watch(int signal) {
  struct sigaction action = {};
  action.sa_handler = remember;
  // No SA_RESTART: a blocked read or write returns. Reset at once: the second signal of a kind kills.
  action.sa_flags = static_cast<int>(SA_RESETHAND);
  sigaction(signal, &action, nullptr);
}

}  // namespace

void remember_stop_signals() {
  for (const int signal : {SIGINT, SIGTERM, SIGPIPE}) watch(signal);
}

int stop_signal() { return asked_to_stop; }

void stop_if_asked() {
  if (asked_to_stop != 0) throw Stopped();
}

}  // namespace hz::app
