#include "harness/farm/farm_run.h"

#include <algorithm>
#include <numeric>
#include <thread>
#include <utility>

#include <fmt/format.h>

#include "harness/farm/leftovers.h"
#include "harness/farm/task_command.h"
#include "harness/sim/protocol.h"

namespace gatedyno {
namespace {

// More would be written for long before the first of them runs.
constexpr int kSharesPerRound = 1000;

}  // namespace

FarmRun::FarmRun(const FarmOptions& options,
                 const Slurm& slurm,
                 int most_shares,
                 JobSource* jobs,
                 const SimRunner::OnOutcome& on_outcome)
    : options_(options),
      slurm_(slurm),
      most_shares_(static_cast<size_t>(std::min(most_shares, kSharesPerRound))),
      jobs_(jobs),
      on_outcome_(on_outcome) {}

Status FarmRun::Run() {
  while (true) {
    if (StopAsked()) {
      return End(Ok());
    }
    if (Status taken = TakeJobs(); !taken.ok()) {
      return End(taken);
    }
    if (rounds_.empty()) {
      return Ok();
    }
    Pause();
    if (Status polled = Poll(); !polled.ok()) {
      return End(polled);
    }
  }
}

bool FarmRun::StopAsked() const {
  return options_.should_stop && options_.should_stop();
}

bool FarmRun::AnyMissing() const {
  return !std::all_of(rounds_.begin(), rounds_.end(), [](const Round& round) {
    return round.complete();
  });
}

Status FarmRun::TakeJobs() {
  while (!StopAsked()) {
    const std::optional<Job> job = jobs_->Next();
    if (!job) {
      break;
    }
    if (Status drafted = Draft(*job); !drafted.ok()) {
      return drafted;
    }
  }
  const bool worth_it =
      draft_ &&
      (!AnyMissing() ||
       draft_->job_count() >= static_cast<size_t>(options_.jobs_per_task));
  return worth_it && !StopAsked() ? SubmitDraft() : Ok();
}

Status FarmRun::Draft(const Job& job) {
  const Result<std::string> text = JobText(job);
  if (!text.ok()) {  // As on a machine of our own: the job fails, not the run.
    Outcome outcome;
    outcome.message = text.error().message;
    Status taken = on_outcome_(job, outcome);
    refused_ = !taken.ok();
    return taken;
  }
  if (draft_ && draft_->last_share_full() &&
      draft_->share_sizes().size() == most_shares_) {
    if (Status submitted = SubmitDraft(); !submitted.ok()) {
      return submitted;
    }
  }
  if (!draft_) {
    Result<RoundFolder> folder = RoundFolder::Make(options_.folder);
    if (!folder.ok()) {
      return Forward(folder);
    }
    draft_.emplace(std::move(*folder),
                   static_cast<size_t>(options_.jobs_per_task));
  }
  return draft_->Add(*text);
}

Status FarmRun::SubmitDraft() {
  if (Status closed = draft_->Close(); !closed.ok()) {
    return closed;
  }
  std::vector<int> shares(draft_->share_sizes().size());
  std::iota(shares.begin(), shares.end(), 0);
  const Result<std::string> array = Submit(draft_->folder(), shares);
  if (!array.ok()) {
    return Forward(array);
  }
  rounds_.emplace_back(draft_->folder(), draft_->share_sizes());
  rounds_.back().NoteSubmitted(shares, *array);
  draft_.reset();
  return Ok();
}

Result<std::string> FarmRun::Submit(const RoundFolder& folder,
                                    std::vector<int> shares) const {
  ArrayRequest request;
  request.queue_name = folder.QueueName();
  request.indices = std::move(shares);
  request.command = TaskShellText(options_, folder);
  request.log_pattern = folder.LogPattern();
  request.arguments = options_.sbatch_arguments;
  if (options_.workers_per_task > 0) {
    request.arguments.push_back(
        fmt::format("--cpus-per-task={}", options_.workers_per_task));
  }
  return slurm_.Submit(request);
}

Status FarmRun::Poll() {
  // In this order: a task publishes before it leaves the queue.
  const Result<std::vector<QueuedTask>> queue = LookAtQueue();
  if (Status merged = Merge(); !merged.ok()) {
    return merged;
  }
  if (!queue.ok()) {
    DropFinished(nullptr);
    return Wait(queue.error());
  }
  silent_since_.reset();
  if (Status made_up = MakeUp(*queue); !made_up.ok()) {
    return made_up;
  }
  DropFinished(&*queue);
  return Ok();
}

Result<std::vector<QueuedTask>> FarmRun::LookAtQueue() {
  std::vector<std::string> names;
  for (const Round& round : rounds_) {
    names.push_back(round.folder().QueueName());
  }
  return slurm_.Queue(names);
}

Status FarmRun::Merge() {
  for (Round& round : rounds_) {
    const Result<size_t> merged = round.Merge(on_outcome_);
    if (!merged.ok()) {
      refused_ = true;
      return Forward(merged);
    }
  }
  return Ok();
}

Status FarmRun::MakeUp(const std::vector<QueuedTask>& queue) {
  for (const QueuedTask& task : queue) {
    if (task.failed_to_launch) {
      if (const Status cancelled = slurm_.CancelTask(task); !cancelled.ok()) {
        return Wait(cancelled.error());
      }
    }
  }
  for (Round& round : rounds_) {
    const std::vector<int> lost = round.Lost(queue, options_.settle);
    if (const auto words = round.Hopeless(options_.fruitless_tasks)) {
      return Unavailable(*words);
    }
    if (!lost.empty()) {
      if (Status again = SubmitAgain(&round, lost); !again.ok()) {
        return again;
      }
    }
  }
  return Ok();
}

Status FarmRun::SubmitAgain(Round* round, const std::vector<int>& lost) {
  const Result<std::string> array = Submit(round->folder(), lost);
  if (!array.ok()) {
    return Wait(array.error());
  }
  round->NoteSubmitted(lost, *array);
  return Ok();
}

void FarmRun::DropFinished(const std::vector<QueuedTask>* queue) {
  std::erase_if(rounds_, [&](Round& round) {
    if (!round.complete() || !MayGo(&round, queue)) {
      return false;
    }
    round.RemoveLogs();
    // What cannot be removed now is a leftover of the next run.
    static_cast<void>(round.folder().Remove());
    return true;
  });
}

// A complete round stays until its tasks have left, which they do by
// themselves; only one that another overtook has to be told.
bool FarmRun::MayGo(Round* round, const std::vector<QueuedTask>* queue) {
  const std::string name = round->folder().QueueName();
  const auto is_ours = [&](const QueuedTask& task) {
    return task.queue_name == name;
  };
  if (queue != nullptr && std::none_of(queue->begin(), queue->end(), is_ours)) {
    return true;
  }
  if (Clock::now() - round->complete_since() < options_.settle) {
    return false;
  }
  return slurm_.Cancel(std::vector{name}).ok() || queue == nullptr;
}

Status FarmRun::Wait(const Error& why) {
  const Clock::time_point now = Clock::now();
  silent_since_ = silent_since_.value_or(now);
  if (now - *silent_since_ < options_.patience) {
    return Ok();
  }
  return Unavailable(
      fmt::format("{} (for {:g} s now)",
                  why.message,
                  std::chrono::duration<double>(options_.patience).count()));
}

void FarmRun::Pause() const {
  constexpr std::chrono::milliseconds kStep(50);
  const Clock::time_point end = Clock::now() + options_.poll_interval;
  while (Clock::now() < end && !StopAsked()) {
    std::this_thread::sleep_for(
        std::min<Clock::duration>(kStep, end - Clock::now()));
  }
}

Status FarmRun::End(const Status& why) {
  std::vector<RoundFolder> folders;
  for (const Round& round : rounds_) {
    folders.push_back(round.folder());
  }
  if (draft_) {  // An sbatch that gave no answer may have done its work.
    folders.push_back(draft_->folder());
  }
  const Status ended = EndTasks(options_, slurm_, folders);
  const Status merged = refused_ ? Ok() : Merge();
  for (const Status& status : {why, merged, ended}) {
    if (!status.ok()) {
      return status;
    }
  }
  for (const RoundFolder& folder : folders) {
    static_cast<void>(folder.Remove());
  }
  return Ok();
}

}  // namespace gatedyno
