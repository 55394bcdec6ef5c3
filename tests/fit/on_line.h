// Points that lie on a known line.

#ifndef GATEDYNO_TESTS_FIT_ON_LINE_H_
#define GATEDYNO_TESTS_FIT_ON_LINE_H_

#include <vector>

#include "harness/record/line.h"

namespace gatedyno {

inline std::vector<Point> OnLine(const std::vector<double>& fanouts,
                                 double slope_s,
                                 double intercept_s) {
  std::vector<Point> points;
  points.reserve(fanouts.size());
  for (const double fanout : fanouts) {
    points.push_back(
        {.fanout = fanout, .delay_s = slope_s * fanout + intercept_s});
  }
  return points;
}

}  // namespace gatedyno

#endif  // GATEDYNO_TESTS_FIT_ON_LINE_H_
