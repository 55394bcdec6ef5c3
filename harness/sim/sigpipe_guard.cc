#include "harness/sim/sigpipe_guard.h"

#include <ctime>

namespace gatedyno {
namespace {

sigset_t OnlySigpipe() {
  sigset_t set;
  sigemptyset(&set);
  sigaddset(&set, SIGPIPE);
  return set;
}

bool IsSigpipePending() {
  sigset_t pending;
  sigemptyset(&pending);
  sigpending(&pending);
  return sigismember(&pending, SIGPIPE) == 1;
}

}  // namespace

SigpipeGuard::SigpipeGuard() : before_() {
  was_pending_ = IsSigpipePending();
  const sigset_t sigpipe = OnlySigpipe();
  pthread_sigmask(SIG_BLOCK, &sigpipe, &before_);
}

SigpipeGuard::~SigpipeGuard() {
  // One raised by our own writes must not be delivered when it is unblocked.
  if (!was_pending_ && IsSigpipePending()) {
    const sigset_t sigpipe = OnlySigpipe();
    const timespec at_once = {};
    sigtimedwait(&sigpipe, nullptr, &at_once);
  }
  pthread_sigmask(SIG_SETMASK, &before_, nullptr);
}

}  // namespace gatedyno
