// Which pins are supplies and bodies.

#ifndef GATEDYNO_NETLIST_SUPPLIES_H_
#define GATEDYNO_NETLIST_SUPPLIES_H_

#include "harness/netlist/cell.h"
#include "harness/netlist/definition.h"
#include "harness/netlist/parse_error.h"
#include "harness/netlist/reader.h"

namespace gatedyno {

// Finds the power, ground and body pins of `cell`, made from `top`, by the
// names in `options`.  A name that is both a supply's and a body's is a
// supply.
//
// SPICE's net "0" is the ground without being a pin.  Where "0" is a ground
// name and the cell has no other ground pin, it becomes the last pin; beside
// a ground pin it is joined with it, with a warning.
ParseStatus RecogniseSupplies(const Subckt& top,
                              const ReaderOptions& options,
                              Cell& cell);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_SUPPLIES_H_
