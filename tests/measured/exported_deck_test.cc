// Decks run by hand under the plain simulator give what the worker measured:
// anybody can repeat a figure without this program.

#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/flow/characterize.h"
#include "tests/measured/lab.h"
#include "tests/support/ngspice_batch.h"

namespace gatedyno {
namespace {

// As `gatedyno deck` writes them.
std::vector<Job> DecksOf(const PreparedRun& run,
                         const Calibration& calibration) {
  const Result<std::vector<ArcSweep>> sweeps = PlanArcs(
      run, run.corners.front(), calibration, Lab::Shared().simulator());
  EXPECT_TRUE(sweeps.ok()) << sweeps.error().message;
  std::vector<Job> jobs;
  for (const ArcSweep& sweep : *sweeps) {
    jobs.push_back(sweep.jobs.front());
    jobs.push_back(sweep.jobs.back());
  }
  return jobs;
}

class ExportedDeckTest : public testing::TestWithParam<const char*> {};
INSTANTIATE_TEST_SUITE_P(Nodes,
                         ExportedDeckTest,
                         testing::Values("p180", "p45"),
                         ParamName);

TEST_P(ExportedDeckTest, GivesTheSameIntervalsInBatch) {
  constexpr double kTolerance = 1e-6;  // The log has seven digits.
  const PreparedRun run = Prepare(GetParam(), {"inv_hi", "nand2", "and2"});
  const RunResult result = Lab::Shared().Measure(run);
  ASSERT_EQ(result.calibrations.size(), 1u);
  const std::vector<Job> jobs = DecksOf(run, result.calibrations.front());
  const std::vector<Outcome> outcomes = Lab::Shared().Simulate(jobs);
  for (size_t i = 0; i < jobs.size(); ++i) {
    const Result<BatchMeasures> batch = RunBatch(jobs[i].deck);
    ASSERT_TRUE(batch.ok()) << batch.error().message;
    ASSERT_EQ(outcomes[i].values_s.size(), 6u);
    for (const auto& [name, value_s] : outcomes[i].values_s) {
      EXPECT_NEAR(batch->at(name), value_s, kTolerance * std::abs(value_s))
          << jobs[i].label << " " << name;
    }
  }
}

}  // namespace
}  // namespace gatedyno
