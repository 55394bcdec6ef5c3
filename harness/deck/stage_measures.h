// What is measured on a fanout deck, and how a point is read from it.
//
// Delay: 50 % of the cell's input to 50 % of its output.  Transition time:
// 20 % to 80 %, raw.  Both output edges are always measured.

#ifndef GATEDYNO_DECK_STAGE_MEASURES_H_
#define GATEDYNO_DECK_STAGE_MEASURES_H_

#include <array>
#include <string>

#include "harness/record/arc.h"
#include "harness/record/job.h"
#include "harness/record/line.h"
#include "harness/record/outcome.h"

namespace gatedyno {

// Nets of the cell under test in every fanout deck.
inline constexpr const char* kInputNet = "d_in";
inline constexpr const char* kOutputNet = "d_out";

// Adds intervals and swing checks for an arc that inverts, or does not.
void AddStageMeasures(bool inverting, double supply_v, Job& job);

// Names of the intervals that an arc's point is read from: its delay, then the
// transitions of its input and of its output.
std::array<std::string, 3> IntervalNames(const Arc& arc);

// The intervals as .meas lines, for whoever runs the deck by hand.
std::string MeasureLines(const Job& job);

// Each REQUIRES: `outcome` is measured, on a job with stage measures.
double DelayOf(const Outcome& outcome, Edge edge);
Point PointOf(const Outcome& outcome, const Arc& arc, double fanout);

}  // namespace gatedyno

#endif  // GATEDYNO_DECK_STAGE_MEASURES_H_
