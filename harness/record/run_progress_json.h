// Progress as JSON: what the store keeps of a run under way.

#ifndef GATEDYNO_RECORD_RUN_PROGRESS_JSON_H_
#define GATEDYNO_RECORD_RUN_PROGRESS_JSON_H_

#include <nlohmann/json.hpp>

#include "harness/base/result.h"
#include "harness/record/run_progress.h"

namespace gatedyno {

// {"jobs": {"wanted": ..., "reused": ..., "simulated": ..., "failed": ...},
//  "expected_jobs": ..., "arcs_ended": ..., "arcs": ..., "current": ...}
nlohmann::json RunProgressToJson(const RunProgress& progress);
Result<RunProgress> RunProgressFromJson(const nlohmann::json& json);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_RUN_PROGRESS_JSON_H_
