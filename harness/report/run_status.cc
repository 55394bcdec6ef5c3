#include "harness/report/run_status.h"

#include <algorithm>
#include <utility>

#include <nlohmann/json.hpp>

#include "harness/report/pace.h"

namespace gatedyno {
namespace {

using nlohmann::json;

// A store may hold the plan of any earlier version.
std::string TitleOf(const std::string& plan) {
  const json read = json::parse(plan, nullptr, /*allow_exceptions=*/false);
  if (!read.is_object()) {
    return "";
  }
  const auto title = read.find("title");
  return title != read.end() && title->is_string() ? title->get<std::string>()
                                                   : "";
}

double Seconds(UnixMilliseconds from, UnixMilliseconds to) {
  constexpr double kMillisecond_s = 1e-3;
  return static_cast<double>(to - from) * kMillisecond_s;
}

const RunRecord* RunWithLock(const StoreView& view) {
  const RunRecord* with_lock = nullptr;
  for (const RunRecord& run : view.runs) {
    if (view.locked && !run.finished &&
        (with_lock == nullptr ||
         run.session_started >= with_lock->session_started)) {
      with_lock = &run;
    }
  }
  return with_lock;
}

// The counts are as of the last note, and so is the time they took.
void AddPace(UnixMilliseconds now, RunStatus* status) {
  const RunRecord& run = status->record;
  if (!run.progress || run.progressed <= run.session_started) {
    return;
  }
  status->jobs_per_s = JobsPerSecond(
      *run.progress, Seconds(run.session_started, run.progressed));
  if (status->jobs_per_s && status->state == RunState::kRunning) {
    status->left_s = SecondsLeft(*run.progress, *status->jobs_per_s);
  }
  if (status->left_s) {
    const double since_s = std::max(Seconds(run.progressed, now), 0.0);
    status->left_s = std::max(*status->left_s - since_s, 0.0);
  }
}

}  // namespace

std::string_view RunStateName(RunState state) {
  switch (state) {
    case RunState::kRunning:
      return "running";
    case RunState::kStopped:
      return "stopped";
    case RunState::kFinished:
      return "finished";
  }
  return "";
}

std::vector<RunStatus> StatusOfRuns(const StoreView& view) {
  const RunRecord* running = RunWithLock(view);
  std::vector<RunStatus> all;
  for (const RunRecord& run : view.runs) {
    RunStatus status;
    status.record = run;
    status.title = TitleOf(run.info.plan);
    if (run.finished) {
      status.state = RunState::kFinished;
    } else if (&run == running) {
      status.state = RunState::kRunning;
    }
    AddPace(view.now, &status);
    all.push_back(std::move(status));
  }
  return all;
}

}  // namespace gatedyno
