#include "harness/flow/stored_only.h"

#include <optional>
#include <utility>

#include "harness/flow/characterize.h"
#include "harness/flow/work_desk.h"

namespace gatedyno {

Result<Outcome> StoredOnly::OutcomeOf(const Job& job) {
  const Result<std::optional<StoredJob>> stored = store_->FindJob(job.key);
  if (!stored.ok()) {
    return Forward(stored);
  }
  if (*stored && (*stored)->outcome) {
    return *(*stored)->outcome;
  }
  ++missing_;
  Outcome outcome;
  outcome.message = "not in the store";
  return outcome;
}

Status StoredOnly::Run(JobSource& jobs, const OnOutcome& on_outcome) {
  while (const std::optional<Job> job = jobs.Next()) {
    const Result<Outcome> outcome = OutcomeOf(*job);
    if (!outcome.ok()) {
      return Forward(outcome);
    }
    Status kept = on_outcome(*job, *outcome);
    if (!kept.ok()) {
      return kept;
    }
  }
  return Ok();
}

Result<FromStore> CharacterizeFromStore(const PreparedRun& run,
                                        const std::string& simulator,
                                        Store* store) {
  StoredOnly runner(store);
  WorkDesk desk(&runner, store, {.read_only = true});
  Result<RunResult> result = Characterize(run, simulator, &desk);
  if (!result.ok()) {
    return Forward(result);
  }
  result->jobs.reused += result->jobs.simulated - runner.missing();
  result->jobs.simulated = 0;
  return FromStore{.result = *std::move(result),
                   .missing_jobs = runner.missing()};
}

}  // namespace gatedyno
