// A plan measured in this process: what the parts of the benchmark start from.

#ifndef GATEDYNO_TESTS_BENCH_SCENE_H_
#define GATEDYNO_TESTS_BENCH_SCENE_H_

#include <memory>
#include <vector>

#include "harness/base/result.h"
#include "harness/deck/deck_head.h"
#include "harness/deck/stage_job.h"
#include "harness/flow/calibrate.h"
#include "harness/flow/prepared_run.h"
#include "harness/record/run_result.h"
#include "harness/sim/worker_pool.h"

namespace gatedyno {

struct Scene {
  std::unique_ptr<PreparedRun> run;  // The bench points into it.
  Bench bench;                       // At the plan's first corner.
  RunResult result;
  ReferenceArcs references;  // At the fanouts the run chose for them.

  const Calibration& calibration() const { return result.calibrations.front(); }
  // The arcs of every cell, in the order of the result's comparisons.
  std::vector<StageTest> Tests() const;
};

// Everything of a plan at its one corner, nothing of it from a store.  `runner`
// is the pool, or hands on to it.
Result<Scene> MeasureScene(const Plan& plan,
                           WorkerPool* pool,
                           SimRunner* runner);

// The reference inverter at given fanouts, by another runner.
Result<ReferenceArcs> MeasureReference(const Scene& scene,
                                       const std::vector<double>& fanouts,
                                       SimRunner* runner);

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_SCENE_H_
