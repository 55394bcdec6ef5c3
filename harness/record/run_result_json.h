// A run as JSON: the JSON report, and what the store keeps of a finished run.

#ifndef GATEDYNO_RECORD_RUN_RESULT_JSON_H_
#define GATEDYNO_RECORD_RUN_RESULT_JSON_H_

#include <nlohmann/json.hpp>

#include "harness/record/run_result.h"

namespace gatedyno {

// {"format": "gatedyno-result/1", "facts": ..., "calibrations": ...,
//  "comparisons": ...}; fields as in record/comparison_json.h.
nlohmann::json RunResultToJson(const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_RUN_RESULT_JSON_H_
