#include "harness/worker/measure.h"

#include <string>
#include <vector>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

// `in` rises and `out` falls 1 ns later, both in 1 ns, from 0 to 1 V.  Points
// in between make each edge straight where it is measured.
std::vector<Waveform> Step() {
  const std::vector<double> time_s = {0.0,
                                      1e-9,
                                      1.1e-9,
                                      1.3e-9,
                                      1.7e-9,
                                      1.9e-9,
                                      2.0e-9,
                                      2.1e-9,
                                      2.3e-9,
                                      2.7e-9,
                                      2.9e-9,
                                      3e-9};
  return {{"in", time_s, {0.0, 0.0, 0.1, 0.3, 0.7, 0.9, 1, 1, 1, 1, 1, 1}},
          {"out", time_s, {1, 1, 1, 1, 1, 1, 1, 0.9, 0.7, 0.3, 0.1, 0.0}}};
}

Job StepJob() {
  Job job;
  job.intervals = {
      {"delay", {"in", 0.5, Edge::kRise, 1}, {"out", 0.5, Edge::kFall, 1}},
      {"back", {"out", 0.5, Edge::kFall, 1}, {"in", 0.5, Edge::kRise, 1}},
      {"slew", {"out", 0.8, Edge::kFall, 1}, {"out", 0.2, Edge::kFall, 1}}};
  job.swings = {{"out", 0.1, 0.9}};
  return job;
}

TEST(MeasureTest, AsksForEachNetOnce) {
  EXPECT_EQ(NetsOf(StepJob()), (std::set<std::string>{"in", "out"}));
  EXPECT_TRUE(NetsOf(Job()).empty());
}

TEST(MeasureTest, IntervalsAreDifferencesAndMayBeNegative) {
  constexpr double kRounding = 1e-21;
  const Outcome outcome = Measure(StepJob(), Step());
  ASSERT_TRUE(outcome.measured()) << outcome.message;
  EXPECT_NEAR(outcome.values_s.at("delay"), 1e-9, kRounding);
  EXPECT_NEAR(outcome.values_s.at("back"), -1e-9, kRounding);
  EXPECT_NEAR(outcome.values_s.at("slew"), 0.6e-9, kRounding);
  EXPECT_EQ(outcome.message, "");
}

TEST(MeasureTest, NothingAskedIsMeasured) {
  EXPECT_TRUE(Measure(Job(), {}).measured());
}

TEST(MeasureTest, AMissingCrossingNamesItsInterval) {
  Job job = StepJob();
  job.intervals[1].to.occurrence = 2;
  const Outcome outcome = Measure(job, Step());
  EXPECT_EQ(outcome.ending, Ending::kFailed);
  EXPECT_EQ(outcome.message,
            "back: v(in) rises through 0.5 V only 1 of 2 times within 3e-09 s");
  EXPECT_TRUE(outcome.values_s.empty());
}

TEST(MeasureTest, WavesAreGivenWhereTheyAreWanted) {
  Job job = StepJob();
  EXPECT_EQ(Measure(job, Step()).waves, std::nullopt);
  job.wants_waves = true;
  const Outcome outcome = Measure(job, Step());
  ASSERT_TRUE(outcome.measured()) << outcome.message;
  ASSERT_TRUE(outcome.waves.has_value());
  EXPECT_EQ(outcome.waves->waveforms, Step());
  ASSERT_EQ(outcome.waves->intervals.size(), job.intervals.size());
  for (size_t i = 0; i < job.intervals.size(); ++i) {
    const TimedInterval& timed = outcome.waves->intervals[i];
    EXPECT_EQ(timed.name, job.intervals[i].name);
    // Bit for bit: the marks of a picture are what was measured.
    EXPECT_EQ(timed.to_s - timed.from_s, outcome.values_s.at(timed.name));
  }
  constexpr double kRounding = 1e-21;
  EXPECT_NEAR(outcome.waves->intervals[0].from_s, 1.5e-9, kRounding);
  EXPECT_NEAR(outcome.waves->intervals[0].to_s, 2.5e-9, kRounding);
}

TEST(MeasureTest, NoWavesOfWhatFailed) {
  Job job = StepJob();
  job.wants_waves = true;
  job.intervals[2].to.occurrence = 2;
  EXPECT_EQ(Measure(job, Step()).waves, std::nullopt);
}

TEST(MeasureTest, AFloatingNetComesBeforeItsDelays) {
  Job job = StepJob();
  job.swings[0].low_v = -0.1;
  job.intervals[0].to.occurrence = 2;
  const Outcome outcome = Measure(job, Step());
  EXPECT_EQ(outcome.ending, Ending::kFailed);
  EXPECT_EQ(outcome.message,
            "v(out) does not swing from below -0.1 V to above 0.9 V (it stays "
            "between 0.00 and 1.00 V): look for a floating net or supply, or a "
            "contention");
}

}  // namespace
}  // namespace gatedyno
