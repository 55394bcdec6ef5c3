// What the other topology of a self-dual output would cost.
//
// A self-dual function may be pulled up by the pull-down network repeated, or
// by its series/parallel dual.  The topology the cell does not use is built,
// sized and estimated for real.
//
// Sizing for equal drive: every way from the output to the supply gets the
// resistance of the present pull-up's weakest vector; parts in series share it
// in proportion to their heights, so that each device of the tallest stack is
// equally wide (common practice).  A repeated network keeps the pull-down's
// proportions.  Either is then scaled to the very drive by nodal analysis.

#ifndef GATEDYNO_EFFORT_OTHER_TOPOLOGY_H_
#define GATEDYNO_EFFORT_OTHER_TOPOLOGY_H_

#include <optional>
#include <string>

#include "harness/effort/estimate.h"
#include "harness/network/analysis.h"

namespace gatedyno {

// The cell with the other pull-up on `output`.  None when there is no other:
// the two are the same (an inverter), or the pull-down is not series/parallel.
// REQUIRES: the function of `output` is self-dual.
std::optional<Cell> WithOtherTopology(const Cell& cell,
                                      const NetworkAnalysis& analysis,
                                      double mu,
                                      NetId output);

// "pull-up as the series/parallel dual: stack 3 (now 2), PMOS 300-600 nm (now
// 400 nm); g a 5.333 (now 4), c 1.667 (now 2); p 4.333 (now 4)"; g is the
// larger of both edges, p the largest by node count.  Empty when the two
// topologies are the same.
std::string DescribeOtherTopology(const Cell& cell,
                                  const NetworkAnalysis& analysis,
                                  const EstimateOptions& options,
                                  NetId output);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_OTHER_TOPOLOGY_H_
