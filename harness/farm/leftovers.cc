#include "harness/farm/leftovers.h"

#include <chrono>
#include <filesystem>
#include <map>
#include <string>
#include <thread>
#include <vector>

#include <fmt/format.h>

#include "harness/farm/merge.h"

namespace gatedyno {
namespace {

// Slurm kills what has not left KillWait (30 s) after it was told, and a node
// that is dead takes its time to be called so.
constexpr std::chrono::seconds kLeaveLimit(120);

Status HandOn(const RoundFolder& round,
              const SimRunner::OnOutcome& on_outcome) {
  const Result<std::vector<ResultName>> results = round.Results();
  if (!results.ok()) {
    return Forward(results);
  }
  std::map<int, std::vector<std::filesystem::path>> shares;
  for (const ResultName& result : *results) {
    shares[result.share].push_back(result.path);
  }
  for (const auto& [share, paths] : shares) {
    std::vector<bool> delivered;
    const Result<size_t> merged =
        MergeShare(round.ShareFile(share), paths, on_outcome, &delivered);
    if (!merged.ok()) {
      return Forward(merged);
    }
  }
  return round.Remove();
}

}  // namespace

Status EndTasks(const FarmOptions& options,
                const Slurm& slurm,
                std::span<const RoundFolder> rounds) {
  using Clock = std::chrono::steady_clock;
  std::vector<std::string> names;
  for (const RoundFolder& round : rounds) {
    names.push_back(round.QueueName());
  }
  const Clock::time_point give_up = Clock::now() + kLeaveLimit;
  while (!names.empty()) {
    const auto queue = slurm.Queue(names);
    if (!queue.ok()) {
      return Forward(queue);
    }
    if (queue->empty()) {
      break;
    }
    if (Clock::now() >= give_up) {
      return Unavailable(fmt::format(
          "{}: {} tasks are still there {} s after they were cancelled; see "
          "squeue --name={}",
          options.folder.string(),
          queue->size(),
          kLeaveLimit.count(),
          fmt::join(names, ",")));
    }
    // Each time: a task that asks to be run again comes back to the queue.
    if (Status cancelled = slurm.Cancel(names); !cancelled.ok()) {
      return cancelled;
    }
    std::this_thread::sleep_for(options.poll_interval);
  }
  return Ok();
}

Status HandOnLeftovers(const FarmOptions& options,
                       const Slurm& slurm,
                       const SimRunner::OnOutcome& on_outcome) {
  const auto rounds = RoundFolder::All(options.folder);
  if (!rounds.ok()) {
    return Forward(rounds);
  }
  if (Status ended = EndTasks(options, slurm, *rounds); !ended.ok()) {
    return ended;
  }
  for (const RoundFolder& round : *rounds) {
    if (Status handed = HandOn(round, on_outcome); !handed.ok()) {
      return handed;
    }
  }
  return Ok();
}

}  // namespace gatedyno
