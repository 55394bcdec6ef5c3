// Gate and diffusion widths, and conductances, as the hand method counts them.
//
// A device of width W and length L, with l = L / (smallest L of the cell):
//   conductance  W / l for an NMOS, W / (l * mu) for a PMOS;
//   gate load    W * l;
//   diffusion    W at either end, whatever the fingers share.
// All in metres of NMOS width at the smallest length, so that a conductance of
// x is that of an NMOS of width x.  Source: Sutherland, Sproull, Harris,
// Logical Effort, 1999 (widths); the rule for lengths is R ~ L / W, C ~ W * L.

#ifndef GATEDYNO_EFFORT_WIDTHS_H_
#define GATEDYNO_EFFORT_WIDTHS_H_

#include <vector>

#include "harness/netlist/cell.h"
#include "harness/network/switch_network.h"

namespace gatedyno {

struct CellWidths {
  double mu = 2.0;
  double smallest_length_m = 0.0;
  bool one_length = true;
  std::vector<double> conductance_m;  // By index of Cell::mosfets.
  std::vector<double> gate_load_m;    // By index of Cell::mosfets.
  std::vector<double> gate_m;         // By NetId: all the gates on the net.
  std::vector<double> diffusion_m;    // By NetId: all the channel ends on it.

  // Gate width of the reference inverter with conductance `conductance_m`.
  //
  // Falling output: Wn = Weq, Wp = mu * Weq, and Weq is the conductance.
  // Rising: Wp = Weq, Wn = Weq / mu, and Weq = mu * conductance.  On both edges
  // Wn + Wp = (1 + mu) * conductance.
  double reference_width_m(double drive_m) const {
    return (1.0 + mu) * drive_m;
  }
};

CellWidths MeasureWidths(const Cell& cell,
                         const SwitchNetwork& network,
                         double mu);

}  // namespace gatedyno

#endif  // GATEDYNO_EFFORT_WIDTHS_H_
