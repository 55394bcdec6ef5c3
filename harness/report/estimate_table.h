// The hand numbers of a cell, for the terminal.

#ifndef GATEDYNO_REPORT_ESTIMATE_TABLE_H_
#define GATEDYNO_REPORT_ESTIMATE_TABLE_H_

#include <string>

#include "harness/effort/estimate.h"
#include "harness/report/style.h"

namespace gatedyno {

std::string EstimateTable(const CellEstimate& estimate, const Style& style);

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_ESTIMATE_TABLE_H_
