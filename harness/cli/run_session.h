// One session of a run: the store held, the run begun or gone on with, progress
// shown and noted.

#ifndef GATEDYNO_CLI_RUN_SESSION_H_
#define GATEDYNO_CLI_RUN_SESSION_H_

#include <string>

#include "harness/base/result.h"
#include "harness/cli/run_options.h"
#include "harness/flow/prepared_run.h"
#include "harness/record/run_result.h"
#include "harness/sim/runner.h"

namespace gatedyno {

// "gatedyno 0.1.0".
std::string ProgramVersion();

// Simulates what the stores do not have yet, and keeps the run's results.
// Fails with ErrorKind::kUnavailable when it was interrupted.
Result<RunResult> RunInSession(const PreparedRun& prepared,
                               const RunOptions& options,
                               const std::string& simulator,
                               SimRunner* runner);

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_RUN_SESSION_H_
