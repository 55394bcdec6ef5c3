#include "harness/report/figure_view.h"

#include <cassert>

#include "harness/fit/coverage.h"
#include "harness/fit/quotient.h"

namespace gatedyno {
namespace {

FigureView ViewOf(const Comparison& row,
                  const Measured& measured,
                  const Measured& hand) {
  assert(row.line);
  FigureView view;
  view.hand = hand.value;
  view.measured = measured;
  const int freedom = row.line->points - 2;
  const Measured ratio =
      hand.value > 0.0 ? Quotient(measured, hand) : Measured();
  if (ratio.u && freedom >= 1) {
    view.difference_expanded = CoverageFactor(freedom) * *ratio.u;
  }
  return view;
}

}  // namespace

FigureView EffortView(const Comparison& row) {
  FigureView view = ViewOf(row, row.effort, {row.estimate.effort, 0.0});
  view.difference = row.effort_difference;
  view.tolerance = row.tolerance.effort;
  return view;
}

FigureView ParasiticView(const Comparison& row,
                         const Calibration* calibration) {
  Measured hand{row.hand_parasitic, std::nullopt};
  if (calibration != nullptr && calibration->p_inv.u) {
    const Estimate& estimate = row.estimate;
    hand.u = (estimate.parasitic_by_nodes - estimate.inner_effort) *
             *calibration->p_inv.u;
  }
  FigureView view = ViewOf(row, row.parasitic, hand);
  view.difference = row.parasitic_difference;
  view.tolerance = row.tolerance.parasitic;
  return view;
}

const Calibration* CalibrationOf(const Comparison& row,
                                 const RunResult& result) {
  for (const Calibration& calibration : result.calibrations) {
    if (calibration.corner.name == row.corner) {
      return &calibration;
    }
  }
  return nullptr;
}

HandLine HandLineOf(const Comparison& row, const Calibration& calibration) {
  const Measured& tau = row.arc.edge == Edge::kRise ? calibration.tau_rise_s
                                                    : calibration.tau_fall_s;
  return {.slope_s = row.estimate.effort * tau.value,
          .intercept_s = row.hand_parasitic * calibration.tau_s.value};
}

}  // namespace gatedyno
