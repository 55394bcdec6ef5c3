// Source and drain areas and perimeters of a device.
//
// Left out of a device line they are not zero: the model fills in its own.  So
// every device gets them: from the netlist where it gives all four, else from
// the node's rules:
//   a net of exactly two terminals, of devices alike in kind, width, fingers
//   and copies, reaching no pin, supply or gate, is one uncontacted strip
//   between two gates, half to each device:
//     area = w * shared / 2, perimeter = w + shared
//   any other terminal has a contacted strip of its own:
//     area = w * contacted, perimeter = 2 * (w + contacted)
// The perimeter includes the gate edge (BSIM4 permod = 1).  w is the width of
// one finger; an even number of fingers f has f / 2 drain strips and f / 2 + 1
// source strips, an odd one (f + 1) / 2 of each.

#ifndef GATEDYNO_DECK_DIFFUSION_H_
#define GATEDYNO_DECK_DIFFUSION_H_

#include "harness/netlist/cell.h"
#include "harness/node/process_node.h"

namespace gatedyno {

struct Diffusion {
  double drain_area_m2 = 0.0;
  double source_area_m2 = 0.0;
  double drain_perimeter_m = 0.0;
  double source_perimeter_m = 0.0;
  bool from_netlist = false;
};

// REQUIRES: `mosfet` is one of `cell.mosfets`.
Diffusion DiffusionOf(const Cell& cell,
                      const Mosfet& mosfet,
                      const DiffusionRules& rules);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_DIFFUSION_H_
