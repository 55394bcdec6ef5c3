#include "harness/network/toggle.h"

namespace gatedyno {

std::vector<Toggle> FindToggles(const NetworkAnalysis& analysis) {
  std::vector<TruthTable> functions;
  for (const NetId output : analysis.outputs) {
    functions.push_back(analysis.function_of(output));
  }
  std::vector<Toggle> toggles;
  for (size_t i = 0; i < analysis.inputs.size(); ++i) {
    const int input = static_cast<int>(i);
    for (size_t o = 0; o < functions.size(); ++o) {
      for (InputVector v = 0; v < functions[o].rows(); ++v) {
        if (functions[o].toggles(v, input)) {
          toggles.push_back({input, analysis.outputs[o], v, Toggled(v, input)});
        }
      }
    }
  }
  return toggles;
}

Arc ArcOf(const Cell& cell,
          const NetworkAnalysis& analysis,
          const Toggle& toggle) {
  const auto edge_to = [](bool high) {
    return high ? Edge::kRise : Edge::kFall;
  };
  const auto moved = static_cast<size_t>(toggle.input);
  Arc arc;
  arc.cell = cell.name;
  arc.pin = cell.net_name(analysis.inputs[moved]);
  arc.output = cell.net_name(toggle.output);
  arc.input_edge = edge_to(IsHigh(toggle.after, toggle.input));
  arc.edge = edge_to(
      analysis.levels[toggle.after][static_cast<size_t>(toggle.output)] ==
      Level::kHigh);
  for (size_t i = 0; i < analysis.inputs.size(); ++i) {
    if (i != moved) {
      arc.side.push_back({cell.net_name(analysis.inputs[i]),
                          IsHigh(toggle.after, static_cast<int>(i))});
    }
  }
  return arc;
}

}  // namespace gatedyno
