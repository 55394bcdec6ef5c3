// Where a run's jobs are asked for, and where a runner takes them from.
//
// A job that was measured before, by this run or an earlier one, in this store
// or in one to reuse, ends at once; every other is simulated once, whoever
// asks for it, and its outcome is in the store before anybody hears of it.

#ifndef GATEDYNO_FLOW_WORK_DESK_H_
#define GATEDYNO_FLOW_WORK_DESK_H_

#include <chrono>
#include <deque>
#include <functional>
#include <map>
#include <optional>
#include <string>
#include <unordered_set>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/record/run_progress.h"
#include "harness/record/run_result.h"
#include "harness/sim/runner.h"
#include "harness/store/store.h"

namespace gatedyno {

struct DeskOptions {
  // Nothing is saved: for a runner that has its outcomes from the store.
  bool read_only = false;
  // Stores that are read before a job is simulated; they outlive the desk.
  std::vector<Store*> reuse = {};
  // Once true, no further job is given out.
  std::function<bool()> should_stop = {};
  std::function<void(const RunProgress& progress)> on_progress = {};
  // How long to wait for a store that another process has locked.
  std::chrono::seconds patience{600};
};

class WorkDesk : public JobSource {
 public:
  using OnEnd = std::function<void(const Outcome& outcome)>;
  // Asks for some more, if only for jobs that end at once; false when there is
  // nothing more to ask for.
  using Feed = std::function<bool()>;

  // `runner` and `store` outlive the desk.
  WorkDesk(SimRunner* runner, Store* store, DeskOptions options);

  // `on_end` is called once: from here, or from Work.
  void Ask(const Job& job, OnEnd on_end);

  // Brings everything asked for, by `feed` and by what follows, to an end.
  // Fails when nothing can be simulated, when the store fails, and when it was
  // told to stop; whatever ended is kept.
  Status Work(const Feed& feed);

  bool stopped() const;

  // Jobs are counted here; arcs and what is expected by whoever asks.
  RunProgress& progress() { return progress_; }
  const std::vector<FailedJob>& failed() const { return failed_; }

  // For the runner.
  std::optional<Job> Next() override;

 private:
  std::optional<Outcome> Known(const Job& job);
  Status Keep(const Job& job, const Outcome& outcome);
  Status Save(const Job& job, const Outcome& outcome);

  SimRunner* runner_;
  Store* store_;
  DeskOptions options_;
  const Feed* feed_ = nullptr;
  std::deque<Job> ready_;
  std::unordered_set<std::string> seen_;               // Keys asked for.
  std::map<std::string, std::vector<OnEnd>> waiting_;  // By key.
  std::map<std::string, Outcome> unmeasured_;          // Of this run, by key.
  std::vector<FailedJob> failed_;
  RunProgress progress_;
  Status status_ = Ok();
};

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_WORK_DESK_H_
