// The least drive of an output towards one supply, over all input vectors.

#ifndef GATEDYNO_EFFORT_WEAKEST_DRIVE_H_
#define GATEDYNO_EFFORT_WEAKEST_DRIVE_H_

#include "harness/effort/widths.h"
#include "harness/network/analysis.h"
#include "harness/record/edge.h"

namespace gatedyno {

// As the width of one NMOS (widths.h), in metres.  0 for an output that never
// takes the level the edge ends at.
double WeakestDrive(const NetworkAnalysis& analysis,
                    const CellWidths& widths,
                    NetId output,
                    Edge edge);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_WEAKEST_DRIVE_H_
