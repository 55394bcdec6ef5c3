#include "harness/effort/arc_ranking.h"

#include <algorithm>
#include <map>
#include <tuple>

#include "harness/effort/arc_estimate.h"
#include "harness/effort/widths.h"
#include "harness/network/toggle.h"

namespace gatedyno {
namespace {

// FO4 is what the trade compares at.
constexpr double kRankingFanout = 4.0;

double HandDelay(const Estimate& estimate) {
  return kRankingFanout * estimate.effort + estimate.parasitic_by_elmore;
}

// Slower by more than rounding, so that ties keep the first side vector.
bool IsSlower(const Estimate& a, const Estimate& b) {
  constexpr double kTie = 1e-9;
  return HandDelay(a) > HandDelay(b) * (1.0 + kTie);
}

struct RankedToggle {
  Toggle toggle;
  Estimate estimate;
};

// Input, position of the output, 0 for rising and 1 for falling.
using ArcKey = std::tuple<int, std::ptrdiff_t, int>;

ArcKey KeyOf(const NetworkAnalysis& analysis, const Toggle& toggle) {
  const auto output = std::find(
      analysis.outputs.begin(), analysis.outputs.end(), toggle.output);
  const Level final =
      analysis.levels[toggle.after][static_cast<size_t>(toggle.output)];
  return {toggle.input,
          output - analysis.outputs.begin(),
          final == Level::kHigh ? 0 : 1};
}

}  // namespace

std::vector<ArcEstimate> EstimateArcs(const Cell& cell,
                                      const NetworkAnalysis& analysis,
                                      const EstimateOptions& options) {
  const CellWidths widths = MeasureWidths(cell, analysis.network, options.mu);
  std::map<ArcKey, std::vector<RankedToggle>> by_key;
  for (const Toggle& toggle : FindToggles(analysis)) {
    const RankedToggle found = {toggle,
                                EstimateToggle(analysis, widths, toggle)};
    std::vector<RankedToggle>& kept = by_key[KeyOf(analysis, toggle)];
    if (options.all_side_vectors || kept.empty()) {
      kept.push_back(found);
    } else if (IsSlower(found.estimate, kept.front().estimate)) {
      kept.front() = found;
    }
  }
  std::vector<ArcEstimate> arcs;
  for (const auto& [_, kept] : by_key) {
    for (const RankedToggle& found : kept) {
      arcs.push_back({ArcOf(cell, analysis, found.toggle), found.estimate});
    }
  }
  return arcs;
}

}  // namespace gatedyno
