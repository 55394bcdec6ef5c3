// Which jobs wait, which are with a worker, and which worker deaths each job
// is to blame for.

#ifndef GATEDYNO_SIM_JOB_LEDGER_H_
#define GATEDYNO_SIM_JOB_LEDGER_H_

#include <cstddef>
#include <deque>
#include <optional>
#include <span>
#include <vector>

namespace gatedyno {

// Jobs are named by their index, 0 to job_count - 1.
class JobLedger {
 public:
  // REQUIRES: kills_before_aside >= 1.
  JobLedger(size_t job_count, int kills_before_aside);

  // The next job to run.
  std::optional<size_t> Take();

  // Jobs that no worker started: they run next, in the same order.
  void GiveBack(std::span<const size_t> jobs);

  // `job` was running when its worker died.  True when that makes it one
  // death too many and the job is set aside: the caller ends it.  Otherwise
  // it waits again, after the others, so that a healthy job is not held up.
  bool Blame(size_t job);

  void MarkEnded() { ++ended_; }

  size_t waiting() const { return waiting_.size(); }
  size_t unended() const { return kills_.size() - ended_; }

 private:
  int kills_before_aside_;
  std::deque<size_t> waiting_;
  std::vector<int> kills_;  // By job.
  size_t ended_ = 0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_JOB_LEDGER_H_
