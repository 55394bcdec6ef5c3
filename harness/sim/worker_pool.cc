#include "harness/sim/worker_pool.h"

#include <algorithm>
#include <chrono>
#include <thread>
#include <utility>

#include <fmt/format.h>

#include "harness/base/install.h"
#include "harness/sim/poll_until.h"
#include "harness/sim/sigpipe_guard.h"

namespace gatedyno {
namespace {

using Clock = PoolWorker::Clock;

// One at work and one behind it, so that a worker need not wait while this
// program stores the last outcome.
constexpr size_t kJobsPerWorkerAtOnce = 2;

// A start that fails this often in a row will go on failing.
constexpr int kFailedStartsBeforeGivingUp = 3;

// A worker whose input ended leaves in a few milliseconds.
constexpr std::chrono::milliseconds kLeaveGrace(1000);
// The output of a dying worker ends a moment before it can be reaped.
constexpr std::chrono::milliseconds kDeathGrace(200);
constexpr std::chrono::milliseconds kNoGrace(0);

std::vector<std::string> WorkerArguments(const PoolOptions& options) {
  if (!options.memory_limit_bytes.has_value()) {
    return {};
  }
  return {fmt::format("--memory-limit-bytes={}", *options.memory_limit_bytes)};
}

}  // namespace

Result<WorkerPool> WorkerPool::Make(PoolOptions options) {
  if (options.workers < 0) {
    return BadInput(fmt::format("workers = {}: must be >= 0", options.workers));
  }
  if (options.jobs_per_worker < 1) {
    return BadInput(fmt::format("jobs_per_worker = {}: must be >= 1",
                                options.jobs_per_worker));
  }
  if (options.kills_before_aside < 1) {
    return BadInput(fmt::format("kills_before_aside = {}: must be >= 1",
                                options.kills_before_aside));
  }
  if (options.workers == 0) {
    options.workers =
        std::max(1, static_cast<int>(std::thread::hardware_concurrency()));
  }
  if (options.worker_program.empty()) {
    options.worker_program = WorkerProgram();
  }
  return WorkerPool(std::move(options));
}

WorkerPool::WorkerPool(PoolOptions options) : options_(std::move(options)) {}

WorkerPool::~WorkerPool() {
  for (PoolWorker& worker : workers_) {
    worker.process().CloseInput();
  }
  for (PoolWorker& worker : workers_) {
    worker.process().Finish(worker.job_count() == 0 ? kLeaveGrace : kNoGrace);
  }
}

Status WorkerPool::Run(std::span<const Job> jobs, const OnOutcome& on_outcome) {
  const SigpipeGuard guard;
  Work work = {
      jobs, on_outcome, JobLedger(jobs.size(), options_.kills_before_aside)};
  failed_starts_ = 0;
  DropDeadWorkers();
  while (work.ledger.unended() > 0) {
    if (StopRequested() && !AnyJobSent()) {
      break;
    }
    StartMissing(work);
    if (workers_.empty() && failed_starts_ >= kFailedStartsBeforeGivingUp) {
      return Unavailable(last_failed_start_);
    }
    SendJobs(&work);
    WaitForWorkers();
    HandleWorkers(&work);
  }
  return Ok();
}

// No job is to blame for a worker that died between two calls of Run.
void WorkerPool::DropDeadWorkers() {
  std::erase_if(workers_, [](PoolWorker& worker) {
    worker.process().Exchange();
    return worker.process().output_ended();
  });
}

bool WorkerPool::StopRequested() const {
  return options_.should_stop && options_.should_stop();
}

bool WorkerPool::AnyJobSent() const {
  return std::any_of(
      workers_.begin(), workers_.end(), [](const PoolWorker& worker) {
        return worker.job_count() > 0;
      });
}

void WorkerPool::StartMissing(const Work& work) {
  const size_t wanted =
      std::min(static_cast<size_t>(options_.workers), work.ledger.unended());
  while (workers_.size() < wanted &&
         failed_starts_ < kFailedStartsBeforeGivingUp) {
    Result<PoolWorker> worker =
        PoolWorker::Start(options_.worker_program, WorkerArguments(options_));
    if (worker.ok()) {
      workers_.push_back(std::move(*worker));
    } else {
      NoteFailedStart(worker.error().message);
    }
  }
}

void WorkerPool::NoteFailedStart(std::string why) {
  ++failed_starts_;
  last_failed_start_ = std::move(why);
}

void WorkerPool::SendJobs(Work* work) {
  // Every worker gets a first job before any gets a second, and near the end
  // nobody sits on a second one that another worker could start.
  for (size_t at_once = 1; at_once <= kJobsPerWorkerAtOnce; ++at_once) {
    for (PoolWorker& worker : workers_) {
      const bool enough_left =
          at_once == 1 || work->ledger.waiting() >= workers_.size();
      if (worker.greeted() && worker.job_count() < at_once && enough_left &&
          worker.jobs_given() < options_.jobs_per_worker && !StopRequested()) {
        SendNextTo(&worker, work);
      }
    }
  }
}

void WorkerPool::SendNextTo(PoolWorker* worker, Work* work) {
  while (const std::optional<size_t> index = work->ledger.Take()) {
    const Job& job = work->jobs[*index];
    const Result<std::string> text = JobText(job);
    if (text.ok()) {
      worker->Give(*index, job, *text);
      return;
    }
    Outcome outcome;
    outcome.message = text.error().message;
    Finish(work, *index, outcome);
  }
}

void WorkerPool::WaitForWorkers() const {
  std::vector<pollfd> watched;
  std::optional<Clock::time_point> earliest;
  for (const PoolWorker& worker : workers_) {
    worker.process().AppendWatched(&watched);
    const auto deadline = worker.deadline();
    if (deadline.has_value() && (!earliest || *deadline < *earliest)) {
      earliest = deadline;
    }
  }
  if (!watched.empty()) {
    PollUntil(&watched, earliest);
  }
}

void WorkerPool::HandleWorkers(Work* work) {
  std::vector<PoolWorker> kept;
  for (PoolWorker& worker : workers_) {
    if (Handle(&worker, work)) {
      kept.push_back(std::move(worker));
    }
  }
  workers_ = std::move(kept);
}

bool WorkerPool::Handle(PoolWorker* worker, Work* work) {
  if (!worker->greeted()) {
    return HandleGreeting(worker);
  }
  return HandleReplies(worker, work) && HandleDeadline(worker, work);
}

bool WorkerPool::HandleGreeting(PoolWorker* worker) {
  const Status greeting = worker->Greet();
  if (worker->greeted()) {
    failed_starts_ = 0;
    return true;
  }
  if (greeting.ok() && worker->awaits_greeting()) {
    return true;
  }
  NoteFailedStart(fmt::format("{}: {}",
                              options_.worker_program.string(),
                              worker->EndUngreeted(greeting)));
  return false;
}

bool WorkerPool::HandleReplies(PoolWorker* worker, Work* work) {
  while (true) {
    // Again for each reply: the last one may have taken its time to store, and
    // what came meanwhile is not too late.
    worker->process().Exchange();
    const std::vector<size_t> jobs = worker->jobs();
    const Result<std::optional<Reply>> reply = worker->TakeReply();
    if (!reply.ok()) {
      HandleDeath(worker, work, reply.error().message);
      return false;
    }
    if (!reply->has_value()) {
      break;
    }
    Finish(work, jobs.front(), (*reply)->outcome);
    if ((*reply)->leaving) {
      work->ledger.GiveBack(worker->jobs());
      worker->process().Finish(kLeaveGrace);
      return false;
    }
  }
  if (worker->process().output_ended()) {
    HandleDeath(worker, work, "");
    return false;
  }
  if (worker->job_count() == 0 &&
      worker->jobs_given() >= options_.jobs_per_worker) {
    worker->process().Finish(kLeaveGrace);
    return false;
  }
  return true;
}

bool WorkerPool::HandleDeadline(PoolWorker* worker, Work* work) {
  const auto deadline = worker->deadline();
  if (!deadline.has_value() || Clock::now() < *deadline) {
    return true;
  }
  worker->process().Finish(kNoGrace);
  const std::vector<size_t> jobs = worker->jobs();
  work->ledger.GiveBack(std::span(jobs).subspan(1));
  Outcome outcome;
  outcome.ending = Ending::kTimedOut;
  outcome.message =
      fmt::format("killed after {:g} s", worker->oldest_time_limit_s());
  Finish(work, jobs.front(), outcome);
  return false;
}

// `babble` is what was wrong with its last words, if anything.
void WorkerPool::HandleDeath(PoolWorker* worker,
                             Work* work,
                             const std::string& babble) {
  const std::string end =
      worker->process().Finish(babble.empty() ? kDeathGrace : kNoGrace);
  const std::vector<size_t> jobs = worker->jobs();
  if (jobs.empty()) {
    return;
  }
  work->ledger.GiveBack(std::span(jobs).subspan(1));
  if (!work->ledger.Blame(jobs.front())) {
    return;
  }
  Outcome outcome;
  outcome.ending = Ending::kCrashed;
  outcome.message =
      fmt::format("lost {} worker{}; the last {}",
                  options_.kills_before_aside,
                  options_.kills_before_aside == 1 ? "" : "s",
                  babble.empty() ? end : "sent rubbish: " + babble);
  Finish(work, jobs.front(), outcome);
}

void WorkerPool::Finish(Work* work, size_t job, const Outcome& outcome) {
  work->ledger.MarkEnded();
  work->on_outcome(work->jobs[job], outcome);
}

}  // namespace gatedyno
