// Widths on a process's width grid, and what rounding does to g.
//
// Rounding that keeps all ratios leaves g as it is; rounding that breaks them
// does not.  The width of one finger is what is drawn, so that is what is
// rounded: to the nearest step, at least one.

#ifndef GATEDYNO_EFFORT_GRID_H_
#define GATEDYNO_EFFORT_GRID_H_

#include <string>
#include <vector>

#include "harness/base/result.h"
#include "harness/effort/estimate.h"
#include "harness/netlist/cell.h"
#include "harness/record/edge.h"

namespace gatedyno {

// A device off the grid.  Widths are of one finger.
struct OffGridDevice {
  int mosfet = 0;  // Index into Cell::mosfets.
  double width_m = 0.0;
  double rounded_m = 0.0;
};

// g of a (pin, output, edge), worst side vector, before and after rounding all
// the devices.
struct EffortChange {
  std::string pin;
  std::string output;
  Edge edge = Edge::kFall;
  double before = 0.0;
  double after = 0.0;
};

struct GridEffect {
  std::vector<OffGridDevice> devices;
  Cell rounded;                       // The cell with every width on the grid.
  std::vector<EffortChange> changes;  // All arcs, in the estimate's order.
  // One per device, with the arc whose g that device's rounding changes most:
  // "m1 w=93n is off the 5 nm grid: rounded to 95n, g(a, fall) 1.667 -> 1.640".
  std::vector<std::string> warnings;
};

// Fails as EstimateCell does.  REQUIRES: grid_m > 0.
Result<GridEffect> RoundToGrid(const Cell& cell,
                               double grid_m,
                               const EstimateOptions& options);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_GRID_H_
