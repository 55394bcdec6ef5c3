// Copies of a cell in parallel, as device lines.
//
// Cells are written out flat.  A device line takes the number of copies as its
// multiplicity, which no simulator loses.  A device of the process that is a
// subcircuit is another matter: ngspice 39.3 loses `m` in silence where the
// subcircuit declares it without using it, and where a subcircuit above the
// call wraps another (tried: a fanout of 4 became 1).  So its line never has
// one.  One copy is written, and every net it is joined to is tapped:
//
//   v<tap> outer inner 0               the copy's own current i
//   f<tap> outer 0 v<tap> copies-1     what the other copies draw
//
// The outer net then sees `copies` times i, whatever the subcircuit does with
// its parameters and however broken the number.  It is exact: parallel copies
// with the same terminal voltages carry the same currents.  A multiplicity
// that the cell's netlist gives such a device is made in the same way.

#ifndef GATEDYNO_DECK_INSTANCE_H_
#define GATEDYNO_DECK_INSTANCE_H_

#include <array>
#include <map>
#include <string>
#include <vector>

#include "harness/netlist/cell.h"
#include "harness/node/process_node.h"

namespace gatedyno {

struct Instance {
  std::string prefix;                 // Of its device and inner net names.
  std::map<NetId, std::string> nets;  // The deck's nets on the cell's pins.
                                      // Pins left out get inner nets; supplies
                                      // and bodies are joined without asking.
  double copies = 1.0;                // In parallel; need not be whole.
};

// Writes instances of one cell; what they have in common is made once.
class CellWriter {
 public:
  // `cell` outlives the writer.  REQUIRES: every device is one of the node's.
  CellWriter(const Cell& cell, const ProcessNode& node);

  std::string Lines(const Instance& instance) const;

 private:
  struct Device {
    bool is_subcircuit = false;
    double multiplicity = 1.0;
    std::array<NetId, 4> nets = {};  // Drain, gate, source, body.
    // " MODEL w=... m=", where the multiplicity goes; of a subcircuit, all.
    std::string text;
  };

  Device DeviceText(const Mosfet& mosfet, const ProcessNode& node) const;

  const Cell& cell_;
  std::vector<Device> devices_;
  std::vector<std::string> fixed_nets_;  // By net: supplies and bodies.
  bool has_subcircuit_ = false;
};

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_INSTANCE_H_
