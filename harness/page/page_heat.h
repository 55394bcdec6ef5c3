// The page's heat map, difference by cell and corner: a table, so that it is
// its own data table, prints, and needs no script.

#ifndef GATEDYNO_PAGE_PAGE_HEAT_H_
#define GATEDYNO_PAGE_PAGE_HEAT_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// Two tables, of g and of p.  A place shows the largest difference of the
// cell's arcs at that corner, and links to that arc; "not measured" where none
// has a line, and nothing where the run has no such arc.
std::string HeatMaps(const RunResult& result);

// The class of a place: "h0" within a quarter of what is allowed, then "up1" to
// "up3" or "down1" to "down3" for steps at a quarter, a half and the whole of
// it.  Taken from the percentage as SignedPercent() prints it, so that the
// shade agrees with the number read.
std::string HeatClass(double difference, double tolerance);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_HEAT_H_
