// Widths of a cell that the node cannot make.

#ifndef GATEDYNO_FLOW_WIDTH_WARNINGS_H_
#define GATEDYNO_FLOW_WIDTH_WARNINGS_H_

#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/effort/estimate.h"
#include "harness/netlist/cell.h"
#include "harness/node/process_node.h"

namespace gatedyno {

// One for each device off the width grid, with what rounding it does to g
// (effort/grid.h), and one for each whose finger is below the minimum.  Cells
// are measured as they are written all the same.  Fails as EstimateCell does.
Result<std::vector<std::string>> WidthWarnings(const Cell& cell,
                                               const ProcessNode& node,
                                               const EstimateOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_WIDTH_WARNINGS_H_
