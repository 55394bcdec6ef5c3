#include "harness/effort/other_topology.h"

#include <algorithm>

#include <fmt/format.h>

#include "harness/effort/arc_ranking.h"
#include "harness/effort/sized_network.h"
#include "harness/effort/weakest_drive.h"
#include "harness/effort/widths.h"
#include "harness/network/isomorphism.h"
#include "harness/network/rail_network.h"
#include "harness/network/series_parallel.h"
#include "harness/network/stack.h"

namespace gatedyno {
namespace {

RailNetwork RailOf(const NetworkAnalysis& analysis, NetId output, NetId rail) {
  return FindRailNetwork(
      analysis.network, analysis.group_of(output), output, rail);
}

// Scales the devices from `first` on to a weakest rising drive of `target_m`.
// False when the cell, as changed, is no static cell.
bool MatchDrive(
    Cell& cell, size_t first, double mu, NetId output, double target_m) {
  const Result<NetworkAnalysis> analysis = AnalyseNetwork(cell);
  if (!analysis.ok()) {
    return false;
  }
  const double drive_m =
      WeakestDrive(*analysis,
                   MeasureWidths(cell, analysis->network, mu),
                   output,
                   Edge::kRise);
  ScaleWidths(cell, first, target_m / drive_m);
  return true;
}

// What a topology costs.
struct Cost {
  int stack = 0;
  double narrowest_m = 0.0;
  double widest_m = 0.0;
  std::vector<double> effort;  // By input; 0 where it does not move the output.
  double parasitic = 0.0;
};

Cost CostOf(const Cell& cell,
            const NetworkAnalysis& analysis,
            double mu,
            NetId output) {
  const RailNetwork up = RailOf(analysis, output, analysis.network.power);
  Cost cost;
  cost.stack = TallestStack(analysis, up);
  for (const int index : up.switches) {
    const double width_m =
        cell.mosfets[static_cast<size_t>(index)].total_width_m();
    cost.narrowest_m =
        cost.narrowest_m > 0.0 ? std::min(cost.narrowest_m, width_m) : width_m;
    cost.widest_m = std::max(cost.widest_m, width_m);
  }
  cost.effort.resize(analysis.inputs.size());
  for (const ArcEstimate& found : EstimateArcs(cell, analysis, {mu, false})) {
    if (found.arc.output != cell.net_name(output)) {
      continue;
    }
    for (size_t i = 0; i < analysis.inputs.size(); ++i) {
      if (found.arc.pin == cell.net_name(analysis.inputs[i])) {
        cost.effort[i] = std::max(cost.effort[i], found.estimate.effort);
      }
    }
    cost.parasitic =
        std::max(cost.parasitic, found.estimate.parasitic_by_nodes);
  }
  return cost;
}

std::string WidthText(const Cost& cost) {
  constexpr double kSame = 1.0005;  // Prints the same.
  const double low_nm = cost.narrowest_m * 1e9;
  const double high_nm = cost.widest_m * 1e9;
  return cost.widest_m < cost.narrowest_m * kSame
             ? fmt::format("{:.4g} nm", low_nm)
             : fmt::format("{:.4g}-{:.4g} nm", low_nm, high_nm);
}

std::string CostText(const Cell& cell,
                     const NetworkAnalysis& analysis,
                     const Cost& other,
                     const Cost& now) {
  std::vector<std::string> efforts;
  for (size_t i = 0; i < analysis.inputs.size(); ++i) {
    if (now.effort[i] > 0.0) {
      efforts.push_back(fmt::format("{} {:.4g} (now {:.4g})",
                                    cell.net_name(analysis.inputs[i]),
                                    other.effort[i],
                                    now.effort[i]));
    }
  }
  return fmt::format(
      "stack {} (now {}), PMOS {} (now {}); g {}; p {:.4g} "
      "(now {:.4g})",
      other.stack,
      now.stack,
      WidthText(other),
      WidthText(now),
      fmt::join(efforts, ", "),
      other.parasitic,
      now.parasitic);
}

bool PullUpIsRepeated(const NetworkAnalysis& analysis, NetId output) {
  return SameTopology(analysis.network,
                      RailOf(analysis, output, analysis.network.ground),
                      RailOf(analysis, output, analysis.network.power));
}

// A tree and its dual are the same: a single device.
bool IsItsOwnDual(const SwitchNetwork& network, const SeriesParallel& tree) {
  return CanonicalText(network, tree) == CanonicalText(network, DualOf(tree));
}

}  // namespace

std::optional<Cell> WithOtherTopology(const Cell& cell,
                                      const NetworkAnalysis& analysis,
                                      double mu,
                                      NetId output) {
  const SwitchNetwork& network = analysis.network;
  const RailNetwork down = RailOf(analysis, output, network.ground);
  const RailNetwork up = RailOf(analysis, output, network.power);
  const std::optional<SeriesParallel> tree =
      ReduceSeriesParallel(network, down);
  const bool repeated = PullUpIsRepeated(analysis, output);
  if (repeated && (!tree || IsItsOwnDual(network, *tree))) {
    return std::nullopt;
  }
  Cell other = repeated ? WithPullUpFromTree(cell, network, up, DualOf(*tree))
                        : WithPullUpRepeated(cell, network, up, down);
  const double target_m = WeakestDrive(
      analysis, MeasureWidths(cell, network, mu), output, Edge::kRise);
  const size_t first = cell.mosfets.size() - up.switches.size();
  if (!MatchDrive(other, first, mu, output, target_m)) {
    return std::nullopt;
  }
  return other;
}

std::string DescribeOtherTopology(const Cell& cell,
                                  const NetworkAnalysis& analysis,
                                  const EstimateOptions& options,
                                  NetId output) {
  const std::optional<Cell> other =
      WithOtherTopology(cell, analysis, options.mu, output);
  if (!other) {
    return "";
  }
  const Result<NetworkAnalysis> changed = AnalyseNetwork(*other);
  if (!changed.ok()) {
    return "";
  }
  return fmt::format("pull-up as {}: {}",
                     PullUpIsRepeated(*changed, output)
                         ? "the pull-down repeated"
                         : "the series/parallel dual",
                     CostText(cell,
                              analysis,
                              CostOf(*other, *changed, options.mu, output),
                              CostOf(cell, analysis, options.mu, output)));
}

}  // namespace gatedyno
