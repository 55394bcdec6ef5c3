#include "harness/farm/task.h"

#include <condition_variable>
#include <mutex>
#include <optional>
#include <stop_token>
#include <thread>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "harness/base/scratch_folder.h"
#include "harness/farm/outbox.h"
#include "harness/farm/result_file.h"
#include "harness/farm/round_folder.h"
#include "harness/farm/share_file.h"
#include "harness/sim/worker_pool.h"

namespace gatedyno {
namespace {

// What other tasks did of the share.
class Published {
 public:
  static Result<Published> Read(const RoundFolder& round, int share) {
    const auto results = round.Results();
    if (!results.ok()) {
      return Forward(results);
    }
    Published published;
    for (const ResultName& name : *results) {
      if (name.share == share) {
        Result<ResultReader> reader = ResultReader::Open(name.path);
        if (reader.ok()) {  // Who merges deals with one that is spoilt.
          published.readers_.push_back(std::move(*reader));
        }
      }
    }
    return published;
  }

  bool Has(const std::string& key) {
    for (ResultReader& reader : readers_) {
      const auto outcome = reader.Find(key);
      if (outcome.ok() && outcome->has_value()) {
        return true;
      }
    }
    return false;
  }

 private:
  std::vector<ResultReader> readers_;
};

// The share's jobs that are still to be run, until told to stop.
class Remaining : public JobSource {
 public:
  Remaining(ShareReader share,
            Published published,
            const std::function<bool()>& should_stop)
      : share_(std::move(share)),
        published_(std::move(published)),
        should_stop_(should_stop) {}

  std::optional<Job> Next() override {
    while (status_.ok() && !stopped_) {
      Result<std::optional<Job>> job = share_.Next();
      if (!job.ok()) {
        status_ = Forward(job);
        return std::nullopt;
      }
      if (!job->has_value()) {
        return std::nullopt;
      }
      if (!published_.Has((*job)->key)) {
        stopped_ = should_stop_ && should_stop_();
        return stopped_ ? std::nullopt : std::move(*job);
      }
    }
    return std::nullopt;
  }

  // There were more jobs.
  bool stopped() const { return stopped_; }
  const Status& status() const { return status_; }

 private:
  ShareReader share_;
  Published published_;
  const std::function<bool()>& should_stop_;
  bool stopped_ = false;
  Status status_ = Ok();
};

// Publishes now and then, and at once when told to stop, whatever the workers
// are at meanwhile.
class Postman {
 public:
  Postman(Outbox* outbox, const TaskOptions& options)
      : thread_([outbox, &options](const std::stop_token& done) {
          Walk(outbox, options, done);
        }) {}

 private:
  static void Walk(Outbox* outbox,
                   const TaskOptions& options,
                   const std::stop_token& done) {
    using Clock = std::chrono::steady_clock;
    constexpr std::chrono::milliseconds kPause(50);
    std::mutex mutex;
    std::condition_variable_any woken;
    std::unique_lock lock(mutex);
    Clock::time_point due = Clock::now() + options.publish_every;
    bool stopping = false;
    while (!done.stop_requested()) {
      woken.wait_for(lock, done, kPause, [] { return false; });
      const bool told =
          !stopping && options.should_stop && options.should_stop();
      if (told || Clock::now() >= due) {
        stopping = stopping || told;
        // The outbox remembers a failure, and tells the pool's loop.
        static_cast<void>(outbox->Publish());
        due = Clock::now() + options.publish_every;
      }
    }
  }

  std::jthread thread_;
};

Result<Remaining> OpenShare(const TaskOptions& options,
                            const RoundFolder& round) {
  Result<ShareReader> share = ShareReader::Open(round.ShareFile(options.share));
  if (!share.ok()) {
    return Unavailable(
        fmt::format("{}; do this node and the one that runs gatedyno share "
                    "the folder {}?",
                    share.error().message,
                    options.folder.string()));
  }
  Result<Published> published = Published::Read(round, options.share);
  if (!published.ok()) {
    return Forward(published);
  }
  return Remaining(
      std::move(*share), std::move(*published), options.should_stop);
}

PoolOptions PoolOptionsOf(const TaskOptions& options) {
  PoolOptions pool;
  pool.workers = options.workers;
  pool.worker_program = options.worker_program;
  pool.memory_limit_bytes =
      options.memory_limit_bytes.value_or(pool.memory_limit_bytes);
  return pool;
}

Status CheckSimulator(const TaskOptions& options, WorkerPool* pool) {
  if (options.simulator.empty()) {
    return Ok();
  }
  const Result<std::string> here = pool->Simulator();
  if (!here.ok()) {
    return Forward(here);
  }
  if (*here != options.simulator) {
    return Unavailable(
        fmt::format("the simulator of this node is {}, that of the run {}: "
                    "install the same on all nodes",
                    *here,
                    options.simulator));
  }
  return Ok();
}

Status RunPool(const TaskOptions& options,
               WorkerPool* pool,
               Remaining* jobs,
               Outbox* outbox) {
  const Postman postman(outbox, options);
  return pool->Run(*jobs, [outbox](const Job& job, const Outcome& outcome) {
    return outbox->Add(job, outcome);
  });
}

}  // namespace

Result<TaskEnd> RunTask(const TaskOptions& options) {
  const RoundFolder round(options.folder, options.round);
  Result<Remaining> jobs = OpenShare(options, round);
  if (!jobs.ok()) {
    return Forward(jobs);
  }
  Result<WorkerPool> pool = WorkerPool::Make(PoolOptionsOf(options));
  if (!pool.ok()) {
    return Forward(pool);
  }
  if (const Status same = CheckSimulator(options, &*pool); !same.ok()) {
    return Forward(same);
  }
  const Result<ScratchFolder> scratch = ScratchFolder::Make("gatedyno-farm");
  if (!scratch.ok()) {
    return Forward(scratch);
  }
  Outbox outbox(round, options.share, scratch->path());
  const Status ran = RunPool(options, &*pool, &*jobs, &outbox);
  const Status published = outbox.Publish();
  for (const Status& status : {ran, jobs->status(), published}) {
    if (!status.ok()) {
      return Forward(status);
    }
  }
  return jobs->stopped() ? TaskEnd::kStopped : TaskEnd::kComplete;
}

}  // namespace gatedyno
