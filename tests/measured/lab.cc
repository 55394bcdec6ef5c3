#include "tests/measured/lab.h"

#include <filesystem>
#include <utility>

#include <gtest/gtest.h>

#include "harness/flow/characterize.h"
#include "harness/sim/simulator_identity.h"

namespace gatedyno {
namespace {

// The value, or the end of the test program: nothing can be tested without.
template <class T>
T Must(Result<T> result) {
  if (!result.ok()) {
    ADD_FAILURE() << result.error().message;
    std::abort();
  }
  return *std::move(result);
}

std::filesystem::path Worker() {
  return std::filesystem::path(GATEDYNO_BIN_DIR) / "gatedyno-worker";
}

PoolOptions Options() {
  PoolOptions options;
  options.worker_program = Worker();
  return options;
}

}  // namespace

Lab::Lab(WorkerPool pool, Store store, std::string simulator)
    : pool_(std::move(pool)),
      store_(std::move(store)),
      simulator_(std::move(simulator)),
      book_(&pool_,
            &store_,
            Must(store_.BeginRun({})),
            [](const JobCounts& /*counts*/) {}) {}

Lab& Lab::Shared() {
  static Lab& lab = *new Lab(Must(WorkerPool::Make(Options())),
                             Must(Store::Open(":memory:")),
                             Must(SimulatorIdentity(Worker())));
  return lab;
}

RunResult Lab::Measure(const PreparedRun& run) {
  Result<RunResult> result = Characterize(run, simulator_, &book_);
  if (!result.ok()) {
    ADD_FAILURE() << result.error().message;
    return {};
  }
  return *std::move(result);
}

std::vector<Outcome> Lab::Simulate(const std::vector<Job>& jobs) {
  const Status finished = book_.Finish(jobs);
  EXPECT_TRUE(finished.ok()) << finished.error().message;
  std::vector<Outcome> outcomes;
  for (const Job& job : jobs) {
    outcomes.push_back(book_.OutcomeOf(job.key));
    EXPECT_TRUE(outcomes.back().measured())
        << job.label << ": " << outcomes.back().message << "\n"
        << job.deck;
  }
  return outcomes;
}

PreparedRun Prepare(const std::string& node,
                    const std::vector<std::string>& cells,
                    Drive drive) {
  Plan plan;
  plan.node = node;
  plan.cells = cells;
  plan.drive = drive;
  Result<PreparedRun> run = PrepareRun(plan);
  if (!run.ok()) {
    ADD_FAILURE() << run.error().message;
    return {};
  }
  return *std::move(run);
}

RunResult MeasureCells(const std::string& node,
                       const std::vector<std::string>& cells,
                       Drive drive) {
  return Lab::Shared().Measure(Prepare(node, cells, drive));
}

Comparison FindRow(const RunResult& result,
                   const std::string& cell,
                   const std::string& pin,
                   Edge edge) {
  for (const Comparison& row : result.comparisons) {
    if (row.arc.cell == cell && row.arc.pin == pin && row.arc.edge == edge) {
      EXPECT_NE(row.verdict, Verdict::kNotMeasured)
          << cell << " " << DescribeArc(row.arc) << ": " << row.reason;
      return row;
    }
  }
  ADD_FAILURE() << result.facts.node << ": no row of " << cell << " " << pin
                << " " << EdgeName(edge);
  return {};
}

MeanRow FindMean(const RunResult& result,
                 const std::string& cell,
                 const std::string& pin) {
  MeanRow mean;
  for (const Edge edge : {Edge::kRise, Edge::kFall}) {
    const Comparison row = FindRow(result, cell, pin, edge);
    mean.effort += row.effort_mean.value / 2;
    mean.parasitic += row.parasitic.value / 2;
  }
  return mean;
}

}  // namespace gatedyno
