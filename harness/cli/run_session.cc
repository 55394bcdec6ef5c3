#include "harness/cli/run_session.h"

#include <chrono>
#include <cstddef>
#include <ctime>
#include <utility>
#include <vector>

#include <fmt/chrono.h>
#include <fmt/format.h>

#include "harness/cli/interrupt.h"
#include "harness/cli/progress_line.h"
#include "harness/flow/characterize.h"
#include "harness/store/finish_run.h"
#include "harness/store/run_lock.h"
#include "harness/store/store.h"

namespace gatedyno {
namespace {

std::string Utc(UnixMilliseconds at) {
  constexpr UnixMilliseconds kPerSecond = 1000;
  return fmt::format("{:%Y-%m-%dT%H:%M:%SZ}",
                     fmt::gmtime(static_cast<std::time_t>(at / kPerSecond)));
}

// File names and a simulator's words may be no UTF-8; that must not lose a run.
std::string JsonText(const nlohmann::json& json) {
  return json.dump(-1, ' ', false, nlohmann::json::error_handler_t::replace);
}

// The run of the store that this one goes on with, or a new one.
Result<RunRecord> EnterRun(const RunInfo& info, Store* store) {
  const Result<std::optional<RunRecord>> unfinished =
      store->FindUnfinished(info);
  if (!unfinished.ok()) {
    return Forward(unfinished);
  }
  if (*unfinished) {
    const Status resumed = store->ResumeRun((*unfinished)->id);
    if (!resumed.ok()) {
      return Forward(resumed);
    }
    fmt::print(stderr,
               "going on with run {} of {}\n",
               (*unfinished)->id,
               Utc((*unfinished)->started));
    return **unfinished;
  }
  RunRecord record;
  const Result<RunId> id = store->BeginRun(info);
  if (!id.ok()) {
    return Forward(id);
  }
  record.id = *id;
  record.started = UnixNow();
  return record;
}

Result<std::vector<Store>> OpenReused(const std::vector<std::string>& files) {
  std::vector<Store> stores;
  for (const std::string& file : files) {
    Result<Store> store =
        Store::Open(file, {.create = false, .read_only = true});
    if (!store.ok()) {
      return Forward(store);
    }
    stores.push_back(*std::move(store));
  }
  return stores;
}

// Notes a run's progress in the store, now and then.
class ProgressNotes {
 public:
  ProgressNotes(Store* store, RunId run) : store_(store), run_(run) {}

  // Nothing depends on it: a note that cannot be made is left out.
  void Note(const RunProgress& progress) {
    constexpr std::chrono::seconds kBetween(1);
    const auto now = std::chrono::steady_clock::now();
    if (now - last_ >= kBetween) {
      last_ = now;
      [[maybe_unused]] const Status noted =
          store_->NoteProgress(run_, progress);
    }
  }

 private:
  Store* store_;
  RunId run_;
  std::chrono::steady_clock::time_point last_;
};

}  // namespace

std::string ProgramVersion() {
  return fmt::format("gatedyno {}", GATEDYNO_VERSION);
}

Result<RunResult> RunInSession(const PreparedRun& prepared,
                               const RunOptions& options,
                               const std::string& simulator,
                               SimRunner* runner) {
  Result<Store> store = Store::Open(options.store);
  if (!store.ok()) {
    return Forward(store);
  }
  const Result<RunLock> lock = LockRuns(options.store);
  if (!lock.ok()) {
    return Forward(lock);
  }
  Result<std::vector<Store>> reused = OpenReused(options.reuse);
  if (!reused.ok()) {
    return Forward(reused);
  }
  const Result<RunRecord> record =
      EnterRun({.plan = JsonText(PlanToJson(prepared.plan)),
                .node = prepared.node.name,
                .program_version = ProgramVersion(),
                .simulator_version = simulator},
               &*store);
  if (!record.ok()) {
    return Forward(record);
  }
  CatchInterrupts();
  ProgressLine line;
  ProgressNotes notes(&*store, record->id);
  DeskOptions desk_options;
  for (Store& other : *reused) {
    desk_options.reuse.push_back(&other);
  }
  desk_options.should_stop = &Interrupted;
  desk_options.on_progress = [&](const RunProgress& progress) {
    line.Show(progress);
    notes.Note(progress);
  };
  WorkDesk desk(runner, &*store, std::move(desk_options));
  const int arcs_before = record->progress ? record->progress->arcs_ended : 0;
  Result<RunResult> result = Characterize(
      prepared, simulator, &desk, static_cast<size_t>(arcs_before));
  [[maybe_unused]] const Status noted =
      store->NoteProgress(record->id, desk.progress());
  if (!result.ok()) {
    return result;
  }
  result->facts.program = ProgramVersion();
  result->facts.started = Utc(record->started);
  const Status kept = FinishRun(record->id, *result, &*store);
  return kept.ok() ? std::move(result) : Forward(kept);
}

}  // namespace gatedyno
