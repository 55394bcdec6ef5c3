// Channel-connected groups: the gates a cell is made of.
//
// Two devices belong to one group when a source or drain of one is a source or
// drain of the other, the supplies excluded.  A group computes its nets from
// its gate inputs; groups gate one another through their output nets.

#ifndef GATEDYNO_NETWORK_GROUP_H_
#define GATEDYNO_NETWORK_GROUP_H_

#include <vector>

#include "harness/base/result.h"
#include "harness/network/switch_network.h"

namespace gatedyno {

struct Group {
  std::vector<int> switches;       // Indices, ascending.
  std::vector<NetId> nets;         // Sources and drains, supplies excluded.
  std::vector<NetId> gates;        // Nets that gate its devices, no supplies.
  std::vector<NetId> outputs;      // Nets that are pins or gate a device.
  std::vector<NetId> pass_inputs;  // Pins among its nets that no supply
                                   // reaches: they come in by a channel.
};

// In no particular order.  `outputs` leaves out the pass inputs.
std::vector<Group> FindGroups(const SwitchNetwork& network);

// Every group after those that gate it.  Fails with kBadInput, naming a net,
// when groups gate one another in a ring.
Result<std::vector<Group>> OrderGroups(const Cell& cell,
                                       std::vector<Group> groups);

// Groups on the longest way from a pin to an output.  Groups must be ordered.
int LongestWay(const std::vector<Group>& groups);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_GROUP_H_
