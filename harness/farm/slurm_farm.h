// Runs jobs on a cluster, through Slurm: the same workers, on many machines.
//
// Jobs are written to a folder that all nodes share, in shares of so many, and
// submitted as task arrays; each task runs `gatedyno task` on one share.  What
// tasks publish (round_folder.h) is all that decides: a share whose task is
// gone from the queue - lost, killed, out of time - is submitted again and runs
// only what is missing; whatever ran twice counts once.
//
// One run at a time uses a folder.  What an earlier one left there, whatever it
// died of, comes first: its tasks are cancelled, publish what they have, and
// all of it is handed on before any job is asked for.

#ifndef GATEDYNO_FARM_SLURM_FARM_H_
#define GATEDYNO_FARM_SLURM_FARM_H_

#include <chrono>
#include <cstdint>
#include <filesystem>
#include <functional>
#include <optional>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/farm/slurm.h"
#include "harness/sim/runner.h"

namespace gatedyno {

struct FarmOptions {
  std::filesystem::path
      folder;  // Under one name on this machine and all nodes.
  // gatedyno, under one name on all nodes; empty: the one that runs.
  std::filesystem::path program;
  std::filesystem::path worker_program;  // Empty: the one beside `program`.
  std::optional<std::uint64_t> memory_limit_bytes;  // Of each worker.
  // What WorkerPool::Simulator() says here: a task on a node that has another
  // one fails.  Empty: not looked at.
  std::string simulator;
  // Slurm takes about a second to start a task: a share should be minutes.
  int jobs_per_task = 500;
  int workers_per_task = 0;  // 0: one for each processor Slurm gives the task.
  // For sbatch: partition, account, time.  One argument each.
  std::vector<std::string> sbatch_arguments;
  std::chrono::milliseconds publish_every{30'000};  // See task.h.
  std::chrono::milliseconds poll_interval{2'000};
  // A task gone from the queue is believed lost after this long: network file
  // systems show new files late.  And a task whose jobs have all come back is
  // given this long to leave.
  std::chrono::milliseconds settle{15'000};
  std::chrono::milliseconds command_limit{60'000};  // Of each Slurm command.
  // For this long a controller that does not answer is waited for.
  std::chrono::milliseconds patience{600'000};
  int fruitless_tasks = 3;  // In a row on a share, before the run fails.
  // Asked at every turn.  Once true, tasks are cancelled, what they publish is
  // taken in, and Run returns.
  std::function<bool()> should_stop;
};

class SlurmFarm : public SimRunner {
 public:
  // Fails when an option is out of range or the folder cannot be made.
  static Result<SlurmFarm> Make(FarmOptions options);

  // See SimRunner.  Begins with Recover.  Outcomes come from this thread; the
  // jobs they make necessary wait until a share is full or nothing else is
  // under way.  Fails when Slurm refuses or stays silent, when the folder
  // cannot be used, and when a share comes back empty again and again; what
  // was published by then is handed on first.
  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override;

  // Hands on what an earlier run left in the folder, without asking any source
  // for jobs, and ends its tasks.
  Status Recover(const OnOutcome& on_outcome);

 private:
  explicit SlurmFarm(FarmOptions options);

  FarmOptions options_;
  Slurm slurm_;
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_SLURM_FARM_H_
