// Ring oscillators: the period that measured g and p predict, against the
// period of the simulated ring.  Nothing in a ring is a fanout deck: no source,
// no shaping stages, and every stage drives the next.

#include <algorithm>
#include <string>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/base/fingerprint.h"
#include "harness/base/text.h"
#include "harness/deck/deck_text.h"
#include "harness/deck/instance.h"
#include "harness/deck/sim_settings.h"
#include "harness/flow/calibrate.h"
#include "tests/measured/lab.h"

namespace gatedyno {
namespace {

// Of the predicted period, relative.
//
// Self drive: a ring is a path of equals, which is what self drive measures.
// Short rings of an outer input are the exception: the net inside the stack is
// still settling when the next edge comes, and at 15 stages less so.
constexpr double kOfEquals = 0.01;
constexpr double kUnsettled = 0.02;
// Matched drive knows nothing of what drives a gate in the end.  It gives the
// input the slope of a reference inverter of the same effort, faster than that
// of a gate with a larger parasitic: the predicted period is short, and most so
// where the parasitic is most of the delay, a NAND's at fanout 1.
constexpr double kOtherSlope = 0.05;
constexpr double kAllParasitic = 0.08;

struct Ring {
  const char* cell;
  const char* pin;  // The input in the ring; the others are tied off.
  int stages;       // Odd.
  double fanout;    // Of each stage: the next stage and dummy loads.
  double self_tolerance;
  double matched_tolerance;
};
constexpr Ring kRings[] = {
    {"inv", "a", 5, 1, kOfEquals, kOfEquals},
    {"inv", "a", 7, 1, kOfEquals, kOfEquals},
    {"inv", "a", 5, 2, kOfEquals, kOfEquals},
    {"inv", "a", 7, 3, kOfEquals, kOfEquals},
    {"nand2", "a", 5, 1, kOfEquals, kAllParasitic},
    {"nand2", "a", 5, 3, kOfEquals, kOtherSlope},
    {"nand2", "b", 5, 1, kUnsettled, kAllParasitic},
    {"nand2", "b", 5, 3, kUnsettled, kOtherSlope},
    {"nand2", "b", 15, 1, kOfEquals, kAllParasitic},
};

// Each edge goes round once a period, and passes every stage as a rise and as
// a fall: T = N * sum over both edges of (g tau_edge h + p tau).
double PredictedPeriod(const RunResult& result, const Ring& ring) {
  const Calibration& calibration = result.calibrations.front();
  double stage_s = 0.0;
  for (const Edge edge : {Edge::kRise, Edge::kFall}) {
    const Comparison row = FindRow(result, ring.cell, ring.pin, edge);
    const double tau_edge_s = edge == Edge::kRise
                                  ? calibration.tau_rise_s.value
                                  : calibration.tau_fall_s.value;
    stage_s += row.effort.value * tau_edge_s * ring.fanout +
               row.parasitic.value * calibration.tau_s.value;
  }
  return ring.stages * stage_s;
}

class RingWriter {
 public:
  RingWriter(const PreparedRun& run, const Arc& arc, const Ring& ring)
      : run_(run), arc_(arc), ring_(ring), cell_(run.cells.front()) {}

  // Dummy loads are loaded like the stages: a load's own load decides its
  // input capacitance.
  std::string Circuit() const {
    const double dummies = ring_.fanout - 1;
    std::string text;
    for (int i = 0; i < ring_.stages; ++i) {
      const std::string out = fmt::format("w{}", (i + 1) % ring_.stages);
      text += Gate(fmt::format("r{}", i), fmt::format("w{}", i), out, 1.0);
      if (dummies > 0) {
        const std::string dummy = fmt::format("d{}", i);
        text += Gate(dummy, out, dummy + "_out", dummies);
        text += Gate(fmt::format("e{}", i),
                     dummy + "_out",
                     fmt::format("e{}_out", i),
                     dummies * ring_.fanout);
      }
    }
    return text;
  }

 private:
  NetId PinNamed(const std::string& name) const {
    return *std::find_if(cell_.pins.begin(), cell_.pins.end(), [&](NetId pin) {
      return EqualsIgnoringCase(cell_.net_name(pin), name);
    });
  }

  std::string Gate(const std::string& prefix,
                   const std::string& in,
                   const std::string& out,
                   double copies) const {
    Instance instance{prefix, {}, copies};
    for (const SideInput& side : arc_.side) {
      instance.nets[PinNamed(side.pin)] = side.high ? kPowerNet : kGroundNet;
    }
    instance.nets[PinNamed(arc_.pin)] = in;
    instance.nets[PinNamed(arc_.output)] = out;
    return CellWriter(cell_, run_.node).Lines(instance);
  }

  const PreparedRun& run_;
  const Arc& arc_;
  const Ring& ring_;
  const Cell& cell_;
};

// From the third to the fourth rise of one net, when the start is forgotten.
Job RingJob(const PreparedRun& run,
            const Arc& arc,
            const Ring& ring,
            double period_s) {
  constexpr double kPeriods = 6;
  constexpr double kStepsPerPeriod = 50;
  const Bench bench = FirstBench(run);
  const double supply_v = run.corners.front().supply_v;
  const std::string step = DeckNumber(period_s / kStepsPerPeriod);
  Job job;
  job.label = fmt::format("ring of {} {}", ring.stages, ring.cell);
  job.stop_s = kPeriods * period_s;
  job.intervals = {{"period",
                    {"w0", supply_v / 2, Edge::kRise, 3},
                    {"w0", supply_v / 2, Edge::kRise, 4}}};
  job.swings = {{"w0", 0.05 * supply_v, 0.95 * supply_v}};
  job.deck =
      "* ring oscillator\n" + DeckHead(bench) +
      RingWriter(run, arc, ring).Circuit() + ".ic v(w0)=0\n" +
      fmt::format(".tran {0} {1} 0 {0}\n", step, DeckNumber(job.stop_s)) +
      ModelLines(bench) + ".end\n";
  job.settings = SettingsLadder(bench.rung);
  job.key = Fingerprint(job.deck);
  return job;
}

class RingOscillatorTest : public testing::TestWithParam<const char*> {};
INSTANTIATE_TEST_SUITE_P(Nodes,
                         RingOscillatorTest,
                         testing::Values("p180", "p45"),
                         ParamName);

// Predicted over simulated.
double PeriodRatio(const std::string& node, const Ring& ring, Drive drive) {
  const PreparedRun run = Prepare(node, {ring.cell}, drive);
  const RunResult result = Lab::Shared().Measure(run);
  if (result.calibrations.size() != 1) {
    ADD_FAILURE() << node << ": no calibration";
    return 0.0;
  }
  const double predicted_s = PredictedPeriod(result, ring);
  const Arc arc = FindRow(result, ring.cell, ring.pin, Edge::kRise).arc;
  const std::vector<Outcome> outcomes =
      Lab::Shared().Simulate({RingJob(run, arc, ring, predicted_s)});
  return outcomes.front().measured()
             ? predicted_s / outcomes.front().values_s.at("period")
             : 0.0;
}

std::string Describe(const Ring& ring) {
  return fmt::format("{} {}, {} stages, fanout {}",
                     ring.cell,
                     ring.pin,
                     ring.stages,
                     ring.fanout);
}

TEST_P(RingOscillatorTest, PeriodFollowsFromSelfDrive) {
  for (const Ring& ring : kRings) {
    EXPECT_NEAR(
        PeriodRatio(GetParam(), ring, Drive::kSelf), 1.0, ring.self_tolerance)
        << Describe(ring);
  }
}

TEST_P(RingOscillatorTest, PeriodFollowsFromMatchedDrive) {
  for (const Ring& ring : kRings) {
    EXPECT_NEAR(PeriodRatio(GetParam(), ring, Drive::kMatched),
                1.0,
                ring.matched_tolerance)
        << Describe(ring);
  }
}

}  // namespace
}  // namespace gatedyno
