// A line in units of tau: what the hand numbers mean.
//
//   effort       g = slope / tau of the arc's output edge
//   effort_mean  slope / tau
//   parasitic    p = intercept / tau
//
// The arc and the reference inverter are measured by different simulations and
// count as independent.  The exception is an arc that is the reference
// inverter's own, recognised by a slope and a standard error identical to the
// calibration's: it is the same measurement, so g is 1 without uncertainty and
// the shared part of the others counts once.

#ifndef GATEDYNO_FIT_NORMALISE_H_
#define GATEDYNO_FIT_NORMALISE_H_

#include "harness/record/comparison.h"
#include "harness/record/edge.h"
#include "harness/record/line.h"

namespace gatedyno {

struct Normalised {
  Measured effort;
  Measured effort_mean;
  Measured parasitic;
};

// `edge` is the arc's output edge.  REQUIRES: a calibration as Calibrate makes
// it, with tau of each edge above zero.
Normalised Normalise(const Line& line,
                     Edge edge,
                     const Calibration& calibration);

}  // namespace gatedyno

#endif  // GATEDYNO_FIT_NORMALISE_H_
