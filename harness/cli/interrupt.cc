#include "harness/cli/interrupt.h"

#include <csignal>
#include <string_view>

#include <unistd.h>

namespace gatedyno {
namespace {

// What a handler may touch.
volatile std::sig_atomic_t interrupted = 0;

void OnSignal(int signal) {
  constexpr int kSignalledExit = 128;
  constexpr std::string_view kNotice =
      "\ngatedyno: stopping once the jobs in flight have ended; again to stop "
      "at once\n";
  if (interrupted != 0) {
    ::_exit(kSignalledExit + signal);
  }
  interrupted = 1;
  [[maybe_unused]] const ssize_t ignored =
      ::write(STDERR_FILENO, kNotice.data(), kNotice.size());
}

}  // namespace

void CatchInterrupts() {
  struct sigaction action = {};
  action.sa_handler = &OnSignal;
  ::sigaction(SIGINT, &action, nullptr);
  ::sigaction(SIGTERM, &action, nullptr);
}

bool Interrupted() {
  return interrupted != 0;
}

}  // namespace gatedyno
