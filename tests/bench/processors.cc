// Where the workers' processor time goes, and what a second worker brings.

#include <array>
#include <vector>

#include <fmt/format.h>

#include "harness/flow/plan.h"
#include "tests/bench/parts.h"
#include "tests/bench/program.h"
#include "tests/bench/scene.h"
#include "tests/bench/shell.h"
#include "tests/bench/statistics.h"
#include "tests/bench/target.h"

namespace gatedyno {
namespace {

// Adds up what the outcomes say of the simulator.
class CountingRunner : public SimRunner {
 public:
  explicit CountingRunner(SimRunner* runner) : runner_(runner) {}

  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override {
    return runner_->Run(jobs, [&](const Job& job, const Outcome& outcome) {
      simulator_s_ += outcome.simulator_s;
      ++jobs_;
      return on_outcome(job, outcome);
    });
  }

  double simulator_s() const { return simulator_s_; }
  int jobs() const { return jobs_; }

 private:
  SimRunner* runner_;
  double simulator_s_ = 0.0;
  int jobs_ = 0;
};

Result<bool> BenchShare() {
  constexpr double kLeastShare = 95.0;
  const Result<Plan> plan = LoadPlan(ArbiterPlan());
  if (!plan.ok()) {
    return Forward(plan);
  }
  const double before_s = ChildrenProcessorTime();
  double simulator_s = 0.0;
  int jobs = 0;
  {
    Result<WorkerPool> pool = WorkerPool::Make({});
    if (!pool.ok()) {
      return Forward(pool);
    }
    CountingRunner counting(&*pool);
    const Result<Scene> scene = MeasureScene(*plan, &*pool, &counting);
    if (!scene.ok()) {
      return Forward(scene);
    }
    simulator_s = counting.simulator_s();
    jobs = counting.jobs();
  }  // The workers have ended here.
  const double workers_s = ChildrenProcessorTime() - before_s;
  Figure("jobs", jobs);
  Figure("processor time of the workers, s", workers_s);
  return AtLeast("simulator's share of it, %",
                 100.0 * simulator_s / workers_s,
                 kLeastShare);
}

Result<bool> BenchScaling(const std::filesystem::path& folder) {
  constexpr int kRounds = 3;
  constexpr double kLeastGain = 1.9;
  std::array<std::vector<double>, 2> wall_s;
  for (int round = 0; round < kRounds; ++round) {
    for (const size_t workers : {1U, 2U}) {
      const Result<Spent> spent = RunShell(
          FreshRun(
              folder,
              "scaling",
              fmt::format("{} --workers {}", Quoted(ArbiterPlan()), workers)),
          {0, 1});
      if (!spent.ok()) {
        return Forward(spent);
      }
      wall_s[workers - 1].push_back(spent->wall_s);
    }
  }
  const double one_s = Median(wall_s[0]);
  const double two_s = Median(wall_s[1]);
  Figure("one worker, s", one_s, "median of three runs");
  Figure("two workers, s", two_s, "median of three runs");
  return AtLeast("two workers against one", one_s / two_s, kLeastGain);
}

}  // namespace

Result<bool> BenchProcessors(const std::filesystem::path& folder) {
  fmt::print("\nprocessors: the arbiter's plan, fanouts chosen by the run\n");
  const Result<bool> share = BenchShare();
  if (!share.ok()) {
    return Forward(share);
  }
  const Result<bool> scaling = BenchScaling(folder);
  if (!scaling.ok()) {
    return Forward(scaling);
  }
  return *share && *scaling;
}

}  // namespace gatedyno
