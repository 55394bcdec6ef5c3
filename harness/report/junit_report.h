// The run as JUnit XML, for what shows test results: one suite a corner, one
// case an arc.  Beyond is a failure; not measured an error, since nothing was
// found out; either is skipped where exemptions that are in force cover all
// that is wrong with the arc.  Each case carries its numbers as properties,
// named as the columns of the CSV report, with all their digits.

#ifndef GATEDYNO_REPORT_JUNIT_REPORT_H_
#define GATEDYNO_REPORT_JUNIT_REPORT_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// Exemptions stand as on the day `today`, "2026-12-02".
std::string JunitReport(const RunResult& result, const std::string& today);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_JUNIT_REPORT_H_
