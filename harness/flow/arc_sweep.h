// One arc over all the fanouts: its jobs, and the points they gave.

#ifndef GATEDYNO_FLOW_ARC_SWEEP_H_
#define GATEDYNO_FLOW_ARC_SWEEP_H_

#include <span>
#include <string>
#include <vector>

#include "harness/compare/compare.h"
#include "harness/deck/stage_job.h"
#include "harness/flow/outcome_book.h"

namespace gatedyno {

struct ArcSweep {
  Arc arc;
  Estimate estimate;
  std::vector<double> fanouts;
  std::vector<Job> jobs;  // One a fanout, same order.
};

// `test` but its fanout describes the arc.
ArcSweep PlanSweep(const Bench& bench,
                   StageTest test,
                   const std::vector<double>& fanouts);

// REQUIRES: the sweep's jobs have ended in `book`.
MeasuredArc CollectSweep(const ArcSweep& sweep, const OutcomeBook& book);

}  // namespace gatedyno

#endif  // GATEDYNO_FLOW_ARC_SWEEP_H_
