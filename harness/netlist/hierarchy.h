// Which .subckt instantiates which.

#ifndef GATEDYNO_NETLIST_HIERARCHY_H_
#define GATEDYNO_NETLIST_HIERARCHY_H_

#include <vector>

#include "harness/netlist/definition.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"

namespace gatedyno {

// The subcircuits that no other one instantiates, in file order.  Fails for an
// unknown subcircuit, one that contains itself, instances nested deeper than
// 32, the wrong number of nets, and overrides of parameters not declared.
Parsed<std::vector<const Subckt*>> FindTopCells(const Netlist& netlist,
                                                const ReaderOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_HIERARCHY_H_
