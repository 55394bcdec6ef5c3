// Comparisons and calibrations as JSON: what the store keeps of a finished run
// and what the JSON report is made of.
//
// Field names are the structs' own, units included: {"slope_s": 1.5e-12}.  A
// number with uncertainty is {"value": 1.11, "u": 0.01}; an unknown
// uncertainty, an unmeasured line and a number that is not finite are null.
// Edges and verdicts are their names.

#ifndef GATEDYNO_RECORD_COMPARISON_JSON_H_
#define GATEDYNO_RECORD_COMPARISON_JSON_H_

#include <nlohmann/json.hpp>

#include "harness/base/result.h"
#include "harness/record/comparison.h"

namespace gatedyno {

nlohmann::json ComparisonToJson(const Comparison& comparison);
// A number that is null comes back as NaN.  Fails with kInternal on a missing
// or mistyped field and on an unknown name; fields it does not know pass.
Result<Comparison> ComparisonFromJson(const nlohmann::json& json);

nlohmann::json CalibrationToJson(const Calibration& calibration);
Result<Calibration> CalibrationFromJson(const nlohmann::json& json);

}  // namespace gatedyno

#endif  // GATEDYNO_RECORD_COMPARISON_JSON_H_
