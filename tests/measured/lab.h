// The whole chain for tests: workers and a store in memory, so that tests of
// one program share calibrations and jobs.

#ifndef GATEDYNO_TESTS_MEASURED_LAB_H_
#define GATEDYNO_TESTS_MEASURED_LAB_H_

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/deck/deck_head.h"
#include "harness/flow/prepared_run.h"
#include "harness/flow/work_desk.h"
#include "harness/record/run_result.h"
#include "harness/sim/worker_pool.h"
#include "harness/store/store.h"

namespace gatedyno {

class Lab {
 public:
  // Never destroyed; the workers end with the program.
  static Lab& Shared();

  // The run, or a failed test and an empty result.
  RunResult Measure(const PreparedRun& run);

  // One a job, in their order; a job that was not measured fails the test.
  std::vector<Outcome> Simulate(const std::vector<Job>& jobs);

  const std::string& simulator() const { return simulator_; }

 private:
  Lab(WorkerPool pool, Store store, std::string simulator);

  WorkerPool pool_;
  Store store_;
  std::string simulator_;
};

// At the run's first corner, or a failed test and no node.
Bench FirstBench(const PreparedRun& run);

// The plan's cells at its first corner, or a failed test and no cells.
PreparedRun Prepare(const std::string& node,
                    const std::vector<std::string>& cells,
                    Drive drive = Drive::kMatched);

// Prepared, then measured.
RunResult MeasureCells(const std::string& node,
                       const std::vector<std::string>& cells,
                       Drive drive = Drive::kMatched);

// The row of one pin and output edge at the run's first corner that has it;
// fails the test when there is none, or when it was not measured.
Comparison FindRow(const RunResult& result,
                   const std::string& cell,
                   const std::string& pin,
                   Edge edge);

// Mean over both output edges of slope / tau, and of intercept / tau.
struct MeanRow {
  double effort = 0.0;
  double parasitic = 0.0;
};
MeanRow FindMean(const RunResult& result,
                 const std::string& cell,
                 const std::string& pin);

// Of a test whose parameter is a plain name.
inline std::string ParamName(const testing::TestParamInfo<const char*>& info) {
  return info.param;
}

// The four built-in nodes.
inline constexpr const char* kNodes[] = {"p180", "p130", "p65", "p45"};

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_MEASURED_LAB_H_
