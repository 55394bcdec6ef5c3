#include "harness/sim/attempt_queue.h"

#include <iterator>
#include <utility>

namespace gatedyno {

size_t AttemptQueue::Waiting(size_t enough) {
  while (fresh_.size() + retries_.size() < enough) {
    std::optional<Job> job = source_->Next();
    if (!job) {
      break;
    }
    fresh_.push_back({.job = *std::move(job)});
  }
  return fresh_.size() + retries_.size();
}

std::optional<Attempt> AttemptQueue::Take() {
  if (fresh_.empty()) {
    if (std::optional<Job> job = source_->Next()) {
      return Attempt{.job = *std::move(job)};
    }
  }
  std::deque<Attempt>& from = fresh_.empty() ? retries_ : fresh_;
  if (from.empty()) {
    return std::nullopt;
  }
  Attempt attempt = std::move(from.front());
  from.pop_front();
  return attempt;
}

void AttemptQueue::GiveBack(std::vector<Attempt> attempts) {
  fresh_.insert(fresh_.begin(),
                std::move_iterator(attempts.begin()),
                std::move_iterator(attempts.end()));
}

}  // namespace gatedyno
