// A cell's transistors as reports draw them.

#ifndef GATEDYNO_FLOW_CELL_CIRCUIT_H_
#define GATEDYNO_FLOW_CELL_CIRCUIT_H_

#include "harness/netlist/cell.h"
#include "harness/record/circuit.h"

namespace gatedyno {

// Nets joined by resistors are one, as in the estimates; capacitors are left
// out.  Devices that are part of no stage (drain and source on one net, or
// both on supplies) are there all the same.  Empty for a cell that
// AnalyseNetwork refuses, which has no estimate either.
Circuit CircuitOf(const Cell& cell);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_CELL_CIRCUIT_H_
