// The main job: calibrate each corner with the reference inverter, measure
// every arc, fit, compare.

#ifndef GATEDYNO_FLOW_CHARACTERIZE_H_
#define GATEDYNO_FLOW_CHARACTERIZE_H_

#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/flow/arc_sweep.h"
#include "harness/flow/outcome_book.h"
#include "harness/flow/prepared_run.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// The arcs of every cell of the plan at one corner, with their jobs.
Result<std::vector<ArcSweep>> PlanArcs(const PreparedRun& run,
                                       const Corner& corner,
                                       const Calibration& calibration,
                                       const std::string& simulator);

// Everything; failed jobs become comparisons that are not measured.  Fails
// only when the run cannot go on: no worker starts, the store cannot be
// written, or it was told to stop.  Of the facts the caller still fills in
// program and started.
Result<RunResult> Characterize(const PreparedRun& run,
                               const std::string& simulator,
                               OutcomeBook* book);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_CHARACTERIZE_H_
