#include "harness/flow/outcome_book.h"

#include <cassert>
#include <set>
#include <utility>

#include <fmt/format.h>

namespace gatedyno {

OutcomeBook::OutcomeBook(SimRunner* runner,
                         Store* store,
                         RunId run,
                         OnProgress on_progress)
    : runner_(runner),
      store_(store),
      run_(run),
      on_progress_(std::move(on_progress)) {}

Status OutcomeBook::Finish(std::span<const Job> jobs) {
  Status noted = store_->AddJobs(run_, jobs);
  if (!noted.ok()) {
    return noted;
  }
  const Result<std::vector<Job>> open = Unfinished(jobs);
  if (!open.ok()) {
    return Forward(open);
  }
  Status kept = Ok();
  Status ran = runner_->Run(*open, [&](const Job& job, const Outcome& outcome) {
    const Status now = Keep(job, outcome);
    kept = kept.ok() ? now : kept;
    on_progress_(counts_);
  });
  if (!ran.ok()) {
    return ran;
  }
  for (const Job& job : *open) {
    if (kept.ok() && !outcomes_.contains(job.key)) {
      return Unavailable(fmt::format(
          "stopped before '{}'; what was measured is kept", job.label));
    }
  }
  return kept;
}

const Outcome& OutcomeBook::OutcomeOf(const std::string& key) const {
  const auto found = outcomes_.find(key);
  assert(found != outcomes_.end());
  return found->second;
}

// The distinct jobs that neither this book nor the store has an outcome of.
Result<std::vector<Job>> OutcomeBook::Unfinished(std::span<const Job> jobs) {
  std::vector<Job> open;
  std::set<std::string> seen;
  for (const Job& job : jobs) {
    if (outcomes_.contains(job.key) || !seen.insert(job.key).second) {
      continue;
    }
    ++counts_.wanted;
    Result<std::optional<Outcome>> stored = store_->FindMeasured(job.key);
    if (!stored.ok()) {
      return Forward(stored);
    }
    if (*stored) {
      ++counts_.reused;
      outcomes_.emplace(job.key, **std::move(stored));
    } else {
      open.push_back(job);
    }
  }
  return open;
}

Status OutcomeBook::Keep(const Job& job, const Outcome& outcome) {
  ++counts_.simulated;
  if (!outcome.measured()) {
    ++counts_.failed;
    failed_.push_back({job.key, job.label, outcome.message});
  }
  outcomes_.emplace(job.key, outcome);
  return store_->SaveOutcome(job, outcome);
}

}  // namespace gatedyno
