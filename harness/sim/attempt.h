// One try at a job, and what comes after one that gave nothing.

#ifndef GATEDYNO_SIM_ATTEMPT_H_
#define GATEDYNO_SIM_ATTEMPT_H_

#include <cstddef>
#include <optional>

#include "harness/record/job.h"

namespace gatedyno {

struct Attempt {
  Job job;
  size_t rung = 0;  // Of Job::settings.
  int losses = 0;   // Workers the job has taken with it so far.
};

enum class Mishap {
  kRefused,    // The simulator failed, in words, and lives on.
  kSilent,     // No reply within the time limit; the worker was killed.
  kCrashed,    // The worker ended by its own fault, or babbled.
  kTakenAway,  // Somebody outside ended the worker.
};

// The attempt to make after `attempt` ended in `mishap`; none when that was its
// last, by the rungs or because it has cost `losses_before_aside` workers.
//
//   refused     one rung up: the same settings would fail again
//   crashed     one rung up, or again on the last
//   silent      once more as it was, since a machine may stall; then up
//   taken away  as it was: it says nothing of the deck, and a point must not
//               depend on who was killed when
std::optional<Attempt> NextAttempt(Attempt attempt,
                                   Mishap mishap,
                                   int losses_before_aside);

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_ATTEMPT_H_
