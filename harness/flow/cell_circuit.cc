#include "harness/flow/cell_circuit.h"

#include "harness/network/analysis.h"

namespace gatedyno {
namespace {

CircuitStage StageOf(const Cell& cell, const Group& group) {
  CircuitStage stage;
  for (const NetId output : group.outputs) {
    stage.outputs.push_back(cell.net_name(output));
  }
  stage.devices.assign(group.switches.begin(), group.switches.end());
  return stage;
}

}  // namespace

Circuit CircuitOf(const Cell& cell) {
  const Result<NetworkAnalysis> analysis = AnalyseNetwork(cell);
  if (!analysis.ok()) {
    return {};
  }
  Circuit circuit{.power = cell.net_name(cell.power),
                  .ground = cell.net_name(cell.ground),
                  .devices = {},
                  .stages = {}};
  for (size_t i = 0; i < cell.mosfets.size(); ++i) {
    const Mosfet& mosfet = cell.mosfets[i];
    const Switch& device = analysis->network.switches[i];
    circuit.devices.push_back({.name = mosfet.name,
                               .p_type = mosfet.polarity == Polarity::kP,
                               .gate = cell.net_name(device.gate),
                               .drain = cell.net_name(device.drain),
                               .source = cell.net_name(device.source),
                               .width_m = mosfet.total_width_m(),
                               .length_m = mosfet.length_m});
  }
  for (const Group& group : analysis->groups) {
    circuit.stages.push_back(StageOf(cell, group));
  }
  return circuit;
}

}  // namespace gatedyno
