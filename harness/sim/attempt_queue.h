// The attempts that wait for a worker, and the source behind them.

#ifndef GATEDYNO_SIM_ATTEMPT_QUEUE_H_
#define GATEDYNO_SIM_ATTEMPT_QUEUE_H_

#include <cstddef>
#include <deque>
#include <optional>
#include <vector>

#include "harness/sim/attempt.h"
#include "harness/sim/runner.h"

namespace gatedyno {

class AttemptQueue {
 public:
  // `source` outlives the queue.
  explicit AttemptQueue(JobSource* source) : source_(source) {}

  // How many wait, counted no further than `enough`: jobs are drawn from the
  // source only as they are needed.
  size_t Waiting(size_t enough);

  // The next one to make: what was given back, then new jobs, then second
  // tries, so that a healthy job is not held up.
  std::optional<Attempt> Take();

  // Attempts that no worker began: they run next, in the same order.
  void GiveBack(std::vector<Attempt> attempts);

  void Retry(Attempt attempt) { retries_.push_back(std::move(attempt)); }

 private:
  JobSource* source_;
  std::deque<Attempt> fresh_;
  std::deque<Attempt> retries_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_ATTEMPT_QUEUE_H_
