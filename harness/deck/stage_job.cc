#include "harness/deck/stage_job.h"

#include <algorithm>
#include <cassert>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/base/fingerprint.h"
#include "harness/base/text.h"
#include "harness/deck/deck_text.h"
#include "harness/deck/instance.h"
#include "harness/deck/reference.h"
#include "harness/deck/sim_settings.h"
#include "harness/deck/stage_measures.h"
#include "harness/deck/stimulus.h"

namespace gatedyno {
namespace {

NetId PinNamed(const Cell& cell, const std::string& name) {
  const auto found =
      std::find_if(cell.pins.begin(), cell.pins.end(), [&](NetId pin) {
        return EqualsIgnoringCase(cell.net_name(pin), name);
      });
  assert(found != cell.pins.end());
  return *found;
}

class StageWriter {
 public:
  StageWriter(const Bench& bench, const StageTest& test)
      : test_(test),
        reference_(ReferenceInverter(*bench.node)),
        write_reference_(reference_, *bench.node),
        write_cell_(*test.cell, *bench.node) {}

  std::string Circuit() {
    const double h = test_.fanout;
    if (test_.drive == Drive::kMatched) {
      AddMatchedShaping();
    } else {
      AddCell("shaping stage 1", "s1", "src", "s1_out", 1.0 / (h * h));
      AddCell("shaping stage 2", "s2", "s1_out", kInputNet, 1.0 / h);
    }
    AddCell("cell under test", "d", kInputNet, kOutputNet, 1.0);
    AddCell("load", "l1", kOutputNet, "l1_out", h);
    AddCell("load on the load", "l2", "l1_out", "l2_out", h * h);
    return std::move(text_);
  }

 private:
  void AddMatchedShaping() {
    const double effort = DriverEffort(test_.estimate, test_.fanout);
    const NetId pin = PinNamed(*test_.cell, test_.arc.pin);
    const double reference_m = GateWidth(reference_, PinNamed(reference_, "a"));
    const double copies = GateWidth(*test_.cell, pin) / reference_m / effort;
    AddInverter("shaping stage 1", "s1", "src", "s1_out", copies / effort);
    AddInverter("shaping stage 2", "s2", "s1_out", kInputNet, copies);
  }

  void AddInverter(const char* role,
                   const char* prefix,
                   const char* in,
                   const char* out,
                   double copies) {
    Instance instance{prefix, {}, copies};
    instance.nets[PinNamed(reference_, "a")] = in;
    instance.nets[PinNamed(reference_, "y")] = out;
    Add(role, reference_, write_reference_, instance);
  }

  void AddCell(const char* role,
               const char* prefix,
               const char* in,
               const char* out,
               double copies) {
    const Cell& cell = *test_.cell;
    Instance instance{prefix, {}, copies};
    for (const SideInput& side : test_.arc.side) {
      instance.nets[PinNamed(cell, side.pin)] =
          side.high ? kPowerNet : kGroundNet;
    }
    instance.nets[PinNamed(cell, test_.arc.pin)] = in;
    instance.nets[PinNamed(cell, test_.arc.output)] = out;
    Add(role, cell, write_cell_, instance);
  }

  void Add(const char* role,
           const Cell& cell,
           const CellWriter& writer,
           const Instance& instance) {
    text_ += fmt::format("* {}: {} copies of {}\n",
                         role,
                         DeckNumber(instance.copies),
                         DeckRemark(cell.name));
    text_ += writer.Lines(instance);
  }

  const StageTest& test_;
  const Cell reference_;
  const CellWriter write_reference_;
  const CellWriter write_cell_;
  std::string text_;
};

// Sum of the 50 % delays from the source to the load's output, by hand, in
// tau; the shaping stages' efforts are the driver's.  By node count, which is
// the same for both edges of equal effort, so that one deck serves both.
double ChainDelayTau(const StageTest& test) {
  constexpr double kParasitic = 2.0;  // Of an inverter, above any node's.
  // Inner nets make p up to half as large again in stacks of four.
  constexpr double kInnerNets = 1.5;
  const double shaping =
      2.0 * (DriverEffort(test.estimate, test.fanout) + kParasitic);
  const double stage =
      test.estimate.effort * test.fanout +
      kParasitic * kInnerNets * test.estimate.parasitic_by_nodes;
  return shaping + 2.0 * stage;
}

// All that decides the outcome, wherever the models are installed.
std::string KeyOf(const Bench& bench,
                  const std::string& circuit,
                  const std::string& measures,
                  const Job& job) {
  return Fingerprint(fmt::format("{}\n{}\n{}\n{}\n{}",
                                 bench.simulator,
                                 bench.models_fingerprint,
                                 fmt::join(job.settings, ""),
                                 circuit,
                                 measures));
}

// A device takes about 4 us a time point and a deck 250 to 500 points, on a
// processor of 2020; reading a foundry's library takes seconds.
double TimeLimit(const StageTest& test) {
  constexpr double kReading = 30.0;
  constexpr double kPerDevice = 0.2;
  constexpr double kStages = 5.0;
  return kReading +
         kPerDevice * kStages * static_cast<double>(test.cell->mosfets.size());
}

}  // namespace

double DriverEffort(const Estimate& estimate, double fanout) {
  return estimate.fixed_first_effort.value_or(estimate.effort * fanout);
}

Job StageJob(const Bench& bench, const StageTest& test) {
  const double supply_v = bench.corner.supply_v;
  const Stimulus stimulus = StimulusFor(ChainDelayTau(test), test.time_unit_s);
  Job job;
  job.label = fmt::format("{} {}->{} h={} {}",
                          test.arc.cell,
                          test.arc.pin,
                          test.arc.output,
                          test.fanout,
                          bench.corner.name);
  job.settings = SettingsLadder(bench.rung);
  job.stop_s = stimulus.stop_s();
  job.time_limit_s = bench.time_limit_s.value_or(TimeLimit(test));
  AddStageMeasures(test.arc.inverting(), supply_v, job);
  const std::string measures = MeasureLines(job);
  const std::string circuit = DeckHead(bench) + SourceLine(stimulus, supply_v) +
                              StageWriter(bench, test).Circuit() +
                              TransientLine(stimulus);
  job.key = KeyOf(bench, circuit, measures, job);
  job.deck = fmt::format("* {} {} {}, fanout {}, {} drive\n{}{}{}.end\n",
                         DeckRemark(test.arc.cell),
                         DeckRemark(DescribeArc(test.arc)),
                         DeckRemark(DescribeSide(test.arc)),
                         test.fanout,
                         DriveName(test.drive),
                         circuit,
                         ModelLines(bench),
                         measures);
  return job;
}

}  // namespace gatedyno
