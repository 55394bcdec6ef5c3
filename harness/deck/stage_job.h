// The fanout deck of one arc at one fanout, as a job.
//
//   source -> shaping stage 1 -> shaping stage 2 -> cell under test
//          -> load (h copies, same pin) -> load on the load (h * h copies)
//
// Matched drive: the shaping stages are reference inverters with the stage
// effort of the cell under test, so that the input's slope is the one a path
// of equal efforts would have.  Self drive: they are the cell itself at the
// same h.  The load must itself be loaded, or its input capacitance is wrong.

#ifndef GATEDYNO_DECK_STAGE_JOB_H_
#define GATEDYNO_DECK_STAGE_JOB_H_

#include "harness/deck/deck_head.h"
#include "harness/netlist/cell.h"
#include "harness/record/arc.h"
#include "harness/record/comparison.h"
#include "harness/record/job.h"
#include "harness/record/line.h"

namespace gatedyno {

struct StageTest {
  const Cell* cell = nullptr;
  Arc arc;
  Estimate estimate;
  double fanout = 1.0;
  Drive drive = Drive::kMatched;
  // About tau at this corner; only sets the length of the run.
  double time_unit_s = 0.0;
};

// Stage effort that the cell's driver is matched to.
double DriverEffort(const Estimate& estimate, double fanout);

// Jobs of the two edges of an arc are equal, key and all, where their hand
// efforts are.  The time limit is a hundred times what such a deck takes.
Job StageJob(const Bench& bench, const StageTest& test);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_STAGE_JOB_H_
