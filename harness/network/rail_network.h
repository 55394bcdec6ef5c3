// The pull-up or pull-down network of one output: the devices between it and
// one supply.

#ifndef GATEDYNO_NETWORK_RAIL_NETWORK_H_
#define GATEDYNO_NETWORK_RAIL_NETWORK_H_

#include <vector>

#include "harness/network/group.h"
#include "harness/network/switch_network.h"

namespace gatedyno {

struct RailNetwork {
  NetId output = 0;
  NetId rail = 0;
  std::vector<int> switches;  // Indices into SwitchNetwork::switches.
  std::vector<NetId> inner;   // Nets but the output and the rail.
};

// The devices the rail reaches over channels without passing the output or the
// other rail, less dead ends and devices tied off.
RailNetwork FindRailNetwork(const SwitchNetwork& network,
                            const Group& group,
                            NetId output,
                            NetId rail);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_RAIL_NETWORK_H_
