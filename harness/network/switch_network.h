// A cell as switches between nets.
//
// Every device is a switch: an NMOS conducts when its gate is high, a PMOS
// when it is low.  A resistor is a wire here: the nets it joins are one net,
// so that an extracted cell reads like the drawn one.  Capacitors are left
// out.  NetIds are the cell's own.

#ifndef GATEDYNO_NETWORK_SWITCH_NETWORK_H_
#define GATEDYNO_NETWORK_SWITCH_NETWORK_H_

#include <vector>

#include "harness/base/result.h"
#include "harness/netlist/cell.h"

namespace gatedyno {

struct Switch {
  Polarity polarity = Polarity::kN;
  NetId gate = 0;
  NetId drain = 0;
  NetId source = 0;

  // The end that is not `end`.
  NetId across(NetId end) const { return end == drain ? source : drain; }
  // A device with both ends on one net (a dummy, a capacitor) conducts
  // nothing; its gate still loads.
  bool has_channel() const { return drain != source; }
};

struct SwitchNetwork {
  NetId power = -1;
  NetId ground = -1;
  std::vector<NetId> same_as;      // By NetId: the net it is one with.
  std::vector<Switch> switches;    // By index of Cell::mosfets.
  std::vector<NetId> signal_pins;  // In pin order; no supplies, no wells.

  bool is_supply(NetId net) const { return net == power || net == ground; }
  int net_count() const { return static_cast<int>(same_as.size()); }
};

// Fails with kBadInput for a cell without supplies, a resistor between two
// pins, and a device that joins the supplies.
Result<SwitchNetwork> BuildSwitchNetwork(const Cell& cell);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_SWITCH_NETWORK_H_
