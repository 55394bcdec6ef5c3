// A cell taken apart: inputs, outputs, ordered groups, and the level of every
// net for every input vector.
//
// What the estimates and the decks build on.  A cell that passes is
// complementary static, or several stages of that.

#ifndef GATEDYNO_NETWORK_ANALYSIS_H_
#define GATEDYNO_NETWORK_ANALYSIS_H_

#include <vector>

#include "harness/base/result.h"
#include "harness/netlist/cell.h"
#include "harness/network/group.h"
#include "harness/network/kind.h"
#include "harness/network/levels.h"
#include "harness/network/switch_network.h"
#include "harness/network/truth_table.h"

namespace gatedyno {

struct NetworkAnalysis {
  SwitchNetwork network;
  std::vector<Group> groups;   // Each after those that gate it.
  std::vector<NetId> inputs;   // Pins that gate devices and are driven by none.
  std::vector<NetId> outputs;  // Pins driven by a group; may gate devices too.
  std::vector<Levels> levels;  // By input vector.

  // REQUIRES: a group drives `net`.
  const Group& group_of(NetId net) const;
  // REQUIRES: `net` never floats: a pin, or a net that gates a device.
  TruthTable function_of(NetId net) const;
};

// Fails with kBadInput, naming the cell's place and the pin, net or input
// vector, for a pin never used, a cell without output or with more than
// kMaxInputs inputs, feedback, and a gate that is not complementary static.
Result<NetworkAnalysis> AnalyseNetwork(const Cell& cell);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_ANALYSIS_H_
