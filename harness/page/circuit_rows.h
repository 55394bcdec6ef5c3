// The nets of a stage in rows, so that every device can be drawn downwards: the
// power supply on top, then the nets of the pull-up, the outputs, the nets of
// the pull-down, ground at the bottom.

#ifndef GATEDYNO_PAGE_CIRCUIT_ROWS_H_
#define GATEDYNO_PAGE_CIRCUIT_ROWS_H_

#include <cstddef>
#include <string>
#include <vector>

#include "harness/record/circuit.h"

namespace gatedyno {

enum class NetRole { kPower, kInner, kOutput, kGround };

struct StageNet {
  std::string name;
  NetRole role = NetRole::kInner;
  int row = 0;  // From the top.
};

// A device between two nets, which are places in StageRows::nets.
struct StageDevice {
  std::size_t device = 0;  // Place in Circuit::devices.
  std::size_t upper = 0;
  std::size_t lower = 0;  // In a later row than `upper`.
};

struct StageRows {
  std::vector<StageNet> nets;
  std::vector<StageDevice> devices;  // In the stage's order.
};

// Works for any network, also for bridges, pass devices and dead ends.  A net
// is as near to the outputs as the devices between allow, so that who is next
// to the output is seen.  Devices with both ends on one net are left out.
// REQUIRES: places of circuit.devices in stage.devices.
StageRows FindRows(const Circuit& circuit, const CircuitStage& stage);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_CIRCUIT_ROWS_H_
