// Measures the reference inverter: tau, p_inv and FO4 of every corner.

#ifndef GATEDYNO_FLOW_CALIBRATE_H_
#define GATEDYNO_FLOW_CALIBRATE_H_

#include <map>
#include <string>

#include "harness/base/result.h"
#include "harness/compare/compare.h"
#include "harness/deck/deck_head.h"
#include "harness/flow/arc_measurement.h"
#include "harness/flow/prepared_run.h"
#include "harness/record/comparison.h"

namespace gatedyno {

// The node at each corner of a plan, by the corner's name.
using Benches = std::map<std::string, Bench>;

// `simulator` is part of every job's key.  `run` outlives the benches.
Result<Benches> BenchesOf(const PreparedRun& run, const std::string& simulator);

// The reference inverter at one corner.
struct ReferenceArcs {
  MeasuredArc rise;
  MeasuredArc fall;
};

// By corner.  Fails only when the run cannot go on.  Of `context`, the bench is
// set here.
Result<std::map<std::string, ReferenceArcs>> MeasureReferences(
    const PreparedRun& run, const Benches& benches, ArcContext context);

struct CalibrationSet {
  std::map<std::string, Calibration> by_corner;
  std::map<std::string, std::string> failures;  // Why a corner has none.
};

CalibrationSet CalibrateCorners(
    const PreparedRun& run,
    const std::map<std::string, ReferenceArcs>& references,
    double delay_u_relative);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_CALIBRATE_H_
