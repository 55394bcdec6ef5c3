// The run as CSV (RFC 4180): one row an arc and corner, SI units, full digits.

#ifndef GATEDYNO_REPORT_CSV_REPORT_H_
#define GATEDYNO_REPORT_CSV_REPORT_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// Lines end with CRLF; an empty field stands for "not measured".
std::string CsvReport(const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_CSV_REPORT_H_
