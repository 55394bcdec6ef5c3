// One call of SlurmFarm::Run, from the first job to the last outcome.

#ifndef GATEDYNO_FARM_FARM_RUN_H_
#define GATEDYNO_FARM_FARM_RUN_H_

#include <chrono>
#include <optional>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/farm/round.h"
#include "harness/farm/round_draft.h"
#include "harness/farm/slurm.h"
#include "harness/farm/slurm_farm.h"
#include "harness/sim/runner.h"

namespace gatedyno {

// All that is passed outlives the object.  The calling thread alone works.
class FarmRun {
 public:
  FarmRun(const FarmOptions& options,
          const Slurm& slurm,
          int most_shares,
          JobSource* jobs,
          const SimRunner::OnOutcome& on_outcome);

  Status Run();

 private:
  using Clock = std::chrono::steady_clock;

  bool StopAsked() const;
  bool AnyMissing() const;

  // Takes what the source has, and submits what is worth a task.
  Status TakeJobs();
  Status Draft(const Job& job);
  Status SubmitDraft();
  Result<std::string> Submit(const RoundFolder& folder,
                             std::vector<int> shares) const;

  // Looks at the queue, then at what is published, then makes up for losses.
  Status Poll();
  Result<std::vector<QueuedTask>> LookAtQueue();
  Status Merge();
  Status MakeUp(const std::vector<QueuedTask>& queue);
  Status SubmitAgain(Round* round, const std::vector<int>& lost);
  // `queue` is null while Slurm does not answer.
  void DropFinished(const std::vector<QueuedTask>* queue);
  bool MayGo(Round* round, const std::vector<QueuedTask>* queue);
  // Slurm did not answer; fails once it has not for longer than its patience.
  Status Wait(const Error& why);
  void Pause() const;

  // Ends all tasks, takes in what they published, and returns `why`.
  Status End(const Status& why);

  const FarmOptions& options_;
  const Slurm& slurm_;
  const size_t most_shares_;
  JobSource* const jobs_;
  const SimRunner::OnOutcome& on_outcome_;
  std::optional<RoundDraft> draft_;
  std::vector<Round> rounds_;
  std::optional<Clock::time_point> silent_since_;
  bool refused_ = false;  // on_outcome_ failed, and is called no more.
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_FARM_RUN_H_
