#include "harness/flow/work_desk.h"

#include <cassert>
#include <utility>

#include <fmt/format.h>

namespace gatedyno {

WorkDesk::WorkDesk(SimRunner* runner, Store* store, DeskOptions options)
    : runner_(runner), store_(store), options_(std::move(options)) {}

void WorkDesk::Ask(const Job& job, OnEnd on_end) {
  if (const auto under_way = waiting_.find(job.key);
      under_way != waiting_.end()) {
    under_way->second.push_back(std::move(on_end));
    return;
  }
  if (const auto failed = unmeasured_.find(job.key);
      failed != unmeasured_.end()) {
    on_end(failed->second);
    return;
  }
  const bool is_new = seen_.insert(job.key).second;
  progress_.jobs.wanted += is_new ? 1 : 0;
  if (const std::optional<Outcome> known = Known(job)) {
    progress_.jobs.reused += is_new ? 1 : 0;
    on_end(*known);
    return;
  }
  waiting_[job.key].push_back(std::move(on_end));
  ready_.push_back(job);
}

Status WorkDesk::Work(const Feed& feed) {
  feed_ = &feed;
  Status ran =
      runner_->Run(*this, [this](const Job& job, const Outcome& outcome) {
        return Keep(job, outcome);
      });
  feed_ = nullptr;
  if (!ran.ok()) {
    return ran;
  }
  if (!status_.ok()) {
    return status_;
  }
  if (stopped()) {
    return Unavailable("stopped; what was measured is kept");
  }
  assert(waiting_.empty());
  return Ok();
}

bool WorkDesk::stopped() const {
  return options_.should_stop && options_.should_stop();
}

std::optional<Job> WorkDesk::Next() {
  while (status_.ok() && !stopped()) {
    if (!ready_.empty()) {
      Job job = std::move(ready_.front());
      ready_.pop_front();
      return job;
    }
    if (feed_ == nullptr || !(*feed_)()) {
      break;
    }
  }
  return std::nullopt;
}

// What a store has measured before.
std::optional<Outcome> WorkDesk::Known(const Job& job) {
  Result<std::optional<Outcome>> found = store_->FindMeasured(job.key);
  for (Store* other : options_.reuse) {
    if (!found.ok() || found->has_value()) {
      break;
    }
    found = other->FindMeasured(job.key);
    if (found.ok() && found->has_value()) {
      status_ = status_.ok() ? Save(job, **found) : status_;
    }
  }
  if (!found.ok()) {
    status_ = Forward(found);
    return std::nullopt;
  }
  return *std::move(found);
}

Status WorkDesk::Keep(const Job& job, const Outcome& outcome) {
  const auto asked = waiting_.find(job.key);
  if (asked == waiting_.end()) {
    // Twice, or from a farm that worked for an earlier session: whoever asks
    // for it will find it in the store.
    return outcome.measured() ? Save(job, outcome) : Ok();
  }
  if (Status saved = Save(job, outcome); !saved.ok()) {
    return saved;
  }
  ++progress_.jobs.simulated;
  progress_.current = job.label;
  if (!outcome.measured()) {
    ++progress_.jobs.failed;
    failed_.push_back({job.key, job.label, outcome.message});
    unmeasured_.emplace(job.key, outcome);
  }
  const std::vector<OnEnd> waiting = std::move(asked->second);
  waiting_.erase(asked);
  for (const OnEnd& on_end : waiting) {
    on_end(outcome);
  }
  if (options_.on_progress) {
    options_.on_progress(progress_);
  }
  return status_;
}

Status WorkDesk::Save(const Job& job, const Outcome& outcome) {
  if (options_.read_only) {
    return Ok();
  }
  const auto give_up = std::chrono::steady_clock::now() + options_.patience;
  while (true) {
    Status saved = store_->SaveOutcome(job, outcome);
    if (saved.ok() || store_->trouble() != StoreTrouble::kLocked ||
        std::chrono::steady_clock::now() >= give_up || stopped()) {
      return saved;
    }
  }
}

}  // namespace gatedyno
