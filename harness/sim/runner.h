// The one way to have jobs simulated.
//
// Three implementations: a table in tests, a pool of workers on one machine, a
// farm.  A runner sees decks and what to measure on them, never a cell.

#ifndef GATEDYNO_SIM_RUNNER_H_
#define GATEDYNO_SIM_RUNNER_H_

#include <functional>
#include <span>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"

namespace gatedyno {

class SimRunner {
 public:
  // Called once per job, in the order the jobs end, always from the thread
  // that called Run.
  using OnOutcome = std::function<void(const Job& job, const Outcome& outcome)>;

  virtual ~SimRunner() = default;

  // Runs every job; each one ends in an outcome, whatever happens to the
  // worker that had it.  Fails only when no job can be run at all.
  virtual Status Run(std::span<const Job> jobs,
                     const OnOutcome& on_outcome) = 0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_RUNNER_H_
