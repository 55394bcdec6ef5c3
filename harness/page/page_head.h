// How the page opens: counts, the arcs that differ most, the corners.

#ifndef GATEDYNO_PAGE_PAGE_HEAD_H_
#define GATEDYNO_PAGE_PAGE_HEAD_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// Cells and arcs within, beyond and not measured.
std::string CountTable(const RunResult& result);

// The three with the largest difference of g, as a list; each links to its
// arc.
std::string WorstList(const RunResult& result);

// tau, p_inv and FO4, one row a corner.
std::string CornerTable(const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_HEAD_H_
