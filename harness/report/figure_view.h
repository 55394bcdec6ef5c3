// The two figures of an arc, g and p, in one shape, and the hand line.

#ifndef GATEDYNO_REPORT_FIGURE_VIEW_H_
#define GATEDYNO_REPORT_FIGURE_VIEW_H_

#include <optional>
#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

struct FigureView {
  double hand = 0.0;  // p in tau.
  Measured measured;
  double difference = 0.0;  // (measured - hand) / hand.
  // What the verdict allows for, U of compare/compare.h; none when unknown.
  std::optional<double> difference_expanded;
  double tolerance = 0.0;
};

// REQUIRES: row.line.
FigureView EffortView(const Comparison& row);
// The hand number holds p_inv, whose uncertainty counts; `calibration` may be
// null, which leaves the uncertainty unknown.
FigureView ParasiticView(const Comparison& row, const Calibration* calibration);

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

#endif  // GATEDYNO_REPORT_FIGURE_VIEW_H_
