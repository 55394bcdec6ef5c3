// The node's reference inverter: the yardstick of every effort, and the
// shaping stages of matched drive.

#ifndef GATEDYNO_DECK_REFERENCE_H_
#define GATEDYNO_DECK_REFERENCE_H_

#include "harness/netlist/cell.h"
#include "harness/node/process_node.h"

namespace gatedyno {

// N width node.reference_width_m(), P width mu times that, drawn length; pins
// a, y and the node's supplies.
Cell ReferenceInverter(const ProcessNode& node);

// Gate width of a pin over all the devices it gates.
double GateWidth(const Cell& cell, NetId pin);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_REFERENCE_H_
