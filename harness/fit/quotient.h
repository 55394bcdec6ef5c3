// One measured number divided by another.

#ifndef GATEDYNO_FIT_QUOTIENT_H_
#define GATEDYNO_FIT_QUOTIENT_H_

#include "harness/record/line.h"

namespace gatedyno {

// q = a / b.  First order, which holds while u(b) is far below b:
//
//   u(q)^2 = (u(a)^2 - 2 q cov(a, b) + q^2 u(b)^2) / b^2
//
// Source: JCGM 100:2008, 5.2.2.  None when either uncertainty is unknown.
// REQUIRES: b is not zero.
Measured Quotient(const Measured& a,
                  const Measured& b,
                  double covariance = 0.0);

}  // namespace gatedyno

#endif  // GATEDYNO_FIT_QUOTIENT_H_
