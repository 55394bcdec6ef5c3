// The head of the page of two runs: what they are, their reference inverters,
// and how far g and p hold from one to the other.

#ifndef GATEDYNO_PAGE_VERSUS_HEAD_H_
#define GATEDYNO_PAGE_VERSUS_HEAD_H_

#include <string>

#include "harness/report/versus_view.h"

namespace gatedyno {

// What A and B are, a column each, and the corners that are left out.
std::string SideTable(const VersusView& view);

// tau, FO4 and p_inv of both, with ratios.
std::string CornerPairTable(const VersusView& view);

// Of all arcs: count, mean, standard deviation, within a tenth, the largest.
std::string SpreadTable(const VersusView& view);

// Of g alone, by what drives the output.
std::string StackSpreadTable(const VersusView& view);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_VERSUS_HEAD_H_
