#include "tests/measured/lab.h"

#include <filesystem>
#include <utility>

#include <gtest/gtest.h>

#include "harness/flow/calibrate.h"
#include "harness/flow/characterize.h"

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
      simulator_(std::move(simulator)) {}

Lab& Lab::Shared() {
  static Lab& lab = *[] {
    WorkerPool pool = Must(WorkerPool::Make(Options()));
    std::string simulator = Must(pool.Simulator());
    return new Lab(
        std::move(pool), Must(Store::Open(":memory:")), std::move(simulator));
  }();
  return lab;
}

RunResult Lab::Measure(const PreparedRun& run) {
  WorkDesk desk(&pool_, &store_, {});
  Result<RunResult> result = Characterize(run, simulator_, &desk);
  if (!result.ok()) {
    ADD_FAILURE() << result.error().message;
    return {};
  }
  return *std::move(result);
}

std::vector<Outcome> Lab::Simulate(const std::vector<Job>& jobs) {
  WorkDesk desk(&pool_, &store_, {});
  std::vector<Outcome> outcomes(jobs.size());
  for (size_t i = 0; i < jobs.size(); ++i) {
    desk.Ask(jobs[i],
             [&outcomes, i](const Outcome& outcome) { outcomes[i] = outcome; });
  }
  const Status finished = desk.Work([] { return false; });
  EXPECT_TRUE(finished.ok()) << finished.error().message;
  for (size_t i = 0; i < jobs.size(); ++i) {
    EXPECT_TRUE(outcomes[i].measured())
        << jobs[i].label << ": " << outcomes[i].message << "\n"
        << jobs[i].deck;
  }
  return outcomes;
}

Bench FirstBench(const PreparedRun& run) {
  const Result<Benches> benches = BenchesOf(run, Lab::Shared().simulator());
  EXPECT_TRUE(benches.ok()) << benches.error().message;
  return benches.ok() ? benches->at(run.corners.front().name) : Bench();
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
