// A pull-up built from a series/parallel tree or by repeating the pull-down.

#ifndef GATEDYNO_EFFORT_SIZED_NETWORK_H_
#define GATEDYNO_EFFORT_SIZED_NETWORK_H_

#include "harness/netlist/cell.h"
#include "harness/network/rail_network.h"
#include "harness/network/series_parallel.h"

namespace gatedyno {

// The cell with the PMOS of `old_up` replaced by a network of the form of
// `tree`, whose leaves name the switches to take the gates from.  Widths are
// in proportion to 1 / (share of the resistance), the widest end last.
Cell WithPullUpFromTree(const Cell& cell,
                        const SwitchNetwork& network,
                        const RailNetwork& old_up,
                        const SeriesParallel& tree);

// The same with `down` mirrored, each PMOS as wide as its NMOS.
Cell WithPullUpRepeated(const Cell& cell,
                        const SwitchNetwork& network,
                        const RailNetwork& old_up,
                        const RailNetwork& down);

// Multiplies the widths of the devices from `first` on.
void ScaleWidths(Cell& cell, size_t first, double factor);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_SIZED_NETWORK_H_
