// Two runs side by side as CSV (RFC 4180): one row an arc and corner, those of
// one side too; SI units, full digits.

#ifndef GATEDYNO_REPORT_VERSUS_CSV_H_
#define GATEDYNO_REPORT_VERSUS_CSV_H_

#include <string>

#include "harness/compare/versus.h"

namespace gatedyno {

// An empty field stands for "not measured", "unknown" or "not there".  Changes
// are relative, their uncertainties expanded, all others standard.
std::string VersusCsv(const Versus& versus);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_VERSUS_CSV_H_
