// Jobs of a store, simulated once more: for who asks again, or for their waves.

#ifndef GATEDYNO_SIM_REPLAY_H_
#define GATEDYNO_SIM_REPLAY_H_

#include <cstddef>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/sim/runner.h"

namespace gatedyno {

// The job without its other rungs, and with the time that this one is given.
// REQUIRES: rung < RungCount(job).
Job OnlyRung(const Job& job, size_t rung);

// How each of the jobs ends, in their order.  Fails when no job can be run.
// REQUIRES: no two jobs have the same key.
Result<std::vector<Outcome>> SimulateAgain(std::vector<Job> jobs,
                                           SimRunner* runner);

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_REPLAY_H_
