// The whole way from deck to number, against what can be worked out on paper
// and against the simulator's own measuring.

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <gtest/gtest.h>

#include "harness/worker/measure.h"
#include "tests/support/ngspice_batch.h"
#include "tests/support/shared_session.h"

namespace gatedyno {
namespace {

// 1 kohm and 1 pF, stepped at 1 ns.
constexpr double kTimeConstant = 1e-9;

Job RcJob(Edge edge) {
  const std::string levels = edge == Edge::kRise ? "0 1" : "1 0";
  Job job;
  job.deck = "one rc\nvin in 0 pulse(" + levels +
             " 1n 1f 1f 1 2)\n"
             "r1 in out 1k\nc1 out 0 1p\n"
             ".options reltol=1e-5 chgtol=1e-18 trtol=1 num_threads=1\n"
             ".tran 5p 12n 0 5p\n.end\n";
  job.stop_s = 12e-9;
  const double low_v = edge == Edge::kRise ? 0.2 : 0.8;
  job.intervals = {
      {"half", {"in", 0.5, edge, 1}, {"out", 0.5, edge, 1}},
      {"20-80", {"out", low_v, edge, 1}, {"out", 1.0 - low_v, edge, 1}},
      {"10-90",
       {"out", edge == Edge::kRise ? 0.1 : 0.9, edge, 1},
       {"out", edge == Edge::kRise ? 0.9 : 0.1, edge, 1}},
      {"30-70",
       {"out", edge == Edge::kRise ? 0.3 : 0.7, edge, 1},
       {"out", edge == Edge::kRise ? 0.7 : 0.3, edge, 1}}};
  job.swings = {{"out", 0.01, 0.99}};
  return job;
}

// On the straight line between the time points around it.
double VoltageAt(const Waveform& waveform, double time_s) {
  const auto after = std::upper_bound(
      waveform.time_s.begin() + 1, waveform.time_s.end() - 1, time_s);
  const auto i = static_cast<size_t>(after - waveform.time_s.begin());
  const double share = (time_s - waveform.time_s[i - 1]) /
                       (waveform.time_s[i] - waveform.time_s[i - 1]);
  return std::lerp(waveform.voltage_v[i - 1], waveform.voltage_v[i], share);
}

// v(t) = 1 - exp(-t / RC): closed form.
TEST(RcTest, MeetsTheClosedForm) {
  constexpr double kTolerance = 1e-3;  // Of the value: what is asked of it.
  for (const Edge edge : {Edge::kRise, Edge::kFall}) {
    const Outcome outcome = RunJob(RcJob(edge), &SharedSession());
    ASSERT_TRUE(outcome.measured()) << outcome.message;
    const std::map<std::string, double> expected_s = {
        {"half", std::log(2.0) * kTimeConstant},
        {"20-80", std::log(4.0) * kTimeConstant},
        {"10-90", std::log(9.0) * kTimeConstant},
        {"30-70", std::log(7.0 / 3.0) * kTimeConstant}};
    for (const auto& [name, value_s] : expected_s) {
      EXPECT_NEAR(outcome.values_s.at(name), value_s, kTolerance * value_s)
          << name;
    }
  }
}

// Each mark of a picture lies on its waveform: the straight line between the
// time points around it is at the level, to what the curve departs from it.
TEST(RcTest, TheMarksLieOnTheWaveforms) {
  constexpr double kDeparture_v = 1e-5;  // A step is 1/200 time constant.
  Job job = RcJob(Edge::kFall);
  job.intervals.erase(job.intervals.begin());  // The source steps at once.
  job.wants_waves = true;
  const Outcome outcome = RunJob(job, &SharedSession());
  ASSERT_TRUE(outcome.measured()) << outcome.message;
  ASSERT_TRUE(outcome.waves.has_value());
  const std::vector<Waveform>& waveforms = outcome.waves->waveforms;
  ASSERT_EQ(waveforms.size(), 1U);
  EXPECT_EQ(waveforms[0].net, "out");
  EXPECT_GE(waveforms[0].time_s.back(), job.stop_s * (1.0 - 1e-6));
  for (size_t i = 0; i < job.intervals.size(); ++i) {
    const TimedInterval& timed = outcome.waves->intervals[i];
    EXPECT_NEAR(VoltageAt(waveforms[0], timed.from_s),
                job.intervals[i].from.level_v,
                kDeparture_v);
    EXPECT_NEAR(VoltageAt(waveforms[0], timed.to_s),
                job.intervals[i].to.level_v,
                kDeparture_v);
  }
}

TEST(RcTest, AgreesWithTheSimulatorsOwnMeasuring) {
  // It draws a straight line between time points, 1/200 of a time constant
  // apart: h^2/8 of the curvature.
  constexpr double kTolerance = 1e-5;
  const Job job = RcJob(Edge::kRise);
  const Outcome outcome = RunJob(job, &SharedSession());
  ASSERT_TRUE(outcome.measured()) << outcome.message;
  std::string deck = job.deck;
  deck.insert(deck.find(".end"),
              ".meas tran half trig v(in) val=.5 rise=1 targ v(out) val=.5 "
              "rise=1\n"
              ".meas tran slew trig v(out) val=.2 rise=1 targ v(out) val=.8 "
              "rise=1\n");
  const Result<BatchMeasures> batch = RunBatch(deck);
  ASSERT_TRUE(batch.ok()) << batch.error().message;
  const double half_s = batch->at("half");
  EXPECT_NEAR(outcome.values_s.at("half"), half_s, kTolerance * half_s);
  const double slew_s = batch->at("slew");
  EXPECT_NEAR(outcome.values_s.at("20-80"), slew_s, kTolerance * slew_s);
}

}  // namespace
}  // namespace gatedyno
