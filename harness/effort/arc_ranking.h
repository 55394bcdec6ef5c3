// The arcs of a cell with their hand numbers, the slowest side vector of each
// (pin, output, edge) or all of them.

#ifndef GATEDYNO_EFFORT_ARC_RANKING_H_
#define GATEDYNO_EFFORT_ARC_RANKING_H_

#include <vector>

#include "harness/effort/estimate.h"
#include "harness/network/analysis.h"

namespace gatedyno {

// By pin, output, rise before fall, then in counting order of the side vector.
// Slowest is by the hand delay at a fanout of four, p by Elmore; of equals the
// first.
std::vector<ArcEstimate> EstimateArcs(const Cell& cell,
                                      const NetworkAnalysis& analysis,
                                      const EstimateOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_ARC_RANKING_H_
