// The main job: calibrate each corner with the reference inverter, measure
// every arc, check the accuracy, fit, compare.

#ifndef GATEDYNO_FLOW_CHARACTERIZE_H_
#define GATEDYNO_FLOW_CHARACTERIZE_H_

#include <cstddef>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/deck/stage_job.h"
#include "harness/flow/fanout_choice.h"
#include "harness/flow/prepared_run.h"
#include "harness/flow/work_desk.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// While a run goes on, its delays are taken to be as uncertain as promised.
FanoutRule FanoutRuleOf(const Plan& plan);

// The arcs of one cell of the plan; their fanout is still to be set.
// REQUIRES: cell < run.cells.size().
std::vector<StageTest> ArcTests(const PreparedRun& run,
                                size_t cell,
                                const Calibration& calibration);

// Everything; failed jobs become comparisons that are not measured.  Fails
// only when the run cannot go on: no worker starts, the store cannot be
// written, or it was told to stop.  Of the facts the caller still fills in
// program and started.
//
// `arcs_before` is how many arcs an earlier session has ended: this one begins
// where that stopped, so that simulators need not wait until every deck of the
// plan was looked for in the store.
Result<RunResult> Characterize(const PreparedRun& run,
                               const std::string& simulator,
                               WorkDesk* desk,
                               size_t arcs_before = 0);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_CHARACTERIZE_H_
