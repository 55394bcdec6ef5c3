#include "tests/bench/golden.h"

#include <cstdio>
#include <map>
#include <optional>
#include <string>
#include <utility>

#include <fmt/format.h>

#include "tests/bench/script_deck.h"

namespace gatedyno {
namespace {

// Hands on what `jobs` gives, made golden, and remembers what it was.
class GoldenJobs : public JobSource {
 public:
  GoldenJobs(JobSource* jobs, double step_s) : jobs_(jobs), step_s_(step_s) {}

  std::optional<Job> Next() override {
    std::optional<Job> job = jobs_->Next();
    if (!job) {
      return std::nullopt;
    }
    Job golden = GoldenJob(*job, step_s_);
    under_way_.insert_or_assign(job->key, *std::move(job));
    return golden;
  }

  Job Original(const std::string& key) {
    return std::move(under_way_.extract(key).mapped());
  }

 private:
  JobSource* jobs_;
  double step_s_;
  std::map<std::string, Job> under_way_;  // By key.
};

}  // namespace

Job GoldenJob(const Job& job, double step_s) {
  Job golden = job;
  golden.settings = {
      ".options reltol=1e-6 chgtol=1e-20 trtol=1 num_threads=1\n",
      ".options reltol=1e-5 chgtol=1e-19 trtol=1 num_threads=1\n",
      ".options reltol=1e-4 chgtol=1e-18 trtol=1 num_threads=1\n"};
  golden.time_limit_s = 600.0;
  golden.deck = WithFixedStep(std::move(golden.deck), job, step_s);
  return golden;
}

Status GoldenRunner::Run(JobSource& jobs, const OnOutcome& on_outcome) {
  GoldenJobs golden(&jobs, step_s_);
  return runner_->Run(golden, [&](const Job& job, const Outcome& outcome) {
    ++simulated_;
    loosened_ += outcome.measured() && outcome.rung > 0 ? 1 : 0;
    failed_ += outcome.measured() ? 0 : 1;
    fmt::print(stderr, "\rgolden: {} decks ", simulated_);
    return on_outcome(golden.Original(job.key), outcome);
  });
}

}  // namespace gatedyno
