// SIGTERM, put off: Slurm sends it some time before it kills a task.
//
// Blocked in the whole program, and so in the workers it starts: those get the
// signal too, and what they are at ends well all the same.  KILL works as ever.

#ifndef GATEDYNO_FARM_HELD_TERMINATION_H_
#define GATEDYNO_FARM_HELD_TERMINATION_H_

#include <csignal>

namespace gatedyno {

// REQUIRES: the program has no other thread yet.
inline void HoldTermination() {
  sigset_t signals;
  ::sigemptyset(&signals);
  ::sigaddset(&signals, SIGTERM);
  ::sigprocmask(SIG_BLOCK, &signals, nullptr);
}

// Whether it has come since.
inline bool TerminationAsked() {
  sigset_t pending;
  return ::sigpending(&pending) == 0 && ::sigismember(&pending, SIGTERM) == 1;
}

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_HELD_TERMINATION_H_
