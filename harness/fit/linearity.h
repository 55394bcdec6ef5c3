// Does a line describe the points?
//
// Measured arcs are smooth rather than noisy, so what is left over a line is
// mostly its bend.  An arc is *bent* when either
//
//   - one point is further from the line than `residual_tau`, or
//   - a parabola fits better, beyond its own uncertainty (U = k u, coverage.h),
//     and leaves the nearest straight line by more than `bend_tau` in between:
//     a bend misleads beyond the points, scatter of the same size does not.
//
// Both limits are in tau and grow with the slope where that is above tau: on a
// gate of effort 8 a tenth of tau is a hundredth of a fanout.

#ifndef GATEDYNO_FIT_LINEARITY_H_
#define GATEDYNO_FIT_LINEARITY_H_

#include <optional>
#include <span>

#include "harness/record/line.h"

namespace gatedyno {

struct LinearityLimits {
  // Straight arcs leave residuals below 0.03 tau over fanouts 1 to 6 (our own
  // trials on a 45 nm card); three times that is not such an arc.
  double residual_tau = 0.10;
  double bend_tau = 0.05;
};

struct Linearity {
  bool bent = false;
  double largest_residual_tau = 0.0;
  // Signed: positive when the delay grows faster at large fanouts.  None below
  // four points or three distinct fanouts, where the test cannot be made.
  std::optional<Measured> bend_tau;
};

// `line` is the fit of `points`.  REQUIRES: tau_s > 0.
Linearity TestLinearity(const Line& line,
                        std::span<const Point> points,
                        double tau_s,
                        const LinearityLimits& limits = {});

}  // namespace gatedyno

#endif  // GATEDYNO_FIT_LINEARITY_H_
