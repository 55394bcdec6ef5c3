// Which fanouts an arc is measured at: as few as prove its line straight.
//
//   1 4 6          three points give a line, and with the known numerical
//                  error of the delays they also tell how much it bends
//   + 2 3          where that proves nothing, the slope is uncertain by more
//                  than kWantedSlope, or the verdict hangs on the uncertainty
//   + 1.5 5        where it still is not straight, or the verdict still hangs
//
// A plan that names fanouts gets these and no others.

#ifndef GATEDYNO_FLOW_FANOUT_CHOICE_H_
#define GATEDYNO_FLOW_FANOUT_CHOICE_H_

#include <span>
#include <vector>

#include "harness/record/line.h"

namespace gatedyno {

// Expanded uncertainty of a slope, relative, that needs no further points: less
// than half the tolerance that plans start from.  Three points of a straight
// line give half as much or less.
inline constexpr double kWantedSlope = 0.10;

struct FanoutRule {
  std::vector<double> fixed;  // By the plan; empty: chosen.
  // Standard uncertainty of a delay by the simulator's settings, relative.
  double delay_u_relative = 0.0;
};

std::vector<double> FirstFanouts(const FanoutRule& rule);

// What to measure next, given all points so far; none when they are enough.
// `close_call`: the verdict hangs on the uncertainty (compare/compare.h).
// REQUIRES: points at two fanouts or more; tau_s > 0.
std::vector<double> MoreFanouts(const FanoutRule& rule,
                                std::span<const Point> points,
                                double tau_s,
                                bool close_call);

// All that an arc may be measured at.
std::vector<double> AllFanouts(const FanoutRule& rule);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_FANOUT_CHOICE_H_
