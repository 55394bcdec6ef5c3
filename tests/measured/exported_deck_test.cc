// Decks run by hand under the plain simulator give what the worker measured:
// anybody can repeat a figure without this program.
//
// The simulator's own .meas draws a straight line between time points, so the
// same crossings are found here in the same way, in the worker's waveforms; how
// far the worker's cubic is from that is within what is promised of a delay.

#include <algorithm>
#include <map>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/flow/calibrate.h"
#include "harness/flow/characterize.h"
#include "harness/worker/measure.h"
#include "tests/measured/lab.h"
#include "tests/support/ngspice_batch.h"
#include "tests/support/shared_session.h"

namespace gatedyno {
namespace {

// As `gatedyno deck` writes them, at the smallest and the largest fanout.
std::vector<Job> DecksOf(const PreparedRun& run,
                         const Calibration& calibration) {
  const Bench bench = FirstBench(run);
  const std::vector<double> fanouts = AllFanouts(FanoutRuleOf(run.plan));
  std::vector<Job> jobs;
  for (size_t cell = 0; cell < run.cells.size(); ++cell) {
    for (StageTest& test : ArcTests(run, cell, calibration)) {
      for (const double fanout : {fanouts.front(), fanouts.back()}) {
        test.fanout = fanout;
        jobs.push_back(StageJob(bench, test));
      }
    }
  }
  return jobs;
}

double StraightCrossing(const std::vector<Waveform>& waveforms,
                        const Crossing& crossing) {
  const Waveform& waveform = *std::find_if(
      waveforms.begin(), waveforms.end(), [&](const Waveform& candidate) {
        return candidate.net == crossing.net;
      });
  int found = 0;
  for (size_t i = 1; i < waveform.time_s.size(); ++i) {
    const double v0 = waveform.voltage_v[i - 1];
    const double v1 = waveform.voltage_v[i];
    const bool passes = crossing.edge == Edge::kRise
                            ? v0 < crossing.level_v && v1 >= crossing.level_v
                            : v0 > crossing.level_v && v1 <= crossing.level_v;
    if (passes && ++found == crossing.occurrence) {
      return waveform.time_s[i - 1] +
             (crossing.level_v - v0) / (v1 - v0) *
                 (waveform.time_s[i] - waveform.time_s[i - 1]);
    }
  }
  ADD_FAILURE() << "no crossing of " << crossing.net;
  return 0.0;
}

void ExpectBatchAgrees(const Job& job, const Outcome& outcome) {
  constexpr double kLogDigits = 1e-6;  // The log has seven.
  // A straight line's own error on top of what is promised of a delay;
  // transition times are not promised, and end where the waveform bends.
  constexpr double kDelay = 2 * kDefaultAccuracy;
  constexpr double kTransition = 1e-2;
  const Result<BatchMeasures> batch = RunBatch(DeckText(job, 0));
  ASSERT_TRUE(batch.ok()) << batch.error().message;
  const Result<std::vector<Waveform>> waveforms =
      SharedSession().Run(DeckText(job, 0), NetsOf(job), job.stop_s);
  ASSERT_TRUE(waveforms.ok()) << waveforms.error().message;
  ASSERT_EQ(job.intervals.size(), 6U);
  for (const Interval& interval : job.intervals) {
    const double batch_s = batch->at(interval.name);
    const double straight_s = StraightCrossing(*waveforms, interval.to) -
                              StraightCrossing(*waveforms, interval.from);
    EXPECT_NEAR(straight_s, batch_s, kLogDigits * batch_s)
        << job.label << " " << interval.name;
    const bool is_delay = interval.name.starts_with("delay");
    EXPECT_NEAR(outcome.values_s.at(interval.name),
                batch_s,
                (is_delay ? kDelay : kTransition) * batch_s)
        << job.label << " " << interval.name;
  }
}

class ExportedDeckTest : public testing::TestWithParam<const char*> {};
INSTANTIATE_TEST_SUITE_P(Nodes,
                         ExportedDeckTest,
                         testing::Values("p180", "p45"),
                         ParamName);

TEST_P(ExportedDeckTest, GivesTheSameIntervalsInBatch) {
  const PreparedRun run = Prepare(GetParam(), {"inv_hi", "nand2", "and2"});
  const RunResult result = Lab::Shared().Measure(run);
  ASSERT_EQ(result.calibrations.size(), 1U);
  const std::vector<Job> jobs = DecksOf(run, result.calibrations.front());
  const std::vector<Outcome> outcomes = Lab::Shared().Simulate(jobs);
  for (size_t i = 0; i < jobs.size(); ++i) {
    ExpectBatchAgrees(jobs[i], outcomes[i]);
  }
}

}  // namespace
}  // namespace gatedyno
