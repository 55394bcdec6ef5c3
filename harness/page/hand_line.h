// The hand line of an arc, and what it takes.

#ifndef GATEDYNO_PAGE_HAND_LINE_H_
#define GATEDYNO_PAGE_HAND_LINE_H_

#include "harness/record/run_result.h"

namespace gatedyno {

// Of the row's corner; null where it has none.
const Calibration* CalibrationOf(const Comparison& row,
                                 const RunResult& result);

// What the hand numbers say of the delay: g tau(edge) h + p tau.
struct HandLine {
  double slope_s = 0.0;
  double intercept_s = 0.0;
};
HandLine HandLineOf(const Comparison& row, const Calibration& calibration);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_HAND_LINE_H_
