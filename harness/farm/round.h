// A round once it is submitted: which of its jobs have come back, and which
// tasks went without bringing theirs.

#ifndef GATEDYNO_FARM_ROUND_H_
#define GATEDYNO_FARM_ROUND_H_

#include <chrono>
#include <cstddef>
#include <filesystem>
#include <optional>
#include <set>
#include <span>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/farm/round_folder.h"
#include "harness/farm/slurm.h"
#include "harness/sim/runner.h"

namespace gatedyno {

class Round {
 public:
  using Clock = std::chrono::steady_clock;

  Round(RoundFolder folder, const std::vector<size_t>& share_sizes);

  const RoundFolder& folder() const { return folder_; }

  // Takes in what was published since the last call; returns how many
  // outcomes that were.  Fails with what `on_outcome` returned.
  Result<size_t> Merge(const SimRunner::OnOutcome& on_outcome);

  // Every job has had its outcome.
  bool complete() const;
  // REQUIRES: complete().
  Clock::time_point complete_since() const { return last_merge_; }

  // The shares with jobs missing whose task has not been in `queue` for
  // `settle`: to be submitted again.  REQUIRES: what was published before
  // `queue` was asked for is merged, or a task that just ended looks lost.
  std::vector<int> Lost(std::span<const QueuedTask> queue,
                        std::chrono::milliseconds settle);

  // `array` has these shares now.
  void NoteSubmitted(std::span<const int> shares, const std::string& array);

  // A share whose last `limit` tasks brought nothing, in words.
  std::optional<std::string> Hopeless(int limit) const;

  // Of those shares that never lost a task.
  void RemoveLogs() const;

 private:
  struct Share {
    std::vector<bool> delivered;  // By place in the share file.
    size_t missing = 0;
    std::string array;     // That has or had it last.
    int fruitless = 0;     // Tasks in a row that ended and brought nothing.
    bool brought = false;  // Something came since it was last submitted.
    std::optional<Clock::time_point> gone_since;
    bool lost = false;  // Gone for good, and counted.
    bool ever_lost = false;
  };

  static void NoteLost(Share* share);

  RoundFolder folder_;
  std::vector<Share> shares_;
  std::set<std::filesystem::path> merged_;
  Clock::time_point last_merge_ = Clock::now();  // That brought something.
};

}  // namespace gatedyno

#endif  // GATEDYNO_FARM_ROUND_H_
