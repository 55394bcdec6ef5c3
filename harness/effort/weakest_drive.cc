#include "harness/effort/weakest_drive.h"

#include <algorithm>

#include "harness/effort/drive.h"

namespace gatedyno {

double WeakestDrive(const NetworkAnalysis& analysis,
                    const CellWidths& widths,
                    NetId output,
                    Edge edge) {
  const Level final = edge == Edge::kRise ? Level::kHigh : Level::kLow;
  const Group& group = analysis.group_of(output);
  double weakest_m = 0.0;
  for (const Levels& levels : analysis.levels) {
    if (levels[static_cast<size_t>(output)] == final) {
      const double drive_m =
          SolveDrive(analysis.network, group, widths, levels, output)
              .conductance_m;
      weakest_m = weakest_m > 0.0 ? std::min(weakest_m, drive_m) : drive_m;
    }
  }
  return weakest_m;
}

}  // namespace gatedyno
