// Drive of an output: the resistive network between it and the supply it moves
// to, with the final input vector applied.
//
// Nodal analysis.  Devices that conduct are conductances (widths.h); with
// matrix Y over the nets joined to the output, the supply as reference, and a
// unit current into the output o, the voltages are the transfer resistances
// R(o,k) = (Y^-1)(o,k): the resistance that the ways from o and from k to the
// supply share (on a tree; in general the same role in Elmore's sum).  Bridges
// need no special care.  1 / R(o,o) is the width of one NMOS of equal drive.

#ifndef GATEDYNO_EFFORT_DRIVE_H_
#define GATEDYNO_EFFORT_DRIVE_H_

#include <vector>

#include "harness/effort/widths.h"
#include "harness/network/group.h"
#include "harness/network/levels.h"
#include "harness/network/switch_network.h"

namespace gatedyno {

struct Drive {
  double conductance_m = 0.0;
  // Nets joined to the output by devices that conduct, the output first;
  // dangling ones of the other network too.
  std::vector<NetId> nets;
  std::vector<double> transfer_per_m;  // R(o,k), by index of `nets`.
  // Indices of the devices that carry current from the output to the supply.
  std::vector<int> carrying;
};

// REQUIRES: `levels` drives `output`, which is one of `group`'s outputs.
Drive SolveDrive(const SwitchNetwork& network,
                 const Group& group,
                 const CellWidths& widths,
                 const Levels& levels,
                 NetId output);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_DRIVE_H_
