// Whether a pull-up repeats the topology of the pull-down.

#ifndef GATEDYNO_NETWORK_ISOMORPHISM_H_
#define GATEDYNO_NETWORK_ISOMORPHISM_H_

#include "harness/network/rail_network.h"

namespace gatedyno {

// True when the nets of one can be matched to the nets of the other so that
// every device lands on a device with the same gate: output on output and rail
// on rail, or the network turned end for end.  Series/parallel networks are
// also the same when they differ in the order of parts in series.
bool SameTopology(const SwitchNetwork& network,
                  const RailNetwork& a,
                  const RailNetwork& b);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_ISOMORPHISM_H_
