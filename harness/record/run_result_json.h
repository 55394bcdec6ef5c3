// A run as JSON: the JSON report, and what the store keeps of a finished run.

#ifndef GATEDYNO_RECORD_RUN_RESULT_JSON_H_
#define GATEDYNO_RECORD_RUN_RESULT_JSON_H_

#include <span>
#include <string>

#include <nlohmann/json.hpp>

#include "harness/base/result.h"
#include "harness/record/run_result.h"

namespace gatedyno {

// {"format": "gatedyno-result/1", "facts": ..., "calibrations": ...,
//  "comparisons": ...}; fields as in record/comparison_json.h.
nlohmann::json RunResultToJson(const RunResult& result);

// The same without "comparisons", which the store keeps one by one.
nlohmann::json RunHeadToJson(const RunResult& result);

// What RunResultToJson() wrote.  Fails with kBadInput on another format, with
// kInternal on a missing or mistyped field; fields it does not know pass.
Result<RunResult> RunResultFromJson(const nlohmann::json& json);

// From the texts a store keeps: the head and one comparison a row.  A head of
// RunResultToJson() has its comparisons first.
Result<RunResult> RunResultFromTexts(const std::string& head,
                                     std::span<const std::string> rows);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_RUN_RESULT_JSON_H_
