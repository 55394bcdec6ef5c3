// Does a line describe the points?
//
// Measured arcs are smooth rather than noisy, so what is left over a line is
// mostly its bend: by how much the parabola through the points leaves the
// nearest straight line, c/2 for c z^2 with the fanouts mapped to z in [-1, 1].
// U is the expanded uncertainty of that, from the scatter about the parabola
// (k u, coverage.h; four points or more) and from the numerical error of the
// delays (2 u).  An arc is
//
//   bent      when one point is further from the line than `residual_tau`, or
//             |bend| exceeds both U and `bend_tau`: a bend misleads beyond the
//             points, scatter of the same size does not;
//   straight  when no point is, and |bend| + U is at most `bend_tau`.
//
// Between the two it takes more points to tell.  Both limits are in tau and
// grow with the slope where that is above tau: on a gate of effort 8 a tenth of
// tau is a hundredth of a fanout.

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
  bool straight = false;
  double largest_residual_tau = 0.0;
  // Signed: positive when the delay grows faster at large fanouts.  None where
  // the test cannot be made: below three distinct fanouts, and for three points
  // of unknown numerical error.
  std::optional<Measured> bend_tau;
};

// `line` is the fit of `points`, each of whose delays has the relative standard
// uncertainty `delay_u_relative` (0: unknown).  REQUIRES: tau_s > 0.
Linearity TestLinearity(const Line& line,
                        std::span<const Point> points,
                        double tau_s,
                        double delay_u_relative = 0.0,
                        const LinearityLimits& limits = {});

}  // namespace gatedyno

#endif  // GATEDYNO_FIT_LINEARITY_H_
