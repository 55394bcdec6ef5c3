#include "harness/page/hand_line.h"

#include "harness/compare/versus.h"

namespace gatedyno {

const Calibration* CalibrationOf(const Comparison& row,
                                 const RunResult& result) {
  return CalibrationAt(row.corner, result);
}

HandLine HandLineOf(const Comparison& row, const Calibration& calibration) {
  const Measured& tau = row.arc.edge == Edge::kRise ? calibration.tau_rise_s
                                                    : calibration.tau_fall_s;
  return {.slope_s = row.estimate.effort * tau.value,
          .intercept_s = row.hand_parasitic * calibration.tau_s.value};
}

}  // namespace gatedyno
