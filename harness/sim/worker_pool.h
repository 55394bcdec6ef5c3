// Runs jobs on workers of this machine.
//
// One loop in the calling thread, no threads of its own.  Whatever happens to
// a worker costs at most the job it was at:
//   - silent past the job's time limit: killed, the job ends as timed out;
//   - dead, or babbling: the job runs again on a fresh worker, and ends as
//     crashed once it has taken `kills_before_aside` workers with it;
//   - its simulator gave up: the reply stands, a fresh worker takes over.

#ifndef GATEDYNO_SIM_WORKER_POOL_H_
#define GATEDYNO_SIM_WORKER_POOL_H_

#include <cstdint>
#include <filesystem>
#include <functional>
#include <optional>
#include <string>
#include <vector>

#include "harness/sim/job_ledger.h"
#include "harness/sim/pool_worker.h"
#include "harness/sim/runner.h"

namespace gatedyno {

struct PoolOptions {
  int workers = 0;                       // 0: one a processor.
  std::filesystem::path worker_program;  // Empty: the one installed with us.
  // A simulator's memory grows with every circuit (0.5 KB): a worker is
  // replaced after this many.
  int jobs_per_worker = 2000;
  std::optional<std::uint64_t> memory_limit_bytes;  // Address space, each.
  int kills_before_aside = 3;
  // Asked before a job is sent.  Once true, the jobs already with workers end
  // and Run returns; the rest have no outcome.
  std::function<bool()> should_stop;
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
  Status Run(std::span<const Job> jobs, const OnOutcome& on_outcome) override;

 private:
  // What one call of Run works on.
  struct Work {
    std::span<const Job> jobs;
    const OnOutcome& on_outcome;
    JobLedger ledger;
  };

  explicit WorkerPool(PoolOptions options);

  void DropDeadWorkers();
  bool StopRequested() const;
  bool AnyJobSent() const;
  void StartMissing(const Work& work);
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
  void NoteFailedStart(std::string why);
  void Finish(Work* work, size_t job, const Outcome& outcome);

  PoolOptions options_;
  std::vector<PoolWorker> workers_;
  int failed_starts_ = 0;  // Since a worker last said hello.
  std::string last_failed_start_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_SIM_WORKER_POOL_H_
