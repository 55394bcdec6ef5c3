// Remarks on a cell that are no errors.

#ifndef GATEDYNO_NETLIST_CELL_WARNINGS_H_
#define GATEDYNO_NETLIST_CELL_WARNINGS_H_

#include <set>
#include <string>

#include "harness/netlist/cell.h"

namespace gatedyno {

// One warning naming the layout remarks that are not used, if any; one naming
// the first device whose size is no transistor's (below 1 nm, or 1 mm and
// more: usually a unit is missing, or M is meant as mega).
void AddWarnings(const std::set<std::string>& unused_remarks, Cell& cell);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_CELL_WARNINGS_H_
