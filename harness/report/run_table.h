// The run as a table for the terminal, at most 100 columns wide.

#ifndef GATEDYNO_REPORT_RUN_TABLE_H_
#define GATEDYNO_REPORT_RUN_TABLE_H_

#include <string>

#include "harness/record/run_result.h"
#include "harness/report/style.h"

namespace gatedyno {

// Exemptions stand as on the day `today`, "2026-12-02".
std::string RunTable(const RunResult& result,
                     const Style& style,
                     const std::string& today);

// What every report says of its numbers.
inline constexpr const char* kCaution =
    "Predictive device models are not a foundry's. Release decisions belong to "
    "qualified models\nand to people.";

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_RUN_TABLE_H_
