#include "tests/measured/written_copies.h"

#include <algorithm>
#include <string>

#include <fmt/format.h>
#include <gtest/gtest.h>

#include "harness/base/fingerprint.h"
#include "harness/base/text.h"
#include "harness/deck/deck_text.h"
#include "harness/deck/instance.h"
#include "harness/deck/sim_settings.h"
#include "harness/deck/stage_job.h"
#include "harness/deck/stage_measures.h"
#include "tests/measured/lab.h"

namespace gatedyno {
namespace {

constexpr int kFanout = 4;
// Sets the length of the run only.
constexpr double kTimeUnitPerLength_s_m = 1e-4;

NetId PinNamed(const Cell& cell, const std::string& name) {
  return *std::find_if(cell.pins.begin(), cell.pins.end(), [&](NetId pin) {
    return EqualsIgnoringCase(cell.net_name(pin), name);
  });
}

std::string OneCopy(const PreparedRun& run,
                    const Arc& arc,
                    const std::string& prefix,
                    const std::string& in,
                    const std::string& out) {
  const Cell& cell = run.cells.front();
  Instance instance{prefix, {}, 1.0};
  for (const SideInput& side : arc.side) {
    instance.nets[PinNamed(cell, side.pin)] =
        side.high ? kPowerNet : kGroundNet;
  }
  instance.nets[PinNamed(cell, arc.pin)] = in;
  instance.nets[PinNamed(cell, arc.output)] = out;
  return CellWriter(cell, run.node).Lines(instance);
}

std::string WrittenLoads(const PreparedRun& run, const Arc& arc) {
  std::string lines;
  for (int load = 0; load < kFanout; ++load) {
    const std::string net = fmt::format("la{}_out", load);
    lines += OneCopy(run, arc, fmt::format("la{}", load), kOutputNet, net);
    for (int next = 0; next < kFanout; ++next) {
      const std::string prefix = fmt::format("lb{}{}", load, next);
      lines += OneCopy(run, arc, prefix, net, prefix + "_out");
    }
  }
  return lines;
}

}  // namespace

Job CountedCopies(const PreparedRun& run, const Arc& arc) {
  Bench bench = FirstBench(run);
  // The tightest there is: what the two decks may differ by is the copies, not
  // where the simulator put its time points.
  bench.rung = RungFor(kFinestAccuracy) + 1;
  StageTest test;
  test.cell = &run.cells.front();
  test.arc = arc;
  for (const ArcEstimate& found : run.estimates.front().arcs) {
    if (found.arc == arc) {
      test.estimate = found.estimate;
    }
  }
  test.fanout = kFanout;
  test.time_unit_s = kTimeUnitPerLength_s_m * run.node.drawn_length_m;
  return StageJob(bench, test);
}

Job WrittenCopies(const PreparedRun& run, const Arc& arc) {
  Job job = CountedCopies(run, arc);
  const size_t begin = job.deck.find("* load: 4 copies");
  const size_t end = job.deck.find(".tran", begin);
  EXPECT_NE(begin, std::string::npos);
  EXPECT_NE(end, std::string::npos);
  job.deck.replace(begin, end - begin, WrittenLoads(run, arc));
  job.label += " written";
  job.key = Fingerprint(job.key + job.deck);
  return job;
}

void ExpectSameWithWrittenCopies(const PreparedRun& run, const Arc& arc) {
  constexpr double kTolerance = 1e-4;  // Of the interval.
  const std::vector<Outcome> outcomes = Lab::Shared().Simulate(
      {CountedCopies(run, arc), WrittenCopies(run, arc)});
  for (const auto& [name, written_s] : outcomes[1].values_s) {
    EXPECT_NEAR(outcomes[0].values_s.at(name),
                written_s,
                kTolerance * std::abs(written_s))
        << run.node.device(Polarity::kN).model << " " << arc.cell << " "
        << DescribeArc(arc) << " " << name;
  }
}

}  // namespace gatedyno
