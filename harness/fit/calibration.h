// What the reference inverter says of a node at one corner.
//
//   tau_rise, tau_fall  slope of the inverter's delay per fanout, each edge
//   tau                 (tau_rise + tau_fall) / 2
//   p_inv               (intercept_rise + intercept_fall) / 2 / tau
//   FO4                 mean of both delays at fanout 4
//
// The two edges come from different delays and count as independent; slope and
// intercept of one line do not, and their covariance enters u(p_inv).

#ifndef GATEDYNO_FIT_CALIBRATION_H_
#define GATEDYNO_FIT_CALIBRATION_H_

#include <span>

#include "harness/base/result.h"
#include "harness/record/comparison.h"
#include "harness/record/corner.h"
#include "harness/record/line.h"

namespace gatedyno {

// `rise` and `fall` are the points of the inverter's rising and falling output,
// whose delays have the relative standard uncertainty `delay_u_relative`.
// FO4 is a measured delay where fanout 4 is among the points, else the line's.
// Fails with kBadInput, naming the corner and the edge, where there is no line
// or the delay does not grow with the fanout.
Result<Calibration> Calibrate(const Corner& corner,
                              std::span<const Point> rise,
                              std::span<const Point> fall,
                              double delay_u_relative = 0.0);

}  // namespace gatedyno

#endif  // GATEDYNO_FIT_CALIBRATION_H_
