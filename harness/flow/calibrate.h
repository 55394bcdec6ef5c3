// Measures the reference inverter: tau, p_inv and FO4 of every corner.

#ifndef GATEDYNO_FLOW_CALIBRATE_H_
#define GATEDYNO_FLOW_CALIBRATE_H_

#include <map>
#include <string>

#include "harness/base/result.h"
#include "harness/deck/deck_head.h"
#include "harness/flow/outcome_book.h"
#include "harness/flow/prepared_run.h"
#include "harness/record/comparison.h"

namespace gatedyno {

// The node at a corner of the plan; `simulator` is part of every job's key.
// `run` outlives the bench.
Result<Bench> BenchAt(const PreparedRun& run,
                      const Corner& corner,
                      const std::string& simulator);

struct CalibrationSet {
  std::map<std::string, Calibration> by_corner;
  std::map<std::string, std::string> failures;  // Why a corner has none.
};

// Over the plan's fanouts.  Fails only when the run cannot go on.
Result<CalibrationSet> CalibrateCorners(const PreparedRun& run,
                                        const std::string& simulator,
                                        OutcomeBook* book);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_CALIBRATE_H_
