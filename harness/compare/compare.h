// Estimate against measurement: the verdict on one arc.
//
// d = (measured - hand) / hand, for g and for p.  With U the expanded
// uncertainty of d (U = k u; k is 2 for many points and more for few, see
// fit/coverage.h) and T the tolerance:
//
//   beyond        |d| - U > T for g or for p: the difference exceeds what is
//                 allowed by more than its uncertainty.  A difference smaller
//                 than its uncertainty is never called beyond.
//   not measured  a job of the arc failed, there is no line or no uncertainty
//                 (two fanouts), or U > T: too uncertain to tell
//   within        otherwise
//
// One failed job leaves the whole arc not measured: a bent arc's slope depends
// on the fanouts it is taken over.

#ifndef GATEDYNO_COMPARE_COMPARE_H_
#define GATEDYNO_COMPARE_COMPARE_H_

#include <string>
#include <vector>

#include "harness/record/arc.h"
#include "harness/record/comparison.h"
#include "harness/record/line.h"

namespace gatedyno {

// All that is known of an arc once its jobs have ended.
struct MeasuredArc {
  Arc arc;
  Estimate estimate;
  std::vector<Point> points;  // Of the jobs that were measured.
  // One a failed job, for people: "h=4: timed out after 60 s".
  std::vector<std::string> failures;
};

// The hand parasitic in tau is (n - e) * p_inv + e, with n the node count and e
// the effort at loads inside the cell that it contains (Estimate::inner_effort,
// zero for cells of one stage).  For a textbook comparison pass a calibration
// with p_inv = {1.0, 0.0}.
// `delay_u_relative` is the numerical standard uncertainty of each delay,
// relative (fit/line_fit.h).
// REQUIRES: hand effort and node count above zero, inner effort not above it.
Comparison Compare(const MeasuredArc& measured,
                   const Calibration& calibration,
                   const Tolerance& tolerance,
                   double delay_u_relative = 0.0);

// Whether the verdict of a measured arc hangs on its uncertainty: the limit of
// g or of p lies within U of the difference, so that more points may change it.
// False where there is no verdict to change.
bool IsCloseCall(const MeasuredArc& measured,
                 const Calibration& calibration,
                 const Tolerance& tolerance,
                 double delay_u_relative);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_COMPARE_H_
