// Complaints about a cell, with its place: "nand2.sp:3:1: cell 'nand2': ...".

#ifndef GATEDYNO_NETWORK_CELL_ERROR_H_
#define GATEDYNO_NETWORK_CELL_ERROR_H_

#include <string_view>

#include "harness/base/result.h"
#include "harness/netlist/cell.h"

namespace gatedyno {

// At the cell's .subckt line.
tl::unexpected<Error> CellError(const Cell& cell, std::string_view message);

// At a line of the cell.
tl::unexpected<Error> CellErrorAt(const Cell& cell,
                                  const SourcePlace& place,
                                  std::string_view message);

}  // namespace gatedyno

#endif  // GATEDYNO_NETWORK_CELL_ERROR_H_
