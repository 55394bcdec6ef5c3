// A run as JSON, all digits: record/run_result_json.h says what is in it.

#ifndef GATEDYNO_REPORT_JSON_REPORT_H_
#define GATEDYNO_REPORT_JSON_REPORT_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// Indented, with a line end.  Bytes of names that are no UTF-8 are replaced:
// they must not lose a run.
std::string JsonReport(const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_JSON_REPORT_H_
