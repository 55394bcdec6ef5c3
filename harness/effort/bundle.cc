#include "harness/effort/bundle.h"

#include <algorithm>

#include <fmt/format.h>

#include "harness/base/text.h"
#include "harness/effort/weakest_drive.h"
#include "harness/effort/widths.h"
#include "harness/network/analysis.h"
#include "harness/network/cell_error.h"

namespace gatedyno {
namespace {

Result<NetId> NetNamed(const Cell& cell,
                       const SwitchNetwork& network,
                       const std::string& name) {
  for (size_t id = 0; id < cell.nets.size(); ++id) {
    if (EqualsIgnoringCase(cell.nets[id], name)) {
      return network.same_as[id];
    }
  }
  return CellError(cell, fmt::format("has no net '{}'", name));
}

}  // namespace

Result<BundleEstimate> EstimateBundle(const Cell& cell,
                                      const Bundle& bundle,
                                      Edge edge,
                                      double mu) {
  const Result<NetworkAnalysis> analysis = AnalyseNetwork(cell);
  if (!analysis.ok()) {
    return Forward(analysis);
  }
  const SwitchNetwork& network = analysis->network;
  const CellWidths widths = MeasureWidths(cell, network, mu);
  const Result<NetId> output = NetNamed(cell, network, bundle.output);
  if (!output.ok()) {
    return Forward(output);
  }
  const auto& outputs = analysis->outputs;
  const bool is_output =
      std::find(outputs.begin(), outputs.end(), *output) != outputs.end();
  const double drive_m =
      is_output ? WeakestDrive(*analysis, widths, *output, edge) : 0.0;
  if (drive_m <= 0.0) {
    return CellError(cell,
                     fmt::format("{} is no output that makes the edge '{}'",
                                 bundle.output,
                                 EdgeName(edge)));
  }
  double load_m = 0.0;
  for (const std::string& name : bundle.nets) {
    const Result<NetId> net = NetNamed(cell, network, name);
    if (!net.ok()) {
      return Forward(net);
    }
    for (const int index : analysis->group_of(*output).switches) {
      const auto i = static_cast<size_t>(index);
      load_m += network.switches[i].gate == *net ? widths.gate_load_m[i] : 0.0;
    }
  }
  const double reference_m = widths.reference_width_m(drive_m);
  return BundleEstimate{
      load_m / reference_m,
      widths.diffusion_m[static_cast<size_t>(*output)] / reference_m};
}

}  // namespace gatedyno
