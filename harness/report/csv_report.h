// The run as CSV (RFC 4180): one row an arc and corner, SI units, full digits.

#ifndef GATEDYNO_REPORT_CSV_REPORT_H_
#define GATEDYNO_REPORT_CSV_REPORT_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// Lines end with CRLF; an empty field stands for "not measured".  "excused"
// says whether exemptions that are in force on the day `today` cover all that
// is wrong with the arc, "exemption" what they say (report/exemption_text.h).
std::string CsvReport(const RunResult& result, const std::string& today);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_CSV_REPORT_H_
