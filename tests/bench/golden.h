// Delays to hold the others against: our decks with tolerances far below what
// anybody would wait for, and a fixed small step.

#ifndef GATEDYNO_TESTS_BENCH_GOLDEN_H_
#define GATEDYNO_TESTS_BENCH_GOLDEN_H_

#include <vector>

#include "harness/base/result.h"
#include "harness/record/job.h"
#include "harness/record/outcome.h"
#include "harness/sim/runner.h"

namespace gatedyno {

// At 45 nm a fortieth of tau.
inline constexpr double kGoldenStep_s = 0.05e-12;

// Where the simulator cannot hold the tolerances ("timestep too small") the
// pool goes on to the next rung, a tenth as tight, and once more:
// Outcome::rung tells.
Job GoldenJob(const Job& job, double step_s);

// Simulates every job as golden, under its own name and key.
class GoldenRunner : public SimRunner {
 public:
  // `runner` outlives this.
  GoldenRunner(SimRunner* runner, double step_s)
      : runner_(runner), step_s_(step_s) {}

  Status Run(JobSource& jobs, const OnOutcome& on_outcome) override;

  int simulated() const { return simulated_; }
  int loosened() const { return loosened_; }
  int failed() const { return failed_; }

 private:
  SimRunner* runner_;
  double step_s_;
  int simulated_ = 0;
  int loosened_ = 0;
  int failed_ = 0;
};

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_BENCH_GOLDEN_H_
