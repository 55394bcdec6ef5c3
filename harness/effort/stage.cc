#include "harness/effort/stage.h"

#include <algorithm>
#include <cassert>

namespace gatedyno {
namespace {

// The diffusion width the hand method puts on a net of the group.
double NetLoad(const Group& group, const CellWidths& widths, NetId net) {
  const bool is_output =
      std::find(group.outputs.begin(), group.outputs.end(), net) !=
      group.outputs.end();
  const double diffusion_m = widths.diffusion_m[static_cast<size_t>(net)];
  return is_output ? diffusion_m : diffusion_m / 2.0;
}

}  // namespace

Stage SolveStage(const NetworkAnalysis& analysis,
                 const CellWidths& widths,
                 NetId output,
                 InputVector before,
                 InputVector after) {
  const Group& group = analysis.group_of(output);
  const Levels& initial = analysis.levels[before];
  const Levels& final = analysis.levels[after];
  const Level target = final[static_cast<size_t>(output)];
  assert(target != initial[static_cast<size_t>(output)]);

  Stage stage;
  stage.drive = SolveDrive(analysis.network, group, widths, final, output);
  stage.reference_width_m = widths.reference_width_m(stage.drive.conductance_m);
  stage.parasitic_by_nodes =
      NetLoad(group, widths, output) / stage.reference_width_m;
  for (size_t k = 0; k < stage.drive.nets.size(); ++k) {
    const NetId net = stage.drive.nets[k];
    if (initial[static_cast<size_t>(net)] != target) {
      stage.parasitic_by_elmore += stage.drive.transfer_per_m[k] *
                                   NetLoad(group, widths, net) /
                                   (1.0 + widths.mu);
    }
  }
  return stage;
}

}  // namespace gatedyno
