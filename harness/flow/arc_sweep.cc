#include "harness/flow/arc_sweep.h"

#include <fmt/format.h>

#include "harness/deck/stage_measures.h"

namespace gatedyno {

ArcSweep PlanSweep(const Bench& bench,
                   StageTest test,
                   const std::vector<double>& fanouts) {
  ArcSweep sweep{.arc = test.arc,
                 .estimate = test.estimate,
                 .fanouts = fanouts,
                 .jobs = {}};
  for (const double fanout : fanouts) {
    test.fanout = fanout;
    sweep.jobs.push_back(StageJob(bench, test));
  }
  return sweep;
}

MeasuredArc CollectSweep(const ArcSweep& sweep, const OutcomeBook& book) {
  MeasuredArc measured{.arc = sweep.arc,
                       .estimate = sweep.estimate,
                       .points = {},
                       .failures = {}};
  for (size_t i = 0; i < sweep.jobs.size(); ++i) {
    const Outcome& outcome = book.OutcomeOf(sweep.jobs[i].key);
    if (outcome.measured()) {
      measured.points.push_back(PointOf(outcome, sweep.arc, sweep.fanouts[i]));
    } else {
      measured.failures.push_back(fmt::format("h={}: {}: {}",
                                              sweep.fanouts[i],
                                              EndingName(outcome.ending),
                                              outcome.message));
    }
  }
  return measured;
}

}  // namespace gatedyno
