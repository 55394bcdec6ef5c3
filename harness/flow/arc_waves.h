// The waveforms of the arcs that differ most, simulated again for a picture.

#ifndef GATEDYNO_FLOW_ARC_WAVES_H_
#define GATEDYNO_FLOW_ARC_WAVES_H_

#include <cstddef>
#include <vector>

#include "harness/base/result.h"
#include "harness/record/arc_waves.h"
#include "harness/record/run_result.h"
#include "harness/sim/runner.h"
#include "harness/store/store.h"

namespace gatedyno {

// Of the `count` arcs whose g differs most (compare/summary.h), largest first;
// fewer where fewer have a verdict.  Each at the fanout nearest to 4 that it
// has a point of, from the job of `store` that measured the point, at the rung
// it ended with then.  What stands in the way of one arc is its trouble, and
// stops no other.  Fails when no job can be run at all, or the store not read.
Result<std::vector<ArcWaves>> WorstWaves(const RunResult& result,
                                         std::size_t count,
                                         Store* store,
                                         SimRunner* runner);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_ARC_WAVES_H_
