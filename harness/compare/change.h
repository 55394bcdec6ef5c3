// One figure measured twice, on two runs: did it change?
//
//   c = (b - a) / |a|
//   U(c)^2 = (k_b u_b / a)^2 + (b k_a u_a / a^2)^2
//
// where each k is that of its own side's points (fit/coverage.h), as for a
// verdict.  The two sides count as independent.  Where they share delays, as
// two runs on one node share their reference inverter, U comes out a little too
// large, so that nothing is called changed too soon.
// Source: the Guide to the expression of uncertainty in measurement (JCGM
// 100:2008), 5.1.2.

#ifndef GATEDYNO_COMPARE_CHANGE_H_
#define GATEDYNO_COMPARE_CHANGE_H_

#include <optional>

#include "harness/record/line.h"

namespace gatedyno {

// A figure of a line, and how many points the line has.
struct Reading {
  Measured measured;
  int points = 0;
};

struct Change {
  Measured before;
  Measured after;
  double relative = 0.0;           // c.
  std::optional<double> expanded;  // U of it; none when unknown.
};

// None where there is nothing to be relative to: `before` is zero, or either
// is no finite number.
std::optional<Change> ChangeOf(const Reading& before, const Reading& after);

// |c| > U.  False where U is unknown.
bool IsBeyondUncertainty(const Change& change);

}  // namespace gatedyno

#endif  // GATEDYNO_COMPARE_CHANGE_H_
