// Where an input decides an output: the raw material of arcs.

#ifndef GATEDYNO_NETWORK_TOGGLE_H_
#define GATEDYNO_NETWORK_TOGGLE_H_

#include <vector>

#include "harness/network/analysis.h"
#include "harness/record/arc.h"

namespace gatedyno {

// One step of one input that moves one output.
struct Toggle {
  int input = 0;  // Index into NetworkAnalysis::inputs.
  NetId output = 0;
  InputVector before = 0;
  InputVector after = 0;  // Differs from `before` in `input` alone.
};

// Every side vector and both directions, by input, output, and vector.
std::vector<Toggle> FindToggles(const NetworkAnalysis& analysis);

Arc ArcOf(const Cell& cell,
          const NetworkAnalysis& analysis,
          const Toggle& toggle);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_TOGGLE_H_
