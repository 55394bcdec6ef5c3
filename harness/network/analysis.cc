#include "harness/network/analysis.h"

#include <algorithm>
#include <cassert>

#include <fmt/format.h>

#include "harness/network/cell_error.h"

namespace gatedyno {
namespace {

bool Contains(const std::vector<NetId>& nets, NetId net) {
  return std::find(nets.begin(), nets.end(), net) != nets.end();
}

Status RefusePassGates(const Cell& cell, const NetworkAnalysis& analysis) {
  for (const Group& group : analysis.groups) {
    if (!group.pass_inputs.empty()) {
      return CellError(
          cell,
          fmt::format("pin {} enters by a source or drain and no supply drives "
                      "it: the shape of a {}, a kind not estimated",
                      cell.net_name(group.pass_inputs.front()),
                      KindName(GateKind::kPassGate)));
    }
  }
  return Ok();
}

// Fills inputs and outputs.
Status SortOutPins(const Cell& cell, NetworkAnalysis& analysis) {
  for (const NetId pin : analysis.network.signal_pins) {
    const bool driven = std::any_of(
        analysis.groups.begin(), analysis.groups.end(), [&](const Group& g) {
          return Contains(g.outputs, pin);
        });
    const bool gates =
        std::any_of(analysis.network.switches.begin(),
                    analysis.network.switches.end(),
                    [&](const Switch& device) { return device.gate == pin; });
    if (driven) {
      analysis.outputs.push_back(pin);
    } else if (gates) {
      analysis.inputs.push_back(pin);
    } else {
      return CellError(cell,
                       fmt::format("pin {} is never used", cell.net_name(pin)));
    }
  }
  if (analysis.outputs.empty()) {
    return CellError(cell, "has no output: its devices drive no pin");
  }
  if (analysis.inputs.size() > static_cast<size_t>(kMaxInputs)) {
    return CellError(cell,
                     fmt::format("has {} inputs: at most {} can be analysed",
                                 analysis.inputs.size(),
                                 kMaxInputs));
  }
  return Ok();
}

// A net that gates a device but that nothing drives.
Status RefuseUndrivenGates(const Cell& cell, const NetworkAnalysis& analysis) {
  for (size_t i = 0; i < cell.mosfets.size(); ++i) {
    const NetId gate = analysis.network.switches[i].gate;
    const bool driven =
        analysis.network.is_supply(gate) || Contains(analysis.inputs, gate) ||
        std::any_of(analysis.groups.begin(),
                    analysis.groups.end(),
                    [&](const Group& g) { return Contains(g.outputs, gate); });
    if (!driven) {
      return CellErrorAt(cell,
                         cell.mosfets[i].place,
                         fmt::format("nothing drives {}, the gate of {}",
                                     cell.net_name(gate),
                                     cell.mosfets[i].name));
    }
  }
  return Ok();
}

OutputBehaviour BehaviourOf(const NetworkAnalysis& analysis,
                            const Group& group,
                            NetId output) {
  OutputBehaviour behaviour = {analysis.network,
                               group,
                               output,
                               static_cast<int>(analysis.inputs.size()),
                               {},
                               {},
                               {}};
  for (size_t v = 0; v < analysis.levels.size(); ++v) {
    const Level level = analysis.levels[v][static_cast<size_t>(output)];
    behaviour.high[v] = level == Level::kHigh;
    behaviour.floating[v] = level == Level::kFloating;
    behaviour.shorted[v] = level == Level::kShorted;
  }
  return behaviour;
}

// Words the first offending vector.
tl::unexpected<Error> KindError(const Cell& cell,
                                const NetworkAnalysis& analysis,
                                const OutputBehaviour& behaviour) {
  const GateKind kind = ClassifyOutput(behaviour);
  InputVector vector = 0;
  while (!behaviour.floating[vector] && !behaviour.shorted[vector]) {
    ++vector;
  }
  const bool floats = behaviour.floating[vector];
  const std::string at = DescribeVector(cell, analysis.inputs, vector);
  const std::string shape =
      kind == GateKind::kNotComplementary
          ? ""
          : fmt::format(" (the shape of a {} gate, a kind not estimated)",
                        KindName(kind));
  return CellError(
      cell,
      fmt::format(
          "{} {} {}{}{}: {} conduct{}; networks are not "
          "complementary{}",
          Contains(analysis.outputs, behaviour.output) ? "output" : "net",
          cell.net_name(behaviour.output),
          floats ? "floats" : "is shorted",
          at.empty() ? "" : " at ",
          at,
          floats ? "neither pull-up nor pull-down"
                 : "both pull-up and pull-down",
          floats ? "s" : "",
          shape));
}

Status RefuseOtherKinds(const Cell& cell, const NetworkAnalysis& analysis) {
  for (const Group& group : analysis.groups) {
    for (const NetId output : group.outputs) {
      const OutputBehaviour behaviour = BehaviourOf(analysis, group, output);
      if (!IsCarriedOn(ClassifyOutput(behaviour))) {
        return KindError(cell, analysis, behaviour);
      }
    }
  }
  return Ok();
}

}  // namespace

const Group& NetworkAnalysis::group_of(NetId net) const {
  const auto group =
      std::find_if(groups.begin(), groups.end(), [&](const Group& candidate) {
        return Contains(candidate.nets, net);
      });
  assert(group != groups.end());
  return *group;
}

TruthTable NetworkAnalysis::function_of(NetId net) const {
  TruthTable table = {static_cast<int>(inputs.size()), {}};
  for (InputVector v = 0; v < table.rows(); ++v) {
    table.high[v] = levels[v][static_cast<size_t>(net)] == Level::kHigh;
  }
  return table;
}

Result<NetworkAnalysis> AnalyseNetwork(const Cell& cell) {
  Result<SwitchNetwork> network = BuildSwitchNetwork(cell);
  if (!network.ok()) {
    return Forward(network);
  }
  NetworkAnalysis analysis;
  analysis.network = std::move(*network);
  analysis.groups = FindGroups(analysis.network);
  if (const Status passes = RefusePassGates(cell, analysis); !passes.ok()) {
    return Forward(passes);
  }
  if (const Status pins = SortOutPins(cell, analysis); !pins.ok()) {
    return Forward(pins);
  }
  if (const Status gates = RefuseUndrivenGates(cell, analysis); !gates.ok()) {
    return Forward(gates);
  }
  Result<std::vector<Group>> ordered =
      OrderGroups(cell, std::move(analysis.groups));
  if (!ordered.ok()) {
    return Forward(ordered);
  }
  analysis.groups = std::move(*ordered);
  const InputVector rows = InputVector{1} << analysis.inputs.size();
  for (InputVector v = 0; v < rows; ++v) {
    analysis.levels.push_back(
        Evaluate(analysis.network, analysis.groups, analysis.inputs, v));
  }
  if (const Status kinds = RefuseOtherKinds(cell, analysis); !kinds.ok()) {
    return Forward(kinds);
  }
  return analysis;
}

}  // namespace gatedyno
