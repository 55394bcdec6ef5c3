// Runs jobs on workers of this machine.
//
// One loop in the calling thread, no threads of its own.  Whatever happens to a
// worker costs at most the attempt it was at:
//   - silent past the time limit: killed;
//   - dead, or babbling: replaced;
//   - its simulator gave up: the reply stands, a fresh worker takes over.
// A job that gave nothing is tried again, with more careful settings where
// that may help (attempt.h), and ends as failed, timed out or crashed, in the
// words of its last attempt, once it is out of rungs or has taken
// `kills_before_aside` workers with it.

#ifndef GATEDYNO_SIM_WORKER_POOL_H_
#define GATEDYNO_SIM_WORKER_POOL_H_

#include <cstdint>
#include <filesystem>
#include <string>
#include <string_view>
#include <vector>

#include "harness/sim/attempt_queue.h"
#include "harness/sim/pool_worker.h"
#include "harness/sim/runner.h"

namespace gatedyno {

struct PoolOptions {
  int workers = 0;                       // 0: one a processor.
  std::filesystem::path worker_program;  // Empty: the one installed with us.
  // A simulator's memory grows with every circuit (0.5 KB): a worker is
  // replaced after this many.
  int jobs_per_worker = 2000;
  // Address space of each.  A simulator of a small circuit takes 0.2 GB, and
  // what runs away ends in words rather than with the machine.
  std::uint64_t memory_limit_bytes = std::uint64_t{4} << 30U;
  int kills_before_aside = 3;
};

class WorkerPool : public SimRunner {
 public:
  // Fails when an option is out of range.
  static Result<WorkerPool> Make(PoolOptions options);

  ~WorkerPool() override;
  WorkerPool(WorkerPool&&) = default;
  WorkerPool& operator=(WorkerPool&&) = default;

  // Fails, naming the program and its last words, when no worker can be
  // started.  Workers are kept for the next call.  A worker dies with the
  // thread that started it: call Run from a thread that lives long enough.
  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override;

  // The simulator's name and version, in its own words; starts a worker where
  // there is none yet.  Part of every job's key.
  Result<std::string> Simulator();

 private:
  // What one call of Run works on.
  struct Work {
    AttemptQueue queue;
    const OnOutcome& on_outcome;
    Status status;  // What on_outcome said first that was not good.
  };

  explicit WorkerPool(PoolOptions options);

  void DropDeadWorkers();
  size_t JobsSent() const;
  void StartUpTo(size_t wanted);
  bool StartsKeepFailing() const;
  void SendJobs(Work* work);
  void SendNextTo(PoolWorker* worker, Work* work);
  void WaitForWorkers() const;
  void HandleWorkers(Work* work);
  // False when the worker is to be removed.
  bool Handle(PoolWorker* worker, Work* work);
  bool HandleGreeting(PoolWorker* worker);
  bool HandleReplies(PoolWorker* worker, Work* work);
  bool HandleDeadline(PoolWorker* worker, Work* work);
  void HandleDeath(PoolWorker* worker, Work* work, const std::string& babble);
  // The attempts of a worker that is gone; its oldest is to blame.
  void HandleLoss(PoolWorker* worker,
                  Work* work,
                  Mishap mishap,
                  std::string_view how);
  void Judge(Work* work, PoolWorker::Answer answer);
  static void Finish(Work* work, const Attempt& attempt, Outcome outcome);
  void NoteFailedStart(std::string why);

  PoolOptions options_;
  std::vector<PoolWorker> workers_;
  int failed_starts_ = 0;  // In a row.
  std::string last_failed_start_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_WORKER_POOL_H_
