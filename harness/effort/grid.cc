#include "harness/effort/grid.h"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <fmt/format.h>

namespace gatedyno {
namespace {

// Widths come from decimal text; this is far below any step yet above what
// arithmetic in netlist expressions leaves.
constexpr double kOnGridSteps = 1e-6;

double RoundedWidth(double width_m, double grid_m) {
  const double steps = std::max(1.0, std::round(width_m / grid_m));
  return steps * grid_m;
}

std::vector<OffGridDevice> FindOffGrid(const Cell& cell, double grid_m) {
  std::vector<OffGridDevice> found;
  for (size_t i = 0; i < cell.mosfets.size(); ++i) {
    const double width_m = cell.mosfets[i].width_m / cell.mosfets[i].fingers;
    const double rounded_m = RoundedWidth(width_m, grid_m);
    if (std::abs(width_m - rounded_m) > kOnGridSteps * grid_m) {
      found.push_back({static_cast<int>(i), width_m, rounded_m});
    }
  }
  return found;
}

void Round(Cell& cell, const OffGridDevice& device) {
  Mosfet& mosfet = cell.mosfets[static_cast<size_t>(device.mosfet)];
  mosfet.width_m = device.rounded_m * mosfet.fingers;
}

// REQUIRES: two estimates of one cell but for widths, one arc per edge.
std::vector<EffortChange> Changes(const CellEstimate& before,
                                  const CellEstimate& after) {
  assert(before.arcs.size() == after.arcs.size());
  std::vector<EffortChange> changes;
  for (size_t i = 0; i < before.arcs.size(); ++i) {
    const Arc& arc = before.arcs[i].arc;
    changes.push_back({arc.pin,
                       arc.output,
                       arc.edge,
                       before.arcs[i].estimate.effort,
                       after.arcs[i].estimate.effort});
  }
  return changes;
}

std::string EffectText(const std::vector<EffortChange>& changes) {
  constexpr double kInvisible = 0.0005;  // Prints the same.
  const auto size = [](const EffortChange& change) {
    return std::abs(change.after / change.before - 1.0);
  };
  // Differences of rounding alone must not choose between equal arcs.
  const auto smaller = [&](const EffortChange& a, const EffortChange& b) {
    return size(a) < size(b) - 1e-9;
  };
  const auto largest =
      std::max_element(changes.begin(), changes.end(), smaller);
  if (largest == changes.end() ||
      std::abs(largest->after - largest->before) < kInvisible) {
    return "g unchanged";
  }
  const bool one_output =
      std::all_of(changes.begin(), changes.end(), [&](const EffortChange& c) {
        return c.output == changes.front().output;
      });
  const std::string arc =
      one_output ? largest->pin
                 : fmt::format("{}->{}", largest->pin, largest->output);
  return fmt::format("g({}, {}) {:.3f} -> {:.3f}",
                     arc,
                     EdgeName(largest->edge),
                     largest->before,
                     largest->after);
}

std::string Warning(const Cell& cell,
                    double grid_m,
                    const OffGridDevice& device,
                    const std::string& effect) {
  const Mosfet& mosfet = cell.mosfets[static_cast<size_t>(device.mosfet)];
  return fmt::format(
      "{} w={:.6g}n{} is off the {:.6g} nm grid: rounded to "
      "{:.6g}n, {}",
      mosfet.name,
      device.width_m * 1e9,
      mosfet.fingers > 1.0 ? " a finger" : "",
      grid_m * 1e9,
      device.rounded_m * 1e9,
      effect);
}

}  // namespace

Result<GridEffect> RoundToGrid(const Cell& cell,
                               double grid_m,
                               const EstimateOptions& options) {
  assert(grid_m > 0.0);
  const EstimateOptions worst = {options.mu, false};
  const Result<CellEstimate> before = EstimateCell(cell, worst);
  if (!before.ok()) {
    return Forward(before);
  }
  GridEffect effect;
  effect.devices = FindOffGrid(cell, grid_m);
  effect.rounded = cell;
  for (const OffGridDevice& device : effect.devices) {
    Cell alone = cell;
    Round(alone, device);
    Round(effect.rounded, device);
    const Result<CellEstimate> after = EstimateCell(alone, worst);
    if (!after.ok()) {
      return Forward(after);
    }
    effect.warnings.push_back(
        Warning(cell, grid_m, device, EffectText(Changes(*before, *after))));
  }
  const Result<CellEstimate> after = EstimateCell(effect.rounded, worst);
  if (!after.ok()) {
    return Forward(after);
  }
  effect.changes = Changes(*before, *after);
  return effect;
}

}  // namespace gatedyno
