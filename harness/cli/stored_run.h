// A finished run of a store, for the commands that report on one.

#ifndef GATEDYNO_CLI_STORED_RUN_H_
#define GATEDYNO_CLI_STORED_RUN_H_

#include <optional>
#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/run_result.h"
#include "harness/report/run_source.h"

namespace gatedyno {

struct StoredRun {
  RunResult result;
  RunSource source;
};

// The run asked for, or the newest that is finished.  `option` is what the
// user named the run with, for the message when there is no such run.
Result<StoredRun> LoadRun(const std::string& store,
                          std::optional<RunId> run = std::nullopt,
                          const std::string& option = "--run");

// Those that are finished, oldest first.
Result<std::vector<RunId>> FinishedRuns(const std::string& store);

}  // namespace gatedyno

#endif  // GATEDYNO_CLI_STORED_RUN_H_
