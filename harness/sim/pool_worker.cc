#include "harness/sim/pool_worker.h"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <iterator>
#include <utility>

#include <fmt/format.h>

namespace gatedyno {
namespace {

// The simulator loads in 0.03 s here; a cold network disk takes its time.
constexpr std::chrono::seconds kHelloLimit(30);

constexpr std::chrono::milliseconds kNoGrace(0);
// The output of a dying worker ends a moment before it can be reaped.
constexpr std::chrono::milliseconds kDeathGrace(200);

// Converting more than this to the clock's ticks would overflow.
constexpr double kLongestLimitSeconds = 1e8;

// A rung takes two to three times the steps of the one below.
constexpr double kSlowerPerRung = 3.0;

}  // namespace

double TimeLimitOf(const Attempt& attempt) {
  return attempt.job.time_limit_s *
         std::pow(kSlowerPerRung, static_cast<double>(attempt.rung));
}

Result<PoolWorker> PoolWorker::Start(
    const std::filesystem::path& program,
    const std::vector<std::string>& arguments) {
  Result<std::unique_ptr<WorkerProcess>> process =
      WorkerProcess::Start(program, arguments);
  if (!process.ok()) {
    return Forward(process);
  }
  PoolWorker worker;
  worker.process_ = std::move(*process);
  worker.deadline_ = Clock::now() + kHelloLimit;
  return worker;
}

Status PoolWorker::Greet() {
  process_->Exchange();
  const Result<std::optional<std::string>> text = process_->Receive();
  if (!text.ok()) {
    return Forward(text);
  }
  if (!text->has_value()) {
    return Ok();
  }
  Result<Hello> hello = ParseHello(**text);
  if (!hello.ok()) {
    return Forward(hello);
  }
  hello_ = std::move(*hello);
  return Ok();
}

bool PoolWorker::awaits_greeting() const {
  return !greeted() && !process_->output_ended() && Clock::now() < deadline_;
}

std::string PoolWorker::EndUngreeted(const Status& greeting) {
  if (!greeting.ok()) {
    process_->Finish(kNoGrace);
    return greeting.error().message;
  }
  if (!process_->output_ended()) {
    process_->Finish(kNoGrace);
    return fmt::format("the worker said nothing in its first {} s",
                       kHelloLimit.count());
  }
  return fmt::format("the worker {} before it was ready",
                     process_->Finish(kDeathGrace).words);
}

void PoolWorker::Give(Attempt attempt, std::string_view text) {
  assert(greeted());
  process_->Send(text);
  sent_.push_back(std::move(attempt));
  ++jobs_given_;
  if (sent_.size() == 1) {
    StartClock();
  }
}

Result<std::optional<PoolWorker::Answer>> PoolWorker::TakeReply() {
  const Result<std::optional<std::string>> text = process_->Receive();
  if (!text.ok()) {
    return Forward(text);
  }
  if (!text->has_value()) {
    return std::optional<Answer>();
  }
  Result<Reply> reply = ParseReply(**text);
  if (!reply.ok()) {
    return Forward(reply);
  }
  if (sent_.empty()) {
    return Internal("a reply to no job");
  }
  Answer answer{std::move(sent_.front()), *std::move(reply)};
  sent_.pop_front();
  StartClock();
  return std::optional<Answer>(std::move(answer));
}

std::vector<Attempt> PoolWorker::TakeAttempts() {
  std::vector<Attempt> attempts(std::move_iterator(sent_.begin()),
                                std::move_iterator(sent_.end()));
  sent_.clear();
  return attempts;
}

void PoolWorker::StartClock() {
  if (!sent_.empty()) {
    const double limit_s =
        std::min(TimeLimitOf(sent_.front()), kLongestLimitSeconds);
    deadline_ = Clock::now() + std::chrono::duration_cast<Clock::duration>(
                                   std::chrono::duration<double>(limit_s));
  }
}

std::optional<PoolWorker::Clock::time_point> PoolWorker::deadline() const {
  if (greeted() && sent_.empty()) {
    return std::nullopt;
  }
  return deadline_;
}

}  // namespace gatedyno
