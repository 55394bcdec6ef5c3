#include "harness/flow/width_warnings.h"

#include <utility>

#include <fmt/format.h>

#include "harness/effort/grid.h"

namespace gatedyno {

Result<std::vector<std::string>> WidthWarnings(const Cell& cell,
                                               const ProcessNode& node,
                                               const EstimateOptions& options) {
  Result<GridEffect> effect = RoundToGrid(cell, node.width_grid_m, options);
  if (!effect.ok()) {
    return Forward(effect);
  }
  std::vector<std::string> warnings = std::move(effect->warnings);
  constexpr double kRounding = 1e-9;  // Of arithmetic in the netlist.
  for (const Mosfet& mosfet : cell.mosfets) {
    const double finger_m = mosfet.width_m / mosfet.fingers;
    if (finger_m < node.minimum_width_m * (1.0 - kRounding)) {
      warnings.push_back(
          fmt::format("{} w={:.6g}n{} is below the node's minimum, {:.6g}n",
                      mosfet.name,
                      finger_m * 1e9,
                      mosfet.fingers > 1.0 ? " a finger" : "",
                      node.minimum_width_m * 1e9));
    }
  }
  return warnings;
}

}  // namespace gatedyno
