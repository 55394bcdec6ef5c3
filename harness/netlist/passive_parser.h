// R and C lines: what extraction adds to a cell.

#ifndef GATEDYNO_NETLIST_PASSIVE_PARSER_H_
#define GATEDYNO_NETLIST_PASSIVE_PARSER_H_

#include "harness/netlist/definition.h"
#include "harness/netlist/fields.h"
#include "harness/netlist/logical_line.h"
#include "harness/netlist/parse_error.h"

namespace gatedyno {

// R1 a b 100 [m=2], C1 a b c=1f.
Parsed<CellLine> ParsePassive(const LogicalLine& line, const Fields& fields);

}  // namespace gatedyno

#endif  // GATEDYNO_NETLIST_PASSIVE_PARSER_H_
