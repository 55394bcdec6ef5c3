// The one way to have jobs simulated.
//
// Three implementations: a table in tests, a pool of workers on one machine, a
// farm.  A runner sees decks and what to measure on them, never a cell.

#ifndef GATEDYNO_SIM_RUNNER_H_
#define GATEDYNO_SIM_RUNNER_H_

#include <functional>
#include <optional>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"

namespace gatedyno {

// Where a runner's jobs come from, one at a time: a plan of a hundred thousand
// is never in memory at once, and what an outcome makes necessary follows it.
class JobSource {
 public:
  virtual ~JobSource() = default;

  // The next job; none when there is none now.  There may be more after an
  // outcome, and there is nothing more once none is under way.
  virtual std::optional<Job> Next() = 0;
};

class SimRunner {
 public:
  // Called once per job, in the order the jobs end, always from the thread
  // that called Run.  A failure ends the run.
  using OnOutcome =
      std::function<Status(const Job& job, const Outcome& outcome)>;

  virtual ~SimRunner() = default;

  // Runs jobs until the source has none and none is under way.  Each ends in an
  // outcome, whatever happens to the worker that has it.  Fails when no job can
  // be run at all, and with what `on_outcome` returned.
  virtual Status Run(JobSource& jobs, const OnOutcome& on_outcome) = 0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_RUNNER_H_
