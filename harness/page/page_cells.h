// The page's section on each cell: function, stages, transistors, and the hand
// numbers of each arc with its side vector.

#ifndef GATEDYNO_PAGE_PAGE_CELLS_H_
#define GATEDYNO_PAGE_PAGE_CELLS_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

std::string CellSections(const RunResult& result);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_CELLS_H_
