// How the runs of a store stand, for who looks on from another terminal.

#ifndef GATEDYNO_REPORT_RUN_STATUS_H_
#define GATEDYNO_REPORT_RUN_STATUS_H_

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "harness/store/run_record.h"

namespace gatedyno {

// What was read, and when.
struct StoreView {
  std::string store;            // File name, as the user gave it.
  std::vector<RunRecord> runs;  // Oldest first.
  bool locked = false;          // A run of the store is going on.
  UnixMilliseconds now = 0;
};

enum class RunState { kRunning, kStopped, kFinished };

std::string_view RunStateName(RunState state);

struct RunStatus {
  RunRecord record;
  std::string title;  // Of the plan; empty where it has none.
  RunState state = RunState::kStopped;
  // Of the newest session; none before a job was simulated in it.
  std::optional<double> jobs_per_s;
  std::optional<double> left_s;  // While running.
};

// One a run, same order.  Of the runs that are not finished, the lock is that
// of the one whose session began last.
std::vector<RunStatus> StatusOfRuns(const StoreView& view);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_RUN_STATUS_H_
