// Where the devices and nets of a stage are drawn, on a grid.
//
// Nets are horizontal bars in rows (circuit_rows.h), devices vertical wires in
// columns, each with its symbol between two rows.  A device carries on the
// column of one that ends at its upper net, else it gets the first column that
// is free over its rows, which is how the left-edge algorithm fills tracks
// (Hashimoto and Stevens, "Wire routing by optimizing channel assignment",
// 1971); they are taken path by path, so that what is in series stands
// together.  What crosses without a dot is not connected.

#ifndef GATEDYNO_PAGE_CIRCUIT_LAYOUT_H_
#define GATEDYNO_PAGE_CIRCUIT_LAYOUT_H_

#include <cstddef>
#include <string>
#include <vector>

#include "harness/page/circuit_rows.h"
#include "harness/record/circuit.h"

namespace gatedyno {

struct PlacedDevice {
  StageDevice between;
  int column = 0;
  int slot = 0;  // The symbol is between rows `slot` and `slot` + 1.
};

struct PlacedNet {
  StageNet net;
  int track = 0;  // Nets of one row whose bars would meet differ; 0 is on top.
  int first_column = 0;
  int last_column = 0;  // An output's is the right edge, StageLayout::columns.
  std::vector<int> dots;  // Columns where three wires or more meet.
};

struct StageLayout {
  std::vector<PlacedNet> nets;
  std::vector<PlacedDevice> devices;
  int columns = 0;
  std::vector<int> tracks;  // By row; at least one.
};

// Devices with both ends on one net are left out.
// REQUIRES: places of circuit.devices in stage.devices.
StageLayout LayOutStage(const Circuit& circuit, const CircuitStage& stage);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_CIRCUIT_LAYOUT_H_
