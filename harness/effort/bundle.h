// Logical effort per bundle: a signal and its complement taken as one input.
//
// The published numbers of exclusive ors and multiplexers count the true and
// the complement input together and leave out the inverters that make the
// complement.  So does this: only the group that drives the output, with the
// gates of all the named nets summed over the reference inverter of the
// group's weakest drive on the edge.
// Source: Sutherland, Sproull, Harris, Logical Effort, 1999.

#ifndef GATEDYNO_EFFORT_BUNDLE_H_
#define GATEDYNO_EFFORT_BUNDLE_H_

#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/netlist/cell.h"
#include "harness/record/edge.h"

namespace gatedyno {

struct Bundle {
  std::string output;
  std::vector<std::string> nets;  // "a", and the net that carries its inverse.
};

struct BundleEstimate {
  double effort = 0.0;
  double parasitic_by_nodes = 0.0;  // Of the group.
};

// Fails with kBadInput as AnalyseNetwork does, for a name the cell does not
// have, and for an output that makes no such edge.
Result<BundleEstimate> EstimateBundle(const Cell& cell,
                                      const Bundle& bundle,
                                      Edge edge,
                                      double mu);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_BUNDLE_H_
