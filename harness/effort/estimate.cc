#include "harness/effort/estimate.h"

#include <fmt/format.h>

#include "harness/effort/arc_ranking.h"
#include "harness/effort/other_topology.h"
#include "harness/effort/widths.h"
#include "harness/network/analysis.h"
#include "harness/network/function_text.h"
#include "harness/network/isomorphism.h"
#include "harness/network/rail_network.h"
#include "harness/network/stack.h"

namespace gatedyno {
namespace {

OutputEstimate DescribeOutput(const Cell& cell,
                              const NetworkAnalysis& analysis,
                              const EstimateOptions& options,
                              NetId output) {
  const SwitchNetwork& network = analysis.network;
  const Group& group = analysis.group_of(output);
  const RailNetwork down =
      FindRailNetwork(network, group, output, network.ground);
  const RailNetwork up = FindRailNetwork(network, group, output, network.power);
  OutputEstimate described;
  described.output = cell.net_name(output);
  described.function = FunctionText(cell, analysis, output);
  described.kind = KindName(GateKind::kComplementaryStatic);
  described.self_dual = IsSelfDual(analysis.function_of(output));
  described.repeated_network = SameTopology(network, down, up);
  described.tallest_pull_down = TallestStack(analysis, down);
  described.tallest_pull_up = TallestStack(analysis, up);
  if (described.self_dual) {
    described.other_topology =
        DescribeOtherTopology(cell, analysis, options, output);
  }
  return described;
}

// Whether the input changes any output.
bool IsHeard(const NetworkAnalysis& analysis, int input) {
  for (const NetId output : analysis.outputs) {
    if (DependsOn(analysis.function_of(output), input)) {
      return true;
    }
  }
  return false;
}

std::string Counted(size_t count, std::string_view thing) {
  return fmt::format("{} {}{}", count, thing, count == 1 ? "" : "s");
}

std::vector<std::string> Remarks(const Cell& cell,
                                 const NetworkAnalysis& analysis,
                                 const CellWidths& widths) {
  std::vector<std::string> remarks;
  if (!widths.one_length) {
    remarks.push_back(
        fmt::format("lengths differ: hand numbers take gate load as W*L and "
                    "drive as W/L, relative to the smallest length, {:.4g} nm",
                    widths.smallest_length_m * 1e9));
  }
  if (!cell.resistors.empty()) {
    remarks.push_back(
        fmt::format("hand numbers take {} for {}",
                    Counted(cell.resistors.size(), "resistor"),
                    cell.resistors.size() == 1 ? "a wire" : "wires"));
  }
  if (!cell.capacitors.empty()) {
    remarks.push_back(
        fmt::format("hand numbers leave out {}",
                    Counted(cell.capacitors.size(), "capacitor")));
  }
  for (size_t i = 0; i < analysis.inputs.size(); ++i) {
    if (!IsHeard(analysis, static_cast<int>(i))) {
      remarks.push_back(fmt::format("input {} changes no output",
                                    cell.net_name(analysis.inputs[i])));
    }
  }
  return remarks;
}

}  // namespace

Result<CellEstimate> EstimateCell(const Cell& cell,
                                  const EstimateOptions& options) {
  const Result<NetworkAnalysis> analysis = AnalyseNetwork(cell);
  if (!analysis.ok()) {
    return Forward(analysis);
  }
  CellEstimate estimate;
  estimate.cell = cell.name;
  estimate.stages = LongestWay(analysis->groups);
  for (const NetId input : analysis->inputs) {
    estimate.inputs.push_back(cell.net_name(input));
  }
  for (const NetId output : analysis->outputs) {
    estimate.outputs.push_back(
        DescribeOutput(cell, *analysis, options, output));
  }
  estimate.arcs = EstimateArcs(cell, *analysis, options);
  estimate.warnings = Remarks(
      cell, *analysis, MeasureWidths(cell, analysis->network, options.mu));
  return estimate;
}

}  // namespace gatedyno
