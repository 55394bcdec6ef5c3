#include "harness/sim/job_ledger.h"

#include <cassert>
#include <numeric>

namespace gatedyno {

JobLedger::JobLedger(size_t job_count, int kills_before_aside)
    : kills_before_aside_(kills_before_aside),
      waiting_(job_count),
      kills_(job_count, 0) {
  assert(kills_before_aside >= 1);
  std::iota(waiting_.begin(), waiting_.end(), size_t{0});
}

std::optional<size_t> JobLedger::Take() {
  if (waiting_.empty()) {
    return std::nullopt;
  }
  const size_t job = waiting_.front();
  waiting_.pop_front();
  return job;
}

void JobLedger::GiveBack(std::span<const size_t> jobs) {
  waiting_.insert(waiting_.begin(), jobs.begin(), jobs.end());
}

bool JobLedger::Blame(size_t job) {
  if (++kills_[job] >= kills_before_aside_) {
    return true;
  }
  waiting_.push_back(job);
  return false;
}

}  // namespace gatedyno
