// Stack heights: devices in series.

#ifndef GATEDYNO_NETWORK_STACK_H_
#define GATEDYNO_NETWORK_STACK_H_

#include "harness/network/analysis.h"
#include "harness/network/rail_network.h"

namespace gatedyno {

// The most devices in series on a way from the output to the rail that passes
// no net twice and conducts for some input vector.
int TallestStack(const NetworkAnalysis& analysis, const RailNetwork& rail);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_STACK_H_
