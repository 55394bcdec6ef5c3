// While one lives, writing to a pipe nobody reads fails with EPIPE and does
// not end the program.  Only the calling thread is changed, and only until the
// guard goes: a program whose own output is closed still ends as it should.

#ifndef GATEDYNO_SIM_SIGPIPE_GUARD_H_
#define GATEDYNO_SIM_SIGPIPE_GUARD_H_

#include <csignal>

namespace gatedyno {

class SigpipeGuard {
 public:
  SigpipeGuard();
  ~SigpipeGuard();
  SigpipeGuard(const SigpipeGuard&) = delete;
  SigpipeGuard& operator=(const SigpipeGuard&) = delete;

 private:
  sigset_t before_;
  bool was_pending_ = false;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_SIGPIPE_GUARD_H_
