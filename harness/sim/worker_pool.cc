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

// A start that fails this often in a row will go on failing.  Not at once: who
// kills workers now and then may hit some before they are ready.
constexpr int kFailedStartsBeforeGivingUp = 10;

// A worker whose input ended leaves in a few milliseconds.
constexpr std::chrono::milliseconds kLeaveGrace(1000);
// The output of a dying worker ends a moment before it can be reaped.
constexpr std::chrono::milliseconds kDeathGrace(200);
constexpr std::chrono::milliseconds kNoGrace(0);

std::vector<std::string> WorkerArguments(const PoolOptions& options) {
  return {fmt::format("--memory-limit-bytes={}", options.memory_limit_bytes)};
}

// What a worker is sent: the job with the one rung it is to be run at.
Result<std::string> AttemptText(const Attempt& attempt) {
  if (attempt.job.settings.empty()) {
    return JobText(attempt.job);
  }
  Job job = attempt.job;
  job.settings = {attempt.job.settings[attempt.rung]};
  return JobText(job);
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

Status WorkerPool::Run(JobSource& jobs, const OnOutcome& on_outcome) {
  const SigpipeGuard guard;
  Work work = {AttemptQueue(&jobs), on_outcome, Ok()};
  failed_starts_ = 0;
  DropDeadWorkers();
  while (work.status.ok()) {
    const size_t sent = JobsSent();
    const size_t all = static_cast<size_t>(options_.workers);
    const size_t waiting = work.queue.Waiting(all);
    if (sent + waiting == 0) {
      return Ok();
    }
    StartUpTo(std::min(all, sent + waiting));
    if (workers_.empty() && StartsKeepFailing()) {
      return Unavailable(last_failed_start_);
    }
    SendJobs(&work);
    WaitForWorkers();
    HandleWorkers(&work);
  }
  // Nobody wants the answers that are still to come.
  std::erase_if(workers_, [](const PoolWorker& worker) {
    return worker.job_count() > 0;
  });
  return work.status;
}

Result<std::string> WorkerPool::Simulator() {
  const SigpipeGuard guard;
  failed_starts_ = 0;
  DropDeadWorkers();
  while (true) {
    StartUpTo(1);
    if (workers_.empty()) {
      return Unavailable(last_failed_start_);
    }
    if (workers_.front().greeted()) {
      return workers_.front().hello().simulator;
    }
    WaitForWorkers();
    std::erase_if(workers_, [&](PoolWorker& worker) {
      return !worker.greeted() && !HandleGreeting(&worker);
    });
  }
}

// No job is to blame for a worker that died between two calls of Run.
void WorkerPool::DropDeadWorkers() {
  std::erase_if(workers_, [](PoolWorker& worker) {
    worker.process().Exchange();
    return worker.process().output_ended();
  });
}

size_t WorkerPool::JobsSent() const {
  size_t sent = 0;
  for (const PoolWorker& worker : workers_) {
    sent += worker.job_count();
  }
  return sent;
}

void WorkerPool::StartUpTo(size_t wanted) {
  while (workers_.size() < wanted && !StartsKeepFailing()) {
    Result<PoolWorker> worker =
        PoolWorker::Start(options_.worker_program, WorkerArguments(options_));
    if (worker.ok()) {
      workers_.push_back(std::move(*worker));
    } else {
      NoteFailedStart(worker.error().message);
    }
  }
}

bool WorkerPool::StartsKeepFailing() const {
  return failed_starts_ >= kFailedStartsBeforeGivingUp;
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
      const bool has_room = worker.greeted() && worker.job_count() < at_once &&
                            worker.jobs_given() < options_.jobs_per_worker;
      const size_t enough = at_once == 1 ? 1 : workers_.size();
      if (has_room && work->queue.Waiting(enough) >= enough) {
        SendNextTo(&worker, work);
      }
    }
  }
}

void WorkerPool::SendNextTo(PoolWorker* worker, Work* work) {
  while (std::optional<Attempt> attempt = work->queue.Take()) {
    const Result<std::string> text = AttemptText(*attempt);
    if (text.ok()) {
      worker->Give(*std::move(attempt), *text);
      return;
    }
    Outcome outcome;
    outcome.message = text.error().message;
    Finish(work, *attempt, std::move(outcome));
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
    Result<std::optional<PoolWorker::Answer>> answer = worker->TakeReply();
    if (!answer.ok()) {
      HandleDeath(worker, work, answer.error().message);
      return false;
    }
    if (!answer->has_value()) {
      break;
    }
    const bool leaving = (*answer)->reply.leaving;
    Judge(work, **std::move(answer));
    if (leaving) {
      work->queue.GiveBack(worker->TakeAttempts());
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
  HandleLoss(worker, work, Mishap::kSilent, "");
  return false;
}

// `babble` is what was wrong with its last words, if anything.
void WorkerPool::HandleDeath(PoolWorker* worker,
                             Work* work,
                             const std::string& babble) {
  const ProcessEnd end =
      worker->process().Finish(babble.empty() ? kDeathGrace : kNoGrace);
  if (!babble.empty()) {
    HandleLoss(worker, work, Mishap::kCrashed, "sent rubbish: " + babble);
  } else {
    HandleLoss(worker,
               work,
               end.taken_away ? Mishap::kTakenAway : Mishap::kCrashed,
               end.words);
  }
}

void WorkerPool::HandleLoss(PoolWorker* worker,
                            Work* work,
                            Mishap mishap,
                            std::string_view how) {
  std::vector<Attempt> attempts = worker->TakeAttempts();
  if (attempts.empty()) {
    return;
  }
  const Attempt blamed = std::move(attempts.front());
  attempts.erase(attempts.begin());
  work->queue.GiveBack(std::move(attempts));
  if (auto next = NextAttempt(blamed, mishap, options_.kills_before_aside)) {
    work->queue.Retry(*std::move(next));
    return;
  }
  const bool silent = mishap == Mishap::kSilent;
  const int lost = blamed.losses + 1;
  Outcome outcome;
  outcome.ending = silent ? Ending::kTimedOut : Ending::kCrashed;
  outcome.message = fmt::format(
      "lost {} worker{}; the last {}",
      lost,
      lost == 1 ? "" : "s",
      silent ? fmt::format("was silent for {:g} s", TimeLimitOf(blamed)) : how);
  Finish(work, blamed, std::move(outcome));
}

void WorkerPool::Judge(Work* work, PoolWorker::Answer answer) {
  if (!answer.reply.outcome.measured()) {
    if (auto next = NextAttempt(
            answer.attempt, Mishap::kRefused, options_.kills_before_aside)) {
      work->queue.Retry(*std::move(next));
      return;
    }
  }
  Finish(work, answer.attempt, std::move(answer.reply.outcome));
}

void WorkerPool::Finish(Work* work, const Attempt& attempt, Outcome outcome) {
  outcome.rung = static_cast<int>(attempt.rung);
  const Status now = work->on_outcome(attempt.job, outcome);
  work->status = work->status.ok() ? now : work->status;
}

}  // namespace gatedyno
