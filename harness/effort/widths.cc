#include "harness/effort/widths.h"

#include <algorithm>

namespace gatedyno {

// Lengths written with different digits for one and the same value.
constexpr double kSameLength = 1e-6;

CellWidths MeasureWidths(const Cell& cell,
                         const SwitchNetwork& network,
                         double mu) {
  CellWidths widths;
  widths.mu = mu;
  widths.gate_m.resize(cell.nets.size());
  widths.diffusion_m.resize(cell.nets.size());
  for (const Mosfet& mosfet : cell.mosfets) {
    const double smallest = widths.smallest_length_m;
    widths.smallest_length_m =
        smallest > 0.0 ? std::min(smallest, mosfet.length_m) : mosfet.length_m;
  }
  for (size_t i = 0; i < cell.mosfets.size(); ++i) {
    const Mosfet& mosfet = cell.mosfets[i];
    const Switch& device = network.switches[i];
    const double width_m = mosfet.total_width_m();
    const double length = mosfet.length_m / widths.smallest_length_m;
    const double resistance = mosfet.polarity == Polarity::kP ? mu : 1.0;
    widths.one_length = widths.one_length && length < 1.0 + kSameLength;
    widths.conductance_m.push_back(width_m / (length * resistance));
    widths.gate_load_m.push_back(width_m * length);
    widths.gate_m[static_cast<size_t>(device.gate)] += width_m * length;
    widths.diffusion_m[static_cast<size_t>(device.drain)] += width_m;
    widths.diffusion_m[static_cast<size_t>(device.source)] += width_m;
  }
  return widths;
}

}  // namespace gatedyno
