// The rows of the run table, one a comparison.

#ifndef GATEDYNO_REPORT_COMPARISON_ROWS_H_
#define GATEDYNO_REPORT_COMPARISON_ROWS_H_

#include <string>

#include "harness/record/comparison.h"
#include "harness/report/style.h"

namespace gatedyno {

// Two lines above the rows.
std::string ComparisonHead();

// Arc, g by hand, measured and difference, p by hand (with measured p_inv, and
// with 1), measured and difference, verdict.  Below it, unless it is within,
// why, the side inputs, and `note` where there is one.  An arc whose names are
// too long for its column has a line of its own above its numbers.
std::string ComparisonRow(const Comparison& row,
                          const Style& style,
                          const std::string& note = "");

}  // namespace gatedyno

#endif  // GATEDYNO_REPORT_COMPARISON_ROWS_H_
