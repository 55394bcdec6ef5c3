// A plan with everything it names found, read and estimated; no simulation yet.

#ifndef GATEDYNO_FLOW_PREPARED_RUN_H_
#define GATEDYNO_FLOW_PREPARED_RUN_H_

#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/effort/estimate.h"
#include "harness/flow/plan.h"
#include "harness/netlist/cell.h"
#include "harness/node/process_node.h"

namespace gatedyno {

struct PreparedRun {
  Plan plan;
  ProcessNode node;
  std::vector<Corner> corners;
  std::vector<Cell> cells;
  std::vector<CellEstimate> estimates;  // Of cells, same order.
  // Each begins with its cell, or its place in the plan.
  std::vector<std::string> warnings;
};

Result<PreparedRun> PrepareRun(const Plan& plan);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_PREPARED_RUN_H_
