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
#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/sim/protocol.h"
#include "harness/sim/worker_process.h"

namespace gatedyno {

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

  // Sends one more job, known to the pool as `index`.
  // REQUIRES: greeted().
  void Give(size_t index, const Job& job, std::string_view job_text);

  // The reply to the oldest job, which is then no longer with this worker.
  // Fails when something else came; the worker is then of no more use.
  Result<std::optional<Reply>> TakeReply();

  // Oldest first.
  std::vector<size_t> jobs() const;
  size_t job_count() const { return sent_.size(); }
  int jobs_given() const { return jobs_given_; }

  // When the hello or the oldest job's reply is overdue; none when idle.
  std::optional<Clock::time_point> deadline() const;
  // REQUIRES: job_count() > 0.
  double oldest_time_limit_s() const { return sent_.front().time_limit_s; }

  WorkerProcess& process() { return *process_; }
  const WorkerProcess& process() const { return *process_; }

 private:
  struct SentJob {
    size_t index = 0;
    double time_limit_s = 0.0;
  };

  PoolWorker() = default;
  void StartClock();

  std::unique_ptr<WorkerProcess> process_;
  std::optional<Hello> hello_;
  std::deque<SentJob> sent_;
  int jobs_given_ = 0;
  Clock::time_point deadline_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_POOL_WORKER_H_
