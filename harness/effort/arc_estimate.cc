#include "harness/effort/arc_estimate.h"

#include <algorithm>
#include <cassert>
#include <vector>

#include "harness/effort/stage.h"

namespace gatedyno {
namespace {

// The way an edge has come to a net, in tau.
struct Arrival {
  bool moves = false;
  double effort = 0.0;  // Of the stages passed, at their fixed loads.
  double by_nodes = 0.0;
  double by_elmore = 0.0;
  std::optional<double> first_effort;  // Of the first stage passed.

  double time() const { return effort + by_elmore; }
};

// The latest of the gates that let the path conduct.
Arrival LastGate(const SwitchNetwork& network,
                 const std::vector<int>& carrying,
                 const Levels& initial,
                 const std::vector<Arrival>& arrivals) {
  Arrival last;
  for (const int index : carrying) {
    const Switch& device = network.switches[static_cast<size_t>(index)];
    const Arrival& gate = arrivals[static_cast<size_t>(device.gate)];
    const bool newly_on = gate.moves && !Conducts(device, initial);
    if (newly_on && (!last.moves || gate.time() > last.time())) {
      last = gate;
    }
  }
  assert(last.moves);
  return last;
}

bool Moves(const NetworkAnalysis& analysis, const Toggle& toggle, NetId net) {
  return analysis.levels[toggle.before][static_cast<size_t>(net)] !=
         analysis.levels[toggle.after][static_cast<size_t>(net)];
}

}  // namespace

Estimate EstimateToggle(const NetworkAnalysis& analysis,
                        const CellWidths& widths,
                        const Toggle& toggle) {
  const NetId pin = analysis.inputs[static_cast<size_t>(toggle.input)];
  std::vector<Arrival> arrivals(
      static_cast<size_t>(analysis.network.net_count()));
  arrivals[static_cast<size_t>(pin)].moves = true;

  Estimate estimate;
  for (const Group& group : analysis.groups) {
    for (const NetId net : group.outputs) {
      if (!Moves(analysis, toggle, net)) {
        continue;
      }
      const Stage stage =
          SolveStage(analysis, widths, net, toggle.before, toggle.after);
      Arrival way = LastGate(analysis.network,
                             stage.drive.carrying,
                             analysis.levels[toggle.before],
                             arrivals);
      const double fixed_effort =
          widths.gate_m[static_cast<size_t>(net)] / stage.reference_width_m;
      if (net == toggle.output) {
        estimate.fixed_first_effort = way.first_effort;
        estimate.effort =
            widths.gate_m[static_cast<size_t>(pin)] / stage.reference_width_m;
        estimate.inner_effort = way.effort + fixed_effort;
        estimate.parasitic_by_nodes =
            way.by_nodes + stage.parasitic_by_nodes + estimate.inner_effort;
        estimate.parasitic_by_elmore =
            way.by_elmore + stage.parasitic_by_elmore + estimate.inner_effort;
        return estimate;
      }
      if (!way.first_effort) {
        way.first_effort = fixed_effort;
      }
      way.effort += fixed_effort;
      way.by_nodes += stage.parasitic_by_nodes;
      way.by_elmore += stage.parasitic_by_elmore;
      arrivals[static_cast<size_t>(net)] = way;
    }
  }
  assert(false);
  return estimate;
}

}  // namespace gatedyno
