// One stage of an arc: a group's output net that moves between two levels.
//
// In units of tau, the delay of a reference inverter per unit of fanout:
//   effort delay        load width / (Wn + Wp of the reference)
//   parasitic, by nodes  drain width on the output / (Wn + Wp)
//   parasitic, by Elmore sum over nets k of R(o,k) * C(k) / (1 + mu)
// with the reference inverter of the edge (widths.h), whose own parasitic is 1
// by either count.  C(k) is the diffusion width: of the output every drain; of
// an inner net half the ends, since two devices in series share one diffusion.
// Only nets that have to move count: a net joined to the final supply before
// the edge does not, one that floated does.
// Sources: Elmore 1948 for the sum; its use for p with internal nets, Weste and
// Harris, CMOS VLSI Design, 4th ed. (NAND2, outer input falling: 7/3).

#ifndef GATEDYNO_EFFORT_STAGE_H_
#define GATEDYNO_EFFORT_STAGE_H_

#include "harness/effort/drive.h"
#include "harness/effort/widths.h"
#include "harness/network/analysis.h"

namespace gatedyno {

struct Stage {
  Drive drive;
  double reference_width_m = 0.0;  // Wn + Wp of the edge's reference.
  double parasitic_by_nodes = 0.0;
  double parasitic_by_elmore = 0.0;
};

// REQUIRES: `output` is driven to different levels before and after.
Stage SolveStage(const NetworkAnalysis& analysis,
                 const CellWidths& widths,
                 NetId output,
                 InputVector before,
                 InputVector after);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_STAGE_H_
