// The transistors of a cell on the page: a drawing of each stage, and the table
// of what is drawn.

#ifndef GATEDYNO_PAGE_PAGE_CIRCUIT_H_
#define GATEDYNO_PAGE_PAGE_CIRCUIT_H_

#include <string>

#include "harness/record/run_result.h"

namespace gatedyno {

// A figure; a sentence for a cell whose run kept no transistors.
std::string CircuitFigure(const CellSummary& cell);

}  // namespace gatedyno

#endif  // GATEDYNO_PAGE_PAGE_CIRCUIT_H_
