// Rounds that nobody waits for any more: of a run that was killed, stopped or
// failed.

#ifndef GATEDYNO_FARM_LEFTOVERS_H_
#define GATEDYNO_FARM_LEFTOVERS_H_

#include <span>

#include "harness/base/result.h"
#include "harness/farm/round_folder.h"
#include "harness/farm/slurm.h"
#include "harness/farm/slurm_farm.h"
#include "harness/sim/runner.h"

namespace gatedyno {

// Cancels the tasks of `rounds` and waits until they have published what they
// have and left.  Fails when some are still there after two minutes.
Status EndTasks(const FarmOptions& options,
                const Slurm& slurm,
                std::span<const RoundFolder> rounds);

// Calls `on_outcome` for all that is published in the folder, once a job of
// each round, and removes the rounds.  Their tasks are ended first.
Status HandOnLeftovers(const FarmOptions& options,
                       const Slurm& slurm,
                       const SimRunner::OnOutcome& on_outcome);

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_LEFTOVERS_H_
