#include "harness/flow/calibrate.h"

#include <utility>

#include <fmt/format.h>

#include "harness/deck/reference.h"
#include "harness/fit/calibration.h"
#include "harness/node/model_check.h"

namespace gatedyno {
namespace {

// Before tau is known: no bulk node's is above 0.1 ps per nanometre of drawn
// length at its nominal corner (180 nm: 12.4 ps, 45 nm: 2.2 ps).  Too large
// only makes the calibration's own runs longer.
constexpr double kTauPerLengthSPerM = 1e-4;

StageTest InverterTest(const ProcessNode& node,
                       const Cell& inverter,
                       Edge edge) {
  StageTest test;
  test.cell = &inverter;
  test.estimate = {.effort = 1.0,
                   .parasitic_by_nodes = 1.0,
                   .parasitic_by_elmore = 1.0,
                   .fixed_first_effort = {}};
  test.time_unit_s = kTauPerLengthSPerM * node.drawn_length_m;
  test.arc = {.cell = inverter.name,
              .pin = inverter.net_name(inverter.pins[0]),
              .output = inverter.net_name(inverter.pins[1]),
              .input_edge = Opposite(edge),
              .edge = edge,
              .side = {}};
  return test;
}

void Settle(const Corner& corner,
            const ReferenceArcs& arcs,
            double delay_u_relative,
            CalibrationSet* set) {
  for (const MeasuredArc* arc : {&arcs.rise, &arcs.fall}) {
    if (!arc->failures.empty()) {
      set->failures[corner.name] = fmt::format(
          "the reference inverter was not measured: {}", arc->failures.front());
      return;
    }
  }
  const Result<Calibration> calibration =
      Calibrate(corner, arcs.rise.points, arcs.fall.points, delay_u_relative);
  if (calibration.ok()) {
    set->by_corner[corner.name] = *calibration;
  } else {
    set->failures[corner.name] = calibration.error().message;
  }
}

}  // namespace

Result<Benches> BenchesOf(const PreparedRun& run,
                          const std::string& simulator) {
  // Reading a foundry's library takes a while, and corners share it.
  std::map<std::string, std::string> fingerprints;  // By process.
  Benches benches;
  for (const Corner& corner : run.corners) {
    std::string& fingerprint = fingerprints[corner.process];
    if (fingerprint.empty()) {
      Result<std::string> made = ModelsFingerprint(ProcessOf(run.node, corner));
      if (!made.ok()) {
        return Forward(made);
      }
      fingerprint = *std::move(made);
    }
    benches[corner.name] = {.node = &run.node,
                            .corner = corner,
                            .models_fingerprint = fingerprint,
                            .simulator = simulator,
                            .rung = RungFor(run.plan.accuracy),
                            .time_limit_s = run.plan.time_limit_s};
  }
  return benches;
}

Result<std::map<std::string, ReferenceArcs>> MeasureReferences(
    const PreparedRun& run, const Benches& benches, ArcContext context) {
  const Cell inverter = ReferenceInverter(run.node);
  std::map<std::string, ReferenceArcs> references;
  context.always_checked = true;
  auto corner = run.corners.begin();
  const Status done = context.desk->Work([&] {
    if (corner == run.corners.end()) {
      return false;
    }
    ReferenceArcs& arcs = references[corner->name];
    context.bench = &benches.at(corner->name);
    for (const Edge edge : {Edge::kRise, Edge::kFall}) {
      MeasuredArc& arc = edge == Edge::kRise ? arcs.rise : arcs.fall;
      MeasureArc(context,
                 InverterTest(run.node, inverter, edge),
                 [&arc](MeasuredArc measured) { arc = std::move(measured); });
    }
    ++corner;
    return true;
  });
  if (!done.ok()) {
    return Forward(done);
  }
  return references;
}

CalibrationSet CalibrateCorners(
    const PreparedRun& run,
    const std::map<std::string, ReferenceArcs>& references,
    double delay_u_relative) {
  CalibrationSet set;
  for (const Corner& corner : run.corners) {
    Settle(corner, references.at(corner.name), delay_u_relative, &set);
  }
  return set;
}

}  // namespace gatedyno
