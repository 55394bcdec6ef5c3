// Measures one arc: asks for its jobs, looks at the points, asks for more.

#ifndef GATEDYNO_FLOW_ARC_MEASUREMENT_H_
#define GATEDYNO_FLOW_ARC_MEASUREMENT_H_

#include <functional>

#include "harness/compare/compare.h"
#include "harness/deck/stage_job.h"
#include "harness/flow/accuracy_sample.h"
#include "harness/flow/fanout_choice.h"
#include "harness/flow/work_desk.h"

namespace gatedyno {

// What the arcs of one corner have in common.
struct ArcContext {
  const Bench* bench = nullptr;
  const FanoutRule* fanouts = nullptr;
  AccuracySample* sample = nullptr;
  WorkDesk* desk = nullptr;
  bool always_checked = false;  // The first fanout is part of the sample.
  // What the arcs are compared with; null for the reference inverter itself.
  const Calibration* calibration = nullptr;
  Tolerance tolerance = {};
};

// `test` but its fanout describes the arc.  `on_done` is called once the arc's
// jobs have ended, from here or from the desk's Work; everything in `context`
// lives until then.  Points come in the order of their fanouts.
void MeasureArc(const ArcContext& context,
                const StageTest& test,
                std::function<void(MeasuredArc)> on_done);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_ARC_MEASUREMENT_H_
