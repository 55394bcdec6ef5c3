#include "harness/farm/round.h"

#include <algorithm>
#include <map>
#include <utility>

#include <fmt/format.h>

#include "harness/base/file.h"
#include "harness/farm/merge.h"

namespace gatedyno {
namespace {

std::string LastLine(const std::string& text) {
  const size_t end = text.find_last_not_of(" \t\r\n");
  if (end == std::string::npos) {
    return "";
  }
  const size_t begin = text.find_last_of('\n', end);
  const size_t first = begin == std::string::npos ? 0 : begin + 1;
  return text.substr(first, end + 1 - first);
}

}  // namespace

Round::Round(RoundFolder folder, const std::vector<size_t>& share_sizes)
    : folder_(std::move(folder)), shares_(share_sizes.size()) {
  for (size_t i = 0; i < share_sizes.size(); ++i) {
    shares_[i].missing = share_sizes[i];
  }
}

Result<size_t> Round::Merge(const SimRunner::OnOutcome& on_outcome) {
  const Result<std::vector<ResultName>> results = folder_.Results();
  if (!results.ok()) {
    return Forward(results);
  }
  std::map<int, std::vector<std::filesystem::path>> fresh;
  for (const ResultName& result : *results) {
    if (result.share < static_cast<int>(shares_.size()) &&
        merged_.insert(result.path).second) {
      fresh[result.share].push_back(result.path);
    }
  }
  size_t all = 0;
  for (const auto& [index, paths] : fresh) {
    Share& share = shares_[static_cast<size_t>(index)];
    if (share.missing == 0) {
      continue;
    }
    const Result<size_t> count = MergeShare(
        folder_.ShareFile(index), paths, on_outcome, &share.delivered);
    if (!count.ok()) {
      return count;
    }
    share.missing -= *count;
    share.brought = share.brought || *count > 0;
    all += *count;
  }
  if (all > 0) {
    last_merge_ = Clock::now();
  }
  return all;
}

bool Round::complete() const {
  return std::all_of(shares_.begin(), shares_.end(), [](const Share& share) {
    return share.missing == 0;
  });
}

std::vector<int> Round::Lost(std::span<const QueuedTask> queue,
                             std::chrono::milliseconds settle) {
  std::set<int> queued;
  for (const QueuedTask& task : queue) {
    if (task.queue_name == folder_.QueueName() && !task.failed_to_launch) {
      queued.insert(task.index);
    }
  }
  std::vector<int> lost;
  const Clock::time_point now = Clock::now();
  for (size_t i = 0; i < shares_.size(); ++i) {
    Share& share = shares_[i];
    const int index = static_cast<int>(i);
    if (share.missing == 0 || queued.contains(index)) {
      share.gone_since.reset();
      share.lost = false;
      continue;
    }
    share.gone_since = share.gone_since.value_or(now);
    if (now - *share.gone_since >= settle) {
      NoteLost(&share);
      lost.push_back(index);
    }
  }
  return lost;
}

void Round::NoteLost(Share* share) {
  if (!share->lost) {
    share->lost = true;
    share->ever_lost = true;
    share->fruitless = share->brought ? 0 : share->fruitless + 1;
  }
}

void Round::NoteSubmitted(std::span<const int> shares,
                          const std::string& array) {
  for (const int index : shares) {
    Share& share = shares_[static_cast<size_t>(index)];
    share.array = array;
    share.brought = false;
    share.gone_since.reset();
    share.lost = false;
  }
}

std::optional<std::string> Round::Hopeless(int limit) const {
  for (size_t i = 0; i < shares_.size(); ++i) {
    const Share& share = shares_[i];
    if (share.fruitless < limit) {
      continue;
    }
    const std::filesystem::path log =
        folder_.LogFile(static_cast<int>(i), share.array);
    const Result<std::string> words = ReadFile(log);
    const std::string last = words.ok() ? LastLine(*words) : "";
    return fmt::format(
        "{}: {} tasks in a row ended without a result for share {}; the last, "
        "{}_{}, {}",
        folder_.path().string(),
        share.fruitless,
        i,
        share.array,
        i,
        last.empty() ? "left no words: do the nodes share that folder?"
                     : fmt::format("said in {}: {}", log.string(), last));
  }
  return std::nullopt;
}

void Round::RemoveLogs() const {
  for (size_t i = 0; i < shares_.size(); ++i) {
    if (!shares_[i].ever_lost) {
      folder_.RemoveLogs(static_cast<int>(i));
    }
  }
}

}  // namespace gatedyno
