// Hand numbers of one toggle, through all the stages it moves.
//
// Net by net in the order of the groups: a group's output moves once the last
// of the newly conducting gates in its final driving path has moved, plus its
// stage's delay.  (The last, even where a parallel path is ready earlier: the
// drive counted is that of the whole path.)  Delays are in tau, every edge's
// tau taken equal; which way is last is decided by Elmore.
//
// With h the fanout in units of the pin's own gate width, all its devices
// counted:
//   d(h) = sum over earlier stages (load width / reference width + p)
//          + inner load of the output net / reference width + p_last
//          + h * (gate width of the pin) / (reference width of the last stage).
// For a cell of one stage the last factor is the g of the tables.
// Source: Sutherland, Sproull, Harris, Logical Effort, 1999; the sum over
// stages is their path delay with fixed inner loads.

#ifndef GATEDYNO_EFFORT_ARC_ESTIMATE_H_
#define GATEDYNO_EFFORT_ARC_ESTIMATE_H_

#include "harness/effort/widths.h"
#include "harness/network/analysis.h"
#include "harness/network/toggle.h"
#include "harness/record/line.h"

namespace gatedyno {

Estimate EstimateToggle(const NetworkAnalysis& analysis,
                        const CellWidths& widths,
                        const Toggle& toggle);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_ARC_ESTIMATE_H_
