// The outcomes of a run's jobs, each job simulated once.
//
// Jobs with the same key are one job.  What the store has already measured is
// taken from there; everything simulated is written there as it ends.  The
// store also notes which jobs the run consists of.

#ifndef GATEDYNO_FLOW_OUTCOME_BOOK_H_
#define GATEDYNO_FLOW_OUTCOME_BOOK_H_

#include <functional>
#include <map>
#include <span>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/record/run_result.h"
#include "harness/sim/runner.h"
#include "harness/store/store.h"

namespace gatedyno {

class OutcomeBook {
 public:
  // Called after each job of this run has ended.
  using OnProgress = std::function<void(const JobCounts& counts)>;

  // `runner` and `store` outlive the book.
  OutcomeBook(SimRunner* runner,
              Store* store,
              RunId run,
              OnProgress on_progress);

  // Brings every job to an end.  Fails when nothing can be simulated, when
  // the store cannot be written, or when the runner was told to stop.
  Status Finish(std::span<const Job> jobs);

  // REQUIRES: the job has been finished.
  const Outcome& OutcomeOf(const std::string& key) const;

  const JobCounts& counts() const { return counts_; }
  const std::vector<FailedJob>& failed() const { return failed_; }

 private:
  Result<std::vector<Job>> Unfinished(std::span<const Job> jobs);
  Status Keep(const Job& job, const Outcome& outcome);

  SimRunner* runner_;
  Store* store_;
  RunId run_;
  OnProgress on_progress_;
  std::map<std::string, Outcome> outcomes_;
  std::vector<FailedJob> failed_;
  JobCounts counts_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_OUTCOME_BOOK_H_
