// The line through an arc's points.
//
//   delay_s = slope_s * fanout + intercept_s
//
// Ordinary least squares: every point weighs the same and the fanouts are exact
// (they are chosen, not measured).  With n points, residuals r, mean fanout m
// and Sxx = sum (fanout - m)^2:
//
//   s^2           = sum r^2 / (n - 2)
//   u(slope)      = s / sqrt(Sxx)
//   u(intercept)  = s sqrt(1/n + m^2/Sxx)
//   cov           = -m s^2 / Sxx
//
// The numerical error of the simulation, an independent relative standard
// uncertainty e of each delay d, adds to these by the law of propagation.  With
// the weights of slope and intercept, w = (fanout - m)/Sxx and a = 1/n - m w:
//
//   u(slope)^2 += sum (w e d)^2, u(intercept)^2 += sum (a e d)^2,
//   cov += sum a w (e d)^2
//
// Source: any text on regression, and JCGM 100:2008, 5.1; the tests hold it
// against the NIST reference data set Norris.  These are one-sigma standard
// errors: for few points, an interval that holds the truth 95 % of the time is
// wider than two of them (see coverage.h).

#ifndef GATEDYNO_FIT_LINE_FIT_H_
#define GATEDYNO_FIT_LINE_FIT_H_

#include <span>

#include "harness/base/result.h"
#include "harness/record/line.h"

namespace gatedyno {

// Fails with kBadInput below two distinct fanouts, and on a fanout or a delay
// that is not a finite number.  Two points give a line without uncertainty.
Result<Line> FitLine(std::span<const Point> points,
                     double delay_u_relative = 0.0);

// The line's delay at one fanout, and its standard error:
// u^2 = u(intercept)^2 + fanout^2 u(slope)^2 + 2 fanout cov.
Measured DelayAt(const Line& line, double fanout);

}  // namespace gatedyno

#endif  // GATEDYNO_FIT_LINE_FIT_H_
