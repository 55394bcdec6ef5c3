#include "harness/flow/calibrate.h"

#include <vector>

#include <fmt/format.h>

#include "harness/deck/reference.h"
#include "harness/fit/calibration.h"
#include "harness/flow/arc_sweep.h"
#include "harness/node/model_check.h"

namespace gatedyno {
namespace {

// Before tau is known: no bulk node's is above 0.1 ps per nanometre of drawn
// length at its nominal corner (180 nm: 12.4 ps, 45 nm: 2.2 ps).  Too large
// only makes the calibration's own runs longer.
constexpr double kTauPerLengthSPerM = 1e-4;

struct InverterSweeps {
  ArcSweep rise;
  ArcSweep fall;
};

InverterSweeps PlanInverter(const Bench& bench,
                            const Cell& inverter,
                            const std::vector<double>& fanouts) {
  StageTest test;
  test.cell = &inverter;
  test.estimate = {.effort = 1.0,
                   .parasitic_by_nodes = 1.0,
                   .parasitic_by_elmore = 1.0,
                   .fixed_first_effort = {}};
  test.time_unit_s = kTauPerLengthSPerM * bench.node->drawn_length_m;
  test.arc = {.cell = inverter.name,
              .pin = inverter.net_name(inverter.pins[0]),
              .output = inverter.net_name(inverter.pins[1]),
              .input_edge = Edge::kFall,
              .edge = Edge::kRise,
              .side = {}};
  InverterSweeps sweeps;
  sweeps.rise = PlanSweep(bench, test, fanouts);
  test.arc.input_edge = Edge::kRise;
  test.arc.edge = Edge::kFall;
  sweeps.fall = PlanSweep(bench, test, fanouts);
  return sweeps;
}

void Settle(const Corner& corner,
            const InverterSweeps& sweeps,
            const OutcomeBook& book,
            CalibrationSet* set) {
  const MeasuredArc rise = CollectSweep(sweeps.rise, book);
  const MeasuredArc fall = CollectSweep(sweeps.fall, book);
  if (!rise.failures.empty()) {
    set->failures[corner.name] = fmt::format(
        "the reference inverter was not measured: {}", rise.failures.front());
    return;
  }
  const Result<Calibration> calibration =
      Calibrate(corner, rise.points, fall.points);
  if (calibration.ok()) {
    set->by_corner[corner.name] = *calibration;
  } else {
    set->failures[corner.name] = calibration.error().message;
  }
}

}  // namespace

Result<Bench> BenchAt(const PreparedRun& run,
                      const Corner& corner,
                      const std::string& simulator) {
  const Result<std::string> fingerprint =
      ModelsFingerprint(ProcessOf(run.node, corner));
  if (!fingerprint.ok()) {
    return Forward(fingerprint);
  }
  return Bench{.node = &run.node,
               .corner = corner,
               .models_fingerprint = *fingerprint,
               .simulator = simulator,
               .settings = {}};
}

Result<CalibrationSet> CalibrateCorners(const PreparedRun& run,
                                        const std::string& simulator,
                                        OutcomeBook* book) {
  const Cell inverter = ReferenceInverter(run.node);
  std::vector<InverterSweeps> sweeps;
  std::vector<Job> jobs;
  for (const Corner& corner : run.corners) {
    const Result<Bench> bench = BenchAt(run, corner, simulator);
    if (!bench.ok()) {
      return Forward(bench);
    }
    sweeps.push_back(PlanInverter(*bench, inverter, run.plan.fanouts));
    for (const ArcSweep* sweep : {&sweeps.back().rise, &sweeps.back().fall}) {
      jobs.insert(jobs.end(), sweep->jobs.begin(), sweep->jobs.end());
    }
  }
  const Status finished = book->Finish(jobs);
  if (!finished.ok()) {
    return Forward(finished);
  }
  CalibrationSet set;
  for (size_t i = 0; i < run.corners.size(); ++i) {
    Settle(run.corners[i], sweeps[i], *book, &set);
  }
  return set;
}

}  // namespace gatedyno
