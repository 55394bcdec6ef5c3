// A worker as the pool sees it: a process, whether it said hello, the jobs it
// was sent, and when its patience ends.
//
// A worker does its jobs in the order they were sent and replies in that
// order, so the one it is at, and to blame for its death, is always the oldest
// without a reply.

#ifndef GATEDYNO_SIM_POOL_WORKER_H_
#define GATEDYNO_SIM_POOL_WORKER_H_

#include <chrono>
#include <deque>
#include <filesystem>
#include <memory>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/base/result.h"
#include "harness/sim/attempt.h"
#include "harness/sim/protocol.h"
#include "harness/sim/worker_process.h"

namespace gatedyno {

// Wall clock before a worker at this attempt is killed.
double TimeLimitOf(const Attempt& attempt);

class PoolWorker {
 public:
  using Clock = std::chrono::steady_clock;

  static Result<PoolWorker> Start(const std::filesystem::path& program,
                                  const std::vector<std::string>& arguments);

  // Reads the hello when it has come.  Fails when something else came.
  Status Greet();
  bool greeted() const { return hello_.has_value(); }
  // The hello may still come.
  bool awaits_greeting() const;
  // Ends a worker that never got ready, and says why it did not; `greeting` is
  // what Greet() returned last.
  std::string EndUngreeted(const Status& greeting);
  // REQUIRES: greeted().
  const Hello& hello() const { return *hello_; }

  // Sends one more attempt; `text` is its JobText.
  // REQUIRES: greeted().
  void Give(Attempt attempt, std::string_view text);

  struct Answer {
    Attempt attempt;  // The oldest, which is then no longer with this worker.
    Reply reply;
  };
  // Fails when something else came; the worker is then of no more use.
  Result<std::optional<Answer>> TakeReply();

  // Takes all that are with this worker, oldest first.
  std::vector<Attempt> TakeAttempts();
  size_t job_count() const { return sent_.size(); }
  int jobs_given() const { return jobs_given_; }

  // When the hello or the oldest attempt's reply is overdue; none when idle.
  std::optional<Clock::time_point> deadline() const;

  WorkerProcess& process() { return *process_; }
  const WorkerProcess& process() const { return *process_; }

 private:
  PoolWorker() = default;
  void StartClock();

  std::unique_ptr<WorkerProcess> process_;
  std::optional<Hello> hello_;
  std::deque<Attempt> sent_;
  int jobs_given_ = 0;
  Clock::time_point deadline_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_POOL_WORKER_H_
